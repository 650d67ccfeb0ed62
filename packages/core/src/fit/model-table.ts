/**
 * The ladder of models side by side, so that a reader sees what each of them would have said.
 */
import { practicalFormulas } from '../models/practical-formulas.ts';
import type { FitProblem } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { fitHingedLine } from './linear-fit.ts';
import { evaluateModel } from './node-fit.ts';
import type { ModelCorrection, NodeWorkspace } from './node-workspace.ts';
import type { Posterior } from './posterior.ts';
import type { ModelRow, PeakResidual } from './tension-estimate.ts';

/** Tension of a model with both ends of one kind, and the stiffness that goes with it. */
export interface BracketFit {
  logTension: number;
  logStiffness: number;
}

/** Residuals of a model whose frequencies are given, in the order of the problem. */
export function residualsOf(problem: FitProblem, fitted: (index: number) => number): PeakResidual[] {
  return problem.peaks.map((peak, i) => {
    const model = fitted(i);
    const relative = peak.frequency / model - 1;
    return {
      mode: peak.mode,
      plane: peak.plane,
      frequency: peak.frequency,
      fitted: model,
      relative,
      standardised: relative / problem.uncertainties[i]!,
    };
  });
}

/** Residuals of the full model at given ends, tension and stiffness. */
export function modelResiduals(
  problem: FitProblem,
  ends: [EndNode, EndNode],
  state: BracketFit,
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): PeakResidual[] {
  evaluateModel(problem, ends[0], ends[1], state.logTension, state.logStiffness, work, correction);
  const fitted = problem.peaks.map((peak, i) => peak.frequency * Math.exp(-work.residuals[i]!));
  return residualsOf(problem, (i) => fitted[i]!);
}

/** Fills in χ², degrees of freedom and AICc of a row from its residuals. */
export function modelRow(
  row: Pick<ModelRow, 'id' | 'name' | 'tension' | 'bendingStiffness' | 'note'>,
  residuals: PeakResidual[],
  parameters: number,
): ModelRow {
  const chiSquared = residuals.reduce((sum, { standardised }) => sum + standardised ** 2, 0);
  const spare = residuals.length - parameters - 1;
  return {
    ...row,
    residuals,
    chiSquared,
    degreesOfFreedom: Math.max(0, residuals.length - parameters),
    aicc: spare > 0 ? chiSquared + 2 * parameters + (2 * parameters * (parameters + 1)) / spare : null,
  };
}

const hingedEnd: EndNode = { fixity: 0, stiffness: null };
const clampedEnd: EndNode = { fixity: 1, stiffness: null };

/**
 * Rows of the table, from the string to the model adopted.
 *
 * @param problem settled
 * @param posterior the mixture
 * @param bracket fits with both ends hinged and both clamped
 * @param fittedParameters 2 where the frequencies decide bending stiffness, else 1
 */
export function modelTable(
  problem: FitProblem,
  posterior: Posterior,
  bracket: { hinged: BracketFit | null; clamped: BracketFit | null },
  fittedParameters: number,
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): ModelRow[] {
  const rung = (id: string, name: string, end: EndNode, fit: BracketFit | null, note: string) =>
    fit === null
      ? []
      : [
          modelRow(
            { id, name, tension: Math.exp(fit.logTension), bendingStiffness: Math.exp(fit.logStiffness), note },
            modelResiduals(problem, [end, end], fit, work, correction),
            fittedParameters,
          ),
        ];
  const { fit, node } = posterior.mode;
  return [
    stringRow(problem),
    ...hingedLineRow(problem),
    ...rung('hinged', 'Stiff string, both ends hinged', hingedEnd, bracket.hinged, 'Upper end of the bracket.'),
    ...rung('clamped', 'Stiff string, both ends clamped', clampedEnd, bracket.clamped, 'Lower end of the bracket.'),
    modelRow(
      {
        id: 'adopted',
        name: 'Adopted: all that the ends may be',
        tension: Math.exp(posterior.logTension),
        bendingStiffness: Math.exp(posterior.logStiffness),
        note: 'Mixture over end fixity; residuals are those of its most probable member.',
      },
      modelResiduals(problem, [node.first, node.second], fit, work, correction),
      fittedParameters,
    ),
    ...formulaRows(problem, Math.exp(posterior.logStiffness)),
  ];
}

function formulaRows(problem: FitProblem, bendingStiffness: number): ModelRow[] {
  const { length, massPerLength } = problem;
  return practicalFormulas({ length, massPerLength, bendingStiffness }, problem.peaks).map(({ id, name, tension, note }) => ({
    id,
    name,
    tension,
    bendingStiffness: null,
    residuals: [],
    chiSquared: null,
    degreesOfFreedom: null,
    aicc: null,
    note,
  }));
}

function stringRow(problem: FitProblem): ModelRow {
  let [total, sum] = [0, 0];
  problem.peaks.forEach((peak, i) => {
    total += problem.weights[i]!;
    sum += problem.weights[i]! * Math.log(peak.frequency / peak.mode);
  });
  const fundamental = Math.exp(sum / total);
  return modelRow(
    {
      id: 'taut-string',
      name: 'Taut string',
      tension: 4 * problem.massPerLength * (problem.length * fundamental) ** 2,
      bendingStiffness: null,
      note: 'Leaves out bending stiffness, sag and what the ends add.',
    },
    residualsOf(problem, (i) => problem.peaks[i]!.mode * fundamental),
    1,
  );
}

/** The classical straight line, without any prior; absent where the peaks do not determine it. */
function hingedLineRow(problem: FitProblem): ModelRow[] {
  if (new Set(problem.peaks.map(({ mode }) => mode)).size < 2) return [];
  const { peaks, uncertainties } = problem;
  const fit = fitHingedLine(
    problem,
    peaks.map(({ mode, frequency }, i) => ({ mode, frequency, standardUncertainty: frequency * uncertainties[i]! })),
  );
  const { intercept, slope } = fit.line;
  if (intercept <= 0 || peaks.some(({ mode }) => intercept + slope * mode ** 2 <= 0)) return [];
  return [
    modelRow(
      {
        id: 'hinged-line',
        name: 'Straight line of (f/n)² on n²',
        tension: fit.tension,
        bendingStiffness: fit.bendingStiffness > 0 ? fit.bendingStiffness : null,
        note:
          fit.bendingStiffness > 0
            ? 'Hinged ends, nothing known of bending stiffness beforehand.'
            : 'Hinged ends. The line falls, so that no bending stiffness follows from it.',
      },
      residualsOf(problem, (i) => peaks[i]!.mode * Math.sqrt(intercept + slope * peaks[i]!.mode ** 2)),
      2,
    ),
  ];
}
