import type {
  AreaFacts,
  CircuitFacts,
  InspectionFacts,
  LampPattern,
  NoticeFacts,
  ReadingFacts,
  ReceptacleFacts,
} from '@/lib/findings/facts';
import type { Lamp } from '@/lib/findings/vocabulary';

/** "110" is hot–neutral lit, hot–ground lit, neutral–ground off; "d" is dim. */
export function lamps(bits: string): LampPattern {
  const lamp = (index: number): Lamp => ({ '1': 'lit', '0': 'off', d: 'dim' })[bits[index] ?? '0'] as Lamp;
  return { hn: lamp(0), hg: lamp(1), ng: lamp(2) };
}

export function area(row: Partial<AreaFacts> & { id: string }): AreaFacts {
  return { structureId: 'house', name: row.id, place: 'living-room', floor: 1, order: 1, ...row };
}

export function receptacle(row: Partial<ReceptacleFacts> & { id: string }): ReceptacleFacts {
  return {
    areaId: 'living',
    label: row.id,
    order: 1,
    pattern: '5-15R',
    device: 'receptacle',
    presence: 'present',
    marks: [],
    sinkFt: 'none',
    tubOrShowerFt: 'none',
    poolFt: 'none',
    ...row,
  };
}

export function circuit(row: Partial<CircuitFacts> & { id: string }): CircuitFacts {
  return { panelId: 'panel', breaker: row.id, poles: 1, amps: 15, protection: 'none', ...row };
}

type Draft = ReadingFacts extends infer One
  ? One extends ReadingFacts
    ? Omit<One, 'by' | 'recordedAt' | 'order' | 'id'> & { id?: string; order?: number }
    : never
  : never;

/** Readings in the order in which they were taken. */
export function readings(drafts: readonly Draft[]): ReadingFacts[] {
  return drafts.map((draft, index) => ({
    id: `r${index + 1}`,
    order: index + 1,
    by: 'R. Okafor',
    recordedAt: `2026-12-01T15:${String(index).padStart(2, '0')}:00Z`,
    ...draft,
  }));
}

/** Lamps at a receptacle. */
export function read(receptacleId: string, bits: string): Draft {
  return { kind: 'wiring', receptacleId, evidence: { lamps: lamps(bits) } };
}

export function notice(row: Partial<NoticeFacts> & Pick<NoticeFacts, 'id' | 'kind'>): NoticeFacts {
  return { order: 1000, at: '2026-12-01T16:30:00Z', ...row };
}

/** A house with one living room, copper cable with a ground, and nothing recorded. */
export function emptyHouse(
  rows: Partial<Omit<InspectionFacts, 'inspection'>> & { inspection?: Partial<InspectionFacts['inspection']> } = {},
): InspectionFacts {
  const { inspection, ...rest } = rows;
  return {
    inspection: {
      id: 'inspection',
      stateProfile: 'general',
      yearBuilt: 1990,
      wiringMethod: 'grounded-cable',
      supply: '120/240',
      ...inspection,
    },
    structures: [{ id: 'house', name: 'House' }],
    areas: [area({ id: 'living', name: 'Living room' })],
    panels: [{ id: 'panel', name: 'Main panel', kind: 'main' }],
    circuits: [],
    receptacles: [],
    readings: [],
    skips: [],
    photos: [],
    notices: [],
    ...rest,
  };
}
