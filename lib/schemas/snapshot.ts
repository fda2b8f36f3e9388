import { z } from 'zod';
import {
  BREAKER_PROTECTIONS,
  CONFIDENCES,
  DEVICE_KINDS,
  DEVICE_MARKS,
  FIXERS,
  LAMPS,
  METERS,
  PRESENCES,
  SIGNALS,
  SKIP_REASONS,
  SLOT_PATTERNS,
  STATE_PROFILES,
  URGENCIES,
  WIRING_CONDITIONS,
  WIRING_METHODS,
} from '@/lib/findings/vocabulary';

const sha256 = z.string().regex(/^[0-9a-f]{64}$/);
const instant = z.iso.datetime({ offset: true });
/** What a reader sees, per language. English is always there. */
const words = z.object({ en: z.string(), es: z.string().optional() });
const lampPattern = z.object({ hn: z.enum(LAMPS), hg: z.enum(LAMPS), ng: z.enum(LAMPS) });
/** V rms. */
const voltTrio = z.object({ hn: z.number(), hg: z.number(), ng: z.number(), meter: z.enum(METERS) });

const person = z.object({ name: z.string(), email: z.string().optional(), phone: z.string().optional() });
const inspector = z.object({
  membershipId: z.string(),
  name: z.string(),
  licenseNumber: z.string().optional(),
  licenseState: z.string().optional(),
  leads: z.boolean(),
});

/** A photo's bytes stand in storage under `key`; the report prints the 1600 px copy, which must hash to `sha256Of1600`. */
const photo = z.object({
  id: z.string(),
  number: z.int(),
  key: z.string(),
  sha256: sha256,
  sha256Of1600: sha256,
  width: z.int().optional(),
  height: z.int().optional(),
  caption: z.string(),
  takenAt: instant.optional(),
  place: z.string(),
  receptacleId: z.string().optional(),
});

const composed = z.object({
  title: z.string(),
  observed: z.string(),
  means: z.string(),
  hazard: z.object({ signal: z.enum(SIGNALS), type: z.string(), consequence: z.string(), avoid: z.string() }),
  plain: z.string(),
  doNext: z.string(),
  who: z.string(),
  caution: z.string(),
  evidence: z.array(z.string()),
  unproven: z.array(z.string()),
});

const finding = z.object({
  id: z.string(),
  code: z.string(),
  number: z.int(),
  signal: z.enum(SIGNALS),
  urgency: z.enum(URGENCIES),
  who: z.enum(FIXERS),
  place: z.string(),
  receptacleIds: z.array(z.string()),
  text: z.object({ en: composed, es: composed.optional() }),
  evidence: z.array(
    z.object({
      at: instant.optional(),
      instrument: z.string(),
      showed: z.string(),
      by: z.string().optional(),
    }),
  ),
  told: z.array(z.object({ at: instant, whom: z.string(), note: z.string().optional() })),
  photoIds: z.array(z.string()),
  drawing: z
    .object({
      pattern: z.enum(SLOT_PATTERNS),
      device: z.enum(DEVICE_KINDS),
      lamps: lampPattern.optional(),
      volts: voltTrio.optional(),
      condition: z.enum(WIRING_CONDITIONS).optional(),
    })
    .optional(),
  hook: z.object({ section: z.string(), since: z.number().optional(), confidence: z.enum(CONFIDENCES) }).optional(),
});

const logRow = z.object({
  receptacleId: z.string(),
  areaId: z.string(),
  number: z.int(),
  label: z.string(),
  presence: z.enum(PRESENCES),
  pattern: z.enum(SLOT_PATTERNS),
  device: z.enum(DEVICE_KINDS),
  marks: z.array(z.enum(DEVICE_MARKS)),
  lamps: lampPattern.optional(),
  volts: voltTrio.optional(),
  circuit: z.string().optional(),
  protection: words,
  result: words,
  /** Numbers of the findings that name this receptacle. */
  findings: z.array(z.int()),
});

const notTested = z.object({
  place: z.string(),
  reason: z.enum(SKIP_REASONS).optional(),
  says: words,
  note: z.string().optional(),
});

const panel = z.object({
  id: z.string(),
  name: z.string(),
  kind: z.enum(['main', 'sub']),
  place: z.string().optional(),
  fedFromCircuitId: z.string().optional(),
});
const circuit = z.object({
  id: z.string(),
  panelId: z.string(),
  breaker: z.string(),
  poles: z.union([z.literal(1), z.literal(2)]),
  amps: z.number().optional(),
  wireAwg: z.number().optional(),
  labelAsFound: z.string().optional(),
  protection: z.enum(BREAKER_PROTECTIONS),
  feeds: z.array(
    z.object({
      receptacleId: z.string(),
      place: z.string(),
      pattern: z.enum(SLOT_PATTERNS),
      device: z.enum(DEVICE_KINDS),
      fedFromReceptacleId: z.string().optional(),
      off: z.boolean(),
    }),
  ),
});

/** Everything that one released version says, frozen. The PDF and the web report print this and nothing else. */
export const reportSnapshotSchema = z.object({
  schema: z.literal(1),
  renderer: z.string(),
  reportVersionId: z.string(),
  number: z.int(),
  releasedAt: instant,
  supersedes: z.object({ id: z.string(), number: z.int(), sha256 }).optional(),
  reason: z.string().optional(),
  changes: z.array(z.string()),
  overrides: z.array(z.object({ code: z.string(), says: z.string(), reason: z.string() })),
  firm: z.object({
    name: z.string(),
    address: z.string(),
    phone: z.string(),
    email: z.string(),
    licenseNumber: z.string(),
    logo: z.object({ key: z.string(), sha256 }).optional(),
  }),
  inspection: z.object({
    id: z.string(),
    number: z.int(),
    street: z.string(),
    cityLine: z.string(),
    county: z.string().optional(),
    timeZone: z.string(),
    scheduledAt: instant,
    walkedAt: z.object({ first: instant, last: instant }).optional(),
    yearBuilt: z.int().optional(),
    wiringMethod: z.enum(WIRING_METHODS),
    serviceAmps: z.int().optional(),
    occupied: z.boolean().optional(),
    utilitiesOn: z.boolean().optional(),
    codeEdition: z.int().optional(),
    codeEditionSource: z.string().optional(),
  }),
  stateProfile: z.object({
    code: z.enum(STATE_PROFILES),
    name: z.string(),
    duties: z.array(z.object({ says: z.string(), section: z.string() })),
  }),
  buyers: z.array(person),
  agents: z.array(person),
  inspectors: z.array(inspector),
  signature: z.object({
    membershipId: z.string(),
    name: z.string(),
    licenseNumber: z.string().optional(),
    image: z.object({ key: z.string(), sha256 }).optional(),
    signedAt: instant,
  }),
  coverage: z.object({
    present: z.int(),
    tested: z.int(),
    skipped: z.int(),
    areas: z.array(
      z.object({
        areaId: z.string(),
        name: z.string(),
        structure: z.string(),
        present: z.int(),
        tested: z.int(),
        skipped: z.int(),
      }),
    ),
    leftOff: z.array(z.string()),
  }),
  findings: z.array(finding),
  gaps: z.array(z.object({ id: z.string(), kind: z.string(), place: z.string(), says: words })),
  log: z.array(logRow),
  panels: z.array(panel),
  circuits: z.array(circuit),
  notTested: z.array(notTested),
  photos: z.array(photo),
  limits: z.object({ en: z.array(z.string()), es: z.array(z.string()).optional() }),
});

export type ReportSnapshot = z.infer<typeof reportSnapshotSchema>;
export type SnapshotFinding = ReportSnapshot['findings'][number];
export type SnapshotPhoto = ReportSnapshot['photos'][number];
export type SnapshotLogRow = ReportSnapshot['log'][number];
export type SnapshotCircuit = ReportSnapshot['circuits'][number];

/** Raised when the same snapshot would print differently; it stands in each new snapshot and file row. */
export const RENDERER = 'ohmstead-pdf-1';

/** Text of a stored snapshot, read back. Throws where it is not one: a released version is never repaired. */
export function parseSnapshot(text: string): ReportSnapshot {
  return reportSnapshotSchema.parse(JSON.parse(text));
}

/**
 * JSON with sorted keys and no white space (after RFC 8785), so that equal contents are equal bytes.
 * Throws on numbers that JSON cannot hold; `undefined` is left out.
 */
export function canonicalJson(value: unknown): string {
  if (typeof value === 'number' && !Number.isFinite(value)) throw new Error('a snapshot holds finite numbers only');
  if (value === null || typeof value !== 'object') return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map((item) => canonicalJson(item ?? null)).join(',')}]`;
  const members = Object.entries(value)
    .filter(([, member]) => member !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([key, member]) => `${JSON.stringify(key)}:${canonicalJson(member)}`);
  return `{${members.join(',')}}`;
}
