import { randomUUID } from 'node:crypto';
import type { CreateReport } from '@strandnote/api/contract';
import type { ReportTexts } from '@strandnote/core/report-content';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { makeVerificationCode } from '../verification/verification-code.ts';

const { campaignCables, campaigns, clients, firms, reports, revisionCables, revisions } = schema;

const emptyTexts: ReportTexts = { scope: '', conditions: '', deviations: '', conclusion: '' };

/** Opens a report on a campaign, numbered from the firm's counter, with revision A as a draft. */
export async function createReport(deps: AppDeps, actor: Actor, campaignId: string, body: CreateReport): Promise<void> {
  assertCan(actor, 'report.write');
  await withFirm(deps.db, actor, async (tx) => {
    // The firm's row is locked first: numbers are given out one at a time, and the same request sent twice waits here.
    const [firm] = await tx.select().from(firms).for('no key update');
    if (await isRepeated(tx, campaignId, body)) return;
    const cableIds = await coveredCables(tx, campaignId, body);
    const number = `${firm!.reportPrefix}${String(firm!.nextReportNumber).padStart(4, '0')}`;
    await tx.update(firms).set({ nextReportNumber: firm!.nextReportNumber + 1 });
    const { id, clientId, title, revisionId } = body;
    await tx.insert(reports).values({ firmId: actor.firmId, id, campaignId, clientId, number, title });
    await insertRevision(tx, actor, {
      id: revisionId,
      reportId: id,
      letter: 'A',
      texts: emptyTexts,
      cableIds,
      deputyUserId: null,
      at: deps.clock(),
    });
    await recordEvent(
      tx,
      actor,
      'report.created',
      { kind: 'report', id },
      { number, title, campaignId, cables: cableIds.length },
      deps.clock(),
    );
  });
}

interface NewRevision {
  id: string;
  reportId: string;
  letter: string;
  texts: ReportTexts;
  cableIds: string[];
  deputyUserId: string | null;
  at: Date;
}

/** A draft with the cables that it covers and the code by which anyone can verify it once it is issued. */
export async function insertRevision(tx: Tx, actor: Actor, { cableIds, at, ...revision }: NewRevision): Promise<void> {
  await tx.insert(revisions).values({
    ...revision,
    firmId: actor.firmId,
    state: 'draft',
    authorUserId: actor.userId,
    textVersion: 1,
    verificationCode: makeVerificationCode(),
    changedAt: at,
    createdAt: at,
  });
  await tx
    .insert(revisionCables)
    .values(cableIds.map((cableId) => ({ firmId: actor.firmId, id: randomUUID(), revisionId: revision.id, cableId })));
}

async function isRepeated(tx: Tx, campaignId: string, body: CreateReport): Promise<boolean> {
  const [stored] = await tx.select().from(reports).where(eq(reports.id, body.id));
  if (!stored) return false;
  const same = stored.campaignId === campaignId && stored.clientId === body.clientId && stored.title === body.title;
  const [first] = await tx.select().from(revisions).where(eq(revisions.id, body.revisionId));
  if (!same || first?.reportId !== body.id) throw new AppError('conflict', 'Another report has this identifier already.');
  return true;
}

async function coveredCables(tx: Tx, campaignId: string, body: CreateReport): Promise<string[]> {
  const [campaign] = await tx.select({ id: campaigns.id }).from(campaigns).where(eq(campaigns.id, campaignId));
  if (!campaign) throw new AppError('not-found', 'There is no such campaign.');
  const [client] = await tx.select({ id: clients.id }).from(clients).where(eq(clients.id, body.clientId));
  if (!client) throw AppError.ofField('clientId', 'Choose a client of the firm.');
  const inCampaign = await tx
    .select({ cableId: campaignCables.cableId })
    .from(campaignCables)
    .where(eq(campaignCables.campaignId, campaignId));
  const all = inCampaign.map(({ cableId }) => cableId);
  if (body.cableIds === null) return all;
  if (body.cableIds.some((cableId) => !all.includes(cableId))) {
    throw AppError.ofField('cableIds', 'Choose among the cables of the campaign.');
  }
  return [...new Set(body.cableIds)];
}
