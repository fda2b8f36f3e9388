import type { PlaceKind } from '../vocabulary';
import type { Ruling, Spot } from './asked';

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
export function afciRules({ place, edition, volts = 120, amps = 15, finished }: Spot): Ruling[] {
  if (volts !== 120 || amps > 20) return [];
  if (place === 'bedroom') {
    if (edition >= 2002) return [{ asked: 'yes', row: 'af2' }];
    return edition >= 1999 ? [{ asked: 'yes', row: 'af1', note: 'In force from 1 January 2002.' }] : [];
  }
  if (edition >= 2014 && KITCHEN_AND_LAUNDRY.includes(place)) return [{ asked: 'yes', row: 'af6' }];
  if (edition < 2008) return [];
  if (LIVING.includes(place)) return [{ asked: 'yes', row: 'af4' }];
  if (PERHAPS_LIVING.includes(place))
    return [
      {
        asked: 'depends',
        row: 'af4',
        note: 'It depends on how the room is used: dens, libraries and similar rooms count.',
      },
    ];
  if (place === 'basement' && finished !== false)
    return [{ asked: 'depends', row: 'af4', note: 'A finished basement counts where it is used as a living space.' }];
  return [];
}
