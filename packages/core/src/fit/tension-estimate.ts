/**
 * What a fit answers. Plain data that survives JSON: stored, drawn and printed as it is. All quantities SI.
 */
import type { Cable, EndCondition, ModalPeak } from '../cable/cable.ts';

/** Version of the engine; an estimate is compared digit by digit only within one. */
export const ENGINE_VERSION = '1.0.0';

type Plane = 'in-plane' | 'out-of-plane';

/** What a caller may choose; everything has a default. */
export interface EstimateOptions {
  /** Relative standard uncertainty taken for a frequency that states none, before its residuals are known. Default 0.002. */
  assumedFrequencyUncertainty?: number;
  /** Extra free length at each end of a tie set in masonry, m: uniform between 0 and this. Default [0, 0]. */
  embedment?: [number, number];
  /** Distance of the sensor from the first end, m: lets diagnostics name modes that it cannot hear. */
  sensorPosition?: number;
  /** Acceleration of free fall, m/s². Default 9.80665. */
  gravity?: number;
}

/** Something a reader must know. `caution` can change the result; `info` explains it. */
export interface EstimateNote {
  /** Stable, kebab-case. */
  code: string;
  /** A full sentence. */
  message: string;
  severity: 'info' | 'caution' | 'serious';
  /** Input that it speaks of, where there is one. */
  field?: string;
}

/** How one peak sits on a model. */
export interface PeakResidual {
  mode: number;
  plane: Plane;
  /** Measured, Hz. */
  frequency: number;
  /** Of the model, Hz. */
  fitted: number;
  /** Measured over fitted, minus one. */
  relative: number;
  /** `relative` over the relative standard uncertainty of the peak. */
  standardised: number;
}

/** One rung of the ladder, or one practical formula, beside the others. */
export interface ModelRow {
  id: string;
  name: string;
  /** N */
  tension: number;
  /** N·m²; null where the model has none or takes it as given. */
  bendingStiffness: number | null;
  /** Empty for a formula that uses a single frequency. */
  residuals: PeakResidual[];
  /** null for a formula that uses a single frequency. */
  chiSquared: number | null;
  degreesOfFreedom: number | null;
  /** Akaike's criterion for small samples; null where the peaks are too few for it. */
  aicc: number | null;
  /** What the model leaves out, or why it stands here. */
  note: string;
}

/** One source of uncertainty (JCGM 100:2008). */
export interface BudgetLine {
  source: 'frequencies' | 'end-fixity' | 'bending-stiffness' | 'length' | 'mass' | 'axial-stiffness' | 'damper' | 'embedment';
  label: string;
  /** Best value in `unit`; null where there is no single one. */
  value: number | null;
  unit: string;
  /** Of the input, in `unit`; null where the source is not one input. */
  standardUncertainty: number | null;
  /** Relative standard uncertainty of the input; null likewise. */
  relative: number | null;
  distribution: 'normal' | 'log-normal' | 'log-uniform' | 'uniform' | 'posterior';
  /** ∂ln T/∂ln input; null where the source is not one input. */
  sensitivity: number | null;
  /** What it adds to u(T)/T. */
  contribution: number;
  /** Share of the variance of ln T, 0 to 1; the lines sum to 1. */
  shareOfVariance: number;
}

/** What was known of bending stiffness before the frequencies spoke, N·m². */
export type StiffnessPrior =
  | { kind: 'value'; value: number; relativeUncertainty: number }
  | { kind: 'bounds'; bounds: [number, number] }
  /** Nothing was given: ln EI uniform over the bounds that the string tension and ξ from 5 to 2000 give. */
  | { kind: 'assumed'; bounds: [number, number] };

/** What the fit ran with, defaults filled in. */
export interface EffectiveInputs {
  length: number;
  massPerLength: number;
  bendingStiffness: StiffnessPrior;
  /** null where sag is left out. */
  axialStiffness: number | null;
  inclination: number | null;
  ends: [EndCondition, EndCondition];
  relativeUncertainty: { length: number; massPerLength: number; axialStiffness: number };
  /** Relative standard uncertainty of each peak as weighted in the fit, in the order of `residuals`. */
  frequencyUncertainty: number[];
  /** Where these came from. */
  frequencyUncertaintySource: 'stated' | 'residuals' | 'assumed' | 'mixed';
}

/** The answer: a tension, its interval, and everything that they rest on. */
export interface TensionEstimate {
  engineVersion: string;
  /** Mean chord tension, N. */
  tension: number;
  /** N */
  standardUncertainty: number;
  /** N: quantiles 2.5 and 97.5 % of the distribution of T. */
  interval95: [number, number];
  /** N: quantiles 16 and 84 %. */
  interval68: [number, number];
  /** Expanded uncertainty U (N): half the 95 % interval; k = U/u; coverage 0.95. */
  expanded: { U: number; k: number; coverage: number };
  /** N·m²; null where the peaks do not determine it and nothing was known of it. */
  bendingStiffness: { value: number; standardUncertainty: number } | null;
  /** Tension (N) if both ends are hinged, and if both are clamped. */
  bracket: { hinged: number; clamped: number };
  models: ModelRow[];
  budget: BudgetLine[];
  /** Of the most probable node of the fit, in order of plane and mode. */
  residuals: PeakResidual[];
  /** Fit as a whole, at that node. */
  goodness: { chiSquared: number; degreesOfFreedom: number; pValue: number | null; scale: number };
  diagnostics: EstimateNote[];
  warnings: EstimateNote[];
  /** ξ; λ² (null without sag); ℓ in m. */
  dimensionless: { xi: number; lambdaSquared: number | null; boundaryLayer: number };
  /** Mean and standard deviation of the fixity η of the two ends given the frequencies. */
  fixity: [{ mean: number; standardDeviation: number }, { mean: number; standardDeviation: number }];
  /** Why only the interval may be given and no single tension; null where one may. */
  boundsOnly: string | null;
  options: EstimateOptions;
  inputs: EffectiveInputs;
}

/** What a fit starts from, as stored beside its answer. */
export interface EstimateInput {
  cable: Cable;
  peaks: ModalPeak[];
  options: EstimateOptions;
}
