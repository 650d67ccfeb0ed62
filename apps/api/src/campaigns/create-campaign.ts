import { randomUUID } from 'node:crypto';
import type { CreateCampaign } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { eq, sql } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { isSameEntry } from '../http/same-entry.ts';

const { cables, campaignCables, campaigns, structures } = schema;

/** Opens a campaign on a structure, numbered after the last one, for the cables named or for all. */
export async function createCampaign(deps: AppDeps, actor: Actor, structureId: string, body: CreateCampaign): Promise<void> {
  assertCan(actor, 'campaign.edit');
  await withFirm(deps.db, actor, async (tx) => {
    // The structure's row is locked, so that numbers are given out one at a time and the same request sent twice waits here.
    const [structure] = await tx.select().from(structures).where(eq(structures.id, structureId)).for('no key update');
    if (!structure) throw new AppError('not-found', 'There is no such structure.');
    if (await isRepeated(tx, structureId, body)) return;
    const cableIds = await coveredCables(tx, structureId, body.cableIds);
    const number = await nextNumber(tx, structureId);
    const { cableIds: _named, ...fields } = body;
    await tx.insert(campaigns).values({ ...fields, firmId: actor.firmId, structureId, number, state: 'open' });
    await tx
      .insert(campaignCables)
      .values(cableIds.map((cableId) => ({ firmId: actor.firmId, id: randomUUID(), campaignId: body.id, cableId })));
    await recordEvent(
      tx,
      actor,
      'campaign.created',
      { kind: 'campaign', id: body.id },
      { structureId, number, cables: cableIds.length },
      deps.clock(),
    );
  });
}

async function isRepeated(tx: Tx, structureId: string, { cableIds, ...fields }: CreateCampaign): Promise<boolean> {
  const [stored] = await tx.select().from(campaigns).where(eq(campaigns.id, fields.id));
  if (!stored) return false;
  const rows = await tx.select().from(campaignCables).where(eq(campaignCables.campaignId, fields.id));
  const covered = new Set(rows.map(({ cableId }) => cableId));
  const sameCables = cableIds === null || (cableIds.length === covered.size && cableIds.every((id) => covered.has(id)));
  if (sameCables && isSameEntry(stored, { ...fields, structureId })) return true;
  throw new AppError('conflict', 'Another campaign has this identifier already.');
}

async function coveredCables(tx: Tx, structureId: string, named: string[] | null): Promise<string[]> {
  const rows = await tx.select({ id: cables.id }).from(cables).where(eq(cables.structureId, structureId));
  const all = rows.map(({ id }) => id);
  if (all.length === 0) throw AppError.ofField('cableIds', 'The structure has no cables yet: add its cables first.');
  if (named === null) return all;
  if (named.some((id) => !all.includes(id))) throw AppError.ofField('cableIds', 'Choose among the cables of the structure.');
  return [...new Set(named)];
}

async function nextNumber(tx: Tx, structureId: string): Promise<number> {
  const [last] = await tx
    .select({ number: sql<number>`coalesce(max(${campaigns.number}), 0)::int` })
    .from(campaigns)
    .where(eq(campaigns.structureId, structureId));
  return last!.number + 1;
}
