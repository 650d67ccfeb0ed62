import type { Cable, Measurement } from '@strandnote/api/contract';
import { ENGINE_VERSION, EstimationError, surveyedCable } from '@strandnote/core';
import type { StoredEstimateInput } from '@strandnote/core/report-content';
import { sha256OfJson } from '../reports/canonical-json.ts';

/**
 * What a measurement's tension is computed from as its cable and its peaks stand now. The phone makes the same input of the
 * same values.
 *
 * @throws EstimationError where these values describe no cable that can be estimated
 */
export function estimateInputOf(cable: Cable, measurement: Measurement): StoredEstimateInput {
  const span = cable.spans.find(({ id }) => id === measurement.spanId);
  if (!span) throw new EstimationError('missing', 'spanId', 'The span that was measured is no longer part of the cable.');
  return {
    cable: surveyedCable(cable.section, span, measurement),
    peaks: measurement.peaks
      .filter(({ used }) => used)
      .map(({ mode, frequency, standardUncertainty, plane }) => ({
        mode,
        frequency,
        plane,
        ...(standardUncertainty === null ? {} : { standardUncertainty }),
      })),
    options: {},
  };
}

/** Whether a stored estimate no longer speaks for its inputs: they have changed since, or the engine has. */
export function isStale(stored: { engineVersion: string; inputSha256: string }, cable: Cable, measurement: Measurement): boolean {
  if (stored.engineVersion !== ENGINE_VERSION) return true;
  try {
    return sha256OfJson(estimateInputOf(cable, measurement)) !== stored.inputSha256;
  } catch (error) {
    if (error instanceof EstimationError) return true;
    throw error;
  }
}
