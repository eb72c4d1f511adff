// A stage of `stage-text.ts` as the text of a sheet, of either channel: the mirrored sheet has its voltages negated and
// its current sources turned round, and says the same of the part.

import type { StageSetup } from './stage-text.ts';

const DEVICE_UNITS: Readonly<Record<string, string>> = {
  beta: 'A/V^2',
  V_TO: 'V',
  lambda: '/V',
  gamma: 'V^0.5',
  phi: 'V',
  r_s: 'ohm',
  r_d: 'ohm',
  I_GSS: 'A',
  tempco: 'V/K',
  beta_exponent: '',
  R_thJA: 'K/W',
  C_GS: 'F',
  C_GD: 'F',
};

/** The sheet of a stage `A1` of the part `Q1`; `channel` 1 is n. */
export function stageSheet(setup: StageSetup, channel: 1 | -1): string {
  const { family = 'JFET', device, lines, output, ambient = 298.15 } = setup;
  const fields = Object.entries(device).map(([field, value]) => {
    const name = field === 'beta' && family === 'MOSFET' ? 'K' : field;
    // A model card writes V_TO of a JFET negative on both channels.
    const mirrors = field === 'V_TO' && family === 'MOSFET';
    return `  ${name}: ${mirrors ? channel * value : value} ${DEVICE_UNITS[field]}`.trimEnd();
  });
  return [
    `T_A = ${ambient - 273.15} degC`,
    `Q1 = ${channel === 1 ? 'n' : 'p'}-${family}`,
    ...fields,
    'A1 = stage of Q1',
    ...lines.map((line) => `  ${lineInSheet(line, channel)}`),
    ...(output ? [`  output: ${output}`] : []),
    '',
  ].join('\n');
}

function lineInSheet(line: string, channel: 1 | -1): string {
  const [place, legs] = line.split(':').map((part) => part.trim());
  return `${place}: ${legs
    .split(',')
    .map((leg) => legInSheet(leg.trim(), channel))
    .join(', ')}`;
}

function legInSheet(leg: string, channel: 1 | -1): string {
  const match = /^(?:(\S+)( [FHA])? )?(to|from) (.+)$/.exec(leg);
  if (!match) return leg;
  const [, number, unit, way, place] = match;
  const element = number ? `${number}${unit ?? ' ohm'} ` : '';
  const turned = unit === ' A' && channel === -1 ? { to: 'from', from: 'to' }[way] : way;
  const volts = /^(\S+) V$/.exec(place);
  const far = volts ? `${channel * Number(volts[1]) || 0} V` : place;
  return `${element}${turned} ${far}`;
}
