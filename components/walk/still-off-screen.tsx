'use client';

import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import type { Walk } from '@/lib/walk/use-walk';
import { WalkButton } from './walk-button';
import type { StillOff } from './walk-top';

/** Everything that a button killed and that is not known to be back. */
export function StillOffScreen({ walk, points }: { walk: Walk; points: StillOff[] }) {
  const [whom, setWhom] = useState('');
  const [missingWhom, setMissingWhom] = useState(false);
  if (points.length === 0)
    return (
      <p className="px-4 py-6 font-serif text-l">
        Nothing is off. Every point that a button put out is back on or handed over.
      </p>
    );

  const record = (kind: 'back-on' | 'handed-over', point: StillOff) =>
    walk.save([
      {
        op: 'notice.add',
        id: uuidv7(),
        kind,
        receptacleId: point.receptacleId,
        readingId: point.readingId,
        ...(kind === 'handed-over' ? { whom: whom.trim() } : {}),
      },
    ]);

  async function handOver(point: StillOff) {
    setMissingWhom(whom.trim() === '');
    if (whom.trim() !== '') await record('handed-over', point);
  }

  return (
    <div className="grid gap-5 px-4 py-4">
      <p>Look at the lamps of each point before you say that it is back.</p>
      <ul className="grid gap-4">
        {points.map((point) => (
          <li key={`${point.readingId}${point.receptacleId}`} className="grid gap-2 border-t border-hairline pt-3">
            <h2 className="font-serif font-bold">{point.place}</h2>
            <div className="grid grid-cols-2 gap-2">
              <WalkButton weight="solid" onClick={() => void record('back-on', point)}>
                Back on
              </WalkButton>
              <WalkButton onClick={() => void handOver(point)}>Left off, handed over</WalkButton>
            </div>
          </li>
        ))}
      </ul>
      <label className="grid gap-2 font-bold">
        Handed over to
        <input
          className="min-h-[56px] rounded-[2px] border border-rule bg-sheet px-3 font-normal"
          value={whom}
          aria-invalid={missingWhom}
          aria-describedby="whom-missing"
          onChange={(event) => setWhom(event.target.value)}
        />
        <span id="whom-missing" role="alert" className="font-bold">
          {missingWhom && '▲ Write who was told that it is off.'}
        </span>
      </label>
    </div>
  );
}
