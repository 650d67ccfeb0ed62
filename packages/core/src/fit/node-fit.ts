/**
 * Weighted non-linear least squares at one node: both ends held, t = ln T and e = ln EI (or t alone) fitted to ln f_n.
 *
 * Gauss–Newton with exact derivatives of the phase closure (../models/end-rotation). With x = βL, y² = x² + ξ²:
 *
 *   ln f = ln x + ln y + (e − ln m)/2 − ln(2πL²)
 *
 * so that ∂ln f/∂p follows from ∂x/∂p. A log-normal prior on EI is one more observation. Everything is written into a
 * workspace made once per estimate: the inner loop allocates nothing.
 */
import type { EndForm } from '../models/end-rotation.ts';
import { solveWavenumber } from '../models/end-rotation.ts';
import type { FitProblem } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import type { ModelCorrection, NodeWorkspace, StiffnessFreedom } from './node-workspace.ts';
import { type Quadratic, quadratic } from './quadratic-model.ts';

/** The fit at a node. Covariances are those of (t, e) given the node. */
export interface NodeFit {
  logTension: number;
  logStiffness: number;
  /** Of the frequencies alone, and with the prior on EI. */
  chiSquared: number;
  objective: number;
  varianceTension: number;
  covariance: number;
  varianceStiffness: number;
  /** ∂t/∂e along the valley of best t, for the next start. */
  valley: number;
  converged: boolean;
}

const iterationLimit = 40;

/**
 * Fits one node.
 *
 * @param problem peaks and weights
 * @param first, second the ends
 * @param start t and e to begin with
 * @param freedom whether e is fitted
 * @param workspace left holding residuals and derivatives of the last evaluation
 * @param correction sag and attachments, where there are any
 * @returns the optimum, its covariance and χ²
 */
export function fitNode(
  problem: FitProblem,
  first: EndNode,
  second: EndNode,
  start: { logTension: number; logStiffness: number },
  freedom: StiffnessFreedom,
  workspace: NodeWorkspace,
  correction: ModelCorrection | null = null,
): NodeFit {
  let { logTension: t, logStiffness: e } = start;
  let accepted: Quadratic | null = null;
  let [stepT, stepE] = [0, 0];
  let converged = false;
  for (let i = 0; i < iterationLimit; i++) {
    evaluateModel(problem, first, second, t + stepT, e + stepE, workspace, correction);
    const here = quadratic(problem, workspace, freedom, e + stepE);
    if (accepted !== null && !(here.objective <= accepted.objective * (1 + 1e-10) + 1e-9)) {
      // Overshot: half the step, from the last good place.
      [stepT, stepE] = [0.4 * stepT, 0.4 * stepE];
      if (Math.abs(stepT) < 1e-13 && Math.abs(stepE) < 1e-11) break;
      continue;
    }
    [t, e] = [t + stepT, e + stepE];
    accepted = here;
    [stepT, stepE] = [clampStep(here.stepT, 1), clampStep(here.stepE, 1.5)];
    // Convergence is nearly quadratic: after a step this small what is left is below a hundred-millionth.
    if (Math.abs(stepT) < 3e-6 && Math.abs(stepE) < 3e-5) {
      converged = true;
      break;
    }
  }
  const best = accepted!;
  return {
    logTension: t + stepT,
    logStiffness: e + stepE,
    // The last step is taken without another look: what it gains is known from the quadratic model.
    chiSquared: Math.max(0, best.chiSquared - (converged ? best.gain : 0)),
    objective: Math.max(0, best.objective - (converged ? best.gain : 0)),
    varianceTension: best.varianceTension,
    covariance: best.covariance,
    varianceStiffness: best.varianceStiffness,
    valley: best.valley,
    converged,
  };
}

function clampStep(step: number, limit: number): number {
  return Number.isFinite(step) ? Math.max(-limit, Math.min(limit, step)) : 0;
}

/**
 * Residuals ln f_measured − ln f_model and the derivatives of ln f_model by t, e and ln L, into the workspace.
 */
export function evaluateModel(
  problem: FitProblem,
  first: EndNode,
  second: EndNode,
  t: number,
  e: number,
  work: NodeWorkspace,
  correction: ModelCorrection | null = null,
): void {
  const { length, modes, logFrequencies } = problem;
  const xi = length * Math.exp((t - e) / 2);
  setEndForm(work.first, first, length, e, xi);
  setEndForm(work.second, second, length, e, xi);
  const constant = (e - Math.log(problem.massPerLength)) / 2 - Math.log(2 * Math.PI * length * length);
  const { solution } = work;
  correction?.evaluate(t, e, first, second);
  for (let i = 0; i < modes.length; i++) {
    solveWavenumber(modes[i]!, xi, work.first, work.second, solution, work.wavenumbers[i]!);
    const x = solution[0]!;
    work.wavenumbers[i] = x;
    const square = x * x + xi * xi;
    const byXi = solution[1]! * xi;
    const first1 = solution[2]! * work.first.b;
    const second1 = solution[3]! * work.second.b;
    // A fixity follows ξ; a given stiffness follows 1/EI.
    const following = byXi + (first.stiffness === null ? first1 : 0) + (second.stiffness === null ? second1 : 0);
    const xt = following / 2;
    const xe = -following / 2 - (first.stiffness === null ? 0 : first1) - (second.stiffness === null ? 0 : second1);
    const xl = byXi + first1 + second1;
    let model = Math.log(x) + Math.log(square) / 2 + constant;
    work.byTension[i] = xt / x + (x * xt + (xi * xi) / 2) / square;
    work.byStiffness[i] = 0.5 + xe / x + (x * xe - (xi * xi) / 2) / square;
    work.byLength[i] = -2 + xl / x + (x * xl + xi * xi) / square;
    work.byMass[i] = -0.5;
    work.byAxialStiffness[i] = 0;
    if (correction) {
      model += correction.shift[i]!;
      work.byLength[i]! += correction.byLength[i]!;
      work.byMass[i]! += correction.byMass[i]!;
      work.byAxialStiffness[i] = correction.byAxialStiffness[i]!;
      work.byTension[i]! += correction.byTension[i]!;
      work.byStiffness[i]! += correction.byStiffness[i]!;
    }
    work.residuals[i] = logFrequencies[i]! - model;
  }
}

/** Writes an end node in the form of the models, at e = ln EI and ξ. */
export function setEndForm(form: EndForm, end: EndNode, length: number, e: number, xi: number): void {
  if (end.stiffness !== null) {
    form.a = 1;
    form.b = (end.stiffness * length) / Math.exp(e);
  } else if (end.fixity >= 1) {
    form.a = 0;
    form.b = 1;
  } else {
    form.a = 1 - end.fixity;
    form.b = end.fixity * xi;
  }
}
