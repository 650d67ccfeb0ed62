import type { Desk, RevisionSummary } from '@strandnote/api/contract';
import type { ReactNode } from 'react';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { Button, Empty, Heading, Loading, Page, Panel, Problem, Progress, Row, Rule, Stack, Tag, Text, Touchable } from '../../ui/index.ts';
import { useDeskQuery } from './desk.api.ts';
import { MovedCables } from './moved-cables.tsx';

/** What waits for the person who looks. */
export function DeskScreen() {
  const firm = useFirm();
  const desk = useDeskQuery(firm.firmId);
  if (desk.isPending) return <Page title="Desk">{<Loading />}</Page>;
  if (desk.isError) return <Page title="Desk">{<Problem error={desk.error} onRetry={desk.refetch} />}</Page>;
  return (
    <Page title="Desk">
      <DeskSections desk={desk.data} />
    </Page>
  );
}

function DeskSections({ desk }: { desk: Desk }) {
  const firm = useFirm();
  const nothing = Object.values(desk).every((list) => list.length === 0);
  if (nothing) return <FirstStep mayStart={hasRole(firm, 'admin', 'engineer')} />;
  const report = (revision: RevisionSummary) => `/${firm.firmId}/reports/${revision.id}`;
  return (
    <>
      <Section title="Returned to you" shown={desk.returned.length > 0}>
        <Revisions revisions={desk.returned} hrefOf={report} />
      </Section>
      <Section title="To check" shown={desk.toCheck.length > 0}>
        <Revisions
          revisions={desk.toCheck}
          hrefOf={(revision) => `/${firm.firmId}/checking/${revision.id}`}
          progressOf={({ tickedCount, cableCount, openComments }) => (
            <Progress
              done={tickedCount}
              of={cableCount}
              label={`${tickedCount} of ${cableCount} looked at${openComments === 0 ? '' : `, ${openComments} open`}`}
            />
          )}
        />
      </Section>
      <Section title="Approved, to issue" shown={desk.toIssue.length > 0}>
        <Revisions revisions={desk.toIssue} hrefOf={report} />
      </Section>
      <Section title="Campaigns in progress" shown={desk.campaigns.length > 0}>
        <Campaigns campaigns={desk.campaigns} />
      </Section>
      <Section title="Drafts" shown={desk.drafts.length > 0}>
        <Revisions revisions={desk.drafts} hrefOf={report} />
      </Section>
      <Section title="Cables whose tension moved" shown={desk.moved.length > 0}>
        <MovedCables moved={desk.moved} />
      </Section>
    </>
  );
}

function FirstStep({ mayStart }: { mayStart: boolean }) {
  const firm = useFirm();
  return (
    <Empty
      {...(mayStart
        ? {
            action: (
              <Button kind="primary" href={`/${firm.firmId}/structures/new`}>
                Add a structure
              </Button>
            ),
          }
        : {})}
    >
      Campaigns in progress, and reports that wait for you, stand here. Nothing waits now.
    </Empty>
  );
}

function Section({ title, shown, children }: { title: string; shown: boolean; children: ReactNode }) {
  if (!shown) return null;
  return (
    <Stack gap={3}>
      <Heading level={2}>{title}</Heading>
      {children}
    </Stack>
  );
}

interface RevisionsProps<Waiting extends RevisionSummary> {
  revisions: readonly Waiting[];
  hrefOf: (revision: Waiting) => string;
  progressOf?: (revision: Waiting) => ReactNode;
}

function Revisions<Waiting extends RevisionSummary>({ revisions, hrefOf, progressOf }: RevisionsProps<Waiting>) {
  return (
    <Panel gap={0}>
      {revisions.map((revision, index) => (
        <Stack key={revision.id} gap={0}>
          {index > 0 ? <Rule /> : null}
          <Touchable
            href={hrefOf(revision)}
            label={`Report ${revision.reportNumber}, revision ${revision.letter}, ${revision.structureName}`}
          >
            <Row justify="space-between">
              <Stack gap={0}>
                <Text strong>{`${revision.reportNumber}, revision ${revision.letter}`}</Text>
                <Text>{`${revision.structureName}, ${revision.campaignName}`}</Text>
                <Text size="note" tone="muted">{`Prepared by ${revision.authorName} for ${revision.clientName}`}</Text>
              </Stack>
              {progressOf ? progressOf(revision) : <Tag>{revision.state}</Tag>}
            </Row>
          </Touchable>
        </Stack>
      ))}
    </Panel>
  );
}

function Campaigns({ campaigns }: { campaigns: Desk['campaigns'] }) {
  const firm = useFirm();
  return (
    <Panel gap={0}>
      {campaigns.map((campaign, index) => (
        <Stack key={campaign.id} gap={0}>
          {index > 0 ? <Rule /> : null}
          <Touchable href={`/${firm.firmId}/site/${campaign.id}`} label={`${campaign.structureName}, ${campaign.name}`}>
            <Row justify="space-between">
              <Stack gap={0}>
                <Text strong>{campaign.structureName}</Text>
                <Text>{campaign.name}</Text>
              </Stack>
              <Progress
                done={campaign.measuredCount + campaign.notMeasuredCount}
                of={campaign.cableCount}
                label={`${campaign.measuredCount} of ${campaign.cableCount} measured${campaign.notMeasuredCount > 0 ? `, ${campaign.notMeasuredCount} not to be measured` : ''}`}
              />
            </Row>
          </Touchable>
        </Stack>
      ))}
    </Panel>
  );
}
