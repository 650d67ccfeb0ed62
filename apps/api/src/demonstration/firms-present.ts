import { createDb } from '@strandnote/db';
import { sql } from 'drizzle-orm';

/** What the database holds: nothing yet, firms that work, or a demonstration. */
export async function firmsPresent(ownerUrl: string): Promise<'none' | 'real' | 'demonstration'> {
  const db = createDb(ownerUrl, { connections: 1 });
  try {
    const { rows } = await db.execute<{ demonstration: boolean }>(sql`select demonstration from firms order by demonstration limit 1`);
    if (!rows[0]) return 'none';
    return rows[0].demonstration ? 'demonstration' : 'real';
  } finally {
    await db.$client.end();
  }
}
