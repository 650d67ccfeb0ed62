import { appendFile, readFile } from 'node:fs/promises';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { eq } from 'drizzle-orm';
import { z } from 'zod';
import type { AppDeps } from '../deps.ts';

const anchor = z.object({ firmId: z.string(), sequence: z.number().int(), hash: z.string(), at: z.string() });
export type Anchor = z.infer<typeof anchor>;

/** Appends the head of a firm's chain to a file outside the database, so that a chain that was cut or rewritten shows itself. */
export async function appendAnchor(file: string, head: Anchor): Promise<void> {
  await appendFile(file, `${JSON.stringify(head)}\n`, { mode: 0o600 });
}

/** Anchors the head as it stands now. What was done stays done where the file cannot be written; the log tells. */
export async function anchorHead(
  { db, env, clock, log }: Pick<AppDeps, 'db' | 'env' | 'clock' | 'log'>,
  actor: Pick<Actor, 'firmId' | 'userId' | 'clientId'>,
): Promise<void> {
  const { auditHeads } = schema;
  const [head] = await withFirm(db, actor, (tx) => tx.select().from(auditHeads).where(eq(auditHeads.firmId, actor.firmId)));
  if (!head) return;
  const { firmId, sequence, hash } = head;
  try {
    await appendAnchor(env.ANCHOR_FILE, { firmId, sequence, hash, at: clock().toISOString() });
  } catch (error) {
    log.error({ err: error, firmId, sequence, hash }, 'the head of the audit chain could not be anchored');
  }
}

/** All anchors of a firm, oldest first; none where there is no file yet. */
export async function readAnchors(file: string, firmId: string): Promise<Anchor[]> {
  const text = await readFile(file, 'utf8').catch((error: NodeJS.ErrnoException) => {
    if (error.code === 'ENOENT') return '';
    throw error;
  });
  return text
    .split('\n')
    .filter((line) => line !== '')
    .map((line) => anchor.parse(JSON.parse(line)))
    .filter((candidate) => candidate.firmId === firmId);
}
