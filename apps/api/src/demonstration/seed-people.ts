import { randomBytes } from 'node:crypto';
import { type Actor, schema, withFirm } from '@strandnote/db';
import { membershipsOf } from '../access/require-member.ts';
import { createClient } from '../clients/write-client.ts';
import { createFirm } from '../commands/firm-create.ts';
import type { AppDeps } from '../deps.ts';
import { editFirm } from '../firms/edit-firm.ts';
import { acceptInvitation, createAccount } from '../members/accept-invitation.ts';
import type { DemonstrationAccount } from './open-demonstration.ts';
import type { SeededRandom } from './seeded-random.ts';

type Role = 'admin' | 'engineer' | 'checker' | 'client';
const people: Record<Role, { label: string; name: string; email: string; licence: string }> = {
  engineer: { label: 'engineer', name: 'Ines Callowell', email: 'engineer@larkmoor.example', licence: 'OV-20417' },
  checker: { label: 'checker', name: 'Tobin Marsh-Reyes', email: 'checker@larkmoor.example', licence: 'OV-11830' },
  admin: { label: 'administrator', name: 'Petra Vangelis', email: 'admin@larkmoor.example', licence: '' },
  client: { label: 'client', name: 'Odile Farrow', email: 'client@orrinvale.example', licence: '' },
};

export interface DemonstrationPeople {
  actors: Record<Role, Actor>;
  passwords: Record<Role, string>;
  clientId: string;
  accounts: DemonstrationAccount[];
}

/** The demonstration's firm with its four people, through the same doors as any other. Passwords are made at random. */
export async function seedPeople(deps: AppDeps, ownerUrl: string, random: SeededRandom): Promise<DemonstrationPeople> {
  const password = () => randomBytes(12).toString('base64url');
  const passwords = { engineer: password(), checker: password(), admin: password(), client: password() };
  const { firmId, token } = await createFirm(ownerUrl, deps.env.publicUrl, {
    firmName: 'Larkmoor Structural (demonstration)',
    adminName: people.admin.name,
    adminEmail: people.admin.email,
    timeZone: 'Europe/London',
    demonstration: true,
  });
  await acceptInvitation(deps, token, { password: passwords.admin });
  const admin = await adminOf(deps, firmId);
  await editFirm(deps, admin, {
    letterhead: {
      addressLines: ['Larkmoor Structural', '4 Tidemill Yard', 'Orrinvale'],
      phone: '',
      email: 'office@larkmoor.example',
      registration: 'An invented firm in an invented county',
    },
  });
  const clientId = random.uuid();
  await createClient(deps, admin, {
    id: clientId,
    name: 'County of Orrinvale, Bridges',
    contactName: people.client.name,
    contactEmail: people.client.email,
    address: 'County Hall, Orrinvale',
  });
  const join = (role: Exclude<Role, 'admin'>) =>
    addMember(deps, admin, role, passwords[role], role === 'client' ? clientId : null, random.uuid());
  const actors = { admin, engineer: await join('engineer'), checker: await join('checker'), client: await join('client') };
  const accounts = (Object.keys(people) as Role[]).map((role) => ({
    role: people[role].label,
    email: people[role].email,
    password: passwords[role],
  }));
  return { actors, passwords, clientId, accounts };
}

async function adminOf(deps: AppDeps, firmId: string): Promise<Actor> {
  const context = await deps.auth.$context;
  const found = await context.internalAdapter.findUserByEmail(people.admin.email);
  const [membership] = await membershipsOf(deps.db, found!.user.id);
  return { firmId, userId: found!.user.id, name: membership!.member_name, roles: membership!.roles, clientId: null };
}

async function addMember(deps: AppDeps, admin: Actor, role: Role, password: string, clientId: string | null, id: string): Promise<Actor> {
  const { name, email, licence } = people[role];
  const userId = await createAccount(deps, { name, email }, password);
  const roles = [role];
  const licenceJurisdiction = licence === '' ? '' : 'Orrinvale (invented)';
  await withFirm(deps.db, admin, (tx) =>
    tx
      .insert(schema.members)
      .values({ firmId: admin.firmId, id, userId, name, email, roles, clientId, licenceNumber: licence, licenceJurisdiction }),
  );
  return { firmId: admin.firmId, userId, name, roles, clientId };
}
