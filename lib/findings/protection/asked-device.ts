import type { PlaceKind } from '../vocabulary';
import type { Ruling, Spot } from './asked';

const TAMPER_HEIGHT_FT = 5.5;
/** Places outside the areas that the general rule names, or named only later. */
const NO_TAMPER: PlaceKind[] = ['attic', 'crawl-space'];
const PERHAPS_TAMPER: PlaceKind[] = ['accessory-building', 'boathouse', 'pool-area', 'closet'];

const isSmall = ({ amps = 15 }: Spot) => amps <= 20;

export function tamperRules(spot: Spot): Ruling[] {
  const { place, edition, volts = 120, heightFt, dedicatedAppliance } = spot;
  if (edition < 2008 || !isSmall(spot) || NO_TAMPER.includes(place)) return [];
  if (volts === 240 && edition < 2017) return [];
  const row = volts === 240 ? 'tr3' : 'tr1';
  if (edition >= 2011) {
    if (heightFt !== undefined && heightFt > TAMPER_HEIGHT_FT) return [];
    if (dedicatedAppliance)
      return [{ asked: 'depends', row: 'tr2', note: 'Excepted behind an appliance that is not easily moved.' }];
  }
  const named = edition >= 2026 && place === 'accessory-building';
  if (PERHAPS_TAMPER.includes(place) && !named)
    return [
      { asked: 'depends', row, note: 'It depends on whether the place counts among the dwelling areas of the rule.' },
    ];
  return [{ asked: 'yes', row: named ? 'tr4' : row, note: 'A like-for-like two-slot replacement is excepted.' }];
}

export function weatherRules(spot: Spot): Ruling[] {
  const { place, edition } = spot;
  if (edition < 2008 || !isSmall(spot)) return [];
  if (place === 'outdoors') return [{ asked: 'yes', row: 'wr1' }];
  const perhapsDamp: PlaceKind[] = ['pool-area', 'boathouse', 'crawl-space', 'accessory-building', 'sunroom'];
  return perhapsDamp.includes(place)
    ? [{ asked: 'depends', row: 'wr1', note: 'It depends on whether the place is damp or wet.' }]
    : [];
}

export function coverRules(spot: Spot): Ruling[] {
  const { place, edition } = spot;
  if (edition < 1996 || !isSmall(spot)) return [];
  const open = place === 'outdoors';
  if (!open && place !== 'pool-area' && place !== 'boathouse') return [];
  const note = 'Where rain can reach it; under a roof a cover that closes without a plug may do.';
  if (edition < 2002)
    return [{ asked: 'depends', row: 'cv1', note: `${note} Loads that a person attends were excepted.` }];
  return [{ asked: open ? 'yes' : 'depends', row: 'cv2', note }];
}
