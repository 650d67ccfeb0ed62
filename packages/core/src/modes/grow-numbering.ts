/**
 * Candidates of a numbering: grown from seeds, assigned and fitted through narrowing gates, then varied peak by peak.
 */
import { type Candidate, highestCurvature, modeAt, type NumberingProblem, scoreNumbering } from './numbering-score.ts';

const seedPeaks = 4;
const seedModes = 10;
const seedCurvatures = 18;

/** Candidates from every seed that the expected tension allows. */
export function plantSeeds(problem: NumberingProblem, found: Map<number, Candidate>): void {
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

/** The best candidates, best first. */
export function best(found: Map<number, Candidate>, count: number): Candidate[] {
  return [...found.values()].sort((a, b) => b.logScore - a.logScore).slice(0, count);
}

/** Every peak of the best candidates as foreign where it has a mode, and as its nearest free mode where it has none. */
export function toggle(problem: NumberingProblem, found: Map<number, Candidate>, count: number): void {
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
