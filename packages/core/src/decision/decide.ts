/**
 * An interval against limits that were agreed before the survey.
 *
 * Numbers and zone, never "safe": each side is within, within but not proven, outside but not proven, or outside, by the
 * whole interval and not by the tension alone. There is no default limit; where there is nothing to decide by, the answer
 * says why.
 *
 * Source: guard bands in the manner of ILAC-G8:09/2019.
 */
import { standardGravity } from '../cable/cable.ts';
import { assertRange } from '../errors.ts';

/** Zones that an interval can lie in. */
export type ProvenZone = 'within' | 'within-not-proven' | 'outside-not-proven' | 'outside';

/** Zones, and why none is given where none is. */
export type DecisionZone = ProvenZone | 'bounds-only' | 'no-limit-agreed' | 'not-comparable' | 'not-measured';

/** What is decided, and by what. Tensions in N, at one place of the cable. */
export interface DecisionQuestion {
  /** null: not measured. */
  estimate: { tension: number; interval95: readonly [number, number]; boundsOnly: string | null } | null;
  /** N; null on a side without an agreed limit. */
  lowerLimit: number | null;
  upperLimit: number | null;
  /** N; null without a reference. */
  reference: number | null;
  /** Why tension and reference cannot be compared (stage, traffic or temperature differ), in a sentence; null when they can. */
  notComparable: string | null;
}

/** The answer. */
export interface Decision {
  zone: DecisionZone;
  /** Of each side alone; null where that side has no limit or nothing was decided. */
  lower: ProvenZone | null;
  upper: ProvenZone | null;
  reason: string;
  /** Tension over the reference, minus one; null where they are not compared. */
  toReference: number | null;
}

const worstLast: readonly ProvenZone[] = ['within', 'within-not-proven', 'outside-not-proven', 'outside'];
const reasons: Record<ProvenZone, string> = {
  within: 'The whole interval lies within the agreed limits.',
  'within-not-proven': 'The tension lies within the agreed limits, but its interval crosses a limit.',
  'outside-not-proven': 'The tension lies outside the agreed limits, but its interval crosses a limit.',
  outside: 'The whole interval lies outside the agreed limits.',
};

/**
 * Zone of an estimate against agreed limits.
 *
 * @param question estimate, limits and reference (N)
 * @returns zone of each side and overall (the worse one), the reason in a sentence, and the ratio to the reference
 * Source: ILAC-G8:09/2019 (guard bands).
 */
export function decide(question: DecisionQuestion): Decision {
  const { estimate, lowerLimit, upperLimit, reference, notComparable } = question;
  const undecided = (zone: DecisionZone, reason: string, toReference: number | null = null): Decision => ({
    zone,
    lower: null,
    upper: null,
    reason,
    toReference,
  });
  if (estimate === null) return undecided('not-measured', 'This cable was not measured.');
  if (notComparable !== null) return undecided('not-comparable', notComparable);
  if (estimate.boundsOnly !== null) return undecided('bounds-only', estimate.boundsOnly);
  const toReference = reference === null ? null : estimate.tension / reference - 1;
  if (lowerLimit === null && upperLimit === null) {
    return undecided('no-limit-agreed', 'No limit was agreed before the survey.', toReference);
  }
  const lower = lowerLimit === null ? null : zoneOfSide(estimate, (tension) => tension - lowerLimit);
  const upper = upperLimit === null ? null : zoneOfSide(estimate, (tension) => upperLimit - tension);
  const zone = worse(lower ?? 'within', upper ?? 'within');
  return { zone, lower, upper, reason: reasons[zone], toReference };
}

function worse(a: ProvenZone, b: ProvenZone): ProvenZone {
  return worstLast.indexOf(a) > worstLast.indexOf(b) ? a : b;
}

/** @param margin how far (N) a tension lies on the agreed side */
function zoneOfSide(estimate: { tension: number; interval95: readonly [number, number] }, margin: (tension: number) => number): ProvenZone {
  const ends = estimate.interval95.map(margin);
  if (Math.min(...ends) >= 0) return 'within';
  if (Math.max(...ends) < 0) return 'outside';
  return margin(estimate.tension) >= 0 ? 'within-not-proven' : 'outside-not-proven';
}

/**
 * Whether any tension could ever be "within" with the uncertainty expected: said while planning, before anybody goes out.
 *
 * @param expandedUncertainty U (N) expected, >= 0
 * @param lowerLimit N, null on a side without a limit
 * @param upperLimit N, null likewise
 * @returns false when the interval is wider than the room between the limits
 * @throws EstimationError `out-of-range`
 */
export function canBeProven(expandedUncertainty: number, lowerLimit: number | null, upperLimit: number | null): boolean {
  assertRange(expandedUncertainty, 'expandedUncertainty', 0, 1e15);
  if (lowerLimit === null || upperLimit === null) return true;
  return upperLimit - lowerLimit >= 2 * expandedUncertainty;
}

/** Where on a cable a tension holds. */
export type TensionPlace = 'mean-chord' | 'lower-end' | 'upper-end';

/**
 * Tension brought from one place of a cable to another: along an inclined cable it grows by the weight of the cable below.
 *
 *   T_end ≈ T ± m g Δh/2
 *
 * @param tension N, where `from` says
 * @param from where it holds
 * @param to where it is wanted
 * @param cable mass per length (kg/m) and rise of the upper end above the lower (m)
 * @returns N
 * @throws EstimationError `out-of-range` naming the field
 * Source: equilibrium along the chord, e.g. Irvine 1981.
 */
export function tensionAt(
  tension: number,
  from: TensionPlace,
  to: TensionPlace,
  cable: { massPerLength: number; rise: number },
  gravity = standardGravity,
): number {
  assertRange(tension, 'tension', -1e15, 1e15);
  assertRange(cable.massPerLength, 'massPerLength', 0, 1e6);
  assertRange(cable.rise, 'rise', 0, 1e5);
  const half = (cable.massPerLength * gravity * cable.rise) / 2;
  const aboveMean: Record<TensionPlace, number> = { 'mean-chord': 0, 'lower-end': -half, 'upper-end': half };
  return tension - aboveMean[from] + aboveMean[to];
}
