import type { StoredEstimate } from '@strandnote/core/report-content';
import { View } from 'react-native';
import { formatNumber } from '../../lib/display-units.ts';
import { useColours } from '../../theme/use-theme.tsx';
import { Heading, Panel, Row, Stack, Text } from '../../ui/index.ts';

/** Where the uncertainty comes from, the largest source first. */
export function EstimateBudget({ output }: { output: StoredEstimate }) {
  return (
    <Panel>
      <Heading level={2}>Where the uncertainty comes from</Heading>
      <Stack gap={3}>
        {output.budget.map((line) => (
          <BudgetBar key={line.source} line={line} />
        ))}
      </Stack>
    </Panel>
  );
}

function BudgetBar({ line }: { line: StoredEstimate['budget'][number] }) {
  const colours = useColours();
  const share = Math.max(0, Math.min(1, line.shareOfVariance));
  const details = [
    line.relative === null ? null : `u ${formatNumber(100 * line.relative, 2)} %`,
    line.sensitivity === null ? null : `sensitivity ${formatNumber(line.sensitivity, 2)}`,
    line.distribution,
  ].filter((word) => word !== null);
  return (
    <Stack gap={1}>
      <Row justify="space-between" gap={3}>
        <Text>{line.label}</Text>
        <Text figures>{`${formatNumber(100 * line.contribution, 2)} % of the tension`}</Text>
      </Row>
      <View aria-hidden style={{ height: 8, backgroundColor: colours.line }}>
        <View style={{ height: 8, width: `${100 * share}%`, backgroundColor: colours.verdigris }} />
      </View>
      <Text size="note" tone="muted">{`${formatNumber(100 * share, 0)} % of the variance; ${details.join(', ')}`}</Text>
    </Stack>
  );
}
