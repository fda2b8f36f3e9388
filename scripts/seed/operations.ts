import { v7 as uuidv7 } from 'uuid';
import type { Operation } from '@/lib/schemas/operations';
import type { Reading } from '@/lib/schemas/reading';
import { lampPattern, type AreaPlan, type HousePlan, type PointPlan } from './plan';

type Bare<One> = One extends Operation ? Omit<One, 'inspectionId' | 'capturedAt'> : never;
type Draft = Bare<Operation>;

/** Ids that the plan's names turn into. */
type Names = { circuits: Map<string, string>; points: Map<string, string> };
export type PlannedPhoto = { photoId: string; caption: string; receptacleId: string; order: number };
export type HouseOperations = { operations: Draft[]; photos: PlannedPhoto[] };

/** The plan of a house as the operations that an inspector's phone would have sent. */
export function houseOperations(plan: HousePlan, place: { structureId: string; visitId: string }): HouseOperations {
  const names: Names = { circuits: new Map(), points: new Map() };
  const operations: Draft[] = [
    { op: 'inspection.set', patch: houseFacts(plan), base: {} },
    ...panelOperations(plan, names),
  ];
  for (const area of plan.areas) for (const point of area.points) names.points.set(point.label, uuidv7());

  const photos: PlannedPhoto[] = [];
  plan.areas.forEach((area, index) => {
    const areaId = uuidv7();
    operations.push({
      op: 'area.add',
      id: areaId,
      fields: { structureId: place.structureId, order: index + 1, ...areaFields(area) },
    });
    area.points.forEach((point, order) => {
      const receptacleId = names.points.get(point.label);
      if (!receptacleId) throw new Error(`no id for ${point.label}`);
      operations.push(
        ...pointOperations(point, { areaId, receptacleId, order: order + 1, visitId: place.visitId, names }),
      );
      if (point.photo) photos.push({ photoId: uuidv7(), caption: point.photo, receptacleId, order: photos.length + 1 });
    });
  });
  return { operations, photos };
}

function houseFacts(plan: HousePlan) {
  return {
    arrivalConfirmed: plan.areas.length > 0,
    tripConfirmed: plan.areas.length > 0,
    serviceAmps: plan.serviceAmps ?? null,
    codeEdition: plan.codeEdition?.edition ?? null,
    codeEditionSource: plan.codeEdition?.source ?? null,
  };
}

function areaFields({ name, place, alsoPlace, floor, finished, gradeAccess }: AreaPlan) {
  return {
    name,
    place,
    alsoPlace: alsoPlace ?? null,
    floor,
    finished: finished ?? null,
    gradeAccess: gradeAccess ?? null,
  };
}

function panelOperations(plan: HousePlan, names: Names): Draft[] {
  return (plan.panels ?? []).flatMap((panel, panelOrder) => {
    const panelId = uuidv7();
    const fedFromCircuitId = panel.fedFrom ? (names.circuits.get(panel.fedFrom) ?? null) : null;
    const add: Draft = {
      op: 'panel.add',
      id: panelId,
      fields: {
        name: `${panel.name} panel`,
        kind: panel.kind,
        place: panel.place,
        fedFromCircuitId,
        order: panelOrder + 1,
      },
    };
    const circuits = panel.circuits.map(({ label, ...circuit }, order): Draft => {
      const id = uuidv7();
      names.circuits.set(`${panel.name}/${circuit.breaker}`, id);
      return { op: 'circuit.add', id, fields: { panelId, ...circuit, labelAsFound: label ?? null, order: order + 1 } };
    });
    return [add, ...circuits];
  });
}

type PointPlace = { areaId: string; receptacleId: string; order: number; visitId: string; names: Names };

function pointOperations(point: PointPlan, { areaId, receptacleId, order, visitId, names }: PointPlace): Draft[] {
  const add: Draft = {
    op: 'receptacle.add',
    id: receptacleId,
    fields: {
      areaId,
      order,
      label: point.label,
      pattern: point.pattern ?? '5-15R',
      device: point.device ?? 'receptacle',
      marks: point.marks ?? [],
      marksChecked: point.marks !== undefined || point.device !== undefined,
      cover: point.cover ?? null,
      circuitId: point.circuit ? (names.circuits.get(point.circuit) ?? null) : null,
      doNotTrip: point.doNotTrip ?? null,
      sinkFt: point.sinkFt ?? null,
      measuredTo: point.sinkFt === undefined ? null : 'outside-edge',
      nearBondedPanel: point.nearBondedPanel ?? null,
    },
  };
  const readings = readingsOf(point, names).map((reading): Draft => ({
    op: 'reading.add',
    id: uuidv7(),
    visitId,
    receptacleId,
    reading,
  }));
  const skip: Draft[] = point.skip ? [{ op: 'skip.add', id: uuidv7(), receptacleId, ...point.skip }] : [];
  const told: Draft[] = point.told
    ? [{ op: 'notice.add', id: uuidv7(), kind: 'danger-told', receptacleId, ...point.told }]
    : [];
  return [add, ...readings, ...skip, ...told];
}

function readingsOf(point: PointPlan, names: Names): Reading[] {
  const readings: Reading[] = [];
  const { lamps, volts, sensor, loadsUnplugged, powerChecked } = point;
  if (lamps)
    readings.push({
      kind: 'wiring',
      evidence: { lamps: lampPattern(lamps), ...given({ loadsUnplugged, powerChecked }) },
    });
  if (volts) readings.push({ kind: 'wiring', evidence: { volts } });
  if (sensor) readings.push({ kind: 'wiring', evidence: { sensor } });
  if (point.load) readings.push({ kind: 'load', evidence: point.load });
  if (point.gfci) {
    const { upstream, wentDead, ...trial } = point.gfci;
    const points = {
      upstreamReceptacleId: upstream ? names.points.get(upstream) : undefined,
      wentDead: wentDead?.flatMap((label) => names.points.get(label) ?? []),
    };
    readings.push({
      kind: 'gfci',
      evidence: { ...trial, ...(lamps ? { lamps: lampPattern(lamps) } : {}), ...given(points) },
    });
  }
  if (point.afci) readings.push({ kind: 'afci', evidence: point.afci });
  if (point.signs) readings.push({ kind: 'physical', evidence: { signs: point.signs } });
  return readings;
}

function given<Part extends object>(part: Part): Partial<Part> {
  return Object.fromEntries(Object.entries(part).filter(([, value]) => value !== undefined)) as Partial<Part>;
}
