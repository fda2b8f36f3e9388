'use client';

import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import type { LampPattern } from '@/lib/findings/facts';
import type { Lamp, SlotPattern } from '@/lib/findings/vocabulary';

/** Lamps as tapped so far; what is absent was not read. */
export type TappedLamps = Partial<LampPattern>;

const LINKS = [
  { key: 'hn', name: 'Lamp hot to neutral', at: 'left-1/2 top-[2%] -translate-x-1/2' },
  { key: 'hg', name: 'Lamp hot to ground', at: 'right-[9%] bottom-[20%]' },
  { key: 'ng', name: 'Lamp neutral to ground', at: 'left-[9%] bottom-[20%]' },
] as const;
const CYCLE: (Lamp | undefined)[] = [undefined, 'lit', 'dim', 'off'];
const CHOICES = [
  { value: undefined, label: 'not read', digit: '0' },
  { value: 'lit', label: 'lit', digit: '1' },
  { value: 'off', label: 'off', digit: '2' },
  { value: 'dim', label: 'dim', digit: '3' },
] as const;

/** The pad is the drawing itself: a tap cycles a lamp; at a desk the digits 0 to 3 or the arrow keys set it. */
export function LampPad({
  pattern,
  lamps,
  onChange,
}: {
  pattern: SlotPattern;
  lamps: TappedLamps;
  onChange: (lamps: TappedLamps) => void;
}) {
  const links = pattern === '1-15R' ? LINKS.slice(0, 1) : LINKS;
  const set = (key: keyof LampPattern, value: Lamp | undefined) => onChange({ ...lamps, [key]: value });
  return (
    <div className="relative mx-auto aspect-square w-full max-w-[352px]">
      <ReceptacleDrawing
        pattern={pattern}
        view="pad"
        lamps={lamps}
        size={352}
        label={`${pattern} receptacle, ${links.length === 1 ? 'one lamp' : 'three lamps'}`}
      />
      {links.map(({ key, name, at }) => (
        <fieldset
          key={key}
          className={`absolute size-[92px] rounded-full focus-within:shadow-[var(--focus)] ${at}`}
          onKeyDown={(event) => {
            const choice = CHOICES.find((one) => one.digit === event.key);
            if (choice) set(key, choice.value);
          }}
        >
          <legend className="sr-only">{name}</legend>
          {CHOICES.map(({ value, label }) => (
            <label key={label} className="sr-only">
              <input
                type="radio"
                name={`lamp-${key}`}
                checked={lamps[key] === value}
                onChange={() => set(key, value)}
              />
              {label}
            </label>
          ))}
          {/* The radios above are what is spoken and tabbed to; this is the same for a thumb. */}
          <button
            type="button"
            tabIndex={-1}
            aria-label={`${name}: ${lamps[key] ?? 'not read'}. Tap to change`}
            onClick={() => set(key, CYCLE[(CYCLE.indexOf(lamps[key]) + 1) % CYCLE.length])}
            className="absolute inset-0 touch-manipulation rounded-full"
          />
        </fieldset>
      ))}
    </div>
  );
}
