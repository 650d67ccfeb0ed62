/**
 * A mixture of normal distributions of ln T: its moments and quantiles.
 */
import { errorFunction } from 'simple-statistics';

/** Shares (any positive scale), means and variances, one entry a component. */
export interface NormalMixture {
  weights: Float64Array;
  means: Float64Array;
  variances: Float64Array;
}

/** Components beyond this are merged by their place: quantiles need no more. */
const mostComponents = 48;

/** Mean and variance of a mixture. */
export function mixtureMoments({ weights, means, variances }: NormalMixture): { mean: number; variance: number } {
  let [total, mean] = [0, 0];
  for (let i = 0; i < weights.length; i++) {
    total += weights[i]!;
    mean += weights[i]! * means[i]!;
  }
  mean /= total;
  let variance = 0;
  for (let i = 0; i < weights.length; i++) variance += weights[i]! * (variances[i]! + (means[i]! - mean) ** 2);
  return { mean, variance: variance / total };
}

/**
 * Merges components that lie close together into one of the same mean and variance.
 *
 * Bins are a fraction of the spread, so that what is merged lies within a small part of the width of the whole.
 */
export function mergeComponents(mixture: NormalMixture): NormalMixture {
  const { weights, means, variances } = mixture;
  if (weights.length <= mostComponents) return mixture;
  let [low, high] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const mean of means) [low, high] = [Math.min(low, mean), Math.max(high, mean)];
  const width = (high - low) / mostComponents || 1;
  const merged = {
    weights: new Float64Array(mostComponents),
    means: new Float64Array(mostComponents),
    variances: new Float64Array(mostComponents),
  };
  for (let i = 0; i < weights.length; i++) {
    const bin = Math.min(mostComponents - 1, Math.floor((means[i]! - low) / width));
    merged.weights[bin]! += weights[i]!;
    merged.means[bin]! += weights[i]! * means[i]!;
    merged.variances[bin]! += weights[i]! * (variances[i]! + means[i]! ** 2);
  }
  const kept = [...merged.weights.keys()].filter((bin) => merged.weights[bin]! > 0);
  const mean = (bin: number) => merged.means[bin]! / merged.weights[bin]!;
  return {
    weights: Float64Array.from(kept, (bin) => merged.weights[bin]!),
    means: Float64Array.from(kept, mean),
    // Cancellation may leave a bin of one component a hair below zero.
    variances: Float64Array.from(kept, (bin) => Math.max(0, merged.variances[bin]! / merged.weights[bin]! - mean(bin) ** 2)),
  };
}

/**
 * Quantile of a mixture by bracketed Newton on its distribution function.
 *
 * @param mixture at least one component of positive variance
 * @param probability above 0 and below 1
 */
export function mixtureQuantile(mixture: NormalMixture, probability: number): number {
  const { mean, variance } = mixtureMoments(mixture);
  const spread = Math.sqrt(variance);
  if (spread === 0) return mean;
  let [low, high] = [mean - 12 * spread, mean + 12 * spread];
  let value = mean + spread * normalGuess(probability);
  for (let i = 0; i < 60; i++) {
    const { below, density } = distribution(mixture, value);
    if (below < probability) low = value;
    else high = value;
    const newton = value + (probability - below) / density;
    const next = density > 0 && newton > low && newton < high ? newton : (low + high) / 2;
    const moved = Math.abs(next - value);
    value = next;
    if (moved < 1e-12 + 1e-10 * spread) break;
  }
  return value;
}

/** Near enough to start from (logistic approximation of the normal quantile). */
function normalGuess(probability: number): number {
  return Math.log(probability / (1 - probability)) / 1.702;
}

function distribution({ weights, means, variances }: NormalMixture, value: number): { below: number; density: number } {
  let [total, below, density] = [0, 0, 0];
  for (let i = 0; i < weights.length; i++) {
    const sd = Math.sqrt(Math.max(variances[i]!, 1e-18));
    const z = (value - means[i]!) / sd;
    total += weights[i]!;
    below += weights[i]! * normalProbability(z);
    density += (weights[i]! * Math.exp(-0.5 * z * z)) / (sd * Math.sqrt(2 * Math.PI));
  }
  return { below: below / total, density: density / total };
}

/** Probability that a standard normal variable lies below z. */
export function normalProbability(z: number): number {
  return 0.5 * (1 + errorFunction(z / Math.SQRT2));
}

/**
 * Probability that χ² of `degrees` degrees of freedom exceeds a value (Wilson & Hilferty 1931): good to 1e-3, enough to
 * tell plausible from implausible.
 */
export function chiSquaredExceedance(value: number, degrees: number): number {
  const variance = 2 / (9 * degrees);
  return 1 - normalProbability(((value / degrees) ** (1 / 3) - (1 - variance)) / Math.sqrt(variance));
}

/**
 * A standard normal variable cut to [low, high]: log of the mass within, mean and variance there.
 *
 * Far out in a tail the mass underflows; there the variable sits within 1/|z| of the nearer bound (Mills' ratio).
 */
export function truncatedNormal(low: number, high: number): { logMass: number; mean: number; variance: number } {
  const density = (z: number) => (Number.isFinite(z) ? Math.exp(-0.5 * z * z) / Math.sqrt(2 * Math.PI) : 0);
  const near = low > 0 ? low : high < 0 ? -high : 0;
  if (near > 4) {
    const mean = (low > 0 ? 1 : -1) * (near + 1 / near);
    return { logMass: -0.5 * near * near - Math.log(near * Math.sqrt(2 * Math.PI)), mean, variance: 1 / near ** 2 };
  }
  const mass = normalProbability(high) - normalProbability(low);
  if (!(mass > 1e-6))
    return {
      logMass: Math.log(Math.max(high - low, 1e-300)) + Math.log(density(near)),
      mean: (low + high) / 2,
      variance: (high - low) ** 2 / 12,
    };
  const mean = (density(low) - density(high)) / mass;
  const variance = 1 + (low * density(low) - high * density(high)) / mass - mean * mean;
  return { logMass: Math.log(mass), mean, variance: Math.min(1, Math.max(0, variance)) };
}
