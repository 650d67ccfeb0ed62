import { useId } from 'react';
import { Pressable, View } from 'react-native';
import Svg, { Path } from 'react-native-svg';
import { type ColourName, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useTargetSize } from './target-size.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface CheckboxProps {
  label: string;
  value: boolean;
  onChange: (value: boolean) => void;
  hint?: string;
  error?: string | null;
  /** Why it cannot be ticked yet. */
  why?: string | null;
}

export function Checkbox({ label, value, onChange, hint, error, why }: CheckboxProps) {
  const minHeight = useTargetSize();
  const id = useId();
  const note = error ?? why ?? hint;
  const web = webProps({
    role: 'checkbox',
    'aria-checked': value,
    'aria-describedby': note ? id : undefined,
    'aria-invalid': error ? true : undefined,
    'aria-disabled': why ? true : undefined,
  });
  return (
    <View style={{ gap: space(1) }}>
      <Pressable
        {...web}
        onPress={why ? undefined : () => onChange(!value)}
        style={{ flexDirection: 'row', alignItems: 'center', gap: space(2), minHeight }}
      >
        <Box ticked={value} edge={error ? 'minium' : why ? 'muted' : value ? 'verdigris' : 'ink'} />
        <View style={{ flexShrink: 1 }}>
          <Text>{label}</Text>
        </View>
      </Pressable>
      {note ? (
        <Text id={id} size="note" tone={error ? 'minium' : 'muted'} strong={Boolean(error)}>
          {note}
        </Text>
      ) : null}
    </View>
  );
}

function Box({ ticked, edge }: { ticked: boolean; edge: ColourName }) {
  const colours = useColours();
  const backgroundColor = ticked ? colours.verdigris : colours.sheet;
  return (
    <View style={{ width: 22, height: 22, borderRadius: 3, borderWidth: 1.5, borderColor: colours[edge], backgroundColor }}>
      {ticked ? (
        <Svg width={19} height={19} viewBox="0 0 20 20" aria-hidden>
          <Path d="M4 10.5 8.5 15 16 5.5" fill="none" stroke={colours.onVerdigris} strokeWidth={2.2} />
        </Svg>
      ) : null}
    </View>
  );
}
