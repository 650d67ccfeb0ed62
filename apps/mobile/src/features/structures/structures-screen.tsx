import type { Structure } from '@strandnote/api/contract';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, type Column, DataTable, Empty, Loading, Page, Problem } from '../../ui/index.ts';
import { structureKindWords } from './structure-words.ts';
import { useStructuresQuery } from './structures.api.ts';

const columns: Column<Structure>[] = [
  { key: 'name', header: 'Structure', cell: (row) => row.name, sortBy: (row) => row.name, onPhone: 'title' },
  { key: 'kind', header: 'Kind', cell: (row) => structureKindWords[row.kind], sortBy: (row) => row.kind },
  { key: 'place', header: 'Place', cell: (row) => row.place || 'not stated', sortBy: (row) => row.place },
  { key: 'owner', header: 'Owner', cell: (row) => row.ownerName || 'not stated', sortBy: (row) => row.ownerName },
  {
    key: 'cables',
    header: 'Cables',
    cell: (row) => String(row.cableCount),
    figures: true,
    align: 'right',
    sortBy: (row) => row.cableCount,
  },
];

/** The registry: structures whose cables the firm surveys. */
export function StructuresScreen() {
  const firm = useFirm();
  const structures = useStructuresQuery(firm.firmId);
  const add = hasRole(firm, 'admin', 'engineer') ? (
    <Button kind="primary" href={`/${firm.firmId}/structures/new`}>
      Add a structure
    </Button>
  ) : undefined;
  if (structures.isPending) return <Page title="Structures">{<Loading />}</Page>;
  if (structures.isError) return <Page title="Structures">{<Problem error={structures.error} onRetry={structures.refetch} />}</Page>;
  return (
    <Page title="Structures" actions={add}>
      <DataTable
        caption="Structures of the firm"
        columns={columns}
        rows={structures.data.items}
        rowKey={(row) => row.id}
        hrefOf={(row) => `/${firm.firmId}/structures/${row.id}`}
        empty={<Empty>Bridges, roofs and masts whose cables you survey stand here. Add the first one, then its cables.</Empty>}
      />
    </Page>
  );
}
