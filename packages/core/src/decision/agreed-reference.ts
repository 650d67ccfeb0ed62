/**
 * What a cable is compared with, and how it stands, by the basis that was agreed before the survey. Phone, office and report use
 * these same functions, so that a zone on site is the zone of the report.
 */
import { massPerLength, type SurveyedSection } from '../cable/surveyed-span.ts';
import { type Decision, type DecisionQuestion, decide, type TensionPlace, tensionAt } from './decide.ts';

/** Agreed before the work: kind of reference, limits as fractions of it (null on a side without one), and the construction stage. */
export interface AgreedBasis {
  stage: string;
  basis: { referenceKind: string | null; lowerLimit: number | null; upperLimit: number | null };
}

/** A tension that a cable may be compared with (N). */
export interface StatedReference {
  id: string;
  kind: string;
  stage: string;
  place: TensionPlace;
  value: number;
  dated: string | null;
  retiredAt: string | null;
}

/** The cable that a reference hangs on: its section, its anchors (m) where they are known, its chords (m) and inclinations (rad). */
export interface HungCable {
  section: SurveyedSection;
  lowerAnchor: { z: number } | null;
  upperAnchor: { z: number } | null;
  spans: readonly { chordLength: number; inclination: number }[];
}

/** How a span stands: the decision, and the limits (N) that it was taken by; null where tension and reference are not compared. */
export interface AgreedDecision extends Decision {
  lowerLimit: number | null;
  upperLimit: number | null;
}

/**
 * The reference tension that a cable is compared with: of the kind agreed, not retired, for the campaign's stage where there is one,
 * and the latest of those.
 *
 * @param references all that are stated for the cable
 * @param agreed kind and stage
 * @returns null where none of the kind is stated
 */
export function chooseReference<Reference extends StatedReference>(
  references: readonly Reference[],
  agreed: AgreedBasis,
): Reference | null {
  const candidates = references.filter(({ kind, retiredAt }) => kind === agreed.basis.referenceKind && retiredAt === null);
  const atStage = candidates.filter(({ stage }) => isSameStage(stage, agreed.stage));
  const ranked = (atStage.length > 0 ? atStage : candidates).toSorted(
    (a, b) => (b.dated ?? '').localeCompare(a.dated ?? '') || a.id.localeCompare(b.id),
  );
  return ranked[0] ?? null;
}

/**
 * A stated reference brought to the mean chord.
 *
 * @param reference tension (N) and its place on the cable
 * @param cable that it hangs on; its rise comes from the chords where the anchors have no coordinates
 * @returns N
 * Source: `tensionAt` in ./decide.
 */
export function referenceAtMeanChord(reference: Pick<StatedReference, 'value' | 'place'>, cable: HungCable): number {
  const { lowerAnchor, upperAnchor } = cable;
  const rise =
    lowerAnchor !== null && upperAnchor !== null
      ? Math.max(0, upperAnchor.z - lowerAnchor.z)
      : cable.spans.reduce((sum, { chordLength, inclination }) => sum + chordLength * Math.sin(inclination), 0);
  return tensionAt(reference.value, reference.place, 'mean-chord', { massPerLength: massPerLength(cable.section).value, rise });
}

/**
 * The zone of an estimate under the basis agreed, with a reason in the words of this cable where there is no zone.
 *
 * @param estimate null where nothing was measured
 * @param reference the chosen one, its value at the mean chord (N) and its stage; null where there is none
 * @param agreed limits as fractions of the reference, and the stage of the survey
 * @returns zone, reason and limits in N
 * Source: ILAC-G8:09/2019 (guard bands), see ./decide.
 */
export function decideAsAgreed(
  estimate: DecisionQuestion['estimate'],
  reference: { meanChordValue: number; stage: string } | null,
  { basis, stage }: AgreedBasis,
): AgreedDecision {
  const limit = (fraction: number | null) => (fraction === null || reference === null ? null : fraction * reference.meanChordValue);
  const limits = { lowerLimit: limit(basis.lowerLimit), upperLimit: limit(basis.upperLimit) };
  const otherStage =
    reference === null || isSameStage(reference.stage, stage)
      ? null
      : `The reference is for the stage “${reference.stage}”, the survey for “${stage}”.`;
  const decision = decide({ ...limits, estimate, reference: reference?.meanChordValue ?? null, notComparable: otherStage });
  const reason = decision.zone === 'no-limit-agreed' ? (whyNoLimit(basis, reference) ?? decision.reason) : decision.reason;
  return { ...decision, reason, ...(otherStage === null ? limits : { lowerLimit: null, upperLimit: null }) };
}

function whyNoLimit({ referenceKind }: AgreedBasis['basis'], reference: object | null): string | null {
  if (referenceKind === null) return 'No reference was agreed before the survey.';
  return reference === null ? 'The cable has no reference tension of the kind that was agreed.' : null;
}

/** Stages are typed by hand: capitals and spaces around do not make another stage. */
function isSameStage(a: string, b: string): boolean {
  return a.trim().toLowerCase() === b.trim().toLowerCase();
}
