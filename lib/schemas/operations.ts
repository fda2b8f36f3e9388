import { z } from 'zod';
import { NOTICE_KINDS } from '@/lib/findings/facts';
import {
  BREAKER_PROTECTIONS,
  COVER_KINDS,
  DEVICE_KINDS,
  DEVICE_MARKS,
  DISTANCE_ENDS,
  DO_NOT_TRIP_REASONS,
  PLACES,
  PRESENCES,
  SIGNALS,
  SINK_KINDS,
  SKIP_REASONS,
  SLOT_PATTERNS,
  STRUCTURE_KINDS,
  SUPPLIES,
  WIRING_METHODS,
  YES_NO_UNKNOWN,
} from '@/lib/findings/vocabulary';
import { idSchema } from './id';
import { readingSchema } from './reading';

const instant = z.iso.datetime({ offset: true });
/** What a field's number was when the person changed it: the server refuses a write on a value that the person had not seen. */
const base = z.record(z.string(), z.int().nonnegative());
/** Fractional index: orders items between two others without renumbering. */
const order = z.number().finite();
const name = (what: string) => z.string().trim().min(1, `Name the ${what}`).max(80, 'Keep it under 80 characters');
const text = (most: number) => z.string().trim().max(most, `Keep it under ${most} characters`);
const feet = z.number('Enter feet').min(0, 'A distance cannot be negative').max(200, 'Check the distance: over 200 ft');

/** The patch of an edit: any subset of the fields; null clears one that may be empty. */
const patchOf = <Shape extends z.ZodRawShape>(shape: Shape) =>
  z
    .strictObject(shape)
    .partial()
    .refine((patch) => Object.keys(patch).length > 0, 'Nothing to change');

export const INSPECTION_FIELDS = {
  yearBuilt: z.int('Enter the year as four digits').min(1700, 'Check the year').max(2100, 'Check the year').nullable(),
  wiringMethod: z.enum(WIRING_METHODS),
  supply: z.enum(SUPPLIES),
  serviceAmps: z
    .int('Enter the service size in amperes')
    .min(15)
    .max(2000, 'Check the service size: over 2,000 A')
    .nullable(),
  occupied: z.boolean().nullable(),
  utilitiesOn: z.boolean().nullable(),
  codeEdition: z.int().min(1900).max(2100).nullable(),
  codeEditionSource: text(200).nullable(),
  arrivalConfirmed: z.boolean(),
  tripConfirmed: z.boolean(),
  generalNote: text(2000).nullable(),
} as const;

export const STRUCTURE_FIELDS = { name: name('structure'), kind: z.enum(STRUCTURE_KINDS), order } as const;

export const AREA_FIELDS = {
  structureId: idSchema,
  name: name('area'),
  place: z.enum(PLACES),
  alsoPlace: z.enum(PLACES).nullable(),
  floor: z.int().min(-5).max(100),
  order,
  finished: z.boolean().nullable(),
  gradeAccess: z.boolean().nullable(),
  closed: z.boolean(),
} as const;

export const PANEL_FIELDS = {
  name: name('panel'),
  kind: z.enum(['main', 'sub']),
  fedFromCircuitId: idSchema.nullable(),
  place: text(120).nullable(),
  order,
} as const;

export const CIRCUIT_FIELDS = {
  panelId: idSchema,
  breaker: z.string().trim().min(1, 'Give the breaker position').max(12),
  poles: z.union([z.literal(1), z.literal(2)]),
  amps: z.int().min(5).max(400, 'Check the breaker: over 400 A').nullable(),
  wireAwg: z.int().min(0).max(18).nullable(),
  labelAsFound: text(120).nullable(),
  protection: z.enum(BREAKER_PROTECTIONS),
  sharedNeutral: z.enum(YES_NO_UNKNOWN),
  order,
} as const;

export const RECEPTACLE_FIELDS = {
  areaId: idSchema,
  label: text(80),
  order,
  pattern: z.enum(SLOT_PATTERNS),
  device: z.enum(DEVICE_KINDS),
  presence: z.enum(PRESENCES),
  marks: z.array(z.enum(DEVICE_MARKS)).max(DEVICE_MARKS.length),
  marksChecked: z.boolean(),
  cover: z.enum(COVER_KINDS).nullable(),
  circuitId: idSchema.nullable(),
  fedFromReceptacleId: idSchema.nullable(),
  dedicatedAppliance: z.boolean().nullable(),
  heightFt: feet.nullable(),
  sinkFt: feet.nullable(),
  noSinkNear: z.boolean(),
  sinkKind: z.enum(SINK_KINDS).nullable(),
  tubOrShowerFt: feet.nullable(),
  noTubNear: z.boolean(),
  poolFt: feet.nullable(),
  noPoolNear: z.boolean(),
  measuredTo: z.enum(DISTANCE_ENDS).nullable(),
  doNotTrip: z.enum(DO_NOT_TRIP_REASONS).nullable(),
  nearBondedPanel: z.boolean().nullable(),
} as const;

export const PHOTO_FIELDS = { caption: text(300), order } as const;

const common = { inspectionId: idSchema, capturedAt: instant };
const addOf = <Name extends string, Shape extends z.ZodRawShape>(op: Name, shape: Shape) =>
  z.strictObject({ op: z.literal(op), ...common, id: idSchema, fields: z.strictObject(shape).partial() });
const setOf = <Name extends string, Shape extends z.ZodRawShape>(op: Name, shape: Shape) =>
  z.strictObject({ op: z.literal(op), ...common, id: idSchema, patch: patchOf(shape), base });
const removeOf = <Name extends string>(op: Name) =>
  z.strictObject({ op: z.literal(op), ...common, id: idSchema, base });
const restoreOf = <Name extends string>(op: Name) => z.strictObject({ op: z.literal(op), ...common, id: idSchema });

const readingAddSchema = z
  .strictObject({
    op: z.literal('reading.add'),
    ...common,
    id: idSchema,
    visitId: idSchema,
    receptacleId: idSchema.optional(),
    circuitId: idSchema.optional(),
    supersedes: idSchema.optional(),
    reading: readingSchema,
  })
  .refine(
    (op) => (op.receptacleId === undefined) !== (op.circuitId === undefined),
    'A reading belongs to one receptacle or one circuit',
  );

/** Takes a reading back: what the Undo button records. The reading stays in the record, marked as withdrawn. */
const readingWithdrawSchema = z.strictObject({ op: z.literal('reading.withdraw'), ...common, id: idSchema });

const skipAddSchema = z.strictObject({
  op: z.literal('skip.add'),
  ...common,
  id: idSchema,
  receptacleId: idSchema.optional(),
  areaId: idSchema.optional(),
  reason: z.enum(SKIP_REASONS, 'Choose why it was not tested'),
  note: text(300).optional(),
});

const noticeAddSchema = z.strictObject({
  op: z.literal('notice.add'),
  ...common,
  id: idSchema,
  kind: z.enum(NOTICE_KINDS),
  receptacleId: idSchema.optional(),
  circuitId: idSchema.optional(),
  readingId: idSchema.optional(),
  whom: text(120).optional(),
  note: text(500).optional(),
});

const photoAddSchema = z.strictObject({
  op: z.literal('photo.add'),
  ...common,
  id: idSchema,
  receptacleId: idSchema.optional(),
  areaId: idSchema.optional(),
  circuitId: idSchema.optional(),
  sha256: z.string().regex(/^[0-9a-f]{64}$/),
  bytes: z
    .int()
    .positive()
    .max(25 * 1024 * 1024, 'This photo is over 25 MB. Choose a smaller size in the camera settings.'),
  type: z.enum(['image/jpeg', 'image/png', 'image/webp', 'image/heic']),
  caption: text(300).optional(),
  order,
  takenAt: instant.optional(),
});

export const DECISIONS = ['kept', 'dismissed'] as const;

const findingDecideSchema = z.strictObject({
  op: z.literal('finding.decide'),
  ...common,
  id: idSchema,
  findingId: z.string().min(1).max(200),
  decision: z.enum(DECISIONS),
  reason: text(500).optional(),
  ownWords: z.strictObject({ observed: text(2000).optional(), plain: text(1000).optional() }).optional(),
  raisedSignal: z.enum(SIGNALS).optional(),
  sawReadingIds: z.array(idSchema).max(2000),
});

const visitAddSchema = z.strictObject({
  op: z.literal('visit.add'),
  ...common,
  id: idSchema,
  kind: z.enum(['first', 'return', 're-test']),
});

/** Everything that can change in an inspection from phone or desk. `applyOperation` is the one writer. */
export const operationSchema = z.discriminatedUnion('op', [
  z.strictObject({ op: z.literal('inspection.set'), ...common, patch: patchOf(INSPECTION_FIELDS), base }),
  z.strictObject({ op: z.literal('inspection.advance'), ...common, to: z.enum(['on-site', 'in-review']) }),
  visitAddSchema,
  addOf('structure.add', STRUCTURE_FIELDS),
  setOf('structure.set', STRUCTURE_FIELDS),
  removeOf('structure.remove'),
  addOf('area.add', AREA_FIELDS),
  setOf('area.set', AREA_FIELDS),
  removeOf('area.remove'),
  restoreOf('area.restore'),
  addOf('panel.add', PANEL_FIELDS),
  setOf('panel.set', PANEL_FIELDS),
  removeOf('panel.remove'),
  addOf('circuit.add', CIRCUIT_FIELDS),
  setOf('circuit.set', CIRCUIT_FIELDS),
  removeOf('circuit.remove'),
  addOf('receptacle.add', RECEPTACLE_FIELDS),
  setOf('receptacle.set', RECEPTACLE_FIELDS),
  removeOf('receptacle.remove'),
  restoreOf('receptacle.restore'),
  readingAddSchema,
  readingWithdrawSchema,
  skipAddSchema,
  removeOf('skip.remove'),
  noticeAddSchema,
  photoAddSchema,
  setOf('photo.set', PHOTO_FIELDS),
  removeOf('photo.remove'),
  restoreOf('photo.restore'),
  findingDecideSchema,
]);
export type Operation = z.infer<typeof operationSchema>;
export type OperationName = Operation['op'];
