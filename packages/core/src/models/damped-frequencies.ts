/**
 * Cables with viscous dampers: complex roots s of the exact dynamic stiffness, frequency |s|/2π, damping ratio −Re s/|s|.
 *
 * As ../attachments, with ω² = −s² and c s at the place of a damper. Every root is followed from its undamped frequency, which
 * Wittrick–Williams counting has found, while the coefficients grow from nothing to their values; so no mode is missed. Sag is
 * left out: it moves a mode's frequency far more than it moves what a damper does to it.
 *
 * Sources: Krenk 2000; Main & Jones 2002.
 */
import { type Cable, checkCable } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { attachedFrequencies, lumpedAttachments } from './attachments.ts';
import { add, type Complex, complex, cosine, determinant, divide, exponential, multiply, scale, sine, squareRoot } from './complex.ts';
import type { EndForm } from './end-rotation.ts';
import { knownEnd } from './natural-frequencies.ts';
import { modeNumbers } from './taut-string.ts';

/** One damped mode. */
export interface DampedMode {
  /** |s|/2π, Hz. */
  frequency: number;
  /** ζ = −Re s/|s|. */
  dampingRatio: number;
}

interface Joint {
  position: number;
  mass: number;
  stiffness: number;
  coefficient: number;
}

interface DampedCable {
  length: number;
  massPerLength: number;
  tension: number;
  bendingStiffness: number;
  first: EndForm;
  second: EndForm;
  joints: Joint[];
}

/** Steps in which the coefficients grow, as squares of equal parts: the modes move most while they are small. */
const growthSteps = 60;
const newtonSteps = 30;

/**
 * Frequencies and damping of a cable with dampers of known coefficients.
 *
 * @param cable SI; ends known; every damper with a coefficient
 * @param state tension (N) > 0, bending stiffness (N·m²) >= 0; out of the plane of the sag
 * @param modeCount integer from 1 to 200
 * @returns one damped mode a number, in the order of the undamped ones
 * @throws EstimationError `attachment-unknown`, `ends-unknown`, `out-of-range`, `not-converged`, naming the field
 * Source: Krenk 2000; Main & Jones 2002.
 */
export function dampedFrequencies(cable: Cable, state: { tension: number; bendingStiffness?: number }, modeCount: number): DampedMode[] {
  checkCable(cable);
  modeNumbers(modeCount);
  const bendingStiffness = state.bendingStiffness ?? cable.bendingStiffness ?? 0;
  assertRange(state.tension, 'tension', 0, 1e15, true);
  assertRange(bendingStiffness, 'bendingStiffness', 0, 1e15);
  const { length, massPerLength } = cable;
  const ends = cable.ends ?? ['unknown', 'unknown'];
  const xi = bendingStiffness === 0 ? Number.POSITIVE_INFINITY : length * Math.sqrt(state.tension / bendingStiffness);
  const first = knownEnd(ends[0], 'ends[0]', length, bendingStiffness, xi);
  const second = knownEnd(ends[1], 'ends[1]', length, bendingStiffness, xi);
  const bare = { length, massPerLength, tension: state.tension, bendingStiffness, first, second };
  const undamped = attachedFrequencies({ ...bare, attachments: lumpedAttachments(cable), sagStiffness: 0 }, modeCount);
  const joints = jointsOf(cable);
  return undamped.map((omega, index) => {
    let s = complex(0, omega);
    for (let k = 1; k <= growthSteps; k++) {
      const share = (k / growthSteps) ** 2;
      s = refine({ ...bare, joints: joints.map((joint) => ({ ...joint, coefficient: joint.coefficient * share })) }, s, index + 1);
    }
    const size = Math.hypot(s.re, s.im);
    return { frequency: size / (2 * Math.PI), dampingRatio: -s.re / size };
  });
}

function jointsOf(cable: Cable): Joint[] {
  const all = (cable.attachments ?? []).map((attachment, index): Joint => {
    if (attachment.kind === 'damper' && attachment.coefficient === undefined) {
      throw new EstimationError(
        'attachment-unknown',
        `attachments[${index}].coefficient`,
        'Damped frequencies need the coefficient of every damper.',
      );
    }
    return {
      position: attachment.position,
      mass: attachment.kind === 'mass' ? attachment.mass : 0,
      stiffness: attachment.kind === 'support' ? attachment.stiffness : 0,
      coefficient: attachment.kind === 'damper' ? attachment.coefficient! : 0,
    };
  });
  const merged: Joint[] = [];
  for (const joint of all.sort((a, b) => a.position - b.position)) {
    const last = merged.at(-1);
    if (last && joint.position - last.position < 1e-6 * cable.length) {
      last.mass += joint.mass;
      last.stiffness += joint.stiffness;
      last.coefficient += joint.coefficient;
    } else merged.push({ ...joint });
  }
  return merged;
}

/** Newton on the characteristic function from a root close by. */
function refine(cable: DampedCable, start: Complex, mode: number): Complex {
  let s = start;
  for (let i = 0; i < newtonSteps; i++) {
    const h = 1e-6 * Math.hypot(s.re, s.im);
    const here = characteristic(cable, s);
    const slope = scale(
      add(characteristic(cable, complex(s.re + h, s.im)), scale(characteristic(cable, complex(s.re - h, s.im)), -1)),
      1 / (2 * h),
    );
    const step = divide(here, slope);
    s = add(s, scale(step, -1));
    if (Math.hypot(step.re, step.im) < 1e-12 * Math.hypot(s.re, s.im)) return s;
  }
  if (Number.isFinite(s.re) && Number.isFinite(s.im)) return s;
  throw new EstimationError('not-converged', 'attachments', `The damped frequency of mode ${mode} could not be followed.`);
}

/** Determinant of the dynamic stiffness, its poles multiplied away. */
function characteristic(cable: DampedCable, s: Complex): Complex {
  const { joints, bendingStiffness, length } = cable;
  const inertia = scale(multiply(s, s), -cable.massPerLength);
  const places = [0, ...joints.map(({ position }) => position), length];
  const isString = bendingStiffness === 0;
  const last = places.length - 1;
  let size = 0;
  const v = places.map((_, i) => (i === 0 || i === last ? -1 : size++));
  const held = (i: number) => (i === 0 && cable.first.a === 0) || (i === last && cable.second.a === 0);
  const theta = places.map((_, i) => (isString || held(i) ? -1 : size++));
  const matrix = Array.from({ length: size }, () => Array.from({ length: size }, () => complex(0)));
  const put = (row: number, column: number, value: Complex) => {
    if (row < 0 || column < 0) return;
    matrix[row]![column] = add(matrix[row]![column]!, value);
    if (row !== column) matrix[column]![row] = add(matrix[column]![row]!, value);
  };
  let poles = complex(1);
  for (let i = 0; i < last; i++) {
    const k = piece(cable, inertia, places[i + 1]! - places[i]!);
    poles = multiply(poles, k.delta);
    const [v1, t1, v2, t2] = [v[i]!, theta[i]!, v[i + 1]!, theta[i + 1]!];
    put(v1, v1, k.k11);
    put(v2, v2, k.k11);
    put(v1, v2, k.k13);
    put(t1, t1, k.k22);
    put(t2, t2, k.k22);
    put(v1, t1, k.k12);
    put(v2, t2, scale(k.k12, -1));
    put(v1, t2, k.k14);
    put(t1, v2, scale(k.k14, -1));
    put(t1, t2, k.k24);
  }
  joints.forEach(({ mass, stiffness, coefficient }, i) => {
    put(v[i + 1]!, v[i + 1]!, add(complex(stiffness), scale(multiply(s, s), mass), scale(s, coefficient)));
  });
  [cable.first, cable.second].forEach(({ a, b }, end) => {
    const row = theta[end === 0 ? 0 : last]!;
    if (row >= 0) put(row, row, complex(((b / a) * bendingStiffness) / length));
  });
  return multiply(poles, determinant(matrix));
}

interface ComplexPiece {
  k11: Complex;
  k12: Complex;
  k13: Complex;
  k14: Complex;
  k22: Complex;
  k24: Complex;
  delta: Complex;
}

/** The entries of ../segment-stiffness for complex wavenumbers. */
function piece({ tension, bendingStiffness: ei }: DampedCable, inertia: Complex, length: number): ComplexPiece {
  const zero = complex(0);
  if (ei === 0) {
    const beta = squareRoot(scale(inertia, 1 / tension));
    const [s, c] = [sine(scale(beta, length)), cosine(scale(beta, length))];
    const pull = scale(beta, tension);
    return { k11: divide(multiply(pull, c), s), k13: divide(scale(pull, -1), s), k12: zero, k14: zero, k22: zero, k24: zero, delta: s };
  }
  const a = tension / (2 * ei);
  const root = squareRoot(add(complex(a * a), scale(inertia, 1 / ei)));
  const alpha = squareRoot(add(root, complex(a)));
  const beta = squareRoot(divide(scale(inertia, 1 / ei), add(root, complex(a))));
  const e = exponential(scale(alpha, -length));
  const [s, c] = [sine(scale(beta, length)), cosine(scale(beta, length))];
  const one = scale(e, 2);
  const ch = add(complex(1), multiply(e, e));
  const sh = add(complex(1), scale(multiply(e, e), -1));
  const [aa, bb, ab] = [multiply(alpha, alpha), multiply(beta, beta), multiply(alpha, beta)];
  const difference = add(aa, scale(bb, -1));
  const rest = add(one, scale(multiply(c, ch), -1));
  const delta = add(scale(multiply(ab, rest), 2), multiply(difference, s, sh));
  const n = divide(scale(add(aa, bb), ei), delta);
  return {
    k11: multiply(n, ab, add(multiply(beta, s, ch), multiply(alpha, c, sh))),
    k13: scale(multiply(n, ab, add(multiply(beta, s, one), multiply(alpha, sh))), -1),
    k22: multiply(n, add(multiply(alpha, s, ch), scale(multiply(beta, c, sh), -1))),
    k24: multiply(n, add(multiply(beta, sh), scale(multiply(alpha, s, one), -1))),
    k14: multiply(n, ab, add(ch, scale(multiply(c, one), -1))),
    k12: divide(scale(multiply(ab, add(scale(multiply(ab, s, sh), 2), scale(multiply(difference, rest), -1))), ei), delta),
    // Only zeros matter; its size is taken out.
    delta: divide(delta, add(aa, bb)),
  };
}
