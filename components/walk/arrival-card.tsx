'use client';

import type { Walk } from '@/lib/walk/use-walk';
import { WalkButton } from './walk-button';

/** The inspector's own safety, before the first check. */
export function ArrivalCard({ walk }: { walk: Walk }) {
  return (
    <div className="flex grow flex-col justify-between gap-4 px-4 py-4">
      <div className="grid gap-3">
        <h2 className="font-serif text-xl font-bold">Before the first check</h2>
        <ul className="grid list-disc gap-2 pl-5">
          <li>Prove the tester and the sensor on a known live outlet, now and when you are done.</li>
          <li>Sense plates, panel and appliance metal before you touch them.</li>
          <li>Dry hands, one hand, instruments rated CAT III. Open no cover live.</li>
          <li>
            Lamps off does not mean power off. Treat ground slots and cases as live until a proved sensor stays quiet.
          </li>
          <li>
            Tell the occupant that power will be cut at times. Ask about medical equipment, freezers, sump pumps,
            computers, alarms.
          </li>
          <li>Load tests can trip a device too.</li>
        </ul>
      </div>
      <WalkButton
        weight="log"
        records="Records that the card was read"
        onClick={() => void walk.save([{ op: 'inspection.set', patch: { arrivalConfirmed: true }, base: {} }])}
      >
        Ready. Start the walk
      </WalkButton>
    </div>
  );
}
