import { type IntervalBarValues, type IntervalScale, intervalBar } from '@strandnote/core/drawing';
import { Figure } from './figure.tsx';
import { Measured } from './measured.tsx';

export interface IntervalBarProps {
  /** SI, or shares of the reference (`shareOfReference`). */
  values: IntervalBarValues;
  /** One scale for a whole column: `sharedScale(rows)`. */
  scale: IntervalScale;
  height?: number;
  /** What it shows, in words: "3 520 ± 110 kN, within 3 325 to 3 675 kN". Left out where the row says it already. */
  label?: string;
}

export function IntervalBar({ values, scale, height = 34, label }: IntervalBarProps) {
  return (
    <Measured label={label} minHeight={height}>
      {(width) => <Figure figure={intervalBar(values, scale, { width, height })} />}
    </Measured>
  );
}
