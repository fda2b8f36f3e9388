'use client';

import { v7 as uuidv7 } from 'uuid';
import type { GfciDevice } from '@/lib/findings/vocabulary';
import type { Walk } from '@/lib/walk/use-walk';
import { DO_NOT_TRIP_LABELS } from './labels';
import { receptacleName } from './progress';
import type { TrialProps } from './trial-parts';
import { goTo } from './walk-address';
import { WalkButton } from './walk-button';

/** Asked once, before the first button of an inspection. */
export function TripCard({ walk }: { walk: Walk }) {
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

/** A point that was marked on arrival. */
export function DoNotTrip({ walk, state, receptacle, onAnyway }: TrialProps & { onAnyway: () => void }) {
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
    goTo(state.inspection.id, { kind: 'area', areaId: receptacle.areaId });
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
