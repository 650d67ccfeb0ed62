import { createDb } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import { verifyChain } from '../audit/verify-chain.ts';

/** Recomputes the audit chain of every firm and compares it with the anchor file. @returns whether all are intact */
export async function runAuditVerify({ ownerUrl, anchorFile }: { ownerUrl: string; anchorFile: string }): Promise<boolean> {
  const db = createDb(ownerUrl, { connections: 1 });
  try {
    const { rows } = await db.execute<{ id: string; name: string }>(sql`select id, name from firms order by name`);
    let intact = true;
    for (const { id, name } of rows) {
      const { events, faults } = await verifyChain(db, { firmId: id, userId: 'operator', clientId: null }, anchorFile);
      console.log(faults.length === 0 ? `${name}: ${events} events, intact` : `${name}: ${events} events, ${faults.length} faults`);
      for (const { message } of faults) console.log(`  ${message}`);
      intact &&= faults.length === 0;
    }
    return intact;
  } finally {
    await db.$client.end();
  }
}
