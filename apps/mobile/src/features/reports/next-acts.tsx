import type { Revision } from '@strandnote/api/contract';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Notice, PasswordField, Sheet, Stack, Text, TextField } from '../../ui/index.ts';
import { useIssueMutation, useNextRevisionMutation, useRecallMutation, useWithdrawMutation } from './reports.api.ts';

/** The step that comes next for this member: recall, issue, withdraw, or the next revision. */
export function NextActs({ revision }: { revision: Revision }) {
  const firm = useFirm();
  const router = useRouter();
  const [open, setOpen] = useState<'issue' | 'withdraw' | null>(null);
  const recall = useRecallMutation(firm.firmId, revision.id);
  const next = useNextRevisionMutation(firm.firmId, revision.reportId);
  const { may, state } = revision;
  const startNext = async () => {
    const after = await next.mutateAsync({ id: crypto.randomUUID() });
    router.push(`/${firm.firmId}/reports/${after.id}` as '/');
  };
  const problem = recall.error ?? next.error;
  return (
    <>
      {state === 'in check' && may.recall !== undefined ? (
        <Button onPress={() => recall.mutate({})} busy={recall.isPending} why={may.recall}>
          Recall to draft
        </Button>
      ) : null}
      {may.withdraw === null ? (
        <Button kind="destructive" onPress={() => setOpen('withdraw')}>
          Withdraw
        </Button>
      ) : null}
      {may['start-next-revision'] === null ? (
        <Button onPress={() => void startNext().catch(() => undefined)} busy={next.isPending}>
          Start the next revision
        </Button>
      ) : null}
      {state === 'approved' && may.issue !== undefined ? (
        <Button kind="primary" onPress={() => setOpen('issue')} why={may.issue}>
          {`Issue to ${revision.clientName}`}
        </Button>
      ) : null}
      {problem ? <Notice kind="problem">{problem.message}</Notice> : null}
      {open === 'issue' ? <IssueSheet revision={revision} onClose={() => setOpen(null)} /> : null}
      {open === 'withdraw' ? <WithdrawSheet revision={revision} onClose={() => setOpen(null)} /> : null}
    </>
  );
}

function IssueSheet({ revision, onClose }: { revision: Revision; onClose: () => void }) {
  const firm = useFirm();
  const issue = useIssueMutation(firm.firmId, revision.id);
  const [password, setPassword] = useState('');
  const submit = () => issue.mutate({ password }, { onSuccess: onClose });
  return (
    <Sheet
      title={`Issue revision ${revision.letter}`}
      onClose={onClose}
      actions={
        <Button kind="primary" onPress={submit} busy={issue.isPending} why={password === '' ? 'Type your password to sign.' : null}>
          Sign the PDF and issue it
        </Button>
      }
    >
      <Stack>
        <Text>{`The PDF that was rendered at approval is signed with the firm’s certificate and sent to ${revision.clientName}. It cannot be changed afterwards; a later revision supersedes it.`}</Text>
        <PasswordField
          label="Your password"
          purpose="current-password"
          value={password}
          onChange={setPassword}
          error={issue.error?.message}
        />
      </Stack>
    </Sheet>
  );
}

function WithdrawSheet({ revision, onClose }: { revision: Revision; onClose: () => void }) {
  const firm = useFirm();
  const withdraw = useWithdrawMutation(firm.firmId, revision.id);
  const [reason, setReason] = useState('');
  const submit = () => withdraw.mutate({ reason }, { onSuccess: onClose });
  return (
    <Sheet
      title={`Withdraw revision ${revision.letter}`}
      onClose={onClose}
      holds={reason !== ''}
      actions={
        <Button kind="destructive" onPress={submit} busy={withdraw.isPending} why={reason.trim() === '' ? 'Give the reason first.' : null}>
          Withdraw the report
        </Button>
      }
    >
      <Stack>
        <Text>The PDF stays as it is. Its verification page says from now on that it was withdrawn, and the client is told.</Text>
        <TextField label="Reason" value={reason} onChange={setReason} rows={3} maxLength={2000} error={withdraw.error?.message} />
      </Stack>
    </Sheet>
  );
}
