import type { Revision } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo, useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Caution, Columns, Loading, Notice, Page, Problem, Progress, Stack, Tag } from '../../ui/index.ts';
import { Remarks } from '../reports/remarks.tsx';
import { useRevisionQuery } from '../reports/reports.api.ts';
import { byUrgency, type ResultRow, resultRows } from '../reports/result-rows.ts';
import { ResultsTable } from '../reports/results-table.tsx';
import { conditionsOf } from '../reports/revision-screen.tsx';
import { Signatures } from '../reports/signatures.tsx';
import { StructureElevation } from '../reports/structure-elevation.tsx';
import { ApproveSheet } from './approve-sheet.tsx';
import { CableCheck } from './cable-check.tsx';
import { ReportReading } from './report-reading.tsx';
import { ReturnSheet } from './return-sheet.tsx';

/** The independent check: what is doubtful first, cable by cable, and then the signature. */
export function CheckRevisionScreen() {
  const firm = useFirm();
  const { revision: revisionId, cable } = useLocalSearchParams<{ revision: string; cable?: string }>();
  const revision = useRevisionQuery(firm.firmId, revisionId);
  if (revision.isPending || revision.isOutdated) return <Page title="Check">{<Loading />}</Page>;
  if (revision.isError) return <Page title="Check">{<Problem error={revision.error} onRetry={revision.refetch} />}</Page>;
  return <CheckView revision={revision.data} cableId={cable ?? null} />;
}

function CheckView({ revision, cableId }: { revision: Revision; cableId: string | null }) {
  const firm = useFirm();
  const rows = useMemo(() => byUrgency(resultRows(revision.content)), [revision.content]);
  const ticked = useMemo(() => new Set(revision.ticks.map((tick) => tick.cableId)), [revision.ticks]);
  const here = `/${firm.firmId}/checking/${revision.id}`;
  const current = rows.find((row) => row.cable.id === cableId) ?? null;
  const last = useMemo(() => ({ header: 'Check', cell: (row: ResultRow) => checkWords(revision, row, ticked) }), [revision, ticked]);
  return (
    <Page
      title={`Revision ${revision.letter}, ${revision.state}`}
      breadcrumb={[
        { label: revision.structureName, href: `/${firm.firmId}/structures/${revision.content.structure.id}` },
        { label: revision.campaignName },
        { label: `Report ${revision.reportNumber}` },
      ]}
      status={<CheckProgress revision={revision} />}
      actions={<CheckActs revision={revision} />}
    >
      {revision.may.tick ? <Notice kind="caution">{revision.may.tick}</Notice> : null}
      <StructureElevation content={revision.content} rows={rows} hrefOf={(id) => `${here}?cable=${id}`} />
      <Columns shares={current ? [1, 1] : [1, 0]}>
        <Stack>
          <ResultsTable
            caption="Cables of the revision, doubtful ones first"
            rows={rows}
            hrefOf={(row) => `${here}?cable=${row.cable.id}`}
            currentKey={current?.key ?? null}
            compact={current !== null}
            last={last}
          />
          <Caution unchecked={revision.state === 'in check'} conditions={conditionsOf(revision)} />
        </Stack>
        {current ? (
          <CableCheck key={current.cable.id} revision={revision} rows={rows} cableId={current.cable.id} ticked={ticked} here={here} />
        ) : null}
      </Columns>
      <ReportReading revision={revision} />
      <Remarks revision={revision} />
      <Signatures signatures={revision.signatures} timeZone={revision.content.structure.timeZone} />
    </Page>
  );
}

function checkWords(revision: Revision, row: ResultRow, ticked: ReadonlySet<string>): string {
  const open = revision.comments.some((comment) => comment.cableId === row.cable.id && comment.state === 'open');
  if (open) return 'open remark';
  return ticked.has(row.cable.id) ? 'looked at' : 'to look at';
}

function CheckProgress({ revision }: { revision: Revision }) {
  if (revision.state !== 'in check') return <Tag>{revision.state}</Tag>;
  const open = revision.comments.filter((comment) => comment.state === 'open').length;
  const of = revision.content.cables.length;
  const remarks = open === 0 ? '' : open === 1 ? ', 1 remark open' : `, ${open} remarks open`;
  return <Progress done={revision.ticks.length} of={of} label={`${revision.ticks.length} of ${of} looked at${remarks}`} />;
}

function CheckActs({ revision }: { revision: Revision }) {
  const [open, setOpen] = useState<'return' | 'approve' | null>(null);
  const { may } = revision;
  if (revision.state !== 'in check' && revision.state !== 'approved') return null;
  return (
    <>
      {may.return === null ? <Button onPress={() => setOpen('return')}>Return with remarks</Button> : null}
      {revision.state === 'in check' && may.approve !== undefined ? (
        <Button kind="primary" onPress={() => setOpen('approve')} why={may.approve}>
          Approve and sign
        </Button>
      ) : null}
      {open === 'return' ? <ReturnSheet revision={revision} onClose={() => setOpen(null)} /> : null}
      {open === 'approve' ? <ApproveSheet revision={revision} onClose={() => setOpen(null)} /> : null}
    </>
  );
}
