import type { Actor, Db } from '@strandnote/db';
import { sql } from 'drizzle-orm';
import type { AppDeps } from '../deps.ts';
import { AppError } from '../http/errors.ts';
import type { Person } from './current-person.ts';

export type Membership = {
  firm_id: string;
  firm_name: string;
  time_zone: string;
  demonstration: boolean;
  member_id: string;
  member_name: string;
  email: string;
  roles: Actor['roles'];
  client_id: string | null;
  client_name: string | null;
  units: 'si' | 'us';
  licence_number: string;
  licence_jurisdiction: string;
};

/** The firms of a person; asked across firms by the database's own function. */
export async function membershipsOf(db: Db, userId: string): Promise<Membership[]> {
  const { rows } = await db.execute<Membership>(sql`select * from my_firms(${userId})`);
  return rows;
}

/** The person as a member of the firm of the address. Another firm's address is not found, whether it exists or not. */
export async function requireMember(deps: AppDeps, person: Person, firmId: string): Promise<Actor> {
  const membership = (await membershipsOf(deps.db, person.userId)).find((candidate) => candidate.firm_id === firmId);
  if (!membership) throw new AppError('not-found', 'There is nothing here, or it is not yours to see.');
  return { firmId, userId: person.userId, name: membership.member_name, roles: membership.roles, clientId: membership.client_id };
}
