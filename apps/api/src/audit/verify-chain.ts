import { type Actor, type AuditFault, type Db, schema, verifyAuditChain, withFirm } from '@strandnote/db';
import { and, eq } from 'drizzle-orm';
import { readAnchors } from './anchor-heads.ts';

export interface ChainVerdict {
  events: number;
  head: string;
  faults: AuditFault[];
}

/** Recomputes the chain of the actor's firm, and compares it with the anchors that were kept outside the database. */
export async function verifyChain(db: Db, actor: Pick<Actor, 'firmId' | 'userId' | 'clientId'>, anchorFile: string): Promise<ChainVerdict> {
  const anchors = await readAnchors(anchorFile, actor.firmId);
  return withFirm(db, actor, async (tx) => {
    const chain = await verifyAuditChain(tx, actor.firmId);
    const { auditEvents } = schema;
    const missing: AuditFault[] = [];
    for (const { sequence, hash, at } of anchors) {
      const [event] = await tx
        .select({ hash: auditEvents.hash })
        .from(auditEvents)
        .where(and(eq(auditEvents.firmId, actor.firmId), eq(auditEvents.sequence, sequence)));
      if (event?.hash !== hash) missing.push({ sequence, message: `Event ${sequence} is not the one that was anchored at ${at}.` });
    }
    return { ...chain, faults: [...chain.faults, ...missing].sort((a, b) => a.sequence - b.sequence) };
  });
}
