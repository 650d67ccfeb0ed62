import type { Tx } from '@strandnote/db';
import { sql } from 'drizzle-orm';

/** The jobs there are, with what each is given. Firm and person are stamped by the database from the transaction. */
export interface JobPayloads {
  mail: { to: string; subject: string; text: string; path?: string };
  'render-report': { revisionId: string; submissionId: string };
}

export type JobName = keyof JobPayloads;

/** Puts a job into the queue in the same transaction: it runs if and only if the transaction commits. */
export async function enqueue<Name extends JobName>(tx: Pick<Tx, 'execute'>, name: Name, payload: JobPayloads[Name]): Promise<void> {
  await tx.execute(sql`select enqueue(${name}, ${JSON.stringify(payload)}::jsonb)`);
}
