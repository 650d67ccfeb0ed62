/**
 * Room that the inner loop of a fit works in, made once per estimate, and what it is told.
 */
import type { EndForm, WavenumberSolution } from '../models/end-rotation.ts';
import type { EndNode } from './fixity-nodes.ts';

/** What exact sag and attachments add to ln f of the bare cable, with derivatives; see ./model-correction. */
export interface ModelCorrection {
  /** Fills `shift`, `byTension` and `byStiffness` for every peak at t = ln T, e = ln EI. */
  evaluate(t: number, e: number, first: EndNode, second: EndNode): void;
  shift: Float64Array;
  byTension: Float64Array;
  byStiffness: Float64Array;
  byLength: Float64Array;
  byMass: Float64Array;
  byAxialStiffness: Float64Array;
}

/** How ln EI is treated in a node. */
export type StiffnessFreedom = { kind: 'fixed' } | { kind: 'free'; mean: number; weight: number };

/** Room for one fit at a time. Lengths: one per peak. */
export interface NodeWorkspace {
  solution: WavenumberSolution;
  first: EndForm;
  second: EndForm;
  residuals: Float64Array;
  byTension: Float64Array;
  byStiffness: Float64Array;
  byLength: Float64Array;
  byMass: Float64Array;
  byAxialStiffness: Float64Array;
  /** Last wavenumber of every peak: the next node begins there. */
  wavenumbers: Float64Array;
}

/** Makes the workspace of a problem of `count` peaks. */
export function nodeWorkspace(count: number): NodeWorkspace {
  const row = () => new Float64Array(count);
  return {
    solution: new Float64Array(4),
    first: { a: 1, b: 0 },
    second: { a: 1, b: 0 },
    residuals: row(),
    byTension: row(),
    byStiffness: row(),
    byLength: row(),
    byMass: row(),
    byAxialStiffness: row(),
    wavenumbers: row(),
  };
}
