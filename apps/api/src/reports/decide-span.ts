import { decide } from '@strandnote/core';
import type { FrozenDecision, FrozenReference } from '@strandnote/core/report-content';

/** What one span is judged by. Tensions in N at the mean chord; limits as fractions of the reference. */
export interface SpanToDecide {
  estimate: { tension: number; interval95: readonly [number, number]; boundsOnly: string | null } | null;
  notMeasuredReason: string | null;
  reference: FrozenReference | null;
  stage: string;
  basis: { referenceKind: string | null; lowerLimit: number | null; upperLimit: number | null };
}

/**
 * The zone of a span under the rule that was agreed before the survey, as a report freezes it: the limits in newtons from the
 * fractions agreed, and a reason in the words of this cable where there is no zone.
 */
export function decideSpan({ estimate, notMeasuredReason, stage, basis, ...given }: SpanToDecide): FrozenDecision {
  const reference = basis.referenceKind === null ? null : given.reference;
  const limit = (fraction: number | null) => (fraction === null || reference === null ? null : fraction * reference.meanChordValue);
  const limits = { lowerLimit: limit(basis.lowerLimit), upperLimit: limit(basis.upperLimit) };
  const { zone, reason, toReference } = decide({
    ...limits,
    estimate,
    reference: reference?.meanChordValue ?? null,
    notComparable: reference === null ? null : otherStage(reference.stage, stage),
  });
  const decided = { zone, toReference, ...(zone === 'not-measured' || zone === 'not-comparable' ? noLimits : limits) };
  if (zone === 'not-measured') return { ...decided, reason: notMeasuredReason ?? 'No estimate has been saved for this cable.' };
  if (zone === 'no-limit-agreed') return { ...decided, reason: whyNoLimit(basis.referenceKind, reference) ?? reason };
  return { ...decided, reason };
}

const noLimits = { lowerLimit: null, upperLimit: null };

function otherStage(ofReference: string, ofSurvey: string): string | null {
  if (sameStage(ofReference, ofSurvey)) return null;
  return `The reference is for the stage “${ofReference}”, the survey for “${ofSurvey}”.`;
}

function whyNoLimit(kind: string | null, reference: FrozenReference | null): string | null {
  if (kind === null) return 'No reference was agreed before the survey.';
  return reference === null ? 'The cable has no reference tension of the kind that was agreed.' : null;
}

/** Stages are typed by hand: capitals and spaces around do not make another stage. */
export function sameStage(a: string, b: string): boolean {
  return a.trim().toLowerCase() === b.trim().toLowerCase();
}
