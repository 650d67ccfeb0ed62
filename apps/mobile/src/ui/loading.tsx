import { useEffect, useState } from 'react';
import { View } from 'react-native';
import { space } from '../theme/tokens.ts';
import { Text } from './text.tsx';
import { webProps } from './web-props.ts';

/** What comes at once needs no notice that it is coming; what does not come needs a reason. */
export function Loading({ what = 'Loading' }: { what?: string }) {
  const [stage, setStage] = useState<'silent' | 'coming' | 'late'>('silent');
  useEffect(() => {
    const coming = setTimeout(() => setStage('coming'), 200);
    const late = setTimeout(() => setStage('late'), 5000);
    return () => {
      clearTimeout(coming);
      clearTimeout(late);
    };
  }, []);
  return (
    <View {...webProps({ role: 'status' })} style={{ minHeight: 120, padding: space(4), justifyContent: 'center', gap: space(1) }}>
      {stage === 'silent' ? null : <Text tone="muted">{`${what}…`}</Text>}
      {stage === 'late' ? <Text tone="muted">{whyLate()}</Text> : null}
    </View>
  );
}

function whyLate(): string {
  return navigator.onLine
    ? 'The server has not answered yet. It is asked again.'
    : 'There is no connection, and this page was not kept on this phone. It comes as soon as there is one.';
}
