/**
 * How much the tension of one cable changed between two campaigns.
 *
 * Mass, length, bending stiffness and ends are the same in both and cancel: ln T_1, ln T_2 and ln EI are fitted together at each
 * node of fixity, the fixity of the second campaign following from the same physical stiffness k = s √(T_1 EI). The rule of thumb
 * T_2/T_1 = (f_2/f_1)² is biased for stiff cables and is not used. What does not cancel is a between-campaign term (default
 * 1 % of T, common practice) unless a control cable measured in both shows less.
 *
 * Sources: JCGM 100:2008 (correlated inputs); ISO 11843-1 for the smallest change that could have been seen.
 */
import { type Cable, checkCable, checkPeaks, type ModalPeak } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { buildProblem, type FitProblem } from './fit-problem.ts';
import { type EndNode, type FixityNode, fixityNodes } from './fixity-nodes.ts';
import { settleNoise } from './frequency-noise.ts';
import { mergeComponents, mixtureMoments, mixtureQuantile } from './mixture.ts';
import { modelCorrection } from './model-correction.ts';
import { evaluateModel } from './node-fit.ts';
import { type ModelCorrection, type NodeWorkspace, nodeWorkspace } from './node-workspace.ts';
import { scoutEnds } from './scout-ends.ts';

/** What a caller may choose. */
export interface ChangeOptions {
  /** Standard uncertainty of T_2/T_1 that no common input cancels, as a fraction. Default 0.01. */
  betweenCampaigns?: number;
  /** As for a single estimate. */
  assumedFrequencyUncertainty?: number;
  gravity?: number;
}

/** The change from the first campaign to the second. */
export interface TensionChange {
  /** T_2/T_1 − 1. */
  change: number;
  /** Of T_2/T_1. */
  standardUncertainty: number;
  /** Of T_2/T_1 − 1: quantiles 2.5 and 97.5 %. */
  interval95: [number, number];
  /** Part of the standard uncertainty that comes from the frequencies and the ends alone. */
  withinCampaigns: number;
  /** Smallest |change| that would have been seen with 95 % probability. */
  smallestDetectable: number;
  /** Whether the interval excludes no change. */
  significant: boolean;
}

const defaultBetween = 0.01;
/** z_0.975 + z_0.95. */
const detection = 1.959964 + 1.644854;
const iterationLimit = 30;

/**
 * Change of tension between two campaigns on the same cable, damper, mass and ends confirmed unchanged.
 *
 * @param cable as for the estimates
 * @param before peaks (Hz) of the first campaign
 * @param after peaks (Hz) of the second
 * @param options between-campaign term and defaults
 * @returns relative change with its interval
 * @throws EstimationError as for the estimates; fields of the second campaign begin with `after`
 * Source: see the head of this file.
 */
export function tensionChange(
  cable: Cable,
  before: readonly ModalPeak[],
  after: readonly ModalPeak[],
  options: ChangeOptions = {},
): TensionChange {
  checkCable(cable);
  checkPeaks(before);
  checkAfter(after);
  const between = options.betweenCampaigns ?? defaultBetween;
  assertRange(between, 'options.betweenCampaigns', 0, 0.5);
  const first = prepare(cable, before, options);
  const second = prepare(cable, after, options);
  const nodes = fixityNodes(first.problem.ends, false).map((node) => jointFit(node, first, second));
  const highest = Math.max(...nodes.map(({ logWeight }) => logWeight));
  const mixture = mergeComponents({
    weights: Float64Array.from(nodes, ({ logWeight }) => Math.exp(logWeight - highest)),
    means: Float64Array.from(nodes, ({ change }) => change),
    variances: Float64Array.from(nodes, ({ variance }) => variance),
  });
  const within = mixtureMoments(mixture).variance;
  const whole = { ...mixture, variances: mixture.variances.map((v) => v + between ** 2) };
  const { mean, variance } = mixtureMoments(whole);
  if (!Number.isFinite(mean) || !Number.isFinite(variance))
    throw new EstimationError('not-converged', 'after', 'No common fit of both campaigns was found.');
  const interval95: [number, number] = [Math.expm1(mixtureQuantile(whole, 0.025)), Math.expm1(mixtureQuantile(whole, 0.975))];
  return {
    change: Math.expm1(mean),
    standardUncertainty: Math.exp(mean) * Math.sqrt(variance),
    interval95,
    withinCampaigns: Math.exp(mean) * Math.sqrt(within),
    smallestDetectable: Math.expm1(detection * Math.sqrt(variance)),
    significant: interval95[0] > 0 || interval95[1] < 0,
  };
}

function checkAfter(after: readonly ModalPeak[]): void {
  try {
    checkPeaks(after);
  } catch (error) {
    if (error instanceof EstimationError) throw new EstimationError(error.code, `after.${error.field}`, error.message);
    throw error;
  }
}

interface Prepared {
  problem: FitProblem;
  work: NodeWorkspace;
  correction: ModelCorrection | null;
  start: { logTension: number; logStiffness: number };
  prior: { mean: number; weight: number };
}

function prepare(cable: Cable, peaks: readonly ModalPeak[], { assumedFrequencyUncertainty, gravity }: ChangeOptions): Prepared {
  const given = {
    ...(assumedFrequencyUncertainty === undefined ? {} : { assumedFrequencyUncertainty }),
    ...(gravity === undefined ? {} : { gravity }),
  };
  const raw = buildProblem(cable, peaks, given);
  const work = nodeWorkspace(peaks.length);
  const correction = modelCorrection(raw);
  const { problem, plan } = settleNoise(raw, scoutEnds(cable), work, correction);
  return { problem, work, correction, start: plan.start, prior: normalPrior(problem) };
}

/** Prior on ln EI as mean and weight; a uniform one by its variance, which is enough where it cancels. */
function normalPrior({ prior }: FitProblem): { mean: number; weight: number } {
  if (prior.kind === 'value') return { mean: Math.log(prior.value), weight: 1 / Math.max(prior.relativeUncertainty, 1e-6) ** 2 };
  const [low, high] = [Math.log(prior.bounds[0]), Math.log(prior.bounds[1])];
  return { mean: (low + high) / 2, weight: 12 / (high - low) ** 2 };
}

/** Fits (t_1, t_2, e) at one node by Gauss–Newton; returns t_2 − t_1 with its variance and the weight of the node. */
function jointFit(node: FixityNode, first: Prepared, second: Prepared): { change: number; variance: number; logWeight: number } {
  const state = [first.start.logTension, second.start.logTension, first.start.logStiffness];
  let system = jointSystem(node, first, second, state);
  for (let i = 0; i < iterationLimit; i++) {
    const step = system.step.map((value) => Math.max(-1, Math.min(1, value)));
    step.forEach((value, k) => {
      state[k]! += value;
    });
    system = jointSystem(node, first, second, state);
    if (step.every((value) => Math.abs(value) < 1e-9)) break;
  }
  const c = system.covariance;
  return {
    change: state[1]! - state[0]!,
    variance: c[0]! + c[4]! - 2 * c[1]!,
    logWeight: Math.log(node.prior) - system.objective / 2 + 0.5 * Math.log(system.determinant),
  };
}

interface JointSystem {
  objective: number;
  step: number[];
  /** 3 × 3, row by row, and its determinant. */
  covariance: number[];
  determinant: number;
}

function jointSystem(node: FixityNode, first: Prepared, second: Prepared, [t1, t2, e]: number[]): JointSystem {
  const normal = new Float64Array(9);
  const gradient = new Float64Array(3);
  let objective = first.prior.weight * (e! - first.prior.mean) ** 2;
  normal[8] = first.prior.weight;
  gradient[2] = -first.prior.weight * (e! - first.prior.mean);
  const add = (row: [number, number, number], residual: number, weight: number) => {
    objective += weight * residual * residual;
    for (let a = 0; a < 3; a++) {
      gradient[a]! += weight * row[a]! * residual;
      for (let b = 0; b < 3; b++) normal[3 * a + b]! += weight * row[a]! * row[b]!;
    }
  };
  evaluateModel(first.problem, node.first, node.second, t1!, e!, first.work, first.correction);
  first.problem.weights.forEach((weight, i) => {
    add([first.work.byTension[i]!, 0, first.work.byStiffness[i]!], first.work.residuals[i]!, weight);
  });
  // Half the logarithm of T_1/T_2 is what the same stiffness changes in s.
  const [endA, endB] = [follow(node.first, (t1! - t2!) / 2), follow(node.second, (t1! - t2!) / 2)];
  const asStiffness = [held(node.first, (t1! + e!) / 2), held(node.second, (t1! + e!) / 2)] as const;
  const byFixity = new Float64Array(second.problem.weights.length);
  evaluateModel(second.problem, endA, endB, t2!, e!, second.work, second.correction);
  byFixity.set(second.work.byTension);
  const byStiffness = second.work.byStiffness.slice();
  const residuals = second.work.residuals.slice();
  evaluateModel(second.problem, asStiffness[0], asStiffness[1], t2!, e!, second.work, second.correction);
  second.problem.weights.forEach((weight, i) => {
    const held2 = second.work.byTension[i]!;
    add([byFixity[i]! - held2, held2, byStiffness[i]!], residuals[i]!, weight);
  });
  return solve3(normal, gradient, objective);
}

function follow(end: EndNode, halfLogRatio: number): EndNode {
  if (end.stiffness !== null || end.fixity === 0 || end.fixity === 1) return end;
  const s = (end.fixity / (1 - end.fixity)) * Math.exp(halfLogRatio);
  return { fixity: s / (1 + s), stiffness: null };
}

function held(end: EndNode, halfLogProduct: number): EndNode {
  if (end.stiffness !== null || end.fixity === 0 || end.fixity === 1) return end;
  return { fixity: 0, stiffness: (end.fixity / (1 - end.fixity)) * Math.exp(halfLogProduct) };
}

function solve3(n: Float64Array, g: Float64Array, objective: number): JointSystem {
  const [a, b, c, , d, f, , , h] = n as unknown as number[];
  const [A, B, C] = [d! * h! - f! * f!, c! * f! - b! * h!, b! * f! - c! * d!];
  const determinant = Math.max(a! * A + b! * B + c! * C, 1e-300);
  const inverse = [A, B, C, B, a! * h! - c! * c!, b! * c! - a! * f!, C, b! * c! - a! * f!, a! * d! - b! * b!].map(
    (value) => value / determinant,
  );
  const step = [0, 1, 2].map((row) => inverse[3 * row]! * g[0]! + inverse[3 * row + 1]! * g[1]! + inverse[3 * row + 2]! * g[2]!);
  return { objective, step, covariance: inverse, determinant: 1 / determinant };
}
