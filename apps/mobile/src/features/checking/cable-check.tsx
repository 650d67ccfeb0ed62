import type { Revision } from '@strandnote/api/contract';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Heading, Link, Notice, Panel, Row, Stack, Text, TextField } from '../../ui/index.ts';
import { Remarks } from '../reports/remarks.tsx';
import { useCommentMutation, useTickMutation } from '../reports/reports.api.ts';
import type { ResultRow } from '../reports/result-rows.ts';
import { SpanEvidence } from './span-evidence.tsx';

interface CableCheckProps {
  revision: Revision;
  /** In the order in which the checker goes through them. */
  rows: readonly ResultRow[];
  cableId: string;
  ticked: ReadonlySet<string>;
  /** The address of the revision. */
  here: string;
}

/** One cable under check: the evidence of each span, remarks, and the tick. */
export function CableCheck({ revision, rows, cableId, ticked, here }: CableCheckProps) {
  const spans = rows.filter((row) => row.cable.id === cableId);
  const cable = spans[0]?.cable;
  if (!cable) return null;
  const next = rows.find((row) => row.cable.id !== cableId && !ticked.has(row.cable.id));
  return (
    <Panel>
      <Row justify="space-between">
        <Heading level={2}>{`Cable ${cable.reference}`}</Heading>
        {next ? <Link href={`${here}?cable=${next.cable.id}`}>{`Next: ${next.cable.reference}`}</Link> : <Link href={here}>Close</Link>}
      </Row>
      <Text tone="muted">
        {[cable.kind, cable.sectionName, cable.ownerReference, cable.paintedMark].filter((part) => part !== '').join(' · ')}
      </Text>
      {cable.notMeasuredReason ? <Notice kind="caution">{`Not measured: ${cable.notMeasuredReason}`}</Notice> : null}
      {spans.map((row) => (
        <SpanEvidence key={row.key} row={row} heading={spans.length > 1 ? row.name : null} />
      ))}
      {revision.may.tick !== undefined ? <Tick revision={revision} cableId={cableId} ticked={ticked.has(cableId)} /> : null}
      <Heading level={3}>Remarks</Heading>
      <Remarks revision={revision} cableId={cableId} />
      {revision.may.remark === null ? <NewRemark revision={revision} cableId={cableId} /> : null}
    </Panel>
  );
}

function Tick({ revision, cableId, ticked }: { revision: Revision; cableId: string; ticked: boolean }) {
  const firm = useFirm();
  const tick = useTickMutation(firm.firmId, revision.id);
  return (
    <Stack gap={2}>
      <Row>
        <Button
          kind={ticked ? 'secondary' : 'primary'}
          busy={tick.isPending}
          why={revision.may.tick ?? null}
          onPress={() => tick.mutate({ cableId, ticked: !ticked })}
        >
          {ticked ? 'Take the tick back' : 'Tick as looked at'}
        </Button>
      </Row>
      {tick.isError ? <Notice kind="problem">{tick.error.message}</Notice> : null}
    </Stack>
  );
}

function NewRemark({ revision, cableId }: { revision: Revision; cableId: string | null }) {
  const firm = useFirm();
  const remark = useCommentMutation(firm.firmId, revision.id);
  const [text, setText] = useState('');
  const save = () => remark.mutate({ id: crypto.randomUUID(), cableId, field: '', text }, { onSuccess: () => setText('') });
  return (
    <Stack gap={2}>
      <TextField label="New remark" value={text} onChange={setText} rows={3} maxLength={2000} error={remark.error?.message} />
      <Row>
        <Button onPress={save} busy={remark.isPending} why={text.trim() === '' ? 'Write the remark first.' : null}>
          Write the remark
        </Button>
      </Row>
    </Stack>
  );
}
