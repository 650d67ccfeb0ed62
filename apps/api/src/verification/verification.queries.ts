import type { Verification } from '@strandnote/api/contract';
import type { Db } from '@strandnote/db';
import { sql } from 'drizzle-orm';

interface VerifiedRow extends Record<string, unknown> {
  code: string;
  report_number: string;
  letter: string;
  firm_name: string;
  structure_name: string;
  state: Verification['state'];
  issued_at: string | Date;
  superseded_by_letter: string | null;
  superseded_at: string | Date | null;
  withdrawn_at: string | Date | null;
  sha256: string;
  demonstration: boolean;
}

/**
 * What anyone may know who holds a code, or a file and so its hash. Asked across firms by the database's own function, which
 * tells this and nothing else.
 */
export async function findByKey(db: Db, key: string): Promise<Verification | null> {
  const { rows } = await db.execute<VerifiedRow>(sql`select * from verify_report(${key})`);
  const [row] = rows;
  if (!row) return null;
  return {
    code: row.code,
    reportNumber: row.report_number,
    letter: row.letter,
    firmName: row.firm_name,
    structureName: row.structure_name,
    state: row.state,
    issuedAt: isoOf(row.issued_at),
    supersededByLetter: row.superseded_by_letter,
    supersededAt: row.superseded_at === null ? null : isoOf(row.superseded_at),
    withdrawnAt: row.withdrawn_at === null ? null : isoOf(row.withdrawn_at),
    sha256: row.sha256,
    demonstration: row.demonstration,
  };
}

/** A raw query gives times as PostgreSQL prints them. */
function isoOf(time: string | Date): string {
  return new Date(time).toISOString();
}
