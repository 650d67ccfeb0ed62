/**
 * A straight line by weighted least squares, and the line that a hinged stiff string is in the plane of (f_n/n)² on n².
 *
 *   (f_n/n)² = T/(4L²m) + n² π²EI/(4L⁴m)
 *
 * Sources: JCGM 100:2008, H.3 (the line and its covariance); Blevins 1979 (the hinged stiff string).
 */
import { EstimationError } from '../errors.ts';

/** A fitted line y = intercept + slope · x. */
export interface LineFit {
  intercept: number;
  slope: number;
  interceptUncertainty: number;
  slopeUncertainty: number;
  /** Correlation of intercept and slope. */
  correlation: number;
  chiSquared: number;
  degreesOfFreedom: number;
  /** √(χ²/ν); null without degrees of freedom. */
  residualDeviation: number | null;
}

/**
 * Straight line through points.
 *
 * @param x, y the points, at least two of different x
 * @param uncertainties standard uncertainties of y; without them all points weigh alike and their scatter gives them
 * @returns coefficients with standard uncertainties and correlation
 * @throws EstimationError `too-few-peaks` when the points do not determine a line
 * Source: JCGM 100:2008, H.3.
 */
export function fitLine(x: readonly number[], y: readonly number[], uncertainties?: readonly number[]): LineFit {
  const weights = x.map((_, i) => (uncertainties ? 1 / uncertainties[i]! ** 2 : 1));
  const total = weights.reduce((sum, w) => sum + w, 0);
  const mean = (values: readonly number[]) => values.reduce((sum, value, i) => sum + weights[i]! * value, 0) / total;
  const [centreX, centreY] = [mean(x), mean(y)];
  let [sxx, sxy] = [0, 0];
  x.forEach((value, i) => {
    sxx += weights[i]! * (value - centreX) ** 2;
    sxy += weights[i]! * (value - centreX) * (y[i]! - centreY);
  });
  if (x.length < 2 || !(sxx > 0)) {
    throw new EstimationError('too-few-peaks', 'peaks', 'A line needs two peaks of different mode numbers.');
  }
  const slope = sxy / sxx;
  const intercept = centreY - slope * centreX;
  const chiSquared = x.reduce((sum, value, i) => sum + weights[i]! * (y[i]! - intercept - slope * value) ** 2, 0);
  const degreesOfFreedom = x.length - 2;
  const residualDeviation = degreesOfFreedom > 0 ? Math.sqrt(chiSquared / degreesOfFreedom) : null;
  const scale = uncertainties ? 1 : (residualDeviation ?? 0);
  const interceptVariance = 1 / total + centreX ** 2 / sxx;
  return {
    intercept,
    slope,
    interceptUncertainty: scale * Math.sqrt(interceptVariance),
    slopeUncertainty: scale / Math.sqrt(sxx),
    correlation: -centreX / sxx / Math.sqrt(interceptVariance / sxx),
    chiSquared,
    degreesOfFreedom,
    residualDeviation,
  };
}

/** Tension and bending stiffness that a line of (f/n)² on n² means. */
export interface HingedLineFit {
  /** N */
  tension: number;
  tensionUncertainty: number;
  /** N·m²; below zero where the line falls. */
  bendingStiffness: number;
  bendingStiffnessUncertainty: number;
  line: LineFit;
}

/**
 * Tension and bending stiffness of a hinged stiff string from its frequencies.
 *
 * @param cable length (m), mass per length (kg/m), both > 0 and taken as exact here
 * @param peaks mode numbers and frequencies (Hz); uncertainties (Hz) when every peak states one
 * @returns tension (N), bending stiffness (N·m²) and the line behind them
 * @throws EstimationError `too-few-peaks` below two different modes
 * Source: Blevins 1979.
 */
export function fitHingedLine(
  cable: { length: number; massPerLength: number },
  peaks: readonly { mode: number; frequency: number; standardUncertainty?: number | undefined }[],
): HingedLineFit {
  const x = peaks.map(({ mode }) => mode ** 2);
  const y = peaks.map(({ mode, frequency }) => (frequency / mode) ** 2);
  const stated = peaks.every(({ standardUncertainty }) => standardUncertainty !== undefined);
  const uncertainties = peaks.map(({ frequency, standardUncertainty }, i) => (2 * y[i]! * (standardUncertainty ?? 0)) / frequency);
  // Without stated uncertainties all peaks are taken as equally good relative to their frequency.
  const line = stated ? fitLine(x, y, uncertainties) : relativeLine(x, y);
  const byIntercept = 4 * cable.length ** 2 * cable.massPerLength;
  const bySlope = (4 * cable.length ** 4 * cable.massPerLength) / Math.PI ** 2;
  return {
    tension: byIntercept * line.intercept,
    tensionUncertainty: byIntercept * line.interceptUncertainty,
    bendingStiffness: bySlope * line.slope,
    bendingStiffnessUncertainty: bySlope * line.slopeUncertainty,
    line,
  };
}

/** Points of equal relative uncertainty, its size taken from their scatter. */
function relativeLine(x: readonly number[], y: readonly number[]): LineFit {
  const line = fitLine(x, y, y);
  const scale = line.residualDeviation ?? 0;
  return { ...line, interceptUncertainty: scale * line.interceptUncertainty, slopeUncertainty: scale * line.slopeUncertainty };
}
