import { View } from 'react-native';
import { type ColourName, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';

/** A state in a word or two: "on this phone", "in check". */
export function Tag({
  children,
  tone = 'ink',
}: {
  children: string;
  tone?: Extract<ColourName, 'ink' | 'muted' | 'verdigris' | 'minium' | 'ochre'>;
}) {
  const colours = useColours();
  return (
    <View
      style={{
        alignSelf: 'flex-start',
        paddingHorizontal: space(2),
        borderRadius: radius,
        borderWidth: 1,
        borderColor: colours[tone],
        backgroundColor: colours.sheet,
      }}
    >
      <Text size="note" tone={tone}>
        {children}
      </Text>
    </View>
  );
}
