import type { ReactNode } from 'react';
import { Pressable, View, type ViewStyle } from 'react-native';
import { hairline, space } from '../theme/tokens.ts';
import { useColours } from '../theme/use-theme.tsx';
import { useLinkPress } from './link-press.ts';
import type { PlaceLink } from './place-bar.tsx';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

export interface PlaceRailProps {
  places: readonly PlaceLink[];
  /** The mark and the name. */
  head: ReactNode;
  /** The firm, the person, what waits to be sent. */
  foot: ReactNode;
}

/** The places at the left of a wide screen. */
export function PlaceRail({ places, head, foot }: PlaceRailProps) {
  const colours = useColours();
  const style = {
    position: 'sticky',
    top: 0,
    width: 208,
    height: '100dvh',
    flexShrink: 0,
    backgroundColor: colours.sheet,
    borderRightWidth: hairline,
    borderRightColor: colours.line,
  };
  return (
    <View style={style as unknown as ViewStyle}>
      <View role="banner" style={{ padding: space(5), paddingBottom: space(6) }}>
        {head}
      </View>
      <View {...webProps({ role: 'navigation', 'aria-label': 'Places' })} style={{ flexGrow: 1 }}>
        {places.map((place) => (
          <RailItem key={place.href} place={place} />
        ))}
      </View>
      <View role="contentinfo" style={{ padding: space(5), gap: space(2) }}>
        {foot}
      </View>
    </View>
  );
}

function RailItem({ place }: { place: PlaceLink }) {
  const colours = useColours();
  const link = useLinkPress(place.href);
  return (
    <Pressable
      role="link"
      {...link}
      {...webProps({ 'aria-current': place.current ? 'page' : undefined })}
      style={(state) => [
        railItem,
        place.current && { backgroundColor: colours.wash, borderLeftColor: colours.verdigris },
        'hovered' in state && Boolean(state.hovered) && { backgroundColor: colours.wash },
      ]}
    >
      <Text strong={place.current} tone={place.current ? 'verdigris' : 'ink'}>
        {place.label}
      </Text>
    </Pressable>
  );
}

const railItem: ViewStyle = {
  minHeight: 48,
  justifyContent: 'center',
  paddingLeft: space(4),
  borderLeftWidth: 4,
  borderLeftColor: 'transparent',
};
