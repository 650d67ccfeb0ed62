/**
 * The cable that the models and the fit see, and the checks at their doors.
 */
import { assertFinite, assertRange, EstimationError } from '../errors.ts';

/** Standard acceleration of free fall (m/s²), exact by convention (CGPM 1901). */
export const standardGravity = 9.80665;

/** How an end is held against rotation. Fixity η is s/(1+s) with s = k √(EI/T)/EI: 0 hinged, 1 clamped. */
export type EndCondition =
  | 'hinged'
  | 'clamped'
  | 'unknown'
  /** Range of fixity, each from 0 to 1. */
  | { fixity: [number, number] }
  /** N·m/rad */
  | { rotationalStiffness: number };

/** Something on the cable between its ends; positions in m from the first end. */
export type Attachment =
  /** Lumped mass in kg. */
  | { kind: 'mass'; position: number; mass: number }
  /** Elastic support across the cable in N/m. */
  | { kind: 'support'; position: number; stiffness: number }
  /** Viscous damper in N·s/m; without a coefficient it may act as anything from free to locked. */
  | { kind: 'damper'; position: number; coefficient?: number };

/** Relative standard uncertainties (1-sigma) as fractions; what is left out is assumed and said so. */
export interface CableUncertainty {
  length?: number;
  massPerLength?: number;
  bendingStiffness?: number;
  axialStiffness?: number;
}

/** One vibrating length. */
export interface Cable {
  /** Free vibrating length, m. */
  length: number;
  /** Everything that moves with the cable, kg/m. */
  massPerLength: number;
  /** N·m², best value; its uncertainty is `relativeUncertainty.bendingStiffness`. */
  bendingStiffness?: number;
  /** N·m², bounds between which ln EI is uniform; used unless a value with its uncertainty is given. */
  bendingStiffnessBounds?: [number, number];
  /** EA in N; with the inclination it brings sag into play. */
  axialStiffness?: number;
  /** Of the chord from the horizontal, rad. */
  inclination?: number;
  /** Default both 'unknown'. */
  ends?: [EndCondition, EndCondition];
  attachments?: Attachment[];
  relativeUncertainty?: CableUncertainty;
}

/** A natural frequency with its number. */
export interface ModalPeak {
  mode: number;
  /** Hz */
  frequency: number;
  /** Hz, 1-sigma */
  standardUncertainty?: number;
  /** Default in-plane. */
  plane?: 'in-plane' | 'out-of-plane';
}

/**
 * From the thinnest wire in a laboratory to more than any structure holds (m, kg/m, N·m², Hz): beyond, it is a typing error,
 * and the arithmetic stays far from its limits.
 */
const physical = {
  length: [0.01, 1e5],
  massPerLength: [1e-6, 1e6],
  bendingStiffness: [1e-9, 1e12],
  frequency: [1e-4, 1e6],
} as const;

/** Highest mode number taken: beyond it a number is a typing error, and the work of a fit stays bounded. */
export const highestMode = 200;

/**
 * Checks a cable; silent when every value lies in its physical range.
 *
 * @param cable what to check (SI)
 * @throws EstimationError `not-finite`, `out-of-range`, `missing`, `attachment-outside`, naming the field
 */
export function checkCable(cable: Cable): void {
  assertRange(cable.length, 'length', physical.length[0], physical.length[1]);
  assertRange(cable.massPerLength, 'massPerLength', physical.massPerLength[0], physical.massPerLength[1]);
  // 0 is an answer: a string.
  if (cable.bendingStiffness !== undefined && cable.bendingStiffness !== 0) {
    assertRange(cable.bendingStiffness, 'bendingStiffness', physical.bendingStiffness[0], physical.bendingStiffness[1]);
  }
  if (cable.bendingStiffnessBounds !== undefined) checkBounds(cable.bendingStiffnessBounds);
  if (cable.axialStiffness !== undefined) assertRange(cable.axialStiffness, 'axialStiffness', 0, 1e18, true);
  if (cable.inclination !== undefined) assertRange(cable.inclination, 'inclination', -Math.PI / 2, Math.PI / 2);
  if (cable.ends !== undefined) {
    if (!Array.isArray(cable.ends) || cable.ends.length !== 2) throw new EstimationError('missing', 'ends', 'A cable has two ends.');
    cable.ends.forEach((end, index) => {
      checkEnd(end, `ends[${index}]`);
    });
  }
  cable.attachments?.forEach((attachment, index) => {
    checkAttachment(attachment, cable.length, `attachments[${index}]`);
  });
  for (const name of ['length', 'massPerLength', 'axialStiffness'] as const) {
    const value = cable.relativeUncertainty?.[name];
    if (value !== undefined) assertRange(value, `relativeUncertainty.${name}`, 0, 0.5);
  }
  const bending = cable.relativeUncertainty?.bendingStiffness;
  if (bending !== undefined) assertRange(bending, 'relativeUncertainty.bendingStiffness', 0, 5);
}

function checkBounds(bounds: [number, number]): void {
  const field = 'bendingStiffnessBounds';
  if (!Array.isArray(bounds) || bounds.length !== 2) throw new EstimationError('missing', field, 'Bending stiffness needs two bounds.');
  for (const index of [0, 1] as const)
    assertRange(bounds[index], `${field}[${index}]`, physical.bendingStiffness[0], physical.bendingStiffness[1]);
  if (bounds[1] < bounds[0]) {
    throw new EstimationError('out-of-range', field, 'The upper bound of bending stiffness must not lie below the lower one.');
  }
}

function checkEnd(end: EndCondition, field: string): void {
  if (end === 'hinged' || end === 'clamped' || end === 'unknown') return;
  if (typeof end === 'object' && end !== null && 'fixity' in end) {
    if (!Array.isArray(end.fixity)) throw new EstimationError('missing', `${field}.fixity`, 'A range of fixity needs two numbers.');
    assertRange(end.fixity[0], `${field}.fixity[0]`, 0, 1);
    assertRange(end.fixity[1], `${field}.fixity[1]`, 0, 1);
    if (end.fixity[1] < end.fixity[0]) {
      throw new EstimationError('out-of-range', `${field}.fixity`, 'The range of fixity must run from its lower to its higher value.');
    }
    return;
  }
  if (typeof end === 'object' && end !== null && 'rotationalStiffness' in end) {
    assertRange(end.rotationalStiffness, `${field}.rotationalStiffness`, 0, 1e15);
    return;
  }
  throw new EstimationError('missing', field, 'An end is hinged, clamped, unknown, a range of fixity or a rotational stiffness.');
}

function checkAttachment(attachment: Attachment, length: number, field: string): void {
  assertFinite(attachment.position, `${field}.position`);
  if (attachment.position <= 0 || attachment.position >= length) {
    throw new EstimationError(
      'attachment-outside',
      `${field}.position`,
      `An attachment must lie between the ends, from 0 to ${length} m, and it is at ${attachment.position} m.`,
    );
  }
  if (attachment.kind === 'mass') assertRange(attachment.mass, `${field}.mass`, 0, 1e9);
  else if (attachment.kind === 'support') assertRange(attachment.stiffness, `${field}.stiffness`, 0, 1e15);
  else if (attachment.kind !== 'damper')
    throw new EstimationError('missing', `${field}.kind`, 'An attachment is a mass, a support or a damper.');
  else if (attachment.coefficient !== undefined) assertRange(attachment.coefficient, `${field}.coefficient`, 0, 1e12);
}

/**
 * Checks modal peaks: numbers are positive integers, none twice in a plane, and frequencies rise with the mode number.
 *
 * @param peaks frequencies in Hz, any order
 * @throws EstimationError `no-peaks`, `mode-invalid`, `mode-repeated`, `frequencies-not-increasing`, `not-finite`, `out-of-range`
 */
export function checkPeaks(peaks: readonly ModalPeak[]): void {
  if (!Array.isArray(peaks) || peaks.length === 0) throw new EstimationError('no-peaks', 'peaks', 'Enter at least one natural frequency.');
  if (peaks.length > 2 * highestMode) throw new EstimationError('out-of-range', 'peaks', `At most ${2 * highestMode} peaks are taken.`);
  peaks.forEach((peak, index) => {
    if (!Number.isInteger(peak.mode) || peak.mode < 1 || peak.mode > highestMode) {
      throw new EstimationError(
        'mode-invalid',
        `peaks[${index}].mode`,
        `A mode number is a whole number from 1 to ${highestMode}, and this is ${peak.mode}.`,
      );
    }
    assertRange(peak.frequency, `peaks[${index}].frequency`, physical.frequency[0], physical.frequency[1]);
    if (peak.standardUncertainty !== undefined) {
      assertRange(peak.standardUncertainty, `peaks[${index}].standardUncertainty`, 1e-9 * peak.frequency, peak.frequency);
    }
  });
  checkOrder(peaks, 'in-plane');
  checkOrder(peaks, 'out-of-plane');
}

function checkOrder(peaks: readonly ModalPeak[], plane: 'in-plane' | 'out-of-plane'): void {
  const ordered = peaks
    .map((peak, index) => ({ ...peak, index }))
    .filter((peak) => (peak.plane ?? 'in-plane') === plane)
    .sort((a, b) => a.mode - b.mode || a.index - b.index);
  for (let i = 1; i < ordered.length; i++) {
    const [below, above] = [ordered[i - 1]!, ordered[i]!];
    if (below.mode === above.mode) {
      throw new EstimationError('mode-repeated', `peaks[${above.index}].mode`, `Mode ${above.mode} is entered twice; keep one of them.`);
    }
    if (above.frequency <= below.frequency) {
      throw new EstimationError(
        'frequencies-not-increasing',
        `peaks[${above.index}].frequency`,
        `Mode ${above.mode} (${above.frequency} Hz) must lie above mode ${below.mode} (${below.frequency} Hz).`,
      );
    }
  }
}
