import type { CampaignCable, Estimate, Measurement } from '@strandnote/api/contract';
import { estimateTension } from '@strandnote/core';
import { estimateInputOf } from '../../../apps/api/src/estimates/estimate-input.ts';

/** The same entry with an estimate of each of its measurements, as the server would compute it. */
export function estimated(entry: CampaignCable): CampaignCable {
  return { ...entry, estimates: entry.measurements.map((measurement) => estimateOf(entry, measurement)) };
}

function estimateOf(entry: CampaignCable, measurement: Measurement): Estimate {
  const input = estimateInputOf(entry.cable, measurement);
  const output = estimateTension(input.cable, input.peaks, input.options);
  return {
    id: measurement.id.replace(/^0/, 'e'),
    measurementId: measurement.id,
    spanId: measurement.spanId,
    campaignId: measurement.campaignId,
    engineVersion: output.engineVersion,
    input,
    output,
    createdBy: 'Ines Falk',
    createdAt: '2026-09-01T12:00:00.000Z',
    stale: false,
  };
}
