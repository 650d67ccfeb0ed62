import { type CampaignCable, type CampaignDetail, type Measurement, putMeasurement } from '@strandnote/api/contract';
import type { OutboxEntry } from '../../lib/outbox-state.ts';

/** A campaign with what was entered on this device and is not on the server yet. */
export function overlaySurvey(detail: CampaignDetail, entries: readonly OutboxEntry[], enteredBy: string): CampaignDetail {
  return entries.reduce((survey, entry) => overlaid(survey, entry, enteredBy), detail);
}

const measurementPath = /\/campaigns\/([^/]+)\/measurements\/([^/]+)$/;
const cablePath = /\/campaigns\/([^/]+)\/cables\/([^/]+)$/;

function overlaid(survey: CampaignDetail, { path, body }: OutboxEntry, enteredBy: string): CampaignDetail {
  const measured = measurementPath.exec(path);
  if (measured?.[1] === survey.id) {
    const parsed = putMeasurement.safeParse(body);
    return parsed.success ? withMeasurement(survey, { ...parsed.data, id: measured[2]!, campaignId: survey.id, enteredBy }) : survey;
  }
  const excused = cablePath.exec(path);
  if (excused?.[1] === survey.id && typeof body === 'object' && body !== null && 'notMeasuredReason' in body) {
    const reason = typeof body.notMeasuredReason === 'string' ? body.notMeasuredReason : null;
    return withReason(survey, excused[2]!, reason);
  }
  return survey;
}

/** The campaign with this measurement in the place of the one with its id, or beside the others. */
export function withMeasurement(survey: CampaignDetail, measurement: Measurement): CampaignDetail {
  return withEntries(survey, (entry) => {
    if (!entry.cable.spans.some(({ id }) => id === measurement.spanId)) return entry;
    const others = entry.measurements.filter(({ id }) => id !== measurement.id);
    return { ...entry, measurements: [...others, measurement] };
  });
}

export function withReason(survey: CampaignDetail, cableId: string, notMeasuredReason: string | null): CampaignDetail {
  return withEntries(survey, (entry) => (entry.cable.id === cableId ? { ...entry, notMeasuredReason } : entry));
}

function withEntries(survey: CampaignDetail, change: (entry: CampaignCable) => CampaignCable): CampaignDetail {
  const cables = survey.cables.map(change);
  return { ...survey, cables, measuredCount: cables.filter(isMeasured).length };
}

/** A cable counts as measured when a visit to one of its spans gave a peak to use. */
export function isMeasured(entry: CampaignCable): boolean {
  return entry.measurements.some(({ peaks }) => peaks.some(({ used }) => used));
}
