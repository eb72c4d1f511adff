// How far values reach over the declared set while one input is led over a range: the band around their curves.

import type { SpreadModel } from '../sheet/index.ts';
import { ANALYSES } from './analyse.ts';
import { turnedModel } from './turned-model.ts';

/** One value at every place of the input, SI; NaN where it or its end is not known. */
export interface Band {
  readonly low: Float64Array;
  readonly nominal: Float64Array;
  readonly high: Float64Array;
}

/** The bands of the values in these slots. The input of slot `input` stands at each place itself, without its own spread. */
export function bandsOver(model: SpreadModel, input: number, places: Float64Array, wanted: readonly number[]): Band[] {
  const bands = wanted.map(() => ({
    low: new Float64Array(places.length),
    nominal: new Float64Array(places.length),
    high: new Float64Array(places.length),
  }));
  const first = turnedModel(model, input, places[0]!, 'held');
  const over = ANALYSES.endsOver(first, input, wanted, ['low', 'high']);
  places.forEach((place, i) => {
    const turned = turnedModel(model, input, place, 'held');
    const ends = over(turned);
    bands.forEach(({ low, nominal, high }, w) => {
      low[i] = ends[w]!.low;
      nominal[i] = turned.slots[wanted[w]!]!;
      high[i] = ends[w]!.high;
    });
  });
  return bands;
}
