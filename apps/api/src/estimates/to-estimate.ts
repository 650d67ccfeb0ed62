import type { Cable, Estimate, Measurement } from '@strandnote/api/contract';
import { estimateInput, tensionEstimate } from '@strandnote/core/report-content';
import type { schema } from '@strandnote/db';
import { isStale } from './estimate-input.ts';

type EstimateRow = typeof schema.estimates.$inferSelect;

/** An estimate with whether it still speaks for its inputs as they are now. */
export function toEstimate(row: EstimateRow, cable: Cable, measurement: Measurement, nameOf: (userId: string) => string): Estimate {
  return {
    id: row.id,
    measurementId: row.measurementId,
    spanId: row.spanId,
    campaignId: row.campaignId,
    engineVersion: row.engineVersion,
    input: estimateInput.parse(row.input),
    output: tensionEstimate.parse(row.output),
    createdBy: nameOf(row.createdBy),
    createdAt: row.createdAt.toISOString(),
    stale: isStale(row, cable, measurement),
  };
}
