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
  try {
    const used = peaks
      .filter((peak) => peak.used)
      .map(({ mode, frequency, standardUncertainty, plane }) => ({
        mode,
        frequency,
        plane,
        ...(standardUncertainty === null ? {} : { standardUncertainty }),
      }));
    return { output: estimateTension(surveyedCable(section, span, visit), used, {}), problem: null };
  } catch (error) {
    if (!(error instanceof EstimationError)) throw error;
    return { output: null, problem: { code: error.code, field: error.field, message: error.message } };
  }
}

/** The first fits after a page load are slow, because nothing is compiled yet: a few are made before the person types. */
export function warmUp(section: Section, span: Span, expected: readonly number[]): void {
  const visit = { lowerDamperState: 'none', upperDamperState: 'none', crossTied: false } as const;
  for (let count = 1; count <= Math.min(6, expected.length); count++) {
    const peaks = expected.slice(0, count).map((frequency, index): ModalPeak => {
      return {
        id: '',
        mode: index + 1,
        frequency,
        standardUncertainty: null,
        plane: 'in-plane',
        source: 'typed',
        used: true,
        setAsideReason: null,
      };
    });
    estimateSpan(section, span, visit, peaks);
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
