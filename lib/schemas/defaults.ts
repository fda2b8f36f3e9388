import type { WalkArea, WalkCircuit, WalkPanel, WalkReceptacle, WalkStructure } from './walk';

type FieldsOf<Row> = Omit<Row, 'id' | 'revisions' | 'version' | 'deleted'>;

/** What a new row holds where its operation gives no value; the phone and the server fill in the same. */
export const STRUCTURE_DEFAULTS: FieldsOf<WalkStructure> = { name: 'Main house', kind: 'main-house', order: 1 };

export const AREA_DEFAULTS: FieldsOf<WalkArea> = {
  structureId: '',
  name: '',
  place: 'other-room',
  alsoPlace: null,
  floor: 1,
  order: 1,
  finished: null,
  gradeAccess: null,
  closed: false,
};

export const PANEL_DEFAULTS: FieldsOf<WalkPanel> = {
  name: '',
  kind: 'main',
  fedFromCircuitId: null,
  place: null,
  order: 1,
};

export const CIRCUIT_DEFAULTS: FieldsOf<WalkCircuit> = {
  panelId: '',
  breaker: '',
  poles: 1,
  amps: null,
  wireAwg: null,
  labelAsFound: null,
  protection: 'unknown',
  sharedNeutral: 'unknown',
  order: 1,
};

export const RECEPTACLE_DEFAULTS: FieldsOf<WalkReceptacle> = {
  areaId: '',
  label: '',
  order: 1,
  pattern: '5-15R',
  device: 'receptacle',
  presence: 'present',
  marks: [],
  marksChecked: false,
  cover: null,
  circuitId: null,
  fedFromReceptacleId: null,
  dedicatedAppliance: null,
  heightFt: null,
  sinkFt: null,
  noSinkNear: false,
  sinkKind: null,
  tubOrShowerFt: null,
  noTubNear: false,
  poolFt: null,
  noPoolNear: false,
  measuredTo: null,
  doNotTrip: null,
  nearBondedPanel: null,
};
