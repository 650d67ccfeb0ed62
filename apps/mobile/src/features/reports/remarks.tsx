import type { CheckComment, Revision } from '@strandnote/api/contract';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Empty, Notice, Panel, Row, Stack, Tag, Text, TextField } from '../../ui/index.ts';
import { useEditCommentMutation } from './reports.api.ts';

/** The remarks of the check: the engineer answers, the checker closes. */
export function Remarks({ revision, cableId }: { revision: Revision; cableId?: string }) {
  const shown = revision.comments.filter((comment) => cableId === undefined || comment.cableId === cableId);
  if (shown.length === 0) return <Empty>No remarks. A checker writes them on a cable, on a field, or on the whole.</Empty>;
  return (
    <Stack gap={3}>
      {shown.map((comment) => (
        <Remark key={comment.id} revision={revision} comment={comment} />
      ))}
    </Stack>
  );
}

function Remark({ revision, comment }: { revision: Revision; comment: CheckComment }) {
  const firm = useFirm();
  const edit = useEditCommentMutation(firm.firmId, revision.id);
  const [answer, setAnswer] = useState(comment.answer ?? '');
  const about = comment.cableReference ?? 'the whole report';
  const mayAnswer = revision.may.answer === null && comment.state === 'open';
  const mayClose = revision.may.remark === null;
  return (
    <Panel gap={2}>
      <Row justify="space-between">
        <Text strong>{comment.field ? `${about}, ${comment.field}` : about}</Text>
        <Tag tone={comment.state === 'open' ? 'ochre' : 'muted'}>{comment.state}</Tag>
      </Row>
      <Text>{comment.text}</Text>
      <Text size="note" tone="muted">{`${comment.authorName}, on submission ${comment.submissionNumber}`}</Text>
      {comment.answer ? <Text>{`Answer by ${comment.answeredBy ?? 'the engineer'}: ${comment.answer}`}</Text> : null}
      {mayAnswer ? (
        <>
          <TextField label="Answer" value={answer} onChange={setAnswer} rows={2} maxLength={2000} />
          <Row>
            <Button
              onPress={() => edit.mutate({ commentId: comment.id, answer })}
              busy={edit.isPending}
              why={answer.trim() === '' || answer === comment.answer ? 'Write the answer first.' : null}
            >
              Save the answer
            </Button>
          </Row>
        </>
      ) : null}
      {mayClose ? (
        <Row>
          <Button
            kind="secondary"
            busy={edit.isPending}
            onPress={() => edit.mutate({ commentId: comment.id, state: comment.state === 'open' ? 'closed' : 'open' })}
          >
            {comment.state === 'open' ? 'Close the remark' : 'Open it again'}
          </Button>
        </Row>
      ) : null}
      {edit.isError ? <Notice kind="problem">{edit.error.message}</Notice> : null}
    </Panel>
  );
}
