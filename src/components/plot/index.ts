/** Plots drawn as SVG, complete without a script. */
export { Plot, type PlotProps } from './Plot';
export { axisLabel, domainOf, layoutPlot, valueAt, type PlotLayout } from './layout';
export { curveStyle, MARKER_PATHS, type CurveStyle, type MarkerShape } from './curve-style';
export { spreadLabels, type LabelWish, type SpreadOptions } from './spread';
export { textWidth } from './text-width';
export type { Pair, PlotAxis, PlotCurve, PlotData, PlotDots, PlotDuty } from './types';
