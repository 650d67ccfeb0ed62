import type { Revision } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { fileAddress, firmPath } from '../../lib/api-client.ts';
import { useFirm } from '../../lib/session.tsx';
import { Caution, Heading, Link, Loading, Notice, Page, Problem, Stack, Tag, Text } from '../../ui/index.ts';
import { Blockers } from './blockers.tsx';
import { NextActs } from './next-acts.tsx';
import { Remarks } from './remarks.tsx';
import { useRevisionQuery } from './reports.api.ts';
import { resultRows } from './result-rows.ts';
import { ResultsTable } from './results-table.tsx';
import { RevisionTexts } from './revision-texts.tsx';
import { Signatures } from './signatures.tsx';
import { StructureElevation } from './structure-elevation.tsx';
import { SubmitPanel } from './submit-panel.tsx';

/** A revision as its author sees it: texts, results as they stand or as they were frozen, remarks, and the next step. */
export function RevisionScreen() {
  const firm = useFirm();
  const { revision: revisionId } = useLocalSearchParams<{ revision: string }>();
  const revision = useRevisionQuery(firm.firmId, revisionId);
  if (revision.isPending || revision.isOutdated) return <Page title="Report">{<Loading />}</Page>;
  if (revision.isError) return <Page title="Report">{<Problem error={revision.error} onRetry={revision.refetch} />}</Page>;
  return <RevisionView revision={revision.data} />;
}

function RevisionView({ revision }: { revision: Revision }) {
  const firm = useFirm();
  const rows = useMemo(() => resultRows(revision.content), [revision.content]);
  const open = revision.state === 'draft' || revision.state === 'returned';
  const { structure, campaign } = revision.content;
  return (
    <Page
      title={`${revision.reportNumber}, revision ${revision.letter}`}
      breadcrumb={[
        { label: structure.name, href: `/${firm.firmId}/structures/${structure.id}` },
        { label: campaign.name, href: `/${firm.firmId}/site/${campaign.id}` },
      ]}
      status={<Tag>{revision.state}</Tag>}
      actions={<NextActs revision={revision} />}
    >
      <Stack gap={1}>
        <Text size="lead">{revision.title}</Text>
        <Text tone="muted">{`For ${revision.clientName}. Prepared by ${revision.authorName}.`}</Text>
      </Stack>
      {revision.state === 'returned' && revision.returnedReason ? (
        <Notice kind="caution" title="Returned by the checker">
          {revision.returnedReason}
        </Notice>
      ) : null}
      {revision.withdrawnReason ? (
        <Notice kind="caution" title="Withdrawn">
          {revision.withdrawnReason}
        </Notice>
      ) : null}
      {open ? <Blockers revision={revision} /> : null}
      <RevisionTexts key={revision.state} revision={revision} />
      <Stack gap={3}>
        <Heading level={2}>Results</Heading>
        <StructureElevation content={revision.content} rows={rows} hrefOf={(cableId) => `/${firm.firmId}/structures/cables/${cableId}`} />
        <ResultsTable caption="Tensions of the report" rows={rows} />
        <Caution unchecked={!['approved', 'issued', 'superseded'].includes(revision.state)} conditions={conditionsOf(revision)} />
      </Stack>
      <Stack gap={3}>
        <Heading level={2}>Remarks of the check</Heading>
        <Remarks revision={revision} />
      </Stack>
      <Signatures signatures={revision.signatures} timeZone={structure.timeZone} />
      <Link href={fileAddress(firmPath(firm.firmId, 'revisions', revision.id, 'preview.pdf'))} download>
        Preview the PDF
      </Link>
      {open && revision.may.submit !== undefined ? <SubmitPanel revision={revision} /> : null}
    </Page>
  );
}

export function conditionsOf(revision: Pick<Revision, 'content'>): string {
  const { steelTemperature, traffic } = revision.content.campaign;
  const temperature =
    steelTemperature === null ? 'at a steel temperature that was not recorded' : `at ${steelTemperature} °C steel temperature`;
  return `Averages ${temperature}${traffic ? `, traffic: ${traffic}` : ''}.`;
}
