/**
 * The three numbers that say what kind of cable it is.
 */
import { assertRange } from '../errors.ts';
import { standardGravity } from './cable.ts';

/**
 * How string-like a cable is: ξ = L √(T/EI). Above 200 nearly a string, below 20 nearly a beam.
 *
 * @param length m, > 0
 * @param tension N, >= 0
 * @param bendingStiffness N·m², > 0
 * @returns dimensionless
 * @throws EstimationError `out-of-range` naming the field
 * Source: definition, e.g. Mehrabi & Tabatabai 1998 (J. Struct. Eng. 124:1313).
 */
export function stringLikeness(length: number, tension: number, bendingStiffness: number): number {
  assertRange(length, 'length', 0, 1e15, true);
  assertRange(tension, 'tension', 0, 1e15);
  assertRange(bendingStiffness, 'bendingStiffness', 0, 1e15, true);
  return length * Math.sqrt(tension / bendingStiffness);
}

/**
 * Length over which an end bends the cable: ℓ = √(EI/T).
 *
 * @param tension N, > 0
 * @param bendingStiffness N·m², >= 0
 * @returns m
 * @throws EstimationError `out-of-range` naming the field
 * Source: boundary layer of EI v'''' = T v''.
 */
export function boundaryLayerLength(tension: number, bendingStiffness: number): number {
  assertRange(tension, 'tension', 0, 1e15, true);
  assertRange(bendingStiffness, 'bendingStiffness', 0, 1e15);
  return Math.sqrt(bendingStiffness / tension);
}

/**
 * Sag and stretch: λ² = (m g L cosθ/T)² · L/(T L_e/EA), L_e = L (1 + (m g L cosθ/T)²/8).
 *
 * @param cable length (m), mass per length (kg/m), axial stiffness (N), inclination of the chord (rad)
 * @param tension mean chord tension, N, > 0
 * @param gravity m/s², standard free fall unless given
 * @returns dimensionless; 0 for a taut or vertical cable
 * @throws EstimationError `out-of-range` naming the field
 * Source: Irvine & Caughey 1974; inclined form Irvine 1981.
 */
export function sagExtensibility(
  cable: { length: number; massPerLength: number; axialStiffness: number; inclination: number },
  tension: number,
  gravity = standardGravity,
): number {
  assertRange(tension, 'tension', 0, 1e15, true);
  assertRange(cable.length, 'length', 0, 1e15, true);
  const ratio = (cable.massPerLength * gravity * cable.length * Math.cos(cable.inclination)) / tension;
  return (ratio ** 2 * cable.axialStiffness) / (tension * (1 + ratio ** 2 / 8));
}
