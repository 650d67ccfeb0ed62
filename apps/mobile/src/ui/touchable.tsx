import type { ReactNode } from 'react';
import { Pressable, type ViewStyle } from 'react-native';
import { radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useLinkPress } from './link-press.ts';
import { useTargetSize } from './target-size.tsx';
import { webProps } from './web-props.ts';

export interface TouchableProps {
  children: ReactNode;
  /** What it is or does, in words: what is inside may be a drawing. */
  label: string;
  href?: string;
  onPress?: () => void;
  /** The one that is shown beside the list. */
  current?: boolean;
}

/** A whole row or drawing that opens something. */
export function Touchable({ children, label, href, onPress, current }: TouchableProps) {
  const colours = useColours();
  const minHeight = useTargetSize();
  const base: ViewStyle = {
    minHeight,
    justifyContent: 'center',
    paddingVertical: space(2),
    borderRadius: radius,
    paddingLeft: space(2),
    borderLeftWidth: 4,
    borderLeftColor: 'transparent',
  };
  const link = useLinkPress(href);
  return (
    <Pressable
      role={href ? 'link' : 'button'}
      onPress={onPress}
      {...link}
      {...webProps({ 'aria-label': label, 'aria-current': current || undefined })}
      style={(state) => [
        base,
        'hovered' in state && state.hovered === true && { backgroundColor: colours.wash },
        current && { borderLeftColor: colours.verdigris },
      ]}
    >
      {children}
    </Pressable>
  );
}
