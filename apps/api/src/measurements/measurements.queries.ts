import type { Measurement } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { asc, eq } from 'drizzle-orm';
import { loadMemberNames } from '../members/members.queries.ts';
import { toMeasurement } from './to-measurement.ts';

const { measurements, modalPeaks } = schema;

/** A measurement with its peaks; null where there is none with this id in the firm. */
export async function findMeasurement(tx: Tx, measurementId: string): Promise<Measurement | null> {
  const [row] = await tx.select().from(measurements).where(eq(measurements.id, measurementId));
  if (!row) return null;
  const peaks = await tx
    .select()
    .from(modalPeaks)
    .where(eq(modalPeaks.measurementId, measurementId))
    .orderBy(asc(modalPeaks.mode), asc(modalPeaks.plane), asc(modalPeaks.id));
  return toMeasurement(row, peaks, await loadMemberNames(tx));
}
