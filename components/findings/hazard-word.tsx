import type { Signal } from '@/lib/findings/vocabulary';

const COLOR: Record<Signal, string> = {
  DANGER: 'bg-danger text-on-danger',
  WARNING: 'bg-warning text-on-warning',
  CAUTION: 'bg-caution text-on-caution',
  NOTICE: 'bg-notice text-on-notice italic',
};
const ALERT =
  'M18.3 1.2a2 2 0 0 1 3.4 0l17.6 31a2 2 0 0 1-1.7 3H2.4a2 2 0 0 1-1.7-3zM17.6 11l1 13h2.8l1-13zm2.4 15.4a2.5 2.5 0 1 0 0 5 2.5 2.5 0 0 0 0-5z';
const SHEET = 'M7 1h19l8 8v26H7zm5 10v3h10v-3zm0 7v3h17v-3zm0 7v3h17v-3z';

/** Word, icon and color of ANSI Z535.4; never the color alone. */
export function HazardWord({
  signal,
  small = false,
  word = signal,
}: {
  signal: Signal;
  small?: boolean;
  word?: string;
}) {
  return (
    <strong
      data-signal={signal}
      className={`inline-flex items-center gap-2 rounded-[2px] border-2 border-transparent tracking-wider uppercase ${COLOR[signal]} ${small ? 'px-2 py-1 text-xs' : 'px-3 py-1.5 text-m'} leading-none [print-color-adjust:exact]`}
    >
      <svg
        aria-hidden="true"
        viewBox="0 0 40 36"
        className="h-[1.1em] w-[1.25em]"
        fill="currentColor"
        fillRule="evenodd"
      >
        <path d={signal === 'NOTICE' ? SHEET : ALERT} />
      </svg>
      {word}
    </strong>
  );
}
