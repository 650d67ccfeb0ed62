import { randomUUID } from 'node:crypto';
import { setImmediate } from 'node:timers/promises';
import type { Cable, Measurement, SavedEstimates, SaveEstimates } from '@strandnote/api/contract';
import { EstimationError, estimateTension } from '@strandnote/core';
import type { StoredEstimate, StoredEstimateInput } from '@strandnote/core/report-content';
import { type Actor, schema, type Tx, withFirm } from '@strandnote/db';
import { asc, desc, eq, inArray } from 'drizzle-orm';
import { assertCan } from '../access/permissions.ts';
import { recordEvent } from '../audit/record-event.ts';
import { closedCampaign } from '../campaigns/edit-campaign.ts';
import { loadCampaignDetail, type SurveyedCampaign } from '../campaigns/load-campaign-detail.ts';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import { canonicalJson, sha256OfText } from '../reports/canonical-json.ts';
import { estimateInputOf } from './estimate-input.ts';

const { campaigns, estimates } = schema;

type Refused = SavedEstimates['refused'][number];
interface Computed {
  measurement: Measurement;
  input: StoredEstimateInput;
  inputSha256: string;
  output: StoredEstimate;
}

/**
 * Computes and stores an estimate of each measurement named, or of all that were measured. One whose inputs and engine are
 * those of its last estimate is not repeated. What cannot be estimated is told with its reason and keeps nobody waiting.
 */
export async function saveEstimates(
  deps: AppDeps,
  actor: Actor,
  campaignId: string,
  { measurementIds }: SaveEstimates,
): Promise<SavedEstimates> {
  assertCan(actor, 'campaign.edit');
  const surveyed = await withFirm(deps.db, actor, (tx) => loadCampaignDetail(tx, campaignId, null));
  if (surveyed.detail.state === 'closed') throw new AppError('conflict', closedCampaign);
  const wanted = measurementsToEstimate(surveyed, measurementIds);
  // Fits take a while: no transaction is held open meanwhile, and other requests get their turn between two of them.
  const computed: Computed[] = [];
  const refused: Refused[] = [];
  for (const { cable, measurement } of wanted) {
    const result = estimateOne(cable, measurement);
    if ('code' in result) refused.push(result);
    else computed.push(result);
    await setImmediate();
  }
  return withFirm(deps.db, actor, async (tx) => {
    await store(tx, actor, { campaignId, computed, at: deps.clock() });
    const { detail } = await loadCampaignDetail(tx, campaignId, null);
    const named = new Set(wanted.map(({ measurement }) => measurement.id));
    const items = detail.cables.flatMap((entry) => entry.estimates.filter(({ measurementId }) => named.has(measurementId)));
    return { items, refused };
  });
}

interface Wanted {
  cable: Cable;
  measurement: Measurement;
}

function measurementsToEstimate({ detail }: SurveyedCampaign, named: string[] | null): Wanted[] {
  const all = detail.cables.flatMap(({ cable, measurements }) => measurements.map((measurement) => ({ cable, measurement })));
  if (named === null) return all.filter(({ measurement }) => measurement.peaks.some(({ used }) => used));
  const known = new Set(all.map(({ measurement }) => measurement.id));
  if (named.some((id) => !known.has(id))) throw AppError.ofField('measurementIds', 'Name measurements of this campaign.');
  return all.filter(({ measurement }) => named.includes(measurement.id));
}

function estimateOne(cable: Cable, measurement: Measurement): Computed | Refused {
  try {
    const input = estimateInputOf(cable, measurement);
    const output = estimateTension(input.cable, input.peaks, input.options);
    return { measurement, input, inputSha256: sha256OfText(canonicalJson(input)), output };
  } catch (error) {
    if (!(error instanceof EstimationError)) throw error;
    return { measurementId: measurement.id, code: error.code, field: fieldOf(error, measurement), message: error.message };
  }
}

/** The fit numbers the peaks that were used; the entry form numbers all of them. */
function fieldOf({ field }: EstimationError, { peaks }: Measurement): string | null {
  if (field === '') return null;
  const places = peaks.flatMap(({ used }, index) => (used ? [index] : []));
  return field.replace(/^peaks\[(\d+)\]/, (_, index: string) => `peaks[${places[Number(index)] ?? index}]`);
}

interface ToStore {
  campaignId: string;
  computed: Computed[];
  at: Date;
}

async function store(tx: Tx, actor: Actor, { campaignId, computed, at }: ToStore): Promise<void> {
  // The campaign's row is locked, so that two people who save at once do not store every estimate twice.
  const [campaign] = await tx.select().from(campaigns).where(eq(campaigns.id, campaignId)).for('no key update');
  if (campaign!.state === 'closed') throw new AppError('conflict', closedCampaign);
  const last = await latestEstimates(tx, computed);
  const changed = computed.filter(({ measurement, inputSha256, output }) => {
    const stored = last.get(measurement.id);
    return stored?.inputSha256 !== inputSha256 || stored.engineVersion !== output.engineVersion;
  });
  if (changed.length === 0) return;
  await tx.insert(estimates).values(
    changed.map(({ measurement, input, inputSha256, output }) => ({
      firmId: actor.firmId,
      id: randomUUID(),
      measurementId: measurement.id,
      spanId: measurement.spanId,
      campaignId,
      engineVersion: output.engineVersion,
      input,
      output,
      inputSha256,
      createdBy: actor.userId,
      createdAt: after(last.get(measurement.id)?.createdAt, at),
    })),
  );
  const measurementIds = changed.map(({ measurement }) => measurement.id);
  await recordEvent(tx, actor, 'estimates.saved', { kind: 'campaign', id: campaignId }, { measurementIds }, at);
}

/** Of two estimates of a measurement the later one stands, even if the clock did not move between them. */
function after(last: Date | undefined, at: Date): Date {
  return last && last >= at ? new Date(last.getTime() + 1) : at;
}

async function latestEstimates(tx: Tx, computed: Computed[]) {
  const ids = computed.map(({ measurement }) => measurement.id);
  const rows = await tx
    .selectDistinctOn([estimates.measurementId], {
      measurementId: estimates.measurementId,
      inputSha256: estimates.inputSha256,
      engineVersion: estimates.engineVersion,
      createdAt: estimates.createdAt,
    })
    .from(estimates)
    .where(inArray(estimates.measurementId, ids))
    .orderBy(asc(estimates.measurementId), desc(estimates.createdAt), desc(estimates.id));
  return new Map(rows.map((row) => [row.measurementId, row]));
}
