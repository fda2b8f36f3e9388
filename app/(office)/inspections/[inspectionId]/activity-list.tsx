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

const SAID: Record<string, string> = {
  'inspection.booked': 'Booked',
  'inspection.set': 'House facts changed',
  'inspection.advance': 'Moved on',
  'inspection.cancelled': 'Cancelled',
  'inspection.reopened': 'Opened again',
  'area.add': 'Area added',
  'receptacle.add': 'Receptacle added',
  'receptacle.set': 'Receptacle changed',
  'reading.add': 'Reading recorded',
  'reading.withdraw': 'Reading taken back',
  'skip.add': 'Skipped, with a reason',
  'notice.add': 'Told, or put back on',
  'photo.add': 'Photo announced',
  'photo.stored': 'Photo stored',
  'finding.decide': 'Finding decided',
  'party.saved': 'Party saved',
};

/** A sentence where there is one; else the kind, read as words. */
function wordsOf(kind: string): string {
  const words = SAID[kind] ?? kind.replaceAll(/[.-]/g, ' ');
  return words.charAt(0).toUpperCase() + words.slice(1);
}
