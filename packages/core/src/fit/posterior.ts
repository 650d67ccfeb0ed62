/**
 * From fitted nodes to a distribution of ln T: input uncertainties and unknown shifts of the length added.
 */
import type { CableUncertainty } from '../cable/cable.ts';
import { normalisedWeights, type PosteriorNode } from './end-fixity-fit.ts';
import { assumedUncertainty, type FitProblem } from './fit-problem.ts';
import { gaussLegendre } from './fixity-nodes.ts';
import { mergeComponents, mixtureMoments, mixtureQuantile, type NormalMixture } from './mixture.ts';

/** An unknown change of the vibrating length, uniform from 0 to `most` (m; below zero shortens). */
export interface LengthShift {
  source: 'damper' | 'embedment';
  most: number;
}

/** Variance of ln T from each source, and what it adds up to. */
export interface VarianceParts {
  frequencies: number;
  endFixity: number;
  bendingStiffness: number;
  length: number;
  mass: number;
  axialStiffness: number;
  damper: number;
  embedment: number;
}

/** Total derivatives of ln T by the logarithm of an input, the evidence weights moving with it. */
export interface Sensitivities {
  length: number;
  mass: number;
  axialStiffness: number;
}

/** The distribution of ln T, and of the rest. */
export interface Posterior {
  logTension: number;
  variance: number;
  quantile(probability: number): number;
  parts: VarianceParts;
  sensitivities: Sensitivities;
  logStiffness: number;
  stiffnessVariance: number;
  fixity: [{ mean: number; standardDeviation: number }, { mean: number; standardDeviation: number }];
  /** The component of most evidence for its prior share. */
  mode: PosteriorNode;
}

/** Relative standard uncertainties of the inputs with what is left out filled in. */
export function inputUncertainty(given: CableUncertainty | undefined): { length: number; massPerLength: number; axialStiffness: number } {
  return {
    length: given?.length ?? assumedUncertainty.length,
    massPerLength: given?.massPerLength ?? assumedUncertainty.massPerLength,
    axialStiffness: given?.axialStiffness ?? assumedUncertainty.axialStiffness,
  };
}

/**
 * Assembles the posterior.
 *
 * @param problem the settled problem
 * @param components fitted nodes
 * @param shifts of the length that are not known
 */
export function assemblePosterior(problem: FitProblem, components: readonly PosteriorNode[], shifts: readonly LengthShift[]): Posterior {
  const weights = normalisedWeights(components);
  const means = Float64Array.from(components, ({ fit }) => fit.logTension);
  const within = Float64Array.from(components, ({ fit }) => fit.varianceTension);
  const average = (value: (c: PosteriorNode) => number) => components.reduce((sum, c, i) => sum + weights[i]! * value(c), 0);
  const centre = average(({ fit }) => fit.logTension);
  const along = (value: (c: PosteriorNode) => number) => {
    const mean = average(value);
    return average((c) => (c.fit.logTension - centre) * (value(c) - mean));
  };
  const sensitivities: Sensitivities = {
    length: average((c) => c.length.within) + along((c) => c.length.evidence),
    mass: average((c) => c.mass.within) + along((c) => c.mass.evidence),
    axialStiffness: average((c) => c.axialStiffness.within) + along((c) => c.axialStiffness.evidence),
  };
  const u = inputUncertainty(problem.cable.relativeUncertainty);
  const inputs = {
    length: (sensitivities.length * u.length) ** 2,
    mass: (sensitivities.mass * u.massPerLength) ** 2,
    axialStiffness: (sensitivities.axialStiffness * u.axialStiffness) ** 2,
  };
  const shifted = shiftedMixture({ weights, means, variances: within }, shifts, problem.length);
  const added = inputs.length + inputs.mass + inputs.axialStiffness;
  const mixture = mergeComponents({ ...shifted.mixture, variances: shifted.mixture.variances.map((v) => v + added) });
  const between = betweenGroups(components, weights, centre);
  const moments = mixtureMoments(mixture);
  const logStiffness = average(({ fit }) => fit.logStiffness);
  return {
    logTension: logMeanTension(mixture, moments.mean),
    variance: moments.variance,
    quantile: (probability) => mixtureQuantile(mixture, probability),
    parts: {
      frequencies: average((c) => c.frequencyVariance),
      endFixity: between.groups,
      bendingStiffness: average((c) => c.priorVariance) + between.withinGroups,
      ...inputs,
      ...shifted.variance,
    },
    sensitivities,
    logStiffness,
    stiffnessVariance: average(({ fit }) => fit.varianceStiffness + (fit.logStiffness - logStiffness) ** 2),
    fixity: [endFixity(components, weights, 'first'), endFixity(components, weights, 'second')],
    mode: components.reduce((best, c) => (c.logWeight - Math.log(c.node.prior) > best.logWeight - Math.log(best.node.prior) ? c : best)),
  };
}

/**
 * ln of the mean tension over the nodes. Where the nodes lie within some per cent this is their mean of ln T; where bending
 * explains nearly everything on some of them, it is not drawn down by logarithms that run to nothing.
 */
function logMeanTension({ weights, means }: NormalMixture, near: number): number {
  let [total, sum] = [0, 0];
  for (let i = 0; i < weights.length; i++) {
    total += weights[i]!;
    sum += weights[i]! * Math.exp(means[i]! - near);
  }
  return near + Math.log(sum / total);
}

/** Variance of the node means: between fixities, and within one fixity between values of bending stiffness. */
function betweenGroups(
  components: readonly PosteriorNode[],
  weights: Float64Array,
  centre: number,
): { groups: number; withinGroups: number } {
  const byGroup = new Map<number, { weight: number; sum: number; squares: number }>();
  components.forEach(({ group, fit }, i) => {
    const found = byGroup.get(group) ?? { weight: 0, sum: 0, squares: 0 };
    const away = fit.logTension - centre;
    byGroup.set(group, {
      weight: found.weight + weights[i]!,
      sum: found.sum + weights[i]! * away,
      squares: found.squares + weights[i]! * away ** 2,
    });
  });
  let [groups, withinGroups] = [0, 0];
  for (const { weight, sum, squares } of byGroup.values()) {
    if (weight === 0) continue;
    groups += sum ** 2 / weight;
    withinGroups += Math.max(0, squares - sum ** 2 / weight);
  }
  return { groups, withinGroups };
}

/** T grows with the square of the vibrating length: every shift spreads ln T by 2 ln(1 + s/L). */
function shiftedMixture(
  mixture: NormalMixture,
  shifts: readonly LengthShift[],
  length: number,
): { mixture: NormalMixture; variance: { damper: number; embedment: number } } {
  const rule = gaussLegendre(5);
  const variance = { damper: 0, embedment: 0 };
  let current = mixture;
  for (const { source, most } of shifts) {
    const steps = rule.nodes.map((place) => 2 * Math.log(1 + (most * place) / length));
    const merged = mergeComponents(current);
    const spread = <T>(value: (i: number, j: number) => T) => [...merged.weights.keys()].flatMap((i) => steps.map((_, j) => value(i, j)));
    current = {
      weights: Float64Array.from(spread((i, j) => merged.weights[i]! * rule.weights[j]!)),
      means: Float64Array.from(spread((i, j) => merged.means[i]! + steps[j]!)),
      variances: Float64Array.from(spread((i) => merged.variances[i]!)),
    };
    variance[source] += mixtureMoments({
      weights: Float64Array.from(rule.weights),
      means: Float64Array.from(steps),
      variances: new Float64Array(5),
    }).variance;
  }
  return { mixture: current, variance };
}

function endFixity(
  components: readonly PosteriorNode[],
  weights: Float64Array,
  end: 'first' | 'second',
): { mean: number; standardDeviation: number } {
  const other = end === 'first' ? 'second' : 'first';
  const values = components.map((c) => [fixityOf(c, end), fixityOf(c, c.node.mirrored ? other : end)] as const);
  const mean = values.reduce((sum, [a, b], i) => sum + (weights[i]! * (a + b)) / 2, 0);
  const variance = values.reduce((sum, [a, b], i) => sum + (weights[i]! * ((a - mean) ** 2 + (b - mean) ** 2)) / 2, 0);
  return { mean, standardDeviation: Math.sqrt(variance) };
}

function fixityOf({ node, fit }: PosteriorNode, end: 'first' | 'second'): number {
  const { fixity, stiffness } = node[end];
  if (stiffness === null) return fixity;
  const s = stiffness * Math.exp(-(fit.logTension + fit.logStiffness) / 2);
  return s / (1 + s);
}
