import type { Structure } from '@strandnote/api/contract';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { useState } from 'react';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Empty, Loading, Page, Problem } from '../../ui/index.ts';
import { useStructuresQuery } from '../structures/structures.api.ts';
import { CableChoice } from './cable-choice.tsx';
import { CampaignForm } from './campaign-form.tsx';
import { campaignFields, newCampaignValues } from './campaign-form-values.ts';
import { fieldOfCampaign } from './campaign-problems.ts';
import { useCreateCampaignMutation } from './campaigns.api.ts';

/** Opens a campaign on a structure. */
export function CreateCampaignScreen() {
  const firm = useFirm();
  const structures = useStructuresQuery(firm.firmId);
  const title = 'Open a campaign';
  if (structures.isPending) return <Page title={title}>{<Loading what="the structures" />}</Page>;
  if (structures.isError) return <Page title={title}>{<Problem error={structures.error} onRetry={structures.refetch} />}</Page>;
  if (structures.data.items.length === 0) {
    return (
      <Page title={title}>
        <Empty action={<Button href={`/${firm.firmId}/structures/new`}>Add a structure</Button>}>
          A campaign surveys the cables of a structure, and there is no structure yet.
        </Empty>
      </Page>
    );
  }
  return <CreateCampaign structures={structures.data.items} title={title} />;
}

function CreateCampaign({ structures, title }: { structures: readonly Structure[]; title: string }) {
  const firm = useFirm();
  const router = useRouter();
  const { structure } = useLocalSearchParams<{ structure?: string }>();
  const [id] = useState(() => crypto.randomUUID());
  const create = useCreateCampaignMutation(firm.firmId);
  const named = structures.find((candidate) => candidate.id === structure) ?? (structures.length === 1 ? structures[0] : undefined);
  const today = new Date().toLocaleDateString('en-CA');
  const form = useForm({ defaultValues: newCampaignValues(named?.id ?? null, today) });
  const save = form.handleSubmit(async (values) => {
    if (values.structureId === null) return;
    const cableIds = values.cables === 'all' ? null : values.cableIds;
    try {
      await create.mutateAsync({ id, structureId: values.structureId, ...campaignFields(values), cableIds });
      router.replace(`/${firm.firmId}/site/${id}` as '/');
    } catch (error) {
      showProblem(form, error, fieldOfCampaign);
    }
  });
  return (
    <Page
      title={title}
      breadcrumb={[{ label: 'Site', href: `/${firm.firmId}/site` }]}
      narrow
      actions={
        <Button kind="primary" onPress={() => void save()} busy={create.isPending}>
          Open the campaign
        </Button>
      }
    >
      <CampaignForm form={form} onSubmit={() => void save()} first={<CableChoice form={form} structures={structures} />} />
    </Page>
  );
}
