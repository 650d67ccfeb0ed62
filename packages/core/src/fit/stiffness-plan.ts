/**
 * How bending stiffness enters a fit: held, fitted under its prior, or integrated over a range that holds all its evidence.
 */
import { type FitProblem, stringTension } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { fitNode, type NodeFit } from './node-fit.ts';
import type { ModelCorrection, NodeWorkspace } from './node-workspace.ts';
import type { StiffnessPrior } from './tension-estimate.ts';

/** Where a fit starts, and what happens to ln EI in it. */
export type StiffnessPlan = { start: { logTension: number; logStiffness: number }; lowestChiSquared: number; spread: number } & (
  | { kind: 'fixed' }
  /** Under a log-normal prior; a weight of zero where bounds alone are known, which then cut the result. */
  | { kind: 'fitted'; mean: number; weight: number; bounds: [number, number] | null }
  /** Quadrature over a range of ln EI with so many nodes. */
  | { kind: 'integrated'; range: [number, number]; nodes: number }
);

/** Beyond this posterior standard deviation of ln EI a normal approximation is not trusted. */
const widestGaussian = 0.2;
/** Evidence below exp(−7) of the highest is left out: 3.7 standard deviations. */
const deepestDrop = 14;
const gridPoints = 7;

/** Log-density of the prior on ln EI, up to a constant. */
export function logPrior(prior: StiffnessPrior, logStiffness: number): number {
  if (prior.kind !== 'value' || prior.relativeUncertainty === 0) return 0;
  return -0.5 * ((logStiffness - Math.log(prior.value)) / priorSpread(prior)) ** 2;
}

/** Standard deviation of ln EI under a log-normal prior: the coefficient of variation taken as it is given. */
function priorSpread(prior: StiffnessPrior & { kind: 'value' }): number {
  return prior.relativeUncertainty;
}

/**
 * Chooses the plan by looking at a few nodes of fixity.
 *
 * @param scouts pairs of ends that span what is possible
 * @returns plan, the lowest χ² seen, and the posterior standard deviation of ln EI at its scout (0 when held)
 */
export function planStiffness(
  problem: FitProblem,
  scouts: readonly [EndNode, EndNode][],
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): StiffnessPlan {
  const { prior } = problem;
  const logTension = Math.log(stringTension(problem.length, problem.massPerLength, problem.peaks));
  if (prior.kind === 'value' && (prior.relativeUncertainty === 0 || prior.value === 0)) {
    // A string has no boundary layer; ξ of a million leaves none either, and keeps one model for all.
    const logStiffness = prior.value === 0 ? logTension + 2 * Math.log(problem.length) - 2 * Math.log(1e6) : Math.log(prior.value);
    const fits = scouts.map(([a, b]) => fitNode(problem, a, b, { logTension, logStiffness }, { kind: 'fixed' }, work, correction));
    const best = lowest(fits);
    return { kind: 'fixed', start: { logTension: best.logTension, logStiffness }, lowestChiSquared: best.chiSquared, spread: 0 };
  }
  const bounds: [number, number] | null = prior.kind === 'value' ? null : [Math.log(prior.bounds[0]), Math.log(prior.bounds[1])];
  const spread = prior.kind === 'value' ? priorSpread(prior) : Number.POSITIVE_INFINITY;
  const mean = bounds === null ? Math.log((prior as StiffnessPrior & { kind: 'value' }).value) : (bounds[0] + bounds[1]) / 2;
  const weight = 1 / spread ** 2;
  const fits = scouts.map(([a, b]) => freeFit(problem, a, b, { logTension, logStiffness: mean }, mean, weight, bounds, work, correction));
  const best = lowest(fits);
  const sharpest = Math.min(...fits.map((fit) => Math.sqrt(fit.varianceStiffness)));
  if (fits.every((fit) => fit.converged && Math.sqrt(fit.varianceStiffness) <= widestGaussian)) {
    return {
      kind: 'fitted',
      mean,
      weight,
      bounds,
      start: best,
      lowestChiSquared: best.chiSquared,
      spread: Math.sqrt(best.varianceStiffness),
    };
  }
  return locateRange(problem, scouts, bounds ?? [mean - 4.5 * spread, mean + 4.5 * spread], logTension, sharpest, work, correction);
}

/**
 * A fit of both, within a broad normal prior over the bounds where there are no better ones, so that it cannot run away; its
 * spread is then that of the frequencies alone.
 */
function freeFit(
  problem: FitProblem,
  first: EndNode,
  second: EndNode,
  start: { logTension: number; logStiffness: number },
  mean: number,
  weight: number,
  bounds: [number, number] | null,
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): NodeFit {
  const broad = bounds === null ? weight : 1 / (bounds[1] - bounds[0]) ** 2;
  return fitNode(problem, first, second, start, { kind: 'free', mean, weight: broad }, work, correction);
}

function lowest(fits: readonly NodeFit[]): NodeFit {
  return fits.reduce((best, fit) => (fit.objective < best.objective ? fit : best));
}

/** Narrows a range of ln EI to where there is evidence, by grids that shrink while most of a grid is empty. */
function locateRange(
  problem: FitProblem,
  scouts: readonly [EndNode, EndNode][],
  whole: [number, number],
  logTension: number,
  sharpest: number,
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): StiffnessPlan {
  let range = whole;
  let relief = 0;
  let best = { objective: Number.POSITIVE_INFINITY, chiSquared: 0, logTension, logStiffness: range[0] };
  for (let round = 0; round < 6; round++) {
    const step = (range[1] - range[0]) / (gridPoints - 1);
    const objectives = new Float64Array(gridPoints).fill(Number.POSITIVE_INFINITY);
    for (const [first, second] of scouts) {
      let start = best.logTension;
      for (let i = 0; i < gridPoints; i++) {
        const logStiffness = range[0] + i * step;
        const fit = fitNode(problem, first, second, { logTension: start, logStiffness }, { kind: 'fixed' }, work, correction);
        const objective = fit.chiSquared - 2 * logPrior(problem.prior, logStiffness);
        objectives[i] = Math.min(objectives[i]!, objective);
        if (objective < best.objective) best = { objective, chiSquared: fit.chiSquared, logTension: fit.logTension, logStiffness };
        start = fit.logTension + fit.valley * step;
      }
    }
    const held = [...objectives.keys()].filter((i) => objectives[i]! < best.objective + deepestDrop);
    const [from, to] = [Math.max(0, (held[0] ?? 0) - 1), Math.min(gridPoints - 1, (held.at(-1) ?? gridPoints - 1) + 1)];
    const narrowed: [number, number] = [range[0] + from * step, range[0] + to * step];
    const enough = to - from >= 4;
    range = narrowed;
    relief = Math.max(...objectives.slice(from, to + 1)) - best.objective;
    if (enough) break;
  }
  // Flat evidence needs few nodes. At one fixity the evidence may be much sharper than over all of them: the nodes keep up.
  const smooth = relief < 3 ? 5 : 8;
  const needed = Math.ceil((range[1] - range[0]) / (1.3 * sharpest)) + 2;
  const nodes = Number.isFinite(needed) ? Math.max(smooth, Math.min(24, needed)) : smooth;
  return { kind: 'integrated', range, nodes, start: best, lowestChiSquared: best.chiSquared, spread: (range[1] - range[0]) / 6 };
}
