/**
 * How probable a numbering of peaks is: marginal likelihood over fundamental, curvature and quality of the frequencies.
 *
 * A hinged stiff string has f_n = n f_0 √(1 + B n²), B = π²/ξ². For a numbering that gives k peaks the modes n_i and calls the
 * rest foreign,
 *
 *   p = Σ_σ w_σ · mean over B of ∫ Π N(ln f_i − ln(n_i f_0 √(1 + B n_i²)); σ)/f_i · p(ln f_0) d ln f_0
 *       × (0.7/(1.05 f_max))^foreign × detection
 *
 * with the integral over ln f_0 analytic, B uniform in v = ln((B + 1e-4)/1e-4) and integrated by the trapezoidal rule around the
 * fitted one, and detection of the modes below f_max as Beta(3, 1.5), 1 % each for "even modes only" and "odd modes only".
 * Values tuned by simulation.
 */

/** A numbering being weighed: modes of the sorted peaks, 0 for foreign. */
export interface Candidate {
  modes: Int16Array;
  /** Of the string: n f_0 √(1 + B n²). */
  fundamental: number;
  curvature: number;
  logScore: number;
}

/** What does not change between candidates. */
export interface NumberingProblem {
  /** Ascending, Hz. */
  frequencies: Float64Array;
  logs: Float64Array;
  /** Relative standard uncertainties of a frequency, and their weights. */
  noise: { sigma: number; weight: number }[];
  /** ln f_0 known beforehand, and its standard deviation; null without a tension. */
  prior: { mean: number; deviation: number } | null;
}

/** B = π²/ξ² up to ξ of about 10. */
export const highestCurvature = 0.1;
const curvatureUnit = 1e-4;
const curvatureWidth = Math.log((highestCurvature + curvatureUnit) / curvatureUnit);
/** The trapezoidal rule is exact to a per cent on a normal distribution with steps of two standard deviations. */
const curvaturePoints = 11;
const foreignRate = 0.7;
/** Share of surveys in which every odd mode, or every even one, stays unseen (common practice). */
const onlyHalf = 0.01;
/** ln f_0 without a tension: flat over a factor of a thousand. */
const flatDensity = 1 / Math.log(1000);

/** Mode number (a real) that a string of f_0 and B has at f. */
export function modeAt(frequency: number, fundamental: number, curvature: number): number {
  const ratio = frequency / fundamental;
  if (curvature < 1e-9) return ratio;
  return Math.sqrt((Math.sqrt(1 + 4 * curvature * ratio * ratio) - 1) / (2 * curvature));
}

/** ln of the probability of a candidate's numbering, up to a constant; −∞ without any mode. */
export function scoreNumbering(problem: NumberingProblem, candidate: Candidate): number {
  const { frequencies, logs } = problem;
  const { modes } = candidate;
  let named = 0;
  let logDensity = 0;
  let highest = 0;
  for (let i = 0; i < modes.length; i++) {
    if (modes[i] === 0) continue;
    named++;
    logDensity -= logs[i]!;
    highest = Math.max(highest, modes[i]!);
  }
  if (named === 0) return Number.NEGATIVE_INFINITY;
  const top = frequencies[frequencies.length - 1]!;
  // A foreign peak may stand above the last mode: modes up to there could have been seen.
  const visible = Math.max(highest, Math.min(mostVisible, Math.floor(modeAt(top, candidate.fundamental, candidate.curvature) + 0.02)));
  const foreign = (modes.length - named) * Math.log(foreignRate / (1.05 * top));
  return Math.log(marginal(problem, candidate, named)) + logDensity + foreign + Math.log(detection(modes, named, visible));
}

/** Integral over ln f_0, curvature and noise. */
function marginal(problem: NumberingProblem, candidate: Candidate, named: number): number {
  let total = 0;
  overCurvature(problem, candidate, named, (curvature, share) => {
    total += share * atCurvature(problem, candidate.modes, curvature, named);
  });
  return total;
}

/**
 * Fundamental of a numbering as the mean over curvature: the fitted curvature of a few noisy peaks wanders, its prior holds it.
 */
export function meanFundamental(problem: NumberingProblem, candidate: Candidate): number {
  const { modes } = candidate;
  const named = modes.reduce((count, n) => count + (n > 0 ? 1 : 0), 0);
  let total = 0;
  let sum = 0;
  overCurvature(problem, candidate, named, (curvature, share) => {
    const weight = share * atCurvature(problem, modes, curvature, named);
    const logs = modes.reduce(
      (all, n, i) => (n === 0 ? all : all + problem.logs[i]! - modeLogs[n]! - 0.5 * Math.log(1 + curvature * n * n)),
      0,
    );
    total += weight;
    sum += (weight * logs) / named;
  });
  return total > 0 ? Math.exp(sum / total) : candidate.fundamental;
}

/** Trapezoidal rule in v around the fitted curvature; shares carry the prior density. */
function overCurvature(
  problem: NumberingProblem,
  { modes, curvature }: Candidate,
  named: number,
  visit: (curvature: number, share: number) => void,
): void {
  const widest = problem.noise.reduce((most, { sigma }) => Math.max(most, sigma), 0);
  const reach = 3.5 * widest * curvatureDeviation(modes, curvature, named);
  const place = (b: number) => Math.log((Math.max(0, Math.min(highestCurvature, b)) + curvatureUnit) / curvatureUnit);
  const from = place(curvature - reach);
  const step = (place(curvature + reach) - from) / (curvaturePoints - 1);
  for (let k = 0; k < curvaturePoints; k++) {
    const edge = k === 0 || k === curvaturePoints - 1 ? 0.5 : 1;
    visit(curvatureUnit * Math.expm1(from + k * step), (edge * step) / curvatureWidth);
  }
}

/** Standard deviation of B over that of a frequency, the fundamental being free; without end for a single mode. */
function curvatureDeviation(modes: Int16Array, curvature: number, named: number): number {
  let sum = 0;
  let squares = 0;
  for (const n of modes) {
    if (n === 0) continue;
    const slope = (n * n) / (2 * (1 + curvature * n * n));
    sum += slope;
    squares += slope * slope;
  }
  const spread = squares - (sum * sum) / named;
  return spread > 1e-9 ? 1 / Math.sqrt(spread) : 1e9;
}

/** Integral over ln f_0 and noise at one curvature. */
function atCurvature({ logs, noise, prior }: NumberingProblem, modes: Int16Array, curvature: number, named: number): number {
  let sum = 0;
  let squares = 0;
  for (let i = 0; i < modes.length; i++) {
    const n = modes[i]!;
    if (n === 0) continue;
    const d = logs[i]! - modeLogs[n]! - 0.5 * Math.log(1 + curvature * n * n);
    sum += d;
    squares += d * d;
  }
  const mean = sum / named;
  const scatter = Math.max(0, squares - sum * mean);
  let total = 0;
  for (const { sigma, weight } of noise) {
    const exponent = scatter / (2 * sigma * sigma);
    if (exponent > 600) continue;
    const spread = (2 * Math.PI * sigma * sigma) ** (-(named - 1) / 2) / Math.sqrt(named);
    total += weight * spread * Math.exp(-exponent) * fundamentalDensity(prior, mean, sigma / Math.sqrt(named));
  }
  return total;
}

/** No survey shows more modes than this; the bound keeps the count below short. */
const mostVisible = 400;
const modeLogs = Float64Array.from({ length: 201 }, (_, n) => Math.log(Math.max(1, n)));

function fundamentalDensity(prior: NumberingProblem['prior'], mean: number, deviation: number): number {
  if (prior === null) return flatDensity;
  const variance = prior.deviation ** 2 + deviation ** 2;
  return Math.exp(-((mean - prior.mean) ** 2) / (2 * variance)) / Math.sqrt(2 * Math.PI * variance);
}

/** Probability of seeing just these modes of those visible. */
function detection(modes: Int16Array, named: number, visible: number): number {
  let even = 0;
  for (const n of modes) if (n > 0 && n % 2 === 0) even++;
  const half = Math.floor(visible / 2);
  const onlyEven = even === named ? onlyHalf * seen(named, Math.max(named, half)) : 0;
  const onlyOdd = even === 0 ? onlyHalf * seen(named, Math.max(named, visible - half)) : 0;
  return (1 - 2 * onlyHalf) * seen(named, Math.max(named, visible)) + onlyEven + onlyOdd;
}

/** B(3 + k, 1.5 + M − k)/B(3, 1.5): k of M seen when each is seen with a probability that is Beta(3, 1.5). */
function seen(named: number, visible: number): number {
  let value = 1;
  for (let i = 0; i < named; i++) value *= (3 + i) / (4.5 + i);
  for (let i = 0; i < visible - named; i++) value *= (1.5 + i) / (4.5 + named + i);
  return value;
}
