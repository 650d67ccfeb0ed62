import type { FrozenDecision, FrozenReference, Zone } from '@strandnote/core/report-content';

/** What one span is judged by. Tensions in N at the mean chord; limits as fractions of the reference. */
export interface SpanToDecide {
  estimate: { tension: number; interval95: [number, number] } | null;
  /** Why only bounds may be given, in a sentence; null where a tension may be. */
  boundsOnly: string | null;
  notMeasuredReason: string | null;
  reference: FrozenReference | null;
  stage: string;
  basis: { referenceKind: string | null; lowerLimit: number | null; upperLimit: number | null };
}

/**
 * The zone of a span under the rule agreed before the survey: its interval against the limits, each side on its own
 * (guard bands after ILAC-G8:09/2019). Without an agreed limit, or where tension and reference cannot be compared, there
 * is no zone and the reason says why.
 */
export function decideSpan(span: SpanToDecide): FrozenDecision {
  if (span.estimate === null) return undecided('not-measured', span.notMeasuredReason ?? 'No estimate has been saved for this cable.');
  if (span.basis.referenceKind === null) return undecided('no-limit-agreed', 'No reference was agreed before the survey.');
  if (span.reference === null) return undecided('no-limit-agreed', 'The cable has no reference tension of the kind that was agreed.');
  if (!sameStage(span.reference.stage, span.stage)) {
    return undecided('not-comparable', `The reference is for the stage “${span.reference.stage}”, the survey for “${span.stage}”.`);
  }
  const compared = {
    lowerLimit: limit(span.basis.lowerLimit, span.reference),
    upperLimit: limit(span.basis.upperLimit, span.reference),
    toReference: span.estimate.tension / span.reference.meanChordValue - 1,
  };
  if (span.boundsOnly !== null) return { ...compared, zone: 'bounds-only', reason: span.boundsOnly, toReference: null };
  if (compared.lowerLimit === null && compared.upperLimit === null) {
    return { ...compared, zone: 'no-limit-agreed', reason: 'No limit was agreed before the survey.' };
  }
  const zone = worse(
    compared.lowerLimit === null ? 'within' : zoneOfSide(span.estimate, (tension) => tension - compared.lowerLimit!),
    compared.upperLimit === null ? 'within' : zoneOfSide(span.estimate, (tension) => compared.upperLimit! - tension),
  );
  return { ...compared, zone, reason: reasonOfZone[zone] };
}

type ProvenZone = 'within' | 'within-not-proven' | 'outside-not-proven' | 'outside';
const inOrder: ProvenZone[] = ['within', 'within-not-proven', 'outside-not-proven', 'outside'];
const reasonOfZone: Record<ProvenZone, string> = {
  within: 'The whole interval lies within the agreed limits.',
  'within-not-proven': 'The tension lies within the agreed limits, but its interval crosses a limit.',
  'outside-not-proven': 'The tension lies outside the agreed limits, but its interval crosses a limit.',
  outside: 'The whole interval lies outside the agreed limits.',
};

/** @param margin how far (N) a tension is on the agreed side of the limit */
function zoneOfSide(estimate: { tension: number; interval95: [number, number] }, margin: (tension: number) => number): ProvenZone {
  const [low, high] = estimate.interval95.map(margin).sort((a, b) => a - b) as [number, number];
  if (low >= 0) return 'within';
  if (high < 0) return 'outside';
  return margin(estimate.tension) >= 0 ? 'within-not-proven' : 'outside-not-proven';
}

function worse(a: ProvenZone, b: ProvenZone): ProvenZone {
  return inOrder.indexOf(a) > inOrder.indexOf(b) ? a : b;
}

function limit(fraction: number | null, reference: FrozenReference): number | null {
  return fraction === null ? null : fraction * reference.meanChordValue;
}

function undecided(zone: Zone, reason: string): FrozenDecision {
  return { zone, reason, lowerLimit: null, upperLimit: null, toReference: null };
}

function sameStage(a: string, b: string): boolean {
  return a.trim().toLowerCase() === b.trim().toLowerCase();
}
