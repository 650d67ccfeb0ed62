/**
 * The door of the forward models: picks the cheapest rung of the ladder that is exact for the cable at hand.
 */
import { type Cable, checkCable, type EndCondition } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { type EndForm, endOfFixity, endOfStiffness, frequencyOfWavenumber, solveWavenumber } from './end-rotation.ts';
import { stiffStringFrequencies } from './stiff-string.ts';
import { modeNumbers, tautStringFrequencies } from './taut-string.ts';

/** Tension (N), bending stiffness (N·m²) and the plane of the motion. */
export interface CableState {
  tension: number;
  /** Default: the cable's own value, else 0. */
  bendingStiffness?: number;
  /** Default in-plane; sag acts there when axial stiffness and inclination are given. */
  plane?: 'in-plane' | 'out-of-plane';
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
  const modes = modeNumbers(modeCount);
  const bendingStiffness = state.bendingStiffness ?? cable.bendingStiffness ?? 0;
  assertRange(bendingStiffness, 'bendingStiffness', 0, 1e15);
  assertRange(state.tension, 'tension', 0, 1e15, bendingStiffness === 0);
  const ends = cable.ends ?? ['unknown', 'unknown'];
  if (bendingStiffness === 0) return tautStringFrequencies(cable, state.tension, modeCount);
  if (ends[0] === 'hinged' && ends[1] === 'hinged') {
    return stiffStringFrequencies(cable, { tension: state.tension, bendingStiffness }, modeCount);
  }
  const xi = cable.length * Math.sqrt(state.tension / bendingStiffness);
  const first = knownEnd(ends[0], 'ends[0]', cable.length, bendingStiffness, xi);
  const second = knownEnd(ends[1], 'ends[1]', cable.length, bendingStiffness, xi);
  const solution = new Float64Array(4);
  return modes.map((mode) => {
    if (!solveWavenumber(mode, xi, first, second, solution)) {
      throw new EstimationError('not-converged', 'ends', `The frequency of mode ${mode} could not be found.`);
    }
    return frequencyOfWavenumber(solution[0]!, cable, { tension: state.tension, bendingStiffness });
  });
}

/** An end in the form of the models; refuses one that is not known. */
export function knownEnd(end: EndCondition, field: string, length: number, bendingStiffness: number, xi: number): EndForm {
  if (end === 'hinged') return { a: 1, b: 0 };
  if (end === 'clamped') return { a: 0, b: 1 };
  if (end !== 'unknown' && 'rotationalStiffness' in end) return endOfStiffness(end.rotationalStiffness, length, bendingStiffness);
  if (end !== 'unknown' && end.fixity[0] === end.fixity[1]) return endOfFixity(end.fixity[0], xi);
  throw new EstimationError(
    'ends-unknown',
    field,
    'Frequencies can only be predicted for known ends: choose hinged, clamped or a rotational stiffness.',
  );
}
