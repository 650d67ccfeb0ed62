/**
 * Propagation of distributions as a check on the budget: inputs drawn from what is known of them, the fit repeated.
 *
 * Each draw takes its own length, mass and axial stiffness from their normal distributions, frequencies displaced by their
 * uncertainties, and ends displaced within what the evidence leaves of them; bending stiffness stays under its prior.
 *
 * Source: JCGM 101:2008.
 */
import type { Cable, EndCondition, ModalPeak } from '../cable/cable.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { estimateTension } from './estimate-tension.ts';
import { fixityRange } from './fixity-nodes.ts';
import type { EstimateOptions } from './tension-estimate.ts';

/** What came out of the draws. */
export interface MonteCarloResult {
  /** N */
  tension: number;
  standardUncertainty: number;
  /** N: quantiles 2.5 and 97.5 % of the draws. */
  interval95: [number, number];
  /** Draws that gave a tension, of those asked for. */
  draws: number;
  asked: number;
}

/**
 * Repeats a fit with drawn inputs.
 *
 * @param cable as for the estimate
 * @param peaks as for the estimate
 * @param random uniform numbers in [0, 1), seeded by the caller: the same seed gives the same result
 * @param draws how many, from 10 to 100 000
 * @param options as for the estimate
 * @returns mean, standard deviation and interval of the drawn tensions (N)
 * @throws EstimationError as {@link estimateTension}
 * Source: JCGM 101:2008.
 */
export function monteCarloTension(
  cable: Cable,
  peaks: readonly ModalPeak[],
  random: () => number,
  draws: number,
  options: EstimateOptions = {},
): MonteCarloResult {
  assertRange(draws, 'draws', 10, 100_000);
  const nominal = estimateTension(cable, peaks, options);
  // 1 − u lies in (0, 1], where the logarithm is finite (Box & Muller 1958).
  const normal = () => Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random());
  const u = nominal.inputs.relativeUncertainty;
  const relative = nominal.inputs.frequencyUncertainty;
  const order = nominal.residuals;
  const tensions: number[] = [];
  const asked = Math.round(draws);
  for (let i = 0; i < asked; i++) {
    const moved: Cable = {
      ...cable,
      length: cable.length * Math.exp(u.length * normal()),
      massPerLength: cable.massPerLength * Math.exp(u.massPerLength * normal()),
      ...(cable.axialStiffness === undefined ? {} : { axialStiffness: cable.axialStiffness * Math.exp(u.axialStiffness * normal()) }),
      ends: drawEnds(nominal.inputs.ends, nominal.fixity, normal),
    };
    const shaken = order.map(({ mode, plane, frequency }, k) => {
      const displaced = frequency * Math.exp(relative[k]! * normal());
      return { mode, plane, frequency: displaced, standardUncertainty: relative[k]! * displaced };
    });
    const tension = attempt(moved, shaken, options);
    if (tension !== null) tensions.push(tension);
  }
  return summary(tensions, asked);
}

/** A draw whose frequencies fall out of order, or that no tension fits, is left out and counted. */
function attempt(cable: Cable, peaks: readonly ModalPeak[], options: EstimateOptions): number | null {
  try {
    return estimateTension(cable, peaks, options).tension;
  } catch (error) {
    if (error instanceof EstimationError) return null;
    throw error;
  }
}

/** Open ends become single fixities, drawn around what the frequencies left of them and kept within their range. */
function drawEnds(
  ends: readonly [EndCondition, EndCondition],
  fixity: readonly { mean: number; standardDeviation: number }[],
  normal: () => number,
): [EndCondition, EndCondition] {
  // Ends are alike in half of the prior: one number moves both half of the time, on average.
  const shared = normal();
  const draw = (end: EndCondition, index: number): EndCondition => {
    const range = fixityRange(end);
    if (range === null || range[0] === range[1]) return end;
    const { mean, standardDeviation } = fixity[index]!;
    const value = mean + standardDeviation * (Math.SQRT1_2 * shared + Math.SQRT1_2 * normal());
    const eta = Math.min(range[1], Math.max(range[0], value));
    return { fixity: [eta, eta] };
  };
  return [draw(ends[0], 0), draw(ends[1], 1)];
}

function summary(tensions: number[], asked: number): MonteCarloResult {
  if (tensions.length < 10) throw new EstimationError('not-converged', 'draws', 'Too few draws gave a tension.');
  const sorted = tensions.sort((a, b) => a - b);
  const mean = sorted.reduce((sum, value) => sum + value, 0) / sorted.length;
  const variance = sorted.reduce((sum, value) => sum + (value - mean) ** 2, 0) / (sorted.length - 1);
  const quantile = (p: number) => sorted[Math.min(sorted.length - 1, Math.floor(p * sorted.length))]!;
  return {
    tension: mean,
    standardUncertainty: Math.sqrt(variance),
    interval95: [quantile(0.025), quantile(0.975)],
    draws: sorted.length,
    asked,
  };
}
