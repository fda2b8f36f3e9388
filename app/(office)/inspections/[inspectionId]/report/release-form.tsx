'use client';

import { useActionState } from 'react';
import type { ReviewLine } from '@/db/report-review';
import type { ReleaseOutcome } from '@/db/reports';
import { Button } from '@/components/ui/button';
import { TextArea } from '@/components/ui/field';
import { releaseAction, type ReleaseState } from './actions';

type ReleaseFormProps = {
  inspectionId: string;
  nextNumber: number;
  /** What a new version would change; null before the first. */
  changes: string[] | null;
  held: number;
  overridable: ReviewLine[];
  mayRelease: boolean;
};

const EMPTY: ReleaseState = { outcome: null, reason: '', overrides: {} };

export function ReleaseForm(props: ReleaseFormProps) {
  const { inspectionId, nextNumber, changes, held, overridable, mayRelease } = props;
  const [state, action, isPending] = useActionState(releaseAction, EMPTY);
  const says = state.outcome && wordsOf(state.outcome);
  const hold = holdOf(props);
  const byCode = new Map(overridable.map((line) => [line.code, line]));
  return (
    <form action={action} className="mt-4 grid gap-4">
      <input type="hidden" name="inspectionId" value={inspectionId} />
      {changes !== null && changes.length > 0 && (
        <>
          <ul className="list-disc pl-5 text-s">
            {changes.map((change) => (
              <li key={change}>{change}</li>
            ))}
          </ul>
          <TextArea
            id="reason"
            name="reason"
            rows={2}
            required
            defaultValue={state.reason}
            label={`Why version ${nextNumber} is made`}
            hint="Printed in the report."
          />
        </>
      )}
      {mayRelease &&
        held === 0 &&
        [...byCode.values()].map((line) => (
          <TextArea
            key={line.code}
            id={`override-${line.code}`}
            name={`override-${line.code}`}
            rows={2}
            required
            defaultValue={state.overrides[line.code]}
            label={`Why release although: ${line.says.toLowerCase()}`}
            hint="Kept and printed in the report."
          />
        ))}
      <Button
        type="submit"
        weight={hold ? 'outline' : 'solid'}
        disabled={hold !== null}
        pending={isPending}
        className="justify-self-start disabled:border-dashed disabled:text-ink-2"
      >
        Sign and release
      </Button>
      {hold && <p className="text-s text-ink-2">{hold}</p>}
      {says && <p role="status">{says}</p>}
    </form>
  );
}

function holdOf({ held, changes, mayRelease }: ReleaseFormProps): string | null {
  if (!mayRelease) return 'An inspector signs and releases.';
  if (held > 0) return held === 1 ? 'Held by one line.' : `Held by ${held} lines.`;
  if (changes?.length === 0) return 'Nothing has changed since the last version.';
  return null;
}

function wordsOf(outcome: ReleaseOutcome): string {
  switch (outcome.kind) {
    case 'released':
      return `Version ${outcome.number} is released. Its PDF will be ready in a minute.`;
    case 'held':
      return 'Not released: something still holds it. The list says what.';
    case 'nothing-changed':
      return `Not released again: nothing has changed since version ${outcome.number}.`;
    case 'reason-needed':
      return `Say why version ${outcome.number} is made.`;
    case 'not-allowed':
      return 'An inspector signs and releases.';
    case 'not-found':
      return 'This inspection no longer exists. Go back to your inspections.';
  }
}
