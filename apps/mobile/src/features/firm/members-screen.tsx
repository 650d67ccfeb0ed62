import type { Client, Member } from '@strandnote/api/contract';
import { useMemo, useState } from 'react';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, type Column, DataTable, Empty, Loading, Page, Problem } from '../../ui/index.ts';
import { useClientsQuery } from '../clients/clients.api.ts';
import { useMembersQuery } from './firm.api.ts';
import { Invitations } from './invitations.tsx';
import { InviteSheet } from './invite-sheet.tsx';
import { MemberSheet } from './member-sheet.tsx';
import { rolesText } from './role-words.ts';

/** The people of the firm, what they may do, and who was invited. */
export function MembersScreen() {
  const firm = useFirm();
  const members = useMembersQuery(firm.firmId);
  const clients = useClientsQuery(firm.firmId);
  if (members.isPending || clients.isPending) return <Page title="People">{<Loading />}</Page>;
  if (members.isError || clients.isError) {
    return (
      <Page title="People">
        <Problem error={members.error ?? clients.error} onRetry={() => Promise.all([members.refetch(), clients.refetch()])} />
      </Page>
    );
  }
  return <People members={members.data.items} clients={clients.data.items} />;
}

function People({ members, clients }: { members: Member[]; clients: Client[] }) {
  const firm = useFirm();
  const mayEdit = hasRole(firm, 'admin');
  const [open, setOpen] = useState<Member | 'invite' | null>(null);
  const columns = useMemo(() => columnsOf(clients, mayEdit ? setOpen : null), [clients, mayEdit]);
  const invite = (
    <Button kind="primary" onPress={() => setOpen('invite')}>
      Invite a person
    </Button>
  );
  return (
    <Page title="People" breadcrumb={[{ label: 'Account', href: '/account' }]} {...(mayEdit ? { actions: invite } : {})}>
      <DataTable
        caption="People of the firm"
        columns={columns}
        rows={members}
        rowKey={(member) => member.id}
        empty={<Empty>The people of the firm stand here.</Empty>}
      />
      {mayEdit ? <Invitations clients={clients} /> : null}
      {open === 'invite' ? <InviteSheet again={null} onClose={() => setOpen(null)} /> : null}
      {open !== null && open !== 'invite' ? <MemberSheet member={open} onClose={() => setOpen(null)} /> : null}
    </Page>
  );
}

function columnsOf(clients: readonly Client[], onEdit: ((member: Member) => void) | null): Column<Member>[] {
  const clientName = (id: string | null) => clients.find((client) => client.id === id)?.name ?? null;
  const shown: Column<Member>[] = [
    { key: 'name', header: 'Name', cell: (row) => row.name, sortBy: (row) => row.name, onPhone: 'title' },
    { key: 'state', header: 'State', cell: stateText, sortBy: stateText, onPhone: 'aside' },
    { key: 'email', header: 'E-mail', cell: (row) => row.email, sortBy: (row) => row.email },
    { key: 'roles', header: 'Roles', cell: (row) => rolesText(row.roles, clientName(row.clientId)) },
    { key: 'licence', header: 'Licence', cell: licenceText },
  ];
  if (onEdit === null) return shown;
  const edit = (member: Member) => (
    <Button kind="quiet" onPress={() => onEdit(member)} label={`Edit the roles of ${member.name}`}>
      Edit
    </Button>
  );
  return [...shown, { key: 'edit', header: 'Change', cell: edit, onPhone: 'across' }];
}

function stateText({ active }: Member): string {
  return active ? 'active' : 'not active';
}

function licenceText({ licenceNumber, licenceJurisdiction }: Member): string {
  return [licenceNumber, licenceJurisdiction].filter(Boolean).join(', ') || 'not stated';
}
