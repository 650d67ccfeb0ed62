import type { Verification } from '@strandnote/api/contract';
import { showTime } from '../../lib/show-time.ts';
import { Definitions, Heading, Notice, Panel, Text } from '../../ui/index.ts';
import { stateTone, stateWords } from '../issued/issued-words.ts';
import type { DroppedFile } from './verify-screen.tsx';

const consequence: Record<Verification['state'], string> = {
  issued: 'This is the current revision of the report.',
  superseded: 'A later revision has taken its place. Ask for that one.',
  withdrawn: 'The firm has withdrawn this report. Do not rely on it.',
};

/** What is known of a report, and how a dropped file compares with it. */
export function VerifiedReport({ report, dropped }: { report: Verification; dropped: DroppedFile | null }) {
  return (
    <Panel>
      <Heading level={2}>{`Report ${report.reportNumber}, revision ${report.letter}`}</Heading>
      <Text size="lead" strong tone={stateTone[report.state]} live>
        {stateWords(report)}
      </Text>
      <Text>{consequence[report.state]}</Text>
      {dropped ? <Comparison report={report} dropped={dropped} /> : null}
      {report.demonstration ? (
        <Notice kind="caution">This report belongs to a demonstration: its data are invented and its signature proves nothing.</Notice>
      ) : null}
      <Definitions
        items={[
          { term: 'Issued by', value: report.firmName },
          { term: 'Structure', value: report.structureName },
          { term: 'Issued', value: showTime(report.issuedAt, 'UTC') },
          ...(report.supersededAt ? [{ term: 'Superseded', value: showTime(report.supersededAt, 'UTC') }] : []),
          ...(report.withdrawnAt ? [{ term: 'Withdrawn', value: showTime(report.withdrawnAt, 'UTC') }] : []),
          { term: 'Verification code', value: report.code, figures: true },
          { term: 'SHA-256 of the PDF', value: report.sha256, figures: true },
        ]}
      />
      <Text size="note" tone="muted">
        A genuine report shows what was estimated from vibration at the time, not that the cables are sound today. Decisions belong to a
        licensed engineer under local codes.
      </Text>
    </Panel>
  );
}

function Comparison({ report, dropped }: { report: Verification; dropped: DroppedFile }) {
  if (dropped.sha256 === report.sha256) {
    return (
      <Notice kind="info" title="Genuine" alert>
        {`${dropped.name} is, byte for byte, the file that was issued.`}
      </Notice>
    );
  }
  return (
    <Notice kind="problem" title="Not the issued file">
      {`${dropped.name} differs from the file that was issued under this code. Its SHA-256 is ${dropped.sha256}.`}
    </Notice>
  );
}
