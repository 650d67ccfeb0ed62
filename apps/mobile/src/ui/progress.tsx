import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface ProgressProps {
  done: number;
  of: number;
  /** What the figures mean: "51 of 56 looked at, 1 remark open". */
  label: string;
}

/** How far something has come: a bar, with the same in words. */
export function Progress({ done, of, label }: ProgressProps) {
  const colours = useColours();
  const share = of > 0 ? Math.min(1, Math.max(0, done / of)) : 0;
  const web = webProps({ role: 'progressbar', 'aria-label': label, 'aria-valuemin': 0, 'aria-valuemax': of, 'aria-valuenow': done });
  return (
    <View style={{ gap: space(1), minWidth: 160, flexShrink: 1 }}>
      <Text size="note" tone="muted">
        {label}
      </Text>
      <View {...web} style={{ height: 8, backgroundColor: colours.line, overflow: 'hidden' }}>
        <View style={{ height: 8, width: `${share * 100}%`, backgroundColor: colours.verdigris }} />
      </View>
    </View>
  );
}
