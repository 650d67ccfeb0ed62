/**
 * The quadratic model of χ² at a state of a node: where its minimum lies and how sharp it is.
 *
 * Source: Gauss–Newton, e.g. Nocedal & Wright, Numerical Optimization, chapter 10.
 */
import type { FitProblem } from './fit-problem.ts';
import type { NodeWorkspace, StiffnessFreedom } from './node-workspace.ts';

/** Step to the minimum, covariances of (t, e) and what the step gains. */
export interface Quadratic {
  chiSquared: number;
  objective: number;
  stepT: number;
  stepE: number;
  varianceTension: number;
  covariance: number;
  varianceStiffness: number;
  valley: number;
  /** What the whole step takes from the objective. */
  gain: number;
}

/** χ² here and the step to the minimum of its quadratic model. */
export function quadratic(problem: FitProblem, work: NodeWorkspace, freedom: StiffnessFreedom, e: number): Quadratic {
  const { residuals, byTension, byStiffness } = work;
  const { weights } = problem;
  let tt = 0;
  let te = 0;
  let ee = 0;
  let gt = 0;
  let ge = 0;
  let chiSquared = 0;
  for (let i = 0; i < weights.length; i++) {
    const w = weights[i]!;
    const r = residuals[i]!;
    const jt = byTension[i]!;
    const je = byStiffness[i]!;
    tt += w * jt * jt;
    te += w * jt * je;
    ee += w * je * je;
    gt += w * jt * r;
    ge += w * je * r;
    chiSquared += w * r * r;
  }
  if (freedom.kind === 'fixed') {
    return {
      chiSquared,
      objective: chiSquared,
      stepT: gt / tt,
      stepE: 0,
      varianceTension: 1 / tt,
      covariance: 0,
      varianceStiffness: 0,
      valley: -te / tt,
      gain: (gt * gt) / tt,
    };
  }
  ee += freedom.weight;
  ge -= freedom.weight * (e - freedom.mean);
  // One peak cannot tell both: a whisper of a prior keeps the system regular without moving it.
  const determinant = Math.max(tt * ee - te * te, 1e-12 * tt * ee);
  const stepT = (ee * gt - te * ge) / determinant;
  const stepE = (tt * ge - te * gt) / determinant;
  return {
    chiSquared,
    objective: chiSquared + freedom.weight * (e - freedom.mean) ** 2,
    stepT,
    stepE,
    varianceTension: ee / determinant,
    covariance: -te / determinant,
    varianceStiffness: tt / determinant,
    valley: -te / tt,
    gain: gt * stepT + ge * stepE,
  };
}
