import { type FitPlotCurve, type FitPlotPeak, fitPlot } from '@strandnote/core/drawing';
import { Figure } from './figure.tsx';
import { Measured } from './measured.tsx';

export interface FitPlotProps {
  peaks: readonly FitPlotPeak[];
  curves: readonly FitPlotCurve[];
  height?: number;
}

export function FitPlot({ peaks, curves, height = 240 }: FitPlotProps) {
  const names = curves.map((curve) => curve.name).join(', ');
  const label = `Square of frequency over mode against the square of the mode: ${peaks.length} peaks${names ? `; models: ${names}` : ''}`;
  return (
    <Measured label={label} minHeight={height}>
      {(width) => <Figure figure={fitPlot(peaks, curves, { width, height })} />}
    </Measured>
  );
}
