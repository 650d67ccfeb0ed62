import type { Desk } from '@strandnote/api/contract';
import { useFirm } from '../../lib/session.tsx';
import { type Column, DataTable, Empty, Loading, Page, Problem, Progress } from '../../ui/index.ts';
import { useDeskQuery } from '../desk/desk.api.ts';

type Waiting = Desk['toCheck'][number];

const columns: Column<Waiting>[] = [
  { key: 'report', header: 'Report', cell: (row) => `${row.reportNumber}, revision ${row.letter}`, onPhone: 'title' },
  { key: 'structure', header: 'Structure', cell: (row) => row.structureName },
  { key: 'campaign', header: 'Campaign', cell: (row) => row.campaignName },
  { key: 'author', header: 'Prepared by', cell: (row) => row.authorName },
  {
    key: 'progress',
    header: 'Looked at',
    cell: (row) => (
      <Progress done={row.tickedCount} of={row.cableCount} label={`${row.tickedCount} of ${row.cableCount}${remarks(row.openComments)}`} />
    ),
    onPhone: 'across',
  },
];

function remarks(open: number): string {
  if (open === 0) return '';
  return open === 1 ? ', 1 remark open' : `, ${open} remarks open`;
}

/** Revisions in check. */
export function CheckingScreen() {
  const firm = useFirm();
  const desk = useDeskQuery(firm.firmId);
  if (desk.isPending) return <Page title="Checking">{<Loading />}</Page>;
  if (desk.isError) return <Page title="Checking">{<Problem error={desk.error} onRetry={desk.refetch} />}</Page>;
  return (
    <Page title="Checking">
      <DataTable
        caption="Revisions in check"
        columns={columns}
        rows={desk.data.toCheck}
        rowKey={(row) => row.id}
        hrefOf={(row) => `/${firm.firmId}/checking/${row.id}`}
        empty={<Empty>Revisions that were submitted for checking stand here, except those that you prepared a part of.</Empty>}
      />
    </Page>
  );
}
