/**
 * The budget of uncertainty: every source, what is known of it, how strongly it acts, and its share.
 *
 * Source: JCGM 100:2008, clause 8 and annex H.
 */
import type { FitProblem } from './fit-problem.ts';
import type { LengthShift, Posterior } from './posterior.ts';
import { inputUncertainty } from './posterior.ts';
import type { BudgetLine } from './tension-estimate.ts';

/**
 * Lines of the budget, largest share first.
 *
 * @param problem the settled problem
 * @param posterior with its variance by source
 * @param shifts unknown shifts of the length that took part
 * @param sag whether axial stiffness took part
 */
export function uncertaintyBudget(problem: FitProblem, posterior: Posterior, shifts: readonly LengthShift[], sag: boolean): BudgetLine[] {
  const { parts, sensitivities } = posterior;
  const u = inputUncertainty(problem.cable.relativeUncertainty);
  const total = Object.values(parts).reduce((sum, part) => sum + part, 0) || 1;
  const line = (source: BudgetLine['source'], label: string, variance: number, rest: Partial<BudgetLine>): BudgetLine => ({
    source,
    label,
    value: null,
    unit: '',
    standardUncertainty: null,
    relative: null,
    distribution: 'normal',
    sensitivity: null,
    contribution: Math.sqrt(variance),
    shareOfVariance: variance / total,
    ...rest,
  });
  const input = (value: number, unit: string, relative: number, sensitivity: number): Partial<BudgetLine> => ({
    value,
    unit,
    standardUncertainty: value * relative,
    relative,
    sensitivity,
  });
  const lines = [
    line('frequencies', 'Frequencies', parts.frequencies, {}),
    line('end-fixity', 'End fixity', parts.endFixity, { distribution: 'posterior' }),
    line('bending-stiffness', 'Bending stiffness', parts.bendingStiffness, stiffnessEntry(problem, posterior)),
    line('length', 'Free length', parts.length, input(problem.length, 'm', u.length, sensitivities.length)),
    line('mass', 'Mass per length', parts.mass, input(problem.massPerLength, 'kg/m', u.massPerLength, sensitivities.mass)),
  ];
  if (sag && problem.cable.axialStiffness !== undefined) {
    const entry = input(problem.cable.axialStiffness, 'N', u.axialStiffness, sensitivities.axialStiffness);
    lines.push(line('axial-stiffness', 'Axial stiffness', parts.axialStiffness, entry));
  }
  for (const source of ['damper', 'embedment'] as const) {
    const reach = shifts.filter((shift) => shift.source === source).reduce((sum, { most }) => sum + Math.abs(most), 0);
    if (reach === 0) continue;
    const label = source === 'damper' ? 'Effect of the damper' : 'Embedded ends';
    lines.push(line(source, label, parts[source], { value: reach, unit: 'm', distribution: 'uniform', sensitivity: 2 }));
  }
  return lines.sort((a, b) => b.shareOfVariance - a.shareOfVariance);
}

function stiffnessEntry(problem: FitProblem, posterior: Posterior): Partial<BudgetLine> {
  const value = Math.exp(posterior.logStiffness);
  const relative = Math.sqrt(posterior.stiffnessVariance);
  const { prior } = problem;
  return {
    value,
    unit: 'N·m²',
    standardUncertainty: value * relative,
    relative,
    distribution: prior.kind === 'value' ? 'log-normal' : 'log-uniform',
  };
}
