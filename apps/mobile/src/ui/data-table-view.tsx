import {
  createSortedRowModel,
  rowSortingFeature,
  type SortingState,
  sortFn_alphanumeric,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { useMemo, useState } from 'react';
import { View } from 'react-native';
import { hairline, radius } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { DataRows } from './data-rows.tsx';
import type { Column, DataTableProps } from './data-table.tsx';
import { Body, Head } from './data-table-parts.tsx';
import { useWide } from './use-wide.ts';

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric },
});

export function DataTableView<Row>(props: DataTableProps<Row>) {
  const { caption, captionShown, columns, rows, rowKey, empty } = props;
  const colours = useColours();
  const wide = useWide();
  const table = useSortedTable(columns, rows, rowKey);
  if (rows.length === 0 && empty) return <>{empty}</>;
  if (!wide) return <DataRows {...props} rows={table.getRowModel().rows.map((row) => row.original)} />;
  return (
    <View style={{ backgroundColor: colours.sheet, borderColor: colours.line, borderWidth: hairline, borderRadius: radius, minWidth: 0 }}>
      <div style={{ overflowX: 'auto' }}>
        <table style={{ width: '100%', borderCollapse: 'collapse' }}>
          <caption style={captionShown ? shownCaption(colours.muted) : hiddenCaption}>{caption}</caption>
          <Head table={table} columns={columns} />
          <Body {...props} table={table} />
        </table>
      </div>
    </View>
  );
}

function useSortedTable<Row>(columns: readonly Column<Row>[], rows: readonly Row[], rowKey: (row: Row) => string) {
  const [sorting, setSorting] = useState<SortingState>([]);
  // Of the row model only the order is used; what a cell shows is the business of its column.
  const definitions = useMemo(
    () =>
      columns.map((column) => ({
        id: column.key,
        accessorFn: (row: object) => column.sortBy?.(row as Row) ?? undefined,
        enableSorting: column.sortBy !== undefined,
        sortUndefined: 'last' as const,
        sortDescFirst: false,
      })),
    [columns],
  );
  const data = rows as readonly unknown[] as object[];
  const table = useTable({
    features,
    columns: definitions,
    data,
    getRowId: (row: object) => rowKey(row as Row),
    state: { sorting },
    onSortingChange: setSorting,
  });
  return table as unknown as {
    getRowModel: () => { rows: { id: string; original: Row }[] };
    getColumn: (key: string) => { getIsSorted: () => false | 'asc' | 'desc'; toggleSorting: () => void } | undefined;
  };
}

const hiddenCaption = {
  position: 'absolute',
  width: 1,
  height: 1,
  overflow: 'hidden',
  clipPath: 'inset(50%)',
  whiteSpace: 'nowrap',
} as const;

function shownCaption(color: string) {
  return {
    textAlign: 'left',
    padding: '12px 16px',
    color,
    fontFamily: 'AtkinsonHyperlegibleNext_400Regular, sans-serif',
    fontSize: 14,
  } as const;
}
