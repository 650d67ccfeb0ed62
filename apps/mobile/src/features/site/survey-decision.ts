import type { Cable, Campaign, ReferenceTension } from '@strandnote/api/contract';
import { chooseReference, type DecisionQuestion, decideAsAgreed, referenceAtMeanChord } from '@strandnote/core';
import type { Zone } from '@strandnote/core/report-content';

type Agreed = Pick<Campaign, 'basis' | 'stage'>;

/** How a span stands against what was agreed, as the report will freeze it. Tensions in N at the mean chord. */
export interface SurveyDecision {
  zone: Zone;
  reason: string;
  lowerLimit: number | null;
  upperLimit: number | null;
  reference: number | null;
  referenceKind: ReferenceTension['kind'] | null;
  /** Tension over the reference, minus one. */
  toReference: number | null;
}

/** The reference that a cable is compared with, brought to the mean chord. */
export function agreedReference(cable: Cable, agreed: Agreed): (ReferenceTension & { meanChordValue: number }) | null {
  const chosen = chooseReference(cable.references, agreed);
  return chosen && { ...chosen, meanChordValue: referenceAtMeanChord(chosen, cable) };
}

/** The zone of an estimate under the basis that was agreed before the survey. */
export function decideSpan(cable: Cable, campaign: Agreed, estimate: DecisionQuestion['estimate']): SurveyDecision {
  const reference = agreedReference(cable, campaign);
  const { zone, reason, lowerLimit, upperLimit, toReference } = decideAsAgreed(estimate, reference, campaign);
  return {
    zone,
    reason,
    lowerLimit,
    upperLimit,
    reference: reference?.meanChordValue ?? null,
    referenceKind: reference?.kind ?? null,
    toReference,
  };
}

/** "design ±5 %", "design −5 % to +8 %", "design, no limit agreed". */
export function agreedInWords({ basis }: Agreed, words: Record<ReferenceTension['kind'], string>): string {
  if (basis.referenceKind === null) return 'no reference agreed';
  const name = words[basis.referenceKind];
  const [below, above] = [basis.lowerLimit, basis.upperLimit].map((limit) => (limit === null ? null : percent(Math.abs(limit - 1))));
  if (below === null && above === null) return `${name}, no limit agreed`;
  if (below === above) return `${name} ±${below} %`;
  if (below === null) return `${name}, at most +${above} %`;
  if (above === null) return `${name}, at least \u2212${below} %`;
  return `${name} \u2212${below} % to +${above} %`;
}

function percent(share: number): string {
  return String(Number((100 * share).toPrecision(3)));
}
