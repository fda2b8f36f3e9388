'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { ErrorSummary } from '@/components/ui/error-summary';
import { SelectField, TextArea, TextField } from '@/components/ui/field';
import type { DecisionStanding } from '@/db/report-findings';
import { SIGNALS, type Signal } from '@/lib/findings/vocabulary';
import type { WalkDecision } from '@/lib/schemas/walk';
import { decideAction, type DecisionState } from './actions';

type DecisionFormProps = {
  inspectionId: string;
  findingId: string;
  readingIds: string[];
  signal: Signal;
  standing: DecisionStanding;
  decision?: WalkDecision;
  original: { observed: string; plain: string };
  nextId?: string;
  left: number;
};

/** Keep, dismiss with a reason, say it in own words, raise the signal. What it was decided on is kept with it. */
export function DecisionForm({
  inspectionId,
  findingId,
  readingIds,
  signal,
  standing,
  decision,
  original,
  nextId,
  left,
}: DecisionFormProps) {
  const start: DecisionState = {
    problems: [],
    saved: false,
    values: {
      reason: decision?.reason ?? '',
      observed: decision?.ownWords?.observed ?? '',
      plain: decision?.ownWords?.plain ?? '',
      raisedSignal: decision?.raisedSignal ?? '',
    },
  };
  const [{ values, problems, saved }, submit, isSending] = useActionState(
    decideAction.bind(null, inspectionId, findingId, readingIds),
    start,
  );
  const errorOf = (field: string) => problems.find((problem) => problem.field === field)?.says;
  const graver = SIGNALS.slice(0, SIGNALS.indexOf(signal));
  return (
    <form action={submit} noValidate className="grid gap-4 border-t-2 border-ink pt-4" aria-label="Decision">
      <ErrorSummary problems={problems} />
      {standing === 'changed' && (
        <p className="border-2 border-dashed border-ink p-3">
          <b>Changed since you decided.</b> There is new or withdrawn evidence. Look at it, then keep or dismiss again;
          the report waits for that.
        </p>
      )}
      <div className="flex flex-wrap items-center gap-3">
        <Button weight="solid" type="submit" name="decision" value="kept" pending={isSending}>
          {standing === 'kept' ? 'Keep as it is now' : 'Keep'}
        </Button>
        <span role="status">{saved && 'Recorded.'}</span>
        {saved && nextId && (
          <Link className="button" href={`/inspections/${inspectionId}/findings?show=${encodeURIComponent(nextId)}`}>
            Next of {left} to decide
          </Link>
        )}
        {saved && !nextId && (
          <Link className="button" href={`/inspections/${inspectionId}/report`}>
            All decided. Go to the report
          </Link>
        )}
      </div>
      <details open={values.observed !== '' || values.plain !== '' || values.raisedSignal !== ''}>
        <summary className="flex min-h-[44px] items-center font-bold underline">
          In my own words, or a graver signal
        </summary>
        <div className="grid gap-4 pt-2">
          <TextArea
            id="observed"
            name="observed"
            label="What was observed"
            hint={`Now: ${original.observed}`}
            defaultValue={values.observed}
            error={errorOf('observed')}
          />
          <TextArea
            id="plain"
            name="plain"
            label="In plain words for the buyer"
            hint={`Now: ${original.plain}`}
            defaultValue={values.plain}
            error={errorOf('plain')}
          />
          {graver.length > 0 && (
            <SelectField
              id="raisedSignal"
              name="raisedSignal"
              label="Raise the signal"
              hint="It can be raised, never lowered"
              defaultValue={values.raisedSignal}
            >
              <option value="">Leave it at {signal}</option>
              {graver.map((word) => (
                <option key={word}>{word}</option>
              ))}
            </SelectField>
          )}
          <p>
            <Button type="submit" name="decision" value="kept" pending={isSending}>
              Keep with these words
            </Button>
          </p>
        </div>
      </details>
      <details open={standing === 'dismissed' || errorOf('reason') !== undefined}>
        <summary className="flex min-h-[44px] items-center font-bold underline">Dismiss because…</summary>
        <div className="grid gap-4 pt-2">
          <TextField
            id="reason"
            name="reason"
            label="Reason, kept on record and not printed"
            defaultValue={values.reason}
            error={errorOf('reason')}
          />
          <p>
            <Button type="submit" name="decision" value="dismissed" pending={isSending}>
              Dismiss it
            </Button>
          </p>
        </div>
      </details>
    </form>
  );
}
