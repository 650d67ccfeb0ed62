import { View } from 'react-native';
import { hairline, radius, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { Text } from './text.tsx';
import { useWide } from './use-wide.ts';

/** A key that does something here, with what it does. Shown where there is a keyboard to press it on. */
export function KeyHint({ keys, children }: { keys: string[]; children: string }) {
  const colours = useColours();
  if (!useWide()) return null;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space(1) }}>
      {keys.map((key) => (
        <View
          key={key}
          style={{
            borderWidth: hairline,
            borderColor: colours.muted,
            borderRadius: radius,
            paddingHorizontal: 6,
            backgroundColor: colours.sheet,
          }}
        >
          <Text size="small" figures>
            {key}
          </Text>
        </View>
      ))}
      <Text size="small" tone="muted">
        {children}
      </Text>
    </View>
  );
}
