import type { CampaignDetail } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo, useState } from 'react';
import { hasRole, useFirm } from '../../lib/session.tsx';
import { type Units, useUnits } from '../../lib/units.tsx';
import {
  Button,
  Caution,
  Checkbox,
  Columns,
  Empty,
  Gloved,
  Loading,
  Page,
  Problem,
  Progress,
  Stack,
  Tag,
  Text,
  TextField,
  useWide,
} from '../../ui/index.ts';
import { CampaignFacts } from './campaign-facts.tsx';
import { ChecklistElevation } from './checklist-elevation.tsx';
import { ChecklistList } from './checklist-list.tsx';
import { type ChecklistRow, checklistRows, foundRows, nextToMeasure, progressOf } from './checklist-rows.ts';
import { entryHref } from './entry-href.ts';
import { useDrafts } from './entry-store.ts';
import { SaveEstimates } from './save-estimates.tsx';
import { useSurvey } from './use-survey.ts';

/** A campaign as a checklist: the elevation, what is done, and every cable with its tension or what is still to do. */
export function ChecklistScreen() {
  const firm = useFirm();
  const { campaign } = useLocalSearchParams<{ campaign: string }>();
  const { query, survey } = useSurvey(campaign);
  if (query.isError) return <Page title="Campaign">{<Problem error={query.error} onRetry={query.refetch} />}</Page>;
  if (query.isPending || !survey) return <Page title="Campaign">{<Loading what="the campaign" />}</Page>;
  return (
    <Gloved>
      <ChecklistView survey={survey} listHref={`/${firm.firmId}/site/${campaign}`} />
    </Gloved>
  );
}

function ChecklistView({ survey, listHref }: { survey: CampaignDetail; listHref: string }) {
  const firm = useFirm();
  const wide = useWide();
  const units = useUnits();
  const rows = useMemo(() => checklistRows(survey), [survey]);
  const [typed, setTyped] = useState('');
  const [onlyToMeasure, setOnlyToMeasure] = useState(false);
  const found = useMemo(() => foundRows(rows, typed, onlyToMeasure), [rows, typed, onlyToMeasure]);
  const drafts = useDrafts(survey.id);
  const drafted = useMemo(() => new Set(drafts.map(({ spanId }) => spanId)), [drafts]);
  const hrefOf = useMemo(() => (row: ChecklistRow) => entryHref(listHref, row), [listHref]);
  const progress = progressOf(rows);
  const next = nextToMeasure(rows, '');
  const engineer = hasRole(firm, 'engineer');
  const open = survey.state === 'open';
  return (
    <Page
      title={survey.name}
      breadcrumb={[
        { label: 'Site', href: `/${firm.firmId}/site` },
        { label: survey.structureName, href: `/${firm.firmId}/structures/${survey.structureId}` },
      ]}
      status={open ? <Progress done={progress.done} of={progress.of} label={progress.label} /> : <Tag tone="muted">closed</Tag>}
      actions={
        engineer && open && next ? (
          <Button kind="primary" href={hrefOf(next)}>
            {`Measure ${next.name}`}
          </Button>
        ) : null
      }
    >
      {typed === '' ? <ChecklistElevation survey={survey} rows={rows} listHref={listHref} /> : null}
      <Columns shares={[3, 1]} gap={2}>
        {[
          <TextField
            key="find"
            label="Find a cable by its reference or painted mark"
            value={typed}
            onChange={setTyped}
            autoComplete="off"
          />,
          <Stack key="filter" gap={0}>
            {wide ? <Text size="note"> </Text> : null}
            <Checkbox label="Only those to measure" value={onlyToMeasure} onChange={setOnlyToMeasure} />
          </Stack>,
        ]}
      </Columns>
      {found.length === 0 ? (
        <Empty>{typed === '' ? 'Nothing is left to measure.' : `No cable of the campaign is called or marked “${typed}”.`}</Empty>
      ) : (
        <ChecklistList survey={survey} rows={found} drafted={drafted} hrefOf={hrefOf} />
      )}
      <Caution unchecked site conditions={conditionsOf(survey, units)} />
      {engineer ? <SaveEstimates survey={survey} rows={rows} /> : null}
      <CampaignFacts survey={survey} editHref={engineer ? `${listHref}/edit` : null} />
    </Page>
  );
}

function conditionsOf({ steelTemperature, traffic }: CampaignDetail, units: Units): string {
  const temperature =
    steelTemperature === null
      ? 'Steel temperature not stated for the campaign'
      : `Averages at ${units.show(steelTemperature, 'temperature')}`;
  return `${temperature}${traffic ? `, traffic: ${traffic}` : ''}.`;
}
