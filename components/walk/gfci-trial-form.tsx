'use client';

import { v7 as uuidv7 } from 'uuid';
import { assessGfci } from '@/lib/findings';
import type { GfciReadingEvidence, LampPattern } from '@/lib/findings/facts';
import { BREAKER_MARKINGS, type BreakerMarking, type GfciDevice, type TripResult } from '@/lib/findings/vocabulary';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import { lampsInWords, readsCorrect } from './labels';
import { lastWiring, placeOf, standingReadings } from './progress';
import { answered, NotTested, shown, TRIPS, Verdict, withoutGaps, YES_NO, type TrialProps } from './trial-parts';
import { Choices } from './walk-button';
import { WentDead } from './went-dead';

const MARKINGS: Record<BreakerMarking, string> = {
  'class-a-gfci': 'Class A GFCI',
  'dual-function': 'AFCI and GFCI',
  afci: 'AFCI only',
  other: 'Other',
};

/** A GFCI's own button first; the plug-in tester only where the lamps read correct. */
export function GfciTrialForm({ walk, state, receptacle }: TrialProps) {
  const held = standingReadings(state, receptacle.id).findLast((row) => row.kind === 'gfci');
  const wiring = lastWiring(state, receptacle.id);
  const lamps: LampPattern | undefined = wiring?.kind === 'wiring' ? wiring.evidence.lamps : undefined;
  const start: GfciReadingEvidence = { device: receptacle.device === 'receptacle' ? 'downstream' : 'receptacle' };
  const evidence: GfciReadingEvidence = {
    ...(held?.kind === 'gfci' ? held.evidence : start),
    ...(lamps ? { lamps } : {}),
  };
  const verdict = assessGfci(evidence);
  const downstream = evidence.device === 'downstream';
  const mayUseTester = lamps !== undefined && readsCorrect(lamps);

  async function set(patch: Partial<GfciReadingEvidence>) {
    const next = withoutGaps({ ...evidence, ...patch });
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacle.id,
        supersedes: held?.id,
        reading: { kind: 'gfci', evidence: next },
      },
    ]);
  }

  return (
    <div className="grid gap-5">
      <Choices<GfciDevice>
        legend="Where is the GFCI?"
        columns={3}
        options={[
          ['receptacle', 'Here'],
          ['downstream', 'Upstream'],
          ['breaker', 'Breaker'],
        ]}
        value={evidence.device}
        onChange={(device) => void set({ device: device ?? evidence.device })}
      />
      {evidence.device === 'breaker' && (
        <Choices
          legend="What is the breaker marked?"
          options={BREAKER_MARKINGS.map((marking) => [marking, MARKINGS[marking]] as const)}
          value={evidence.breakerMarking}
          onChange={(breakerMarking) => void set({ breakerMarking })}
        />
      )}
      {downstream && (
        <UpstreamChoice
          state={state}
          receptacle={receptacle}
          value={evidence.upstreamReceptacleId}
          onChange={(id) => void set({ upstreamReceptacleId: id })}
        />
      )}
      <p className="border-t border-hairline pt-3">
        Lamps before: <b>{lamps ? lampsInWords(lamps) : 'not read'}</b>
        {!lamps && '. Read the lamps first, if you can.'}
      </p>
      <Choices
        legend={
          downstream
            ? 'Press the upstream device’s own button. Does this point lose power?'
            : 'Press its own test button.'
        }
        options={
          downstream
            ? [
                ['trips', 'It goes dead'],
                ['no-trip', 'It stays live'],
              ]
            : TRIPS
        }
        value={evidence.button}
        onChange={(button) =>
          void set({
            button,
            faceDead: downstream ? (button === undefined ? undefined : button === 'trips') : evidence.faceDead,
          })
        }
      />
      {!downstream && evidence.button === 'trips' && (
        <Choices
          legend="Are both halves of the face dead?"
          options={YES_NO}
          value={shown(evidence.faceDead)}
          onChange={(value) => void set({ faceDead: answered(value) })}
        />
      )}
      {evidence.button === 'trips' && !downstream && (
        <WentDead
          state={state}
          exceptId={receptacle.id}
          chosen={evidence.wentDead ?? []}
          onChange={(wentDead) => void set({ wentDead, downstreamDead: wentDead.length > 0 ? true : undefined })}
        />
      )}
      {(evidence.button === 'trips' || evidence.tester === 'trips') && (
        <Choices
          legend="Does it reset?"
          options={YES_NO}
          value={shown(evidence.resets)}
          onChange={(value) => void set({ resets: answered(value) })}
        />
      )}
      {mayUseTester ? (
        <Choices
          legend="Then the plug-in tester’s button. It passes a few milliamperes from hot to ground."
          options={TRIPS}
          value={evidence.tester}
          onChange={(tester) => void set({ tester })}
        />
      ) : (
        <TesterWithoutGround value={evidence.tester} onChange={(tester) => void set({ tester })} />
      )}
      <Choices
        legend="Does its end-of-life light show, or does it beep?"
        options={YES_NO}
        value={shown(evidence.endOfLife)}
        onChange={(value) => void set({ endOfLife: answered(value) })}
      />
      <NotTested value={evidence.notTestedReason} onChange={(notTestedReason) => void set({ notTestedReason })} />
      <Verdict says={verdict.says} protects={verdict.protects} />
    </div>
  );
}

function TesterWithoutGround({
  value,
  onChange,
}: {
  value: TripResult | undefined;
  onChange: (tester: TripResult | undefined) => void;
}) {
  return (
    <div className="grid gap-3 border-l-4 border-double border-ink pl-3">
      <p>
        Do not press the plug-in tester’s button here: the lamps do not read correct. Without a ground it cannot trip a
        working GFCI, and it can put a shock voltage on metal joined to the ground slot.
      </p>
      <Choices legend="If it was pressed already, what did it do?" options={TRIPS} value={value} onChange={onChange} />
    </div>
  );
}

function UpstreamChoice({
  state,
  receptacle,
  value,
  onChange,
}: {
  state: WalkState;
  receptacle: WalkReceptacle;
  value?: string;
  onChange: (id: string | undefined) => void;
}) {
  const devices = state.receptacles.filter(
    (row) =>
      !row.deleted &&
      row.id !== receptacle.id &&
      (row.device === 'gfci-receptacle' || row.device === 'dual-function-receptacle'),
  );
  if (devices.length === 0) return <p>No GFCI receptacle is logged yet. Log it where it is, or say “Breaker”.</p>;
  return (
    <label className="grid gap-2 font-bold">
      Which device’s button was pressed?
      <select
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        value={value ?? ''}
        onChange={(event) => onChange(event.target.value || undefined)}
      >
        <option value="">Not recorded</option>
        {devices.map((row) => (
          <option key={row.id} value={row.id}>
            {placeOf(state, row.id)}
          </option>
        ))}
      </select>
    </label>
  );
}
