/**
 * What sag adds to ln f of the bare cable, inside the fit: ln f(λ², ξ) − ln f(0, ξ) and its derivatives.
 *
 * At a root of Φ(x; λ², ξ) the derivatives follow from Φ itself, dx/dp = −Φ_p/Φ_x, so that no second root is sought. The shift is
 * exact at a centre and followed around it as the power law of T and EI that touches it there: a small shift is nearly
 * proportional to λ² ∝ T⁻³, so that within the reach below what is left is under a millionth.
 */
import { type EndForm, wavenumber } from '../models/end-rotation.ts';
import { type SagProperties, sagFunction, sagParameter, sagWavenumber } from '../models/sag.ts';
import type { FitProblem } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { setEndForm } from './node-fit.ts';
import type { ModelCorrection } from './node-workspace.ts';

/** How far ln T and ln EI may move before the sag is computed anew. */
const reach = { t: 4e-3, e: 0.4 };
/** A shift of ln f below this is left out. */
const smallestShift = 1e-8;
/** Beyond this λ² modes may change places (at 4π² for a string): all are found and put in order. */
const crossing = 30;

/** State at the centre of the linear range. */
interface Centre {
  t: number;
  e: number;
  xi: number;
  lambdaSquared: number;
  /** d ln λ²/d ln T */
  slope: number;
  firstNode: EndNode | null;
  secondNode: EndNode | null;
  first: EndForm;
  second: EndForm;
}

/** One row a derivative, one entry a peak. */
export function emptyCorrection(count: number): Omit<ModelCorrection, 'evaluate'> {
  const row = () => new Float64Array(count);
  return { shift: row(), byTension: row(), byStiffness: row(), byLength: row(), byMass: row(), byAxialStiffness: row() };
}

/** The correction of a cable with sag and nothing attached. */
export function sagCorrection(problem: FitProblem, sag: SagProperties): ModelCorrection {
  const { length, peaks } = problem;
  const out = emptyCorrection(peaks.length);
  const atCentre = new Float64Array(peaks.length);
  const highest = Math.max(...peaks.map(({ mode }) => mode));
  const base = new Float64Array(highest + 3);
  const raised = new Float64Array(highest + 1);
  const centre: Centre = {
    t: Number.NaN,
    e: Number.NaN,
    xi: 0,
    lambdaSquared: 0,
    slope: -3,
    firstNode: null,
    secondNode: null,
    first: { a: 1, b: 0 },
    second: { a: 1, b: 0 },
  };

  function recentre(t: number, e: number, firstNode: EndNode, secondNode: EndNode): void {
    const xi = length * Math.exp((t - e) / 2);
    const { value, slope } = sagParameter(sag, length, Math.exp(t));
    Object.assign(centre, { t, e, xi, lambdaSquared: value, slope, firstNode, secondNode });
    setEndForm(centre.first, firstNode, length, e, xi);
    setEndForm(centre.second, secondNode, length, e, xi);
    for (let n = 1; n <= highest + 2; n++) base[n] = wavenumber(n, xi, centre.first, centre.second, base[n]!);
    for (const row of Object.values(out)) row.fill(0);
    if (value > crossing) orderRaised(centre, base, raised);
    for (let i = 0; i < peaks.length; i++) {
      const { mode, plane } = peaks[i]!;
      if (plane !== 'in-plane' || (0.5 * value) / mode ** 4 < smallestShift) {
        atCentre[i] = 0;
        continue;
      }
      const x = value > crossing ? raised[mode]! : raise(centre, base, mode, base[mode]! * Math.exp(atCentre[i]!));
      const from = base[mode]!;
      atCentre[i] = Math.log(x / from) + 0.5 * Math.log((x * x + xi * xi) / (from * from + xi * xi));
      // A mode without stretch does not answer to sag, even where it took another's place in the order.
      if (!base.includes(x)) writeSlopes(out, i, mode, x, from, centre);
    }
  }

  function evaluate(t: number, e: number, firstNode: EndNode, secondNode: EndNode): void {
    const near = Math.abs(t - centre.t) < reach.t && Math.abs(e - centre.e) < reach.e;
    if (!near || centre.firstNode !== firstNode || centre.secondNode !== secondNode) recentre(t, e, firstNode, secondNode);
    for (let i = 0; i < peaks.length; i++) {
      const shift = atCentre[i]!;
      const change = out.byTension[i]! * (t - centre.t) + out.byStiffness[i]! * (e - centre.e);
      out.shift[i] = shift > 2 * Math.abs(change) ? shift * Math.exp(change / shift) : shift + change;
    }
  }
  return { ...out, evaluate };
}

function isSymmetric({ first, second }: Centre): boolean {
  return first.a * second.b === second.a * first.b;
}

/** Wavenumber with sag that belongs to mode n without. */
function raise(centre: Centre, base: Float64Array, n: number, near: number): number {
  const symmetric = isSymmetric(centre);
  if (symmetric && n % 2 === 0) return base[n]!;
  return sagWavenumber(base[n]!, base[n + (symmetric ? 2 : 1)]!, centre.xi, centre.lambdaSquared, centre.first, centre.second, near);
}

function orderRaised(centre: Centre, base: Float64Array, raised: Float64Array): void {
  for (let n = 1; n < raised.length; n++) raised[n] = raise(centre, base, n, 0);
  raised.subarray(1).sort();
}

const nearFirst: EndForm = { a: 1, b: 0 };
const nearSecond: EndForm = { a: 1, b: 0 };
const step = 1e-6;

/** Φ beside the centre, x and ξ moved by fractions of themselves; a fixity follows ξ. */
function sagBeside(x: number, byXi: number, centre: Centre): number {
  moveEnd(nearFirst, centre.first, centre.firstNode!, 1 + byXi);
  moveEnd(nearSecond, centre.second, centre.secondNode!, 1 + byXi);
  return sagFunction(x, centre.xi * (1 + byXi), centre.lambdaSquared, nearFirst, nearSecond);
}

function moveEnd(moved: EndForm, form: EndForm, node: EndNode, factor: number): void {
  moved.a = form.a;
  moved.b = node.stiffness !== null || form.a === 0 ? form.b : form.b * factor;
}

function writeSlopes(out: Omit<ModelCorrection, 'evaluate'>, i: number, mode: number, x: number, from: number, centre: Centre): void {
  const { xi, slope } = centre;
  // Close to a pole the step must stay on this side of it.
  const h = Math.min(step, 0.01 * (x / from - 1));
  const byX = (sagBeside(x * (1 + h), 0, centre) - sagBeside(x * (1 - h), 0, centre)) / (2 * h);
  const byXi = (sagBeside(x, h, centre) - sagBeside(x, -h, centre)) / (2 * h);
  moveEnd(nearFirst, centre.first, centre.firstNode!, 1 + step);
  moveEnd(nearSecond, centre.second, centre.secondNode!, 1 + step);
  const baseByXi = (wavenumber(mode, xi * (1 + step), nearFirst, nearSecond, from) / from - 1) / step;
  const logSlope = (place: number, byLogXi: number) => byLogXi + (place * place * byLogXi + xi * xi) / (place * place + xi * xi);
  // Φ = 1 − λ²Q, and Φ = 0: ∂Φ/∂ln λ² = −1.
  const byLambda = (1 / byX) * (1 + (x * x) / (x * x + xi * xi));
  const shiftByXi = logSlope(x, -byXi / byX) - logSlope(from, baseByXi);
  out.byTension[i] = byLambda * slope + shiftByXi / 2;
  out.byStiffness[i] = -shiftByXi / 2;
  // λ² is a function of (m g L/T)² and EA/T.
  out.byLength[i] = byLambda * (-slope - 1) + shiftByXi;
  out.byMass[i] = byLambda * (-slope - 1);
  out.byAxialStiffness[i] = byLambda;
}
