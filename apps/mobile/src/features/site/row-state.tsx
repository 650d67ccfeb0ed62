import { formatInterval, formatWithUncertainty } from '@strandnote/core';
import { type Units, useUnits } from '../../lib/units.tsx';
import type { FontSize } from '../../theme/tokens.ts';
import { Text } from '../../ui/index.ts';
import { zoneTone, zoneWords } from '../reports/zone-words.ts';
import type { ChecklistRow } from './checklist-rows.ts';

/** Where a cable stands, in words: its zone, or why it has none. */
export function stateWords(row: ChecklistRow): string {
  if (row.state === 'not measured') return `not measured: ${row.entry.notMeasuredReason}`;
  if (row.state === 'to measure') return 'to measure';
  return row.output === null ? 'cannot be estimated' : zoneWords[row.decision.zone];
}

export function RowState({ row, size }: { row: ChecklistRow; size?: FontSize }) {
  const judged = row.state === 'measured' && row.output !== null;
  const tone = judged ? zoneTone[row.decision.zone] : row.state === 'measured' ? 'minium' : 'muted';
  return (
    <Text strong={judged} tone={tone} align="right" size={size}>
      {stateWords(row)}
    </Text>
  );
}

/** "3 520 ± 110", or both bounds where only they may be given; null without a tension. */
export function tensionFigures({ output }: ChecklistRow, { system }: Units): string | null {
  if (!output) return null;
  if (output.boundsOnly !== null) {
    const { low, high } = formatInterval(output.interval95, 'force', system);
    return `${low} to ${high}`;
  }
  const { value, uncertainty } = formatWithUncertainty(output.tension, output.expanded.U, 'force', system);
  return `${value} \u00B1 ${uncertainty}`;
}

export function RowFigures({ row, size }: { row: ChecklistRow; size?: FontSize }) {
  const units = useUnits();
  const figures = tensionFigures(row, units);
  if (figures === null) return null;
  return (
    <Text figures size={size}>
      {`${figures} ${units.symbol('force')}`}
    </Text>
  );
}
