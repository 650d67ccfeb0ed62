import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

/** Words first after a moment: what comes at once needs no notice that it is coming. */
export function Loading({ what = 'Loading' }: { what?: string }) {
  const [late, setLate] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setLate(true), 200);
    return () => clearTimeout(timer);
  }, []);
  return (
    <View {...webProps({ role: 'status' })} style={{ minHeight: 120, padding: space(4), justifyContent: 'center' }}>
      {late ? <Text tone="muted">{`${what}…`}</Text> : null}
    </View>
  );
}
