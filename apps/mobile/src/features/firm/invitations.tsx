import type { Client, Invitation } from '@strandnote/api/contract';
import { useMemo, useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, type Column, DataTable, Empty, Heading, Loading, Problem, Row, Stack } from '../../ui/index.ts';
import { instantText } from '../site/visit-time.ts';
import { useInvitationsQuery, useRevokeInvitationMutation } from './firm.api.ts';
import { InviteSheet } from './invite-sheet.tsx';
import { invitationWords, rolesText } from './role-words.ts';

/** Who was invited and what became of it. */
export function Invitations({ clients }: { clients: readonly Client[] }) {
  const firm = useFirm();
  const invitations = useInvitationsQuery(firm.firmId);
  const [again, setAgain] = useState<Invitation | null>(null);
  const columns = useMemo(() => columnsOf(clients, firm.timeZone, setAgain), [clients, firm.timeZone]);
  return (
    <Stack gap={3}>
      <Heading level={2}>Invitations</Heading>
      {invitations.isPending ? <Loading /> : null}
      {invitations.isError ? <Problem error={invitations.error} onRetry={invitations.refetch} /> : null}
      {invitations.data ? (
        <DataTable
          caption="Invitations of the firm"
          columns={columns}
          rows={invitations.data.items}
          rowKey={(invitation) => invitation.id}
          empty={<Empty>Nobody was invited yet.</Empty>}
        />
      ) : null}
      {again ? <InviteSheet again={again} onClose={() => setAgain(null)} /> : null}
    </Stack>
  );
}

function columnsOf(clients: readonly Client[], timeZone: string, onAgain: (invitation: Invitation) => void): Column<Invitation>[] {
  const clientName = (id: string | null) => clients.find((client) => client.id === id)?.name ?? null;
  return [
    { key: 'name', header: 'Name', cell: (row) => row.name, sortBy: (row) => row.name, onPhone: 'title' },
    { key: 'state', header: 'State', cell: (row) => invitationWords[row.state], sortBy: (row) => row.state, onPhone: 'aside' },
    { key: 'email', header: 'E-mail', cell: (row) => row.email, sortBy: (row) => row.email },
    { key: 'roles', header: 'Roles', cell: (row) => rolesText(row.roles, clientName(row.clientId)) },
    { key: 'expires', header: 'Open until', cell: (row) => instantText(row.expiresAt, timeZone), sortBy: (row) => row.expiresAt },
    { key: 'act', header: 'Change', cell: (row) => <InvitationAct invitation={row} onAgain={onAgain} />, onPhone: 'across' },
  ];
}

function InvitationAct({ invitation, onAgain }: { invitation: Invitation; onAgain: (invitation: Invitation) => void }) {
  const firm = useFirm();
  const revoke = useRevokeInvitationMutation(firm.firmId);
  if (invitation.state === 'accepted') return null;
  if (invitation.state !== 'open') {
    return (
      <Row>
        <Button kind="quiet" onPress={() => onAgain(invitation)} label={`Invite ${invitation.name} again`}>
          Invite again
        </Button>
      </Row>
    );
  }
  return (
    <Stack gap={2}>
      <Row>
        <Button
          kind="destructive"
          onPress={() => revoke.mutate(invitation.id)}
          busy={revoke.isPending}
          label={`Revoke the invitation of ${invitation.name}`}
        >
          Revoke
        </Button>
      </Row>
      {revoke.isError ? <Problem error={revoke.error} /> : null}
    </Stack>
  );
}
