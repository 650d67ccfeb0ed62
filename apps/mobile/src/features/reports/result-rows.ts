import type { IntervalBarValues } from '@strandnote/core/drawing';
import type { FrozenCable, FrozenSpan, ReportContent, Zone } from '@strandnote/core/report-content';
import { zonesByUrgency } from './zone-words.ts';

/** One row of a results table: a cable, or one span of a cable that has several. */
export interface ResultRow {
  key: string;
  cable: FrozenCable;
  span: FrozenSpan;
  name: string;
  zone: Zone;
  bar: IntervalBarValues;
  /** Codes of what the fit warned about. */
  warnings: { code: string; message: string }[];
}

export function resultRows(content: ReportContent): ResultRow[] {
  return content.cables.flatMap((cable) =>
    cable.spans.map((span, index) => ({
      key: span.id,
      cable,
      span,
      name: cable.spans.length > 1 ? `${cable.reference} / ${span.name || index + 1}` : cable.reference,
      zone: span.decision.zone,
      bar: barOf(cable, span),
      warnings: span.estimate?.output.warnings ?? [],
    })),
  );
}

/** Doubtful cables first: by zone, then by how much the fit warned about. */
export function byUrgency(rows: readonly ResultRow[]): ResultRow[] {
  const rank = (row: ResultRow) => zonesByUrgency.indexOf(row.zone) * 100 - Math.min(99, row.warnings.length);
  return rows.toSorted((a, b) => rank(a) - rank(b));
}

export function countByZone(rows: readonly ResultRow[]): { zone: Zone; count: number }[] {
  return zonesByUrgency.map((zone) => ({ zone, count: rows.filter((row) => row.zone === zone).length })).filter(({ count }) => count > 0);
}

function barOf(cable: FrozenCable, span: FrozenSpan): IntervalBarValues {
  const output = span.estimate?.output;
  return {
    zone: span.decision.zone,
    tension: output?.tension ?? null,
    interval: output?.interval95 ?? null,
    bracket: output?.bracket ?? null,
    lowerLimit: span.decision.lowerLimit,
    upperLimit: span.decision.upperLimit,
    reference: cable.referenceTension?.meanChordValue ?? null,
    lastSurvey: span.lastSurvey?.tension ?? null,
  };
}

/** What changed in a span since another content was frozen, in words; empty when nothing did. */
export function changesSince(before: ReportContent | null, row: ResultRow): string[] {
  const old = before?.cables.find(({ id }) => id === row.cable.id)?.spans.find(({ id }) => id === row.span.id);
  if (!old) return [];
  const changed = (a: unknown, b: unknown) => JSON.stringify(a) !== JSON.stringify(b);
  return [
    changed(old.inputs, row.span.inputs) ? 'inputs' : '',
    changed(old.measurement?.peaks, row.span.measurement?.peaks) ? 'peaks' : '',
    changed([old.lowerEnd, old.upperEnd], [row.span.lowerEnd, row.span.upperEnd]) ? 'ends' : '',
    changed(old.estimate?.output.tension, row.span.estimate?.output.tension) ? 'tension' : '',
  ].filter((word) => word !== '');
}
