import { memo, useEffect, useRef } from 'react';
import { View, type ViewStyle } from 'react-native';
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
  const list = useRef<View>(null);
  // biome-ignore lint/correctness/useExhaustiveDependencies: the current row is what it answers to
  useEffect(() => {
    const element = list.current as unknown as HTMLElement | null;
    const current = element?.querySelector<HTMLElement>(`[aria-current]`);
    // Not scrollIntoView: that would move the page as well.
    if (element && current) element.scrollTop = current.offsetTop - element.clientHeight / 2;
  }, [currentKey]);
  return (
    <View ref={list} role="navigation" aria-label="Cables of the campaign" style={staysInSight}>
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

const staysInSight = { position: 'sticky', top: 16, maxHeight: 'calc(100vh - 32px)', overflowY: 'auto' } as unknown as ViewStyle;
