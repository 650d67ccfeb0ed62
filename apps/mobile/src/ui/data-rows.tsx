import { View } from 'react-native';
import { hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import type { Column, DataTableProps } from './data-table.tsx';
import { CellContent } from './data-table-parts.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

/** The rows of a table where there is no room for columns: a title, a word beside it, and lines under it. */
export function DataRows<Row>({ caption, captionShown, columns, rows, rowKey, hrefOf }: DataTableProps<Row>) {
  const colours = useColours();
  const style = { backgroundColor: colours.sheet, borderColor: colours.line, borderWidth: hairline, borderRadius: radius };
  return (
    <View style={{ gap: space(2) }}>
      {captionShown ? (
        <Text size="note" tone="muted">
          {caption}
        </Text>
      ) : null}
      <View {...webProps({ role: 'list', 'aria-label': caption })} style={style}>
        {rows.map((row, index) => (
          <View
            key={rowKey(row)}
            role="listitem"
            style={{ padding: space(4), gap: space(1), borderTopWidth: index === 0 ? 0 : hairline, borderTopColor: colours.line }}
          >
            <PhoneRow row={row} columns={columns} href={hrefOf?.(row)} />
          </View>
        ))}
      </View>
    </View>
  );
}

function PhoneRow<Row>({ row, columns, href }: { row: Row; columns: readonly Column<Row>[]; href: string | undefined }) {
  const placed = (place: Column<Row>['onPhone']) => columns.filter((column, index) => placeOf(column, index) === place);
  return (
    <>
      <View style={{ flexDirection: 'row', justifyContent: 'space-between', alignItems: 'center', gap: space(3) }}>
        <View style={{ flexShrink: 1, minWidth: 0 }}>
          {placed('title').map((column) => (
            <CellContent key={column.key} column={column} row={row} href={href} strong />
          ))}
        </View>
        <View style={{ alignItems: 'flex-end', flexShrink: 0, maxWidth: '60%' }}>
          {placed('aside').map((column) => (
            <CellContent key={column.key} column={column} row={row} />
          ))}
        </View>
      </View>
      {placed('across').map((column) => (
        <CellContent key={column.key} column={column} row={row} />
      ))}
      {placed('line').map((column) => (
        <View key={column.key} style={{ flexDirection: 'row', justifyContent: 'space-between', gap: space(3) }}>
          <Text size="note" tone="muted">
            {column.header}
          </Text>
          <View style={{ flexShrink: 1, alignItems: 'flex-end' }}>
            <CellContent column={{ ...column, align: 'right' }} row={row} />
          </View>
        </View>
      ))}
    </>
  );
}

function placeOf<Row>(column: Column<Row>, index: number): Column<Row>['onPhone'] {
  return column.onPhone ?? (index === 0 ? 'title' : 'line');
}
