import type { IssuedReport } from '@strandnote/api/contract';
import { useMemo } from 'react';
import { hasRole, type Membership, useFirm } from '../../lib/session.tsx';
import { showDayOf } from '../../lib/show-time.ts';
import { type Column, DataTable, Empty, Loading, Page, Problem, Text } from '../../ui/index.ts';
import { useIssuedQuery } from './issued.api.ts';
import { stateTone, stateWords } from './issued-words.ts';

/** Issued reports; for a client this is home. */
export function IssuedScreen() {
  const firm = useFirm();
  const issued = useIssuedQuery(firm.firmId);
  const columns = useMemo(() => issuedColumns(firm), [firm]);
  if (issued.isPending) return <Page title="Issued">{<Loading />}</Page>;
  if (issued.isError) return <Page title="Issued">{<Problem error={issued.error} onRetry={issued.refetch} />}</Page>;
  return (
    <Page title="Issued">
      <DataTable
        caption="Issued reports"
        columns={columns}
        rows={issued.data.items}
        rowKey={(row) => row.revisionId}
        hrefOf={(row) => `/${firm.firmId}/issued/${row.revisionId}`}
        empty={
          <Empty>
            {hasRole(firm, 'client') ? 'Reports that are issued to you stand here.' : 'Reports stand here from the day they are issued.'}
          </Empty>
        }
      />
    </Page>
  );
}

function issuedColumns(firm: Membership): Column<IssuedReport>[] {
  return [
    {
      key: 'report',
      header: 'Report',
      cell: (row) => `${row.reportNumber}, revision ${row.letter}`,
      sortBy: (row) => row.reportNumber,
      onPhone: 'title',
    },
    { key: 'structure', header: 'Structure', cell: (row) => row.structureName, sortBy: (row) => row.structureName },
    { key: 'campaign', header: 'Campaign', cell: (row) => row.campaignName },
    { key: 'client', header: 'Client', cell: (row) => row.clientName, onPhone: 'none' },
    { key: 'issued', header: 'Issued', cell: (row) => showDayOf(row.issuedAt, firm.timeZone), sortBy: (row) => row.issuedAt },
    {
      key: 'state',
      header: 'State',
      cell: (row) => (
        <Text strong tone={stateTone[row.state]}>
          {stateWords(row)}
        </Text>
      ),
      onPhone: 'aside',
    },
  ];
}
