import type { IssuedDetail } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { fileAddress, firmPath } from '../../lib/api-client.ts';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { showTime } from '../../lib/show-time.ts';
import { Caution, Definitions, Heading, Link, Loading, Notice, Page, Problem, Row, Stack, Tag, Text } from '../../ui/index.ts';
import { resultRows } from '../reports/result-rows.ts';
import { ResultsTable } from '../reports/results-table.tsx';
import { conditionsOf } from '../reports/revision-screen.tsx';
import { RevisionTextsRead } from '../reports/revision-texts.tsx';
import { Signatures } from '../reports/signatures.tsx';
import { StructureElevation } from '../reports/structure-elevation.tsx';
import { useIssuedReportQuery } from './issued.api.ts';
import { stateTone, stateWords } from './issued-words.ts';

/** One issued report: its files, what holds for it now, and its frozen results. */
export function IssuedReportScreen() {
  const firm = useFirm();
  const { revision } = useLocalSearchParams<{ revision: string }>();
  const report = useIssuedReportQuery(firm.firmId, revision);
  if (report.isPending) return <Page title="Issued report">{<Loading />}</Page>;
  if (report.isError) return <Page title="Issued report">{<Problem error={report.error} onRetry={report.refetch} />}</Page>;
  return <IssuedReportView report={report.data} />;
}

function IssuedReportView({ report }: { report: IssuedDetail }) {
  const firm = useFirm();
  const rows = useMemo(() => resultRows(report.content), [report.content]);
  const here = `/${firm.firmId}/issued/${report.revisionId}`;
  return (
    <Page
      title={`${report.reportNumber}, revision ${report.letter}`}
      breadcrumb={[{ label: 'Issued', href: `/${firm.firmId}/issued` }]}
      status={<Tag tone={stateTone[report.state]}>{stateWords(report)}</Tag>}
    >
      <Text size="lead">{report.title}</Text>
      {report.state === 'issued' ? null : <NotCurrent report={report} />}
      <Files report={report} />
      <Stack gap={3}>
        <Heading level={2}>Results</Heading>
        <StructureElevation content={report.content} rows={rows} hrefOf={() => here} />
        <ResultsTable caption="Tensions of the report" rows={rows} />
        <Caution conditions={conditionsOf(report)} />
      </Stack>
      <RevisionTextsRead texts={report.content.texts} />
      <Signatures signatures={report.signatures} timeZone={report.content.structure.timeZone} />
      {hasRole(firm, 'client') ? null : <Link href={`/${firm.firmId}/reports/${report.revisionId}`}>Open the revision and its check</Link>}
    </Page>
  );
}

function NotCurrent({ report }: { report: IssuedDetail }) {
  return (
    <Notice kind="caution" title={`This report is ${stateWords(report)}`}>
      {report.withdrawnReason ?? 'Use the later revision. This one stays as it was issued.'}
    </Notice>
  );
}

function Files({ report }: { report: IssuedDetail }) {
  const firm = useFirm();
  const file = (name: string) => fileAddress(firmPath(firm.firmId, 'issued', report.revisionId, name));
  return (
    <Stack gap={3}>
      <Heading level={2}>Files</Heading>
      <Row gap={6}>
        <Link href={file('report.pdf')} download strong>
          {`Signed PDF, ${Math.ceil(report.bytes / 1024)} kB`}
        </Link>
        <Link href={file('results.csv')} download>
          Results as CSV
        </Link>
        <Link href={file('content.json')} download>
          Content as JSON
        </Link>
      </Row>
      <Definitions
        items={[
          { term: 'Issued', value: showTime(report.issuedAt, report.content.structure.timeZone) },
          {
            term: 'Verification code',
            value: <Link href={`/verify/${report.verificationCode}`}>{report.verificationCode}</Link>,
          },
          { term: 'SHA-256 of the PDF', value: report.sha256, figures: true },
        ]}
      />
    </Stack>
  );
}
