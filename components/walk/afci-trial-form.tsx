'use client';

import { v7 as uuidv7 } from 'uuid';
import { assessAfci } from '@/lib/findings';
import type { AfciReadingEvidence } from '@/lib/findings/facts';
import { standingReadings } from './progress';
import { answered, NotTested, shown, TRIPS, Verdict, withoutGaps, YES_NO, type TrialProps } from './trial-parts';
import { Choices } from './walk-button';
import { WentDead } from './went-dead';

/** An AFCI is tested by its own button only. */
export function AfciTrialForm({ walk, state, receptacle }: TrialProps) {
  const held = standingReadings(state, receptacle.id).findLast((row) => row.kind === 'afci');
  const evidence: AfciReadingEvidence = held?.kind === 'afci' ? held.evidence : {};
  const verdict = assessAfci(evidence);

  async function set(patch: Partial<AfciReadingEvidence>) {
    const next = withoutGaps({ ...evidence, ...patch });
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacle.id,
        supersedes: held?.id,
        reading: { kind: 'afci', evidence: next },
      },
    ]);
  }

  return (
    <div className="grid gap-5">
      <Choices
        legend="Press the AFCI’s own test button."
        options={TRIPS}
        value={evidence.button}
        onChange={(button) => void set({ button })}
      />
      {evidence.button === 'trips' && (
        <>
          <Choices
            legend="Is this point dead now?"
            options={YES_NO}
            value={shown(evidence.circuitDead)}
            onChange={(value) => void set({ circuitDead: answered(value) })}
          />
          <WentDead
            state={state}
            exceptId={receptacle.id}
            chosen={evidence.wentDead ?? []}
            onChange={(wentDead) => void set({ wentDead })}
          />
          <Choices
            legend="Does it reset? Some need full OFF first."
            options={YES_NO}
            value={shown(evidence.resets)}
            onChange={(value) => void set({ resets: answered(value) })}
          />
        </>
      )}
      <Choices
        legend="A plug-in AFCI indicator, if used"
        options={TRIPS}
        value={evidence.indicator}
        onChange={(indicator) => void set({ indicator })}
      />
      <NotTested value={evidence.notTestedReason} onChange={(notTestedReason) => void set({ notTestedReason })} />
      <Verdict says={verdict.says} protects={verdict.protects} />
    </div>
  );
}
