import { memo } from 'react';
import { View } from 'react-native';
import { Panel, Row, Stack, Text, Touchable } from '../../ui/index.ts';
import type { ChecklistRow } from './checklist-rows.ts';
import { RowFigures, RowState } from './row-state.tsx';

interface CableListProps {
  rows: readonly ChecklistRow[];
  currentKey: string;
  hrefOf: (row: ChecklistRow) => string;
}

/** The checklist beside the cable that is open, on a wide screen. */
export const CableList = memo(function CableList({ rows, currentKey, hrefOf }: CableListProps) {
  return (
    <View role="navigation" aria-label="Cables of the campaign" style={{ maxHeight: '80vh' as never, overflowY: 'auto' as never }}>
      <Panel gap={0}>
        {rows.map((row) => (
          <Touchable key={row.key} href={hrefOf(row)} label={`Cable ${row.name}, ${row.state}`} current={row.key === currentKey}>
            <Row justify="space-between" gap={2} wrap={false}>
              <Text figures strong>
                {row.name}
              </Text>
              <Stack gap={0} align="flex-end">
                <RowFigures row={row} size="note" />
                <RowState row={row} size="small" />
              </Stack>
            </Row>
          </Touchable>
        ))}
      </Panel>
    </View>
  );
});
