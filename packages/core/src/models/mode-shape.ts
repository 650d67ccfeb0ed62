/**
 * Shapes of modes of a bare cable, for drawing and for choosing where a sensor listens.
 *
 * v = P sin βx + Q cos βx + R e^{−αx} + S e^{−α(L−x)} with the constants that the ends ask for (../end-rotation).
 */
import { type Cable, checkCable } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { wavenumber } from './end-rotation.ts';
import { knownEnd } from './natural-frequencies.ts';

/**
 * Displacement of a mode at places along the cable, its largest value 1.
 *
 * Sag and attachments are left out: they reshape the first in-plane modes of slack cables.
 *
 * @param cable SI; ends known
 * @param state tension (N) > 0, bending stiffness (N·m²) > 0
 * @param mode its number, integer from 1 to 200
 * @param places m from the first end, each from 0 to the length
 * @returns one displacement a place, −1 to 1
 * @throws EstimationError `ends-unknown`, `out-of-range`, `mode-invalid`, naming the field
 * Source: characteristic solution, e.g. Morse & Ingard 1968.
 */
export function modeShape(
  cable: Cable,
  state: { tension: number; bendingStiffness: number },
  mode: number,
  places: readonly number[],
): number[] {
  checkCable(cable);
  assertRange(state.tension, 'tension', 0, 1e15, true);
  assertRange(state.bendingStiffness, 'bendingStiffness', 0, 1e15, true);
  if (!Number.isInteger(mode) || mode < 1 || mode > 200)
    throw new EstimationError('mode-invalid', 'mode', 'A mode number is a whole number from 1 to 200.');
  places.forEach((place, index) => {
    assertRange(place, `places[${index}]`, 0, cable.length);
  });
  const shape = shapeOf(cable, state, mode);
  const largest = Array.from({ length: 40 * mode + 1 }, (_, i) => Math.abs(shape(i / (40 * mode)))).reduce((a, b) => Math.max(a, b), 0);
  return places.map((place) => shape(place / cable.length) / largest);
}

/** The shape over z = x/L, of any size. */
function shapeOf(
  cable: Cable,
  { tension, bendingStiffness }: { tension: number; bendingStiffness: number },
  mode: number,
): (z: number) => number {
  const xi = cable.length * Math.sqrt(tension / bendingStiffness);
  const ends = cable.ends ?? ['unknown', 'unknown'];
  const first = knownEnd(ends[0], 'ends[0]', cable.length, bendingStiffness, xi);
  const second = knownEnd(ends[1], 'ends[1]', cable.length, bendingStiffness, xi);
  const x = wavenumber(mode, xi, first, second);
  if (!(x > 0)) throw new EstimationError('not-converged', 'ends', `The shape of mode ${mode} could not be found.`);
  const y = Math.sqrt(x * x + xi * xi);
  const [s, c, e, n] = [Math.sin(x), Math.cos(x), Math.exp(-y), x * x + y * y];
  // Moments at both ends, with P = 1 and Q = −(R + S e): two equations for R and S.
  const [a11, a12, b1] = [first.a * n + first.b * y, e * (first.a * n - first.b * y), first.b * x];
  const [a21, a22, b2] = [
    e * (second.a * n - second.b * y) + second.b * x * s,
    second.a * n + second.b * y + second.b * x * e * s,
    -second.b * x * c,
  ];
  const determinant = a11 * a22 - a12 * a21;
  const r = (b1 * a22 - a12 * b2) / determinant;
  const t = (a11 * b2 - b1 * a21) / determinant;
  return (z) => Math.sin(x * z) - (r + t * e) * Math.cos(x * z) + r * Math.exp(-y * z) + t * Math.exp(-y * (1 - z));
}
