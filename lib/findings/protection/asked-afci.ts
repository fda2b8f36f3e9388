import type { PlaceKind } from '../vocabulary';
import { depends, yes, type Ruling, type Spot } from './ruling';

/** Rooms that the 2008 text names or that are plainly similar. */
const LIVING: PlaceKind[] = [
  'living-room',
  'dining-room',
  'family-room',
  'recreation-room',
  'hallway',
  'closet',
  'sunroom',
];
/** Rooms that a den or library may be, or not. */
const PERHAPS_LIVING: PlaceKind[] = ['office', 'other-room', 'wet-bar'];
const KITCHEN_AND_LAUNDRY: PlaceKind[] = ['kitchen-counter', 'kitchen-wall', 'dishwasher', 'laundry-area'];

/** What the editions ask of arc protection at a spot: 120 V circuits of 15 and 20 A, 10 A since 2023. */
export function afciRules(spot: Spot): Ruling[] {
  const { edition, volts = 120, amps = 15 } = spot;
  if (volts !== 120 || amps > 20 || (amps < 15 && edition < 2023)) return [];
  const rulings = roomRules(spot);
  return amps < 15 && rulings.some(({ asked }) => asked === 'yes') ? [...rulings, yes('af8')] : rulings;
}

function roomRules({ place, edition, finished }: Spot): Ruling[] {
  if (place === 'bedroom') {
    if (edition >= 2002) return [yes('af2')];
    return edition >= 1999 ? [yes('af1', 'In force from 1 January 2002.')] : [];
  }
  if (edition >= 2014 && KITCHEN_AND_LAUNDRY.includes(place)) return [yes('af6')];
  if (edition < 2008) return [];
  if (LIVING.includes(place)) return [yes('af4')];
  if (PERHAPS_LIVING.includes(place))
    return [depends('af4', 'It depends on how the room is used: dens, libraries and similar rooms count.')];
  if (place === 'basement' && finished !== false)
    return [depends('af4', 'A finished basement counts where it is used as a living space.')];
  return [];
}
