import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import { BEAD_SIGNS, BEAD_WORDS, beadOf, receptacleName } from './progress';
import { addressOf } from './walk-address';

/** Every receptacle of the area, to go back to any of them. */
export function ReceptacleStrip({
  state,
  rows,
  currentId,
  off,
}: {
  state: WalkState;
  rows: WalkReceptacle[];
  currentId?: string;
  off: Set<string>;
}) {
  if (rows.length === 0) return null;
  return (
    <nav aria-label="Receptacles of this area" className="flex flex-wrap gap-2 border-b border-hairline px-4 py-2">
      {rows.map((row, index) => {
        const bead = beadOf(state, row, off);
        const isCurrent = row.id === currentId;
        return (
          <a
            key={row.id}
            href={addressOf(state.inspection.id, { kind: 'area', areaId: row.areaId, receptacleId: row.id })}
            aria-label={`${receptacleName(state, row)}, ${BEAD_WORDS[bead]}`}
            aria-current={isCurrent ? 'true' : undefined}
            className={`flex h-[44px] min-w-[44px] items-center justify-center gap-1 rounded-[2px] border px-2 text-s ${isCurrent ? 'border-ink bg-paper-2 font-bold' : 'border-hairline'}`}
          >
            <span aria-hidden="true">
              {index + 1} {BEAD_SIGNS[bead]}
            </span>
          </a>
        );
      })}
    </nav>
  );
}
