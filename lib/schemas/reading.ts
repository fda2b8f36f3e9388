import { z } from 'zod';
import type {
  AfciReadingEvidence,
  GfciReadingEvidence,
  LoadTest,
  PhysicalReadingEvidence,
  WiringReadingEvidence,
} from '@/lib/findings/facts';
import {
  BREAKER_MARKINGS,
  GFCI_DEVICES,
  LAMPS,
  METERS,
  PHYSICAL_SIGNS,
  RETRIPS,
  TRIP_RESULTS,
  YES_NO_UNKNOWN,
} from '@/lib/findings/vocabulary';
import { idSchema } from './id';

const volts = z.number('Enter a voltage').min(0, 'Voltage cannot be negative').max(300, 'Check the meter: over 300 V');
const amps = z
  .number('Enter the load in amperes')
  .gt(0, 'The load must be above 0 A')
  .max(20, 'Check the load: over 20 A');
const reason = z.string().trim().min(1, 'Say why it was not tested').max(300, 'Keep the reason under 300 characters');

export const lampPatternSchema = z.strictObject({ hn: z.enum(LAMPS), hg: z.enum(LAMPS), ng: z.enum(LAMPS) });
export const voltTrioSchema = z.strictObject({ hn: volts, hg: volts, ng: volts, meter: z.enum(METERS) });
export const contactSensorSchema = z.strictObject({
  hotSlot: z.boolean().optional(),
  neutralSlot: z.boolean().optional(),
  groundSlot: z.boolean().optional(),
  coverScrew: z.boolean().optional(),
});

export const wiringEvidenceSchema = z.strictObject({
  lamps: lampPatternSchema.optional(),
  volts: voltTrioSchema.optional(),
  moreVolts: z.array(voltTrioSchema).max(6, 'Six further meter readings at most').optional(),
  sensor: contactSensorSchema.optional(),
  loadsUnplugged: z.enum(YES_NO_UNKNOWN).optional(),
  hardWiredLoadsOff: z.enum(YES_NO_UNKNOWN).optional(),
  sharedNeutral: z.enum(YES_NO_UNKNOWN).optional(),
  nearBondedPanel: z.boolean().optional(),
  groundOhms: z
    .number('Enter the resistance in ohms')
    .min(0, 'Resistance cannot be negative')
    .max(20000, 'Check the instrument: over 20,000 ohms')
    .optional(),
  groundJumperSeen: z.boolean().optional(),
  powerChecked: z.boolean().optional(),
}) satisfies z.ZodType<WiringReadingEvidence>;

export const loadTestSchema = z.strictObject({
  amps,
  noLoadHn: volts,
  loadedHn: volts,
  noLoadNg: volts.optional(),
  loadedNg: volts.optional(),
}) satisfies z.ZodType<LoadTest>;

export const gfciEvidenceSchema = z.strictObject({
  device: z.enum(GFCI_DEVICES),
  lamps: lampPatternSchema.optional(),
  deadBefore: z.boolean().optional(),
  button: z.enum(TRIP_RESULTS).optional(),
  faceDead: z.boolean().optional(),
  tester: z.enum(TRIP_RESULTS).optional(),
  resets: z.boolean().optional(),
  downstreamDead: z.boolean().optional(),
  endOfLife: z.boolean().optional(),
  retrips: z.enum(RETRIPS).optional(),
  upstreamTrippedFirst: z.boolean().optional(),
  deviceFound: z.boolean().optional(),
  measured: z
    .strictObject({
      milliamps: z
        .number('Enter the test current in mA')
        .gt(0, 'Test current must be above 0 mA')
        .max(1000, 'Check the analyzer: over 1,000 mA'),
      seconds: z
        .number('Enter the trip time in seconds')
        .gt(0, 'Trip time must be above 0 s')
        .max(60, 'Check the analyzer: over 60 s'),
    })
    .optional(),
  notTestedReason: reason.optional(),
  breakerMarking: z.enum(BREAKER_MARKINGS).optional(),
  wentDead: z.array(idSchema).max(200).optional(),
  upstreamReceptacleId: idSchema.optional(),
}) satisfies z.ZodType<GfciReadingEvidence>;

export const afciEvidenceSchema = z.strictObject({
  button: z.enum(TRIP_RESULTS).optional(),
  circuitDead: z.boolean().optional(),
  resets: z.boolean().optional(),
  indicator: z.enum(TRIP_RESULTS).optional(),
  notTestedReason: reason.optional(),
  wentDead: z.array(idSchema).max(200).optional(),
}) satisfies z.ZodType<AfciReadingEvidence>;

export const physicalEvidenceSchema = z.strictObject({
  signs: z.array(z.enum(PHYSICAL_SIGNS)).min(1, 'Choose what you saw'),
  note: z.string().trim().max(500, 'Keep the note under 500 characters').optional(),
  temperatureRiseF: z
    .number('Enter the rise in degrees F')
    .min(0)
    .max(500, 'Check the thermometer: over 500 degrees')
    .optional(),
  amps: amps.optional(),
}) satisfies z.ZodType<PhysicalReadingEvidence>;

/** A reading as the phone records it. Readings are append-only: a correction names the one that it supersedes. */
export const readingSchema = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('wiring'), evidence: wiringEvidenceSchema }),
  z.strictObject({ kind: z.literal('load'), evidence: loadTestSchema }),
  z.strictObject({ kind: z.literal('gfci'), evidence: gfciEvidenceSchema }),
  z.strictObject({ kind: z.literal('afci'), evidence: afciEvidenceSchema }),
  z.strictObject({ kind: z.literal('physical'), evidence: physicalEvidenceSchema }),
]);
export type Reading = z.infer<typeof readingSchema>;
