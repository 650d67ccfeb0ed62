import { sql } from 'drizzle-orm';
import type { Tx } from './client.ts';

export interface AuditFault {
  sequence: number;
  message: string;
}

/**
 * Recomputes the chain of the actor's firm.
 *
 * @returns how many events there are, the hash of the last, and every place where the chain does not hold, first to last
 */
export async function verifyAuditChain(tx: Tx, firmId: string): Promise<{ events: number; head: string; faults: AuditFault[] }> {
  const count = await tx.execute<{ events: string; head: string | null }>(
    sql`select count(*) as events, (select hash from audit_heads where firm_id = ${firmId}) as head from audit_events where firm_id = ${firmId}`,
  );
  const faults = await tx.execute<{ sequence: string; message: string }>(sql`select sequence, message from audit_faults(${firmId})`);
  const { events = '0', head = null } = count.rows[0] ?? {};
  return {
    events: Number(events),
    head: head ?? '',
    faults: faults.rows.map(({ sequence, message }) => ({ sequence: Number(sequence), message })),
  };
}
