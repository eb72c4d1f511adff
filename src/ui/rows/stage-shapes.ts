// Stages in their usual shapes as lines of the sheet, biased so that they work with the part and the supply at hand.
//
// A depletion FET biases itself at a quarter of I_DSS, where V_ov is half of the pinch-off voltage; an
// enhancement FET is held by a divider at its gate at 1 mA with a sixth of the supply at its source. The drain
// resistor takes half of what is left. Rules of thumb, common practice, no source.

import { plainText, preferredValue, RESISTANCE, VOLTAGE } from '../../quantity/index.ts';
import type { SheetView } from '../../sheet/index.ts';
import { freeName, supplyOf } from './sheet-stock.ts';
import type { StockPart } from './sheet-stock.ts';

export type StageShape = 'common source' | 'follower' | 'common gate' | 'current sink' | 'switch';

const SUPPLY = { name: 'V_DD', volts: 15 };
const GATE_RESISTANCE = 1e6;
const ENHANCEMENT_CURRENT = 1e-3;
const MOST_CURRENT = 5e-3;
const SWITCH_CURRENT = 10e-3;
const DRIVE = 10;

interface Bias {
  readonly current: number;
  readonly overdrive: number;
  /** Voltage across the source resistor. */
  readonly source: number;
}

/** The lines of a stage of this part, its resistors first. */
export function stageLines(shape: StageShape, part: StockPart, sheet: SheetView): string[] {
  const present = supplyOf(sheet);
  const supply = present ?? SUPPLY;
  const rail = present ? [] : [`${SUPPLY.name} = ${SUPPLY.volts} V ± 5 %  [assumed]`];
  // The source of a p-channel FET stands at the supply, its drain leads down to 0 V.
  const [near, far] = part.channel === 'n' ? ['0 V', supply.name] : [supply.name, '0 V'];
  const named = createResistors(sheet);
  const legs = legsOf(shape, part, supply.volts, { near, far, named });
  const stage = [`${freeName(sheet, 'A')} = stage of ${part.name}`, ...legs.map((leg) => `  ${leg}`)];
  return [...rail, ...named.lines(), ...stage];
}

interface Rails {
  readonly near: string;
  readonly far: string;
  readonly named: Resistors;
}

function legsOf(shape: StageShape, part: StockPart, volts: number, { near, far, named }: Rails): string[] {
  if (shape === 'switch') return switchLegs(part, volts, { near, far, named });
  const bias = biasOf(part, volts);
  const isSink = shape === 'current sink' && isDepletion(part);
  const gate = isSink ? `to ${near}` : gateLegs(part, bias, volts, { near, far, named });
  const hasDrain = shape === 'common source' || shape === 'common gate';
  const drain = hasDrain ? named.make('R_D', ((volts - bias.source - bias.overdrive) * 0.5) / bias.current) : '';
  const source = named.make('R_S', bias.source / bias.current);
  switch (shape) {
    case 'common source':
      return [
        `gate: ${gate}, 100 nF to signal`,
        `drain: ${drain} to ${far}, 1 uF to load`,
        `source: ${source} to ${near}, 47 uF to ${near}`,
        'load: 100 kohm to 0 V',
        'output: load',
      ];
    case 'follower':
      return [
        `gate: ${gate}, 100 nF to signal`,
        `drain: to ${far}`,
        `source: ${source} to ${near}, 1 uF to load`,
        'load: 100 kohm to 0 V',
        'output: load',
      ];
    case 'common gate':
      return [
        `gate: ${gate}, 1 uF to 0 V`,
        `drain: ${drain} to ${far}, 1 uF to load`,
        `source: ${source} to ${near}, 10 uF to signal`,
        'load: 100 kohm to 0 V',
        'output: load',
      ];
    case 'current sink':
      return [`gate: ${gate}`, `drain: to ${far}`, `source: ${source} to ${near}`];
  }
}

/** A depletion FET is on with its gate at its source; an enhancement FET is driven. */
function switchLegs(part: StockPart, volts: number, { near, far, named }: Rails): string[] {
  const load = named.make('R_L', volts / switchCurrent(part));
  const drive = plainText(Math.min(DRIVE, volts), VOLTAGE);
  const gate = isDepletion(part) ? near : part.channel === 'n' ? drive : '0 V';
  return [`gate: 100 kohm to ${gate}`, `drain: ${load} to ${far}`, `source: to ${near}`];
}

function gateLegs(part: StockPart, bias: Bias, volts: number, { near, far, named }: Rails): string {
  if (isDepletion(part)) return `${named.make('R_G', GATE_RESISTANCE)} to ${near}`;
  const share = (bias.source + part.threshold + bias.overdrive) / volts;
  const lower = named.make('R_G', GATE_RESISTANCE * share);
  const upper = named.make('R_G', GATE_RESISTANCE * (1 - share));
  return `${upper} to ${far}, ${lower} to ${near}`;
}

function biasOf(part: StockPart, volts: number): Bias {
  const { beta, threshold } = part;
  if (isDepletion(part)) {
    const current = Math.min((beta * threshold * threshold) / 4, MOST_CURRENT);
    const overdrive = Math.sqrt(current / beta);
    return { current, overdrive, source: -threshold - overdrive };
  }
  const current = ENHANCEMENT_CURRENT;
  return { current, overdrive: Math.sqrt(current / beta), source: volts / 6 };
}

/** Well below what a depletion FET carries with its gate at its source. */
function switchCurrent(part: StockPart): number {
  return isDepletion(part) ? Math.min(SWITCH_CURRENT, biasOf(part, 0).current) : SWITCH_CURRENT;
}

function isDepletion({ threshold }: StockPart): boolean {
  return threshold < 0;
}

interface Resistors {
  /** Names a resistor of a preferred value near `ohms`. */
  make(stem: string, ohms: number): string;
  lines(): string[];
}

function createResistors(sheet: SheetView): Resistors {
  const names = new Set<string>();
  const written: string[] = [];
  return {
    make(stem, ohms) {
      const name = freeName(sheet, stem, names);
      names.add(name);
      written.push(`${name} = ${plainText(preferredValue('E24', Math.max(ohms, 1), 'nearest'), RESISTANCE)} ± 1 %`);
      return name;
    },
    lines: () => written,
  };
}
