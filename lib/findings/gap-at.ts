import type { Gap } from './facts';
import type { Point } from './points';

export type GapKind = Gap['kind'];

/** A gap of one receptacle. Its id is kind, what it is about, and the receptacle. */
export function gapAt(point: Point, kind: GapKind, about: string, says: string, readingIds: string[] = []): Gap {
  const { id, areaId } = point.receptacle;
  return { id: `${kind}:${about}:${id}`, kind, receptacleId: id, areaId, place: point.place, says, readingIds };
}
