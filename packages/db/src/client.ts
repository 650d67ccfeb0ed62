import { sql } from 'drizzle-orm';
import { drizzle, type NodePgDatabase } from 'drizzle-orm/node-postgres';
import pg from 'pg';
import * as schema from './schema/index.ts';

export type Db = NodePgDatabase<typeof schema> & { $client: pg.Pool };
export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0];

/** Who acts, and in which firm. A person of a client organisation carries its id; everyone else null. */
export interface Actor {
  firmId: string;
  userId: string;
  name: string;
  roles: ('admin' | 'engineer' | 'checker' | 'client')[];
  clientId: string | null;
}

/** A pool of connections as one of the database's roles. Close it with `db.$client.end()`. */
export function createDb(url: string, { connections = 10 }: { connections?: number } = {}): Db {
  const pool = new pg.Pool({ connectionString: url, max: connections });
  // A connection that breaks while idle is replaced by the pool; without a listener it would end the process.
  pool.on('error', () => undefined);
  return drizzle({ client: pool, schema }) as Db;
}

/**
 * The only way to rows of a firm: a transaction in which row-level security sees this actor. The settings are local to the
 * transaction, so that a pooled connection carries nothing over.
 */
export async function withFirm<Result>(
  db: Db,
  actor: Pick<Actor, 'firmId' | 'userId' | 'clientId'>,
  work: (tx: Tx) => Promise<Result>,
): Promise<Result> {
  return db.transaction(async (tx) => {
    await tx.execute(sql`select set_config('strandnote.firm_id', ${actor.firmId}, true),
      set_config('strandnote.user_id', ${actor.userId}, true),
      set_config('strandnote.client_id', ${actor.clientId ?? ''}, true)`);
    return work(tx);
  });
}
