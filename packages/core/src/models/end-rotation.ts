/**
 * The stiff string with elastic rotation at its ends, by phase closure.
 *
 * Between the ends the motion is v = P sin βx + Q cos βx + R e^{−αx} + S e^{−α(L−x)} with
 *
 *   α² − β² = T/EI,   m ω² = EI β⁴ + T β²
 *
 * A wave that runs to an end of rotational stiffness k comes back with the phase φ = atan(kβ/(EI(α² + β²) + kα)), and a mode
 * closes on itself when βL = nπ + φ_1 + φ_2. The mode number is explicit, so no root can be missed. What this neglects is
 * the coupling of the two ends through e^{−αL}. The full 4 × 4 determinant, reduced by v(0) = v(L) = 0, is, with x = βL,
 * y = αL, e = e^{−y}, N = x² + y², D_i = a_i N + b_i y, M_i = a_i N − b_i y, φ_i = atan(b_i x/D_i),
 * ρ_i = √(D_i² + b_i² x²),
 *
 *   ρ_1 ρ_2 sin(x − φ_1 − φ_2) = −4 e b_1 b_2 x y + e² [ (M_1 M_2 − b_1 b_2 x²) sin x − x (b_1 M_2 + b_2 M_1) cos x ]
 *
 * whose right-hand side is put back into the phase as a correction δ, so that the same iteration is exact down to T = 0.
 * An end is the pair (a, b): stiffness k is (1, kL/EI), clamped (0, 1), fixity η is (1 − η, η ξ).
 *
 * Sources: Morse & Ingard 1968; Blevins 1979; the reduction is derived here and checked against both.
 */

/** One end in the form that stays finite from hinged to clamped: rotation is held by b/a. */
export interface EndForm {
  a: number;
  b: number;
}

/** What `solveWavenumber` writes: x = βL, then ∂x/∂ξ at fixed b, ∂x/∂b_1, ∂x/∂b_2. */
export type WavenumberSolution = Float64Array;

/** e^{−y} below this changes no digit of x. */
const deepestCoupling = 40;
/** Below this y the derivatives follow the coupling of the ends as well: e^{−16} of a derivative moves no optimum. */
const derivativeCoupling = 16;
const iterationLimit = 60;

/**
 * Dimensionless wavenumber x = βL of one mode, and its derivatives.
 *
 * @param mode n >= 1
 * @param xi ξ >= 0
 * @param first one end
 * @param second the other
 * @param out receives x and its derivatives
 * @param start x to begin with; nπ unless given
 * @returns whether it converged
 */
export function solveWavenumber(mode: number, xi: number, first: EndForm, second: EndForm, out: WavenumberSolution, start = 0): boolean {
  const x = wavenumber(mode, xi, first, second, start);
  out[0] = Math.abs(x);
  writeDerivatives(mode, out[0]!, xi, first, second, out);
  return x > 0;
}

/**
 * x = βL of one mode alone; negative if the iteration did not settle.
 *
 * Newton on x − nπ − φ_1 − φ_2 − δ, the slope of δ neglected: the phase falls or rises more slowly than x itself, so that
 * it converges from x = nπ; iterations are bounded.
 */
export function wavenumber(mode: number, xi: number, first: EndForm, second: EndForm, start = 0): number {
  const base = mode * Math.PI;
  let x = start > 0 ? start : base;
  for (let i = 0; i < iterationLimit; i++) {
    const y = Math.sqrt(x * x + xi * xi);
    const delta = y < deepestCoupling ? endCoupling(mode, x, xi, first, second) : 0;
    const residual = x - base - phase(x, y, xi, first) - phase(x, y, xi, second) - delta;
    const step = residual / (1 - phaseByX(x, y, xi, first) - phaseByX(x, y, xi, second));
    // The first mode of a soft beam may overshoot; x never falls below a tenth of nπ.
    x = Math.max(x - step, 0.1 * base);
    // The step after next would be lost in rounding: convergence is quadratic but for δ. The last digits may dither.
    const size = Math.abs(step);
    if (size < 2e-15 * x || (delta === 0 && size < 1e-9 * x) || (i > 12 && size < 1e-13 * x)) return x;
  }
  return -x;
}

function writeDerivatives(mode: number, x: number, xi: number, first: EndForm, second: EndForm, out: WavenumberSolution): void {
  const y = Math.sqrt(x * x + xi * xi);
  let slope = 1 - phaseByX(x, y, xi, first) - phaseByX(x, y, xi, second);
  let byXi = phaseByXi(x, y, xi, first) + phaseByXi(x, y, xi, second);
  let byFirst = phaseByB(x, y, first);
  let bySecond = phaseByB(x, y, second);
  if (y < derivativeCoupling) {
    const by = (dx: number, dxi: number, d1: number, d2: number) => couplingSlope(mode, x, xi, first, second, [dx, dxi, d1, d2]);
    slope -= by(1e-5 * x, 0, 0, 0);
    byXi += xi > 0 ? by(0, 1e-5 * xi, 0, 0) : 0;
    byFirst += first.b > 0 ? by(0, 0, 1e-5 * first.b, 0) : 0;
    bySecond += second.b > 0 ? by(0, 0, 0, 1e-5 * second.b) : 0;
  }
  out[1] = byXi / slope;
  out[2] = byFirst / slope;
  out[3] = bySecond / slope;
}

/** φ of one end. */
function phase(x: number, y: number, xi: number, { a, b }: EndForm): number {
  return b === 0 ? 0 : Math.atan((b * x) / (a * (2 * x * x + xi * xi) + b * y));
}

/** ∂φ/∂x, y moving with x. */
function phaseByX(x: number, y: number, xi: number, { a, b }: EndForm): number {
  if (b === 0) return 0;
  const held = a * (2 * x * x + xi * xi) + b * y;
  return (held * b - b * x * (4 * a * x + (b * x) / y)) / (held * held + b * b * x * x);
}

/** ∂φ/∂ξ at fixed x and b. */
function phaseByXi(x: number, y: number, xi: number, { a, b }: EndForm): number {
  if (b === 0) return 0;
  const held = a * (2 * x * x + xi * xi) + b * y;
  return (-b * x * (2 * a * xi + (b * xi) / y)) / (held * held + b * b * x * x);
}

/** ∂φ/∂b. */
function phaseByB(x: number, y: number, { a, b }: EndForm): number {
  const n = x * x + y * y;
  const held = a * n + b * y;
  return held === 0 ? 0 : (x * a * n) / (held * held + b * b * x * x);
}

/** δ: what the coupling of the ends adds to the phase. */
function endCoupling(mode: number, x: number, xi: number, first: EndForm, second: EndForm): number {
  const y = Math.sqrt(x * x + xi * xi);
  const e = Math.exp(-y);
  const n = x * x + y * y;
  const d1 = first.a * n + first.b * y;
  const d2 = second.a * n + second.b * y;
  const m1 = first.a * n - first.b * y;
  const m2 = second.a * n - second.b * y;
  const b1x = first.b * x;
  const b2x = second.b * x;
  const rho = Math.sqrt((d1 * d1 + b1x * b1x) * (d2 * d2 + b2x * b2x));
  const right = -4 * e * b1x * second.b * y + e * e * ((m1 * m2 - b1x * b2x) * Math.sin(x) - (b1x * m2 + b2x * m1) * Math.cos(x));
  const sine = Math.max(-1, Math.min(1, right / rho));
  return Math.asin(mode % 2 === 0 ? sine : -sine);
}

function couplingSlope(mode: number, x: number, xi: number, first: EndForm, second: EndForm, step: number[]): number {
  const [dx, dxi, d1, d2] = step as [number, number, number, number];
  const at = (sign: number) =>
    endCoupling(mode, x + sign * dx, xi + sign * dxi, { a: first.a, b: first.b + sign * d1 }, { a: second.a, b: second.b + sign * d2 });
  return (at(1) - at(-1)) / (2 * (dx + dxi + d1 + d2));
}

/**
 * End of a given rotational stiffness.
 *
 * @param rotationalStiffness k, N·m/rad; 0 hinged, Infinity clamped
 * @param length m
 * @param bendingStiffness N·m², > 0
 */
export function endOfStiffness(rotationalStiffness: number, length: number, bendingStiffness: number): EndForm {
  const b = (rotationalStiffness * length) / bendingStiffness;
  return Number.isFinite(b) ? { a: 1, b } : { a: 0, b: 1 };
}

/** End of a given fixity η from 0 (hinged) to 1 (clamped) on a cable of given ξ. */
export function endOfFixity(fixity: number, xi: number): EndForm {
  return fixity >= 1 ? { a: 0, b: 1 } : { a: 1 - fixity, b: fixity * xi };
}

/**
 * Frequency from the wavenumber: f = x/(2πL²√m) · √(EI x² + T L²).
 *
 * @param x βL
 * @param cable length (m), mass per length (kg/m)
 * @param state tension (N), bending stiffness (N·m²)
 * @returns Hz
 */
export function frequencyOfWavenumber(
  x: number,
  cable: { length: number; massPerLength: number },
  state: { tension: number; bendingStiffness: number },
): number {
  const { length, massPerLength } = cable;
  return (
    (x * Math.sqrt((state.bendingStiffness * x * x + state.tension * length * length) / massPerLength)) / (2 * Math.PI * length * length)
  );
}
