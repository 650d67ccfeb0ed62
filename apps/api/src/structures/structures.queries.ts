import type { Structure } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { asc, count, eq, type SQL } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';
import { toStructure } from './to-structure.ts';

const { cables, structures } = schema;

export async function listStructures(tx: Tx, where?: SQL): Promise<Structure[]> {
  const rows = await tx
    .select({ structure: structures, cableCount: count(cables.id) })
    .from(structures)
    .leftJoin(cables, eq(cables.structureId, structures.id))
    .where(where)
    .groupBy(structures.firmId, structures.id)
    .orderBy(asc(structures.name));
  return rows.map(({ structure, cableCount }) => toStructure(structure, cableCount));
}

export async function loadStructure(tx: Tx, structureId: string): Promise<Structure> {
  const [structure] = await listStructures(tx, eq(structures.id, structureId));
  if (!structure) throw new AppError('not-found', 'There is no such structure.');
  return structure;
}
