import { lazy, type ReactNode, Suspense } from 'react';
import { Loading } from './loading.tsx';

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

// The table machinery is a tenth of the app, and the pages before signing in show no table.
const View = lazy(async () => ({ default: (await import('./data-table-view.tsx')).DataTableView }));

/** A table on a wide screen; on a phone the same data, row by row. */
export function DataTable<Row>(props: DataTableProps<Row>) {
  return (
    <Suspense fallback={<Loading />}>
      <View {...(props as unknown as DataTableProps<unknown>)} />
    </Suspense>
  );
}
