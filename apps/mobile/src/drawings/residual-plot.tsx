import { type PlottedResidual, residualPlot } from '@strandnote/core/drawing';
import { Figure } from './figure.tsx';
import { Measured } from './measured.tsx';

export interface ResidualPlotProps {
  residuals: readonly PlottedResidual[];
  height?: number;
}

export function ResidualPlot({ residuals, height = 180 }: ResidualPlotProps) {
  const words = residuals.map(({ mode, residual }) => `mode ${mode} ${(100 * residual).toFixed(2)} %`).join(', ');
  return (
    <Measured label={`Residuals: ${words}`} minHeight={height}>
      {(width) => <Figure figure={residualPlot(residuals, { width, height })} />}
    </Measured>
  );
}
