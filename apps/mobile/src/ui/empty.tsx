import type { ReactNode } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Text } from './text.tsx';

export interface EmptyProps {
  /** What belongs here: "Structures whose cables you survey stand here." */
  children: string;
  /** The first step. */
  action?: ReactNode;
}

export function Empty({ children, action }: EmptyProps) {
  return (
    <View style={{ gap: space(4), paddingVertical: space(8), paddingHorizontal: space(4), alignItems: 'center' }}>
      <Text tone="muted" align="center">
        {children}
      </Text>
      {action}
    </View>
  );
}
