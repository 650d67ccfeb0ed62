import type { CampaignDetail } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { Button, Empty, Gloved, Loading, Page, Problem } from '../../ui/index.ts';
import { checklistRows } from './checklist-rows.ts';
import { EntryView } from './entry-view.tsx';
import { useSurvey } from './use-survey.ts';

/** A cable on site: its modal peaks are typed, and its tension appears while they are. */
export function EntryScreen() {
  const firm = useFirm();
  const { campaign } = useLocalSearchParams<{ campaign: string }>();
  const { query, survey } = useSurvey(campaign);
  if (query.isError) return <Page title="Cable">{<Problem error={query.error} onRetry={query.refetch} />}</Page>;
  if (query.isPending || !survey) return <Page title="Cable">{<Loading what="the campaign" />}</Page>;
  return (
    <Gloved>
      <EntryPlace survey={survey} stored={query.data} onReload={query.refetch} listHref={`/${firm.firmId}/site/${campaign}`} />
    </Gloved>
  );
}

interface EntryPlaceProps {
  survey: CampaignDetail;
  stored: CampaignDetail;
  onReload: () => Promise<unknown>;
  listHref: string;
}

/** Finds the span and the visit that the address names. */
function EntryPlace({ survey, stored, onReload, listHref }: EntryPlaceProps) {
  const { cable, span, visit } = useLocalSearchParams<{ cable: string; span?: string; visit?: string }>();
  const rows = useMemo(() => checklistRows(survey), [survey]);
  const ofCable = rows.filter(({ entry }) => entry.cable.id === cable);
  const row = ofCable.find(({ key }) => key === span) ?? ofCable[0];
  if (!row) {
    return (
      <Page title="Cable">
        <Empty action={<Button href={listHref}>Open the checklist</Button>}>This campaign does not cover the cable.</Empty>
      </Page>
    );
  }
  const named = row.entry.measurements.find(({ id }) => id === visit) ?? row.measurement;
  const measurement = visit === 'new' ? null : named;
  return (
    <EntryView
      key={`${row.key} ${measurement?.id ?? 'new'}`}
      survey={survey}
      stored={stored}
      onReload={onReload}
      rows={rows}
      row={row}
      measurement={measurement}
      listHref={listHref}
    />
  );
}
