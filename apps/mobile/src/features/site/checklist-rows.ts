import type { CampaignCable, CampaignDetail, Estimate, Measurement, Span } from '@strandnote/api/contract';
import type { IntervalBarValues } from '@strandnote/core/drawing';
import type { StoredEstimate } from '@strandnote/core/report-content';
import { estimateMeasurement } from './live-estimate.ts';
import { decideSpan, type SurveyDecision } from './survey-decision.ts';
import { isMeasured } from './survey-overlay.ts';

/** One line of the checklist: a cable, or one span of a cable that has several. */
export interface ChecklistRow {
  key: string;
  entry: CampaignCable;
  span: Span;
  name: string;
  state: 'measured' | 'to measure' | 'not measured';
  /** The visit that the report takes. */
  measurement: Measurement | null;
  output: StoredEstimate | null;
  /** Why there is no tension although peaks were entered. */
  refusal: string | null;
  /** Kept on the server and still true of its inputs. */
  saved: boolean;
  decision: SurveyDecision;
  bar: IntervalBarValues;
}

/** Every span of the campaign in the order of the structure. */
export function checklistRows(survey: CampaignDetail): ChecklistRow[] {
  return survey.cables.flatMap((entry) => entry.cable.spans.map((span) => checklistRow(survey, entry, span)));
}

export function spanName({ cable }: CampaignCable, span: Span): string {
  if (cable.spans.length === 1) return cable.reference;
  return `${cable.reference} / ${span.name || cable.spans.indexOf(span) + 1}`;
}

function checklistRow(survey: CampaignDetail, entry: CampaignCable, span: Span): ChecklistRow {
  const measurement = reportedMeasurement(entry.measurements, span.id);
  const used = measurement?.peaks.some((peak) => peak.used) ?? false;
  const saved = measurement && used ? speaksFor(entry.estimates, measurement) : null;
  const outcome = measurement && used && !saved ? estimateMeasurement(entry.cable.section, span, measurement) : null;
  const output = saved?.output ?? outcome?.output ?? null;
  const decision = decideSpan(entry.cable, survey, output);
  return {
    key: span.id,
    entry,
    span,
    name: spanName(entry, span),
    state: used ? 'measured' : entry.notMeasuredReason === null ? 'to measure' : 'not measured',
    measurement,
    output,
    refusal: outcome?.problem?.message ?? null,
    saved: saved !== null,
    decision,
    bar: barOf(decision, output, entry.lastSurvey.find(({ spanId }) => spanId === span.id)?.tension ?? null),
  };
}

/** Of several visits to a span the report takes the last that gave a peak to use, and the last of all if none did. */
export function reportedMeasurement(measurements: readonly Measurement[], spanId: string): Measurement | null {
  const visits = visitsOf(measurements, spanId);
  return visits.find(({ peaks }) => peaks.some(({ used }) => used)) ?? visits[0] ?? null;
}

/** The visits to a span, the latest first. */
export function visitsOf(measurements: readonly Measurement[], spanId: string): Measurement[] {
  return measurements
    .filter((measurement) => measurement.spanId === spanId)
    .toSorted((a, b) => Date.parse(b.visitedAt) - Date.parse(a.visitedAt) || a.id.localeCompare(b.id));
}

/** The saved estimate, if it was made of just these peaks: what was entered since on this device makes it stale too. */
function speaksFor(estimates: readonly Estimate[], measurement: Measurement): Estimate | null {
  const saved = estimates.find(({ measurementId }) => measurementId === measurement.id);
  if (!saved || saved.stale) return null;
  const entered = measurement.peaks.filter(({ used }) => used);
  const same =
    saved.input.peaks.length === entered.length &&
    saved.input.peaks.every((peak) =>
      entered.some(
        (candidate) =>
          candidate.mode === peak.mode &&
          candidate.frequency === peak.frequency &&
          candidate.plane === (peak.plane ?? 'in-plane') &&
          candidate.standardUncertainty === (peak.standardUncertainty ?? null),
      ),
    );
  return same ? saved : null;
}

export function barOf(
  { zone, lowerLimit, upperLimit, reference }: SurveyDecision,
  output: Pick<StoredEstimate, 'tension' | 'interval95' | 'bracket'> | null,
  lastSurvey: number | null,
): IntervalBarValues {
  return {
    zone,
    tension: output?.tension ?? null,
    interval: output?.interval95 ?? null,
    bracket: output?.bracket ?? null,
    lowerLimit,
    upperLimit,
    reference,
    lastSurvey,
  };
}

/** Cables whose reference, owner's reference or painted mark contains what was typed, and who still wait, if asked for. */
export function foundRows(rows: readonly ChecklistRow[], typed: string, onlyToMeasure: boolean): ChecklistRow[] {
  const wanted = plain(typed);
  return rows.filter(({ entry: { cable }, name, state }) => {
    if (onlyToMeasure && state !== 'to measure') return false;
    return [name, cable.ownerReference, cable.paintedMark].some((text) => plain(text).includes(wanted));
  });
}

/** On site nobody types the hyphen of "W-07u". */
function plain(text: string): string {
  return text.toLowerCase().replace(/[\s\-_./]/g, '');
}

/** Where to go from here: the next that waits, going round once; null when none does. */
export function nextToMeasure(rows: readonly ChecklistRow[], key: string): ChecklistRow | null {
  const at = rows.findIndex((row) => row.key === key);
  const round = [...rows.slice(at + 1), ...rows.slice(0, Math.max(0, at))];
  return round.find(({ state }) => state === 'to measure') ?? null;
}

export function progressOf(rows: readonly ChecklistRow[]): { done: number; of: number; measured: number; label: string } {
  const cables = [...new Set(rows.map(({ entry }) => entry))];
  const measured = cables.filter(isMeasured).length;
  const excused = cables.filter((entry) => !isMeasured(entry) && entry.notMeasuredReason !== null).length;
  const label = `${measured} of ${cables.length} measured${excused > 0 ? `, ${excused} not to be measured` : ''}`;
  return { done: measured + excused, of: cables.length, measured, label };
}
