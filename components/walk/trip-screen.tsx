'use client';

import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { assessAfci, assessGfci } from '@/lib/findings';
import type { AfciReadingEvidence, GfciReadingEvidence, LampPattern } from '@/lib/findings/facts';
import { BREAKER_MARKINGS, type BreakerMarking, type GfciDevice, type TripResult } from '@/lib/findings/vocabulary';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { DO_NOT_TRIP_LABELS, lampsInWords } from './labels';
import { lastWiring, placeOf, receptacleName, standingReadings } from './progress';
import { addressOf } from './walk-address';
import { Choices, WalkButton } from './walk-button';
import { WentDead } from './went-dead';

const TRIPS: [TripResult, string][] = [
  ['trips', 'It trips'],
  ['no-trip', 'It does not trip'],
];
const YES_NO: ['yes' | 'no', string][] = [
  ['yes', 'Yes'],
  ['no', 'No'],
];
const MARKINGS: Record<BreakerMarking, string> = {
  'class-a-gfci': 'Class A GFCI',
  'dual-function': 'AFCI and GFCI',
  afci: 'AFCI only',
  other: 'Other',
};

type Kind = 'gfci' | 'afci';

/** A trial of a GFCI or AFCI, saved answer by answer: each answer is a reading that supersedes the one before. */
export function TripScreen({ walk, state, receptacle }: { walk: Walk; state: WalkState; receptacle: WalkReceptacle }) {
  const [kind, setKind] = useState<Kind>(receptacle.device === 'afci-receptacle' ? 'afci' : 'gfci');
  const [anyway, setAnyway] = useState(false);

  if (!state.inspection.tripConfirmed) return <TripCard walk={walk} />;
  if (receptacle.doNotTrip && !anyway)
    return <DoNotTrip walk={walk} state={state} receptacle={receptacle} onAnyway={() => setAnyway(true)} />;
  return (
    <div className="flex grow flex-col justify-between gap-5 px-4 py-4">
      <div className="grid gap-5">
        <Choices
          legend="What is tested?"
          options={[
            ['gfci', 'GFCI, shock protection'],
            ['afci', 'AFCI, arc protection'],
          ]}
          value={kind}
          onChange={(next) => setKind(next ?? kind)}
        />
        {kind === 'gfci' ? (
          <GfciTrialForm walk={walk} state={state} receptacle={receptacle} />
        ) : (
          <AfciTrialForm walk={walk} state={state} receptacle={receptacle} />
        )}
      </div>
      <a
        className="flex min-h-[72px] items-center justify-center rounded-[2px] bg-inverse px-4 text-l font-bold text-on-inverse"
        href={addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId })}
      >
        Back to {state.areas.find((area) => area.id === receptacle.areaId)?.name ?? 'the area'}
      </a>
    </div>
  );
}

type FormProps = { walk: Walk; state: WalkState; receptacle: WalkReceptacle };

function GfciTrialForm({ walk, state, receptacle }: FormProps) {
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
  const mayUseTester = lamps !== undefined && lampsInWords(lamps) === 'H–N and H–G lit, N–G off';

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
  const yesNo = (value: boolean | undefined) => (value === undefined ? undefined : value ? 'yes' : 'no');
  const flag = (value: 'yes' | 'no' | undefined) => (value === undefined ? undefined : value === 'yes');

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
          value={yesNo(evidence.faceDead)}
          onChange={(value) => void set({ faceDead: flag(value) })}
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
          value={yesNo(evidence.resets)}
          onChange={(value) => void set({ resets: flag(value) })}
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
        value={yesNo(evidence.endOfLife)}
        onChange={(value) => void set({ endOfLife: flag(value) })}
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

function AfciTrialForm({ walk, state, receptacle }: FormProps) {
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
  const yesNo = (value: boolean | undefined) => (value === undefined ? undefined : value ? 'yes' : 'no');
  const flag = (value: 'yes' | 'no' | undefined) => (value === undefined ? undefined : value === 'yes');

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
            value={yesNo(evidence.circuitDead)}
            onChange={(value) => void set({ circuitDead: flag(value) })}
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
            value={yesNo(evidence.resets)}
            onChange={(value) => void set({ resets: flag(value) })}
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

/** A cleared answer is absent, not empty: the schema refuses keys without a value. */
function withoutGaps<Evidence extends object>(evidence: Evidence): Evidence {
  return Object.fromEntries(Object.entries(evidence).filter(([, value]) => value !== undefined)) as Evidence;
}

const PROTECTS = { yes: 'Protection shown', no: 'No protection shown', unproven: 'Protection unproven' } as const;

function Verdict({ says, protects }: { says: string; protects: keyof typeof PROTECTS }) {
  return (
    <section aria-live="polite" className="border-y-2 border-ink py-3">
      <h2 className="font-serif text-l font-bold">{PROTECTS[protects]}</h2>
      <p>{says}</p>
    </section>
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

function NotTested({ value, onChange }: { value?: string; onChange: (reason: string | undefined) => void }) {
  const [text, setText] = useState(value ?? '');
  return (
    <label className="grid gap-2 font-bold">
      Not tested, because
      <input
        className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
        value={text}
        onChange={(event) => setText(event.target.value)}
        onBlur={() => {
          if (text.trim() !== (value ?? '')) onChange(text.trim() || undefined);
        }}
      />
    </label>
  );
}

function TripCard({ walk }: { walk: Walk }) {
  return (
    <div className="flex grow flex-col justify-between gap-4 px-4 py-4">
      <div className="grid gap-3">
        <h2 className="font-serif text-xl font-bold">Before the first button</h2>
        <p>A trip test cuts power here and at every point behind it. Ask and look before you press.</p>
        <ul className="grid list-disc gap-2 pl-5">
          <li>
            Medical equipment: anyone who depends on power? Unknown loads downstream count as medical until they are
            traced.
          </li>
          <li>Freezer, refrigerator, sump pump, aquarium.</li>
          <li>Computers, alarms, anything that must not lose power. Load tests can trip a device too.</li>
          <li>The occupant is told, and people are warned off metal before any button.</li>
          <li>Every point you put out is back on before you close the area.</li>
        </ul>
        <p>Mark what must not be tripped on its receptacle, under its device.</p>
      </div>
      <WalkButton
        weight="log"
        records="Records that you asked"
        onClick={() => void walk.save([{ op: 'inspection.set', patch: { tripConfirmed: true }, base: {} }])}
      >
        Asked and told. Go on
      </WalkButton>
    </div>
  );
}

function DoNotTrip({ walk, state, receptacle, onAnyway }: FormProps & { onAnyway: () => void }) {
  const reason = receptacle.doNotTrip ? DO_NOT_TRIP_LABELS[receptacle.doNotTrip] : '';
  const device: GfciDevice = receptacle.device === 'receptacle' ? 'downstream' : 'receptacle';
  async function record() {
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacle.id,
        reading: { kind: 'gfci', evidence: { device, notTestedReason: `Marked do not trip: ${reason.toLowerCase()}` } },
      },
    ]);
    location.hash = addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId });
  }
  return (
    <div className="flex grow flex-col justify-between gap-4 px-4 py-4">
      <div className="grid gap-3">
        <h2 className="font-serif text-xl font-bold">Do not trip: {reason.toLowerCase()}</h2>
        <p>
          {receptacleName(state, receptacle)} was marked. Leave every button alone, and leave out load tests and
          low-impedance checks to ground.
        </p>
      </div>
      <div className="grid gap-2">
        <WalkButton weight="log" records={`Because of: ${reason.toLowerCase()}`} onClick={() => void record()}>
          Record as not tested
        </WalkButton>
        <WalkButton weight="quiet" onClick={onAnyway}>
          It may be tripped now. Go on
        </WalkButton>
      </div>
    </div>
  );
}
