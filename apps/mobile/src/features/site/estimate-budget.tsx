import type { StoredEstimate } from '@strandnote/core/report-content';
import { formatNumber } from '@strandnote/core/units';
import { View } from 'react-native';
import { useColours } from '../../theme/use-theme.tsx';
import { Heading, Panel, Row, Stack, Text } from '../../ui/index.ts';

/** Where the uncertainty comes from, the largest source first. */
export function EstimateBudget({ output }: { output: StoredEstimate }) {
  return (
    <Panel>
      <Heading level={2}>Where the uncertainty comes from</Heading>
      <Text size="note" tone="muted">
        Standard uncertainty that each source adds to the tension, and its share of the variance.
      </Text>
      <Stack gap={3}>
        {output.budget.map((line) => (
          <BudgetBar key={line.source} line={line} />
        ))}
      </Stack>
    </Panel>
  );
}

function contributionWords(contribution: number): string {
  return contribution < 5e-5 ? 'under 0.01 %' : `${formatNumber(100 * contribution, 2)} %`;
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
        <Text figures>{contributionWords(line.contribution)}</Text>
      </Row>
      <View aria-hidden style={{ height: 8, backgroundColor: colours.line }}>
        <View style={{ height: 8, width: `${100 * share}%`, backgroundColor: colours.verdigris }} />
      </View>
      <Text size="note" tone="muted">{`${formatNumber(100 * share, 0)} % of the variance; ${details.join(', ')}`}</Text>
    </Stack>
  );
}
