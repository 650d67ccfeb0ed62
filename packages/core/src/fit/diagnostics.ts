/**
 * What a reader must know of a fit, in plain sentences with stable codes.
 */

import { isKnownEnd } from './fixity-nodes.ts';
import type { SettledNoise } from './frequency-noise.ts';
import type { BudgetLine, EstimateNote, EstimateOptions, PeakResidual } from './tension-estimate.ts';

/** What diagnostics look at. */
export interface FitFindings {
  settled: SettledNoise;
  options: EstimateOptions;
  residuals: PeakResidual[];
  budget: BudgetLine[];
  xi: number;
  lambdaSquared: number | null;
  relativeExpanded: number;
  /** Posterior mean and standard deviation of ln EI. */
  logStiffness: { mean: number; deviation: number };
}

const percent = (fraction: number) => `${(100 * fraction).toPrecision(2)} %`;

/**
 * Warnings: what may make the result wrong or weaker than it looks.
 *
 * @returns notes in the order of their weight
 */
export function fitWarnings(findings: FitFindings): EstimateNote[] {
  return [
    ...dataWarnings(findings),
    ...sensorWarnings(findings),
    ...modelWarnings(findings),
    ...stiffnessWarnings(findings),
    ...assumptionWarnings(findings),
  ];
}

function dataWarnings({ settled, residuals }: FitFindings): EstimateNote[] {
  const notes: EstimateNote[] = [];
  const { problem } = settled;
  const modes = problem.peaks.map(({ mode }) => mode);
  if (problem.peaks.length === 1) {
    notes.push({
      code: 'single-peak',
      severity: 'serious',
      field: 'peaks',
      message:
        'A single frequency cannot show whether its mode number is right, nor tell bending stiffness from tension. Add at least two more modes.',
    });
  } else if (new Set(modes).size < 4) {
    notes.push({
      code: 'few-modes',
      severity: 'caution',
      field: 'peaks',
      message: 'With fewer than four modes a wrong mode number or a foreign peak can stay unseen. Add higher modes.',
    });
  }
  if (modes.length > 1 && modes.every((mode) => mode % 2 === 0)) {
    notes.push({
      code: 'even-modes-only',
      severity: 'serious',
      field: 'peaks',
      message:
        'Only even modes are given. The same frequencies numbered 1, 2, 3 … would mean four times the tension: make sure that no odd mode is hidden, for instance by a sensor at mid-span.',
    });
  }
  if (settled.pValue !== null && settled.pValue < 0.01) {
    notes.push({
      code: 'residuals-too-large',
      severity: 'caution',
      field: 'peaks',
      message: `The residuals are ${settled.scale.toPrecision(2)} times as large as the stated uncertainties allow; the uncertainties were enlarged to match. Look for a wrong mode number or a foreign peak.`,
    });
  }
  return [...notes, ...outliers(residuals, problem.uncertainties)];
}

/** Share of its amplitude below which a mode is not heard (a twentieth: some 26 dB). */
const heard = 0.05;

/** Modes that the sensor sits in a node of, by the shape of a string. */
function sensorWarnings({ settled, options }: FitFindings): EstimateNote[] {
  const { sensorPosition } = options;
  const { length, peaks } = settled.problem;
  if (sensorPosition === undefined || sensorPosition <= 0 || sensorPosition >= length) return [];
  const blind = peaks.filter(({ mode }) => Math.abs(Math.sin((mode * Math.PI * sensorPosition) / length)) < heard).map(({ mode }) => mode);
  if (blind.length === 0) return [];
  return [
    {
      code: 'sensor-blind',
      severity: 'caution',
      field: 'peaks',
      message: `Where the sensor sat, mode ${[...new Set(blind)].join(', ')} hardly moves: check that the peak belongs to this cable and carries the right number.`,
    },
  ];
}

/** Bending stiffness that the frequencies press against a bound of what the section allows. */
function stiffnessWarnings({ settled, logStiffness }: FitFindings): EstimateNote[] {
  const { prior } = settled.problem;
  if (prior.kind !== 'bounds') return [];
  const [low, high] = [Math.log(prior.bounds[0]), Math.log(prior.bounds[1])];
  const room = high - low;
  const nearest = Math.min(logStiffness.mean - low, high - logStiffness.mean);
  if (nearest > 0.15 * room || logStiffness.deviation > 0.15 * room) return [];
  const side = logStiffness.mean - low < high - logStiffness.mean ? 'lower' : 'upper';
  return [
    {
      code: 'bending-stiffness-at-bound',
      severity: 'caution',
      field: 'bendingStiffnessBounds',
      message: `The frequencies press the bending stiffness against its ${side} bound. Check the section, the mode numbers and the length.`,
    },
  ];
}

/** A peak whose residual stands far out from the rest, judged by the median of the others. */
function outliers(residuals: readonly PeakResidual[], uncertainties: Float64Array): EstimateNote[] {
  if (residuals.length < 4) return [];
  return residuals.flatMap((residual, i): EstimateNote[] => {
    const others = residuals.filter((_, j) => j !== i).map(({ relative }) => Math.abs(relative));
    const typical = others.sort((a, b) => a - b)[Math.floor(others.length / 2)]!;
    if (Math.abs(residual.relative) < Math.max(6 * typical, 3 * uncertainties[i]!, 0.005)) return [];
    return [
      {
        code: 'peak-stands-out',
        severity: 'serious',
        field: `peaks.${residual.plane}.${residual.mode}`,
        message: `Mode ${residual.mode} lies ${percent(Math.abs(residual.relative))} ${residual.relative > 0 ? 'above' : 'below'} the fit while the others agree: it may be a foreign peak or carry a wrong number.`,
      },
    ];
  });
}

function modelWarnings({ settled, xi, relativeExpanded }: FitFindings): EstimateNote[] {
  const notes: EstimateNote[] = [];
  const unknown = settled.problem.ends.some((end) => !isKnownEnd(end));
  if (xi < 20) {
    notes.push({
      code: 'bending-dominates',
      severity: 'caution',
      message: `This is nearly a beam (ξ = ${xi.toFixed(0)}): bending and the ends shape the frequencies as much as the tension does.${unknown ? ' With unknown ends only bounds can be given.' : ''}`,
    });
  }
  if (relativeExpanded > 0.15) {
    notes.push({
      code: 'interval-wide',
      severity: 'caution',
      message: `The expanded uncertainty is ${percent(relativeExpanded)} of the tension: only bounds can be given.`,
    });
  }
  return notes;
}

function assumptionWarnings({ settled }: FitFindings): EstimateNote[] {
  const notes: EstimateNote[] = [];
  const { problem } = settled;
  const given = problem.cable.relativeUncertainty;
  if (given?.length === undefined || given?.massPerLength === undefined) {
    const missing = [given?.length === undefined ? 'length (0.3 %)' : '', given?.massPerLength === undefined ? 'mass (3 %)' : ''].filter(
      Boolean,
    );
    notes.push({
      code: 'uncertainty-assumed',
      severity: 'caution',
      field: 'relativeUncertainty',
      message: `No uncertainty was stated for ${missing.join(' and ')}; the values in brackets were assumed.`,
    });
  }
  if (problem.prior.kind === 'assumed') {
    notes.push({
      code: 'bending-stiffness-unknown',
      severity: 'caution',
      field: 'bendingStiffnessBounds',
      message:
        'Nothing is known of the bending stiffness; everything from a beam to a string was allowed. Enter its bounds to narrow the interval.',
    });
  }
  if (problem.uncertaintySource === 'assumed' || problem.uncertaintySource === 'mixed') {
    const assumed = percent(problem.uncertainties[problem.peaks.findIndex(({ stated }) => stated === null)]!);
    notes.push({
      code: 'frequency-uncertainty-assumed',
      severity: 'info',
      field: 'peaks',
      message: `No uncertainty was stated for some frequencies and the residuals are too few to show it; ${assumed} was taken.`,
    });
  }
  return notes;
}

const measureNext: Record<BudgetLine['source'], string> = {
  frequencies: 'read the frequencies from longer records, or add modes',
  'end-fixity': 'find out from drawings how the ends are held, or calibrate with one lift-off or load-cell reading',
  'bending-stiffness': 'add higher modes, or narrow the bounds of the bending stiffness',
  length: 'measure the free length on site',
  mass: 'weigh a piece of the cable, or ask the supplier for its mass',
  'axial-stiffness': 'narrow the axial stiffness, or leave out mode 1',
  damper: 'measure with the damper disconnected, where the owner allows it',
  embedment: 'find out where the embedded ends begin to hold',
};

/** Explanations: what kind of cable it is and what decides the interval. */
export function fitDiagnostics({ settled, budget, xi, lambdaSquared }: FitFindings): EstimateNote[] {
  const notes: EstimateNote[] = [];
  const kind = xi > 200 ? 'nearly a string' : xi < 20 ? 'nearly a beam' : 'a stiff string';
  notes.push({ code: 'kind-of-cable', severity: 'info', message: `With ξ = ${xi.toFixed(0)} this cable is ${kind}.` });
  if (lambdaSquared !== null && lambdaSquared > 0.05) {
    notes.push({
      code: 'sag-matters',
      severity: 'info',
      message: `Sag raises the first in-plane mode (λ² = ${lambdaSquared.toPrecision(2)}); the model contains it.`,
    });
  }
  if (settled.problem.uncertaintySource === 'residuals') {
    notes.push({
      code: 'frequency-uncertainty-from-residuals',
      severity: 'info',
      field: 'peaks',
      message: `The uncertainty of the frequencies (${percent(settled.problem.uncertainties[0]!)}) was estimated from the residuals.`,
    });
  }
  const largest = budget[0];
  if (largest && largest.shareOfVariance > 0.5) {
    notes.push({
      code: 'interval-dominated',
      severity: 'info',
      message: `${percent(largest.shareOfVariance)} of the variance comes from one source (${largest.label.toLowerCase()}). To narrow the interval, ${measureNext[largest.source]}.`,
    });
  }
  return notes;
}
