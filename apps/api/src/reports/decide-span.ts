import { decideAsAgreed } from '@strandnote/core';
import type { FrozenDecision, FrozenReference } from '@strandnote/core/report-content';

/** What one span is judged by. Tensions in N at the mean chord; limits as fractions of the reference. */
export interface SpanToDecide {
  estimate: { tension: number; interval95: readonly [number, number]; boundsOnly: string | null } | null;
  notMeasuredReason: string | null;
  reference: FrozenReference | null;
  stage: string;
  basis: { referenceKind: string | null; lowerLimit: number | null; upperLimit: number | null };
}

/** The zone of a span as a report freezes it; where nothing was measured, with the reason that was given and without limits. */
export function decideSpan({ estimate, notMeasuredReason, stage, basis, ...given }: SpanToDecide): FrozenDecision {
  const reference = basis.referenceKind === null ? null : given.reference;
  const { zone, reason, lowerLimit, upperLimit, toReference } = decideAsAgreed(estimate, reference, { basis, stage });
  if (zone !== 'not-measured') return { zone, reason, lowerLimit, upperLimit, toReference };
  const why = notMeasuredReason ?? 'No estimate has been saved for this cable.';
  return { zone, reason: why, lowerLimit: null, upperLimit: null, toReference };
}
