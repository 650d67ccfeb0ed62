import type { Measurement, PutMeasurement } from '@strandnote/api/contract';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import { closedCampaign } from '../campaigns/edit-campaign.ts';
import { loadCampaign } from '../campaigns/load-campaign-detail.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { measurementChanges } from './measurement-changes.ts';
import { findMeasurement } from './measurements.queries.ts';

const { campaignCables, measurements, modalPeaks, spans } = schema;

interface Place {
  campaignId: string;
  measurementId: string;
}

/**
 * Creates a measurement or replaces it whole, with its peaks, if it is still as the sender saw it. The same request sent
 * again finds its own result and changes nothing, so that a phone's queue may repeat itself.
 *
 * @throws AppError `changed-elsewhere` with the stored measurement, when somebody else has changed it since
 */
export async function putMeasurement(deps: AppDeps, actor: Actor, place: Place, body: PutMeasurement): Promise<Measurement> {
  assertCan(actor, 'campaign.edit');
  return withFirm(deps.db, actor, async (tx) => {
    const { campaign } = await loadCampaign(tx, place.campaignId);
    // Locked, so that of two phones that replace the same version at once, the second sees what the first has stored.
    await tx.select({ id: measurements.id }).from(measurements).where(eq(measurements.id, place.measurementId)).for('no key update');
    const stored = await findMeasurement(tx, place.measurementId);
    if (stored && stored.campaignId !== place.campaignId) {
      throw new AppError('conflict', 'Another measurement has this identifier already.');
    }
    const changes = measurementChanges(stored, body);
    if (stored && Object.keys(changes).length === 0) return stored;
    if (campaign.state === 'closed') throw new AppError('conflict', closedCampaign);
    if (stored && stored.version !== body.version) throw changedElsewhere(stored);
    if (!stored && body.version !== 0) throw new AppError('not-found', 'There is no such measurement to replace.');
    await assertSpanIsSurveyed(tx, place.campaignId, body.spanId, stored);
    await (stored ? replace(tx, actor, place, body) : insert(tx, actor, place, body));
    await writePeaks(tx, actor, place.measurementId, body);
    await recordEvent(
      tx,
      actor,
      stored ? 'measurement.changed' : 'measurement.entered',
      { kind: 'measurement', id: place.measurementId },
      { campaignId: place.campaignId, spanId: body.spanId, changes },
      deps.clock(),
    );
    return (await findMeasurement(tx, place.measurementId))!;
  });
}

function changedElsewhere(stored: Measurement): AppError {
  return new AppError('changed-elsewhere', `${stored.enteredBy} has changed this measurement since you opened it.`, {
    extension: { stored },
  });
}

async function assertSpanIsSurveyed(tx: Tx, campaignId: string, spanId: string, stored: Measurement | null): Promise<void> {
  if (stored && stored.spanId !== spanId) {
    throw AppError.ofField('spanId', 'A measurement stays with its span: enter a measurement of the other cable instead.');
  }
  const [covered] = await tx
    .select({ id: spans.id })
    .from(spans)
    .innerJoin(campaignCables, and(eq(campaignCables.cableId, spans.cableId), eq(campaignCables.campaignId, campaignId)))
    .where(eq(spans.id, spanId));
  if (!covered) throw AppError.ofField('spanId', 'The campaign does not cover this span.');
}

function visitOf(body: PutMeasurement) {
  const { peaks: _peaks, version: _version, visitedAt, ...visit } = body;
  return { ...visit, visitedAt: new Date(visitedAt) };
}

async function insert(tx: Tx, actor: Actor, { campaignId, measurementId }: Place, body: PutMeasurement): Promise<void> {
  const [row] = await tx
    .insert(measurements)
    .values({ ...visitOf(body), firmId: actor.firmId, id: measurementId, campaignId, version: 1, enteredBy: actor.userId })
    .onConflictDoNothing()
    .returning({ id: measurements.id });
  // Two requests made it at once: the other came first. Sent again, this one compares itself with what is stored.
  if (!row) throw new AppError('conflict', 'The measurement was just stored by another request. Send it again.');
}

async function replace(tx: Tx, actor: Actor, { measurementId }: Place, body: PutMeasurement): Promise<void> {
  const [row] = await tx
    .update(measurements)
    .set({ ...visitOf(body), version: body.version + 1, enteredBy: actor.userId })
    .where(and(eq(measurements.id, measurementId), eq(measurements.version, body.version)))
    .returning({ id: measurements.id });
  if (!row) throw new AppError('conflict', 'The measurement was just changed by another request. Send it again.');
}

async function writePeaks(tx: Tx, actor: Actor, measurementId: string, { peaks }: PutMeasurement): Promise<void> {
  await tx.delete(modalPeaks).where(eq(modalPeaks.measurementId, measurementId));
  if (peaks.length === 0) return;
  const written = await tx
    .insert(modalPeaks)
    .values(peaks.map((peak) => ({ ...peak, firmId: actor.firmId, measurementId })))
    .onConflictDoNothing()
    .returning({ id: modalPeaks.id });
  if (written.length < peaks.length) throw new AppError('conflict', 'A peak has the identifier of another peak already.');
}
