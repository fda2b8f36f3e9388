import type { Ruling, Spot } from './asked';
import { measureNote, sinkWithin, within, type Within } from './distance';

const TUB_REACH_FT = 6;
const GRADE_REACH_FT = 6.5;
const OUT_OF_REACH_FT = 8;

const yes = (row: string, note?: string): Ruling => ({ asked: 'yes', row, note });
const depends = (row: string, note: string): Ruling => ({ asked: 'depends', row, note });
const by = (answer: Within, row: string, note: string): Ruling[] =>
  answer === 'no' ? [] : [{ asked: answer, row, note }];

/** What the editions ask of shock protection at a spot: its kind of place, then what stands near it. */
export function gfciRules(spot: Spot): Ruling[] {
  const { edition, volts = 120, amps = 15 } = spot;
  const inScope = edition >= 2020 || (volts === 120 && amps <= 20);
  const scopeNote =
    edition >= 2020 && (volts === 240 || amps > 20)
      ? [{ note: 'Since 2020 the list covers 125 through 250 V of any ampere rating.' }]
      : [];
  const rulings = inScope ? [...placeRules(spot), ...sinkRules(spot), ...tubRules(spot), ...poolRules(spot)] : [];
  if (scopeNote.length > 0)
    return rulings.map((ruling) => ({ ...ruling, note: [ruling.note, scopeNote[0]?.note].filter(Boolean).join(' ') }));
  return rulings;
}

function placeRules(spot: Spot): Ruling[] {
  const { place, edition } = spot;
  switch (place) {
    case 'bathroom':
      return edition >= 1975 ? [yes('gf06')] : [];
    case 'outdoors':
      return outdoorRules(spot);
    case 'garage':
      return garageRules(spot);
    case 'accessory-building':
      return accessoryRules(spot);
    case 'basement':
      return basementRules(spot);
    case 'crawl-space':
      return crawlRules(spot);
    case 'boathouse':
      return edition >= 1987 ? [yes('gf15')] : [];
    case 'kitchen-counter':
      if (edition >= 1996) return [yes('gf17')];
      return edition >= 1987 ? by(sinkWithin(spot), 'gf16', 'At the counter, within 6 ft of the sink.') : [];
    case 'kitchen-wall':
      return edition >= 2023 ? [yes('gf18')] : [];
    case 'dishwasher':
      return edition >= 2014 ? [yes('gf25')] : [];
    case 'laundry-area':
      return edition >= 2014 ? [yes('gf24')] : [];
    case 'wet-bar':
      if (edition >= 2023) return [yes('gf30')];
      return edition >= 1993 && edition < 2005
        ? by(sinkWithin(spot), 'gf19', 'At the counter, within 6 ft of the sink.')
        : [];
    case 'pool-area':
      return edition >= 1971 ? [depends('gf03', 'If this pool area is outdoors, the outdoor rule counts too.')] : [];
    case 'attic':
    case 'bedroom':
    case 'living-room':
    case 'dining-room':
    case 'family-room':
    case 'recreation-room':
    case 'office':
    case 'hallway':
    case 'closet':
    case 'sunroom':
    case 'other-room':
      return [];
  }
}

function outdoorRules({ edition, gradeAccess, heightFt, dedicatedAppliance }: Spot): Ruling[] {
  if (edition < 1971) return [];
  if (edition >= 1996) {
    if (dedicatedAppliance)
      return [depends('gf05', 'A dedicated de-icing outlet that is not readily reached is excepted.')];
    return [yes('gf05')];
  }
  if (edition < 1978)
    return [yes('gf03', 'Published histories also say 1973 and 1975: the 1971 edition took effect in 1973.')];
  const note =
    'Between 1978 and 1996 it depended on direct access from grade, and from 1987 on a height of 6 ft 6 in; histories differ.';
  if (gradeAccess === false) return [];
  if (gradeAccess === undefined) return [depends('gf04', note)];
  if (edition < 1987) return [yes('gf04', note)];
  return by(within(heightFt, GRADE_REACH_FT), 'gf04', note);
}

function garageRules({ edition, dedicatedAppliance, heightFt }: Spot): Ruling[] {
  if (edition < 1978) return [];
  if (edition >= 2008) return [yes('gf08')];
  const note = 'Until 2008 outlets that were not readily reached or dedicated to an appliance were excepted.';
  if (dedicatedAppliance || (heightFt ?? 0) >= OUT_OF_REACH_FT) return [depends('gf07', note)];
  return [yes('gf07', note)];
}

function accessoryRules({ edition, gradeAccess, finished }: Spot): Ruling[] {
  if (edition < 1996) return [];
  const note = 'For buildings that are not habitable, with a floor at or below grade.';
  if (edition >= 2026)
    return finished === false ? [yes('gf09')] : [depends('gf09', 'For buildings that are not habitable.')];
  if (gradeAccess === false) return [];
  return gradeAccess && finished === false ? [yes('gf09', note)] : [depends('gf09', note)];
}

function basementRules({ edition, finished, dedicatedAppliance }: Spot): Ruling[] {
  if (edition >= 2020) return [yes('gf12')];
  if (edition < 1987 || finished === true) return [];
  if (edition < 1990)
    return [depends('gf10', 'At least one in the unfinished part; published histories also say 1990 and 1993.')];
  if (finished === undefined) return [depends('gf11', 'Before 2020 it was the unfinished part only.')];
  if (dedicatedAppliance && edition < 2008)
    return [depends('gf11', 'Until 2008 dedicated, laundry and sump outlets were excepted.')];
  return [yes('gf11')];
}

function crawlRules({ edition, dedicatedAppliance }: Spot): Ruling[] {
  if (edition < 1990) return [];
  if (dedicatedAppliance && edition < 1999) return [depends('gf13', 'Until 1999 dedicated equipment was excepted.')];
  return [yes('gf13')];
}

/** A sink near any receptacle; which sinks count has grown. */
function sinkRules(spot: Spot): Ruling[] {
  const { edition, place, sinkKind } = spot;
  if (edition < 2005 || place === 'kitchen-counter') return [];
  const near = sinkWithin(spot);
  const note = `Within 6 ft of a sink. ${measureNote(edition)}`;
  if (edition >= 2014) return by(near, 'gf22', note);
  const inKitchen = place === 'kitchen-wall' || place === 'dishwasher';
  if (edition >= 2011) return inKitchen || sinkKind === 'kitchen' ? [] : by(near, 'gf21', note);
  if (near === 'no' || inKitchen || sinkKind === 'kitchen' || sinkKind === 'other') return [];
  const counts = sinkKind !== undefined || place === 'wet-bar' || place === 'laundry-area';
  return [
    near === 'yes' && counts ? yes('gf20', note) : depends('gf20', `${note} Laundry, utility and wet-bar sinks count.`),
  ];
}

function tubRules({ edition, tubOrShowerFt }: Spot): Ruling[] {
  if (edition < 2014) return [];
  return by(within(tubOrShowerFt, TUB_REACH_FT), 'gf23', 'Within 6 ft of the outside edge of a bathtub or shower.');
}

function poolRules({ edition, place, poolFt }: Spot): Ruling[] {
  if (edition < 1971) return [];
  const matters = place === 'pool-area' || place === 'outdoors' || poolFt !== undefined;
  if (!matters) return [];
  const reach = edition >= 1984 ? 20 : 15;
  return by(within(poolFt, reach), 'gf02', `Within ${reach} ft of a pool wall; published distances differ.`);
}
