import { standingReadings } from './evidence';
import type { InspectionFacts, NoticeFacts, ReadingFacts } from './facts';

/** A point without power since a trial, and the trial that put it out. */
export type StillOffPoint = { receptacleId: string; readingId: string };

type Trial = Extract<ReadingFacts, { kind: 'gfci' | 'afci' }>;

/**
 * Points that a GFCI or AFCI trial put out and that nothing recorded since shows to be back: no reset of that device,
 * no notice, no later reading with a lit lamp. A trial that tripped and has no reset recorded counts as off.
 * One entry per point, in the server's order of the trials.
 */
export function stillOffPoints(facts: InspectionFacts): StillOffPoint[] {
  const standing = standingReadings(facts.readings);
  const chains = correctionChains(facts.readings);
  const found = new Map<string, StillOffPoint>();
  for (const trial of standing) {
    if (trial.kind !== 'gfci' && trial.kind !== 'afci') continue;
    if (resetRecorded(trial, standing)) continue;
    for (const receptacleId of pointsPutOut(trial))
      if (!isBack(receptacleId, trial, { facts, standing, chain: chains(trial.id) }))
        found.set(receptacleId, { receptacleId, readingId: trial.id });
  }
  return [...found.values()];
}

/** Breakers that a trial left off and that have no receptacle to name. */
export function stillOffCircuits(facts: InspectionFacts): { circuitId: string; readingId: string }[] {
  const standing = standingReadings(facts.readings);
  return standing.flatMap((trial) => {
    if ((trial.kind !== 'gfci' && trial.kind !== 'afci') || !trial.circuitId || trial.receptacleId) return [];
    if (!hasTripped(trial) || resetRecorded(trial, standing)) return [];
    const answered = facts.notices.some(
      (notice) => isReturn(notice) && (notice.circuitId === trial.circuitId || notice.readingId === trial.id),
    );
    return answered ? [] : [{ circuitId: trial.circuitId, readingId: trial.id }];
  });
}

/** Ids of every earlier version of a reading, and its own. */
export function correctionChains(readings: readonly ReadingFacts[]): (readingId: string) => Set<string> {
  const earlier = new Map(readings.map((reading) => [reading.id, reading.supersedes]));
  return (readingId) => {
    const chain = new Set<string>();
    for (let id: string | undefined = readingId; id && !chain.has(id); id = earlier.get(id)) chain.add(id);
    return chain;
  };
}

function hasTripped(trial: Trial): boolean {
  const { evidence } = trial;
  if (evidence.button === 'trips') return true;
  return trial.kind === 'gfci' ? trial.evidence.tester === 'trips' : trial.evidence.indicator === 'trips';
}

function pointsPutOut(trial: Trial): string[] {
  const others = trial.evidence.wentDead ?? [];
  if (!trial.receptacleId || !hasTripped(trial)) return others;
  const faceStaysLive =
    trial.kind === 'gfci' ? trial.evidence.faceDead === false : trial.evidence.circuitDead === false;
  return faceStaysLive ? others : [trial.receptacleId, ...others];
}

/** Reset in the trial itself, or in a later one of the same device. */
function resetRecorded(trial: Trial, standing: ReadingFacts[]): boolean {
  return standing.some(
    (other) =>
      (other.kind === 'gfci' || other.kind === 'afci') &&
      other.evidence.resets === true &&
      (other.id === trial.id ||
        (other.order > trial.order &&
          other.receptacleId === trial.receptacleId &&
          other.circuitId === trial.circuitId)),
  );
}

function isReturn(notice: NoticeFacts): boolean {
  return notice.kind === 'back-on' || notice.kind === 'handed-over';
}

function isBack(
  receptacleId: string,
  trial: Trial,
  known: { facts: InspectionFacts; standing: ReadingFacts[]; chain: Set<string> },
): boolean {
  const told = known.facts.notices.some(
    (notice) =>
      isReturn(notice) &&
      notice.receptacleId === receptacleId &&
      (notice.readingId ? known.chain.has(notice.readingId) : notice.order > trial.order),
  );
  if (told) return true;
  return known.standing.some(
    (reading) =>
      reading.kind === 'wiring' &&
      reading.receptacleId === receptacleId &&
      reading.order > trial.order &&
      reading.evidence.lamps?.hn === 'lit',
  );
}
