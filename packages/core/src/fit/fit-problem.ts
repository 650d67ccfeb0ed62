/**
 * A fit in the form that the inner loops want: logarithms, weights and a prior.
 */
import type { Cable, EndCondition, ModalPeak } from '../cable/cable.ts';
import { EstimationError } from '../errors.ts';
import type { EffectiveInputs, EstimateOptions, StiffnessPrior } from './tension-estimate.ts';

/** Taken for a frequency that states no uncertainty: an ordinary reading of a good spectrum (common practice). */
export const defaultFrequencyUncertainty = 0.002;
/** Taken when a cable states none, and warned about: a taped length, a mass from a drawing (common practice). */
export const assumedUncertainty = { length: 0.003, massPerLength: 0.03, axialStiffness: 0.05, bendingStiffness: 0.3 } as const;
/**
 * ξ between which ln EI is uniform when nothing is known of it: every cable that is still a cable. A single frequency says
 * nothing of bending, and there only slender cables are thought of.
 */
export const assumedXi = { lowest: 5, lowestOfOnePeak: 20, highest: 2000 } as const;

/** Peaks as the fit sees them, sorted by plane and mode. */
export interface SortedPeak {
  mode: number;
  plane: 'in-plane' | 'out-of-plane';
  frequency: number;
  stated: number | null;
}

/** What does not change from node to node. */
export interface FitProblem {
  cable: Cable;
  length: number;
  massPerLength: number;
  peaks: SortedPeak[];
  modes: Int32Array;
  logFrequencies: Float64Array;
  /** Relative standard uncertainties and their inverse squares. */
  uncertainties: Float64Array;
  weights: Float64Array;
  uncertaintySource: EffectiveInputs['frequencyUncertaintySource'];
  ends: [EndCondition, EndCondition];
  prior: StiffnessPrior;
  gravity: number;
}

/**
 * Builds the problem of a checked cable and checked peaks.
 *
 * @param cable SI, checked
 * @param peaks Hz, checked
 * @param options defaults filled in here
 */
export function buildProblem(cable: Cable, peaks: readonly ModalPeak[], options: EstimateOptions): FitProblem {
  const sorted = sortPeaks(peaks);
  const assumed = options.assumedFrequencyUncertainty ?? defaultFrequencyUncertainty;
  const stated = sorted.filter((peak) => peak.stated !== null).length;
  const uncertainties = Float64Array.from(sorted, (peak) => (peak.stated === null ? assumed : peak.stated / peak.frequency));
  return {
    cable,
    length: cable.length,
    massPerLength: cable.massPerLength,
    peaks: sorted,
    modes: Int32Array.from(sorted, ({ mode }) => mode),
    logFrequencies: Float64Array.from(sorted, ({ frequency }) => Math.log(frequency)),
    uncertainties,
    weights: uncertainties.map((u) => 1 / (u * u)),
    uncertaintySource: stated === sorted.length ? 'stated' : stated === 0 ? 'assumed' : 'mixed',
    ends: cable.ends ?? ['unknown', 'unknown'],
    prior: stiffnessPrior(cable, sorted),
    gravity: options.gravity ?? 9.80665,
  };
}

/** The same problem with other uncertainties of the frequencies. */
export function withUncertainties(
  problem: FitProblem,
  uncertainties: Float64Array,
  source: FitProblem['uncertaintySource'] = problem.uncertaintySource,
): FitProblem {
  return { ...problem, uncertainties, weights: uncertainties.map((u) => 1 / (u * u)), uncertaintySource: source };
}

function sortPeaks(peaks: readonly ModalPeak[]): SortedPeak[] {
  return peaks
    .map((peak) => ({
      mode: peak.mode,
      plane: peak.plane ?? ('in-plane' as const),
      frequency: peak.frequency,
      stated: peak.standardUncertainty ?? null,
    }))
    .sort((a, b) => (a.plane === b.plane ? a.mode - b.mode : a.plane === 'in-plane' ? -1 : 1));
}

/** Tension of the string through the lowest of the peaks: where every fit starts. */
export function stringTension(length: number, massPerLength: number, peaks: readonly SortedPeak[]): number {
  const lowest = peaks.reduce((best, peak) => (peak.mode < best.mode ? peak : best));
  return 4 * massPerLength * (length * (lowest.frequency / lowest.mode)) ** 2;
}

function stiffnessPrior(cable: Cable, peaks: readonly SortedPeak[]): StiffnessPrior {
  const { bendingStiffness: value, bendingStiffnessBounds: bounds } = cable;
  const uncertainty = cable.relativeUncertainty?.bendingStiffness;
  if (value !== undefined && (uncertainty !== undefined || bounds === undefined)) {
    return { kind: 'value', value, relativeUncertainty: uncertainty ?? assumedUncertainty.bendingStiffness };
  }
  if (bounds !== undefined) {
    // Bounds that touch are a value.
    return bounds[1] / bounds[0] < 1.0001
      ? { kind: 'value', value: Math.sqrt(bounds[0] * bounds[1]), relativeUncertainty: 0 }
      : { kind: 'bounds', bounds: [bounds[0], bounds[1]] };
  }
  const stretch = stringTension(cable.length, cable.massPerLength, peaks) * cable.length ** 2;
  if (!(stretch > 0 && Number.isFinite(stretch))) {
    throw new EstimationError(
      'out-of-range',
      'peaks[0].frequency',
      'These frequencies give no tension on a cable of this length and mass.',
    );
  }
  const lowest = peaks.length === 1 ? assumedXi.lowestOfOnePeak : assumedXi.lowest;
  return { kind: 'assumed', bounds: [stretch / assumedXi.highest ** 2, stretch / lowest ** 2] };
}
