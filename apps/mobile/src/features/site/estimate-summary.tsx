import type { CampaignDetail } from '@strandnote/api/contract';
import { formatInterval } from '@strandnote/core';
import { sharedScale } from '@strandnote/core/drawing';
import type { StoredEstimate } from '@strandnote/core/report-content';
import { IntervalBar } from '../../drawings/index.ts';
import { useUnits } from '../../lib/units.tsx';
import { Definitions, Panel, QuantitySymbol, Row, Text } from '../../ui/index.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { RowState, tensionFigures } from './row-state.tsx';
import { referenceWords } from './site-words.ts';
import { agreedInWords } from './survey-decision.ts';

interface EstimateSummaryProps {
  survey: CampaignDetail;
  row: ChecklistRow;
  output: StoredEstimate;
}

export function EstimateSummary({ survey, row, output }: EstimateSummaryProps) {
  const units = useUnits();
  const { low, high, symbol } = formatInterval(output.interval95, 'force', units.system);
  const scale = sharedScale([row.bar]);
  const { xi, lambdaSquared, boundaryLayer } = output.dimensionless;
  return (
    <Panel>
      <Row justify="space-between" align="flex-end">
        <Text strong size="figure">
          {tensionFigures(row, units)}
          <Text size="lead">{` ${symbol}`}</Text>
        </Text>
        <RowState row={row} size="lead" />
      </Row>
      <IntervalBar values={row.bar} scale={scale} height={44} label={`Interval ${low} to ${high} ${symbol}`} />
      <Text size="note" tone="muted">{`${agreedInWords(survey, referenceWords)}. ${row.decision.reason}`}</Text>
      <Definitions
        items={[
          { term: 'Interval, 95 %', value: `${low} to ${high} ${symbol}`, figures: true },
          { term: 'Standard uncertainty', value: units.show(output.standardUncertainty, 'force', 1), figures: true },
          {
            term: 'Both ends hinged / both clamped',
            value: `${units.figure(output.bracket.hinged, 'force')} / ${units.show(output.bracket.clamped, 'force')}`,
            figures: true,
          },
          ...(output.bendingStiffness
            ? [
                {
                  term: 'Bending stiffness',
                  value: units.show(output.bendingStiffness.value, 'bending-stiffness'),
                  note: `u ${units.show(output.bendingStiffness.standardUncertainty, 'bending-stiffness')}`,
                  figures: true,
                },
              ]
            : []),
          { term: 'Fixity of the ends', value: output.fixity.map(fixityWords).join(', '), note: 'lower, upper; 0 hinged, 1 clamped' },
          {
            term: 'String-likeness and sag',
            value: (
              <Text>
                <QuantitySymbol>ξ</QuantitySymbol>
                {` = ${xi.toPrecision(3)}`}
                {lambdaSquared === null ? '' : ', '}
                {lambdaSquared === null ? null : <QuantitySymbol>λ²</QuantitySymbol>}
                {lambdaSquared === null ? '' : ` = ${lambdaSquared.toPrecision(2)}`}
              </Text>
            ),
            note: `boundary layer ${units.show(boundaryLayer, 'length')}`,
          },
        ]}
      />
    </Panel>
  );
}

function fixityWords({ mean, standardDeviation }: StoredEstimate['fixity'][number]): string {
  return `${mean.toFixed(2)} \u00B1 ${standardDeviation.toFixed(2)}`;
}
