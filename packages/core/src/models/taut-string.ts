/**
 * The ideal string: no bending, no sag, nothing attached.
 */
import { assertRange, EstimationError } from '../errors.ts';

/** Length (m) and mass per length (kg/m). */
export interface StringProperties {
  length: number;
  massPerLength: number;
}

/**
 * Natural frequencies of a taut string.
 *
 *   f_n = n/(2L) √(T/m)
 *
 * @param cable length (m) and mass per length (kg/m), both > 0
 * @param tension N, > 0
 * @param modeCount integer from 1 to 200
 * @returns frequencies (Hz), ascending, length modeCount
 * @throws EstimationError `out-of-range` naming the field
 * Source: W. T. Thomson, Vibration Theory and Applications, art. 8.2.
 */
export function tautStringFrequencies(cable: StringProperties, tension: number, modeCount: number): number[] {
  checkString(cable);
  assertRange(tension, 'tension', 0, 1e15, true);
  const fundamental = Math.sqrt(tension / cable.massPerLength) / (2 * cable.length);
  return modeNumbers(modeCount).map((n) => n * fundamental);
}

/**
 * Tension of a taut string from one of its frequencies: T = 4 m L² (f/n)².
 *
 * @param cable length (m) and mass per length (kg/m), both > 0
 * @param frequency Hz, > 0
 * @param mode its number, integer >= 1
 * @returns N
 * @throws EstimationError `out-of-range` naming the field
 * Source: W. T. Thomson, Vibration Theory and Applications, art. 8.2.
 */
export function tautStringTension(cable: StringProperties, frequency: number, mode: number): number {
  checkString(cable);
  assertRange(frequency, 'frequency', 0, 1e9, true);
  assertRange(mode, 'mode', 1, 1e6);
  return 4 * cable.massPerLength * (cable.length * (frequency / mode)) ** 2;
}

/** Checks what every string model needs. */
export function checkString(cable: StringProperties): void {
  assertRange(cable.length, 'length', 0, 1e15, true);
  assertRange(cable.massPerLength, 'massPerLength', 0, 1e15, true);
}

/** 1 … modeCount, checked to be a whole number from 1 to 200. */
export function modeNumbers(modeCount: number): number[] {
  assertRange(modeCount, 'modeCount', 1, 200);
  if (!Number.isInteger(modeCount)) throw new EstimationError('out-of-range', 'modeCount', 'The number of modes must be a whole number.');
  return Array.from({ length: modeCount }, (_, index) => index + 1);
}
