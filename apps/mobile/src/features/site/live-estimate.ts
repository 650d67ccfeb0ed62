import type { DampingState, Measurement, ModalPeak, Section, Span } from '@strandnote/api/contract';
import { EstimationError, type EstimationErrorCode, estimateTension, surveyedCable, type TensionEstimate } from '@strandnote/core';

export interface VisitFindings {
  lowerDamperState: DampingState;
  upperDamperState: DampingState;
  crossTied: boolean;
}

/** A tension, or why there is none: `field` as the core names it, peaks numbered as they were given. */
export type Outcome =
  | { output: TensionEstimate; problem: null }
  | { output: null; problem: { code: EstimationErrorCode; field: string; message: string } };

/** Peaks in the order in which the server fits them, so that both come to the same digits. */
export function fitOrder<Peak extends Pick<ModalPeak, 'id' | 'mode' | 'plane'>>(peaks: readonly Peak[]): Peak[] {
  return peaks.toSorted((a, b) => a.mode - b.mode || a.plane.localeCompare(b.plane) || a.id.localeCompare(b.id));
}

/** The estimate that the server would make of these values; the input is the same, digit by digit. */
export function estimateSpan(section: Section, span: Span, visit: VisitFindings, peaks: readonly ModalPeak[]): Outcome {
  const started = performance.now();
  try {
    const used = peaks
      .filter((peak) => peak.used)
      .map(({ mode, frequency, standardUncertainty, plane }) => ({
        mode,
        frequency,
        plane,
        ...(standardUncertainty === null ? {} : { standardUncertainty }),
      }));
    const output = estimateTension(surveyedCable(section, span, visit), used, {});
    // Read by whoever measures how long the person waits for it.
    performance.measure('strandnote.estimate', { start: started, end: performance.now() });
    return { output, problem: null };
  } catch (error) {
    if (!(error instanceof EstimationError)) throw error;
    return { output: null, problem: { code: error.code, field: error.field, message: error.message } };
  }
}

const computed = new WeakMap<Measurement, { span: Span; section: Section; outcome: Outcome }>();

/** The estimate of a whole measurement, kept as long as neither it nor its cable changes. */
export function estimateMeasurement(section: Section, span: Span, measurement: Measurement): Outcome {
  const known = computed.get(measurement);
  if (known && known.span === span && known.section === section) return known.outcome;
  const outcome = estimateSpan(section, span, measurement, fitOrder(measurement.peaks));
  computed.set(measurement, { span, section, outcome });
  return outcome;
}
