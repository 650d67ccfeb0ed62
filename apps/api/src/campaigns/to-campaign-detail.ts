import type { CampaignCable, CampaignDetail } from '@strandnote/api/contract';
import type { schema } from '@strandnote/db';
import { toCable } from '../cables/to-cable.ts';
import { toEstimate } from '../estimates/to-estimate.ts';
import { toMeasurement } from '../measurements/to-measurement.ts';
import type { CampaignRow, SurveyRows } from './survey.queries.ts';

type StructureRow = typeof schema.structures.$inferSelect;
type NameOf = (userId: string) => string;

/** The checklist of a campaign from its rows, in the order of the structure. */
export function toCampaignDetail(campaign: CampaignRow, structure: StructureRow, rows: SurveyRows, nameOf: NameOf): CampaignDetail {
  const cables = toEntries(rows, nameOf);
  return {
    ...toCampaignFields(campaign),
    structureName: structure.name,
    structureTimeZone: structure.timeZone,
    elevation: structure.elevation,
    cableCount: cables.length,
    measuredCount: cables.filter(isMeasured).length,
    cables,
  };
}

/** What a campaign's row says of itself. */
export function toCampaignFields(row: CampaignRow) {
  const { id, structureId, number, name, startsOn, endsOn, crew, instruments, weather, steelTemperature, airTemperature } = row;
  const { traffic, stage, basis, state } = row;
  return {
    id,
    structureId,
    number,
    name,
    startsOn,
    endsOn,
    crew,
    instruments,
    weather,
    steelTemperature,
    airTemperature,
    traffic,
    stage,
    basis,
    state,
  };
}

/** A cable counts as measured when a visit to one of its spans gave a peak to use. */
function isMeasured(entry: CampaignCable): boolean {
  return entry.measurements.some(({ peaks }) => peaks.some(({ used }) => used));
}

function toEntries(rows: SurveyRows, nameOf: NameOf): CampaignCable[] {
  const spansOf = groupBy(rows.spans, ({ cableId }) => cableId);
  const referencesOf = groupBy(rows.references, ({ cableId }) => cableId);
  const peaksOf = groupBy(rows.peaks, ({ measurementId }) => measurementId);
  const visitsOf = groupBy(rows.measurements, ({ spanId }) => spanId);
  const estimateOf = new Map(rows.estimates.map((estimate) => [estimate.measurementId, estimate]));
  const lastOf = new Map(rows.lastSurveys.map((last) => [last.spanId, last]));
  return rows.entries.map(({ place, cable: cableRow, section }) => {
    // A span that is no longer part of the cable stays on the list of a campaign in which it was measured.
    const spans = (spansOf.get(cableRow.id) ?? []).filter(({ id, retiredAt }) => retiredAt === null || visitsOf.has(id));
    const cable = toCable({ cable: cableRow, section, spans, references: referencesOf.get(cableRow.id) ?? [] });
    const measurements = spans
      .flatMap(({ id }) => visitsOf.get(id) ?? [])
      .map((visit) => toMeasurement(visit, peaksOf.get(visit.id) ?? [], nameOf));
    const estimates = measurements.flatMap((measurement) => {
      const row = estimateOf.get(measurement.id);
      return row ? [toEstimate(row, cable, measurement, nameOf)] : [];
    });
    const lastSurvey = spans.flatMap(({ id }) => {
      const last = lastOf.get(id);
      if (!last) return [];
      const { spanId, tension, campaignName, startsOn, steelTemperature } = last;
      return [{ spanId, tension, campaignName, startsOn, steelTemperature }];
    });
    return { cable, notMeasuredReason: place.notMeasuredReason, measurements, estimates, lastSurvey };
  });
}

function groupBy<Row>(rows: Row[], keyOf: (row: Row) => string): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) {
    const group = groups.get(keyOf(row));
    if (group) group.push(row);
    else groups.set(keyOf(row), [row]);
  }
  return groups;
}
