import type { AreaFacts, InspectionFacts, ReadingFacts, ReceptacleFacts } from '@/lib/findings/facts';
import type { WalkArea, WalkReading, WalkReceptacle, WalkState } from './walk';

/** What the engine is given of one inspection: rows that stand, without tombstones and withdrawn readings. */
export function inspectionFacts(state: WalkState): InspectionFacts {
  const { inspection } = state;
  const receptacles = state.receptacles.filter(stands);
  const present = new Set(receptacles.map((row) => row.id));
  const areaIds = new Set(state.areas.filter(stands).map((row) => row.id));

  return {
    inspection: {
      id: inspection.id,
      stateProfile: inspection.stateProfile,
      yearBuilt: inspection.yearBuilt ?? undefined,
      wiringMethod: inspection.wiringMethod,
      supply: inspection.supply,
      codeEdition: inspection.codeEdition ?? undefined,
      codeEditionSource: inspection.codeEditionSource ?? undefined,
    },
    structures: state.structures.filter(stands).map(({ id, name }) => ({ id, name })),
    areas: state.areas.filter(stands).map(areaFacts),
    panels: state.panels.filter(stands).map((panel) => ({
      id: panel.id,
      name: panel.name,
      kind: panel.kind,
      fedFromCircuitId: panel.fedFromCircuitId ?? undefined,
      place: panel.place ?? undefined,
    })),
    circuits: state.circuits.filter(stands).map((circuit) => ({
      id: circuit.id,
      panelId: circuit.panelId,
      breaker: circuit.breaker,
      poles: circuit.poles,
      amps: circuit.amps ?? undefined,
      wireAwg: circuit.wireAwg ?? undefined,
      labelAsFound: circuit.labelAsFound ?? undefined,
      protection: circuit.protection,
      sharedNeutral: circuit.sharedNeutral,
    })),
    receptacles: receptacles.filter((row) => areaIds.has(row.areaId)).map(receptacleFacts),
    readings: state.readings
      .filter((row) => !row.withdrawn && (!row.receptacleId || present.has(row.receptacleId)))
      .map(readingFacts),
    skips: state.skips
      .filter(stands)
      .map(({ id, receptacleId, areaId, reason, note }) => ({ id, receptacleId, areaId, reason, note })),
    photos: state.photos.filter(stands).map(({ id, receptacleId, areaId, circuitId, caption, order }) => ({
      id,
      receptacleId,
      areaId,
      circuitId,
      caption,
      order,
    })),
    notices: state.notices,
  };
}

function stands(row: { deleted: boolean }): boolean {
  return !row.deleted;
}

function areaFacts(area: WalkArea): AreaFacts {
  return {
    id: area.id,
    structureId: area.structureId,
    name: area.name,
    place: area.place,
    alsoPlace: area.alsoPlace ?? undefined,
    floor: area.floor,
    order: area.order,
    finished: area.finished ?? undefined,
    gradeAccess: area.gradeAccess ?? undefined,
  };
}

function receptacleFacts(row: WalkReceptacle): ReceptacleFacts {
  return {
    id: row.id,
    areaId: row.areaId,
    label: row.label,
    order: row.order,
    pattern: row.pattern,
    device: row.device,
    presence: row.presence,
    marks: row.marks,
    marksChecked: row.marksChecked,
    cover: row.cover ?? undefined,
    circuitId: row.circuitId ?? undefined,
    fedFromReceptacleId: row.fedFromReceptacleId ?? undefined,
    dedicatedAppliance: row.dedicatedAppliance ?? undefined,
    heightFt: row.heightFt ?? undefined,
    sinkFt: distance(row.sinkFt, row.noSinkNear),
    sinkKind: row.sinkKind ?? undefined,
    tubOrShowerFt: distance(row.tubOrShowerFt, row.noTubNear),
    poolFt: distance(row.poolFt, row.noPoolNear),
    measuredTo: row.measuredTo ?? undefined,
    doNotTrip: row.doNotTrip ?? undefined,
    nearBondedPanel: row.nearBondedPanel ?? undefined,
  };
}

function distance(feet: number | null, none: boolean): number | 'none' | undefined {
  if (feet !== null) return feet;
  return none ? 'none' : undefined;
}

/** Drops what only Walk keeps beside the reading. */
function readingFacts(row: WalkReading): ReadingFacts {
  const { visitId: _visitId, withdrawn: _withdrawn, ...reading } = row;
  return reading;
}
