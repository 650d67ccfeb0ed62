import type { Campaign } from '@strandnote/api/contract';
import { hasRole, useFirm } from '../../lib/session.tsx';
import {
  Button,
  Empty,
  Gloved,
  Heading,
  Loading,
  Page,
  Panel,
  Problem,
  Progress,
  Row,
  Rule,
  Stack,
  Tag,
  Text,
  Touchable,
} from '../../ui/index.ts';
import { useCampaignsQuery } from '../campaigns/campaigns.api.ts';
import { daysOf } from './campaign-days.ts';

/** The campaigns that work goes on in, and those that are closed. */
export function SiteScreen() {
  const firm = useFirm();
  const campaigns = useCampaignsQuery(firm.firmId);
  if (campaigns.isPending) return <Page title="Site">{<Loading what="the campaigns" />}</Page>;
  if (campaigns.isError) return <Page title="Site">{<Problem error={campaigns.error} onRetry={campaigns.refetch} />}</Page>;
  return (
    <Gloved>
      <SiteView campaigns={campaigns.data.items} />
    </Gloved>
  );
}

function SiteView({ campaigns }: { campaigns: readonly Campaign[] }) {
  const firm = useFirm();
  const open = campaigns.filter(({ state }) => state === 'open');
  const closed = campaigns.filter(({ state }) => state === 'closed');
  const start = (
    <Button kind="primary" href={`/${firm.firmId}/site/new`}>
      Open a campaign
    </Button>
  );
  const mayStart = hasRole(firm, 'engineer');
  return (
    <Page title="Site" actions={mayStart && campaigns.length > 0 ? start : null}>
      {open.length > 0 ? (
        <CampaignPanel campaigns={open} />
      ) : (
        <Empty action={mayStart && campaigns.length === 0 ? start : undefined}>
          Campaigns in progress stand here, each with its checklist of cables.
        </Empty>
      )}
      {closed.length > 0 ? (
        <Stack gap={3}>
          <Heading level={2}>Closed</Heading>
          <CampaignPanel campaigns={closed} />
        </Stack>
      ) : null}
    </Page>
  );
}

function CampaignPanel({ campaigns }: { campaigns: readonly Campaign[] }) {
  const firm = useFirm();
  return (
    <Panel gap={1}>
      {campaigns.map((campaign, index) => (
        <Stack key={campaign.id} gap={1}>
          {index > 0 ? <Rule /> : null}
          <Touchable href={`/${firm.firmId}/site/${campaign.id}`} label={`${campaign.structureName}, ${campaign.name}`}>
            <Row justify="space-between" gap={4}>
              <Stack gap={0}>
                <Text strong>{campaign.structureName}</Text>
                <Text>{campaign.name}</Text>
                <Text size="note" tone="muted">
                  {[daysOf(campaign), campaign.crew].filter(Boolean).join(' · ')}
                </Text>
              </Stack>
              {campaign.state === 'closed' ? (
                <Tag tone="muted">{`closed, ${campaign.measuredCount} of ${campaign.cableCount} measured`}</Tag>
              ) : (
                <Progress
                  done={campaign.measuredCount}
                  of={campaign.cableCount}
                  label={`${campaign.measuredCount} of ${campaign.cableCount} measured`}
                />
              )}
            </Row>
          </Touchable>
        </Stack>
      ))}
    </Panel>
  );
}
