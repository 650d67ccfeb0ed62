import type { CableDetail } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, Caution, Columns, Heading, Loading, Page, Problem, Stack, Text } from '../../ui/index.ts';
import { cableKindWords } from '../structures/structure-words.ts';
import { CableProperties } from './cable-properties.tsx';
import { useCableQuery } from './cables.api.ts';
import { PredictedFrequencies } from './predicted-frequencies.tsx';
import { References } from './references.tsx';
import { TensionHistory } from './tension-history.tsx';

/** One cable: what is known of it, what it should sound like, what it is compared with, and its tensions so far. */
export function CableScreen() {
  const firm = useFirm();
  const { cable: cableId } = useLocalSearchParams<{ cable: string }>();
  const cable = useCableQuery(firm.firmId, cableId);
  if (cable.isPending) return <Page title="Cable">{<Loading />}</Page>;
  if (cable.isError) return <Page title="Cable">{<Problem error={cable.error} onRetry={cable.refetch} />}</Page>;
  return <CableView cable={cable.data} />;
}

function CableView({ cable }: { cable: CableDetail }) {
  const firm = useFirm();
  const structure = `/${firm.firmId}/structures/${cable.structureId}`;
  const about = [cableKindWords[cable.kind], cable.section.name, cable.ownerReference, cable.paintedMark && `painted ${cable.paintedMark}`];
  return (
    <Page
      title={`Cable ${cable.reference}`}
      breadcrumb={[
        { label: 'Structures', href: `/${firm.firmId}/structures` },
        { label: cable.structureName, href: structure },
      ]}
      actions={
        hasRole(firm, 'admin', 'engineer') ? (
          <Button href={`/${firm.firmId}/structures/cables/${cable.id}/edit`}>Edit the cable</Button>
        ) : undefined
      }
    >
      <Text tone="muted">{about.filter((part) => part !== '').join(' · ')}</Text>
      <Stack gap={3}>
        <Heading level={2}>Tension history</Heading>
        <TensionHistory cable={cable} />
        {cable.history.length > 0 ? <Caution unchecked={cable.history.some(({ checked }) => !checked)} /> : null}
      </Stack>
      <Columns>
        <Stack gap={6}>
          <CableProperties cable={cable} />
        </Stack>
        <Stack gap={6}>
          <References cable={cable} />
          <PredictedFrequencies cable={cable} />
        </Stack>
      </Columns>
      {cable.notes ? <Text>{cable.notes}</Text> : null}
    </Page>
  );
}
