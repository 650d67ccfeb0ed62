import { stringFigure } from '@strandnote/core/drawing';
import { View } from 'react-native';
import { Figure } from './figure.tsx';

/** The mark of the product: the string figure of mode 2. The name stands beside it, so it is silent. */
export function Mark({ width = 34, height = 22 }: { width?: number; height?: number }) {
  return (
    <View aria-hidden style={{ width, height }}>
      <Figure figure={stringFigure({ mode: 2, width, height, lineWidth: 2, plain: 'verdigris' })} />
    </View>
  );
}
