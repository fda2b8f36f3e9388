import { Button } from '@/components/ui/button';
import type { OpenConflict } from '@/db/conflicts';
import { resolveConflictAction } from './actions';

/** Both values, who and when; two equal buttons, none chosen for you. */
export function ConflictList({
  inspectionId,
  conflicts,
  timeZone,
}: {
  inspectionId: string;
  conflicts: OpenConflict[];
  timeZone: string;
}) {
  const format = new Intl.DateTimeFormat('en-US', { timeZone, dateStyle: 'short', timeStyle: 'short' });
  return (
    <section aria-labelledby="conflicts" className="border-2 border-dashed border-ink p-4">
      <h2 id="conflicts" className="font-serif text-l font-bold">
        Two people changed the same thing
      </h2>
      <ul className="mt-3 grid gap-4">
        {conflicts.map(({ id, entity, field, theirs, yours }) => (
          <li key={id}>
            <p className="font-bold">
              {wordsOf(entity)}, {wordsOf(field).toLowerCase()}
            </p>
            <form action={resolveConflictAction.bind(null, inspectionId)} className="mt-2 grid gap-3 sm:grid-cols-2">
              <input type="hidden" name="conflictId" value={id} />
              {(
                [
                  ['theirs', theirs],
                  ['yours', yours],
                ] as const
              ).map(([keep, side]) => (
                <Button key={keep} type="submit" name="keep" value={keep}>
                  Keep “{shown(side.value)}” of {side.by}, {format.format(new Date(side.at))}
                </Button>
              ))}
            </form>
          </li>
        ))}
      </ul>
    </section>
  );
}

function shown(value: unknown): string {
  if (value === null || value === '') return 'nothing';
  if (typeof value === 'boolean') return value ? 'yes' : 'no';
  return typeof value === 'object' ? JSON.stringify(value) : String(value);
}

/** "yearBuilt" reads "Year built". */
function wordsOf(name: string): string {
  const words = name.replaceAll(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
  return words.charAt(0).toUpperCase() + words.slice(1);
}
