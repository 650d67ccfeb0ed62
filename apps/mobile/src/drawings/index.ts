export { type DrawnCable, Elevation, type ElevationProps } from './elevation.tsx';
export { Figure } from './figure.tsx';
export { FitPlot, type FitPlotProps } from './fit-plot.tsx';
export { IntervalBar, type IntervalBarProps } from './interval-bar.tsx';
export { Mark } from './mark.tsx';
export { ResidualPlot, type ResidualPlotProps } from './residual-plot.tsx';
export { StringFigure, type StringFigureProps } from './string-figure.tsx';
