// From a solved stage of a sheet to its two planes.

import type { Sheet, SheetView, StageReading } from '../sheet/index.ts';
import { slotsOf } from '../spread/index.ts';
import type { SheetSpread } from '../spread/index.ts';
import type { Chart } from './chart.ts';
import type { OutputDevice } from './output-plane.ts';
import { outputPlane } from './output-plane.ts';
import { requirementsOf } from './requirements.ts';
import type { StraightLine } from './straight-line.ts';
import { transferPlane } from './transfer-plane.ts';

type LabelledLine = StraightLine & { readonly label: string };

/** How near a resistor must be to the slope of a line to be named on it. */
const SAME_SLOPE = 1e-9;

/** Transfer and output plane of a stage, with further devices in it beside its own; null where it is not solved. */
export function planesOf(
  stage: StageReading,
  sheet: SheetView,
  others: readonly { readonly role: 'low' | 'high'; readonly label: string; readonly stage: StageReading }[] = [],
): { readonly transfer: Chart; readonly output: Chart } | null {
  const { name, q, threshold, law, lines } = stage;
  if (q === null || threshold === null) return null;
  const channel = stage.channel > 0 ? 'n' : 'p';
  const forced = (label: string): LabelledLine => ({ volts: 0, ohms: Infinity, amps: q.id, label });
  // The gate's leakage moves both lines a little: they are drawn as they stand with the leakage at Q.
  const lineThrough = (volts: number, ohms: number, label: string): LabelledLine => {
    return { volts: volts + stage.channel * ohms * q.id, ohms, amps: q.id, label };
  };
  const bias = lines
    ? lineThrough(q.vgs, lines.R_m, slopeLabel('bias line', lines.R_m, stage))
    : forced('forced current');
  const load = lines
    ? lineThrough(q.vds, lines.R_L, slopeLabel('load line', lines.R_L, stage))
    : forced('forced current');
  const devices: OutputDevice[] = [{ role: 'nominal', label: 'nominal', law, threshold, q, load }];
  for (const other of others) {
    const { q: at, threshold: opens, law: itsLaw } = other.stage;
    if (at === null || opens === null) continue;
    devices.push({
      role: other.role,
      label: other.label,
      law: itsLaw,
      threshold: opens,
      q: at,
      load: { ...load, label: '' },
    });
  }
  return {
    transfer: transferPlane({ name, channel, devices, bias }),
    output: outputPlane({ name, channel, devices, margin: marginAsked(name, sheet) }),
  };
}

/** A stage as its low and its high device have it; none where its part does not spread. */
export function deviceStages(
  sheet: Sheet,
  name: string,
  spread: SheetSpread | null,
): readonly { readonly role: 'low' | 'high'; readonly label: string; readonly stage: StageReading }[] {
  const found = spread?.report.devices.find(({ stage }) => stage === name);
  if (!spread || !found) return [];
  return (['low', 'high'] as const).flatMap((role) => {
    const stage = sheet.standing(slotsOf(spread.model, found[role].where)).stage(name);
    return stage ? [{ role, label: `${role} device`, stage }] : [];
  });
}

/** `bias line, 1/R_S` where one resistor of the stage alone makes the slope. */
function slopeLabel(label: string, ohms: number, { legs }: StageReading): string {
  const alone = legs.filter(({ kind, value, label: name }) => {
    return kind === 'resistor' && name !== '' && Math.abs(value! - ohms) <= SAME_SLOPE * Math.abs(ohms);
  });
  return alone.length === 1 ? `${label}, 1/${alone[0]!.label}` : label;
}

/** The largest margin in volts that a check asks of the stage; null where none does. */
function marginAsked(name: string, sheet: SheetView): number | null {
  const asked = requirementsOf(sheet).filter(({ text, forbids }) => text === `${name}.margin` && forbids === 'below');
  return asked.length === 0 ? null : Math.max(...asked.map(({ value }) => value));
}
