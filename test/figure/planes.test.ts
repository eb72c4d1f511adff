import { describe, expect, it } from 'vitest';
import type { Chart, Curve, TextItem } from '../../src/figure/index.ts';
import { chartFrame, drawChart, outputPlane, positionOn, transferPlane } from '../../src/figure/index.ts';
import { textBox } from '../../src/figure/labels.ts';
import { device, jfets, SELF_BIAS } from './devices.ts';

const BIAS = { volts: 0, ohms: 1200, amps: 0, label: 'bias line, 1/R_S' };
const SIZE = { width: 268, height: 200 };

function transfer(channel: 'n' | 'p'): Chart {
  return transferPlane({ name: 'A1', channel, devices: jfets(channel), bias: BIAS });
}
function output(channel: 'n' | 'p', margin: number | null = null): Chart {
  return outputPlane({ name: 'A1', channel, devices: jfets(channel).filter(({ role }) => role !== 'low'), margin });
}

function curve(chart: Chart, role: Curve['role']): Curve {
  return chart.curves.find((each) => each.role === role)!;
}

/** The curve's height at x, by straight lines between its points. */
function heightAt({ x, y }: Curve, at: number): number {
  for (let i = 1; i < x.length; i++) {
    const [a, b] = [x[i - 1]!, x[i]!];
    if (at < Math.min(a, b) || at > Math.max(a, b)) continue;
    return a === b ? y[i]! : y[i - 1]! + ((y[i]! - y[i - 1]!) * (at - a)) / (b - a);
  }
  return NaN;
}

function textsOf(chart: Chart): TextItem[] {
  return drawChart(chart, SIZE).items.filter((item): item is TextItem => item.kind === 'text');
}

describe.each(['n', 'p'] as const)('the planes of a %s-channel stage', (channel) => {
  it('have Q on the bias line, on the load line and on the curves of its device', () => {
    const [transferChart, outputChart] = [transfer(channel), output(channel)];
    const { vgs, vds, id } = jfets(channel)[0]!.q;
    expect(heightAt(curve(transferChart, 'bias'), vgs)).toBeCloseTo(id, 9);
    expect(heightAt(curve(outputChart, 'bias'), vds)).toBeCloseTo(id, 9);
    // Chords of a parabola lie above it by less than a thousandth of the plane.
    expect(Math.abs(heightAt(curve(transferChart, 'nominal'), vgs) - id)).toBeLessThan(1e-3 * transferChart.y.high);
    expect(Math.abs(heightAt(curve(outputChart, 'nominal'), vds) - id)).toBeLessThan(1e-3 * outputChart.y.high);
  });

  it('end their curves at the edge of the plane', () => {
    for (const chart of [transfer(channel), output(channel, 2)]) {
      for (const { x, y, role } of chart.curves) {
        const last = [x.at(-1)!, y.at(-1)!] as const;
        const atSide = [chart.x.low, chart.x.high].some((side) => Math.abs(last[0] - side) < 1e-9);
        const atTop = Math.abs(last[1] - chart.y.high) < 1e-9 || Math.abs(last[1]) < 1e-12;
        expect([role, atSide || atTop]).toEqual([role, true]);
        expect(Math.max(...y)).toBeLessThanOrEqual(chart.y.high * (1 + 1e-9));
      }
    }
  });

  it('have ranges from the operating points, not from the current at V_GS = 0', () => {
    const devices = jfets(channel);
    const most = Math.max(...devices.map(({ q }) => q.id));
    const idle = devices[2]!.law(0, devices[2]!.q.vds);
    const { y } = transfer(channel);
    expect(y.high).toBeGreaterThan(most);
    expect(y.high).toBeLessThan(2 * most);
    expect(y.high).toBeLessThan(idle / 2);
  });

  it('label lines without covering a label, a mark or an edge', () => {
    for (const chart of [transfer(channel), output(channel, 2)]) {
      const boxes = textsOf(chart).map(textBox);
      boxes.forEach((a, i) => {
        boxes.slice(i + 1).forEach((b) => {
          const meet = a.x0 < b.x1 && b.x0 < a.x1 && a.y0 < b.y1 && b.y0 < a.y1;
          expect(meet).toBe(false);
        });
        expect(a.x0 >= 0 && a.x1 <= SIZE.width && a.y0 >= 0 && a.y1 <= SIZE.height).toBe(true);
      });
    }
  });
});

describe('the transfer plane', () => {
  it('of an n-channel depletion device ends at V_GS = 0 with the current on the right', () => {
    const { x, yAt } = transfer('n');
    expect([x.high, yAt]).toEqual([0, 'right']);
    expect(x.low).toBeLessThan(-5);
  });

  it('of an enhancement device begins at V_GS = 0 with the current on the left', () => {
    const at = { channel: 'n' as const, rs: 100, loop: 600, supply: 12, gate: 3.5 };
    const chart = transferPlane({
      name: 'A1',
      channel: 'n',
      devices: [device('nominal', 0.05, 2.1, at)],
      bias: { volts: 3.5, ohms: 100, amps: 0, label: 'bias line' },
    });
    expect([chart.x.low, chart.yAt]).toEqual([0, 'left']);
    expect(curve(chart, 'nominal').x[0]).toBe(2.1);
  });

  it('is mirrored for the mirrored stage', () => {
    const [n, p] = [curve(transfer('n'), 'nominal'), curve(transfer('p'), 'nominal')];
    expect(Array.from(p.x, (vgs) => -vgs)).toEqual(Array.from(n.x));
    expect(Array.from(p.y)).toEqual(Array.from(n.y));
  });

  it('draws a forced gate voltage upright and a forced current level', () => {
    const devices = jfets('n').slice(0, 1);
    const upright = transferPlane({
      name: 'A1',
      channel: 'n',
      devices,
      bias: { volts: -1, ohms: 0, amps: 0, label: '' },
    });
    expect(Array.from(curve(upright, 'bias').x)).toEqual([-1, -1]);
    const level = transferPlane({
      name: 'A1',
      channel: 'n',
      devices,
      bias: { volts: 0, ohms: Infinity, amps: 1e-3, label: '' },
    });
    expect(Array.from(curve(level, 'bias').y)).toEqual([1e-3, 1e-3]);
  });

  it('shows a device that is off', () => {
    const off = device('nominal', 1e-3, -2, { ...SELF_BIAS, gate: -6 });
    const chart = transferPlane({ name: 'A1', channel: 'n', devices: [off], bias: { ...BIAS, volts: -6 } });
    expect(chart.x.low).toBeLessThan(-6);
    expect(chart.y.high).toBeGreaterThan(0);
    expect(chart.marks).toHaveLength(1);
  });

  it('marks Q inside the frame where a pointer finds it', () => {
    const chart = transfer('n');
    const frame = chartFrame(chart, SIZE);
    const { vgs, id } = jfets('n')[0]!.q;
    const disc = drawChart(chart, SIZE).items.find((item) => item.kind === 'circle')!;
    expect(disc).toMatchObject({
      x: frame.x0 + positionOn(chart.x, vgs) * (frame.x1 - frame.x0),
      y: frame.y1 - positionOn(chart.y, id) * (frame.y1 - frame.y0),
    });
  });
});

describe('the output plane', () => {
  it('has the edge of saturation where V_DS = V_GS - V_TO on every curve', () => {
    const chart = output('n');
    const { law, threshold, q } = jfets('n')[0]!;
    const edge = q.vgs - threshold;
    expect(heightAt(curve(chart, 'edge'), edge)).toBeCloseTo(law(q.vgs, edge), 5);
  });

  it('hatches the strip in which the margin is too small', () => {
    const chart = output('n', 2);
    const [strip] = chart.areas;
    const { law, threshold } = jfets('n')[2]!;
    expect(strip!.role).toBe('hatch');
    // A point of the strip with a margin of just under 2 V, and its current.
    const at = strip!.x.findIndex((vds) => vds > 3);
    const vds = strip!.x[at]!;
    expect(strip!.low[at]).toBeCloseTo(Math.min(chart.y.high, law(threshold + vds - 2, vds)), 12);
    expect(strip!.high[at]).toBeCloseTo(Math.min(chart.y.high, law(threshold + vds, vds)), 12);
  });

  it('has a family at round gate voltages beside the one in use', () => {
    const labels = output('n')
      .curves.filter(({ role }) => role === 'family')
      .map(({ label }) => label);
    expect(labels.length).toBeGreaterThanOrEqual(2);
    for (const label of labels) expect(label).toMatch(/^−?\d(\.5)? V$/);
  });

  it('says its operating points in words', () => {
    expect(output('n', 2).sentence).toMatch(/nominal V_DS 1\d\.\d V, I_D 1\.\d\d mA.*margin is under 2\.00 V/);
  });
});
