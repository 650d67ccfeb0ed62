/**
 * Mode numbers of peaks that carry none: modes may be missing, peaks may be foreign.
 *
 * A wrong order is the worst blunder, because the result looks plausible: calling the fundamental "mode 2" gives a quarter of
 * the tension. Candidates grow from seeds (each of the lowest peaks as mode 1 … 10, times a range of curvatures), are assigned
 * to the nearest mode within gates that narrow, fitted, toggled peak by peak between mode and foreign, and ranked by marginal
 * likelihood (./numbering-score).
 */
import { assertRange, EstimationError } from '../errors.ts';
import { best, plantSeeds, toggle } from './grow-numbering.ts';
import { type Candidate, meanFundamental, type NumberingProblem } from './numbering-score.ts';

/** What is known besides the frequencies. */
export interface NumberingOptions {
  /** Length (m) and mass per length (kg/m): turn a fundamental into a tension. */
  cable?: { length: number; massPerLength: number };
  /** Expected tension (N) and its relative standard uncertainty. */
  tension?: { value: number; relativeUncertainty: number };
  /** Relative standard uncertainty of a frequency; a mixture of 0.2, 0.35 and 0.6 % without it. */
  relativeUncertainty?: number;
}

/** One numbering, with how probable it is among those found. */
export interface ModeNumbering {
  /** One per frequency given; null = foreign. */
  modes: (number | null)[];
  /** How many times as probable as the next in the list. */
  odds: number;
  /** Of this numbering, and of all that mean the same tension within 3 %. */
  probability: number;
  tensionProbability: number;
  /** First natural frequency, Hz. */
  fundamental: number;
  /** N, of the stiff string; null without length and mass. */
  tension: number | null;
}

const mostPeaks = 40;
const listed = 12;

/**
 * Ranked numberings of unnumbered peaks.
 *
 * @param frequencies Hz, any order, 1 to 40
 * @param options cable, expected tension, quality of the frequencies
 * @returns at most twelve numberings, best first; modes in the order of the frequencies given
 * @throws EstimationError `no-peaks`, `out-of-range`, `missing`, naming the field
 * Source: the product's own; calibrated by simulation.
 */
export function numberModes(frequencies: readonly number[], options: NumberingOptions = {}): ModeNumbering[] {
  checkNumbering(frequencies, options);
  const order = frequencies.map((_, index) => index).sort((a, b) => frequencies[a]! - frequencies[b]!);
  const sorted = Float64Array.from(order, (index) => frequencies[index]!);
  const problem: NumberingProblem = {
    frequencies: sorted,
    logs: sorted.map(Math.log),
    noise:
      options.relativeUncertainty === undefined
        ? [
            { sigma: 0.002, weight: 0.3 },
            { sigma: 0.0035, weight: 0.45 },
            { sigma: 0.006, weight: 0.25 },
          ]
        : [{ sigma: options.relativeUncertainty, weight: 1 }],
    prior: fundamentalPrior(options),
  };
  const found = new Map<number, Candidate>();
  plantSeeds(problem, found);
  toggle(problem, found, 30);
  toggle(problem, found, 8);
  toggle(problem, found, 8);
  return describe(problem, best(found, found.size), order, options);
}

function checkNumbering(frequencies: readonly number[], { cable, tension, relativeUncertainty }: NumberingOptions): void {
  if (!Array.isArray(frequencies) || frequencies.length === 0) {
    throw new EstimationError('no-peaks', 'frequencies', 'Give at least one frequency to number.');
  }
  if (frequencies.length > mostPeaks)
    throw new EstimationError('out-of-range', 'frequencies', `At most ${mostPeaks} frequencies are numbered at once.`);
  frequencies.forEach((frequency, index) => {
    assertRange(frequency, `frequencies[${index}]`, 0, 1e6, true);
  });
  if (cable) {
    assertRange(cable.length, 'cable.length', 0, 1e5, true);
    assertRange(cable.massPerLength, 'cable.massPerLength', 0, 1e6, true);
  }
  if (tension) {
    if (!cable) throw new EstimationError('missing', 'cable', 'An expected tension needs length and mass per length.');
    assertRange(tension.value, 'tension.value', 0, 1e15, true);
    assertRange(tension.relativeUncertainty, 'tension.relativeUncertainty', 0, 5, true);
  }
  if (relativeUncertainty !== undefined) assertRange(relativeUncertainty, 'relativeUncertainty', 0, 0.1, true);
}

function fundamentalPrior({ cable, tension }: NumberingOptions): NumberingProblem['prior'] {
  if (!cable || !tension) return null;
  const fundamental = Math.sqrt(tension.value / cable.massPerLength) / (2 * cable.length);
  // The ends shorten a cable by some per cent: the expectation is no better than that.
  return { mean: Math.log(fundamental), deviation: Math.hypot(tension.relativeUncertainty / 2, 0.02) };
}

function describe(
  problem: NumberingProblem,
  candidates: Candidate[],
  order: readonly number[],
  { cable }: NumberingOptions,
): ModeNumbering[] {
  const highest = candidates[0]?.logScore ?? 0;
  const shares = candidates.map(({ logScore }) => Math.exp(logScore - highest));
  const total = shares.reduce((sum, share) => sum + share, 0);
  return candidates.slice(0, listed).map((candidate, i) => {
    const { fundamental, curvature } = candidate;
    const mean = meanFundamental(problem, candidate);
    const modes: (number | null)[] = order.map(() => null);
    candidate.modes.forEach((n, place) => {
      modes[order[place]!] = n === 0 ? null : n;
    });
    // T goes with the square of the fundamental: 3 % in T is 1.5 % here.
    const alike = candidates.reduce(
      (sum, other, j) => (Math.abs(Math.log(other.fundamental / fundamental)) < 0.015 ? sum + shares[j]! : sum),
      0,
    );
    return {
      modes,
      odds: Math.min(1e9, shares[i]! / Math.max(shares[i + 1] ?? 0, 1e-300)),
      probability: shares[i]! / total,
      tensionProbability: alike / total,
      fundamental: mean * Math.sqrt(1 + curvature),
      tension: cable ? 4 * cable.massPerLength * (cable.length * mean) ** 2 : null,
    };
  });
}
