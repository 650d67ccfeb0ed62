import type { ReactNode } from 'react';
import { Pressable } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { hairline, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import type { Column, DataTableProps } from './data-table.tsx';
import { Link } from './link.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

interface Sortable {
  getColumn: (key: string) => { getIsSorted: () => false | 'asc' | 'desc'; toggleSorting: () => void } | undefined;
}

interface Rows<Row> {
  getRowModel: () => { rows: { id: string; original: Row }[] };
}

const padding = `${space(2)}px ${space(3)}px`;
const orders = { asc: 'ascending', desc: 'descending' } as const;

export function Head<Row>({ table, columns }: { table: Sortable; columns: readonly Column<Row>[] }) {
  const colours = useColours();
  return (
    <thead>
      <tr>
        {columns.map((column) => {
          const sorted = table.getColumn(column.key)?.getIsSorted() || null;
          return (
            <th
              key={column.key}
              scope="col"
              aria-sort={column.sortBy ? (sorted ? orders[sorted] : 'none') : undefined}
              style={{
                padding,
                textAlign: alignOf(column),
                width: column.width,
                borderBottom: `${hairline}px solid ${colours.muted}`,
                fontWeight: 'normal',
              }}
            >
              {column.sortBy ? (
                <Pressable
                  role="button"
                  onPress={() => table.getColumn(column.key)?.toggleSorting()}
                  {...webProps({ 'aria-label': `Sort by ${column.header}` })}
                  style={{
                    minHeight: 28,
                    width: '100%',
                    flexDirection: 'row',
                    alignItems: 'center',
                    gap: 4,
                    justifyContent: alignOf(column) === 'right' ? 'flex-end' : 'flex-start',
                  }}
                >
                  <HeadText align={alignOf(column)}>{column.header}</HeadText>
                  <SortSign sorted={sorted} />
                </Pressable>
              ) : (
                <HeadText align={alignOf(column)}>{column.header}</HeadText>
              )}
            </th>
          );
        })}
      </tr>
    </thead>
  );
}

/** A small triangle: up for ascending, down for descending; `aria-sort` says it in words. */
function SortSign({ sorted }: { sorted: 'asc' | 'desc' | null }) {
  const colours = useColours();
  if (!sorted) return null;
  return (
    <Svg width={8} height={8} viewBox="0 0 8 8" aria-hidden>
      <Path d={sorted === 'asc' ? 'M4 1L8 7L0 7Z' : 'M4 7L8 1L0 1Z'} fill={colours.muted} />
    </Svg>
  );
}

function HeadText({ children, align }: { children: string; align: 'left' | 'right' }) {
  return (
    <Text size="note" tone="muted" align={align}>
      {children}
    </Text>
  );
}

export function Body<Row>({ table, columns, hrefOf, rowKey, currentKey }: DataTableProps<Row> & { table: Rows<Row> }) {
  const colours = useColours();
  return (
    <tbody>
      {table.getRowModel().rows.map(({ id, original }, index) => {
        const current = currentKey !== undefined && rowKey(original) === currentKey;
        const border = index === 0 ? undefined : `${hairline}px solid ${colours.line}`;
        return (
          <tr
            key={id}
            aria-current={current || undefined}
            style={current ? { background: colours.paper, boxShadow: `inset 4px 0 0 ${colours.verdigris}` } : undefined}
          >
            {columns.map((column, place) => {
              const edge = { padding, textAlign: alignOf(column), borderTop: border, verticalAlign: 'middle' } as const;
              return place === 0 ? (
                <th key={column.key} scope="row" style={{ ...edge, whiteSpace: 'nowrap', fontWeight: 'normal' }}>
                  <CellContent column={column} row={original} href={hrefOf?.(original)} strong />
                </th>
              ) : (
                <td key={column.key} style={{ ...edge, whiteSpace: column.figures ? 'nowrap' : undefined }}>
                  <CellContent column={column} row={original} />
                </td>
              );
            })}
          </tr>
        );
      })}
    </tbody>
  );
}

interface CellContentProps<Row> {
  column: Column<Row>;
  row: Row;
  href?: string | undefined;
  strong?: boolean;
}

export function CellContent<Row>({ column, row, href, strong }: CellContentProps<Row>) {
  const content: ReactNode = column.cell(row);
  const plain = typeof content === 'string' || typeof content === 'number';
  if (href !== undefined && plain) {
    return (
      <Link href={href} strong>
        {content}
      </Link>
    );
  }
  return plain ? (
    <Text figures={column.figures} strong={strong} align={alignOf(column)}>
      {content}
    </Text>
  ) : (
    content
  );
}

/** Figures stand under figures: right, unless said otherwise. */
export function alignOf<Row>(column: Column<Row>): 'left' | 'right' {
  return column.align ?? (column.figures ? 'right' : 'left');
}
