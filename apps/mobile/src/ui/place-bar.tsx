import { Pressable, View, type ViewStyle } from 'react-native';
import { hairline, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useLinkPress } from './link-press.ts';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface PlaceLink {
  label: string;
  href: string;
  current: boolean;
}

export const placeBarHeight = 56;

/** The places at the foot of a phone, each a word; the current one hangs from a heavy tick. */
export function PlaceBar({ places }: { places: readonly PlaceLink[] }) {
  const colours = useColours();
  const style = {
    position: 'sticky',
    bottom: 0,
    flexDirection: 'row',
    justifyContent: 'space-around',
    height: placeBarHeight,
    paddingHorizontal: space(1),
    backgroundColor: colours.sheet,
    borderTopWidth: hairline,
    borderTopColor: colours.line,
  };
  return (
    <View {...webProps({ role: 'navigation', 'aria-label': 'Places' })} style={style as unknown as ViewStyle}>
      {places.map((place) => (
        <BarItem key={place.href} place={place} />
      ))}
    </View>
  );
}

function BarItem({ place }: { place: PlaceLink }) {
  const colours = useColours();
  const link = useLinkPress(place.href);
  return (
    <Pressable role="link" {...link} {...webProps({ 'aria-current': place.current ? 'page' : undefined })} style={item}>
      <View style={{ height: 4, width: 32, backgroundColor: place.current ? colours.verdigris : 'transparent' }} />
      <View style={{ flex: 1, justifyContent: 'center' }}>
        <Text size="note" strong={place.current} tone={place.current ? 'verdigris' : 'muted'}>
          {place.label}
        </Text>
      </View>
    </Pressable>
  );
}

const item: ViewStyle = { alignItems: 'center', minWidth: 44, paddingHorizontal: 2, paddingBottom: 4 };
