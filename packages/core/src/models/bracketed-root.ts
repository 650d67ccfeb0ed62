/**
 * Root of a function between two places where it has opposite signs.
 *
 * Source: Brent 1973, Algorithms for Minimization without Derivatives, chapter 4.
 */

/**
 * Finds a root of f in [a, b].
 *
 * @param f continuous, of opposite signs at both ends
 * @param a, b the bracket
 * @param fa, fb values there
 * @returns the root to the last digits of a number; bounded to 100 evaluations
 */
export function bracketedRoot(f: (x: number) => number, a: number, b: number, fa: number, fb: number): number {
  if (fa === 0) return a;
  if (fb === 0) return b;
  let [c, fc, step, before] = [a, fa, b - a, b - a];
  for (let i = 0; i < 100; i++) {
    if (fb > 0 === fc > 0) [c, fc, step, before] = [a, fa, b - a, b - a];
    if (Math.abs(fc) < Math.abs(fb)) [a, b, c, fa, fb, fc] = [b, c, b, fb, fc, fb];
    const tolerance = 2.3e-16 * Math.abs(b);
    const half = (c - b) / 2;
    if (Math.abs(half) <= tolerance || fb === 0) return b;
    [step, before] = brentStep({ a, b, c, fa, fb, fc, half, step, before, tolerance });
    [a, fa] = [b, fb];
    b += Math.abs(step) > tolerance ? step : Math.sign(half) * tolerance;
    fb = f(b);
  }
  return b;
}

interface BrentState {
  a: number;
  b: number;
  c: number;
  fa: number;
  fb: number;
  fc: number;
  half: number;
  step: number;
  before: number;
  tolerance: number;
}

/** Inverse quadratic or secant step where it is safe, else half the bracket; with the step before. */
function brentStep({ a, b, c, fa, fb, fc, half, step, before, tolerance }: BrentState): [number, number] {
  if (Math.abs(before) < tolerance || Math.abs(fa) <= Math.abs(fb)) return [half, half];
  const s = fb / fa;
  let [p, q] = [2 * half * s, 1 - s];
  if (a !== c) {
    const [u, r] = [fa / fc, fb / fc];
    p = s * (2 * half * u * (u - r) - (b - a) * (r - 1));
    q = (u - 1) * (r - 1) * (s - 1);
  }
  if (p > 0) q = -q;
  else p = -p;
  const safe = 2 * p < Math.min(3 * half * q - Math.abs(tolerance * q), Math.abs(before * q));
  return safe ? [p / q, step] : [half, half];
}
