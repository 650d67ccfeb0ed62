/**
 * What sag and attachments add to ln f of the bare cable, inside the fit.
 *
 * Sag: the shift ln f(λ², ξ) − ln f(0, ξ) and its derivatives. At a root of Φ(x; λ², ξ) the derivatives follow from Φ itself,
 * dx/dp = −Φ_p/Φ_x, so that no second root is sought; λ² falls as T⁻³.
 *
 * Masses and supports: the exact frequencies of ../models/attachments, their shift and its derivatives by central differences,
 * taken anew whenever the state has moved and followed linearly between.
 */
import { type AttachedCable, attachedFrequencies, type LumpedAttachment, lumpedAttachments } from '../models/attachments.ts';
import { type EndForm, wavenumber } from '../models/end-rotation.ts';
import { type SagProperties, sagFunction, sagParameter, sagProperties, sagStiffnessOf, sagWavenumber } from '../models/sag.ts';
import type { FitProblem } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { type ModelCorrection, setEndForm } from './node-fit.ts';

/** The correction of a problem; null for a bare cable without sag. */
export function modelCorrection(problem: FitProblem): ModelCorrection | null {
  const sag = sagProperties(problem.cable, problem.gravity);
  const inPlane = problem.peaks.some(({ plane }) => plane === 'in-plane');
  const lumps = lumpedAttachments(problem.cable);
  if (lumps.length > 0) return attachmentCorrection(problem, sag, lumps);
  return sag !== null && inPlane ? sagCorrection(problem, sag) : null;
}

function emptyCorrection(count: number): Omit<ModelCorrection, 'evaluate'> {
  const row = () => new Float64Array(count);
  return { shift: row(), byTension: row(), byStiffness: row(), byLength: row(), byMass: row(), byAxialStiffness: row() };
}

/** Shift below this is left out: a thousandth of the best frequency. */
const smallestShift = 1e-8;

function sagCorrection(problem: FitProblem, sag: SagProperties): ModelCorrection {
  const { length, peaks } = problem;
  const out = emptyCorrection(peaks.length);
  const [first, second]: [EndForm, EndForm] = [
    { a: 1, b: 0 },
    { a: 1, b: 0 },
  ];
  const highest = Math.max(...peaks.map(({ mode }) => mode));
  const base = new Float64Array(highest + 3);
  const raised = new Float64Array(highest + 1);
  const evaluate = (t: number, e: number, firstNode: EndNode, secondNode: EndNode) => {
    const xi = length * Math.exp((t - e) / 2);
    const { value: lambdaSquared, slope } = sagParameter(sag, length, Math.exp(t));
    setEndForm(first, firstNode, length, e, xi);
    setEndForm(second, secondNode, length, e, xi);
    for (const row of Object.values(out)) row.fill(0);
    const symmetric = first.a * second.b === second.a * first.b;
    // Beyond λ² = 4π² modes change places: all are found and put in order.
    const crossed = lambdaSquared > 30;
    const affected = (mode: number) => (0.5 * lambdaSquared) / mode ** 4 > smallestShift;
    for (let n = 1; n <= highest + 2; n++) base[n] = wavenumber(n, xi, first, second, base[n]!);
    if (crossed) {
      for (let n = 1; n <= highest; n++) raised[n] = raise(n);
      raised.subarray(1).sort();
    }
    function raise(n: number): number {
      if (symmetric && n % 2 === 0) return base[n]!;
      return sagWavenumber(base[n]!, base[n + (symmetric ? 2 : 1)]!, xi, lambdaSquared, first, second);
    }
    peaks.forEach(({ mode, plane }, i) => {
      if (plane !== 'in-plane' || !affected(mode)) return;
      const x = crossed ? raised[mode]! : raise(mode);
      const from = base[mode]!;
      if (x === from) return;
      const [square, squareFrom] = [x * x + xi * xi, from * from + xi * xi];
      out.shift[i] = Math.log(x / from) + 0.5 * Math.log(square / squareFrom);
      writeSlopes(i, x, from, xi, lambdaSquared, slope, firstNode, secondNode);
    });
  };
  const [nearFirst, nearSecond]: [EndForm, EndForm] = [
    { a: 1, b: 0 },
    { a: 1, b: 0 },
  ];
  function writeSlopes(
    i: number,
    x: number,
    from: number,
    xi: number,
    lambdaSquared: number,
    slope: number,
    one: EndNode,
    other: EndNode,
  ): void {
    // An antisymmetric mode that took this place in the order has no slope of its own.
    if (crossedTo(x)) return;
    const h = 1e-6;
    const phi = (dx: number, dXi: number) => {
      const moved = xi * (1 + dXi);
      moveEnd(nearFirst, first, one, moved / xi);
      moveEnd(nearSecond, second, other, moved / xi);
      return sagFunction(x * (1 + dx), moved, lambdaSquared, nearFirst, nearSecond);
    };
    const byX = (phi(h, 0) - phi(-h, 0)) / (2 * h);
    const byXi = (phi(0, h) - phi(0, -h)) / (2 * h);
    // Φ = 1 − λ²Q and Φ = 0: ∂Φ/∂ln λ² = −1.
    const [xByLambda, xByXi] = [1 / byX, -byXi / byX];
    moveEnd(nearFirst, first, one, 1 + h);
    moveEnd(nearSecond, second, other, 1 + h);
    const baseByXi = (wavenumber(peaks[i]!.mode, xi * (1 + h), nearFirst, nearSecond, from) / from - 1) / h;
    const logSlope = (place: number, byLogXi: number) => byLogXi + (place * place * byLogXi + xi * xi) / (place * place + xi * xi);
    const byLambda = xByLambda * (1 + (x * x) / (x * x + xi * xi));
    const shiftByXi = logSlope(x, xByXi) - logSlope(from, baseByXi);
    out.byTension[i] = byLambda * slope + shiftByXi / 2;
    out.byStiffness[i] = -shiftByXi / 2;
    out.byLength[i] = byLambda * (slope + 5) + shiftByXi;
    out.byMass[i] = byLambda * (slope + 5);
    out.byAxialStiffness[i] = byLambda;
  }
  function crossedTo(x: number): boolean {
    return base.includes(x);
  }
  return { ...out, evaluate };
}

/** An end as ξ grows by a factor: a fixity follows it, a stiffness stays. */
function moveEnd(moved: EndForm, form: EndForm, node: EndNode, factor: number): void {
  moved.a = form.a;
  moved.b = node.stiffness !== null || form.a === 0 ? form.b : form.b * factor;
}

/** How far (ln T, ln EI) may move before the frequencies with attachments are computed anew. */
const linearReach = { t: 1e-4, e: 0.03 };

function attachmentCorrection(problem: FitProblem, sag: SagProperties | null, lumps: LumpedAttachment[]): ModelCorrection {
  const { length, massPerLength, peaks } = problem;
  const out = emptyCorrection(peaks.length);
  const centre = { t: Number.NaN, e: Number.NaN, first: null as EndNode | null, second: null as EndNode | null };
  const value = new Float64Array(peaks.length);
  const planes = [...new Set(peaks.map(({ plane }) => plane))];
  const shiftAt = (t: number, e: number, one: EndNode, other: EndNode): Float64Array => {
    const [tension, bendingStiffness] = [Math.exp(t), Math.exp(e)];
    const xi = length * Math.exp((t - e) / 2);
    const [first, second]: [EndForm, EndForm] = [
      { a: 1, b: 0 },
      { a: 1, b: 0 },
    ];
    setEndForm(first, one, length, e, xi);
    setEndForm(second, other, length, e, xi);
    const cable: AttachedCable = { length, massPerLength, tension, bendingStiffness, first, second, attachments: lumps, sagStiffness: 0 };
    const shift = new Float64Array(peaks.length);
    for (const plane of planes) {
      const highest = Math.max(...peaks.filter((peak) => peak.plane === plane).map(({ mode }) => mode));
      const sagStiffness = plane === 'in-plane' && sag !== null ? sagStiffnessOf(sag, length, tension) : 0;
      const found = attachedFrequencies({ ...cable, sagStiffness }, highest);
      peaks.forEach(({ mode, plane: own }, i) => {
        if (own !== plane) return;
        const x = wavenumber(mode, xi, first, second);
        const bare = (x * Math.sqrt((bendingStiffness * (x * x + xi * xi)) / massPerLength)) / (length * length);
        shift[i] = Math.log(found[mode - 1]! / bare);
      });
    }
    return shift;
  };
  const evaluate = (t: number, e: number, first: EndNode, second: EndNode) => {
    const near = Math.abs(t - centre.t) < linearReach.t && Math.abs(e - centre.e) < linearReach.e;
    if (!near || centre.first !== first || centre.second !== second) {
      Object.assign(centre, { t, e, first, second });
      const h = 1e-4;
      value.set(shiftAt(t, e, first, second));
      const [tUp, tDown, eUp, eDown] = [
        shiftAt(t + h, e, first, second),
        shiftAt(t - h, e, first, second),
        shiftAt(t, e + h, first, second),
        shiftAt(t, e - h, first, second),
      ];
      for (let i = 0; i < peaks.length; i++) {
        out.byTension[i] = (tUp[i]! - tDown[i]!) / (2 * h);
        out.byStiffness[i] = (eUp[i]! - eDown[i]!) / (2 * h);
      }
    }
    for (let i = 0; i < peaks.length; i++) {
      out.shift[i] = value[i]! + out.byTension[i]! * (t - centre.t) + out.byStiffness[i]! * (e - centre.e);
    }
  };
  return { ...out, evaluate };
}
