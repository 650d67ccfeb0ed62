/**
 * The door of the forward models: picks the cheapest rung of the ladder that is exact for the cable at hand.
 */
import { type Cable, checkCable, type EndCondition } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { attachedFrequencies, type LumpedAttachment, lumpedAttachments } from './attachments.ts';
import { type EndForm, endOfFixity, endOfStiffness, frequencyOfWavenumber, wavenumber } from './end-rotation.ts';
import { sagProperties, sagStiffnessOf, sagWavenumbers } from './sag.ts';
import { stiffStringFrequencies } from './stiff-string.ts';
import { modeNumbers, tautStringFrequencies } from './taut-string.ts';

/** Tension (N), bending stiffness (N·m²) and the plane of the motion. */
export interface CableState {
  tension: number;
  /** Default: the cable's own value, else 0. */
  bendingStiffness?: number;
  /** Default in-plane; sag acts there when axial stiffness and inclination are given. */
  plane?: 'in-plane' | 'out-of-plane';
  /** Acceleration of free fall, m/s², for the sag. Default 9.80665. */
  gravity?: number;
}

/**
 * Natural frequencies of a cable whose ends are known.
 *
 * @param cable SI; ends hinged, clamped, of a rotational stiffness, or of one fixity given as a range of no width
 * @param state tension >= 0 (> 0 without bending stiffness), bending stiffness >= 0, plane
 * @param modeCount integer from 1 to 200
 * @returns frequencies (Hz), ascending, length modeCount
 * @throws EstimationError `ends-unknown`, `out-of-range`, `attachment-unknown`, naming the field
 * Source: the ladder of models in this folder.
 */
export function naturalFrequencies(cable: Cable, state: CableState, modeCount: number): number[] {
  checkCable(cable);
  modeNumbers(modeCount);
  const bendingStiffness = state.bendingStiffness ?? cable.bendingStiffness ?? 0;
  assertRange(bendingStiffness, 'bendingStiffness', 0, 1e15);
  assertRange(state.tension, 'tension', 0, 1e15, bendingStiffness === 0);
  const sagStiffness = sagOf(cable, state);
  const lumps = lumpedOf(cable);
  const { tension } = state;
  if (bendingStiffness === 0 && lumps.length === 0 && sagStiffness === 0) return tautStringFrequencies(cable, tension, modeCount);
  const ends = cable.ends ?? ['unknown', 'unknown'];
  const xi = bendingStiffness === 0 ? Number.POSITIVE_INFINITY : cable.length * Math.sqrt(tension / bendingStiffness);
  const first = knownEnd(ends[0], 'ends[0]', cable.length, bendingStiffness, xi);
  const second = knownEnd(ends[1], 'ends[1]', cable.length, bendingStiffness, xi);
  if (lumps.length > 0 || bendingStiffness === 0) {
    const { length, massPerLength } = cable;
    const attached = { length, massPerLength, tension, bendingStiffness, first, second, attachments: lumps, sagStiffness };
    return attachedFrequencies(attached, modeCount).map((omega) => omega / (2 * Math.PI));
  }
  if (sagStiffness === 0 && first.b === 0 && second.b === 0) return stiffStringFrequencies(cable, { tension, bendingStiffness }, modeCount);
  const base = bareWavenumbers(modeCount + 2, xi, first, second);
  const wanted = base.slice(0, modeCount);
  if (sagStiffness > 0) {
    const lambdaSquared = (sagStiffness * cable.length ** 3) / tension;
    sagWavenumbers(base, xi, lambdaSquared, first, second, modeCount, wanted);
  }
  return Array.from(wanted, (x) => frequencyOfWavenumber(x, cable, { tension, bendingStiffness }));
}

function bareWavenumbers(count: number, xi: number, first: EndForm, second: EndForm): Float64Array {
  const base = new Float64Array(count);
  for (let n = 1; n <= count; n++) {
    const x = wavenumber(n, xi, first, second);
    if (!(x > 0)) throw new EstimationError('not-converged', 'ends', `The frequency of mode ${n} could not be found.`);
    base[n - 1] = x;
  }
  return base;
}

/** κ² EA/L_e (N/m³) in the plane of the sag, else 0. */
function sagOf(cable: Cable, { tension, plane, gravity }: CableState): number {
  const sag = sagProperties(cable, gravity);
  return sag === null || plane === 'out-of-plane' || tension === 0 ? 0 : sagStiffnessOf(sag, cable.length, tension);
}

/** Masses and supports; a damper without a coefficient has no one frequency. */
function lumpedOf(cable: Cable): LumpedAttachment[] {
  const unknown = (cable.attachments ?? []).findIndex(({ kind }) => kind === 'damper');
  if (unknown >= 0) {
    throw new EstimationError(
      'attachment-unknown',
      `attachments[${unknown}]`,
      'With a damper use dampedFrequencies; one of unknown effect only bounds the frequencies.',
    );
  }
  return lumpedAttachments(cable);
}

/** An end in the form of the models; refuses one that is not known. */
export function knownEnd(end: EndCondition, field: string, length: number, bendingStiffness: number, xi: number): EndForm {
  // A string cannot be held against rotation.
  if (bendingStiffness === 0 || end === 'hinged') return { a: 1, b: 0 };
  if (end === 'clamped') return { a: 0, b: 1 };
  if (end !== 'unknown' && 'rotationalStiffness' in end) return endOfStiffness(end.rotationalStiffness, length, bendingStiffness);
  if (end !== 'unknown' && end.fixity[0] === end.fixity[1]) return endOfFixity(end.fixity[0], xi);
  throw new EstimationError(
    'ends-unknown',
    field,
    'Frequencies can only be predicted for known ends: choose hinged, clamped or a rotational stiffness.',
  );
}
