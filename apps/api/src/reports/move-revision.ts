import type { RevisionState } from '@strandnote/api/contract';
import { schema, type Tx } from '@strandnote/db';
import { and, eq, inArray } from 'drizzle-orm';
import { AppError } from '../http/errors.ts';

const { revisions } = schema;

type RevisionRow = typeof revisions.$inferSelect;
interface Move {
  from: RevisionState[];
  to: RevisionState;
  at: Date;
  set?: Partial<RevisionRow>;
}

/**
 * Moves a revision from one state to another. The state is in the WHERE clause: of two moves at once, one updates no row
 * and is refused.
 */
export async function moveRevision(tx: Tx, revisionId: string, { from, to, at, set }: Move): Promise<RevisionRow> {
  const [moved] = await tx
    .update(revisions)
    .set({ ...set, state: to, changedAt: at })
    .where(and(eq(revisions.id, revisionId), inArray(revisions.state, from)))
    .returning();
  if (!moved) throw new AppError('conflict', 'The revision has moved on since you looked at it. Load it again to see where it stands.');
  return moved;
}
