import type { Cable, Campaign, ReferenceTension } from '@strandnote/api/contract';
import { type DecisionQuestion, decide, massPerLength, tensionAt } from '@strandnote/core';
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

/**
 * The reference that a cable is compared with, by the rule of the report: of the kind agreed, not retired, for the campaign's
 * stage where there is one, the latest of those; brought to the mean chord.
 */
export function agreedReference(cable: Cable, { basis, stage }: Agreed): (ReferenceTension & { meanChordValue: number }) | null {
  const candidates = cable.references.filter(({ kind, retiredAt }) => kind === basis.referenceKind && retiredAt === null);
  const atStage = candidates.filter((candidate) => sameStage(candidate.stage, stage));
  const ranked = (atStage.length > 0 ? atStage : candidates).toSorted(
    (a, b) => (b.dated ?? '').localeCompare(a.dated ?? '') || a.id.localeCompare(b.id),
  );
  const chosen = ranked[0];
  if (!chosen) return null;
  const hung = { massPerLength: massPerLength(cable.section).value, rise: riseOf(cable) };
  return { ...chosen, meanChordValue: tensionAt(chosen.value, chosen.place, 'mean-chord', hung) };
}

/** The zone of an estimate under the basis that was agreed before the survey. */
export function decideSpan(cable: Cable, campaign: Agreed, estimate: DecisionQuestion['estimate']): SurveyDecision {
  const { basis, stage } = campaign;
  const reference = agreedReference(cable, campaign);
  const limit = (fraction: number | null) => (fraction === null || reference === null ? null : fraction * reference.meanChordValue);
  const limits = { lowerLimit: limit(basis.lowerLimit), upperLimit: limit(basis.upperLimit) };
  const otherStage =
    reference === null || sameStage(reference.stage, stage)
      ? null
      : `The reference is for the stage “${reference.stage}”, the survey for “${stage}”.`;
  const { zone, reason, toReference } = decide({
    ...limits,
    estimate,
    reference: reference?.meanChordValue ?? null,
    notComparable: otherStage,
  });
  return {
    zone,
    reason: zone === 'no-limit-agreed' ? (whyNoLimit(basis.referenceKind, reference) ?? reason) : reason,
    ...(otherStage === null ? limits : { lowerLimit: null, upperLimit: null }),
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

function whyNoLimit(kind: string | null, reference: unknown): string | null {
  if (kind === null) return 'No reference was agreed before the survey.';
  return reference === null ? 'The cable has no reference tension of the kind that was agreed.' : null;
}

/** Stages are typed by hand: capitals and spaces around do not make another stage. */
function sameStage(a: string, b: string): boolean {
  return a.trim().toLowerCase() === b.trim().toLowerCase();
}

function riseOf(cable: Cable): number {
  if (cable.lowerAnchor !== null && cable.upperAnchor !== null) return Math.max(0, cable.upperAnchor.z - cable.lowerAnchor.z);
  return cable.spans.reduce((rise, span) => rise + span.chordLength * Math.sin(span.inclination), 0);
}
