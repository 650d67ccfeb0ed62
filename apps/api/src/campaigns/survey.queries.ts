import { schema, type Tx } from '@strandnote/db';
import { and, asc, desc, eq, inArray, lt, ne, or, sql } from 'drizzle-orm';

const { cables, campaignCables, campaigns, estimates, measurements, modalPeaks, referenceTensions, sections, spans } = schema;

/** All rows of a campaign in a fixed number of queries, however many cables it has. */
export interface SurveyRows {
  entries: { place: CampaignCableRow; cable: CableRow; section: SectionRow }[];
  spans: SpanRow[];
  references: ReferenceRow[];
  measurements: MeasurementRow[];
  peaks: PeakRow[];
  /** The latest estimate of each measurement. */
  estimates: EstimateRow[];
  lastSurveys: LastSurveyRow[];
}
export type CampaignRow = typeof campaigns.$inferSelect;
export type CampaignCableRow = typeof campaignCables.$inferSelect;
export type CableRow = typeof cables.$inferSelect;
export type SectionRow = typeof sections.$inferSelect;
export type SpanRow = typeof spans.$inferSelect;
export type ReferenceRow = typeof referenceTensions.$inferSelect;
export type MeasurementRow = typeof measurements.$inferSelect;
export type PeakRow = typeof modalPeaks.$inferSelect;
export type EstimateRow = typeof estimates.$inferSelect;

/** @param cableIds narrows the survey to these cables; null takes all of the campaign */
export async function loadSurveyRows(tx: Tx, campaign: CampaignRow, cableIds: string[] | null): Promise<SurveyRows> {
  const entries = await tx
    .select({ place: campaignCables, cable: cables, section: sections })
    .from(campaignCables)
    .innerJoin(cables, eq(cables.id, campaignCables.cableId))
    .innerJoin(sections, eq(sections.id, cables.sectionId))
    .where(and(eq(campaignCables.campaignId, campaign.id), cableIds === null ? undefined : inArray(campaignCables.cableId, cableIds)))
    .orderBy(asc(cables.position), asc(cables.reference));
  const covered = entries.map(({ cable }) => cable.id);
  const spanRows = await tx.select().from(spans).where(inArray(spans.cableId, covered)).orderBy(asc(spans.position), asc(spans.id));
  const spanIds = spanRows.map(({ id }) => id);
  const visits = await tx
    .select()
    .from(measurements)
    .where(and(eq(measurements.campaignId, campaign.id), inArray(measurements.spanId, spanIds)))
    .orderBy(asc(measurements.visitedAt), asc(measurements.id));
  const visitIds = visits.map(({ id }) => id);
  return {
    entries,
    spans: spanRows,
    references: await tx
      .select()
      .from(referenceTensions)
      .where(inArray(referenceTensions.cableId, covered))
      .orderBy(asc(referenceTensions.createdAt), asc(referenceTensions.id)),
    measurements: visits,
    peaks: await tx
      .select()
      .from(modalPeaks)
      .where(inArray(modalPeaks.measurementId, visitIds))
      .orderBy(asc(modalPeaks.mode), asc(modalPeaks.plane), asc(modalPeaks.id)),
    estimates: await tx
      .selectDistinctOn([estimates.measurementId])
      .from(estimates)
      .where(inArray(estimates.measurementId, visitIds))
      .orderBy(asc(estimates.measurementId), desc(estimates.createdAt), desc(estimates.id)),
    lastSurveys: await loadLastSurveys(tx, campaign, spanIds),
  };
}

export type LastSurveyRow = Awaited<ReturnType<typeof loadLastSurveys>>[number];

/** The tension of each span in the last campaign before this one that has an estimate of it. */
async function loadLastSurveys(tx: Tx, campaign: CampaignRow, spanIds: string[]) {
  const earlier = or(
    lt(campaigns.startsOn, campaign.startsOn),
    and(eq(campaigns.startsOn, campaign.startsOn), lt(campaigns.number, campaign.number)),
  );
  return tx
    .selectDistinctOn([estimates.spanId], {
      spanId: estimates.spanId,
      estimateId: estimates.id,
      measurementId: estimates.measurementId,
      campaignId: estimates.campaignId,
      campaignName: campaigns.name,
      startsOn: campaigns.startsOn,
      tension: sql<number>`(${estimates.output} ->> 'tension')::float8`,
      steelTemperature: sql<number | null>`coalesce(${measurements.steelTemperature}, ${campaigns.steelTemperature})`,
    })
    .from(estimates)
    .innerJoin(campaigns, eq(campaigns.id, estimates.campaignId))
    .innerJoin(measurements, eq(measurements.id, estimates.measurementId))
    .where(and(inArray(estimates.spanId, spanIds), ne(estimates.campaignId, campaign.id), earlier))
    .orderBy(
      asc(estimates.spanId),
      desc(campaigns.startsOn),
      desc(campaigns.number),
      desc(measurements.visitedAt),
      desc(estimates.createdAt),
      desc(estimates.id),
    );
}
