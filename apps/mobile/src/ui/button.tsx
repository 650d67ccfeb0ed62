import { createContext, use, useId } from 'react';
import { Pressable, View, type ViewStyle } from 'react-native';
import { type ColourName, type Colours, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useLinkPress } from './link-press.ts';
import { useTargetSize } from './target-size.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export type ButtonKind = 'primary' | 'secondary' | 'quiet' | 'destructive';

export interface ButtonProps {
  /** What it does: "Save and go to W-08u". */
  children: string;
  onPress?: () => void;
  /** Goes to a place instead of doing something. */
  href?: string;
  kind?: ButtonKind;
  /** Why this cannot be done yet. The button stays where it is, does nothing, and says this beside itself. */
  why?: string | null;
  /** Under way: cannot be pressed again. */
  busy?: boolean;
  /** A fuller name for those who only hear it. */
  label?: string;
  /** As wide as its container. */
  wide?: boolean;
  /** Opens or closes something. */
  expanded?: boolean;
}

const WidthContext = createContext<'full' | 'own'>('own');

/** Whether the buttons inside take the width of their container. */
export const ButtonWidth = WidthContext;

export function Button({ children, onPress, href, kind = 'secondary', why, busy = false, label, wide, expanded }: ButtonProps) {
  const colours = useColours();
  const minHeight = useTargetSize() + (kind === 'primary' ? 4 : 0);
  const whyId = useId();
  const full = use(WidthContext) === 'full' || wide;
  const off = Boolean(why) || busy;
  const look = looks(colours)[kind];
  const web = webProps({
    'aria-disabled': off || undefined,
    'aria-busy': busy || undefined,
    'aria-describedby': why ? whyId : undefined,
    'aria-label': label,
    'aria-expanded': expanded,
  });
  const link = useLinkPress(off ? undefined : href);
  const pressable = (
    <Pressable
      role={href && !off ? 'link' : 'button'}
      onPress={off ? undefined : onPress}
      {...link}
      style={(state) => [
        base,
        full && { alignSelf: 'stretch' },
        { minHeight, backgroundColor: look.fill, borderColor: look.border },
        kind === 'quiet' && { paddingHorizontal: space(2) },
        isHovered(state) && !off && { backgroundColor: look.hover },
        state.pressed && !off && { opacity: 0.8 },
        off && { backgroundColor: colours.line, borderColor: colours.line },
      ]}
      {...web}
    >
      <Text strong={kind !== 'quiet'} tone={off ? 'ink' : look.text} align="center">
        {children}
      </Text>
    </Pressable>
  );
  return (
    <View style={[{ gap: space(1) }, full ? { alignSelf: 'stretch' } : { alignItems: 'flex-start' }]}>
      {pressable}
      {why ? (
        <Text id={whyId} size="note" tone="muted">
          {why}
        </Text>
      ) : null}
    </View>
  );
}

const base: ViewStyle = {
  justifyContent: 'center',
  alignItems: 'center',
  paddingHorizontal: space(5),
  paddingVertical: space(2),
  borderRadius: radius,
  borderWidth: 1.5,
};

/** React Native Web tells a Pressable's style when the pointer is over it; the types of React Native do not know. */
function isHovered(state: object): boolean {
  return 'hovered' in state && state.hovered === true;
}

function looks(colours: Colours): Record<ButtonKind, { fill: string; border: string; hover: string; text: ColourName }> {
  const clear = 'transparent';
  return {
    primary: { fill: colours.verdigris, border: colours.verdigris, hover: colours.verdigris, text: 'onVerdigris' },
    secondary: { fill: colours.sheet, border: colours.ink, hover: colours.wash, text: 'ink' },
    quiet: { fill: clear, border: clear, hover: colours.wash, text: 'verdigris' },
    destructive: { fill: colours.sheet, border: colours.minium, hover: colours.sheet, text: 'minium' },
  };
}
