import type { Revision } from '@strandnote/api/contract';
import { useState } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Sheet, Stack, Text, TextField } from '../../ui/index.ts';
import { useReturnMutation } from '../reports/reports.api.ts';

export function ReturnSheet({ revision, onClose }: { revision: Revision; onClose: () => void }) {
  const firm = useFirm();
  const giveBack = useReturnMutation(firm.firmId, revision.id);
  const [reason, setReason] = useState('');
  return (
    <Sheet
      title={`Return revision ${revision.letter}`}
      onClose={onClose}
      holds={reason !== ''}
      actions={
        <Button
          kind="primary"
          busy={giveBack.isPending}
          why={reason.trim() === '' ? 'Say why it is returned.' : null}
          onPress={() => giveBack.mutate({ reason }, { onSuccess: onClose })}
        >
          Return it to the author
        </Button>
      }
    >
      <Stack>
        <Text>{`${revision.authorName} is told by mail. Remarks stay open until you close them.`}</Text>
        <TextField
          label="Why it is returned"
          value={reason}
          onChange={setReason}
          rows={4}
          maxLength={2000}
          error={giveBack.error?.message}
        />
      </Stack>
    </Sheet>
  );
}
