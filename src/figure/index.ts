// Figures as plain geometry, and geometry as SVG text. Curves are in SI with their axes; drawings are in CSS pixels.

export type { Box, Drawing, GroupItem, Item, Role, Run } from './geometry.ts';
export { drawSchematic } from './schematic.ts';
export type { LegEnd, LegKind, SchematicInput, StageLeg } from './stage-input.ts';
export type { SvgOptions } from './svg.ts';
export { escapeXml, svgText } from './svg.ts';
