/**
 * Lumped masses and elastic supports on a cable, exactly, together with sag and end rotation.
 *
 * The cable is cut at its attachments; each piece has its exact dynamic stiffness (../segment-stiffness), so that the global
 * matrix D(ω) over the nodes' v and θ has zero determinant at a natural frequency, and
 *
 *   N(ω) = Σ N_held(ω) + negative pivots of D(ω)
 *
 * counts the frequencies below ω (Wittrick & Williams 1971): none is missed. Sag is a rank-one stiffness of positive sign; it
 * takes one from the count where Φ(ω) < 0 (../sag). A root is isolated by halving on the count and then refined on the
 * determinant, whose poles are multiplied away by Δ of the pieces.
 *
 * Sources: Wittrick & Williams 1971; Irvine & Caughey 1974 for the sag term.
 */
import type { Cable } from '../cable/cable.ts';
import { EstimationError } from '../errors.ts';
import { bracketedRoot } from './bracketed-root.ts';
import type { EndForm } from './end-rotation.ts';
import { beamSegment, emptySegment, heldFrequenciesBelow, type SegmentStiffness, stringSegment } from './segment-stiffness.ts';

/** A mass (kg) or a support (N/m) at a place (m). */
export interface LumpedAttachment {
  position: number;
  mass: number;
  stiffness: number;
}

/** Everything that D(ω) is made of. SI. */
export interface AttachedCable {
  length: number;
  massPerLength: number;
  tension: number;
  /** 0: a string, whose ends cannot hold rotation. */
  bendingStiffness: number;
  first: EndForm;
  second: EndForm;
  attachments: LumpedAttachment[];
  /** κ² EA/L_e, N/m³; 0 without sag. */
  sagStiffness: number;
}

/** What one frequency shows: how many lie below it, and a smooth function that vanishes at each. */
interface Count {
  below: number;
  value: number;
}

/** Room for one cable: pieces, matrix and the load of sag. */
interface Assembly {
  cable: AttachedCable;
  /** Lengths of the pieces, and what sits at their joints. */
  pieces: number[];
  joints: LumpedAttachment[];
  /** Degrees of freedom at each node: index of v and of θ, −1 where held. */
  v: number[];
  theta: number[];
  size: number;
  matrix: Float64Array;
  load: Float64Array;
  segment: SegmentStiffness;
}

/**
 * Natural frequencies of a cable with masses and supports.
 *
 * @param cable SI, checked
 * @param count how many
 * @returns angular frequencies, rad/s, ascending
 * @throws EstimationError `not-converged` if a frequency cannot be isolated
 */
export function attachedFrequencies(cable: AttachedCable, count: number): number[] {
  const assembly = assemble(cable);
  const found: number[] = [];
  let low = 0;
  let high = firstGuess(cable, count);
  while (evaluate(assembly, high).below < count) {
    high *= 1.5;
    if (!(high < 1e12)) throw new EstimationError('not-converged', 'attachments', 'The natural frequencies could not be bracketed.');
  }
  for (let n = 1; n <= count; n++) {
    const root = isolate(assembly, n, low, high);
    found.push(root);
    low = root * (1 - 1e-9);
  }
  return found;
}

function firstGuess({ length, massPerLength, tension, bendingStiffness }: AttachedCable, count: number): number {
  const wavenumber = ((count + 1) * Math.PI) / length;
  return wavenumber * Math.sqrt((tension + bendingStiffness * wavenumber ** 2) / massPerLength) * 1.01;
}

/** Halves on the count until mode n stands alone, then refines on the smooth function. */
function isolate(assembly: Assembly, n: number, from: number, to: number): number {
  let [low, high] = [from, to];
  let [atLow, atHigh]: [Count | null, Count | null] = [null, null];
  for (let i = 0; i < 200 && high - low > 1e-15 * high; i++) {
    const alone = atLow !== null && atHigh !== null && atLow.below === n - 1 && atHigh.below === n;
    if (alone && atLow!.value * atHigh!.value < 0 && high - low < 0.05 * high) {
      return bracketedRoot((omega) => evaluate(assembly, omega).value, low, high, atLow!.value, atHigh!.value);
    }
    const middle = (low + high) / 2;
    const here = evaluate(assembly, middle);
    if (here.below >= n) [high, atHigh] = [middle, here];
    else [low, atLow] = [middle, here];
  }
  return (low + high) / 2;
}

/** Shares of the length that are no distance. */
const endRoom = 1e-6;

function assemble(cable: AttachedCable): Assembly {
  // What sits on an end does not move.
  const inside = ({ position }: LumpedAttachment) => position > endRoom * cable.length && position < (1 - endRoom) * cable.length;
  const sorted = cable.attachments.filter(inside).sort((a, b) => a.position - b.position);
  const joints: LumpedAttachment[] = [];
  for (const { position, mass, stiffness } of sorted) {
    const last = joints.at(-1);
    // Two things at one place are one: a piece of no length has no stiffness.
    if (last && position - last.position < endRoom * cable.length) {
      last.mass += mass;
      last.stiffness += stiffness;
    } else joints.push({ position, mass, stiffness });
  }
  const places = [0, ...joints.map(({ position }) => position), cable.length];
  const pieces = places.slice(1).map((place, i) => place - places[i]!);
  const isString = cable.bendingStiffness === 0;
  let size = 0;
  const v = places.map((_, i) => (i === 0 || i === places.length - 1 ? -1 : size++));
  const holdsRotation = (i: number) => (i === 0 && cable.first.a === 0) || (i === places.length - 1 && cable.second.a === 0);
  const theta = places.map((_, i) => (isString || holdsRotation(i) ? -1 : size++));
  return {
    cable,
    pieces,
    joints,
    v,
    theta,
    size,
    matrix: new Float64Array(size * size),
    load: new Float64Array(size),
    segment: emptySegment(),
  };
}

/** Counts the frequencies below ω and evaluates the smooth function there. */
function evaluate(assembly: Assembly, omega: number): Count {
  const { cable, pieces, matrix, load, segment, size } = assembly;
  const inertia = cable.massPerLength * omega * omega;
  const isString = cable.bendingStiffness === 0;
  const { alpha, beta } = wavenumbers(cable, inertia);
  matrix.fill(0);
  load.fill(0);
  let [below, scale, direct] = [0, 1, 0];
  pieces.forEach((length, i) => {
    if (isString) stringSegment(beta, length, cable.tension, segment);
    else beamSegment(alpha, beta, length, cable.bendingStiffness, segment);
    below += heldFrequenciesBelow(beta, length, segment, isString);
    // Only its sign and zeros matter; the size of Δ is taken out.
    scale *= isString ? segment.delta : segment.delta / (alpha * alpha + beta * beta);
    direct += 2 * (segment.k11 + segment.k13);
    addPiece(assembly, i);
  });
  addJointsAndEnds(assembly, omega);
  const { negative, determinant, energy } = eliminate(matrix, load, size);
  below += negative;
  let value = scale * determinant;
  if (cable.sagStiffness > 0) {
    const phi = 1 - (cable.sagStiffness / inertia) * (cable.length + (direct - energy) / inertia);
    value *= phi;
    if (phi < 0) below -= 1;
  }
  return { below, value };
}

function wavenumbers({ tension, bendingStiffness }: AttachedCable, inertia: number): { alpha: number; beta: number } {
  if (bendingStiffness === 0) return { alpha: 0, beta: Math.sqrt(inertia / tension) };
  const a = tension / (2 * bendingStiffness);
  const root = Math.sqrt(a * a + inertia / bendingStiffness);
  return { alpha: Math.sqrt(root + a), beta: Math.sqrt(inertia / bendingStiffness / (root + a)) };
}

/** Adds piece i, between nodes i and i + 1, and what sag does to its nodes. */
function addPiece({ v, theta, size, matrix, load, segment }: Assembly, i: number): void {
  const { k11, k12, k13, k14, k22, k24 } = segment;
  const [v1, t1, v2, t2] = [v[i]!, theta[i]!, v[i + 1]!, theta[i + 1]!];
  const add = (row: number, column: number, value: number) => {
    if (row < 0 || column < 0) return;
    matrix[row * size + column]! += value;
    if (row !== column) matrix[column * size + row]! += value;
  };
  add(v1, v1, k11);
  add(v2, v2, k11);
  add(t1, t1, k22);
  add(t2, t2, k22);
  add(v1, t1, k12);
  add(v2, t2, -k12);
  add(v1, v2, k13);
  add(v1, t2, k14);
  add(t1, v2, -k14);
  add(t1, t2, k24);
  if (v1 >= 0) load[v1]! += k11 + k13;
  if (v2 >= 0) load[v2]! += k11 + k13;
  if (t1 >= 0) load[t1]! += k12 - k14;
  if (t2 >= 0) load[t2]! += k14 - k12;
}

function addJointsAndEnds({ cable, joints, v, theta, size, matrix }: Assembly, omega: number): void {
  joints.forEach(({ mass, stiffness }, i) => {
    const row = v[i + 1]!;
    matrix[row * size + row]! += stiffness - mass * omega * omega;
  });
  const hold = (row: number, { a, b }: EndForm) => {
    if (row >= 0) matrix[row * size + row]! += ((b / a) * cable.bendingStiffness) / cable.length;
  };
  hold(theta[0]!, cable.first);
  hold(theta.at(-1)!, cable.second);
}

/** Gauss elimination in place: negative pivots, determinant, and loadᵀ D⁻¹ load. */
function eliminate(matrix: Float64Array, load: Float64Array, size: number): { negative: number; determinant: number; energy: number } {
  let [negative, determinant, energy] = [0, 1, 0];
  for (let k = 0; k < size; k++) {
    // A pivot of exactly zero is a place where two counts meet: a hair beside it decides.
    const pivot = matrix[k * size + k]! || 1e-300;
    if (pivot < 0) negative++;
    determinant *= pivot;
    const f = load[k]!;
    energy += (f * f) / pivot;
    for (let i = k + 1; i < size; i++) {
      const factor = matrix[i * size + k]! / pivot;
      if (factor === 0) continue;
      for (let j = k + 1; j < size; j++) matrix[i * size + j]! -= factor * matrix[k * size + j]!;
      load[i]! -= factor * f;
    }
  }
  return { negative, determinant, energy };
}

/** Masses and supports of a cable; dampers are not among them. */
export function lumpedAttachments(cable: Cable): LumpedAttachment[] {
  return (cable.attachments ?? []).flatMap((attachment): LumpedAttachment[] => {
    if (attachment.kind === 'mass') return [{ position: attachment.position, mass: attachment.mass, stiffness: 0 }];
    if (attachment.kind === 'support') return [{ position: attachment.position, mass: 0, stiffness: attachment.stiffness }];
    return [];
  });
}
