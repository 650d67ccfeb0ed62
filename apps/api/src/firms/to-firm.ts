import type { Firm } from '@strandnote/api/contract';
import type { schema } from '@strandnote/db';

export function toFirm(row: typeof schema.firms.$inferSelect): Firm {
  const { id, name, timeZone, letterhead, reportPrefix, demonstration } = row;
  return { id, name, timeZone, letterhead, reportPrefix, demonstration };
}
