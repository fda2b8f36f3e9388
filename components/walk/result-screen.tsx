'use client';

import { useMemo } from 'react';
import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import { conditionName, diagnoseWiring, wiringEvidence } from '@/lib/findings';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { EvidenceSection } from './evidence-section';
import { lampsInWords } from './labels';
import { PhotoButton } from './photo-button';
import { standingReadings } from './progress';
import { ToldLink } from './told-link';
import { addressOf, goTo } from './walk-address';
import { WalkButton } from './walk-button';

/** What the readings prove and what they do not, and the one check that would tell most. */
export function ResultScreen({
  walk,
  state,
  receptacle,
}: {
  walk: Walk;
  state: WalkState;
  receptacle: WalkReceptacle;
}) {
  const facts = useMemo(() => inspectionFacts(state), [state]);
  const evidence = useMemo(() => wiringEvidence(facts, receptacle.id), [facts, receptacle.id]);
  const diagnosis = useMemo(() => diagnoseWiring(evidence), [evidence]);
  const [leading, ...others] = diagnosis.candidates;

  async function undo() {
    const last = standingReadings(state, receptacle.id).findLast((row) => row.kind === 'wiring' && row.evidence.lamps);
    if (last) await walk.save([{ op: 'reading.withdraw', id: last.id }]);
    goTo(state.inspection.id, { kind: 'area', areaId: receptacle.areaId, receptacleId: receptacle.id });
  }
  return (
    <div className="flex grow flex-col justify-between gap-5 px-4 py-4">
      <div className="grid gap-4">
        <div className="grid grid-cols-2 items-end gap-2 text-center text-s">
          <figure>
            <ReceptacleDrawing pattern={receptacle.pattern} view="reading" lamps={evidence.lamps} size={150} />
            <figcaption>
              Read: {evidence.lamps ? lampsInWords(evidence.lamps, receptacle.pattern) : 'no lamps'}
            </figcaption>
          </figure>
          {leading && (
            <figure>
              <ReceptacleDrawing pattern={receptacle.pattern} view="wiring" condition={leading.condition} size={170} />
              <figcaption>{diagnosis.candidates.length === 1 ? 'What fits' : 'Most often'}</figcaption>
            </figure>
          )}
        </div>
        <section aria-live="polite" className="grid gap-3 border-t-2 border-ink pt-3">
          {diagnosis.conflict && (
            <p className="border-2 border-dashed border-ink p-3 font-bold">▲ {diagnosis.conflict}</p>
          )}
          {leading && <h2 className="font-serif text-l font-bold">{conditionName(leading.condition)}</h2>}
          {leading && <p>{leading.because}</p>}
          {others.length > 0 && (
            <p>
              <b>Also possible:</b>{' '}
              {others.map((candidate) => conditionName(candidate.condition).toLowerCase()).join('; ')}.
            </p>
          )}
          <p className="border-l-4 border-double border-ink pl-3">
            <b>Not proven:</b> {diagnosis.notProven.join(' ')}
          </p>
        </section>
        <ToldLink state={state} facts={facts} receptacleId={receptacle.id} />
        <EvidenceSection
          walk={walk}
          state={state}
          receptacleId={receptacle.id}
          evidence={evidence}
          nextCheck={diagnosis.nextCheck}
        />
        <div className="grid grid-cols-2 gap-2">
          <a
            className="flex min-h-[56px] items-center justify-center text-center underline underline-offset-4"
            href={addressOf(state.inspection.id, {
              kind: 'area',
              areaId: receptacle.areaId,
              receptacleId: receptacle.id,
            })}
          >
            Read the lamps again
          </a>
          <WalkButton weight="quiet" onClick={() => void undo()}>
            Undo this lamp reading
          </WalkButton>
        </div>
      </div>
      <div className="sticky bottom-0 -mx-4 grid grid-cols-2 gap-2 border-t border-hairline bg-paper px-4 py-2">
        <PhotoButton walk={walk} subject={{ receptacleId: receptacle.id }} />
        <a
          className="flex min-h-[56px] items-center justify-center rounded-[2px] bg-inverse px-4 text-center font-bold text-on-inverse"
          href={addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId })}
        >
          Log as it stands, next
        </a>
      </div>
    </div>
  );
}
