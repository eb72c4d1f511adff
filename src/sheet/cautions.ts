// Cautions of a stage or point: what its numbers do not say. Each is looked at after every run.
// Thresholds without a source are common practice and named as such beside them.

import type { CellTree } from '../language/index.ts';
import { pathsOf } from '../language/index.ts';
import { VOLTAGE, formatValue } from '../quantity/index.ts';
import type { Handle } from '../network/index.ts';
import type { Read } from './draft.ts';
import type { PartInterface } from './interface.ts';
import type { StageInHand } from './stage-in-hand.ts';

/** Extra-low voltage that may be touched in dry conditions, d.c. Source: IEC 62368-1, ES1 (60 V d.c.). */
const TOUCH_LIMIT = 60;
/** Forward gate voltage of a JFET from which its gate conducts (common practice, no source). */
const GATE_FORWARD = 0.5;
/** Reverse V_DS from which a MOSFET's body diode conducts (common practice, no source). */
const BODY_DIODE = 0.5;
/** Below this V_ov the channel leaves the square law for weak inversion (common practice, no source). */
const WEAK = 0.15;
/** V_DG of a JFET from which its gate current grows beyond the stated leakage (common practice, no source). */
const GATE_CURRENT_GROWTH = 10;

type Found = { readonly text: string; readonly line: CellTree['line'] };

/** Every caution that is due as the stage stands. */
export function stageCautions(stage: StageInHand): Found[] {
  const { tree, fets, lowering, read } = stage;
  const own = (text: string): Found => ({ text, line: tree.line });
  const [{ part, partName }] = fets as [StageInHand['fets'][number]];
  const value = (offered: string): number => (lowering.values.has(offered) ? read(lowering.values.get(offered)!) : NaN);
  const idle = lowering.lines ? read(lowering.lines.V_L) : null;
  return [
    ...deviceCautions({ part, partName, value, idle, thermalRoots: lowering.thermalRoots, read }).map(own),
    ...voltageCautions(stage).map(own),
    ...legCautions(stage),
  ];
}

/** A FET with its numbers, as its cautions take it. */
interface FetInHand {
  readonly part: PartInterface;
  readonly partName: string;
  /** An offered value by name; NaN where there is none. */
  readonly value: (offered: string) => number;
  /** V_DS when no current flows, where the wiring sets one. */
  readonly idle: number | null;
  readonly thermalRoots: Handle | null;
  readonly read: Read;
}

/** What the numbers of one FET, in a stage or at a point, do not say. */
export function deviceCautions({ part, partName, value, idle, thermalRoots, read }: FetInHand): string[] {
  const found: string[] = [];
  const vgs = part.channel * value('V_GS');
  const vds = part.channel * value('V_DS');
  const vsb = part.channel * value('V_SB');
  const vdg = vds - vgs;
  const vov = value('V_ov');
  const volts = (x: number): string => formatValue(x, VOLTAGE).text;
  if (vov <= 0) found.push(`${partName} is cut off: no drain current flows, V_ov is ${volts(vov)}.`);
  if (vds < 0 && vov > 0) {
    found.push(
      `${partName} conducts backwards: V_DS is ${volts(part.channel * vds)}, so drain and source have changed places.`,
    );
  }
  if (part.family === 'JFET' && Math.max(vgs, -vdg) > GATE_FORWARD) {
    found.push(
      `The gate of ${partName} is forward by ${volts(Math.max(vgs, -vdg))}: it conducts, and the sheet does not count that current.`,
    );
  }
  if (part.family === 'MOSFET' && vsb > -BODY_DIODE && vds < -BODY_DIODE) {
    found.push(
      `The body diode of ${partName} conducts at V_DS = ${volts(part.channel * vds)}; the sheet does not count that current.`,
    );
  }
  if (part.family === 'MOSFET' && vsb < -BODY_DIODE) {
    found.push(
      `The bulk of ${partName} is forward: V_SB is ${volts(part.channel * vsb)}. Its junctions conduct, and the sheet does not count that current. Tie the bulk to the source or beyond it.`,
    );
  }
  if (vov > 0 && vov < WEAK) {
    found.push(`V_ov is ${volts(vov)}; below 0.15 V the square law promises more g_m than there is.`);
  }
  if (part.family === 'JFET' && part.device.I_GSS !== null && vdg > GATE_CURRENT_GROWTH) {
    found.push(`V_DG is ${volts(vdg)}: the gate current of a JFET grows with V_DG, which is not modelled here.`);
  }
  const limit = (field: keyof PartInterface['limits']): number => {
    const handle = part.limits[field];
    return handle === undefined ? Infinity : Math.abs(read(handle));
  };
  const over = (what: string, x: number, field: keyof PartInterface['limits']): void => {
    if (Math.abs(x) > limit(field)) found.push(`${what} of ${partName} lies beyond its limit ${field}.`);
  };
  over('V_DS', vds, 'V_DSmax');
  over('V_GS', vgs, 'V_GSmax');
  over('V_DG', vdg, 'V_DGmax');
  over('I_D', value('I_D'), 'I_Dmax');
  const equilibria = thermalRoots === null ? 1 : read(thermalRoots);
  if (equilibria > 1) {
    const beyond = equilibria === 2 ? 'it runs away (thermal runaway)' : 'it goes on to a hotter one, or runs away';
    found.push(
      `${partName} has ${equilibria} thermal equilibria below 600 K. The coolest is shown, which a cold start reaches; once heated beyond the next one, ${beyond}. Lower R_thJA or the dissipation.`,
    );
  }
  if (value('T_J') > limit('T_Jmax')) found.push(`The junction of ${partName} is hotter than its limit T_Jmax.`);
  if (idle !== null && Math.abs(idle) > limit('V_DSmax')) {
    found.push(`With ${partName} off, V_DS is ${volts(idle)}, beyond its limit V_DSmax.`);
  }
  return found;
}

function voltageCautions({ lowering, legs, read }: StageInHand): string[] {
  let low = 0;
  let high = 0;
  const see = (volts: number): void => {
    low = Math.min(low, volts);
    high = Math.max(high, volts);
  };
  for (const [name, handle] of lowering.values) {
    if (name.startsWith('V_') && !['V_GS', 'V_DS', 'V_SB', 'V_ov', 'V_DSsat'].includes(name)) see(read(handle));
  }
  for (const { net } of legs) if (net.to.type === 'rail' && net.to.volts !== null) see(read(net.to.volts));
  if (high - low <= TOUCH_LIMIT) return [];
  const between = formatValue(high - low, VOLTAGE).text;
  const found = [
    `Up to ${between} d.c. between its places, above 60 V d.c.: dangerous to touch. Local codes and licensed practice decide, not the sheet.`,
  ];
  if (legs.some(({ net }) => net.element?.kind === 'capacitor')) {
    found.push('Its capacitors hold that charge after switching off: discharge them and measure before touching.');
  }
  return found;
}

function legCautions({ legs, context }: StageInHand): Found[] {
  const found: Found[] = [];
  const hangs = new Map<string, number>();
  for (const { net, leg, field } of legs) {
    if (net.element?.kind === 'source') {
      found.push({
        line: field.line,
        text: `The current source ${net.element.label} is ideal; its compliance is not checked.`,
      });
    }
    if (leg.place.type === 'expr' && net.to.type === 'rail') {
      for (const path of pathsOf(leg.place.expr)) {
        if (context.look(path.names[0]!.name)?.kind === 'stage') {
          found.push({
            line: field.line,
            text: `The rail ${net.to.label} is taken from a stage and loads it with nothing.`,
          });
        }
      }
    }
    if (leg.element?.type === 'path' && leg.element.names.length === 1) {
      const { name } = leg.element.names[0]!;
      const count = (hangs.get(name) ?? 0) + 1;
      hangs.set(name, count);
      if (count === 2 && context.look(name)?.toleranced) {
        found.push({
          line: field.line,
          text: `${name} has a tolerance and hangs in two legs, as one component in two places. For two pieces write ${name}b = another ${name}.`,
        });
      }
    }
  }
  return found;
}
