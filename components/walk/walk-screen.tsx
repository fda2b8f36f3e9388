'use client';

import { useEffect, useMemo, useSyncExternalStore } from 'react';
import { stillOffPoints } from '@/lib/findings';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { WalkState } from '@/lib/schemas/walk';
import { discardRejected } from '@/lib/walk/outbox';
import { phoneStore, useWalk, type Walk } from '@/lib/walk/use-walk';
import { AreaList } from './area-list';
import { ArrivalCard } from './arrival-card';
import { DeviceScreen } from './device-screen';
import { PadScreen } from './pad-screen';
import { countArea, countWords, areasInOrder, placeOf, receptacleName } from './progress';
import { PhotosScreen } from './photos-screen';
import { ResultScreen } from './result-screen';
import { StillOffScreen } from './still-off-screen';
import { ToldScreen } from './told-screen';
import { TripScreen } from './trip-screen';
import { WaitingScreen } from './waiting-screen';
import { parseAddress, type WalkView } from './walk-address';
import { OutboxLine, StillOffBar, WalkHeader, type StillOff } from './walk-top';
import { WalkTheme } from './walk-theme';

/** The whole of Walk: one address, the inspection's id and the view in the fragment. */
export function WalkScreen() {
  const hash = useSyncExternalStore(
    onHashChange,
    () => location.hash,
    () => '',
  );
  const { inspectionId, view } = useMemo(() => parseAddress(hash), [hash]);
  const walk = useWalk(inspectionId);
  useEffect(() => {
    void window.scrollTo(0, 0);
  }, [hash]);

  if (!inspectionId)
    return (
      <Message
        title="No inspection chosen"
        says="Open Walk from an inspection."
        href="/inspections"
        link="Go to your inspections"
      />
    );
  if (walk.missing)
    return (
      <Message
        title="This inspection no longer exists"
        says="Or it is not one of yours."
        href="/inspections"
        link="Go to your inspections"
      />
    );
  if (!walk.state) return <Opening walk={walk} inspectionId={inspectionId} />;
  return <Opened walk={walk} state={walk.state} view={view} />;
}

function onHashChange(notify: () => void) {
  window.addEventListener('hashchange', notify);
  return () => window.removeEventListener('hashchange', notify);
}

function Opening({ walk, inspectionId }: { walk: Walk; inspectionId: string }) {
  if (walk.link === 'signed-out')
    return (
      <Message
        title="You are signed out"
        says="Sign in to open this inspection. What is on this phone stays here."
        href={`/sign-in?next=${encodeURIComponent(`/walk#${inspectionId}`)}`}
        link="Sign in"
      />
    );
  if (walk.link === 'no-signal')
    return (
      <Message
        title="No connection"
        says="This inspection was not opened on this phone before. Open it once with a connection."
        href="/inspections"
        link="Go to your inspections"
      />
    );
  return (
    <p role="status" className="px-4 py-6">
      Opening the inspection…
    </p>
  );
}

function Message({ title, says, href, link }: { title: string; says: string; href: string; link: string }) {
  return (
    <main className="grid gap-4 px-4 py-8">
      <h1 className="font-serif text-xl font-bold">{title}</h1>
      <p>{says}</p>
      <a className="flex min-h-[56px] items-center font-bold underline underline-offset-4" href={href}>
        {link}
      </a>
    </main>
  );
}

type OpenedProps = { walk: Walk; state: WalkState; view: WalkView };

function Opened({ walk, state, view }: OpenedProps) {
  const points = useMemo(() => stillOff(state), [state]);
  const off = useMemo(() => new Set(points.map((point) => point.receptacleId)), [points]);
  const inspectionId = state.inspection.id;
  const needsCard = !state.inspection.arrivalConfirmed;
  const { title, under, back, backLabel } = headingOf(state, view);

  return (
    <div className="mx-auto flex min-h-dvh max-w-[560px] flex-col bg-paper text-ink">
      <StillOffBar inspectionId={inspectionId} points={points} thin={view.kind !== 'areas'} />
      <OutboxLine inspectionId={inspectionId} walk={walk} />
      <WalkHeader inspectionId={inspectionId} back={back} backLabel={backLabel} title={title} under={under}>
        <WalkTheme />
      </WalkHeader>
      <main className="flex grow flex-col">
        {needsCard ? (
          <ArrivalCard walk={walk} />
        ) : (
          <View walk={walk} state={state} view={view} points={points} off={off} />
        )}
      </main>
    </div>
  );
}

function View({ walk, state, view, points, off }: OpenedProps & { points: StillOff[]; off: Set<string> }) {
  const receptacle =
    'receptacleId' in view ? state.receptacles.find((row) => row.id === view.receptacleId && !row.deleted) : undefined;
  switch (view.kind) {
    case 'areas':
      return <AreaList walk={walk} state={state} off={off} />;
    case 'still-off':
      return <StillOffScreen walk={walk} points={points} />;
    case 'waiting':
      return <WaitingScreen walk={walk} onDiscard={(key) => void discardRejected(phoneStore(), key)} />;
    case 'area': {
      const area = state.areas.find((row) => row.id === view.areaId && !row.deleted);
      return area ? (
        <PadScreen walk={walk} state={state} area={area} receptacleId={view.receptacleId} off={off} />
      ) : (
        <Gone />
      );
    }
    case 'result':
      return receptacle ? (
        <ResultScreen key={receptacle.id} walk={walk} state={state} receptacle={receptacle} />
      ) : (
        <Gone />
      );
    case 'device':
      return receptacle ? (
        <DeviceScreen key={receptacle.id} walk={walk} state={state} receptacle={receptacle} />
      ) : (
        <Gone />
      );
    case 'trip':
      return receptacle ? (
        <TripScreen key={receptacle.id} walk={walk} state={state} receptacle={receptacle} />
      ) : (
        <Gone />
      );
    case 'photos':
      return receptacle ? (
        <PhotosScreen key={receptacle.id} walk={walk} state={state} receptacle={receptacle} />
      ) : (
        <Gone />
      );
    case 'told':
      return receptacle ? (
        <ToldScreen
          key={receptacle.id}
          walk={walk}
          state={state}
          receptacle={receptacle}
          title={`${placeOf(state, receptacle.id)}: dangerous now`}
        />
      ) : (
        <Gone />
      );
  }
}

function Gone() {
  return <p className="px-4 py-6">This was removed. Go back to the areas.</p>;
}

function stillOff(state: WalkState): StillOff[] {
  return stillOffPoints(inspectionFacts(state)).map((point) => ({
    ...point,
    place: placeOf(state, point.receptacleId),
  }));
}

function headingOf(
  state: WalkState,
  view: WalkView,
): { title: string; under: string; back?: WalkView; backLabel: string } {
  const areas: WalkView = { kind: 'areas' };
  if (view.kind === 'areas')
    return {
      title: 'Walk',
      under: `${state.inspection.address} · ${totals(state)}`,
      backLabel: 'Back to the inspection',
    };
  if (view.kind === 'still-off') return { title: 'Still off', under: '', back: areas, backLabel: 'Back to the areas' };
  if (view.kind === 'waiting')
    return { title: 'Not backed up', under: '', back: areas, backLabel: 'Back to the areas' };
  const areaId =
    view.kind === 'area' ? view.areaId : state.receptacles.find((row) => row.id === view.receptacleId)?.areaId;
  const area = state.areas.find((row) => row.id === areaId);
  if (view.kind === 'area')
    return {
      title: area?.name ?? 'Area',
      under: countWords(countArea(state, view.areaId)),
      back: areas,
      backLabel: 'Back to the areas',
    };
  const receptacle = state.receptacles.find((row) => row.id === view.receptacleId);
  const back: WalkView = area ? { kind: 'area', areaId: area.id, receptacleId: view.receptacleId } : areas;
  return {
    title: area?.name ?? 'Receptacle',
    under: receptacle ? receptacleName(state, receptacle) : '',
    back,
    backLabel: `Back to ${area?.name ?? 'the areas'}`,
  };
}

function totals(state: WalkState): string {
  const counts = areasInOrder(state).map((area) => countArea(state, area.id));
  const sum = (key: 'present' | 'tested' | 'skipped') => counts.reduce((total, count) => total + count[key], 0);
  return `${sum('tested')} of ${sum('present')} tested${sum('skipped') > 0 ? `, ${sum('skipped')} skipped` : ''}`;
}
