import type { Spot } from './asked';

const REACH_FT = 6;
/** A sink's rim is taken to be at most a foot wide. */
const RIM_FT = 1;
const NEW_MEASURE_EDITION = 2017;

export type Within = 'yes' | 'no' | 'depends';

/** Whether a distance is within `reach` feet; a distance that was not given depends. */
export function within(feet: number | 'none' | undefined, reach: number): Within {
  if (feet === undefined) return 'depends';
  return feet !== 'none' && feet <= reach ? 'yes' : 'no';
}

/**
 * Whether a sink is within 6 ft. Editions to 2014 measure to its outside edge; from 2017 along the path of a cord to the
 * top inside edge of the bowl. A measure to the other edge decides only where the rim cannot change the answer.
 */
export function sinkWithin({ sinkFt, measuredTo, edition }: Pick<Spot, 'sinkFt' | 'measuredTo' | 'edition'>): Within {
  if (typeof sinkFt !== 'number' || measuredTo === undefined) return within(sinkFt, REACH_FT);
  const asked = edition >= NEW_MEASURE_EDITION ? 'inside-bowl-edge' : 'outside-edge';
  if (measuredTo === asked) return within(sinkFt, REACH_FT);
  const [nearest, farthest] = asked === 'inside-bowl-edge' ? [sinkFt, sinkFt + RIM_FT] : [sinkFt - RIM_FT, sinkFt];
  if (farthest <= REACH_FT) return 'yes';
  return nearest > REACH_FT ? 'no' : 'depends';
}

export function measureNote(edition: number): string {
  if (edition >= 2020)
    return 'Measured along the path of a cord to the inside edge of the bowl; a cabinet door does not end the path.';
  if (edition >= NEW_MEASURE_EDITION)
    return 'Measured along the path of a cord to the inside edge of the bowl; a door or doorway ends the path.';
  return 'Measured to the outside edge of the sink.';
}
