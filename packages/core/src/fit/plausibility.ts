/**
 * Questions about inputs that are possible but unlikely: asked, not refused.
 *
 * Typed in another unit than meant, a number stays a number; what betrays it is the cable that it makes. The bounds are wide
 * (common practice): everything from a rod of a roof to the longest stay lies within.
 */
import type { Cable, ModalPeak } from '../cable/cable.ts';

/** A question to put beside a field. */
export interface PlausibilityQuestion {
  code:
    | 'length-looks-like-mm'
    | 'length-unusual'
    | 'mass-unusual'
    | 'frequency-looks-like-kilohertz'
    | 'frequency-unusual'
    | 'tension-unusual'
    | 'bending-unusual'
    | 'frequencies-not-in-steps';
  field: string;
  message: string;
}

/** Axial stress of steel is E·strain; a cable of steel this heavy carries at most about this (Pa·m³/kg → m²/s²): f_u/ρ. */
const highestSpecificTension = 2.4e5;

/**
 * What looks mistyped.
 *
 * @param cable SI, may be incomplete: fields that are missing or not numbers are passed over
 * @param peaks numbered frequencies, Hz
 * @returns questions, each with the field and a sentence; none when everything is ordinary
 */
export function questionPlausibility(cable: Partial<Cable>, peaks: readonly Partial<ModalPeak>[]): PlausibilityQuestion[] {
  const questions = [...questionCable(cable), ...questionFrequencies(peaks)];
  const first = peaks.find(({ mode, frequency }) => isPositive(mode) && isPositive(frequency));
  if (!first || !isPositive(cable.length)) return questions;
  return [...questions, ...questionTension(cable, cable.length, first.frequency! / first.mode!)];
}

function isPositive(value: number | undefined): value is number {
  return typeof value === 'number' && Number.isFinite(value) && value > 0;
}

function questionCable({ length, massPerLength }: Partial<Cable>): PlausibilityQuestion[] {
  const questions: PlausibilityQuestion[] = [];
  if (isPositive(length) && length > 1500) {
    const meant = length / 1000;
    questions.push({
      code: 'length-looks-like-mm',
      field: 'length',
      message: `A free length of ${length} m is longer than any stay. Was it ${meant} m (${length} mm)?`,
    });
  } else if (isPositive(length) && length < 0.3) {
    questions.push({ code: 'length-unusual', field: 'length', message: `A free length of ${length} m is very short. Is the unit right?` });
  }
  if (isPositive(massPerLength) && (massPerLength > 1000 || massPerLength < 0.05)) {
    questions.push({
      code: 'mass-unusual',
      field: 'massPerLength',
      message: `A mass of ${massPerLength} kg/m is ${massPerLength > 1000 ? 'heavier' : 'lighter'} than cables are. Is it per metre, and in kilograms?`,
    });
  }
  return questions;
}

function questionFrequencies(peaks: readonly Partial<ModalPeak>[]): PlausibilityQuestion[] {
  return peaks.flatMap((peak, index): PlausibilityQuestion[] => {
    if (!isPositive(peak.frequency)) return [];
    const others = peaks.filter((other, i) => i !== index && isPositive(other.frequency) && isPositive(other.mode));
    const field = `peaks[${index}].frequency`;
    const typical = others.map(({ frequency, mode }) => frequency! / mode!).sort((a, b) => a - b)[Math.floor(others.length / 2)];
    const ratio = typical !== undefined && isPositive(peak.mode) ? peak.frequency / (peak.mode * typical) : null;
    if (ratio !== null && (Math.abs(ratio / 1000 - 1) < 0.3 || Math.abs(ratio * 1000 - 1) < 0.3)) {
      return [
        {
          code: 'frequency-looks-like-kilohertz',
          field,
          message: `${peak.frequency} Hz is about a thousand times ${ratio > 1 ? 'above' : 'below'} what the other peaks suggest. Is the decimal mark right, and the unit Hz?`,
        },
      ];
    }
    if (peak.frequency > 500 || peak.frequency < 0.02) {
      return [
        { code: 'frequency-unusual', field, message: `${peak.frequency} Hz is outside what cables of structures do. Is the unit Hz?` },
      ];
    }
    if (ratio !== null && (ratio > 1.6 || ratio < 0.6)) {
      return [
        {
          code: 'frequencies-not-in-steps',
          field,
          message: `${peak.frequency} Hz does not fit mode ${peak.mode} beside the other peaks. Is the mode number right?`,
        },
      ];
    }
    return [];
  });
}

function questionTension(cable: Partial<Cable>, length: number, fundamental: number): PlausibilityQuestion[] {
  const questions: PlausibilityQuestion[] = [];
  const specific = 4 * (length * fundamental) ** 2;
  if (specific > highestSpecificTension || specific < 20) {
    questions.push({
      code: 'tension-unusual',
      field: 'length',
      message: `Length and frequency together mean a wave speed of ${Math.sqrt(specific).toPrecision(3)} m/s, ${specific > 1000 ? 'more than steel can carry' : 'a nearly slack cable'}. Check the length, the frequencies and their numbers.`,
    });
  }
  const stiffness = cable.bendingStiffness ?? cable.bendingStiffnessBounds?.[0];
  if (isPositive(stiffness) && isPositive(cable.massPerLength)) {
    const xi = length * Math.sqrt((specific * cable.massPerLength) / stiffness);
    if (xi < 3 || xi > 1e5) {
      questions.push({
        code: 'bending-unusual',
        field: 'bendingStiffness',
        message: `These values make ξ = ${xi.toPrecision(2)}: ${xi < 3 ? 'a beam rather than a cable' : 'hardly any bending stiffness at all'}. Check length and bending stiffness.`,
      });
    }
  }
  return questions;
}
