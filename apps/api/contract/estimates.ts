import { estimateInput, tensionEstimate } from '@strandnote/core/report-content';
import { z } from 'zod';
import { id, isoTime, listOf } from './primitives.ts';

/** The result of one fit: inputs, engine version and outputs as they were; never changed. */
export const estimate = z.object({
  id,
  measurementId: id,
  spanId: id,
  campaignId: id,
  engineVersion: z.string(),
  input: estimateInput,
  output: tensionEstimate,
  createdBy: z.string(),
  createdAt: isoTime,
  /** Whether the inputs have changed since, so that the estimate no longer speaks for them. */
  stale: z.boolean(),
});
export type Estimate = z.infer<typeof estimate>;

/** Computes and saves estimates on the server, for the measurements named or for all whose inputs changed. */
export const saveEstimates = z.strictObject({ measurementIds: z.array(id).max(2000).nullable() });
export type SaveEstimates = z.infer<typeof saveEstimates>;

export const savedEstimates = listOf(estimate).extend({
  /** Measurements that could not be estimated, with the reason in words. */
  refused: z.array(z.object({ measurementId: id, code: z.string(), field: z.string().nullable(), message: z.string() })),
});
export type SavedEstimates = z.infer<typeof savedEstimates>;
