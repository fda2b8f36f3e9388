import type { Route } from 'next';
import Link from 'next/link';
import type { ReviewLine } from '@/db/report-review';

const NUMBERS = ['No', 'One', 'Two', 'Three', 'Four', 'Five', 'Six', 'Seven', 'Eight', 'Nine', 'Ten'];
const OPENS: Record<ReviewLine['to'], string> = {
  walk: 'Open Walk',
  findings: 'Decide',
  visit: 'Open Visit',
  circuits: 'Open Circuits',
  firm: 'Open Firm',
  me: 'Open your page',
};

type ReviewListProps = { inspectionId: string; lines: ReviewLine[]; isUnchanged: boolean };

/** What holds the release, each with the way to where it is put right. */
export function ReviewList({ inspectionId, lines, isUnchanged }: ReviewListProps) {
  const count = NUMBERS[lines.length] ?? String(lines.length);
  const title = lines.length === 1 ? 'One thing holds the release' : `${count} things hold the release`;
  return (
    <section aria-labelledby="review">
      <h2 id="review" className="font-serif text-xl font-bold">
        {lines.length === 0 ? 'Nothing holds the release' : title}
      </h2>
      <p className="mt-3 max-w-[62ch] font-serif text-m leading-relaxed">{leadOf(lines, isUnchanged)}</p>
      {lines.length > 0 && (
        <ol className="mt-6 border-t border-ink">
          {lines.map((line, index) => (
            <li
              key={index}
              className="grid grid-cols-[3rem_1fr_auto] items-center gap-x-4 gap-y-2 border-b border-hairline py-3 max-sm:grid-cols-[2rem_1fr]"
            >
              <span aria-hidden="true" className="font-serif text-2xl">
                {index + 1}
              </span>
              <div>
                <h3 className="font-bold">{line.says}</h3>
                <p className="text-ink-2">{line.detail}</p>
              </div>
              <Link
                href={addressOf(inspectionId, line)}
                className="button max-sm:col-start-2 max-sm:justify-self-start"
              >
                {OPENS[line.to]}
                <span className="sr-only">: {line.says}</span>
              </Link>
            </li>
          ))}
        </ol>
      )}
    </section>
  );
}

function leadOf(lines: ReviewLine[], isUnchanged: boolean): string {
  if (lines.length === 0)
    return isUnchanged
      ? 'The report says the same as the version that is released. There is nothing to release again.'
      : 'Read page one beside this once more as the buyer will read it, then sign.';
  return lines.some((line) => line.overridable)
    ? 'Each line opens where it is put right. Some may be released with a reason, which is kept and printed.'
    : 'Each line opens where it is put right.';
}

function addressOf(inspectionId: string, { to, at }: ReviewLine): Route {
  switch (to) {
    case 'walk':
      return `/walk#${inspectionId}` as Route;
    case 'findings':
      return `/inspections/${inspectionId}/findings${at ? `?show=${encodeURIComponent(at)}` : ''}` as Route;
    case 'circuits':
      return `/inspections/${inspectionId}/circuits` as Route;
    case 'visit':
      return `/inspections/${inspectionId}` as Route;
    case 'firm':
      return '/firm' as Route;
    case 'me':
      return '/people/me' as Route;
  }
}
