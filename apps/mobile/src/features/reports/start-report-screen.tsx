import { useLocalSearchParams, useRouter } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { Button, Form, FormSelect, FormTextField, Loading, Notice, Page, Problem, Text } from '../../ui/index.ts';
import { useCampaignQuery } from '../campaigns/campaigns.api.ts';
import { useClientsQuery } from '../clients/clients.api.ts';
import { useCreateReportMutation } from './reports.api.ts';

/** Starts the report of a campaign: whom it is for and what it is called. */
export function StartReportScreen() {
  const firm = useFirm();
  const { campaign: campaignId } = useLocalSearchParams<{ campaign: string }>();
  const campaign = useCampaignQuery(firm.firmId, campaignId);
  const clients = useClientsQuery(firm.firmId);
  const title = 'Start a report';
  if (campaign.isPending || clients.isPending) return <Page title={title}>{<Loading />}</Page>;
  if (campaign.isError || clients.isError) {
    return (
      <Page title={title}>
        <Problem error={campaign.error ?? clients.error} onRetry={() => Promise.all([campaign.refetch(), clients.refetch()])} />
      </Page>
    );
  }
  const { structureName, name } = campaign.data;
  return (
    <Page title={title} breadcrumb={[{ label: structureName }, { label: name, href: `/${firm.firmId}/site/${campaignId}` }]} narrow>
      <StartReportForm
        campaignId={campaignId}
        suggestedTitle={`Cable tensions of ${structureName}, ${name}`}
        clients={clients.data.items.map((client) => ({ value: client.id, label: client.name }))}
      />
    </Page>
  );
}

interface StartReportFormProps {
  campaignId: string;
  suggestedTitle: string;
  clients: { value: string; label: string }[];
}

function StartReportForm({ campaignId, suggestedTitle, clients }: StartReportFormProps) {
  const firm = useFirm();
  const router = useRouter();
  const create = useCreateReportMutation(firm.firmId, campaignId);
  const only = clients.length === 1 ? (clients[0]?.value ?? null) : null;
  const form = useForm<{ title: string; clientId: string | null }>({ defaultValues: { title: suggestedTitle, clientId: only } });
  const save = form.handleSubmit(async ({ title, clientId }) => {
    if (clientId === null) return;
    const revisionId = crypto.randomUUID();
    try {
      await create.mutateAsync({ id: crypto.randomUUID(), revisionId, title, clientId, cableIds: null });
      router.replace(`/${firm.firmId}/reports/${revisionId}` as '/');
    } catch (error) {
      showProblem(form, error);
    }
  });
  return (
    <Form onSubmit={save}>
      <FormTextField
        control={form.control}
        name="title"
        label="Title"
        check={(text) => (text.trim() === '' ? 'Give the report a title.' : null)}
      />
      <FormSelect
        control={form.control}
        name="clientId"
        label="Client who receives it"
        options={clients}
        placeholder="Choose a client"
        check={(value) => (value === null ? 'Choose the client who receives the report.' : null)}
      />
      <Text tone="muted">The report covers every cable of the campaign. Its number comes from the firm’s own sequence.</Text>
      {form.formState.errors.root ? <Notice kind="problem">{form.formState.errors.root.message}</Notice> : null}
      <Button kind="primary" onPress={save} busy={create.isPending}>
        Start the report
      </Button>
    </Form>
  );
}
