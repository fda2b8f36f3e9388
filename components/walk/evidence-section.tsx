'use client';

import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import type { LoadTest, WiringDiagnosis, WiringEvidence, WiringReadingEvidence } from '@/lib/findings/facts';
import type { WiringCheck } from '@/lib/findings/vocabulary';
import type { WalkState } from '@/lib/schemas/walk';
import type { Draft, Walk } from '@/lib/walk/use-walk';
import { GroundForm, LoadForm, MeterForm, SensorForm } from './evidence-forms';
import { standingReadings } from './progress';
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
/** Where the answer to a check is written down. */
const ANSWERED_BY: Record<WiringCheck, Instrument> = {
  sensor: 'sensor',
  power: 'panel',
  unplug: 'loads',
  'high-impedance': 'meter',
  'low-impedance-neutral': 'meter',
  'low-impedance-all': 'meter',
  'load-test': 'load',
  'ground-ohms': 'ground',
};
const YES_NO_UNKNOWN = [
  ['yes', 'Yes'],
  ['no', 'No'],
  ['unknown', 'Not known'],
] as const;

type EvidenceSectionProps = {
  walk: Walk;
  state: WalkState;
  receptacleId: string;
  evidence: WiringEvidence;
  nextCheck: WiringDiagnosis['nextCheck'];
};

/** The check that tells most, with the place to write its answer; the other instruments stand behind it. */
export function EvidenceSection({ walk, state, receptacleId, evidence, nextCheck }: EvidenceSectionProps) {
  const [open, setOpen] = useState<Instrument>();
  const first = nextCheck && ANSWERED_BY[nextCheck.kind];
  const toggle = (instrument: Instrument) => setOpen(open === instrument ? undefined : instrument);

  async function add(part: WiringReadingEvidence) {
    await walk.save([reading(state, receptacleId, part)]);
    setOpen(undefined);
  }
  async function addLoad(test: LoadTest) {
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacleId,
        reading: { kind: 'load', evidence: test },
      },
    ]);
    setOpen(undefined);
  }

  const form = {
    sensor: (
      <SensorForm
        value={evidence.sensor ?? {}}
        onSave={async (sensor) => walk.save([supersedingSensor(state, receptacleId, sensor)])}
      />
    ),
    meter: (
      <MeterForm
        meter={nextCheck?.kind.startsWith('low') ? 'low-impedance' : 'high-impedance'}
        onSave={(volts) => add({ volts })}
      />
    ),
    load: <LoadForm onSave={addLoad} />,
    ground: <GroundForm onSave={(groundOhms) => add({ groundOhms })} />,
    loads: <LoadsForm onSave={add} value={evidence} />,
    panel: <SeenForm onSave={add} value={evidence} />,
  };

  return (
    <>
      {nextCheck && first && (
        <section className="grid gap-3 border border-ink bg-paper-2 p-3">
          <h3 className="text-s font-bold">The check that tells them apart best</h3>
          <NextCheck instruction={nextCheck.instruction} />
          <InstrumentButton instrument={first} open={open} onToggle={toggle} />
          {open === first && form[first]}
        </section>
      )}
      <details className="border-b border-hairline" open={open !== undefined && open !== first}>
        <summary className="flex min-h-[56px] cursor-pointer items-center font-bold">Other evidence</summary>
        <div className="grid gap-3 pb-3">
          <div className="grid grid-cols-2 gap-2">
            {INSTRUMENTS.filter(([instrument]) => instrument !== first).map(([instrument]) => (
              <InstrumentButton key={instrument} instrument={instrument} open={open} onToggle={toggle} />
            ))}
          </div>
          {open && open !== first && form[open]}
        </div>
      </details>
    </>
  );
}

type InstrumentButtonProps = { instrument: Instrument; open?: Instrument; onToggle: (instrument: Instrument) => void };

function InstrumentButton({ instrument, open, onToggle }: InstrumentButtonProps) {
  const label = INSTRUMENTS.find(([one]) => one === instrument)?.[1];
  return (
    <WalkButton
      aria-expanded={open === instrument}
      weight={open === instrument ? 'solid' : 'outline'}
      onClick={() => onToggle(instrument)}
    >
      {label}
    </WalkButton>
  );
}

/** What to do, large; the cautions that go with it, at reading size. */
function NextCheck({ instruction }: { instruction: string }) {
  const end = instruction.indexOf('. ') + 1;
  const [doThis, cautions] = end > 0 ? [instruction.slice(0, end), instruction.slice(end)] : [instruction, ''];
  return (
    <>
      <p className="font-serif text-l font-bold">{doThis}</p>
      {cautions && <p>{cautions}</p>}
    </>
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
