import { type IntervalScale, sharedScale, shareOfReference } from '@strandnote/core/drawing';
import { type ReactNode, useMemo } from 'react';
import { IntervalBar } from '../../drawings/index.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Text } from '../../ui/index.ts';
import { changeWords, percentWords, tensionWords } from './figures.ts';
import type { ResultRow } from './result-rows.ts';
import { zonesByUrgency, zoneTone, zoneWords } from './zone-words.ts';

export interface ResultsTableProps {
  caption: string;
  rows: readonly ResultRow[];
  hrefOf?: (row: ResultRow) => string;
  currentKey?: string | null;
  /** Something stands beside the table: only what the eye compares is kept. */
  compact?: boolean;
  /** A last column of the caller's own: the state of the check. */
  last?: { header: string; cell: (row: ResultRow) => ReactNode };
}

/** All cables on one scale, so that the eye runs down the column and stops at the one that does not fit. */
export function ResultsTable({ caption, rows, hrefOf, currentKey, compact = false, last }: ResultsTableProps) {
  const units = useUnits();
  const columns = useMemo(() => {
    const all = resultColumns(rows, units, last);
    return compact ? all.filter(({ key }) => !leftOutBeside.has(key)) : all;
  }, [rows, units, last, compact]);
  return (
    <DataTable
      caption={caption}
      columns={columns}
      rows={rows}
      rowKey={(row) => row.key}
      {...(hrefOf ? { hrefOf } : {})}
      currentKey={currentKey ?? null}
    />
  );
}

const leftOutBeside = new Set(['reference', 'to-reference', 'last-survey']);

function resultColumns(rows: readonly ResultRow[], units: Units, last: ResultsTableProps['last']): Column<ResultRow>[] {
  const onReference = rows.some((row) => shareOfReference(row.bar) !== null);
  const drawn = (row: ResultRow) => (onReference ? shareOfReference(row.bar) : row.bar);
  const scale = sharedScale(rows.map(drawn).filter((bar) => bar !== null));
  const columns: Column<ResultRow>[] = [
    { key: 'cable', header: 'Cable', cell: (row) => row.name, figures: true, sortBy: (row) => row.name, onPhone: 'title' },
    {
      key: 'tension',
      header: `Tension ${units.symbol('force')}, 95 %`,
      cell: (row) => tensionWords(row, units),
      figures: true,
      align: 'right',
      sortBy: (row) => row.bar.tension,
      onPhone: 'line',
    },
    {
      key: 'reference',
      header: 'Reference',
      cell: (row) => (row.bar.reference ? units.figure(row.bar.reference, 'force') : '–'),
      figures: true,
      align: 'right',
      sortBy: (row) => row.bar.reference ?? null,
      onPhone: 'line',
    },
    {
      key: 'to-reference',
      header: 'to reference',
      cell: (row) => percentWords(row.span.decision.toReference),
      figures: true,
      align: 'right',
      sortBy: (row) => row.span.decision.toReference,
      onPhone: 'line',
    },
    {
      key: 'interval',
      header: onReference ? 'Interval as a share of the reference' : 'Interval',
      cell: (row) => <Bar bar={drawn(row)} scale={scale} />,
      width: 240,
      onPhone: 'across',
    },
    {
      key: 'zone',
      header: 'Decision',
      cell: (row) => (
        <Text strong tone={zoneTone[row.zone]}>
          {zoneWords[row.zone]}
        </Text>
      ),
      sortBy: (row) => zonesByUrgency.indexOf(row.zone),
      onPhone: 'aside',
    },
  ];
  if (rows.some((row) => row.span.lastSurvey)) columns.splice(4, 0, changeColumn(units));
  return last ? [...columns, { key: 'last', header: last.header, cell: last.cell, onPhone: 'line' }] : columns;
}

function changeColumn(units: Units): Column<ResultRow> {
  return {
    key: 'last-survey',
    header: 'Last survey',
    cell: (row) => changeWords(row, units),
    figures: true,
    align: 'right',
    onPhone: 'line',
  };
}

function Bar({ bar, scale }: { bar: ResultRow['bar'] | null; scale: IntervalScale }) {
  if (bar === null || bar.interval === null) return <Text tone="muted">–</Text>;
  return <IntervalBar values={bar} scale={scale} />;
}
