import { heardShare, stringFigure } from '@strandnote/core/drawing';
import { View } from 'react-native';
import { Figure } from './figure.tsx';

export interface StringFigureProps {
  mode: number;
  /** Place of the sensor as a share of the free length from the lower end; null where it is not known. */
  sensor?: number | null;
  width?: number;
  height?: number;
}

/** Mode n as its standing wave, with the sensor: near a node it cannot hear that mode. */
export function StringFigure({ mode, sensor = null, width = 140, height = 30 }: StringFigureProps) {
  return (
    <View role="img" aria-label={describe(mode, sensor)} style={{ width, height }}>
      <Figure figure={stringFigure({ mode, sensor, width, height })} />
    </View>
  );
}

function describe(mode: number, sensor: number | null): string {
  if (sensor === null) return `Mode ${mode}`;
  const heard = Math.round(100 * heardShare(mode, sensor));
  return `Mode ${mode}: the sensor feels ${heard} % of its largest displacement`;
}
