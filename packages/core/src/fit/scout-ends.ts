/**
 * A few pairs of ends that span what the ends of a cable may be: what is looked at before the quadrature.
 */
import type { Cable } from '../cable/cable.ts';
import { type EndNode, fixityRange, isKnownEnd } from './fixity-nodes.ts';

/** One pair where both ends are known, else both ends at the foot, the middle and the top of their ranges. */
export function scoutEnds(cable: Cable): [EndNode, EndNode][] {
  const ends = cable.ends ?? ['unknown', 'unknown'];
  const at = (end: (typeof ends)[number], u: number): EndNode => {
    const range = fixityRange(end);
    return range === null
      ? { fixity: 0, stiffness: (end as { rotationalStiffness: number }).rotationalStiffness }
      : { fixity: range[0] + u * (range[1] - range[0]), stiffness: null };
  };
  const places = ends.every(isKnownEnd) ? [0] : [0, 0.5, 1];
  return places.map((u) => [at(ends[0], u), at(ends[1], u)]);
}
