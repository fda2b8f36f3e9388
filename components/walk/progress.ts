import type { WalkArea, WalkReading, WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import { showsNoFault } from './labels';

export type Bead = 'correct' | 'fault' | 'off' | 'skipped' | 'untested';

export const BEAD_SIGNS: Record<Bead, string> = { correct: '●', fault: '☒', off: '◐', skipped: '–', untested: '○' };
export const BEAD_WORDS: Record<Bead, string> = {
  correct: 'lamps correct',
  fault: 'fault',
  off: 'still off',
  skipped: 'skipped',
  untested: 'untested',
};

export function areasInOrder(state: WalkState): WalkArea[] {
  return state.areas.filter((area) => !area.deleted).toSorted((a, b) => a.order - b.order || a.id.localeCompare(b.id));
}

export function receptaclesOf(state: WalkState, areaId: string): WalkReceptacle[] {
  return state.receptacles
    .filter((row) => row.areaId === areaId && !row.deleted && row.presence === 'present')
    .toSorted((a, b) => a.order - b.order || a.id.localeCompare(b.id));
}

/** Readings that count, oldest first. */
export function standingReadings(state: WalkState, receptacleId: string): WalkReading[] {
  const standing = state.readings.filter((row) => !row.withdrawn);
  const superseded = new Set(standing.map((row) => row.supersedes));
  return standing
    .filter((row) => row.receptacleId === receptacleId && !superseded.has(row.id))
    .toSorted((a, b) => a.order - b.order || a.id.localeCompare(b.id));
}

export function lastWiring(state: WalkState, receptacleId: string) {
  return standingReadings(state, receptacleId)
    .filter((row) => row.kind === 'wiring')
    .at(-1);
}

export function skipOf(state: WalkState, receptacle: WalkReceptacle) {
  return state.skips.find(
    (skip) => !skip.deleted && (skip.receptacleId === receptacle.id || skip.areaId === receptacle.areaId),
  );
}

/** What the list shows of a receptacle. Nothing looks tested until it was. */
export function beadOf(state: WalkState, receptacle: WalkReceptacle, off: Set<string>): Bead {
  if (off.has(receptacle.id)) return 'off';
  const readings = standingReadings(state, receptacle.id);
  if (readings.length === 0) return skipOf(state, receptacle) ? 'skipped' : 'untested';
  const lamps = readings
    .flatMap((row) => (row.kind === 'wiring' && row.evidence.lamps ? [row.evidence.lamps] : []))
    .at(-1);
  return lamps && showsNoFault(lamps, receptacle.pattern) && !readings.some(showsTrouble) ? 'correct' : 'fault';
}

function showsTrouble(reading: WalkReading): boolean {
  switch (reading.kind) {
    case 'physical':
      return true;
    case 'gfci':
      return (
        reading.evidence.button === 'no-trip' ||
        reading.evidence.faceDead === false ||
        reading.evidence.resets === false
      );
    case 'afci':
      return (
        reading.evidence.button === 'no-trip' ||
        reading.evidence.circuitDead === false ||
        reading.evidence.resets === false
      );
    case 'wiring':
      return reading.evidence.sensor?.groundSlot === true || reading.evidence.sensor?.coverScrew === true;
    case 'load':
      return false;
  }
}

export type AreaCount = { present: number; tested: number; skipped: number };

export function countArea(state: WalkState, areaId: string): AreaCount {
  const rows = receptaclesOf(state, areaId);
  const tested = rows.filter((row) => standingReadings(state, row.id).length > 0).length;
  const skipped = rows.filter((row) => standingReadings(state, row.id).length === 0 && skipOf(state, row)).length;
  return { present: rows.length, tested, skipped };
}

export function countWords({ present, tested, skipped }: AreaCount): string {
  if (present === 0) return 'nothing logged';
  const open = present - tested - skipped;
  return [`${tested} tested`, skipped > 0 && `${skipped} skipped`, open > 0 && `${open} to do`]
    .filter(Boolean)
    .join(', ');
}

export function placeOf(state: WalkState, receptacleId: string): string {
  const receptacle = state.receptacles.find((row) => row.id === receptacleId);
  const area = state.areas.find((row) => row.id === receptacle?.areaId);
  return [area?.name, receptacle && receptacleName(state, receptacle)].filter(Boolean).join(', ');
}

/** "4 · right of basin": the number is the place in the area's order. */
export function receptacleName(state: WalkState, receptacle: WalkReceptacle): string {
  const number = receptaclesOf(state, receptacle.areaId).findIndex((row) => row.id === receptacle.id) + 1;
  return receptacle.label ? `${number} · ${receptacle.label}` : `Receptacle ${number}`;
}
