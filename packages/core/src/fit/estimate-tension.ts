/**
 * The door of the fit: from natural frequencies to a tension with an honest interval.
 *
 * A bare cable by phase closure at every node of a quadrature over end fixity (./end-fixity-fit), the inputs' uncertainties
 * added (./posterior), the bracket of end conditions always beside it.
 */
import { type Cable, checkCable, checkPeaks, type ModalPeak } from '../cable/cable.ts';
import { sagExtensibility } from '../cable/dimensionless.ts';
import { assertRange, EstimationError } from '../errors.ts';
import { type FitFindings, fitDiagnostics, fitWarnings } from './diagnostics.ts';
import { fitFixity, normalisedWeights } from './end-fixity-fit.ts';
import { buildProblem, type FitProblem } from './fit-problem.ts';
import { type EndNode, type FixityNode, fixityNodes } from './fixity-nodes.ts';
import { type SettledNoise, settleNoise, stiffnessIsFitted } from './frequency-noise.ts';
import { modelCorrection } from './model-correction.ts';
import { type BracketFit, modelResiduals, modelTable } from './model-table.ts';
import { type ModelCorrection, type NodeWorkspace, nodeWorkspace } from './node-workspace.ts';
import { assemblePosterior, inputUncertainty, type LengthShift, type Posterior } from './posterior.ts';
import { scoutEnds } from './scout-ends.ts';
import { ENGINE_VERSION, type EstimateOptions, type TensionEstimate } from './tension-estimate.ts';
import { uncertaintyBudget } from './uncertainty-budget.ts';

/**
 * Tension of a cable from its natural frequencies.
 *
 * @param cable SI; ends may be unknown, bending stiffness a value or bounds
 * @param peaks numbered frequencies, Hz, at least one
 * @param options everything has a default
 * @returns tension (N) with its interval, bracket, models, budget, residuals and notes; plain data
 * @throws EstimationError naming the field, for every input outside its physical range
 * Source: the methods named at the head of ./end-fixity-fit, ./frequency-noise and ../models/end-rotation.
 */
export function estimateTension(cable: Cable, peaks: readonly ModalPeak[], options: EstimateOptions = {}): TensionEstimate {
  checkCable(cable);
  checkPeaks(peaks);
  checkOptions(options);
  const work = nodeWorkspace(peaks.length);
  const problem = buildProblem(cable, peaks, options);
  const correction = modelCorrection(problem);
  const settled = settleNoise(problem, scoutEnds(cable), work, correction);
  const shifts = lengthShifts(cable, options);
  const nodes = fixityNodes(settled.problem.ends, isSharp(settled), isSymmetric(cable));
  const components = fitFixity(settled.problem, nodes, settled.plan, work, correction);
  const fitted = components.filter(({ logWeight }) => Number.isFinite(logWeight));
  if (fitted.length === 0) throw notFitted();
  const posterior = assemblePosterior(settled.problem, fitted, shifts);
  if (!(posterior.variance < widestVariance)) throw notFitted();
  return describe({ settled, posterior, shifts, options, work, correction });
}

/** Variance of ln T beyond which nothing is known of the tension. */
const widestVariance = 4;

function notFitted(): EstimationError {
  return new EstimationError(
    'not-converged',
    'peaks',
    'No tension fits these frequencies on this cable: its bending stiffness alone explains them, or more. Check length, mass and bending stiffness.',
  );
}

function checkOptions(options: EstimateOptions): void {
  if (options.assumedFrequencyUncertainty !== undefined) {
    assertRange(options.assumedFrequencyUncertainty, 'options.assumedFrequencyUncertainty', 0, 0.2, true);
  }
  options.embedment?.forEach((value, index) => {
    assertRange(value, `options.embedment[${index}]`, 0, 1e3);
  });
  if (options.sensorPosition !== undefined) assertRange(options.sensorPosition, 'options.sensorPosition', 0, 1e5);
  if (options.gravity !== undefined) assertRange(options.gravity, 'options.gravity', 0, 100);
}

const hinged: EndNode = { fixity: 0, stiffness: null };
const clamped: EndNode = { fixity: 1, stiffness: null };

/** Short cables with good frequencies tell more of their ends: the quadrature is refined. */
function isSharp({ problem, plan }: SettledNoise): boolean {
  const xi = problem.length * Math.exp((plan.start.logTension - plan.start.logStiffness) / 2);
  return xi < 60 && problem.uncertainties.some((u) => u * xi < 0.08);
}

/** Whether exchanging the ends changes no frequency: what sits on the cable sits in its middle, or nothing does. */
function isSymmetric({ attachments, length }: Cable): boolean {
  return (attachments ?? []).every(({ kind, position }) => kind === 'damper' || Math.abs(position - length / 2) < 1e-9 * length);
}

/** Dampers of unknown effect shorten the cable by at most their distance from the end; embedded ends lengthen it. */
function lengthShifts(cable: Cable, options: EstimateOptions): LengthShift[] {
  const dampers = (cable.attachments ?? [])
    .filter((attachment) => attachment.kind === 'damper' && attachment.coefficient === undefined)
    .map(({ position }): LengthShift => ({ source: 'damper', most: -Math.min(position, cable.length - position) }));
  const embedded = (options.embedment ?? []).filter((most) => most > 0).map((most): LengthShift => ({ source: 'embedment', most }));
  return [...dampers, ...embedded];
}

interface FittedCable {
  settled: SettledNoise;
  posterior: Posterior;
  shifts: LengthShift[];
  options: EstimateOptions;
  work: NodeWorkspace;
  correction: ModelCorrection | null;
}

function describe(fitted: FittedCable): TensionEstimate {
  const { settled, posterior, shifts, options, work, correction } = fitted;
  const { problem } = settled;
  const tension = Math.exp(posterior.logTension);
  const standardUncertainty = tension * Math.sqrt(posterior.variance);
  const at = (probability: number) => Math.exp(posterior.quantile(probability));
  const interval95: [number, number] = [at(0.025), at(0.975)];
  const U = (interval95[1] - interval95[0]) / 2;
  const bracket = { hinged: bracketFit(fitted, hinged), clamped: bracketFit(fitted, clamped) };
  const budget = uncertaintyBudget(problem, posterior, shifts, correction !== null);
  const { node, fit } = posterior.mode;
  const residuals = modelResiduals(problem, [node.first, node.second], fit, work, correction);
  const xi = problem.length * Math.exp((posterior.logTension - posterior.logStiffness) / 2);
  const lambdaSquared = lambda(problem, tension);
  const findings: FitFindings = {
    settled,
    options,
    residuals,
    budget,
    xi,
    lambdaSquared,
    relativeExpanded: U / tension,
    logStiffness: { mean: posterior.logStiffness, deviation: Math.sqrt(posterior.stiffnessVariance) },
  };
  return {
    engineVersion: ENGINE_VERSION,
    tension,
    standardUncertainty,
    interval95,
    interval68: [at(0.16), at(0.84)],
    expanded: { U, k: standardUncertainty > 0 ? U / standardUncertainty : 0, coverage: 0.95 },
    bendingStiffness: describeStiffness(problem, posterior),
    bracket: { hinged: tensionOf(bracket.hinged), clamped: tensionOf(bracket.clamped) },
    models: modelTable(problem, posterior, bracket, stiffnessIsFitted(problem, settled.plan) ? 2 : 1, work, correction),
    budget,
    residuals,
    goodness: { chiSquared: settled.chiSquared, degreesOfFreedom: settled.degreesOfFreedom, pValue: settled.pValue, scale: settled.scale },
    diagnostics: fitDiagnostics(findings),
    warnings: fitWarnings(findings),
    dimensionless: { xi, lambdaSquared, boundaryLayer: problem.length / xi },
    fixity: posterior.fixity,
    boundsOnly: boundsOnly(problem, xi, U / tension),
    options,
    inputs: effectiveInputs(problem),
  };
}

/** Nothing where ends of this kind leave no tension to carry. */
function tensionOf(fit: BracketFit | null): number {
  return fit === null ? 0 : Math.exp(fit.logTension);
}

/** The same fit with both ends of one kind: posterior mean over bending stiffness; null where no tension fits. */
function bracketFit({ settled, work, correction }: FittedCable, end: EndNode): BracketFit | null {
  const node: FixityNode = { first: end, second: end, prior: 1, mirrored: false };
  const components = fitFixity(settled.problem, [node], settled.plan, work, correction).filter(({ logWeight }) =>
    Number.isFinite(logWeight),
  );
  if (components.length === 0) return null;
  const weights = normalisedWeights(components);
  const mean = (value: (fit: (typeof components)[number]['fit']) => number) =>
    components.reduce((sum, { fit }, i) => sum + weights[i]! * value(fit), 0);
  return { logTension: mean((fit) => fit.logTension), logStiffness: mean((fit) => fit.logStiffness) };
}

function lambda(problem: FitProblem, tension: number): number | null {
  const { axialStiffness, inclination } = problem.cable;
  if (axialStiffness === undefined || inclination === undefined) return null;
  return sagExtensibility(
    { length: problem.length, massPerLength: problem.massPerLength, axialStiffness, inclination },
    tension,
    problem.gravity,
  );
}

/** null where nothing was known beforehand and the frequencies leave it open by a factor of two. */
function describeStiffness(problem: FitProblem, posterior: Posterior): TensionEstimate['bendingStiffness'] {
  const value = Math.exp(posterior.logStiffness);
  const spread = Math.sqrt(posterior.stiffnessVariance);
  if (problem.prior.kind === 'value' && problem.prior.value === 0) return null;
  if (problem.prior.kind === 'assumed' && spread > Math.LN2) return null;
  return { value, standardUncertainty: value * spread };
}

function boundsOnly(problem: FitProblem, xi: number, relativeExpanded: number): string | null {
  if (relativeExpanded > 0.15) return 'The expanded uncertainty exceeds 15 % of the tension, so that only bounds are given.';
  const open = problem.ends.some((end) => end === 'unknown');
  return open && xi < 20 ? 'The ends are unknown and bending dominates (ξ below 20), so that only bounds are given.' : null;
}

function effectiveInputs(problem: FitProblem): TensionEstimate['inputs'] {
  const { cable } = problem;
  const sag = cable.axialStiffness !== undefined && cable.inclination !== undefined;
  return {
    length: problem.length,
    massPerLength: problem.massPerLength,
    bendingStiffness: problem.prior,
    axialStiffness: sag ? cable.axialStiffness! : null,
    inclination: sag ? cable.inclination! : null,
    ends: problem.ends,
    relativeUncertainty: inputUncertainty(cable.relativeUncertainty),
    frequencyUncertainty: [...problem.uncertainties],
    frequencyUncertaintySource: problem.uncertaintySource,
  };
}
