import type { PlaceKind } from '../vocabulary';
import { depends, no, yes, type Ruling, type Spot } from './ruling';

const TAMPER_HEIGHT_FT = 5.5;
/** Places outside the areas that the general rule names. */
const NO_TAMPER: PlaceKind[] = ['attic', 'crawl-space'];
const PERHAPS_TAMPER: PlaceKind[] = ['accessory-building', 'boathouse', 'pool-area', 'closet'];
const NAMED_IN_2026: PlaceKind[] = ['garage', 'accessory-building'];
const PERHAPS_DAMP: PlaceKind[] = ['pool-area', 'boathouse', 'crawl-space', 'accessory-building', 'sunroom'];

const isSmall = ({ amps = 15 }: Spot) => amps <= 20;

/** What the editions ask of shutters in the slots: dwelling areas, 15 and 20 A, 120 V and from 2017 also 240 V. */
export function tamperRules(spot: Spot): Ruling[] {
  const { place, edition, volts = 120, heightFt, dedicatedAppliance } = spot;
  if (edition < 2008 || !isSmall(spot) || NO_TAMPER.includes(place)) return [];
  if (volts === 240 && edition < 2017) return [];
  if (edition >= 2011) {
    if (heightFt !== undefined && heightFt > TAMPER_HEIGHT_FT) return [no('tr2', 'Above 5 1/2 ft it is excepted.')];
    if (dedicatedAppliance) return [depends('tr2', 'Excepted behind an appliance that is not easily moved.')];
  }
  const row = volts === 240 ? 'tr3' : 'tr1';
  const note = 'A like-for-like two-slot replacement is excepted.';
  const named = edition >= 2026 && NAMED_IN_2026.includes(place) ? [yes('tr4', note)] : [];
  if (PERHAPS_TAMPER.includes(place))
    return [...named, depends(row, 'It depends on whether the place counts among the dwelling areas of the rule.')];
  return [...named, yes(row, note)];
}

/** What the editions ask of a receptacle's own resistance to weather: 15 and 20 A in damp and wet places. */
export function weatherRules(spot: Spot): Ruling[] {
  const { place, edition, finished } = spot;
  if (edition < 2008 || !isSmall(spot)) return [];
  if (place === 'outdoors') return [yes('wr1')];
  const perhapsDamp = PERHAPS_DAMP.includes(place) || (place === 'basement' && finished !== true);
  return perhapsDamp ? [depends('wr1', 'It depends on whether the place is damp or wet.')] : [];
}

/** What the editions ask of a cover that keeps rain out with a plug in: 15 and 20 A in wet places. */
export function coverRules(spot: Spot): Ruling[] {
  const { place, edition } = spot;
  if (edition < 1996 || !isSmall(spot)) return [];
  if (place !== 'outdoors' && place !== 'pool-area' && place !== 'boathouse') return [];
  const note =
    'Where rain can reach it; under a roof a cover that closes without a plug may do. Published histories say 1996, 1999 and 2002: it came in two stages.';
  if (edition < 2002) return [depends('cv1', `${note} Loads that a person attends were excepted.`)];
  if (place !== 'outdoors') return [depends('cv2', note)];
  return edition >= 2014 ? [yes('cv2', note), yes('cv3', 'The hood is of the extra-duty kind.')] : [yes('cv2', note)];
}
