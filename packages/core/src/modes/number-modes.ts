/**
 * Mode numbers of peaks that carry none: modes may be missing, peaks may be foreign.
 *
 * A wrong order is the worst blunder, because the result looks plausible: calling the fundamental "mode 2" gives a quarter of
 * the tension. Candidates grow from seeds (each of the lowest peaks as mode 1 … 10, times a range of curvatures), are assigned
 * to the nearest mode within gates that narrow, fitted, toggled peak by peak between mode and foreign, and ranked by marginal
 * likelihood (./numbering-score).
 */
import { assertRange, EstimationError } from '../errors.ts';
import { type Candidate, highestCurvature, modeAt, type NumberingProblem, scoreNumbering } from './numbering-score.ts';

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
const seedPeaks = 4;
const seedModes = 10;
const seedCurvatures = 18;
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
  return describe(best(found, found.size), order, options);
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

function plantSeeds(problem: NumberingProblem, found: Map<number, Candidate>): void {
  const { frequencies, prior } = problem;
  const top = Math.log1p(100 * highestCurvature);
  // Many seeds grow into the same numbering: what has been seen half-way is not grown again.
  const seedlings = new Set<number>();
  for (let peak = 0; peak < Math.min(seedPeaks, frequencies.length); peak++) {
    for (let mode = 1; mode <= seedModes; mode++) {
      for (let k = 0; k < seedCurvatures; k++) {
        const curvature = Math.expm1((top * k) / (seedCurvatures - 1)) / 100;
        const fundamental = frequencies[peak]! / (mode * Math.sqrt(1 + curvature * mode * mode));
        if (prior !== null && Math.abs(Math.log(fundamental) - prior.mean) > 4.5 * prior.deviation + 0.02) continue;
        const candidate = grow(problem, fundamental, curvature, seedlings);
        if (candidate !== null) keep(problem, found, candidate);
      }
    }
  }
}

/** Assigns, fits and assigns again, through gates that narrow; null where another seed led here before. */
function grow(problem: NumberingProblem, fundamental: number, curvature: number, seedlings: Set<number>): Candidate | null {
  const candidate: Candidate = { modes: new Int16Array(problem.frequencies.length), fundamental, curvature, logScore: 0 };
  for (const gate of [0.025, 0.02, 0.014]) {
    if (assign(problem, candidate, gate) === 0) return null;
    const key = numberingKey(candidate.modes);
    if (gate > 0.014) {
      if (seedlings.has(key * 2 + (gate > 0.02 ? 0 : 1))) return null;
      seedlings.add(key * 2 + (gate > 0.02 ? 0 : 1));
    }
    refit(problem, candidate);
  }
  return assign(problem, candidate, 0.014) === 0 ? null : candidate;
}

/** A number that tells numberings apart: two 32-bit hashes in the 52 bits of a double that doubling leaves. */
function numberingKey(modes: Int16Array): number {
  let [high, low] = [7, 11];
  for (const n of modes) {
    high = (Math.imul(high, 31) + n) | 0;
    low = (Math.imul(low, 1000003) ^ (n + 1)) | 0;
  }
  return (high >>> 0) * 0x80000 + (low & 0x7ffff);
}

/** Gives each peak its nearest mode within the gate; of two on one mode the nearer stays. Returns how many have one. */
function assign({ frequencies }: NumberingProblem, candidate: Candidate, gate: number): number {
  const { modes, fundamental, curvature } = candidate;
  let named = 0;
  let last = -1;
  let lastResidual = 0;
  for (let i = 0; i < frequencies.length; i++) {
    modes[i] = 0;
    const n = Math.round(modeAt(frequencies[i]!, fundamental, curvature));
    if (n < 1 || n > 200) continue;
    const residual = Math.abs(Math.log(frequencies[i]! / (n * fundamental * Math.sqrt(1 + curvature * n * n))));
    if (residual > Math.min(gate, 0.3 / n)) continue;
    if (last >= 0 && modes[last] === n) {
      if (residual >= lastResidual) continue;
      modes[last] = 0;
      named--;
    }
    modes[i] = n;
    last = i;
    lastResidual = residual;
    named++;
  }
  return named;
}

/** Line of (f/n)² on n², all peaks equally good relative to their frequency. */
function refit({ frequencies }: NumberingProblem, candidate: Candidate): void {
  const { modes } = candidate;
  let [w, x, y, xx, xy] = [0, 0, 0, 0, 0];
  for (let i = 0; i < modes.length; i++) {
    const n = modes[i]!;
    if (n === 0) continue;
    const square = n * n;
    const height = (frequencies[i]! / n) ** 2;
    const weight = 1 / (height * height);
    w += weight;
    x += weight * square;
    y += weight * height;
    xx += weight * square * square;
    xy += weight * square * height;
  }
  const determinant = w * xx - x * x;
  // One mode, or modes that do not differ: the curvature stays.
  const slope = determinant > 1e-12 * w * xx ? (w * xy - x * y) / determinant : Number.NaN;
  if (Number.isNaN(slope)) {
    candidate.fundamental = Math.sqrt(y / (w + candidate.curvature * x));
    return;
  }
  const intercept = (y - slope * x) / w;
  const curvature = intercept > 0 ? slope / intercept : highestCurvature;
  candidate.curvature = Math.max(0, Math.min(highestCurvature, curvature));
  candidate.fundamental = Math.sqrt(y / (w + candidate.curvature * x));
}

function keep(problem: NumberingProblem, found: Map<number, Candidate>, candidate: Candidate): void {
  const key = numberingKey(candidate.modes);
  if (found.has(key)) return;
  candidate.logScore = scoreNumbering(problem, candidate);
  if (candidate.logScore > Number.NEGATIVE_INFINITY) found.set(key, candidate);
}

function best(found: Map<number, Candidate>, count: number): Candidate[] {
  return [...found.values()].sort((a, b) => b.logScore - a.logScore).slice(0, count);
}

/** Every peak of the best candidates as foreign where it has a mode, and as its nearest free mode where it has none. */
function toggle(problem: NumberingProblem, found: Map<number, Candidate>, count: number): void {
  for (const candidate of best(found, count)) {
    for (let i = 0; i < candidate.modes.length; i++) {
      const modes = candidate.modes.slice();
      const nearest = Math.round(modeAt(problem.frequencies[i]!, candidate.fundamental, candidate.curvature));
      modes[i] = modes[i] === 0 ? nearest : 0;
      if (modes[i] !== 0 && (nearest < 1 || nearest > 200 || candidate.modes.includes(nearest))) continue;
      if (modes.every((n) => n === 0)) continue;
      const changed = { ...candidate, modes };
      refit(problem, changed);
      keep(problem, found, changed);
    }
  }
}

function describe(candidates: Candidate[], order: readonly number[], { cable }: NumberingOptions): ModeNumbering[] {
  const highest = candidates[0]?.logScore ?? 0;
  const shares = candidates.map(({ logScore }) => Math.exp(logScore - highest));
  const total = shares.reduce((sum, share) => sum + share, 0);
  return candidates.slice(0, listed).map((candidate, i) => {
    const { fundamental, curvature } = candidate;
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
      fundamental: fundamental * Math.sqrt(1 + curvature),
      tension: cable ? 4 * cable.massPerLength * (cable.length * fundamental) ** 2 : null,
    };
  });
}
