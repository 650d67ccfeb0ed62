import type { ModalPeak, Span, UnitSystem } from '@strandnote/api/contract';
import { formatNumber } from '@strandnote/core/units';
import { problemOfEntry, type QuantityRules } from '../../lib/quantity-entry.ts';
import { type EntryDraft, isBlank, modeOf, type PeakDraft, type VisitDraft } from './entry-draft.ts';
import { readInstant } from './visit-time.ts';

export type PeakField = 'mode' | 'frequency' | 'uncertainty' | 'setAsideReason';
export type PeakProblems = Partial<Record<PeakField, string>>;

/** What is wrong, beside the field that caused it; rows and answers without a fault are absent. */
export interface EntryProblems {
  peaks: Record<string, PeakProblems>;
  visit: Partial<Record<keyof VisitDraft, string>>;
}

export const frequencyRules: QuantityRules = { name: 'The frequency', kind: 'frequency', above: 0, to: 100_000 };
export const uncertaintyRules: QuantityRules = { name: 'The uncertainty of the frequency', kind: 'frequency', above: 0, to: 1000 };
export const temperatureRules: QuantityRules = { name: 'The steel temperature', kind: 'temperature', from: -60, to: 90 };

/** The sensor sits somewhere on the free length. */
export function sensorRules(span: Span): QuantityRules {
  const length = span.chordLength - span.lowerDeduction - span.upperDeduction;
  return { name: 'The position of the sensor', kind: 'length', from: 0, to: Math.max(0, length) };
}

export function checkEntry(draft: EntryDraft, { span, timeZone }: { span: Span; timeZone: string }): EntryProblems {
  return { peaks: checkPeaks(draft), visit: checkVisit(draft.visit, { span, timeZone, system: draft.system }) };
}

export function hasProblems({ peaks, visit }: EntryProblems): boolean {
  return Object.keys(peaks).length > 0 || Object.keys(visit).length > 0;
}

/** The peaks that can be fitted as they stand; a row with a fault stays out until it is mended. */
export function usablePeaks(draft: EntryDraft, problems: EntryProblems['peaks']): ModalPeak[] {
  return draft.peaks
    .filter((peak) => peak.used && !isBlank(peak) && !(peak.id in problems) && peak.frequency.si !== null)
    .map((peak) => toPeak(peak, modeOf(peak)!));
}

export function toPeak(peak: PeakDraft, mode: number): ModalPeak {
  return {
    id: peak.id,
    mode,
    frequency: peak.frequency.si!,
    standardUncertainty: peak.uncertainty.si,
    plane: peak.plane,
    source: peak.source,
    used: peak.used,
    setAsideReason: peak.used ? null : peak.setAsideReason.trim(),
  };
}

function checkPeaks(draft: EntryDraft): EntryProblems['peaks'] {
  const rows = draft.peaks.filter((peak) => !isBlank(peak));
  const problems: EntryProblems['peaks'] = {};
  const note = (id: string, field: PeakField, message: string) => {
    problems[id] = { [field]: message, ...problems[id] };
  };
  for (const row of rows) {
    for (const [field, message] of Object.entries(checkRow(row, draft.system))) note(row.id, field as PeakField, message);
  }
  const sound = rows.filter((row) => row.used && !(row.id in problems));
  for (const plane of ['in-plane', 'out-of-plane'] as const) {
    const inPlane = sound.filter((row) => row.plane === plane);
    for (const { row, earlier } of repeated(inPlane)) {
      note(row.id, 'mode', `Mode ${modeOf(row)} is entered twice (${hertz(earlier)}). Change the number, or set one aside.`);
    }
    for (const { row, message } of outOfOrder(inPlane.filter((row) => !(row.id in problems)))) note(row.id, 'frequency', message);
  }
  return problems;
}

function checkRow(row: PeakDraft, system: UnitSystem): PeakProblems {
  const problems: PeakProblems = {};
  const mode = modeOf(row);
  if (mode === null) problems.mode = `“${row.mode.trim()}” is no mode number. Mode numbers are 1, 2, 3 …`;
  else if (mode < 1 || mode > 60) problems.mode = 'Mode numbers run from 1 to 60.';
  const frequency = problemOfEntry(row.frequency, { ...frequencyRules, required: true }, system);
  if (frequency) problems.frequency = frequency;
  const uncertainty = problemOfEntry(row.uncertainty, uncertaintyRules, system);
  if (uncertainty) problems.uncertainty = uncertainty;
  else if (row.uncertainty.si !== null && row.frequency.si !== null && row.uncertainty.si >= row.frequency.si) {
    problems.uncertainty = 'The uncertainty must be smaller than the frequency itself.';
  }
  if (!row.used && row.setAsideReason.trim() === '') problems.setAsideReason = 'Say why this peak is set aside.';
  return problems;
}

function repeated(rows: readonly PeakDraft[]): { row: PeakDraft; earlier: PeakDraft }[] {
  const first = new Map<number, PeakDraft>();
  return rows.flatMap((row) => {
    const earlier = first.get(modeOf(row)!);
    if (earlier) return [{ row, earlier }];
    first.set(modeOf(row)!, row);
    return [];
  });
}

/**
 * Frequencies must rise with the mode number. Blamed are the fewest rows without which the others rise, so that one slip of a
 * decimal mark does not mark all that follow.
 */
function outOfOrder(rows: readonly PeakDraft[]): { row: PeakDraft; message: string }[] {
  const sorted = rows.toSorted((a, b) => modeOf(a)! - modeOf(b)!);
  const rising = new Set(longestRise(sorted));
  return sorted.flatMap((row, index) => {
    if (rising.has(row)) return [];
    const below = sorted.slice(0, index).findLast((other) => rising.has(other));
    const above = sorted.slice(index + 1).find((other) => rising.has(other));
    return [{ row, message: `Must lie ${placeBetween(below, above)}. Look at the decimal mark and the mode number.` }];
  });
}

function placeBetween(below: PeakDraft | undefined, above: PeakDraft | undefined): string {
  const name = (other: PeakDraft) => `${hertz(other)} (mode ${modeOf(other)})`;
  if (below && above) return `between ${name(below)} and ${name(above)}`;
  return below ? `above ${name(below)}` : `below ${name(above!)}`;
}

/** The longest rising row of frequencies; of two as long, the one whose f/n are more alike, as those of a cable are. */
function longestRise(sorted: readonly PeakDraft[]): PeakDraft[] {
  const perMode = sorted.map((row) => Math.log(row.frequency.si! / modeOf(row)!));
  const typical = perMode.toSorted((a, b) => a - b)[Math.floor(perMode.length / 2)] ?? 0;
  const best: { rows: PeakDraft[]; strangeness: number }[] = [];
  const better = (a: (typeof best)[number], b: (typeof best)[number]) =>
    b.rows.length > a.rows.length || (b.rows.length === a.rows.length && b.strangeness < a.strangeness) ? b : a;
  for (const [index, row] of sorted.entries()) {
    const before = best.filter((_, at) => sorted[at]!.frequency.si! < row.frequency.si!).reduce(better, { rows: [], strangeness: 0 });
    best.push({ rows: [...before.rows, row], strangeness: before.strangeness + Math.abs(perMode[index]! - typical) });
  }
  return best.reduce(better, { rows: [], strangeness: 0 }).rows;
}

function checkVisit(
  visit: VisitDraft,
  { span, timeZone, system }: { span: Span; timeZone: string; system: UnitSystem },
): EntryProblems['visit'] {
  const problems: EntryProblems['visit'] = {};
  const need = (field: keyof VisitDraft, message: string | null) => {
    if (message) problems[field] = message;
  };
  need('visitedAt', readInstant(visit.visitedAt, timeZone) === null ? 'Write the date and time as 2026-12-01 10:40.' : null);
  need('sensor', problemOfEntry(visit.sensor, sensorRules(span), system));
  need('steelTemperature', problemOfEntry(visit.steelTemperature, temperatureRules, system));
  need('excitation', visit.excitation === null ? 'Say what made the cable vibrate.' : null);
  need('lowerDamper', visit.lowerDamper === null ? 'Look at the lower end, and say what its damper does.' : null);
  need('upperDamper', visit.upperDamper === null ? 'Look at the upper end, and say what its damper does.' : null);
  need('bushing', visit.bushing === null ? 'Say whether there is a bushing, and how it sits.' : null);
  need('crossTied', visit.crossTied === null ? 'Say whether the cable is tied to another.' : null);
  need('note', visit.note.trim().length > 1000 ? 'At most 1000 characters.' : null);
  return problems;
}

function hertz({ frequency }: PeakDraft): string {
  const decimals = /[.,](\d+)/.exec(frequency.text)?.[1]?.length ?? 0;
  return `${formatNumber(frequency.si ?? 0, Math.min(decimals, 6))} Hz`;
}
