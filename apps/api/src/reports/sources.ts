import { chooseReference } from '@strandnote/core';
import type { ReportContent } from '@strandnote/core/report-content';
import type { SurveyedCampaign } from '../campaigns/load-campaign-detail.ts';

/** A row whose values a submission uses. The names are those under which the database notes who contributed to what. */
export interface Source {
  entity: 'section' | 'cable' | 'span' | 'reference-tension' | 'campaign' | 'campaign-cable' | 'measurement' | 'estimate' | 'revision';
  entityId: string;
}

/**
 * Every row whose values this content uses, each once: whoever entered or changed one of them cannot check it. Peaks count
 * with their measurement; the tension of the last survey counts with its estimate and its measurement.
 *
 * @param revisionIds this revision and those before it in the report, whose texts it began with
 */
export function sourcesOf(content: ReportContent, { detail, rows }: SurveyedCampaign, revisionIds: string[]): Source[] {
  const spanIds = new Set(content.cables.flatMap(({ spans }) => spans.map(({ id }) => id)));
  const used: Record<Source['entity'], (string | undefined)[]> = {
    revision: revisionIds,
    campaign: [content.campaign.id],
    'campaign-cable': rows.entries.map(({ place }) => place.id),
    cable: rows.entries.map(({ cable }) => cable.id),
    section: rows.entries.map(({ section }) => section.id),
    span: [...spanIds],
    'reference-tension': detail.cables.map(({ cable }) => chooseReference(cable.references, detail)?.id),
    measurement: [
      ...content.cables.flatMap(({ spans }) => spans.map(({ measurement }) => measurement?.id)),
      ...rows.lastSurveys.filter(({ spanId }) => spanIds.has(spanId)).map(({ measurementId }) => measurementId),
    ],
    estimate: [
      ...content.cables.flatMap(({ spans }) => spans.map(({ estimate }) => estimate?.id)),
      ...rows.lastSurveys.filter(({ spanId }) => spanIds.has(spanId)).map(({ estimateId }) => estimateId),
    ],
  };
  return Object.entries(used).flatMap(([entity, ids]) =>
    [...new Set(ids)].flatMap((entityId) => (entityId === undefined ? [] : [{ entity: entity as Source['entity'], entityId }])),
  );
}
