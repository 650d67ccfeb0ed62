import type { CampaignDetail, Measurement } from '@strandnote/api/contract';
import { useLocalSearchParams } from 'expo-router';
import { useMemo } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { showTime } from '../../lib/show-time.ts';
import { Button, Caution, Columns, Empty, Heading, Loading, Notice, Page, Panel, Problem, Stack, Tag, Text } from '../../ui/index.ts';
import { type ChecklistRow, checklistRows } from './checklist-rows.ts';
import { entryHref } from './entry-href.ts';
import { EstimateBudget } from './estimate-budget.tsx';
import { EstimateHistory } from './estimate-history.tsx';
import { EstimateInputs } from './estimate-inputs.tsx';
import { EstimateModels } from './estimate-models.tsx';
import { EstimatePlots } from './estimate-plots.tsx';
import { EstimateSummary } from './estimate-summary.tsx';
import { useSurvey } from './use-survey.ts';

/** One estimate in full: what it rests on, how well it fits, and what was estimated before. */
export function EstimateScreen() {
  const firm = useFirm();
  const { campaign, cable, span } = useLocalSearchParams<{ campaign: string; cable: string; span?: string }>();
  const { query, survey } = useSurvey(campaign);
  const rows = useMemo(() => (survey ? checklistRows(survey) : []), [survey]);
  if (query.isError) return <Page title="Estimate">{<Problem error={query.error} onRetry={query.refetch} />}</Page>;
  if (query.isPending || !survey) return <Page title="Estimate">{<Loading what="the campaign" />}</Page>;
  const ofCable = rows.filter(({ entry }) => entry.cable.id === cable);
  const row = ofCable.find(({ key }) => key === span) ?? ofCable[0];
  const listHref = `/${firm.firmId}/site/${campaign}`;
  if (!row?.measurement || !row.output) {
    return (
      <Page title={row ? `Estimate of ${row.name}` : 'Estimate'}>
        <Empty action={<Button href={row ? entryHref(listHref, row) : listHref}>Open the modal peaks</Button>}>
          {row?.refusal ?? 'There is no estimate before a modal peak is entered.'}
        </Empty>
      </Page>
    );
  }
  return <EstimateView survey={survey} row={row} measurement={row.measurement} output={row.output} listHref={listHref} />;
}

interface EstimateViewProps {
  survey: CampaignDetail;
  row: ChecklistRow;
  measurement: Measurement;
  output: NonNullable<ChecklistRow['output']>;
  listHref: string;
}

function EstimateView({ survey, row, measurement, output, listHref }: EstimateViewProps) {
  const { cable } = row.entry;
  return (
    <Page
      title={`Estimate of ${row.name}`}
      breadcrumb={[
        { label: survey.structureName },
        { label: survey.name, href: listHref },
        { label: `Cable ${row.name}`, href: entryHref(listHref, row) },
      ]}
      status={row.saved ? <Tag tone="verdigris">saved on the server</Tag> : <Tag tone="ochre">computed on this device</Tag>}
      actions={<Button href={entryHref(listHref, row)}>Open the modal peaks</Button>}
    >
      <Text size="note" tone="muted">
        {`Visited ${showTime(measurement.visitedAt, survey.structureTimeZone)}, entered by ${measurement.enteredBy}. Engine ${output.engineVersion}.`}
      </Text>
      <EstimateSummary survey={survey} row={row} output={output} />
      {output.warnings.length > 0 ? (
        <Notice kind="caution" title="Warnings of the fit">
          {output.warnings.map(({ code, message }) => (
            <Text key={`${code} ${message}`}>{message}</Text>
          ))}
        </Notice>
      ) : null}
      <EstimatePlots output={output} measurement={measurement} />
      <Columns>
        {[
          <EstimateBudget key="budget" output={output} />,
          <Panel key="notes">
            <Heading level={2}>What kind of cable it is</Heading>
            <Stack gap={2}>
              {output.diagnostics.map(({ code, message }) => (
                <Text key={code}>{message}</Text>
              ))}
            </Stack>
          </Panel>,
        ]}
      </Columns>
      <EstimateModels output={output} />
      <EstimateInputs cable={cable} span={row.span} output={output} />
      <EstimateHistory survey={survey} row={row} />
      <Caution unchecked />
    </Page>
  );
}
