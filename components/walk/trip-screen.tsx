'use client';

import { useMemo, useState } from 'react';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import { AfciTrialForm } from './afci-trial-form';
import { GfciTrialForm } from './gfci-trial-form';
import { ToldLink } from './told-link';
import type { TrialProps } from './trial-parts';
import { DoNotTrip, TripCard } from './trip-cards';
import { addressOf } from './walk-address';
import { Choices } from './walk-button';

type Kind = 'gfci' | 'afci';

/** A trial of a GFCI or AFCI, saved answer by answer: each answer is a reading that supersedes the one before. */
export function TripScreen({ walk, state, receptacle }: TrialProps) {
  const [kind, setKind] = useState<Kind>(receptacle.device === 'afci-receptacle' ? 'afci' : 'gfci');
  const [anyway, setAnyway] = useState(false);
  const facts = useMemo(() => inspectionFacts(state), [state]);

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
        <ToldLink state={state} facts={facts} receptacleId={receptacle.id} />
      </div>
      <a
        className="flex min-h-[72px] items-center justify-center rounded-[2px] bg-inverse px-4 text-l font-bold text-on-inverse"
        href={addressOf(state.inspection.id, { kind: 'area', areaId: receptacle.areaId })}
      >
        Done, next
      </a>
    </div>
  );
}
