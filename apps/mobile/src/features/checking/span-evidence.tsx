import { estimateTension } from '@strandnote/core';
import { sharedScale } from '@strandnote/core/drawing';
import type { FrozenPeak } from '@strandnote/core/report-content';
import { formatNumber } from '@strandnote/core/units';
import { type ReactNode, useMemo, useState } from 'react';
import { FitPlot, IntervalBar, ResidualPlot } from '../../drawings/index.ts';
import { showTension } from '../../lib/show-tension.ts';
import { type Units, useUnits } from '../../lib/units.tsx';
import { Button, type Column, DataTable, Definitions, Heading, Notice, Row, Stack, Text } from '../../ui/index.ts';
import { inputDefinitions } from '../reports/input-words.ts';
import type { ResultRow } from '../reports/result-rows.ts';
import { zoneTone, zoneWords } from '../reports/zone-words.ts';

type Estimate = NonNullable<ResultRow['span']['estimate']>;

/** What speaks for the tension of a span: inputs and sources, peaks and residuals, models side by side, and a recomputation. */
export function SpanEvidence({ row, heading }: { row: ResultRow; heading: string | null }) {
  const units = useUnits();
  const { span } = row;
  const estimate = span.estimate;
  return (
    <Stack gap={4}>
      {heading ? <Heading level={3}>{heading}</Heading> : null}
      <Row justify="space-between">
        {estimate ? (
          <Text size="title" strong figures>
            {`${showTension(estimate.output, units)} ${units.symbol('force')}`}
          </Text>
        ) : null}
        <Text strong tone={zoneTone[row.zone]}>
          {zoneWords[row.zone]}
        </Text>
      </Row>
      <Text tone="muted">{span.decision.reason}</Text>
      {estimate ? (
        <IntervalBar values={row.bar} scale={sharedScale([row.bar])} label="Interval, bracket of end conditions and limits" />
      ) : null}
      {row.warnings.map((warning) => (
        <Notice key={warning.code + warning.message} kind="caution">
          {warning.message}
        </Notice>
      ))}
      {estimate ? <Fit estimate={estimate} peaks={span.measurement?.peaks ?? []} /> : null}
      <Heading level={3} size="body">
        Inputs
      </Heading>
      <Definitions items={inputDefinitions(span, units)} />
    </Stack>
  );
}

function Fit({ estimate, peaks }: { estimate: Estimate; peaks: readonly FrozenPeak[] }) {
  const units = useUnits();
  const { output } = estimate;
  const fitted = output.residuals.map((residual) => ({ mode: residual.mode, frequency: residual.fitted }));
  return (
    <>
      <FitPlot peaks={peaks} curves={[{ name: 'fitted model', values: fitted }]} />
      <ResidualPlot residuals={output.residuals.map(({ mode, relative }) => ({ mode, residual: relative, used: true }))} />
      <Heading level={3} size="body">
        Peaks
      </Heading>
      <PeaksTable estimate={estimate} peaks={peaks} />
      <Heading level={3} size="body">
        Models side by side
      </Heading>
      <Definitions
        items={output.models.map((model) => ({
          term: model.name,
          value: units.show(model.tension, 'force'),
          ...(model.note ? { note: model.note } : {}),
          figures: true,
        }))}
      />
      <Text>{`Both ends hinged ${units.show(output.bracket.hinged, 'force')}, both clamped ${units.show(output.bracket.clamped, 'force')}.`}</Text>
      <Recompute estimate={estimate} units={units} />
    </>
  );
}

const peakColumns: Column<{ key: string; cells: string[] }>[] = ['Mode', 'Read, Hz', 'Fitted, Hz', 'Residual', 'Use'].map(
  (header, index) => ({
    key: header,
    header,
    cell: (row): ReactNode => row.cells[index] ?? '',
    figures: index < 4,
    align: index === 4 ? 'left' : 'right',
    onPhone: index === 0 ? 'title' : 'line',
  }),
);

function PeaksTable({ estimate, peaks }: { estimate: Estimate; peaks: readonly FrozenPeak[] }) {
  const rows = useMemo(
    () =>
      peaks.map((peak, index) => {
        const residual = peak.used ? estimate.output.residuals.find(({ mode }) => mode === peak.mode) : undefined;
        return {
          key: String(index),
          cells: [
            String(peak.mode),
            formatNumber(peak.frequency, 3),
            residual ? formatNumber(residual.fitted, 3) : '–',
            residual ? `${formatNumber(100 * residual.relative, 2)} %` : '–',
            peak.used ? 'used' : `set aside: ${peak.setAsideReason ?? ''}`,
          ],
        };
      }),
    [estimate, peaks],
  );
  return <DataTable caption="Modal peaks with their residuals" columns={peakColumns} rows={rows} rowKey={(row) => row.key} />;
}

/** Runs the fit again on this device, from the frozen inputs, and says whether the printed tension comes out. */
function Recompute({ estimate, units }: { estimate: Estimate; units: Units }) {
  const [verdict, setVerdict] = useState<{ same: boolean; words: string } | null>(null);
  const recompute = () => {
    const again = estimateTension(estimate.input.cable, estimate.input.peaks, estimate.input.options);
    const difference = Math.abs(again.tension / estimate.output.tension - 1);
    const shown = units.show(again.tension, 'force');
    setVerdict(
      difference < 1e-9
        ? { same: true, words: `Recomputed from the frozen inputs on this device: ${shown}, the same.` }
        : { same: false, words: `Recomputed with this engine: ${shown}, which differs by ${(100 * difference).toPrecision(2)} %.` },
    );
  };
  return (
    <Stack gap={2}>
      <Row>
        <Button onPress={recompute}>Recompute</Button>
        <Text size="note" tone="muted">{`Engine ${estimate.engineVersion}`}</Text>
      </Row>
      {verdict ? (
        <Notice kind={verdict.same ? 'info' : 'problem'} alert>
          {verdict.words}
        </Notice>
      ) : null}
    </Stack>
  );
}
