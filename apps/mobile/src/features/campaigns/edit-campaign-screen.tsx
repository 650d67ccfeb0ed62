import type { CampaignDetail } from '@strandnote/api/contract';
import { useLocalSearchParams, useRouter } from 'expo-router';
import { useForm } from 'react-hook-form';
import { showProblem } from '../../lib/form-problems.ts';
import { useFirm } from '../../lib/session.tsx';
import { useUnits } from '../../lib/units.tsx';
import { Button, Heading, Loading, Notice, Page, Panel, Problem, Row, Text } from '../../ui/index.ts';
import { CampaignForm } from './campaign-form.tsx';
import { campaignFields, campaignValues } from './campaign-form-values.ts';
import { fieldOfCampaign } from './campaign-problems.ts';
import { useCampaignQuery, useEditCampaignMutation } from './campaigns.api.ts';

/** Changes what is said of a campaign; closes it and opens it again. */
export function EditCampaignScreen() {
  const firm = useFirm();
  const { campaign: campaignId } = useLocalSearchParams<{ campaign: string }>();
  const campaign = useCampaignQuery(firm.firmId, campaignId);
  const title = 'Edit the campaign';
  if (campaign.isPending) return <Page title={title}>{<Loading what="the campaign" />}</Page>;
  if (campaign.isError) return <Page title={title}>{<Problem error={campaign.error} onRetry={campaign.refetch} />}</Page>;
  return <EditCampaign campaign={campaign.data} title={title} />;
}

function EditCampaign({ campaign, title }: { campaign: CampaignDetail; title: string }) {
  const firm = useFirm();
  const router = useRouter();
  const { system } = useUnits();
  const listHref = `/${firm.firmId}/site/${campaign.id}`;
  const edit = useEditCampaignMutation(firm.firmId, campaign.id);
  const form = useForm({ defaultValues: campaignValues(campaign, system) });
  const closed = campaign.state === 'closed';
  const save = form.handleSubmit(async (values) => {
    try {
      await edit.mutateAsync(campaignFields(values));
      router.replace(listHref as '/');
    } catch (error) {
      showProblem(form, error, fieldOfCampaign);
    }
  });
  return (
    <Page
      title={title}
      breadcrumb={[{ label: campaign.structureName }, { label: campaign.name, href: listHref }]}
      narrow
      actions={
        <Button kind="primary" onPress={() => void save()} busy={edit.isPending} why={closed ? 'The campaign is closed.' : null}>
          Save the campaign
        </Button>
      }
    >
      {closed ? <Notice>The campaign is closed. Open it again below to change anything in it.</Notice> : null}
      <CampaignForm form={form} onSubmit={() => void save()} />
      <Panel>
        <Heading level={2}>{closed ? 'Open it again' : 'Close it'}</Heading>
        <Text tone="muted">
          {closed
            ? 'Measurements and estimates can be entered again.'
            : 'A closed campaign takes no measurement and no estimate until it is opened again.'}
        </Text>
        <Row>
          <Button onPress={() => edit.mutate({ state: closed ? 'open' : 'closed' })} busy={edit.isPending}>
            {closed ? 'Open the campaign again' : 'Close the campaign'}
          </Button>
        </Row>
        {edit.isError ? <Problem error={edit.error} /> : null}
      </Panel>
    </Page>
  );
}
