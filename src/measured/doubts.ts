// What the numbers of a fit do not say by themselves.

import { formatValue, PLAIN, VOLTAGE } from '../quantity/index.ts';
import type { FitFlag, LawFit } from './law-fit.ts';
import type { Points } from './points.ts';

interface Circumstances {
  /** n-channel frame. */
  readonly points: Points;
  readonly weights: Float64Array;
  /** What a free exponent would make of it: itself, and the share of the squares that it leaves. */
  readonly bent: { readonly exponent: number; readonly left: number } | null;
  readonly isLambdaAsked: boolean;
  readonly isLambdaSeen: boolean;
  readonly isAtBorder: boolean;
}

/** beta and V_TO are not told apart from this correlation of their errors on, or where V_TO is known no better than so, as a share of the largest overdrive. */
const TOO_ALIKE = 0.998;
const TOO_VAGUE = 0.1;
/** The square law does not fit where it leaves so much of the readings, or where another exponent, so far from 2, leaves less than half of the squares. */
const TOO_MUCH = 0.03;
const SEEN = 0.002;
const BENT = 0.08;
/** A reading with less than this weight counts little. */
const LIGHT = 0.3;

/** Every doubt, the gravest first. */
export function doubts(
  fit: Omit<LawFit, 'flags'>,
  { points, weights, bent, isLambdaAsked, isLambdaSeen, isAtBorder }: Circumstances,
): FitFlag[] {
  const { channel, V_TO, errors, correlation, relative, regions, lambda } = fit;
  const flags: FitFlag[] = [];
  const drives = points.V_GS.filter((_, i) => regions[i] !== 'cutoff').map((vgs) => vgs - channel * V_TO);
  const [least, most] = [Math.min(...drives), Math.max(...drives)];
  const share = (part: number): string => `${formatValue(part * 100, PLAIN, { digits: 2, zeros: 'drop' }).text} %`;
  const isBent = bent !== null && bent.left < 0.5 && Math.abs(bent.exponent - 2) > BENT && relative > SEEN;
  if (relative > TOO_MUCH || isBent) {
    const other = isBent
      ? ` An exponent of ${formatValue(bent.exponent, PLAIN, { digits: 3 }).text} would leave ${share(relative * Math.sqrt(bent.left))}.`
      : '';
    flags.push({
      code: 'law',
      text: `The ${fit.exponent === 2 ? 'square law' : 'law'} does not fit: readings and law differ by ${share(relative)} rms.${other} Its constants hold near these readings at best.`,
    });
  }
  if (Math.abs(correlation) > TOO_ALIKE || errors.V_TO > TOO_VAGUE * most) {
    const volts = (x: number): string => formatValue(x, VOLTAGE).text;
    flags.push({
      code: 'spacing',
      text: `The readings lie too close together to tell beta from V_TO: their V_ov goes from ${volts(least)} to ${volts(most)}. Add readings near the threshold and far from it.`,
    });
  }
  if (!regions.includes('saturation')) {
    flags.push({
      code: 'no-saturation',
      text: 'No reading is in saturation: what the law says there is drawn from the ohmic region alone.',
    });
  }
  if (isLambdaAsked && (!isLambdaSeen || (errors.lambda !== null && errors.lambda > lambda))) {
    flags.push({
      code: 'lambda',
      text: isLambdaSeen
        ? 'lambda is lost in the scatter. Add readings at drain voltages that differ more.'
        : 'lambda does not show in these readings, and 0 is taken. Add readings in saturation at drain voltages that differ more.',
    });
  }
  if (isAtBorder) {
    flags.push({
      code: 'exponent',
      text: `The exponent stands at the end of its range, ${fit.exponent}: readings of another kind may be among these.`,
    });
  }
  const light = [...weights.keys()].filter((i) => weights[i]! < LIGHT);
  if (light.length > 0) {
    const rows = light.map((i) => i + 1);
    const listed =
      rows.length === 1 ? `Reading ${rows[0]} lies` : `Readings ${rows.slice(0, -1).join(', ')} and ${rows.at(-1)} lie`;
    flags.push({
      code: 'outliers',
      text: `${listed} far off the others and ${rows.length === 1 ? 'counts' : 'count'} less. Look at ${rows.length === 1 ? 'it' : 'them'} again.`,
    });
  }
  return flags;
}
