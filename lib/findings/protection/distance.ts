import type { Spot } from './ruling';

const REACH_FT = 6;
/** A sink's rim is taken to be at most a foot wide. */
const RIM_FT = 1;
const NEW_MEASURE_EDITION = 2017;

export type Within = 'yes' | 'no' | 'depends';

/** Whether a distance is within `reach` feet; a distance that was not given, or is no number, depends. */
export function within(feet: number | 'none' | undefined, reach: number): Within {
  if (feet === 'none') return 'no';
  if (feet === undefined || Number.isNaN(feet)) return 'depends';
  return feet <= reach ? 'yes' : 'no';
}

type SinkDistance = Pick<Spot, 'sinkFt' | 'measuredTo' | 'edition'>;

/**
 * Whether a sink is within 6 ft. Editions to 2014 measure to its outside edge; from 2017 along the path of a cord to the
 * top inside edge of the bowl. A measure to the other edge decides only where the rim cannot change the answer.
 */
export function sinkWithin(sink: SinkDistance): Within {
  const { sinkFt, edition } = sink;
  if (typeof sinkFt !== 'number' || !isOtherEdge(sink)) return within(sinkFt, REACH_FT);
  const [nearest, farthest] = edition >= NEW_MEASURE_EDITION ? [sinkFt, sinkFt + RIM_FT] : [sinkFt - RIM_FT, sinkFt];
  if (within(farthest, REACH_FT) === 'yes') return 'yes';
  return within(nearest, REACH_FT) === 'no' ? 'no' : 'depends';
}

/** How the edition measures, and whether it was measured so. */
export function measureNote(sink: SinkDistance): string {
  const other = isOtherEdge(sink) ? ' It was measured to the other edge.' : '';
  return `${howMeasured(sink.edition)}${other}`;
}

function isOtherEdge({ sinkFt, measuredTo, edition }: SinkDistance): boolean {
  if (typeof sinkFt !== 'number' || measuredTo === undefined) return false;
  return (measuredTo === 'inside-bowl-edge') !== edition >= NEW_MEASURE_EDITION;
}

function howMeasured(edition: number): string {
  if (edition >= 2020)
    return 'Measured along the path of a cord to the inside edge of the bowl; a cabinet door does not end the path.';
  if (edition >= NEW_MEASURE_EDITION)
    return 'Measured along the path of a cord to the inside edge of the bowl; a door or doorway ends the path.';
  return 'Measured to the outside edge of the sink.';
}
