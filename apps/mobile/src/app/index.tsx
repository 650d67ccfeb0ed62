import { Text } from 'react-native';

export default function Start() {
  return <Text>Strandnote</Text>;
}
