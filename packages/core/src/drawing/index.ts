/** Geometry of the product's drawings: plain numbers and paths, drawn by SVG in the app and by the PDF's own marks in the report. */
export {
  cablePlanes,
  type ElevationCable,
  type ElevationFigure,
  type ElevationInput,
  type ElevationLine,
  type ElevationPoint,
  elevation,
} from './elevation.ts';
export type { Figure, Mark, Pigment, Place, Stroke, TextFont } from './figure.ts';
export { type FitPlotCurve, type FitPlotPeak, fitPlot } from './fit-plot.ts';
export { type IntervalBarValues, type IntervalScale, intervalBar, sharedScale, shareOfReference } from './interval-bar.ts';
export { linearScale, roundStep, roundTicks, tickLabel } from './linear-scale.ts';
export type { PlotSize } from './plot-frame.ts';
export { type PlottedResidual, residualPlot } from './residual-plot.ts';
export { heardShare, type StringFigureOptions, stringFigure } from './string-figure.ts';
export { type DrawnZone, type ZoneStyle, zoneStyle } from './zone-style.ts';
