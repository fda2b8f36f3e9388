import type { Operation } from '@/lib/schemas/operations';
import {
  AREA_DEFAULTS,
  CIRCUIT_DEFAULTS,
  PANEL_DEFAULTS,
  RECEPTACLE_DEFAULTS,
  STRUCTURE_DEFAULTS,
} from '@/lib/schemas/defaults';
import type { WalkReading, WalkState } from '@/lib/schemas/walk';

const UNSENT_ORDER = 1_000_000_000;

/**
 * What the screen shows after an operation that the server has not answered yet. The server's answer replaces it; until
 * then a person sees what they did.
 */
export function applyLocally(state: WalkState, operation: Operation, by: string): WalkState {
  switch (operation.op) {
    case 'inspection.set':
      return { ...state, inspection: { ...state.inspection, ...operation.patch } };
    case 'inspection.advance':
      return { ...state, inspection: { ...state.inspection, state: operation.to } };
    case 'visit.add':
      return { ...state, inspection: { ...state.inspection, visitId: operation.id } };
    case 'structure.add':
      return {
        ...state,
        structures: put(state.structures, { ...STRUCTURE_DEFAULTS, ...operation.fields, ...fresh(operation.id) }),
      };
    case 'area.add':
      return { ...state, areas: put(state.areas, { ...AREA_DEFAULTS, ...operation.fields, ...fresh(operation.id) }) };
    case 'panel.add':
      return {
        ...state,
        panels: put(state.panels, { ...PANEL_DEFAULTS, ...operation.fields, ...fresh(operation.id) }),
      };
    case 'circuit.add':
      return {
        ...state,
        circuits: put(state.circuits, { ...CIRCUIT_DEFAULTS, ...operation.fields, ...fresh(operation.id) }),
      };
    case 'receptacle.add':
      return {
        ...state,
        receptacles: put(state.receptacles, { ...RECEPTACLE_DEFAULTS, ...operation.fields, ...fresh(operation.id) }),
      };
    case 'structure.set':
      return { ...state, structures: edit(state.structures, operation.id, operation.patch) };
    case 'area.set':
      return { ...state, areas: edit(state.areas, operation.id, operation.patch) };
    case 'panel.set':
      return { ...state, panels: edit(state.panels, operation.id, operation.patch) };
    case 'circuit.set':
      return { ...state, circuits: edit(state.circuits, operation.id, operation.patch) };
    case 'receptacle.set':
      return { ...state, receptacles: edit(state.receptacles, operation.id, operation.patch) };
    case 'photo.set':
      return { ...state, photos: edit(state.photos, operation.id, operation.patch) };
    case 'structure.remove':
      return { ...state, structures: edit(state.structures, operation.id, { deleted: true }) };
    case 'area.remove':
      return { ...state, areas: edit(state.areas, operation.id, { deleted: true }) };
    case 'area.restore':
      return { ...state, areas: edit(state.areas, operation.id, { deleted: false }) };
    case 'panel.remove':
      return { ...state, panels: edit(state.panels, operation.id, { deleted: true }) };
    case 'circuit.remove':
      return { ...state, circuits: edit(state.circuits, operation.id, { deleted: true }) };
    case 'receptacle.remove':
      return { ...state, receptacles: edit(state.receptacles, operation.id, { deleted: true }) };
    case 'receptacle.restore':
      return { ...state, receptacles: edit(state.receptacles, operation.id, { deleted: false }) };
    case 'skip.remove':
      return { ...state, skips: edit(state.skips, operation.id, { deleted: true }) };
    case 'photo.remove':
      return { ...state, photos: edit(state.photos, operation.id, { deleted: true }) };
    case 'photo.restore':
      return { ...state, photos: edit(state.photos, operation.id, { deleted: false }) };
    case 'reading.withdraw':
      return { ...state, readings: edit(state.readings, operation.id, { withdrawn: true }) };
    case 'reading.add':
      return { ...state, readings: put(state.readings, readingOf(state, operation, by)) };
    case 'skip.add':
      return { ...state, skips: put(state.skips, { ...operation, deleted: false }) };
    case 'notice.add':
      return {
        ...state,
        notices: put(state.notices, { ...operation, order: nextOrder(state), at: operation.capturedAt }),
      };
    case 'photo.add':
      return {
        ...state,
        photos: put(state.photos, {
          ...operation,
          caption: operation.caption ?? '',
          state: 'announced',
          revisions: {},
          deleted: false,
        }),
      };
    case 'finding.decide':
      return {
        ...state,
        decisions: put(state.decisions, { ...operation, order: nextOrder(state), by, at: operation.capturedAt }),
      };
  }
}

function fresh(id: string) {
  return { id, revisions: {}, version: 0, deleted: false };
}

function put<Row extends { id: string }>(rows: Row[], row: Row): Row[] {
  return [...rows.filter((other) => other.id !== row.id), row];
}

function edit<Row extends { id: string }>(rows: Row[], id: string, patch: Partial<NoInfer<Row>>): Row[] {
  return rows.map((row) => (row.id === id ? { ...row, ...patch } : row));
}

function nextOrder(state: WalkState): number {
  return UNSENT_ORDER + state.readings.length + state.notices.length + state.decisions.length;
}

function readingOf(state: WalkState, operation: Extract<Operation, { op: 'reading.add' }>, by: string): WalkReading {
  const { id, visitId, receptacleId, circuitId, supersedes, capturedAt, reading } = operation;
  return {
    ...reading,
    id,
    visitId,
    receptacleId,
    circuitId,
    supersedes,
    order: nextOrder(state),
    by,
    recordedAt: capturedAt,
    withdrawn: false,
  };
}
