import { useState } from 'react';
import { discardRefusal, retryRefusal } from '../../lib/outbox.ts';
import type { OutboxEntry } from '../../lib/outbox-state.ts';
import { useMeQuery } from '../../lib/session.tsx';
import { useOutbox } from '../../lib/use-outbox.ts';
import { Button, Panel, Row, Sheet, Stack, Text } from '../../ui/index.ts';

/** How much is on this device and not on the server yet; opens the list. Nothing where nothing waits. */
export function OutboxNote() {
  const [open, setOpen] = useState(false);
  const { entries } = useOutbox();
  if (entries.length === 0) return null;
  const refused = entries.filter((entry) => entry.state === 'refused').length;
  return (
    <>
      <Button kind={refused > 0 ? 'destructive' : 'secondary'} onPress={() => setOpen(true)}>
        {refused > 0 ? `${refused} refused` : `${entries.length} on this phone`}
      </Button>
      {open ? <OutboxSheet entries={entries} onClose={() => setOpen(false)} /> : null}
    </>
  );
}

function OutboxSheet({ entries, onClose }: { entries: OutboxEntry[]; onClose: () => void }) {
  const me = useMeQuery();
  return (
    <Sheet title="On this phone, not on the server yet" onClose={onClose}>
      <Stack gap={3}>
        <Text tone="muted">
          What waits here is sent by itself as soon as there is a connection, in this order. It survives closing the page.
        </Text>
        {entries.map((entry) => (
          <Panel key={entry.id} gap={2}>
            <Text strong>{entry.subject}</Text>
            <EntryState entry={entry} own={me.data?.userId === entry.userId} />
          </Panel>
        ))}
      </Stack>
    </Sheet>
  );
}

function EntryState({ entry, own }: { entry: OutboxEntry; own: boolean }) {
  if (entry.state === 'refused') {
    return (
      <>
        <Text tone="minium">{`Refused: ${entry.refusal?.message ?? ''}`}</Text>
        <Row>
          <Button onPress={() => retryRefusal(entry.id)}>Send again</Button>
          <Button kind="destructive" onPress={() => discardRefusal(entry.id)}>
            Discard what I entered
          </Button>
        </Row>
      </>
    );
  }
  if (!own) return <Text tone="muted">Waits for the person who entered it to sign in on this phone.</Text>;
  return <Text tone="muted">{entry.state === 'sending' ? 'Being sent' : 'Waits for a connection'}</Text>;
}
