import type { AuditLine } from '@/db/audit';

/** The last things that happened, newest first. */
export function ActivityList({ lines, timeZone }: { lines: AuditLine[]; timeZone: string }) {
  const format = new Intl.DateTimeFormat('en-US', { timeZone, dateStyle: 'short', timeStyle: 'short' });
  return (
    <section>
      <h2 className="mb-2 font-bold">Latest activity</h2>
      {lines.length === 0 && <p>Nothing yet.</p>}
      <ul className="grid">
        {lines.map((line) => (
          <li key={line.order} className="border-b border-hairline py-2">
            {wordsOf(line.kind)}
            <span className="block text-ink-2">
              {line.who}, {format.format(new Date(line.at))}
            </span>
          </li>
        ))}
      </ul>
    </section>
  );
}

/** "photo.stored" reads "Photo stored". */
function wordsOf(kind: string): string {
  const words = kind.replaceAll(/[.-]/g, ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
