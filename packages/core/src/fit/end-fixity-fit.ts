/**
 * Quadrature over what the frequencies can hardly tell: the fixity of the ends, and bending stiffness where they leave it open.
 *
 * For slender cables an end of fixity η acts like a shortening by η ℓ, ℓ = √(EI/T), the same for every mode: T and η cannot
 * be told apart, and choosing an η hides an error larger than everything else. So the fit runs at every node of a quadrature
 * (./fixity-nodes), each node weighted by its evidence (Laplace)
 *
 *   w ∝ p(η) p(EI) exp(−χ²/2) |C|^{1/2} T
 *
 * (C is that of ln T, and all tensions are equally probable beforehand: equally probable logarithms would favour T → 0 where
 * bending explains nearly everything) and the answer is the mixture. Bending stiffness is fitted in the node where a log-normal prior and the frequencies
 * determine it (ln sd ≤ 0.2); otherwise it is integrated over too. The change of the answer with an input p follows by
 * implicit differentiation: within a node δt = −[C Jᵀ W ∂ln f/∂p]_t, and through the weights Cov(t, Σ W r ∂ln f/∂p).
 *
 * Sources: JCGM 100:2008 and 101:2008 for the propagation; the mixture is the product's own, calibrated by simulation.
 */
import { type FitProblem, stringTension } from './fit-problem.ts';
import { type FixityNode, gaussLegendre } from './fixity-nodes.ts';
import { truncatedNormal } from './mixture.ts';
import { fitNode, type NodeFit } from './node-fit.ts';
import type { ModelCorrection, NodeWorkspace, StiffnessFreedom } from './node-workspace.ts';
import { logPrior, type StiffnessPlan } from './stiffness-plan.ts';

/** One component of the posterior. */
export interface PosteriorNode {
  node: FixityNode;
  /** Index of the fixity node: components of one fixity share it. */
  group: number;
  logWeight: number;
  fit: NodeFit;
  /** Parts of the variance of t within the node: from frequencies, from the prior on EI. */
  frequencyVariance: number;
  priorVariance: number;
  length: InputSlope;
  mass: InputSlope;
  axialStiffness: InputSlope;
}

/** How a node answers to the logarithm of an input: ∂t within it, and the slope of its log-evidence. */
export interface InputSlope {
  within: number;
  evidence: number;
}

/**
 * Fits every node.
 *
 * @param problem peaks, weights and prior
 * @param nodes of fixity, with prior shares
 * @param plan how ln EI is treated
 * @param work room for the inner loop
 * @param correction sag and attachments, where there are any
 * @returns components with unnormalised log weights
 */
export function fitFixity(
  problem: FitProblem,
  nodes: readonly FixityNode[],
  plan: StiffnessPlan,
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): PosteriorNode[] {
  const components: PosteriorNode[] = [];
  let start = { logTension: plan.start.logTension, logStiffness: plan.start.logStiffness };
  nodes.forEach((node, group) => {
    const first = components.length;
    if (plan.kind === 'integrated') integrateStiffness(problem, node, group, plan, start, work, correction, components);
    else {
      const freedom: StiffnessFreedom = plan.kind === 'fixed' ? { kind: 'fixed' } : { kind: 'free', mean: plan.mean, weight: plan.weight };
      const fit = fitNode(problem, node.first, node.second, start, freedom, work, correction);
      const whole = component(problem, node, group, fit, freedom, Math.log(node.prior), work);
      components.push(plan.kind === 'fitted' && plan.bounds !== null ? cutToBounds(whole, plan.bounds) : whole);
    }
    const begun = components[first]!.fit;
    if (Number.isFinite(begun.logTension)) start = { logTension: begun.logTension, logStiffness: begun.logStiffness };
  });
  return components;
}

function integrateStiffness(
  problem: FitProblem,
  node: FixityNode,
  group: number,
  plan: StiffnessPlan & { kind: 'integrated' },
  start: { logTension: number; logStiffness: number },
  work: NodeWorkspace,
  correction: ModelCorrection | null,
  components: PosteriorNode[],
): void {
  const [low, high] = plan.range;
  const rule = gaussLegendre(plan.nodes);
  let previous = start;
  rule.nodes.forEach((u, i) => {
    const logStiffness = low + (high - low) * u;
    const from = { logTension: previous.logTension, logStiffness };
    const fit = fitNode(problem, node.first, node.second, from, { kind: 'fixed' }, work, correction);
    const share = Math.log(node.prior * rule.weights[i]!) + logPrior(problem.prior, logStiffness);
    components.push(component(problem, node, group, fit, { kind: 'fixed' }, share, work));
    const ahead = rule.nodes[i + 1];
    // Along the valley of best tension the next node starts almost at its answer.
    previous = {
      logTension: fit.logTension + (ahead === undefined ? 0 : fit.valley * (high - low) * (ahead - u)),
      logStiffness,
    };
  });
}

/** Weight and sensitivities of one fitted node, from what its last evaluation left in the workspace. */
function component(
  problem: FitProblem,
  node: FixityNode,
  group: number,
  fit: NodeFit,
  freedom: StiffnessFreedom,
  logShare: number,
  work: NodeWorkspace,
): PosteriorNode {
  const { weights } = problem;
  const free = freedom.kind === 'free';
  let [tt, te, ee] = [0, 0, 0];
  for (let i = 0; i < weights.length; i++) {
    const w = weights[i]!;
    const jt = work.byTension[i]!;
    const je = work.byStiffness[i]!;
    tt += w * jt * jt;
    te += w * jt * je;
    ee += w * je * je;
  }
  const [ctt, cte] = [fit.varianceTension, free ? fit.covariance : 0];
  const determinant = free ? fit.varianceTension * fit.varianceStiffness - fit.covariance ** 2 : fit.varianceTension;
  return {
    node,
    group,
    logWeight: carriesTension(problem, fit)
      ? logShare - fit.objective / 2 + 0.5 * Math.log(determinant) + fit.logTension
      : Number.NEGATIVE_INFINITY,
    fit,
    frequencyVariance: free ? ctt * ctt * tt + 2 * ctt * cte * te + cte * cte * ee : ctt,
    priorVariance: free ? cte * cte * freedom.weight : 0,
    length: inputSlope(work.byLength, weights, work, ctt, cte),
    mass: inputSlope(work.byMass, weights, work, ctt, cte),
    axialStiffness: inputSlope(work.byAxialStiffness, weights, work, ctt, cte),
  };
}

/**
 * A node whose ln EI is known to lie within bounds: its normal distribution is cut there, and ln T follows along the valley.
 *
 * Source: moments of a truncated normal distribution.
 */
function cutToBounds(whole: PosteriorNode, [low, high]: [number, number]): PosteriorNode {
  const { fit } = whole;
  const sd = Math.sqrt(fit.varianceStiffness);
  const cut = truncatedNormal((low - fit.logStiffness) / sd, (high - fit.logStiffness) / sd);
  const slope = fit.covariance / fit.varianceStiffness;
  const lost = fit.varianceStiffness * (1 - cut.variance);
  return {
    ...whole,
    logWeight: whole.logWeight + cut.logMass,
    // What the bounds take from the variance, they take from that of the frequencies.
    frequencyVariance: Math.max(0, whole.frequencyVariance - slope ** 2 * lost),
    fit: {
      ...fit,
      logTension: fit.logTension + slope * sd * cut.mean,
      logStiffness: fit.logStiffness + sd * cut.mean,
      varianceTension: fit.varianceTension - slope ** 2 * lost,
      covariance: fit.covariance * cut.variance,
      varianceStiffness: fit.varianceStiffness * cut.variance,
    },
  };
}

/** Below this share of the string tension bending alone makes the frequencies, and ln T has no end. */
const slackestShare = 1e-3;

/** Whether a node was fitted at all: where bending explains more than the frequencies, T runs to nothing and its variance away. */
function carriesTension(problem: FitProblem, fit: NodeFit): boolean {
  const floor = Math.log(slackestShare * stringTension(problem.length, problem.massPerLength, problem.peaks));
  return fit.converged && fit.logTension > floor && fit.varianceTension > 0 && fit.varianceTension < 25 && Number.isFinite(fit.objective);
}

/** −[C Jᵀ W ∂ln f/∂p]_t and Σ W r ∂ln f/∂p. */
function inputSlope(byInput: Float64Array, weights: Float64Array, work: NodeWorkspace, ctt: number, cte: number): InputSlope {
  let [t, e, evidence] = [0, 0, 0];
  for (let i = 0; i < weights.length; i++) {
    const weighted = weights[i]! * byInput[i]!;
    t += weighted * work.byTension[i]!;
    e += weighted * work.byStiffness[i]!;
    evidence += weighted * work.residuals[i]!;
  }
  return { within: -(ctt * t + cte * e), evidence };
}

/** Normalised weights of components, summing to 1. */
export function normalisedWeights(components: readonly PosteriorNode[]): Float64Array {
  let highest = Number.NEGATIVE_INFINITY;
  for (const { logWeight } of components) highest = Math.max(highest, logWeight);
  const weights = Float64Array.from(components, ({ logWeight }) => Math.exp(logWeight - highest));
  const total = weights.reduce((sum, w) => sum + w, 0);
  return weights.map((w) => w / total);
}
