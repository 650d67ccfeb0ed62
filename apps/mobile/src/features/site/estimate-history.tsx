import type { CampaignDetail, TensionOfCampaign } from '@strandnote/api/contract';
import { formatInterval } from '@strandnote/core';
import { useMemo } from 'react';
import { useFirm } from '../../lib/session.tsx';
import { showDay, showTime } from '../../lib/show-time.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Empty, Heading, Loading, Problem, Stack, Tag, Text } from '../../ui/index.ts';
import { useCableQuery } from '../cables/cables.api.ts';
import { type ChecklistRow, visitsOf } from './checklist-rows.ts';

interface HistoryRow {
  key: string;
  when: string;
  where: string;
  interval: string;
  temperature: string;
  state: string;
  tone: 'verdigris' | 'ochre' | 'muted';
}

/** Saved estimates never change: what was saved in this campaign, and what earlier campaigns found. */
export function EstimateHistory({ survey, row }: { survey: CampaignDetail; row: ChecklistRow }) {
  const firm = useFirm();
  const units = useUnits();
  const { cable } = row.entry;
  const history = useCableQuery(firm.firmId, cable.id);
  const earlier = history.data?.history;
  const rows = useMemo(
    () => [...savedRows(survey, row, units), ...earlierRows(earlier ?? [], survey, row.key, units)],
    [survey, row, earlier, units],
  );
  return (
    <Stack gap={3}>
      <Heading level={2}>Saved estimates</Heading>
      {history.isError ? <Problem error={history.error} onRetry={history.refetch} /> : null}
      {history.isPending ? <Loading what="earlier campaigns" /> : null}
      <DataTable
        caption="Saved estimates of this span"
        columns={columns}
        rows={rows}
        rowKey={({ key }) => key}
        empty={<Empty>None is saved yet. “Save estimates” in the checklist keeps one of every cable.</Empty>}
      />
      <Text size="note" tone="muted">
        Between campaigns, read a difference only with both intervals and both temperatures.
      </Text>
    </Stack>
  );
}

const columns: Column<HistoryRow>[] = [
  { key: 'when', header: 'When', cell: ({ when }) => when },
  { key: 'where', header: 'Campaign', cell: ({ where }) => where },
  { key: 'interval', header: 'Tension, 95 %', cell: ({ interval }) => interval, figures: true, align: 'right' },
  { key: 'temperature', header: 'Steel temperature', cell: ({ temperature }) => temperature, figures: true, align: 'right' },
  { key: 'state', header: 'State', cell: ({ state, tone }) => <Tag tone={tone}>{state}</Tag>, onPhone: 'aside' },
];

function intervalWords(interval: readonly [number, number], { system }: Units): string {
  const { low, high, symbol } = formatInterval(interval, 'force', system);
  return `${low} to ${high} ${symbol}`;
}

function savedRows(survey: CampaignDetail, row: ChecklistRow, units: Units): HistoryRow[] {
  return visitsOf(row.entry.measurements, row.key).flatMap(({ id, steelTemperature }) =>
    row.entry.estimates
      .filter(({ measurementId }) => measurementId === id)
      .map((estimate) => ({
        key: estimate.id,
        when: showTime(estimate.createdAt, survey.structureTimeZone),
        where: `${survey.name}, saved by ${estimate.createdBy}, engine ${estimate.engineVersion}`,
        interval: intervalWords(estimate.output.interval95, units),
        temperature: units.show(steelTemperature ?? survey.steelTemperature, 'temperature'),
        ...(estimate.stale
          ? ({ state: 'inputs changed since', tone: 'ochre' } as const)
          : ({ state: 'speaks for its inputs', tone: 'verdigris' } as const)),
      })),
  );
}

function earlierRows(history: readonly TensionOfCampaign[], survey: CampaignDetail, spanId: string, units: Units): HistoryRow[] {
  return history
    .filter((tension) => tension.spanId === spanId && tension.campaignId !== survey.id)
    .map((tension) => ({
      key: `${tension.campaignId} ${tension.spanId}`,
      when: showDay(tension.startsOn),
      where: tension.campaignName,
      interval: intervalWords(tension.interval95, units),
      temperature: units.show(tension.steelTemperature, 'temperature'),
      state: tension.checked ? 'checked' : 'not checked',
      tone: tension.checked ? ('verdigris' as const) : ('muted' as const),
    }));
}
