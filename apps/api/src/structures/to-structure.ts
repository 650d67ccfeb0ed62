import type { Structure } from '@strandnote/api/contract';
import type { schema } from '@strandnote/db';

export function toStructure(row: typeof schema.structures.$inferSelect, cableCount: number): Structure {
  const { id, name, reference, kind, ownerName, clientId, place, timeZone, elevation, notes } = row;
  return { id, name, reference, kind, ownerName, clientId, place, timeZone, elevation, notes, cableCount };
}
