/**
 * How good the frequencies are: as stated, or as their residuals show.
 *
 * Stated uncertainties are believed unless χ² is implausible (p < 0.01); then they are scaled by √(χ²/ν) and the reader is
 * told. Where none is stated, the variance is the mean of an assumed one, weighted like four degrees of freedom, and of the
 * residuals; the factor ν/(ν − 2) is that of Student's distribution, so that few residuals are not taken for few errors.
 *
 * Source: conjugate estimate of a variance (inverse χ²); the assumed value and its weight are common practice.
 */

import { type FitProblem, withUncertainties } from './fit-problem.ts';
import type { EndNode } from './fixity-nodes.ts';
import { chiSquaredExceedance } from './mixture.ts';
import type { ModelCorrection, NodeWorkspace } from './node-workspace.ts';
import { planStiffness, type StiffnessPlan } from './stiffness-plan.ts';

/** A problem whose uncertainties are settled, and how. */
export interface SettledNoise {
  problem: FitProblem;
  plan: StiffnessPlan;
  /** Of the fit as stated or assumed, before scaling. */
  chiSquared: number;
  degreesOfFreedom: number;
  pValue: number | null;
  /** Factor on stated uncertainties; 1 when they were believed. */
  scale: number;
}

const priorDegrees = 4;
const implausible = 0.01;

/** Settles the uncertainties of the frequencies; see the head of this file. */
export function settleNoise(
  problem: FitProblem,
  scouts: readonly [EndNode, EndNode][],
  work: NodeWorkspace,
  correction: ModelCorrection | null,
): SettledNoise {
  const plan = planStiffness(problem, scouts, work, correction);
  const chiSquared = plan.lowestChiSquared;
  const degreesOfFreedom = Math.max(0, problem.peaks.length - (stiffnessIsFitted(problem, plan) ? 2 : 1));
  const again = (next: FitProblem, scale: number, pValue: number | null): SettledNoise => ({
    problem: next,
    plan: planStiffness(next, scouts, work, correction),
    chiSquared,
    degreesOfFreedom,
    pValue,
    scale,
  });
  if (problem.uncertaintySource === 'assumed') {
    if (degreesOfFreedom === 0) return { problem, plan, chiSquared, degreesOfFreedom, pValue: null, scale: 1 };
    const degrees = priorDegrees + degreesOfFreedom;
    const factor = Math.sqrt(((priorDegrees + chiSquared) / degrees) * (degrees / (degrees - 2)));
    return again(
      withUncertainties(
        problem,
        problem.uncertainties.map((u) => u * factor),
        'residuals',
      ),
      1,
      null,
    );
  }
  const pValue = degreesOfFreedom === 0 ? null : chiSquaredExceedance(chiSquared, degreesOfFreedom);
  if (pValue === null || pValue >= implausible) return { problem, plan, chiSquared, degreesOfFreedom, pValue, scale: 1 };
  const scale = Math.sqrt(chiSquared / degreesOfFreedom);
  return again(
    withUncertainties(
      problem,
      problem.uncertainties.map((u) => u * scale),
    ),
    scale,
    pValue,
  );
}

/** Whether the frequencies, rather than the prior, decide bending stiffness, so that it costs a degree of freedom. */
export function stiffnessIsFitted(problem: FitProblem, plan: StiffnessPlan): boolean {
  if (problem.peaks.length < 2 || plan.kind === 'fixed') return false;
  const { prior } = problem;
  if (prior.kind === 'value') return plan.spread < 0.7 * prior.relativeUncertainty;
  return plan.spread < 0.7 * (Math.log(prior.bounds[1] / prior.bounds[0]) / 6);
}
