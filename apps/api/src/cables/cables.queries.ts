import type { Cable, CableDetail, Section, TensionOfCampaign } from '@strandnote/api/contract';
import { tensionEstimate } from '@strandnote/core/report-content';
import { schema, type Tx } from '@strandnote/db';
import { and, asc, desc, eq, inArray, isNull, type SQL, sql } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { toCable, toSection } from './to-cable.ts';

const {
  cables,
  campaigns,
  estimates,
  measurements,
  referenceTensions,
  revisions,
  sections,
  spans,
  structures,
  submissions,
  submissionSources,
} = schema;

export async function listSections(tx: Tx, structureId: string): Promise<Section[]> {
  const rows = await tx.select().from(sections).where(eq(sections.structureId, structureId)).orderBy(asc(sections.name));
  return rows.map(toSection);
}

export async function loadSection(tx: Tx, sectionId: string): Promise<Section> {
  const [row] = await tx.select().from(sections).where(eq(sections.id, sectionId));
  if (!row) throw new AppError('not-found', 'There is no such section.');
  return toSection(row);
}

/** Cables with their spans, section and references, in the order of the structure. */
export async function listCables(tx: Tx, where: SQL | undefined): Promise<Cable[]> {
  const rows = await tx
    .select({ cable: cables, section: sections })
    .from(cables)
    .innerJoin(sections, eq(sections.id, cables.sectionId))
    .where(where)
    .orderBy(asc(cables.position), asc(cables.reference));
  const ids = rows.map(({ cable }) => cable.id);
  const spanRows = await tx
    .select()
    .from(spans)
    .where(and(inArray(spans.cableId, ids), isNull(spans.retiredAt)))
    .orderBy(asc(spans.position));
  const references = await tx
    .select()
    .from(referenceTensions)
    .where(inArray(referenceTensions.cableId, ids))
    .orderBy(asc(referenceTensions.createdAt));
  return rows.map(({ cable, section }) =>
    toCable({
      cable,
      section,
      spans: spanRows.filter(({ cableId }) => cableId === cable.id),
      references: references.filter(({ cableId }) => cableId === cable.id),
    }),
  );
}

export function listCablesOfStructure(tx: Tx, structureId: string): Promise<Cable[]> {
  return listCables(tx, eq(cables.structureId, structureId));
}

export async function loadCable(tx: Tx, cableId: string): Promise<CableDetail> {
  const [cable] = await listCables(tx, eq(cables.id, cableId));
  if (!cable) throw new AppError('not-found', 'There is no such cable.');
  const [structure] = await tx.select({ name: structures.name }).from(structures).where(eq(structures.id, cable.structureId));
  return {
    ...cable,
    structureName: structure!.name,
    history: await tensionHistory(
      tx,
      cable.spans.map(({ id }) => id),
    ),
  };
}

/** The latest estimate of each span in each campaign, oldest campaign first. */
async function tensionHistory(tx: Tx, spanIds: string[]): Promise<TensionOfCampaign[]> {
  const rows = await tx
    .selectDistinctOn([estimates.spanId, estimates.campaignId], { estimate: estimates, campaign: campaigns, visit: measurements })
    .from(estimates)
    .innerJoin(campaigns, eq(campaigns.id, estimates.campaignId))
    .innerJoin(measurements, eq(measurements.id, estimates.measurementId))
    .where(inArray(estimates.spanId, spanIds))
    .orderBy(asc(estimates.spanId), asc(estimates.campaignId), desc(measurements.visitedAt), desc(estimates.createdAt));
  const checked = await checkedEstimates(
    tx,
    rows.map(({ estimate }) => estimate.id),
  );
  return rows
    .map(({ estimate, campaign, visit }) => {
      const { tension, interval95, bracket } = tensionEstimate.parse(estimate.output);
      return {
        campaignId: campaign.id,
        campaignName: campaign.name,
        startsOn: campaign.startsOn,
        spanId: estimate.spanId,
        tension,
        interval95,
        bracket,
        steelTemperature: visit.steelTemperature ?? campaign.steelTemperature,
        checked: checked.has(estimate.id),
      };
    })
    .sort((a, b) => a.startsOn.localeCompare(b.startsOn));
}

/** Those that an approved, issued or superseded revision rests on. */
async function checkedEstimates(tx: Tx, ids: string[]): Promise<Set<string>> {
  const rows = await tx
    .selectDistinct({ id: submissionSources.entityId })
    .from(submissionSources)
    .innerJoin(submissions, eq(submissions.id, submissionSources.submissionId))
    .innerJoin(revisions, eq(revisions.approvedSubmissionId, submissions.id))
    .where(
      and(
        eq(submissionSources.entity, 'estimate'),
        inArray(submissionSources.entityId, ids),
        sql`${revisions.state} in ('approved', 'issued', 'superseded')`,
      ),
    );
  return new Set(rows.map(({ id }) => id));
}
