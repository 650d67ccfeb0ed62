import type { CampaignDetail, Measurement, PutMeasurement } from '@strandnote/api/contract';
import { putMeasurement } from '@strandnote/api/contract';
import { useEffect, useMemo } from 'react';
import { discardRefusal, retryRefusal } from '../../lib/outbox.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { useOutbox, useOutboxStatus } from '../../lib/use-outbox.ts';
import { Button, type Column, DataTable, Loading, Notice, Row, Text } from '../../ui/index.ts';
import { measurementKey } from './entry-store.ts';
import { type Difference, differencesOf } from './measurement-differences.ts';

interface RefusalProps {
  measurementId: string;
  /** The campaign as the server holds it, without what is on this device. */
  stored: CampaignDetail;
  onReload: () => Promise<unknown>;
  onKeepMine: (body: PutMeasurement) => void;
  onTakeTheirs: (theirs: Measurement) => void;
}

/** Why the server did not take what was entered here, and what can be done about it. Nothing is lost before the person decides. */
export function Refusal({ measurementId, stored, onReload, onKeepMine, onTakeTheirs }: RefusalProps) {
  const status = useOutboxStatus(measurementKey(measurementId));
  const { entries } = useOutbox();
  if (status?.kind !== 'refused') return null;
  const mine = putMeasurement.safeParse(entries.find(({ id }) => id === status.id)?.body);
  if (status.code === 'changed-elsewhere' && mine.success) {
    return (
      <Conflict
        key={status.id}
        mine={mine.data}
        measurementId={measurementId}
        stored={stored}
        onReload={onReload}
        onKeepMine={onKeepMine}
        onTakeTheirs={async (theirs) => {
          await discardRefusal(status.id);
          onTakeTheirs(theirs);
        }}
      />
    );
  }
  return (
    <Notice kind="problem" title="The server did not take this">
      <Text>{status.reason}</Text>
      <Text>It is kept on this device as you typed it. Mend it below and save again, or send it again as it is.</Text>
      <Row>
        <Button onPress={() => void retryRefusal(status.id)}>Send again</Button>
      </Row>
    </Notice>
  );
}

interface ConflictProps extends RefusalProps {
  mine: PutMeasurement;
}

const columns: Column<Difference>[] = [
  { key: 'what', header: 'What', cell: (row) => row.what },
  { key: 'mine', header: 'You, on this device', cell: (row) => row.mine, figures: true },
  { key: 'theirs', header: 'On the server', cell: (row) => row.theirs, figures: true },
];

function Conflict({ mine, measurementId, stored, onReload, onKeepMine, onTakeTheirs }: ConflictProps) {
  const units = useUnits();
  // What somebody else has saved is on the server only.
  // biome-ignore lint/correctness/useExhaustiveDependencies: once, when the conflict is shown
  useEffect(() => void onReload(), []);
  const theirs = findMeasurement(stored, measurementId);
  const rows = useDifferences(mine, theirs, units);
  if (!theirs || theirs.version <= mine.version) return <Loading what="what was saved elsewhere" />;
  return (
    <Notice kind="problem" title={`${theirs.enteredBy} has changed this measurement since you opened it`}>
      <Text>Both are here. Nothing is overwritten until you choose.</Text>
      <DataTable
        caption="Where the two differ"
        columns={columns}
        rows={rows}
        rowKey={(row) => row.what}
        empty={<Text>Both say the same.</Text>}
      />
      <Row>
        <Button onPress={() => onKeepMine({ ...mine, version: theirs.version })}>Keep mine</Button>
        <Button onPress={() => onTakeTheirs(theirs)}>{`Take that of ${theirs.enteredBy}`}</Button>
      </Row>
    </Notice>
  );
}

function useDifferences(mine: PutMeasurement, theirs: Measurement | null, units: Units): Difference[] {
  return useMemo(() => (theirs ? differencesOf(mine, theirs, units.show) : []), [mine, theirs, units]);
}

function findMeasurement({ cables }: CampaignDetail, id: string): Measurement | null {
  return cables.flatMap(({ measurements }) => measurements).find((measurement) => measurement.id === id) ?? null;
}
