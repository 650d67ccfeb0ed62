import type { Revision } from '@strandnote/api/contract';
import { useState } from 'react';
import { useFirm, useMeQuery } from '../../lib/session.tsx';
import { Button, Checkbox, Heading, Notice, Panel, Text, TextField } from '../../ui/index.ts';
import { useSubmitMutation } from './reports.api.ts';

/** The preparer signs for the content as it stands; from then on it is frozen. */
export function SubmitPanel({ revision }: { revision: Revision }) {
  const firm = useFirm();
  const me = useMeQuery();
  const submit = useSubmitMutation(firm.firmId, revision.id);
  const [typedName, setTypedName] = useState<string | null>(null);
  const [agreed, setAgreed] = useState(false);
  const name = typedName ?? me.data?.name ?? '';
  const why = revision.may.submit ?? (name.trim() === '' ? 'Type your name.' : agreed ? null : 'Confirm what the signature means.');
  return (
    <Panel>
      <Heading level={2}>Sign as preparer and submit</Heading>
      <Text>{revision.statements.prepared}</Text>
      <Checkbox label="This is what I sign" value={agreed} onChange={setAgreed} />
      <TextField label="Name, as it is to be printed" value={name} onChange={setTypedName} maxLength={120} autoComplete="name" />
      <Text size="note" tone="muted">{`Content hash ${revision.contentSha256}`}</Text>
      {submit.isError ? <Notice kind="problem">{submit.error.message}</Notice> : null}
      <Button
        kind="primary"
        busy={submit.isPending}
        why={why}
        onPress={() => submit.mutate({ submissionId: crypto.randomUUID(), name, contentSha256: revision.contentSha256 })}
      >
        {`Submit revision ${revision.letter} for checking`}
      </Button>
    </Panel>
  );
}
