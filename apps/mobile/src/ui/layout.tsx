import type { ReactNode } from 'react';
import { View, type ViewStyle } from 'react-native';
import { hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useWide } from './use-wide.ts';

interface StackProps {
  children: ReactNode;
  /** Steps of 4 px between the children. */
  gap?: number;
  align?: ViewStyle['alignItems'];
  /** Takes the width that is left in a Row. */
  grow?: boolean;
}

/** One under the other. */
export function Stack({ children, gap = 4, align, grow }: StackProps) {
  return (
    <View style={[{ gap: space(gap), minWidth: 0, flexShrink: 1 }, align && { alignItems: align }, grow && { flex: 1 }]}>{children}</View>
  );
}

interface RowProps extends StackProps {
  justify?: ViewStyle['justifyContent'];
  /** Goes on in a second line where the width does not suffice; on unless said otherwise. */
  wrap?: boolean;
}

/** Side by side. */
export function Row({ children, gap = 3, align = 'center', justify, wrap = true, grow }: RowProps) {
  const style: ViewStyle = {
    flexDirection: 'row',
    flexWrap: wrap ? 'wrap' : 'nowrap',
    columnGap: space(gap),
    rowGap: space(2),
    minWidth: 0,
    flexShrink: 1,
  };
  return <View style={[style, { alignItems: align }, justify && { justifyContent: justify }, grow && { flex: 1 }]}>{children}</View>;
}

interface ColumnsProps {
  children: ReactNode[];
  /** Widths as shares, one for each child; alike if left out. */
  shares?: number[];
  gap?: number;
}

/** Side by side on a wide screen, one under the other on a phone. */
export function Columns({ children, shares, gap = 6 }: ColumnsProps) {
  const wide = useWide();
  if (!wide) return <Stack gap={gap}>{children}</Stack>;
  return (
    <View style={{ flexDirection: 'row', gap: space(gap), alignItems: 'flex-start' }}>
      {children.map((child, index) => (
        // The columns of a screen are fixed, so their place is their name.
        // biome-ignore lint/suspicious/noArrayIndexKey: see above
        <View key={index} style={{ flexGrow: shares?.[index] ?? 1, flexShrink: 1, flexBasis: 0, minWidth: 0 }}>
          {child}
        </View>
      ))}
    </View>
  );
}

interface PanelProps {
  children: ReactNode;
  /** Without the inner space: the children go from edge to edge. */
  flush?: boolean;
  gap?: number;
}

/** A sheet on the paper: what belongs together, inside one hairline. */
export function Panel({ children, flush, gap = 4 }: PanelProps) {
  const colours = useColours();
  const wide = useWide();
  const padding = flush ? 0 : space(wide ? 5 : 4);
  const style: ViewStyle = { backgroundColor: colours.sheet, borderColor: colours.line, borderWidth: hairline, borderRadius: radius };
  return <View style={[style, { padding, gap: flush ? 0 : space(gap) }]}>{children}</View>;
}

/** A hairline across. */
export function Rule() {
  return <View role="presentation" style={{ height: hairline, backgroundColor: useColours().line, alignSelf: 'stretch' }} />;
}
