// Figures as plain geometry, and geometry as SVG text. Charts are in SI with their axes, true node differences for voltages
// and drain currents positive on both channels; drawings are in CSS pixels, y downwards.

export type { Axis } from './axis.ts';
export { createAxis, positionOn, valueOn } from './axis.ts';
export type { BarEnd, SpreadBar, SpreadInput } from './bar.ts';
export { spreadBar } from './bar.ts';
export type { Area, Chart, Curve, CurveRole, Mark, Post } from './chart.ts';
export type { Size } from './draw-chart.ts';
export { chartFrame, drawChart, stackCharts } from './draw-chart.ts';
export type { Box, Drawing, GroupItem, Item, Role, Run } from './geometry.ts';
export type { HistogramInput } from './histogram.ts';
export { histogramChart } from './histogram.ts';
export type { OutputDevice, OutputInput } from './output-plane.ts';
export { outputPlane } from './output-plane.ts';
export type { PlotInput, PlotSeries } from './plot.ts';
export { plotCharts } from './plot.ts';
export { drawSchematic } from './schematic.ts';
export type { LegEnd, LegKind, SchematicInput, StageLeg } from './stage-input.ts';
export type { StraightLine } from './straight-line.ts';
export type { SvgOptions } from './svg.ts';
export { escapeXml, svgText } from './svg.ts';
export type { DeviceLaw, OperatingPoint, PlaneDevice, TransferInput } from './transfer-plane.ts';
export { transferPlane } from './transfer-plane.ts';
