import type {
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
} from '@/lib/findings/vocabulary';
import type { LampPattern } from '@/lib/findings/facts';

export const PLACE_LABELS: Record<PlaceKind, string> = {
  bathroom: 'Bathroom',
  'kitchen-counter': 'Kitchen, counter',
  'kitchen-wall': 'Kitchen, wall',
  dishwasher: 'Dishwasher',
  'laundry-area': 'Laundry',
  'wet-bar': 'Wet bar',
  garage: 'Garage',
  'accessory-building': 'Shed or accessory building',
  outdoors: 'Outside',
  'crawl-space': 'Crawl space',
  basement: 'Basement',
  attic: 'Attic',
  bedroom: 'Bedroom',
  'living-room': 'Living room',
  'dining-room': 'Dining room',
  'family-room': 'Family room',
  'recreation-room': 'Recreation room',
  office: 'Office',
  hallway: 'Hall',
  closet: 'Closet',
  sunroom: 'Sunroom',
  'pool-area': 'Pool area',
  boathouse: 'Boathouse',
  'other-room': 'Other room',
};

export const DEVICE_LABELS: Record<DeviceKind, string> = {
  receptacle: 'Receptacle',
  'gfci-receptacle': 'GFCI receptacle',
  'afci-receptacle': 'AFCI receptacle',
  'dual-function-receptacle': 'AFCI and GFCI receptacle',
  'hard-wired-outlet': 'Hard-wired outlet',
};

export const MARK_LABELS: Record<DeviceMark, string> = {
  'tamper-resistant': 'Tamper-resistant (TR)',
  'weather-resistant': 'Weather-resistant (WR)',
  'no-equipment-ground': 'No Equipment Ground',
  'gfci-protected': 'GFCI Protected',
};

export const COVER_LABELS: Record<CoverKind, string> = {
  indoor: 'Indoor plate',
  flap: 'Flap, closes without a plug',
  'in-use': 'In-use hood',
  metal: 'Metal plate',
  missing: 'Missing',
  broken: 'Broken',
};

export const SKIP_LABELS: Record<SkipReason, string> = {
  blocked: 'Blocked by furniture or stored things',
  'in-use': 'In use, not to be unplugged',
  occupied: 'Room occupied',
  locked: 'Locked',
  wet: 'Wet',
  unsafe: 'Not reachable without risk',
  'utility-off': 'Power off at the utility',
  'medical-equipment': 'Medical equipment',
  'freezer-or-sump': 'Freezer or sump pump',
  'computer-or-alarm': 'Computer or alarm',
  'owner-refused': 'Owner asked not to',
  'client-excluded': 'Excluded by the client',
  'out-of-reach': 'Out of reach',
  'representative-sample': 'Not in the representative number',
};

export const DO_NOT_TRIP_LABELS: Record<DoNotTripReason, string> = {
  'medical-equipment': 'Medical equipment',
  freezer: 'Freezer',
  'sump-pump': 'Sump pump',
  aquarium: 'Aquarium',
  computer: 'Computer',
  alarm: 'Alarm',
  'occupant-asked': 'The occupant asked',
};

export const SIGN_LABELS: Record<PhysicalSign, string> = {
  cracked: 'Cracked or broken face',
  scorched: 'Scorched or melted',
  warm: 'Warm to the touch under load',
  buzzing: 'Buzz, crackle or flicker',
  'weak-grip': 'Plug falls out',
  'ground-contact-loose': 'Ground contact does not hold',
  'loose-in-box': 'Loose in the box',
  'box-recessed': 'Box loose or set back',
  'cover-missing': 'Cover plate missing or broken',
  'live-terminals-exposed': 'Live terminals can be touched',
  painted: 'Painted over',
  'water-or-rust': 'Water, rust or insects',
  'object-in-slot': 'Something stuck in a slot',
  'half-not-working': 'One half does not work',
  'live-plate-or-plumbing': 'Plate, appliance or plumbing senses live',
  'end-of-life-indicator': 'End-of-life light or beep',
  'hard-to-reach-gfci': 'GFCI cannot be reached',
  'feeds-freezer-or-sump': 'Feeds a freezer or sump pump',
};

export const WIRING_METHOD_LABELS: Record<WiringMethod, string> = {
  'grounded-cable': 'Cable with a ground wire',
  'metal-raceway': 'Metal conduit or armored cable',
  'two-wire': 'Two-wire cable, no ground',
  unknown: 'Not known',
};

const LAMP_NAMES: [keyof LampPattern, string][] = [
  ['hn', 'H–N'],
  ['hg', 'H–G'],
  ['ng', 'N–G'],
];

const LIT: Record<Lamp, string> = { lit: 'lit', dim: 'dim', off: 'off' };

/** "H–N and H–G lit, N–G off"; of a two-slot face the one lamp that it has. */
export function lampsInWords(lamps: LampPattern, pattern?: SlotPattern): string {
  const names = pattern === '1-15R' ? LAMP_NAMES.slice(0, 1) : LAMP_NAMES;
  const groups = (['lit', 'dim', 'off'] as const).map(
    (state) => [state, names.filter(([key]) => lamps[key] === state)] as const,
  );
  return groups
    .filter(([, names]) => names.length > 0)
    .map(([state, names]) => `${names.map(([, name]) => name).join(' and ')} ${LIT[state]}`)
    .join(', ');
}

export function readsCorrect(lamps: LampPattern): boolean {
  return lamps.hn === 'lit' && lamps.hg === 'lit' && lamps.ng === 'off';
}

/** Nothing that these lamps can show is wrong: a two-slot face has one lamp, and no ground to read. */
export function showsNoFault(lamps: LampPattern, pattern: SlotPattern): boolean {
  return pattern === '1-15R' ? lamps.hn === 'lit' : readsCorrect(lamps);
}
