import {
  createSortedRowModel,
  rowSortingFeature,
  type SortingState,
  sortFn_alphanumeric,
  tableFeatures,
  useTable,
} from '@tanstack/react-table';
import { type ReactNode, useMemo, useState } from 'react';
import { View } from 'react-native';
import { hairline, radius } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { DataRows } from './data-rows.tsx';
import { Body, Head } from './data-table-parts.tsx';
import { useWide } from './use-wide.ts';

export interface Column<Row> {
  key: string;
  header: string;
  /** A string is set as text, or as figures with `figures`; anything else stands as it is. */
  cell: (row: Row) => ReactNode;
  figures?: boolean;
  align?: 'left' | 'right';
  /** Width (px) that a drawing needs; columns of text take what they need. */
  width?: number;
  /** Makes the column sortable. */
  sortBy?: (row: Row) => string | number | null;
  /** In the rows of a phone: the title, a word to its right, a line with its header, a drawing across, or nothing. */
  onPhone?: 'title' | 'aside' | 'line' | 'across' | 'none';
}

export interface DataTableProps<Row> {
  /** What the table shows; read out before it, and printed above it with `captionShown`. */
  caption: string;
  captionShown?: boolean;
  /** Keep both stable (module scope or useMemo): a new array sorts everything again. */
  columns: readonly Column<Row>[];
  rows: readonly Row[];
  rowKey: (row: Row) => string;
  /** Where a row leads: its first column becomes the link. */
  hrefOf?: (row: Row) => string;
  /** The row that is shown beside the table. */
  currentKey?: string | null;
  /** What stands in place of rows when there are none. */
  empty?: ReactNode;
}

const features = tableFeatures({
  rowSortingFeature,
  sortedRowModel: createSortedRowModel(),
  sortFns: { alphanumeric: sortFn_alphanumeric },
});

/** A table on a wide screen; on a phone the same data, row by row. */
export function DataTable<Row>(props: DataTableProps<Row>) {
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
