// Figures as plain geometry, and geometry as SVG text. Charts are in SI with their axes, true node differences for voltages
// and drain currents positive on both channels; drawings are in CSS pixels, y downwards.

export { benchCharts } from './bench-plot.ts';
export { createAxis, positionOn, valueOn } from './axis.ts';
export type { SpreadBar, SpreadInput } from './bar.ts';
export { spreadBar } from './bar.ts';
export type { Chart, Curve, CurveRole } from './chart.ts';
export type { ChartTable } from './chart-readings.ts';
export { chartTable, readOut } from './chart-readings.ts';
export type { ChartLayers, Size } from './draw-chart.ts';
export { chartFrame, chartLayers, drawChart, stackCharts } from './draw-chart.ts';
export type {
  ArcsItem,
  Box,
  CircleItem,
  ClipItem,
  Drawing,
  GroupItem,
  Item,
  LineItem,
  RectItem,
  Role,
  Run,
  TextItem,
} from './geometry.ts';
export { histogramChart } from './histogram.ts';
export type { OutputDevice } from './output-plane.ts';
export { outputPlane } from './output-plane.ts';
export type { PlotInput } from './plot.ts';
export { plotCharts } from './plot.ts';
export { drawSchematic } from './schematic.ts';
export type { LegEnd, LegKind, SchematicInput, StageLeg } from './stage-input.ts';
export { typeset } from './labels.ts';
export { greekLetter, symbolName } from './symbol-name.ts';
export { deviceStages, planesOf } from './sheet-planes.ts';
export { sheetPlot } from './sheet-plot.ts';
export { plotBands, searchBands, wantedBands } from './plot-bands.ts';
export type { PlotBands } from './plot-bands.ts';
export { schematicOf } from './sheet-schematic.ts';
export type { Token } from './style.ts';
export { ROLE_STYLES, TOKENS } from './style.ts';
export type { SourceLeg } from './source-leg.ts';
export { sourceLeg } from './source-leg.ts';
export { escapeXml, svgText } from './svg.ts';
export { transferPlane } from './transfer-plane.ts';
