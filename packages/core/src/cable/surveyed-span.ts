/**
 * From the registry and the visit to the cable that the fit sees.
 *
 * A span's free length, mass, bending-stiffness bounds and ends follow from what drawings, suppliers and the visit say of
 * it, and their uncertainties from where each value comes from. Phone and server call this one function, so that both fit
 * the same cable.
 */
import { EstimationError } from '../errors.ts';
import type { Attachment, Cable, EndCondition } from './cable.ts';
import { defaultRelativeUncertainty, type PropertySource } from './property-source.ts';

/** What a metre of the cable is made of (kg/m, m², Pa, N·m²). */
export interface SurveyedSection {
  steelArea: number;
  modulus: number;
  steelMass: number;
  steelMassSource: PropertySource;
  sheathMass: number;
  groutMass: number;
  addedMassSource: PropertySource;
  /** Standard uncertainty of the whole mass as a fraction; null takes it from the sources. */
  massRelativeUncertainty: number | null;
  bendingStiffnessLow: number;
  bendingStiffnessHigh: number;
}

export type SurveyedEnd =
  | { kind: 'unknown' | 'hinged' | 'clamped' | 'socket' | 'fork-in-plane' | 'fork-across' | 'guide-bushing' }
  | { kind: 'fixity'; low: number; high: number }
  | { kind: 'stiffness'; rotationalStiffness: number };

/** Chord and deductions (m) with tolerances (m, half-width of a rectangular distribution), inclination (rad). */
export interface SurveyedSpan {
  chordLength: number;
  chordLengthTolerance: number;
  lowerDeduction: number;
  lowerDeductionTolerance: number;
  upperDeduction: number;
  upperDeductionTolerance: number;
  inclination: number;
  lowerEnd: SurveyedEnd;
  upperEnd: SurveyedEnd;
  /** Distance of a damper from its end (m); null where none is fitted. */
  damperPosition: number | null;
}

type DamperState = 'none' | 'connected' | 'disconnected' | 'locked' | 'leaking';
/** What was found at the visit. */
export interface SurveyedVisit {
  lowerDamperState: DamperState;
  upperDamperState: DamperState;
  crossTied: boolean;
}

/**
 * Fixity that the words of a drawing stand for. Common practice, without a published source; editable by giving a range.
 */
export const fixityOfDetail: Record<'socket' | 'fork-in-plane' | 'fork-across' | 'guide-bushing', [number, number]> = {
  socket: [0.7, 1],
  'fork-in-plane': [0, 0.3],
  'fork-across': [0.7, 1],
  'guide-bushing': [0.5, 1],
};

/**
 * Free vibrating length of a span and its standard uncertainty.
 *
 * Three rectangular tolerances combine to u² = Σ tolerance²/3 (JCGM 100:2008, 4.3.7).
 *
 * @param span chord, deductions and their tolerances (m)
 * @returns length and standard uncertainty (m)
 * @throws EstimationError `out-of-range` on `chordLength` when the deductions leave no length
 */
export function freeLength(span: SurveyedSpan): { length: number; standardUncertainty: number } {
  const length = span.chordLength - span.lowerDeduction - span.upperDeduction;
  if (!(length > 0)) {
    throw new EstimationError(
      'out-of-range',
      'chordLength',
      'The deductions leave no free length: the chord must be longer than both together.',
    );
  }
  const tolerances = [span.chordLengthTolerance, span.lowerDeductionTolerance, span.upperDeductionTolerance];
  return { length, standardUncertainty: Math.sqrt(tolerances.reduce((sum, tolerance) => sum + tolerance ** 2 / 3, 0)) };
}

/**
 * Mass per length of a section and its relative standard uncertainty.
 *
 * Steel and added mass (sheath, grout) carry the uncertainty of their own sources; grout cannot be seen, so that a grouted
 * section is never better than 5 % (common practice).
 *
 * @param section masses (kg/m) with sources
 * @returns mass per length (kg/m) and its relative standard uncertainty
 */
export function massPerLength(section: SurveyedSection): { value: number; relativeUncertainty: number } {
  const added = section.sheathMass + section.groutMass;
  const value = section.steelMass + added;
  if (section.massRelativeUncertainty !== null) return { value, relativeUncertainty: section.massRelativeUncertainty };
  const parts = [
    section.steelMass * defaultRelativeUncertainty(section.steelMassSource),
    added * defaultRelativeUncertainty(section.addedMassSource),
  ];
  const combined = Math.hypot(...parts) / value;
  return { value, relativeUncertainty: section.groutMass > 0 ? Math.max(combined, groutedUncertainty) : combined };
}
const groutedUncertainty = 0.05;

/**
 * The cable that the fit sees.
 *
 * @param section what a metre is made of
 * @param span geometry and ends
 * @param visit damper states and cross-tie found on the day
 * @returns a cable with uncertainties, bounds, ends and the dampers that act
 * @throws EstimationError `cross-tied` when the cable is tied to others, since it does not vibrate as one cable then;
 *   `damper-position-missing` when a damper acts whose place is not known; `out-of-range` from {@link freeLength}
 */
export function surveyedCable(section: SurveyedSection, span: SurveyedSpan, visit: SurveyedVisit): Cable {
  if (visit.crossTied) {
    throw new EstimationError(
      'cross-tied',
      'crossTied',
      'A cross-tied cable does not vibrate on its own, so its tension cannot be estimated as one cable.',
    );
  }
  const { length, standardUncertainty } = freeLength(span);
  const mass = massPerLength(section);
  return {
    length,
    massPerLength: mass.value,
    bendingStiffnessBounds: [section.bendingStiffnessLow, section.bendingStiffnessHigh],
    axialStiffness: section.modulus * section.steelArea,
    inclination: span.inclination,
    ends: [endCondition(span.lowerEnd), endCondition(span.upperEnd)],
    attachments: actingDampers(span, visit, length),
    relativeUncertainty: { length: standardUncertainty / length, massPerLength: mass.relativeUncertainty },
  };
}

function endCondition(end: SurveyedEnd): EndCondition {
  switch (end.kind) {
    case 'unknown':
    case 'hinged':
    case 'clamped':
      return end.kind;
    case 'fixity':
      return { fixity: [end.low, end.high] };
    case 'stiffness':
      return { rotationalStiffness: end.rotationalStiffness };
    default:
      return { fixity: fixityOfDetail[end.kind] };
  }
}

/** A damper that is connected, locked or leaking acts somewhere between not at all and as a support; how much is not known. */
function actingDampers(span: SurveyedSpan, visit: SurveyedVisit, length: number): Attachment[] {
  const acts = (state: DamperState) => state === 'connected' || state === 'locked' || state === 'leaking';
  const ends = [
    { field: 'lowerDamperState', state: visit.lowerDamperState, place: (distance: number) => distance },
    { field: 'upperDamperState', state: visit.upperDamperState, place: (distance: number) => length - distance },
  ];
  return ends
    .filter(({ state }) => acts(state))
    .map(({ field, place }) => {
      if (span.damperPosition === null) {
        throw new EstimationError(
          'damper-position-missing',
          field,
          'A damper acts here, but its distance from the end is not given. Enter it with the cable.',
        );
      }
      return { kind: 'damper', position: place(span.damperPosition) };
    });
}
