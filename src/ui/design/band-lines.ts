// A way to bias as lines of the sheet: resistors or a source, the stage, the checks for the band.

import { CURRENT, plainText, RESISTANCE, VOLTAGE } from '../../quantity/index.ts';
import { freeName } from '../rows/index.ts';
import type { BiasForm } from './band-forms.ts';
import { ownName } from './band-wish.ts';
import type { BandWish } from './band-wish.ts';

/** The lines, and the names by which what they write is read again. */
interface BandLines {
  readonly lines: readonly string[];
  readonly stage: string;
}

/** Digits of the exact values that the notes keep. */
const NOTE_DIGITS = 4;

/** Writes a bias; names that the sheet or the new lines already bear are numbered on. */
export function bandLines(wish: BandWish, { bias, form }: BiasForm): BandLines {
  if (bias === null) throw new RangeError(`no bias to write: ${form}`);
  const taken = new Set(wish.taken);
  const name = (stem: string): string => {
    const found = ownName(wish.sheet, stem, taken);
    taken.add(found);
    return found;
  };
  const { near, far, channel } = wish.rails;
  const range = `${plainText(wish.least, CURRENT)} .. ${plainText(wish.most, CURRENT)}`;
  const lines: string[] = [...wish.added];
  const spread = (text: string): string => (text === '' ? '' : ` ± ${text}`);
  const resistor = (stem: string, ohms: number, note: string): string => {
    const own = name(stem);
    const source = `[chosen, ${wish.series}]`;
    lines.push(`${own} = ${plainText(ohms, RESISTANCE)}${spread(wish.tolerance.text)}  ${source}  ; ${note}`);
    return own;
  };
  const rounded = (value: number): number => Number(value.toPrecision(NOTE_DIGITS));

  const { gate, source, exact } = bias;
  let sourceLeg: string;
  if (source.type === 'resistor') {
    const asked = `${plainText(rounded(exact.ohms!), RESISTANCE)} and V_GG ${plainText(rounded(exact.V_GG), VOLTAGE)}`;
    const own = resistor('R_S', source.ohms, `bias line of ${wish.part} for ${range}: ${asked}`);
    sourceLeg = `${own} to ${near}`;
  } else {
    const own = name('I_B');
    const tolerance = spread(wish.sourceTolerance.text);
    lines.push(
      `${own} = ${plainText(source.amps, CURRENT)}${tolerance}  [assumed]  ; current source of the band ${range}`,
    );
    sourceLeg = `${own} ${channel > 0 ? 'to' : 'from'} ${near}`;
  }
  let gateLegs: string;
  if (gate.type === 'rail') {
    gateLegs = `${resistor('R_G', wish.gateOhms, 'holds the gate')} to ${near}`;
  } else {
    const V_GG = plainText(rounded(bias.V_GG), VOLTAGE);
    const upper = resistor('R_1', gate.pair.upper, `divider for V_GG, with the next ${V_GG}`);
    const lower = resistor('R_2', gate.pair.lower, 'divider for V_GG');
    gateLegs = `${upper} to ${far}, ${lower} to ${near}`;
  }
  const stage = freeName(wish.sheet, 'A', taken);
  lines.push(
    `${stage} = stage of ${wish.part}`,
    `  gate: ${gateLegs}`,
    `  drain: ${wish.drain === null ? '' : `${wish.drain.element} `}to ${far}`,
    `  source: ${sourceLeg}`,
    `${name('band')} = check ${stage}.I_D within ${range}`,
    `${name('saturated')} = check ${stage}.margin >= 0 V`,
  );
  return { lines, stage };
}
