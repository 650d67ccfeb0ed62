/** Schemas of a stored estimate: what it was computed from and what came out, as JSON keeps it. */
import { z } from 'zod';
import type { EstimateInput, TensionEstimate } from './tension-estimate.ts';

const number = z.number();
const pair = z.tuple([number, number]);
const plane = z.enum(['in-plane', 'out-of-plane']);

const endCondition = z.union([
  z.enum(['hinged', 'clamped', 'unknown']),
  z.strictObject({ fixity: pair }),
  z.strictObject({ rotationalStiffness: number }),
]);

const attachment = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('mass'), position: number, mass: number }),
  z.strictObject({ kind: z.literal('support'), position: number, stiffness: number }),
  z.strictObject({ kind: z.literal('damper'), position: number, coefficient: number.exactOptional() }),
]);

const options = z.strictObject({
  assumedFrequencyUncertainty: number.exactOptional(),
  embedment: pair.exactOptional(),
  sensorPosition: number.exactOptional(),
  gravity: number.exactOptional(),
});

export const estimateInput: z.ZodType<EstimateInput, EstimateInput> = z.strictObject({
  cable: z.strictObject({
    length: number,
    massPerLength: number,
    bendingStiffness: number.exactOptional(),
    bendingStiffnessBounds: pair.exactOptional(),
    axialStiffness: number.exactOptional(),
    inclination: number.exactOptional(),
    ends: z.tuple([endCondition, endCondition]).exactOptional(),
    attachments: z.array(attachment).exactOptional(),
    relativeUncertainty: z
      .strictObject({
        length: number.exactOptional(),
        massPerLength: number.exactOptional(),
        bendingStiffness: number.exactOptional(),
        axialStiffness: number.exactOptional(),
      })
      .exactOptional(),
  }),
  peaks: z.array(
    z.strictObject({
      mode: z.number().int(),
      frequency: number,
      standardUncertainty: number.exactOptional(),
      plane: plane.exactOptional(),
    }),
  ),
  options,
});

const note = z.strictObject({
  code: z.string(),
  message: z.string(),
  severity: z.enum(['info', 'caution', 'serious']),
  field: z.string().exactOptional(),
});

const residual = z.strictObject({
  mode: number,
  plane,
  frequency: number,
  fitted: number,
  relative: number,
  standardised: number,
});

const modelRow = z.strictObject({
  id: z.string(),
  name: z.string(),
  tension: number,
  bendingStiffness: number.nullable(),
  residuals: z.array(residual),
  chiSquared: number.nullable(),
  degreesOfFreedom: number.nullable(),
  aicc: number.nullable(),
  note: z.string(),
});

const budgetLine = z.strictObject({
  source: z.enum(['frequencies', 'end-fixity', 'bending-stiffness', 'length', 'mass', 'axial-stiffness', 'damper', 'embedment']),
  label: z.string(),
  value: number.nullable(),
  unit: z.string(),
  standardUncertainty: number.nullable(),
  relative: number.nullable(),
  distribution: z.enum(['normal', 'log-normal', 'log-uniform', 'uniform', 'posterior']),
  sensitivity: number.nullable(),
  contribution: number,
  shareOfVariance: number,
});

const effectiveInputs = z.strictObject({
  length: number,
  massPerLength: number,
  bendingStiffness: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('value'), value: number, relativeUncertainty: number }),
    z.strictObject({ kind: z.literal('bounds'), bounds: pair }),
    z.strictObject({ kind: z.literal('assumed'), bounds: pair }),
  ]),
  axialStiffness: number.nullable(),
  inclination: number.nullable(),
  ends: z.tuple([endCondition, endCondition]),
  relativeUncertainty: z.strictObject({ length: number, massPerLength: number, axialStiffness: number }),
  frequencyUncertainty: z.array(number),
  frequencyUncertaintySource: z.enum(['stated', 'residuals', 'assumed', 'mixed']),
});

const fixity = z.strictObject({ mean: number, standardDeviation: number });

export const tensionEstimate: z.ZodType<TensionEstimate, TensionEstimate> = z.strictObject({
  engineVersion: z.string(),
  tension: number,
  standardUncertainty: number,
  interval95: pair,
  interval68: pair,
  expanded: z.strictObject({ U: number, k: number, coverage: number }),
  bendingStiffness: z.strictObject({ value: number, standardUncertainty: number }).nullable(),
  bracket: z.strictObject({ hinged: number, clamped: number }),
  models: z.array(modelRow),
  budget: z.array(budgetLine),
  residuals: z.array(residual),
  goodness: z.strictObject({ chiSquared: number, degreesOfFreedom: number, pValue: number.nullable(), scale: number }),
  diagnostics: z.array(note),
  warnings: z.array(note),
  dimensionless: z.strictObject({ xi: number, lambdaSquared: number.nullable(), boundaryLayer: number }),
  fixity: z.tuple([fixity, fixity]),
  boundsOnly: z.string().nullable(),
  options,
  inputs: effectiveInputs,
});

export type StoredEstimate = TensionEstimate;
export type StoredEstimateInput = EstimateInput;
