// From a stage of a sheet to what its schematic is drawn from: numbers become words, failing checks mark the
// symbols they name.

import { CURRENT, formatValue, VOLTAGE } from '../quantity/index.ts';
import type { SheetView, StageReading } from '../sheet/index.ts';
import type { LegEnd, SchematicInput, StageLeg } from './stage-input.ts';

/** What `drawSchematic` takes, with voltages and current where the stage is solved. */
export function schematicOf(stage: StageReading, sheet: SheetView): SchematicInput {
  const failing = new Set(
    sheet
      .cells()
      .filter(({ check }) => check?.holds === false)
      .flatMap(({ uses }) => uses),
  );
  return {
    name: stage.name,
    channel: stage.channel > 0 ? 'n' : 'p',
    family: stage.family,
    enhancement: stage.enhancement,
    fetName: stage.fetName,
    fetCell: stage.fetCell,
    nodes: stage.nodes,
    legs: stage.legs.map((leg): StageLeg => {
      const { from, kind, label, value, type, reversed, to, cell } = leg;
      const words = value === null || type === null || Number.isNaN(value) ? '' : inWords(value, type);
      const fails = cell !== null && failing.has(cell);
      return { from, kind, label, value: words, reversed, to: endOf(to), cell, fails };
    }),
    voltages: Object.fromEntries([...stage.voltages].map(([node, volts]) => [node, formatValue(volts, VOLTAGE).text])),
    current: stage.current === null ? null : formatValue(stage.current, CURRENT).text,
    output: stage.output,
  };
}

function endOf({ kind, name, volts }: StageReading['legs'][number]['to']): LegEnd {
  const known = volts !== null && Number.isFinite(volts);
  // `0 V` and `15 V` say themselves what they are.
  const isNumber = /^[-−+.\d]/.test(name);
  return { kind, name, volts: known ? volts : null, value: known && !isNumber ? inWords(volts, VOLTAGE) : '' };
}

/** Up to four digits, none that say nothing: 3.3 kΩ, 14.25 V. */
function inWords(value: number, kind: typeof VOLTAGE): string {
  return formatValue(value, kind, { digits: 4, zeros: 'drop' }).text;
}
