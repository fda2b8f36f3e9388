'use client';

import { useMemo, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import { conditionName, diagnoseWiring, evaluateInspection, wiringEvidence } from '@/lib/findings';
import type { LoadTest, WiringReadingEvidence } from '@/lib/findings/facts';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Draft, Walk } from '@/lib/walk/use-walk';
import { GroundForm, LoadForm, MeterForm, SensorForm } from './evidence-forms';
import { lampsInWords } from './labels';
import { PhotoButton } from './photo-button';
import { standingReadings } from './progress';
import { addressOf, goTo } from './walk-address';
import { Choices, WalkButton } from './walk-button';

type Instrument = 'sensor' | 'meter' | 'load' | 'ground' | 'loads' | 'panel';
const INSTRUMENTS: [Instrument, string][] = [
  ['sensor', 'Contact sensor'],
  ['meter', 'Meter'],
  ['loads', 'Loads unplugged'],
  ['load', 'Load test'],
  ['ground', 'Ground path'],
  ['panel', 'What was seen'],
];
const YES_NO_UNKNOWN = [
  ['yes', 'Yes'],
  ['no', 'No'],
  ['unknown', 'Not known'],
] as const;

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
  const [open, setOpen] = useState<Instrument>();
  const facts = useMemo(() => inspectionFacts(state), [state]);
  const evidence = useMemo(() => wiringEvidence(facts, receptacle.id), [facts, receptacle.id]);
  const diagnosis = useMemo(() => diagnoseWiring(evidence), [evidence]);
  const danger = useMemo(() => dangerOf(facts, receptacle.id), [facts, receptacle.id]);
  const [leading, ...others] = diagnosis.candidates;

  async function add(part: WiringReadingEvidence) {
    await walk.save([reading(state, receptacle.id, part)]);
    setOpen(undefined);
  }
  async function undo() {
    const last = standingReadings(state, receptacle.id).findLast((row) => row.kind === 'wiring' && row.evidence.lamps);
    if (last) await walk.save([{ op: 'reading.withdraw', id: last.id }]);
    goTo(state.inspection.id, { kind: 'area', areaId: receptacle.areaId, receptacleId: receptacle.id });
  }
  async function addLoad(test: LoadTest) {
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacle.id,
        reading: { kind: 'load', evidence: test },
      },
    ]);
    setOpen(undefined);
  }

  return (
    <div className="flex grow flex-col justify-between gap-5 px-4 py-4">
      <div className="grid gap-4">
        <div className="grid grid-cols-2 items-end gap-2 text-center text-s">
          <figure>
            <ReceptacleDrawing pattern={receptacle.pattern} view="reading" lamps={evidence.lamps} size={150} />
            <figcaption>Read: {evidence.lamps ? lampsInWords(evidence.lamps) : 'no lamps'}</figcaption>
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
        {danger && (
          <a
            className="flex min-h-[56px] items-center justify-center rounded-[2px] border-(length:--line-2) border-ink px-4 font-bold"
            href={addressOf(state.inspection.id, { kind: 'told', receptacleId: receptacle.id })}
          >
            Stop using it now: say who was told
          </a>
        )}
        <section className="grid gap-3 border border-ink bg-paper-2 p-3">
          {diagnosis.nextCheck && (
            <>
              <h3 className="text-s font-bold">The check that tells them apart best</h3>
              <p className="font-serif text-l font-bold">{diagnosis.nextCheck.instruction}</p>
            </>
          )}
          <div className="grid grid-cols-2 gap-2">
            {INSTRUMENTS.map(([instrument, label]) => (
              <WalkButton
                key={instrument}
                aria-expanded={open === instrument}
                weight={open === instrument ? 'solid' : 'outline'}
                onClick={() => setOpen(open === instrument ? undefined : instrument)}
              >
                {label}
              </WalkButton>
            ))}
          </div>
          {open === 'sensor' && (
            <SensorForm
              value={evidence.sensor ?? {}}
              onSave={async (sensor) => walk.save([supersedingSensor(state, receptacle.id, sensor)])}
            />
          )}
          {open === 'meter' && <MeterForm meter="high-impedance" onSave={(volts) => add({ volts })} />}
          {open === 'load' && <LoadForm onSave={addLoad} />}
          {open === 'ground' && <GroundForm onSave={(groundOhms) => add({ groundOhms })} />}
          {open === 'loads' && <LoadsForm onSave={add} value={evidence} />}
          {open === 'panel' && <SeenForm onSave={add} value={evidence} />}
        </section>
      </div>
      <div className="grid grid-cols-2 gap-2">
        <PhotoButton walk={walk} subject={{ receptacleId: receptacle.id }} />
        <a
          className="flex min-h-[56px] items-center justify-center rounded-[2px] bg-inverse px-4 text-center font-bold text-on-inverse"
          href={addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId })}
        >
          Log as it stands, next
        </a>
        <a
          className="col-span-2 flex min-h-[56px] items-center justify-center underline underline-offset-4"
          href={addressOf(state.inspection.id, {
            kind: 'area',
            areaId: receptacle.areaId,
            receptacleId: receptacle.id,
          })}
        >
          Read the lamps again
        </a>
        <WalkButton weight="quiet" className="col-span-2" onClick={() => void undo()}>
          Undo this lamp reading
        </WalkButton>
      </div>
    </div>
  );
}

function reading(state: WalkState, receptacleId: string, evidence: WiringReadingEvidence): Draft {
  return {
    op: 'reading.add',
    id: uuidv7(),
    visitId: state.inspection.visitId,
    receptacleId,
    reading: { kind: 'wiring', evidence },
  };
}

/** The sensor is answered place by place: the last answer holds all of them and replaces the one before. */
function supersedingSensor(state: WalkState, receptacleId: string, sensor: WiringReadingEvidence['sensor']): Draft {
  const held = standingReadings(state, receptacleId).findLast(
    (row) => row.kind === 'wiring' && row.evidence.sensor !== undefined && Object.keys(row.evidence).length === 1,
  );
  return {
    op: 'reading.add',
    id: uuidv7(),
    visitId: state.inspection.visitId,
    receptacleId,
    supersedes: held?.id,
    reading: { kind: 'wiring', evidence: { sensor } },
  };
}

/** A finding to stop using, about this receptacle, of which nobody was told yet. */
function dangerOf(facts: ReturnType<typeof inspectionFacts>, receptacleId: string): boolean {
  if (facts.notices.some((notice) => notice.kind === 'danger-told' && notice.receptacleId === receptacleId))
    return false;
  return evaluateInspection(facts).findings.some(
    (finding) =>
      finding.urgency === 'U1' &&
      'receptacleIds' in finding.subject &&
      finding.subject.receptacleIds.includes(receptacleId),
  );
}

type PartProps = { value: WiringReadingEvidence; onSave: (part: WiringReadingEvidence) => Promise<void> };

function LoadsForm({ value, onSave }: PartProps) {
  return (
    <div className="grid gap-3">
      <Choices
        legend="Is everything that plugs in on this circuit unplugged?"
        columns={3}
        options={YES_NO_UNKNOWN}
        value={value.loadsUnplugged}
        onChange={(answer) => answer && void onSave({ loadsUnplugged: answer })}
      />
      <Choices
        legend="Are hard-wired loads off, such as lights, alarms, a doorbell transformer?"
        columns={3}
        options={YES_NO_UNKNOWN}
        value={value.hardWiredLoadsOff}
        onChange={(answer) => answer && void onSave({ hardWiredLoadsOff: answer })}
      />
      <p>Then read the lamps again.</p>
    </div>
  );
}

const YES_NO = [
  ['yes', 'Yes'],
  ['no', 'No'],
] as const;

function SeenForm({ value, onSave }: PartProps) {
  const shown = (answer: boolean | undefined) => (answer === undefined ? undefined : answer ? 'yes' : 'no');
  return (
    <div className="grid gap-3">
      <Choices
        legend="Was the breaker, switch and upstream GFCI checked for power?"
        options={YES_NO}
        value={shown(value.powerChecked)}
        onChange={(answer) => answer && void onSave({ powerChecked: answer === 'yes' })}
      />
      <Choices
        legend="Was a jumper from neutral to ground seen, with the plate already off?"
        options={YES_NO}
        value={shown(value.groundJumperSeen)}
        onChange={(answer) => answer && void onSave({ groundJumperSeen: answer === 'yes' })}
      />
      <Choices
        legend="Is the neutral shared with another breaker?"
        columns={3}
        options={YES_NO_UNKNOWN}
        value={value.sharedNeutral}
        onChange={(answer) => answer && void onSave({ sharedNeutral: answer })}
      />
      <Choices
        legend="Is the panel or another neutral–ground bond within about 33 ft of cable?"
        options={YES_NO}
        value={shown(value.nearBondedPanel)}
        onChange={(answer) => answer && void onSave({ nearBondedPanel: answer === 'yes' })}
      />
    </div>
  );
}
