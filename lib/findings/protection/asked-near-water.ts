import type { PlaceKind, SinkKind } from '../vocabulary';
import { by, depends, yes, type Ruling, type Spot } from './ruling';
import { measureNote, sinkWithin, within } from './distance';

const TUB_REACH_FT = 6;
const POOL_REACH_FT = 20;
const EARLY_POOL_REACH_FT = 15;

/** The three kinds of sink that the 2005 text names. */
const NAMED_SINKS: SinkKind[] = ['laundry', 'utility', 'wet-bar'];
const FOOD_SINKS: SinkKind[] = ['wet-bar', 'kitchen'];
/** Places that a pool may be in or beside; elsewhere a wall ends the path. */
const POOLSIDE: PlaceKind[] = ['pool-area', 'outdoors', 'sunroom', 'accessory-building', 'boathouse'];

/** What the editions ask near a sink, a tub or shower, and a pool, whatever the kind of place. */
export function nearWaterRules(spot: Spot): Ruling[] {
  return [...sinkRules(spot), ...foodRules(spot), ...tubRules(spot), ...poolRules(spot)];
}

/** A sink near any receptacle; which sinks count has grown. */
function sinkRules(spot: Spot): Ruling[] {
  const { edition, place } = spot;
  if (edition < 2005 || place === 'kitchen-counter') return [];
  const near = sinkWithin(spot);
  const note = `Within 6 ft of a sink. ${measureNote(spot)}`;
  if (edition >= 2014) return by(near, 'gf22', note);

  const kind = kindOfSink(spot);
  const named = kind !== undefined && NAMED_SINKS.includes(kind) ? by(near, 'gf20', note) : [];
  if (edition >= 2011) return kind === 'kitchen' ? [] : [...named, ...by(near, 'gf21', note)];
  if (kind !== undefined || near === 'no') return named;
  return [depends('gf20', `${note} Laundry, utility and wet-bar sinks count.`)];
}

/** A sink whose kind was not told is taken for the one that belongs to the place. */
function kindOfSink({ place, sinkKind }: Spot): SinkKind | undefined {
  if (place === 'wet-bar') return 'wet-bar';
  if (sinkKind !== undefined) return sinkKind;
  if (place === 'kitchen-wall' || place === 'dishwasher') return 'kitchen';
  return place === 'laundry-area' ? 'laundry' : undefined;
}

/** Food is made there, with a sink at any distance: only some of such a room may belong to that area. */
function foodRules({ edition, place, sinkFt, sinkKind }: Spot): Ruling[] {
  if (edition < 2023) return [];
  if (place === 'wet-bar') return [yes('gf30')];
  const mayServeFood = sinkFt !== 'none' && (sinkKind === undefined || FOOD_SINKS.includes(sinkKind));
  return mayServeFood && place !== 'kitchen-counter' && place !== 'kitchen-wall'
    ? [depends('gf30', 'In an area with a sink and a fixed place for food or drink it is asked at any distance.')]
    : [];
}

function tubRules({ edition, tubOrShowerFt }: Spot): Ruling[] {
  if (edition < 2014) return [];
  return by(within(tubOrShowerFt, TUB_REACH_FT), 'gf23', 'Within 6 ft of the outside edge of a bathtub or shower.');
}

function poolRules({ edition, place, poolFt }: Spot): Ruling[] {
  if (edition < 1971) return [];
  if (poolFt === undefined && !POOLSIDE.includes(place)) return [];
  const near = within(poolFt, POOL_REACH_FT);
  if (edition >= 1984) return by(near, 'gf02', `Within ${POOL_REACH_FT} ft of a pool wall.`);
  const note = `Within ${EARLY_POOL_REACH_FT} ft of a pool wall; one published list says ${POOL_REACH_FT} ft.`;
  const surely = within(poolFt, EARLY_POOL_REACH_FT);
  return surely === 'no' && near === 'yes' ? [depends('gf02', note)] : by(surely, 'gf02', note);
}
