import type { ReactNode } from 'react';
import { View } from 'react-native';
import { hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface NoticeProps {
  kind?: 'info' | 'caution' | 'problem';
  title?: string;
  /** A sentence or nodes of ui/. */
  children?: ReactNode;
  /** Read out at once when it appears. */
  alert?: boolean;
}

const tones = { info: 'verdigris', caution: 'ochre', problem: 'minium' } as const;

/** Something to know before going on, told apart by its words and its rule as well as by its colour. */
export function Notice({ kind = 'info', title, children, alert = kind === 'problem' }: NoticeProps) {
  const colours = useColours();
  const tone = tones[kind];
  return (
    <View
      {...webProps({ role: alert ? 'alert' : 'note' })}
      style={{
        gap: space(1),
        paddingVertical: space(3),
        paddingHorizontal: space(4),
        backgroundColor: colours.sheet,
        borderColor: colours.line,
        borderWidth: hairline,
        borderLeftWidth: 4,
        borderLeftColor: colours[tone],
        borderRadius: radius,
      }}
    >
      {title ? (
        <Text strong tone={tone}>
          {title}
        </Text>
      ) : null}
      {typeof children === 'string' ? <Text>{children}</Text> : children}
    </View>
  );
}
