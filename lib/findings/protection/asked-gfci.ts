import { by, depends, no, yes, type Ruling, type Spot } from './ruling';
import { nearWaterRules } from './asked-near-water';
import { sinkWithin, within } from './distance';

const GRADE_REACH_FT = 6.5;
const OUT_OF_REACH_FT = 8;
const APPLIANCE_MAX_AMPS = 60;

/** What the editions ask of shock protection at a spot: its kind of place, then what stands near it. */
export function gfciRules(spot: Spot): Ruling[] {
  const { edition, volts = 120, amps = 15 } = spot;
  const isLarge = volts === 240 || amps > 20;
  // Before 2020 the list covered 125 V receptacles of 15 and 20 A alone.
  if (isLarge && edition < 2020) return vehicleRules(spot);
  const rulings = [...placeRules(spot), ...nearWaterRules(spot)];
  const scope = 'Since 2020 the list covers 125 through 250 V of any ampere rating.';
  const widened = isLarge && rulings.some(({ asked }) => asked === 'yes') ? [yes('gf27', scope)] : [];
  return [...rulings, ...widened, ...applianceRules(spot, isLarge)];
}

function applianceRules({ edition, amps = 15, dedicatedAppliance }: Spot, isLarge: boolean): Ruling[] {
  if (edition < 2023 || amps > APPLIANCE_MAX_AMPS || !(isLarge || dedicatedAppliance)) return [];
  return [depends('gf31', 'If it serves a named appliance such as a range, dryer, microwave or sump pump.')];
}

function vehicleRules({ edition, place }: Spot): Ruling[] {
  if (edition < 2017 || (place !== 'garage' && place !== 'outdoors')) return [];
  return [no('gf32', 'An outlet for an electric vehicle was asked by an interim amendment of 2017.')];
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
      return counterRules(spot);
    case 'kitchen-wall':
      return edition >= 2023 ? [yes('gf18')] : [];
    case 'dishwasher':
      return edition >= 2014 ? [yes('gf25')] : [];
    case 'laundry-area':
      return edition >= 2014 ? [yes('gf24', 'The whole laundry area since 2014; near its sink since 2005.')] : [];
    case 'wet-bar':
      return edition >= 1993 && edition < 2005
        ? by(sinkWithin(spot), 'gf19', 'At the counter, within 6 ft of the sink.')
        : [];
    case 'pool-area':
      return poolAreaRules(spot);
    case 'attic':
      return edition >= 2020
        ? [depends('gf40', 'A receptacle within 25 ft of heating or cooling equipment, for its service; from memory.')]
        : [];
    case 'sunroom':
      return dampRules(spot);
    case 'bedroom':
    case 'living-room':
    case 'dining-room':
    case 'family-room':
    case 'recreation-room':
    case 'office':
    case 'hallway':
    case 'closet':
    case 'other-room':
      return [];
  }
}

function counterRules(spot: Spot): Ruling[] {
  if (spot.edition < 1987) return [];
  if (spot.edition < 1996) return by(sinkWithin(spot), 'gf16', 'At the counter, within 6 ft of the sink.');
  const whole = yes('gf17', 'For islands published histories also say 1990.');
  return spot.edition >= 2023 ? [whole, yes('gf18')] : [whole];
}

const OUTDOOR_HISTORY =
  'The 1971 edition asked it first, in force from 1973; from 1978 to 1996 it depended on direct access from grade, and the height of 6 ft 6 in was worded in 1987. Published histories differ: 1973 and 1975 for the first, 1978, 1981 and 1987 for the height.';

function outdoorRules({ edition, gradeAccess, heightFt, dedicatedAppliance }: Spot): Ruling[] {
  if (edition < 1971) return [];
  if (edition >= 1996) {
    if (!dedicatedAppliance) return [yes('gf05', OUTDOOR_HISTORY)];
    const deIcing = depends('gf05', 'A dedicated de-icing outlet that is not readily reached is excepted.');
    return [deIcing, ...hardWiredRules(edition)];
  }
  if (edition < 1978) return [yes('gf03', OUTDOOR_HISTORY)];
  if (gradeAccess === false) return [no('gf04', OUTDOOR_HISTORY)];
  if (gradeAccess === undefined) return [depends('gf04', OUTDOOR_HISTORY)];
  const reached = within(heightFt, GRADE_REACH_FT);
  // Histories differ on the years before 1987: a height was perhaps part of it from 1978 on.
  if (edition < 1987) return [reached === 'no' ? depends('gf04', OUTDOOR_HISTORY) : yes('gf04', OUTDOOR_HISTORY)];
  return [{ asked: reached, row: 'gf04', note: OUTDOOR_HISTORY }];
}

function hardWiredRules(edition: number): Ruling[] {
  if (edition < 2020) return [];
  return edition >= 2026
    ? [depends('gf29', 'Hard-wired equipment counts to 60 A; listed air conditioning is excepted to 1 September 2026.')]
    : [depends('gf28', 'Hard-wired equipment counts to 50 A; several states delayed or deleted that.')];
}

/** A pool is outdoors, or in a damp place indoors, or neither; nobody said which. */
function poolAreaRules(spot: Spot): Ruling[] {
  const { edition } = spot;
  const note =
    'If this pool area is outdoors, the outdoor rule counts too. Spas and hydromassage tubs have rows of their own.';
  if (edition < 1971) return [];
  if (edition < 1978) return [depends('gf03', note)];
  if (edition < 1996) return [depends('gf04', note)];
  return [depends('gf05', note), ...dampRules(spot)];
}

/** Whether a place that may be damp is so, nobody said. */
function dampRules({ edition }: Spot): Ruling[] {
  return edition >= 2020 ? [depends('gf26', 'Damp and wet places indoors count since 2020.')] : [];
}

function garageRules({ edition, dedicatedAppliance, heightFt }: Spot): Ruling[] {
  if (edition < 1978) return [];
  if (edition >= 2008) return [yes('gf08')];
  const note = 'Until 2008 outlets that were not readily reached or dedicated to an appliance were excepted.';
  if (dedicatedAppliance || (heightFt ?? 0) >= OUT_OF_REACH_FT) return [depends('gf07', note)];
  return [yes('gf07', note)];
}

function accessoryRules(spot: Spot): Ruling[] {
  const { edition, gradeAccess, finished } = spot;
  if (edition < 1996) return [];
  if (edition >= 2026)
    return finished === false ? [yes('gf09')] : [depends('gf09', 'For buildings that are not habitable.')];
  const note = 'For buildings that are not habitable, with a floor at or below grade.';
  if (gradeAccess === false) return [no('gf09', note), ...dampRules(spot)];
  return gradeAccess && finished === false ? [yes('gf09', note)] : [depends('gf09', note)];
}

const BASEMENT_HISTORY = 'Published histories also say 1993: one outlet in 1987, all in 1990.';

function basementRules({ edition, finished, dedicatedAppliance }: Spot): Ruling[] {
  if (edition >= 2020) return [yes('gf12', finished === false ? BASEMENT_HISTORY : undefined)];
  if (edition < 1987) return [];
  if (finished === true) return [no(edition < 1990 ? 'gf10' : 'gf11', 'Before 2020 it was the unfinished part only.')];
  if (edition < 1990) return [depends('gf10', `At least one in the unfinished part. ${BASEMENT_HISTORY}`)];
  if (finished === undefined) return [depends('gf11', 'Before 2020 it was the unfinished part only.')];
  if (dedicatedAppliance && edition < 2008)
    return [depends('gf11', 'Until 2008 dedicated, laundry and sump outlets were excepted.')];
  return [yes('gf11', BASEMENT_HISTORY)];
}

function crawlRules({ edition, dedicatedAppliance }: Spot): Ruling[] {
  if (edition < 1990) return [];
  if (dedicatedAppliance && edition < 1999) return [depends('gf13', 'Until 1999 dedicated equipment was excepted.')];
  return [yes('gf13')];
}
