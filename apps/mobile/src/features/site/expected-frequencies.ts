import type { Section, Span } from '@strandnote/api/contract';
import { type Cable, EstimationError, naturalFrequencies, surveyedCable, type TensionEstimate } from '@strandnote/core';

/** Enough for the highest mode that anybody reads on site. */
const modeCount = 20;
const undamped = { lowerDamperState: 'none', upperDamperState: 'none', crossTied: false } as const;

/**
 * Where the peaks of a span should lie (Hz, mode 1 first): by the fit so far where there is one, else by an expected tension.
 * For the eye only; an end that is not known is taken half way between hinged and clamped.
 */
export function expectedFrequencies(
  section: Section,
  span: Span,
  known: { fit: TensionEstimate | null; tension: number | null },
): number[] {
  const tension = known.fit?.tension ?? known.tension;
  if (tension === null) return [];
  try {
    const cable = surveyedCable(section, span, undamped);
    const ends = known.fit ? endsOfFit(known.fit) : endsOfDrawing(cable);
    const [low, high] = cable.bendingStiffnessBounds ?? [section.bendingStiffnessLow, section.bendingStiffnessHigh];
    const bendingStiffness = known.fit?.bendingStiffness?.value ?? Math.sqrt(low * high);
    return naturalFrequencies({ ...cable, ends, attachments: [] }, { tension, bendingStiffness, plane: 'in-plane' }, modeCount);
  } catch (error) {
    if (error instanceof EstimationError) return [];
    throw error;
  }
}

function endsOfFit({ fixity }: TensionEstimate): NonNullable<Cable['ends']> {
  const [lower, upper] = fixity;
  return [{ fixity: [lower.mean, lower.mean] }, { fixity: [upper.mean, upper.mean] }];
}

function endsOfDrawing({ ends }: Cable): NonNullable<Cable['ends']> {
  const halfway = (end: NonNullable<Cable['ends']>[number]): NonNullable<Cable['ends']>[number] => {
    if (end === 'unknown') return { fixity: [0.5, 0.5] };
    if (typeof end === 'object' && 'fixity' in end) {
      const middle = (end.fixity[0] + end.fixity[1]) / 2;
      return { fixity: [middle, middle] };
    }
    return end;
  };
  const [lower, upper] = ends ?? ['unknown', 'unknown'];
  return [halfway(lower), halfway(upper)];
}
