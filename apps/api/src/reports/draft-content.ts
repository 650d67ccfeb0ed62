import { ENGINE_VERSION } from '@strandnote/core';
import type { ReportContent } from '@strandnote/core/report-content';
import { schema, type Tx } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { loadCampaignDetail, type SurveyedCampaign } from '../campaigns/load-campaign-detail.ts';
import { toFirm } from '../firms/to-firm.ts';
import { toStructure } from '../structures/to-structure.ts';
import { buildReportContent } from './build-content.ts';
import { canonicalJson, sha256OfText } from './canonical-json.ts';
import { type Blocker, findBlockers } from './find-blockers.ts';
import type { LoadedRevision } from './load-revision.ts';
import { type Source, sourcesOf } from './sources.ts';

const { clients, firms, revisionCables, revisions } = schema;

/** The content of a draft as it would be frozen now, with what stands in the way and the rows that it uses. */
export interface DraftContent {
  content: ReportContent;
  /** Canonical JSON, and its SHA-256. */
  text: string;
  contentSha256: string;
  blockers: Blocker[];
  sources: Source[];
}

export async function draftContent(tx: Tx, { revision, report }: LoadedRevision): Promise<DraftContent> {
  const covered = await tx.select().from(revisionCables).where(eq(revisionCables.revisionId, revision.id));
  const surveyed = await loadCampaignDetail(
    tx,
    report.campaignId,
    covered.map(({ cableId }) => cableId),
  );
  const [firm] = await tx.select().from(firms);
  const [client] = await tx.select().from(clients).where(eq(clients.id, report.clientId));
  const content = buildReportContent({
    engineVersion: ENGINE_VERSION,
    firm: toFirm(firm!),
    client: { id: client!.id, name: client!.name, address: client!.address },
    report: { number: report.number, title: report.title, letter: revision.letter },
    author: { userId: revision.authorUserId, name: surveyed.nameOf(revision.authorUserId) },
    structure: toStructure(surveyed.structure, surveyed.detail.cableCount),
    campaign: surveyed.detail,
    texts: revision.texts,
  });
  const ofReport = await tx.select({ id: revisions.id }).from(revisions).where(eq(revisions.reportId, report.id));
  const text = canonicalJson(content);
  return {
    content,
    text,
    contentSha256: sha256OfText(text),
    blockers: findBlockers(content, staleEstimates(surveyed)),
    sources: sourcesOf(
      content,
      surveyed,
      ofReport.map(({ id }) => id),
    ),
  };
}

function staleEstimates({ detail }: SurveyedCampaign): Set<string> {
  const all = detail.cables.flatMap(({ estimates }) => estimates);
  return new Set(all.filter(({ stale }) => stale).map(({ id }) => id));
}
