// The band around a curve: closed forms, and the ends that a sheet with the input typed there has.

import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { createSheet } from '../../src/sheet/index.ts';
import { ANALYSES, bandsOver } from '../../src/spread/index.ts';

function slotOf(model: ReturnType<ReturnType<typeof createSheet>['spreadModel']>, path: string): number {
  return model.values.find((value) => value.path === path)!.slot;
}

describe('a band', () => {
  it('is that of all spread but the input’s own', () => {
    const model = createSheet('U_1 = 5 V ± 10 %\nR = 1 kohm ± 5 %\nI = U_1 / R\nP = U_1 * I\n').spreadModel();
    const places = Float64Array.of(100, 1000, 4700, 10_000);
    const [current, power] = bandsOver(
      model,
      slotOf(model, 'R'),
      places,
      ['I', 'P'].map((path) => slotOf(model, path)),
    );
    places.forEach((R, i) => {
      expect(current!.nominal[i]).toBe(5 / R);
      expect(current!.low[i]! * R).toBeCloseTo(4.5, 12);
      expect(current!.high[i]! * R).toBeCloseTo(5.5, 12);
      expect(power!.low[i]! * R).toBeCloseTo(4.5 ** 2, 11);
      expect(power!.high[i]! * R).toBeCloseTo(5.5 ** 2, 11);
    });
  });

  it('has no end where the spread leaves it open', () => {
    const model = createSheet('U_1 = 5 V in 4 V ..\nR = 1 kohm\nI = U_1 / R\n').spreadModel();
    const [band] = bandsOver(model, slotOf(model, 'R'), Float64Array.of(1000, 2000), [slotOf(model, 'I')]);
    expect([...band!.low]).toEqual([0.004, 0.002]);
    expect([...band!.high]).toEqual([NaN, NaN]);
  });

  it.each([
    ['crevasse-listener', 'R_S2', ['200 ohm', '1.2 kohm', '5.6 kohm'], 'A1.I_D'],
    ['crevasse-listener', 'V_DD', ['14 V', '20 V'], 'A1.margin'],
    // Chosen anew at each place: R_fit and its current rest on it.
    ['weir-gauge', 'I_B', ['0.5 mA', '0.9 mA'], 'I_fit'],
  ])('of the sheet %s over %s has the ends of that sheet with the value typed', (file, input, entries, path) => {
    const text = readFileSync(`public/examples/${file}.txt`, 'utf8');
    const typed = entries.map((entry) => {
      const edited = text.replace(new RegExp(`^${input} = [^\\[\\n]*`, 'm'), `${input} = ${entry} `);
      const model = createSheet(edited, ANALYSES).spreadModel();
      const [ends] = ANALYSES.ends(model, [slotOf(model, path)], ['low', 'high']);
      return { ...ends!, at: model.slots[slotOf(model, input)]!, nominal: model.slots[slotOf(model, path)]! };
    });
    const model = createSheet(text, ANALYSES).spreadModel();
    const places = Float64Array.from(typed, ({ at }) => at);
    const [band] = bandsOver(model, slotOf(model, input), places, [slotOf(model, path)]);
    typed.forEach(({ low, nominal, high }, i) => {
      for (const [found, wanted] of [
        [band!.low[i]!, low],
        [band!.nominal[i]!, nominal],
        [band!.high[i]!, high],
      ])
        expect(Math.abs(found! / wanted! - 1)).toBeLessThan(1e-9);
    });
    expect(band!.low[0]).not.toBe(band!.low[1]);
  });
});
