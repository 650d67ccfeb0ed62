import { useSyncExternalStore } from 'react';
import { View } from 'react-native';
import { subscribeToUpdates, takeUpdate, updateWaits } from '../../lib/service-worker.ts';
import { Button, Notice, Row, Text } from '../../ui/index.ts';

/** A newer version has come and waits for a good moment, which the person knows best. */
export function UpdatePrompt() {
  const waits = useSyncExternalStore(subscribeToUpdates, updateWaits);
  if (!waits) return null;
  return (
    <View role="region" aria-label="Update">
      <Notice>
        <Row justify="space-between">
          <Text>A newer version of Strandnote is ready. What you typed and saved stays.</Text>
          <Button onPress={takeUpdate}>Reload now</Button>
        </Row>
      </Notice>
    </View>
  );
}
