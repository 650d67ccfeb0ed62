import type { Client } from '@strandnote/api/contract';
import { useMemo, useState } from 'react';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, type Column, DataTable, Empty, Loading, Page, Problem } from '../../ui/index.ts';
import { EditClientSheet, NewClientSheet } from './client-form.tsx';
import { useClientsQuery } from './clients.api.ts';

/** The organisations that order the work and receive its reports. */
export function ClientsScreen() {
  const firm = useFirm();
  const clients = useClientsQuery(firm.firmId);
  if (clients.isPending) return <Page title="Clients">{<Loading />}</Page>;
  if (clients.isError) return <Page title="Clients">{<Problem error={clients.error} onRetry={clients.refetch} />}</Page>;
  return <ClientsPage clients={clients.data.items} mayEdit={hasRole(firm, 'admin', 'engineer')} />;
}

function ClientsPage({ clients, mayEdit }: { clients: Client[]; mayEdit: boolean }) {
  const [open, setOpen] = useState<Client | 'new' | null>(null);
  const columns = useMemo(() => columnsOf(mayEdit ? setOpen : null), [mayEdit]);
  const close = () => setOpen(null);
  const add = (
    <Button kind="primary" onPress={() => setOpen('new')}>
      Add a client
    </Button>
  );
  return (
    <Page
      title="Clients"
      breadcrumb={[{ label: 'Account', href: '/account' }]}
      {...(mayEdit && clients.length > 0 ? { actions: add } : {})}
    >
      <DataTable
        caption="Clients of the firm"
        columns={columns}
        rows={clients}
        rowKey={(client) => client.id}
        empty={<Empty {...(mayEdit ? { action: add } : {})}>Organisations that order the work and receive its reports stand here.</Empty>}
      />
      {open === 'new' ? <NewClientSheet onCreated={close} onClose={close} /> : null}
      {open !== null && open !== 'new' ? <EditClientSheet client={open} onClose={close} /> : null}
    </Page>
  );
}

function columnsOf(onEdit: ((client: Client) => void) | null): Column<Client>[] {
  const shown: Column<Client>[] = [
    { key: 'name', header: 'Client', cell: (row) => row.name, sortBy: (row) => row.name, onPhone: 'title' },
    { key: 'contact', header: 'Contact', cell: (row) => row.contactName || 'not stated', sortBy: (row) => row.contactName },
    { key: 'email', header: 'E-mail', cell: (row) => row.contactEmail || 'not stated', sortBy: (row) => row.contactEmail },
    { key: 'address', header: 'Address', cell: (row) => row.address.replaceAll('\n', ', ') || 'not stated' },
  ];
  if (onEdit === null) return shown;
  const edit = (client: Client) => (
    <Button kind="quiet" onPress={() => onEdit(client)} label={`Edit ${client.name}`}>
      Edit
    </Button>
  );
  return [...shown, { key: 'edit', header: 'Change', cell: edit, onPhone: 'across' }];
}
