/**
 * Sag in the plane of the cable, exact for any λ².
 *
 * A sagging cable of curvature κ = m g cosθ/T stretches when it moves; the additional cable force h = (EA/L_e) κ ∫v dx pushes
 * back uniformly, a rank-one term:
 *
 *   EI v'''' − T v'' − mω² v = −κ h
 *
 * With x = βL, y² = x² + ξ², q = x²y² ∝ ω², and the ends' rotations eliminated (../segment-stiffness) the frequencies are the
 * zeros of
 *
 *   Φ = 1 − (λ²ξ²/q) · (1 + (eᵀKe − gᵀD⁻¹g)/q)  =  1 + c Σ_j b_j²/(ω_j² − ω²)
 *
 * The second form shows where they lie: Φ rises between its poles, the frequencies ω_j without sag, so that exactly one root
 * lies between neighbours whose modes stretch the cable (b_j = ∫φ_j dx ≠ 0), and none is missed. Modes without stretch
 * (antisymmetric ones) stay. In the limit of a string this is Irvine's tan(ω̄/2) = ω̄/2 − (4/λ²)(ω̄/2)³.
 *
 * Sources: Irvine & Caughey 1974; Irvine 1981 (inclined); the form with bending and end rotation is derived here.
 */
import { type Cable, standardGravity } from '../cable/cable.ts';
import { bracketedRoot } from './bracketed-root.ts';
import type { EndForm } from './end-rotation.ts';
import { beamSegment, emptySegment } from './segment-stiffness.ts';

// Scratch of one evaluation, overwritten by the next: nothing is kept in it.
const segment = emptySegment();

/** Φ at x, for a cable of unit length and bending stiffness. */
export function sagFunction(x: number, xi: number, lambdaSquared: number, first: EndForm, second: EndForm): number {
  const y = Math.sqrt(x * x + xi * xi);
  const q = x * x * y * y;
  beamSegment(y, x, 1, 1, segment);
  const { k11, k12, k13, k14, k22, k24 } = segment;
  const g = k12 - k14;
  const [d1, d2] = [first.a * k22 + first.b, second.a * k22 + second.b];
  const shared = first.a * second.a * k24;
  const determinant = d1 * d2 - shared * k24;
  const eliminated = (g * g * (first.a * d2 + 2 * shared + second.a * d1)) / determinant;
  return 1 - ((lambdaSquared * xi * xi) / q) * (1 + (2 * (k11 + k13) - eliminated) / q);
}

/** Relative distance from a pole within which a root is the pole itself. */
const poleRoom = 1e-9;

/**
 * Wavenumbers with sag.
 *
 * @param base wavenumbers without sag, ascending, two more than wanted
 * @param xi ξ > 0
 * @param lambdaSquared λ² >= 0
 * @param first, second the ends
 * @param count how many are wanted
 * @param out receives them, ascending
 */
export function sagWavenumbers(
  base: Float64Array,
  xi: number,
  lambdaSquared: number,
  first: EndForm,
  second: EndForm,
  count: number,
  out: Float64Array,
): void {
  const symmetric = first.a * second.b === second.a * first.b;
  const stride = symmetric ? 2 : 1;
  for (let j = 0; j < count; j += stride) {
    out[j] = sagWavenumber(base[j]!, base[j + stride]!, xi, lambdaSquared, first, second);
    if (symmetric && j + 1 < count) out[j + 1] = base[j + 1]!;
  }
  if (symmetric) out.subarray(0, count).sort();
}

/**
 * The one wavenumber with sag between two neighbours without, whose modes stretch the cable.
 *
 * @param low wavenumber without sag below it
 * @param high the next one above
 * @param near where it is expected, if that is known
 */
export function sagWavenumber(
  low: number,
  high: number,
  xi: number,
  lambdaSquared: number,
  first: EndForm,
  second: EndForm,
  near = 0,
): number {
  const square = (x: number) => x * x * (x * x + xi * xi);
  const [qLow, qHigh] = [square(low), square(high)];
  // Both poles are multiplied away: what is left is smooth and rises from below zero to above.
  const smooth = (x: number) => {
    const q = square(x);
    return sagFunction(x, xi, lambdaSquared, first, second) * ((q - qLow) / qLow) * ((qHigh - q) / qHigh);
  };
  const [from, to] = [low * (1 + poleRoom), high * (1 - poleRoom)];
  if (near > from && near < to) {
    const reach = 0.02 * (near - low);
    const [below, above] = [Math.max(from, near - reach), Math.min(to, near + reach)];
    const [atBelow, atAbove] = [smooth(below), smooth(above)];
    if (atBelow < 0 && atAbove > 0) return bracketedRoot(smooth, below, above, atBelow, atAbove);
  }
  const [atFrom, atTo] = [smooth(from), smooth(to)];
  if (!(atFrom < 0)) return low;
  if (!(atTo > 0)) return high;
  return bracketedRoot(smooth, from, to, atFrom, atTo);
}

/** Weight and stretch of a cable, in which sag shows; null without axial stiffness or inclination. */
export interface SagProperties {
  /** m g cosθ, N/m */
  weight: number;
  axialStiffness: number;
}

/** Sag of a cable, where its data give one. */
export function sagProperties(cable: Cable, gravity = standardGravity): SagProperties | null {
  if (cable.axialStiffness === undefined || cable.inclination === undefined) return null;
  const weight = cable.massPerLength * gravity * Math.cos(cable.inclination);
  return weight < 1e-9 * cable.massPerLength ? null : { weight, axialStiffness: cable.axialStiffness };
}

/** λ² and d ln λ²/d ln T at a tension. */
export function sagParameter({ weight, axialStiffness }: SagProperties, length: number, tension: number): { value: number; slope: number } {
  const square = ((weight * length) / tension) ** 2;
  return { value: (square * axialStiffness) / (tension * (1 + square / 8)), slope: -3 + square / 4 / (1 + square / 8) };
}

/** κ² EA/L_e, N/m³. */
export function sagStiffnessOf(sag: SagProperties, length: number, tension: number): number {
  const slope = sag.weight / tension;
  return (slope ** 2 * sag.axialStiffness) / (length * (1 + (slope * length) ** 2 / 8));
}
