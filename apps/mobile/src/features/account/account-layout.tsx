import { Slot } from 'expo-router';
import { View } from 'react-native';
import { Mark } from '../../drawings/index.ts';
import { space } from '../../theme/tokens.ts';
import { Row, SkipLink, Text, useWide } from '../../ui/index.ts';

/** The frame of what happens outside a firm: the mark, and one column. */
export function AccountLayout() {
  const wide = useWide();
  return (
    <View style={{ flexGrow: 1, width: '100%', maxWidth: 720, alignSelf: 'center' }}>
      <SkipLink />
      <View role="banner" style={{ paddingHorizontal: space(wide ? 8 : 4), paddingTop: space(6) }}>
        <Row gap={3}>
          <Mark width={56} height={34} />
          <Text strong size="heading">
            strandnote
          </Text>
        </Row>
      </View>
      <Slot />
    </View>
  );
}
