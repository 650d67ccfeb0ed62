import { useState } from 'react';
import { useFirm, useMeQuery } from '../../lib/session.tsx';
import { Button, Row, Sheet, Stack, TextField } from '../../ui/index.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { saveReason } from './entry-store.ts';

const usualReasons = ['no access', 'cross-tied', 'too much wind', 'traffic management ended', 'owner stopped the work'];

interface NotMeasuredSheetProps {
  row: ChecklistRow;
  campaignId: string;
  onClose: () => void;
  onSaved: () => void;
}

/** A cable left out of the survey says why; the reason stands in the report. */
export function NotMeasuredSheet({ row, campaignId, onClose, onSaved }: NotMeasuredSheetProps) {
  const firm = useFirm();
  const me = useMeQuery();
  const { cable, notMeasuredReason } = row.entry;
  const [reason, setReason] = useState(notMeasuredReason ?? '');
  const [tried, setTried] = useState(false);
  const missing = reason.trim() === '' ? 'Say why, in a few words: it stands in the report.' : null;
  const save = async (kept: string | null) => {
    if (!me.data) return;
    const { userId } = me.data;
    await saveReason({ firmId: firm.firmId, userId }, { campaignId, cableId: cable.id, cableName: cable.reference, reason: kept });
    onSaved();
  };
  return (
    <Sheet
      title={`${cable.reference} is not measured`}
      onClose={onClose}
      holds={reason !== (notMeasuredReason ?? '')}
      actions={
        <>
          <Button kind="primary" onPress={() => (missing ? setTried(true) : void save(reason.trim()))}>
            Save the reason
          </Button>
          {notMeasuredReason === null ? null : <Button onPress={() => void save(null)}>It is to be measured after all</Button>}
        </>
      }
    >
      <Stack gap={2}>
        <TextField label="Why" value={reason} onChange={setReason} maxLength={300} error={tried ? missing : null} />
        <Row gap={1}>
          {usualReasons.map((usual) => (
            <Button key={usual} kind="quiet" onPress={() => setReason(usual)}>
              {usual}
            </Button>
          ))}
        </Row>
      </Stack>
    </Sheet>
  );
}
