/**
 * The string with bending stiffness, hinged at both ends: the one case with a closed formula.
 */
import { assertRange } from '../errors.ts';
import { checkString, modeNumbers, type StringProperties } from './taut-string.ts';

/** Tension (N) and bending stiffness (N·m²). */
export interface TensionState {
  tension: number;
  bendingStiffness: number;
}

/**
 * Natural frequencies of a cable with hinged ends and bending stiffness.
 *
 *   f_n² = n²/(4 L² m) · (T + n²π² EI/L²)
 *
 * Sag and end fixity are neglected; see ./end-rotation and ./sag.
 *
 * @param cable length (m) and mass per length (kg/m), both > 0
 * @param state tension (N) >= 0 and bending stiffness (N·m²) >= 0
 * @param modeCount integer from 1 to 200
 * @returns frequencies (Hz), ascending, length modeCount
 * @throws EstimationError `out-of-range` naming the field
 * Source: Blevins 1979; the taut string is the limit EI → 0, the hinged beam the limit T → 0.
 */
export function stiffStringFrequencies(cable: StringProperties, state: TensionState, modeCount: number): number[] {
  checkString(cable);
  assertRange(state.tension, 'tension', 0, 1e15);
  assertRange(state.bendingStiffness, 'bendingStiffness', 0, 1e15);
  const { length, massPerLength } = cable;
  return modeNumbers(modeCount).map((n) => {
    const wavenumber = (n * Math.PI) / length;
    return (wavenumber * Math.sqrt((state.tension + state.bendingStiffness * wavenumber ** 2) / massPerLength)) / (2 * Math.PI);
  });
}
