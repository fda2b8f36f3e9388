import type { AfciTrial, ContactSensor, GfciTrial, LampPattern, LoadTest, VoltTrio } from '@/lib/findings/facts';
import type {
  BreakerProtection,
  CoverKind,
  DeviceKind,
  DeviceMark,
  DoNotTripReason,
  Lamp,
  PhysicalSign,
  PlaceKind,
  SkipReason,
  SlotPattern,
  WiringMethod,
  YesNoUnknown,
} from '@/lib/findings/vocabulary';
import type { NewInspection } from '@/lib/schemas/inspection';

/** An invented house, written down the way an inspector would tell it. */
export type HousePlan = {
  booking: Omit<NewInspection, 'leadMembershipId' | 'scheduledLocal' | 'wiringMethod'> & { wiringMethod: WiringMethod };
  /** Days from today; the visit starts at this hour of the house's time. */
  visit: { days: number; at: string };
  codeEdition?: { edition: number; source: string };
  serviceAmps?: number;
  panels?: PanelPlan[];
  areas: AreaPlan[];
  /** How far the demo takes it. */
  upTo: 'booked' | 'on-site' | 'in-review' | 'released';
};

export type PanelPlan = {
  name: string;
  kind: 'main' | 'sub';
  place: string;
  fedFrom?: string;
  circuits: CircuitPlan[];
};
export type CircuitPlan = {
  breaker: string;
  amps: number;
  poles?: 1 | 2;
  wireAwg?: number;
  label?: string;
  protection?: BreakerProtection;
  sharedNeutral?: YesNoUnknown;
};

export type AreaPlan = {
  name: string;
  place: PlaceKind;
  alsoPlace?: PlaceKind;
  floor: number;
  finished?: boolean;
  gradeAccess?: boolean;
  points: PointPlan[];
};

export type PointPlan = {
  label: string;
  pattern?: SlotPattern;
  device?: DeviceKind;
  marks?: DeviceMark[];
  cover?: CoverKind;
  /** "Main panel 7" is written as "Main/7". */
  circuit?: string;
  doNotTrip?: DoNotTripReason;
  sinkFt?: number;
  nearBondedPanel?: boolean;
  /** H–N, H–G, N–G: 1 lit, 0 off, d dim. */
  lamps?: string;
  volts?: VoltTrio;
  sensor?: ContactSensor;
  loadsUnplugged?: YesNoUnknown;
  powerChecked?: boolean;
  load?: LoadTest;
  gfci?: Omit<GfciTrial, 'lamps'> & { wentDead?: string[]; upstream?: string };
  afci?: AfciTrial;
  signs?: PhysicalSign[];
  skip?: { reason: SkipReason; note?: string };
  told?: { whom: string; note: string };
  photo?: string;
};

const LAMP: Record<string, Lamp> = { '1': 'lit', '0': 'off', d: 'dim' };

export function lampPattern(bits: string): LampPattern {
  const [hn, hg, ng] = Array.from(bits, (bit) => LAMP[bit]);
  if (!hn || !hg || !ng) throw new Error(`lamp bits "${bits}" are not three of 0, 1 and d`);
  return { hn, hg, ng };
}
