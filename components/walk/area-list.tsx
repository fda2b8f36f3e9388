'use client';

import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { PLACES, type PlaceKind } from '@/lib/findings/vocabulary';
import type { WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { PLACE_LABELS } from './labels';
import { areasInOrder, BEAD_SIGNS, beadOf, countArea, countWords, receptaclesOf } from './progress';
import { addressOf, goTo } from './walk-address';
import { WalkButton } from './walk-button';

/** Areas in walking order, and what each still needs. */
export function AreaList({ walk, state, off }: { walk: Walk; state: WalkState; off: Set<string> }) {
  const [adding, setAdding] = useState(false);
  const areas = areasInOrder(state);
  const inspectionId = state.inspection.id;
  const next = areas.find((area) => {
    const { present, tested, skipped } = countArea(state, area.id);
    return present === 0 || tested + skipped < present;
  });
  const router = useRouter();
  const findings = `/inspections/${inspectionId}/findings` as const;

  async function review() {
    if (state.inspection.state === 'on-site') await walk.save([{ op: 'inspection.advance', to: 'in-review' }]);
    await walk.refresh();
    router.push(findings);
  }

  if (adding || areas.length === 0)
    return <AddArea walk={walk} state={state} first={areas.length === 0} onDone={() => setAdding(false)} />;
  return (
    <div className="flex grow flex-col justify-between gap-4 px-4 pb-4">
      <div>
        <ul>
          {areas.map((area) => (
            <li key={area.id} className="border-b border-hairline">
              <a
                href={addressOf(inspectionId, { kind: 'area', areaId: area.id })}
                className="grid min-h-[56px] grid-cols-[1fr_auto] items-center gap-x-4 py-3"
              >
                <span className="font-serif font-bold">{area.name}</span>
                <span className="text-right font-serif text-l" aria-hidden="true">
                  {countArea(state, area.id).present}
                </span>
                <span aria-hidden="true" className="tracking-[0.25em] break-all">
                  {receptaclesOf(state, area.id).map((row) => BEAD_SIGNS[beadOf(state, row, off)])}
                </span>
                <span className="text-right text-s text-ink-2">{countWords(countArea(state, area.id))}</span>
              </a>
            </li>
          ))}
        </ul>
        <p className="py-3 text-s text-ink-2">● correct ☒ fault ◐ still off – skipped ○ untested</p>
      </div>
      <div className="grid gap-2">
        <WalkButton onClick={() => setAdding(true)}>Add an area</WalkButton>
        {next ? (
          <a
            className="flex min-h-[72px] items-center justify-center rounded-[2px] bg-inverse px-4 text-l font-bold text-on-inverse"
            href={addressOf(inspectionId, { kind: 'area', areaId: next.id })}
          >
            Go on in {next.name}
          </a>
        ) : (
          <WalkButton weight="log" records="Everything is tested or skipped" onClick={() => void review()}>
            Review the findings
          </WalkButton>
        )}
        {next && (
          <a className="flex min-h-[56px] items-center justify-center underline underline-offset-4" href={findings}>
            See the findings so far
          </a>
        )}
      </div>
    </div>
  );
}

/** Places that the walk usually takes first: outside, garage, basement, kitchen, baths, laundry, rooms, attic. */
const WALK_ORDER: PlaceKind[] = [
  'outdoors',
  'garage',
  'basement',
  'kitchen-counter',
  'bathroom',
  'laundry-area',
  'living-room',
  'bedroom',
  'hallway',
  'attic',
];

function AddArea({ walk, state, first, onDone }: { walk: Walk; state: WalkState; first: boolean; onDone: () => void }) {
  const [more, setMore] = useState(false);
  const areas = areasInOrder(state);
  const places = more ? PLACES : WALK_ORDER;

  async function add(place: PlaceKind) {
    const id = uuidv7();
    const structureId = state.structures.find((row) => !row.deleted)?.id;
    if (!structureId) throw new Error('an inspection has no structure');
    const same = areas.filter((area) => area.place === place).length;
    const name = same === 0 ? PLACE_LABELS[place] : `${PLACE_LABELS[place]} ${same + 1}`;
    const order = Math.max(0, ...areas.map((area) => area.order)) + 1;
    await walk.save([
      { op: 'area.add', id, fields: { structureId, place, name, order, floor: place === 'basement' ? 0 : 1 } },
    ]);
    onDone();
    goTo(state.inspection.id, { kind: 'area', areaId: id });
  }

  return (
    <div className="flex grow flex-col justify-end gap-4 px-4 py-4">
      <h2 className="font-serif text-l font-bold">
        {first ? 'No area yet. Where do you start?' : 'Which area is next?'}
      </h2>
      <div className="grid grid-cols-2 gap-2">
        {places.map((place) => (
          <WalkButton key={place} onClick={() => void add(place)}>
            {PLACE_LABELS[place]}
          </WalkButton>
        ))}
      </div>
      <div className="grid grid-cols-2 gap-2">
        {!more && (
          <WalkButton weight="quiet" onClick={() => setMore(true)}>
            More kinds of area
          </WalkButton>
        )}
        {!first && (
          <WalkButton weight="quiet" onClick={onDone}>
            Back to the areas
          </WalkButton>
        )}
      </div>
    </div>
  );
}
