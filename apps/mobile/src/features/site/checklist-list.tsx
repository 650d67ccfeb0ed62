import type { CampaignDetail } from '@strandnote/api/contract';
import { type IntervalScale, sharedScale, shareOfReference } from '@strandnote/core/drawing';
import { memo, useMemo } from 'react';
import { View } from 'react-native';
import { IntervalBar } from '../../drawings/index.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { type Column, DataTable, Panel, Row, Rule, Stack, Tag, Text, Touchable, useWide } from '../../ui/index.ts';
import { zonesByUrgency } from '../reports/zone-words.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { RowFigures, RowState, stateWords, tensionFigures } from './row-state.tsx';
import { referenceWords } from './site-words.ts';
import { agreedInWords } from './survey-decision.ts';

interface ChecklistListProps {
  survey: CampaignDetail;
  rows: readonly ChecklistRow[];
  /** Spans with something typed and not saved. */
  drafted: ReadonlySet<string>;
  hrefOf: (row: ChecklistRow) => string;
}

interface Bars {
  scale: IntervalScale;
  /** As shares of the reference where there is one, so that all stand on one scale. */
  of: (row: ChecklistRow) => ChecklistRow['bar'] | null;
}

/** All cables on one shared scale: a table on a wide screen, rows to touch on a phone. */
export function ChecklistList(props: ChecklistListProps) {
  const wide = useWide();
  const { rows } = props;
  const bars = useMemo(() => barsOf(rows), [rows]);
  return wide ? <WideTable {...props} bars={bars} /> : <PhoneRows {...props} bars={bars} />;
}

function barsOf(rows: readonly ChecklistRow[]): Bars {
  const onReference = rows.some(({ bar }) => shareOfReference(bar) !== null);
  const of = ({ bar }: ChecklistRow) => (onReference ? shareOfReference(bar) : bar);
  const drawn = rows.filter(({ output }) => output !== null).map(of);
  return { of, scale: sharedScale(drawn.filter((bar) => bar !== null)) };
}

function PhoneRows({ rows, drafted, hrefOf, bars }: ChecklistListProps & { bars: Bars }) {
  return (
    <Panel gap={0}>
      {rows.map((row, index) => (
        <Stack key={row.key} gap={0}>
          {index > 0 ? <Rule /> : null}
          <PhoneRow row={row} href={hrefOf(row)} drafted={drafted.has(row.key)} bars={bars} />
        </Stack>
      ))}
    </Panel>
  );
}

const PhoneRow = memo(function PhoneRow({ row, href, drafted, bars }: { row: ChecklistRow; href: string; drafted: boolean; bars: Bars }) {
  const { paintedMark } = row.entry.cable;
  const bar = row.output ? bars.of(row) : null;
  return (
    <Touchable href={href} label={`Cable ${row.name}, ${stateWords(row)}`}>
      <Stack gap={1}>
        <Row justify="space-between" gap={3} wrap={false}>
          <Row gap={2}>
            <Text figures strong size="lead">
              {row.name}
            </Text>
            {paintedMark && paintedMark !== row.name ? (
              <Text size="note" tone="muted">
                {`mark ${paintedMark}`}
              </Text>
            ) : null}
            {drafted ? <Tag tone="ochre">typed, not saved</Tag> : null}
          </Row>
          {row.output ? <RowFigures row={row} /> : <RowState row={row} size="note" />}
        </Row>
        {bar ? (
          <Row gap={3} wrap={false}>
            <View style={{ flex: 1, minWidth: 0 }}>
              <IntervalBar values={bar} scale={bars.scale} height={26} />
            </View>
            <View style={{ width: 92 }}>
              <RowState row={row} size="note" />
            </View>
          </Row>
        ) : null}
      </Stack>
    </Touchable>
  );
});

function WideTable({ survey, rows, drafted, hrefOf, bars }: ChecklistListProps & { bars: Bars }) {
  const units = useUnits();
  const columns = useMemo(() => wideColumns({ survey, drafted, bars, units }), [survey, drafted, bars, units]);
  return <DataTable caption="Cables of the campaign" columns={columns} rows={rows} rowKey={(row) => row.key} hrefOf={hrefOf} />;
}

function wideColumns({
  survey,
  drafted,
  bars,
  units,
}: Pick<ChecklistListProps, 'survey' | 'drafted'> & { bars: Bars; units: Units }): Column<ChecklistRow>[] {
  const figures = { figures: true, align: 'right' } as const;
  return [
    { key: 'cable', header: 'Cable', cell: (row) => row.name, figures: true, align: 'left', sortBy: (row) => row.name },
    {
      key: 'mark',
      header: 'Painted mark',
      cell: (row) => row.entry.cable.paintedMark || '–',
      sortBy: (row) => row.entry.cable.paintedMark,
    },
    {
      key: 'tension',
      header: `Tension ${units.symbol('force')}, 95 %`,
      cell: (row) => tensionFigures(row, units) ?? '–',
      ...figures,
      sortBy: (row) => row.output?.tension ?? null,
    },
    {
      key: 'reference',
      header: survey.basis.referenceKind ? referenceWords[survey.basis.referenceKind] : 'Reference',
      cell: (row) => (row.decision.reference === null ? '–' : units.figure(row.decision.reference, 'force')),
      ...figures,
      sortBy: (row) => row.decision.reference,
    },
    {
      key: 'bar',
      header: `Interval on ${agreedInWords(survey, referenceWords)}`,
      cell: (row) => <Bar row={row} bars={bars} />,
      width: 320,
    },
    {
      key: 'state',
      header: 'Zone',
      cell: (row) => (drafted.has(row.key) ? <Tag tone="ochre">typed, not saved</Tag> : <RowState row={row} />),
      sortBy: (row) => (row.output ? zonesByUrgency.indexOf(row.decision.zone) : 100),
    },
    { key: 'kept', header: 'Estimate', cell: keptWords },
  ];
}

function Bar({ row, bars }: { row: ChecklistRow; bars: Bars }) {
  const bar = row.output ? bars.of(row) : null;
  return bar ? <IntervalBar values={bar} scale={bars.scale} /> : <Text tone="muted">–</Text>;
}

function keptWords(row: ChecklistRow): string {
  if (row.state !== 'measured') return '–';
  if (row.refusal) return row.refusal;
  return row.saved ? 'saved' : 'not saved yet';
}
