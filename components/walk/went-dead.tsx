'use client';

import type { WalkState } from '@/lib/schemas/walk';
import { areasInOrder, receptacleName, receptaclesOf } from './progress';

/** Which points lost power on this button. They stay on the still-off list until they are back. */
export function WentDead({
  state,
  exceptId,
  chosen,
  onChange,
}: {
  state: WalkState;
  exceptId: string;
  chosen: string[];
  onChange: (ids: string[]) => void;
}) {
  const points = areasInOrder(state).flatMap((area) =>
    receptaclesOf(state, area.id)
      .filter((row) => row.id !== exceptId)
      .map((row) => ({ id: row.id, name: `${area.name}, ${receptacleName(state, row)}` })),
  );
  if (points.length === 0) return null;
  const toggle = (id: string) =>
    onChange(chosen.includes(id) ? chosen.filter((other) => other !== id) : [...chosen, id]);
  return (
    <details open={chosen.length > 0} className="border-y border-hairline">
      <summary className="flex min-h-[56px] cursor-pointer items-center font-bold">
        What else went dead? {chosen.length > 0 && `${chosen.length} so far`}
      </summary>
      <ul className="pb-2">
        {points.map((point) => (
          <li key={point.id} className="border-t border-hairline">
            <label className="flex min-h-[56px] items-center justify-between gap-4">
              {point.name}
              <input
                type="checkbox"
                className="size-7 accent-ink"
                checked={chosen.includes(point.id)}
                onChange={() => toggle(point.id)}
              />
            </label>
          </li>
        ))}
      </ul>
    </details>
  );
}
