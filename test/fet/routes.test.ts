import { describe, expect, it } from 'vitest';
import { DEFAULTS, FORMS, LAMBDA_ROUTES, ROUTES, ROUTE_STATUS, signReason, wantedSign } from '../../src/fet/index.ts';
import type { ChannelSign, Family, NamedKernel, Route } from '../../src/fet/index.ts';
import { call } from './call.ts';
import { between, decade, generator } from './seeded.ts';

interface Part {
  readonly family: Family;
  readonly channel: ChannelSign;
  readonly beta: number;
  readonly vto: number;
  readonly lambda: number;
  readonly r_s: number;
  readonly r_d: number;
}
const CHANNELS: readonly ChannelSign[] = [1, -1];

function route(id: string): Route {
  const found = ROUTES.find((candidate) => candidate.id === id);
  if (!found) throw new RangeError(`no route ${id}`);
  return found;
}

function randomPart(u: () => number, family: Family, depletion: boolean): Omit<Part, 'channel'> {
  const beta = decade(u, 1e-4, 0.5);
  const vto = depletion ? -decade(u, 0.8, 8) : between(u, 0.5, 4);
  // Leads that take a share of every row's V_DS but not all of it.
  const lead = (): number => (u() < 0.5 ? 0 : between(u, 0, 0.04) / (beta * Math.max(1, Math.abs(vto))));
  return { family, beta, vto, lambda: u() < 0.3 ? 0 : decade(u, 1e-3, 0.1), r_s: lead(), r_d: lead() };
}

/** What a data sheet of this very part would print, one condition after another, through the forms. */
function dataSheet(part: Part, u: () => number): Record<string, number> {
  const { family, channel } = part;
  const constants = {
    channel,
    beta: part.beta,
    V_TO: part.vto,
    lambda: part.lambda,
    n: DEFAULTS[family].n.value,
    T_nom: DEFAULTS[family].T_nom.value,
    r_s: part.r_s,
    r_d: part.r_d,
  };
  const stated = (value: number): number => (u() < 0.3 ? NaN : value);
  const vds = (): number => stated(channel * between(u, 0.3, 30));
  const gate = channel * (part.vto + between(u, 2, 6));
  const drive = channel * gate - part.vto;
  const small = part.beta * 0.001;
  const values: Record<string, number> = {
    ...constants,
    beta: part.beta,
    V_TO: family === 'JFET' ? part.vto : channel * part.vto,
    K: part.beta,
    W: 20e-6,
    L: 2e-6,
    'I_DSS@V_DS': stated(channel * between(u, 10, 20)),
    'V_GSoff@I_D': stated(small),
    'V_GSoff@V_DS': vds(),
    'V_GSth@I_D': stated(small),
    'V_GSth@V_DS': vds(),
    'g_fs0@V_DS': stated(channel * between(u, 10, 20)),
    'g_fs@I_D': part.beta * between(u, 0.3, 3),
    'g_fs@V_DS': vds(),
    'I_on@V_GS': gate,
    'I_on@V_DS': vds(),
    'R_DSon@V_GS': family === 'JFET' ? NaN : gate,
    'R_DSon@I_D': stated(part.beta * 0.1),
    'R_DSon2@V_GS': gate + channel * between(u, 1, 4),
    'R_DSon2@I_D': stated(part.beta * 0.1),
    'R_DSon3@V_GS': gate - channel * between(u, 0.3, 0.6) * drive,
    'R_DSon3@I_D': stated(part.beta * 0.1),
    'g_os@I_D': part.beta * between(u, 0.3, 3),
    'g_os@V_DS': stated(channel * between(u, 5, 20)),
  };
  for (const [field, form] of Object.entries(FORMS)) {
    values[field] = call(form, { ...values, ...constants })['value'];
  }
  for (const again of ['R_DSon2', 'R_DSon3']) {
    values[again] = call(FORMS['R_DSon'], {
      ...constants,
      'R_DSon@V_GS': values[`${again}@V_GS`],
      'R_DSon@I_D': values[`${again}@I_D`],
    })['value'];
  }
  return values;
}

const KINDS: readonly [string, Family, boolean][] = [
  ['JFET', 'JFET', true],
  ['depletion MOSFET', 'MOSFET', true],
  ['enhancement MOSFET', 'MOSFET', false],
];
/** Three R_DSon lines are subtracted from one another twice, and lose as many digits as they resemble each other. */
const tolerance = (r: Route): number => (r.inputs.includes('R_DSon3') ? 1e-9 : 1e-12);

describe('routes', () => {
  for (const [name, family, depletion] of KINDS) {
    for (const r of ROUTES.filter((candidate) => candidate.families.includes(family))) {
      const needsDepletion = r.inputs.some((input) => ['I_DSS', 'V_P', 'V_GSoff'].includes(input));
      if (needsDepletion && !depletion) continue;
      it(`${r.id}: gets a ${name} back from its own data sheet, both channels alike`, () => {
        const u = generator(41);
        for (let k = 0; k < 60; k++) {
          const part = randomPart(u, family, depletion);
          const seed = Math.floor(u() * 1e9);
          const [n, p] = CHANNELS.map((channel) => {
            const sheet = dataSheet({ ...part, channel }, generator(seed));
            return call(r, { ...sheet, n: DEFAULTS[family].n.value, T_nom: 298.15, r_s: part.r_s, r_d: part.r_d });
          });
          expect(p).toEqual(n);
          expect(ROUTE_STATUS[n['status']].name).toBe('ok');
          const off = Math.max(
            Math.abs(n['beta'] / part.beta - 1),
            Math.abs(n['V_TO'] - part.vto) / Math.max(1, Math.abs(part.vto)),
          );
          expect({ part, close: off < tolerance(r) || off }).toEqual({ part, close: true });
        }
      });
    }
  }

  it('three R_DSon lines give back the series resistance', () => {
    const three = route('R_DSon with R_DSon2 with R_DSon3 of a MOSFET');
    const u = generator(5);
    for (let k = 0; k < 300; k++) {
      const part = { ...randomPart(u, 'MOSFET', false), channel: 1 as const };
      const result = call(three, dataSheet(part, u));
      expect(Math.abs(result['R_0'] - part.r_s - part.r_d) * part.beta).toBeLessThan(1e-9);
    }
  });

  it('stand in the order of the design, with the names of what they need', () => {
    expect(ROUTES.map(({ needs }) => needs.join(' '))).toEqual([
      'I_DSS V_P',
      'I_DSS V_GSoff',
      'beta V_TO',
      'I_DSS beta',
      'g_fs0 I_DSS',
      'g_fs g_fs@I_D V_P',
      'g_fs g_fs@I_D V_GSoff',
      'R_DSon V_P',
      'R_DSon V_GSoff',
      'K V_TO',
      'K_P V_TO',
      'I_on I_on@V_GS V_TO',
      'g_fs g_fs@I_D V_TO',
      'R_DSon R_DSon@V_GS V_TO',
      'K V_GSth',
      'K_P V_GSth',
      'I_on I_on@V_GS V_GSth',
      'g_fs g_fs@I_D V_GSth',
      'R_DSon R_DSon@V_GS V_GSth',
      'R_DSon R_DSon@V_GS R_DSon2 R_DSon2@V_GS R_DSon3 R_DSon3@V_GS',
      'R_DSon R_DSon@V_GS R_DSon2 R_DSon2@V_GS',
    ]);
    for (const { inputs, needs } of ROUTES) for (const need of needs) expect(inputs).toContain(need);
    expect(new Set(ROUTES.map(({ id }) => id)).size).toBe(ROUTES.length);
  });
});

describe('a test current', () => {
  const I_DSS_V_GSoff = route('I_DSS with V_GSoff of a JFET or MOSFET');
  const device = { channel: 1, lambda: 0, n: 1.1, T_nom: 298.15 };

  it('tends to V_GS - sqrt(I_test / beta) well above weak inversion', () => {
    // 1 mA of a part with I_DSS = 10 mA and V_P = -4 V flows at -4 (1 - sqrt(0.1)) V.
    const gate = -4 * (1 - Math.sqrt(0.1));
    const found = call(I_DSS_V_GSoff, { ...device, I_DSS: 10e-3, V_GSoff: gate, 'V_GSoff@I_D': 1e-3 });
    expect(found['V_TO']).toBeCloseTo(-4, 6);
  });

  it('of 10 nA puts V_TO of a small-signal JFET a tenth or two above V_GSoff', () => {
    const found = call(I_DSS_V_GSoff, { ...device, I_DSS: 5e-3, V_GSoff: -2, 'V_GSoff@I_D': 10e-9 });
    expect(ROUTE_STATUS[found['status']].name).toBe('ok');
    // Put in by hand: -2 V - V_TO = 2 n V_T ln(exp(sqrt(10 nA / I_s)) - 1).
    const unit = (2 * 1.1 * 1.380649e-23 * 298.15) / 1.602176634e-19;
    const x = Math.sqrt(10e-9 / found['beta']) / unit;
    expect(found['V_TO'] + unit * Math.log(Math.expm1(x))).toBeCloseTo(-2, 9);
    expect(found['beta']).toBeCloseTo(5e-3 / found['V_TO'] ** 2, 15);
    expect(found['V_TO'] + 2).toBeGreaterThan(0.1);
    expect(found['V_TO'] + 2).toBeLessThan(0.3);
  });

  it('is met by the larger of two solutions, or by none, for every sane data sheet', () => {
    const u = generator(9);
    const count: Record<string, number> = {};
    for (let k = 0; k < 3000; k++) {
      const sheet = {
        ...device,
        lambda: between(u, 0, 0.05),
        I_DSS: decade(u, 10e-6, 1),
        'I_DSS@V_DS': u() < 0.3 ? NaN : between(u, 0.5, 30),
        V_GSoff: -decade(u, 0.05, 12),
        'V_GSoff@I_D': decade(u, 0.1e-9, 10e-6),
        'V_GSoff@V_DS': u() < 0.3 ? NaN : between(u, 0.5, 30),
      };
      const found = call(I_DSS_V_GSoff, sheet);
      const status = ROUTE_STATUS[found['status']].name;
      count[status] = (count[status] ?? 0) + 1;
      if (status !== 'ok') {
        if (found['beta'] === found['beta'] || found['V_TO'] === found['V_TO'])
          throw new Error('a number without a law');
        continue;
      }
      const again = { ...sheet, beta: found['beta'], V_TO: found['V_TO'] };
      expect(call(FORMS['V_GSoff'], again)['value'] / sheet.V_GSoff).toBeCloseTo(1, 9);
      expect(call(FORMS['I_DSS'], again)['value'] / sheet.I_DSS).toBeCloseTo(1, 12);
    }
    expect(count['ok']).toBeGreaterThan(1800);
    expect(Object.keys(count).toSorted()).toEqual(['ok', 'weak inversion']);
  });

  it('has no square law exactly where the convex residual stays above 0', () => {
    const unit = (2 * 1.1 * 1.380649e-23 * 298.15) / 1.602176634e-19;
    const ratio = Math.sqrt(10e-9 / 0.2e-3);
    // The least distance that has a solution, from the minimum of the residual at exp(x) - 1 = ratio / (1 - ratio).
    const least = unit * (-Math.log(1 - ratio) / ratio - Math.log(ratio / (1 - ratio)));
    const at = (distance: number): string => {
      const found = call(I_DSS_V_GSoff, { ...device, I_DSS: 0.2e-3, V_GSoff: -distance, 'V_GSoff@I_D': 10e-9 });
      return ROUTE_STATUS[found['status']].name;
    };
    expect([at(least * 1.00001), at(least * 0.99999)]).toEqual(['ok', 'weak inversion']);
  });
});

describe('what a route cannot use', () => {
  const jfet = { channel: 1, lambda: 0.01, n: 1.1, T_nom: 298.15, r_s: 0, r_d: 0 };
  const I_DSS_V_P = route('I_DSS with V_P of a JFET or MOSFET');
  const I_DSS_V_GSoff = route('I_DSS with V_GSoff of a JFET or MOSFET');
  const g_fs_V_P = route('g_fs with V_P of a JFET');
  const I_on_V_TO = route('I_on with V_TO of a MOSFET');
  const R_V_TO = route('R_DSon with V_TO of a MOSFET');
  const two = route('R_DSon with R_DSon2 of a MOSFET');
  const cases: [string, NamedKernel, Record<string, number>, string][] = [
    ['a V_P of the other channel', I_DSS_V_P, { I_DSS: 5e-3, V_P: 2 }, 'wrong sign'],
    ['a V_P of 0', I_DSS_V_P, { I_DSS: 5e-3, V_P: 0 }, 'wrong sign'],
    ['a negative I_DSS', I_DSS_V_P, { I_DSS: -5e-3, V_P: -2 }, 'not positive'],
    ['a missing number', I_DSS_V_P, { I_DSS: 5e-3 }, 'missing'],
    ['a V_DS of the other channel', I_DSS_V_P, { I_DSS: 5e-3, V_P: -2, 'I_DSS@V_DS': -15 }, 'wrong sign'],
    ['a test current above I_DSS', I_DSS_V_GSoff, { I_DSS: 5e-3, V_GSoff: -2, 'V_GSoff@I_D': 6e-3 }, 'test current'],
    [
      'a V_GSoff at the edge of weak inversion',
      I_DSS_V_GSoff,
      { I_DSS: 5e-3, V_GSoff: -0.2, 'V_GSoff@I_D': 1e-9 },
      'weak inversion',
    ],
    ['a g_fs no FET can have', g_fs_V_P, { g_fs: 40e-3, 'g_fs@I_D': 1e-3, V_P: -2 }, 'too steep'],
    ['an I_on at a gate voltage below threshold', I_on_V_TO, { I_on: 0.1, 'I_on@V_GS': 2, V_TO: 2.1 }, 'no overdrive'],
    [
      'an R_DSon below its series part',
      R_V_TO,
      { R_DSon: 2, 'R_DSon@V_GS': 10, V_TO: 2, r_s: 1.5, r_d: 1 },
      'series resistance',
    ],
    [
      'an I_DSS whose V_DS the leads take whole',
      I_DSS_V_P,
      { I_DSS: 10e-3, 'I_DSS@V_DS': 5, V_P: -2, r_s: 300, r_d: 200 },
      'leads',
    ],
    ['a g_fs above 1 / r_s', g_fs_V_P, { g_fs: 10e-3, 'g_fs@I_D': 5e-3, V_P: -2, r_s: 100 }, 'leads'],
    [
      'an R_DSon at a current that saturates',
      R_V_TO,
      { R_DSon: 2, 'R_DSon@V_GS': 10, 'R_DSon@I_D': 5, V_TO: 2 },
      'not ohmic',
    ],
    ['R_DSon rising with V_GS', two, { R_DSon: 2, 'R_DSon@V_GS': 5, R_DSon2: 3, 'R_DSon2@V_GS': 10 }, 'lines disagree'],
    [
      'the same R_DSon line twice',
      two,
      { R_DSon: 2, 'R_DSon@V_GS': 5, R_DSon2: 2, 'R_DSon2@V_GS': 5 },
      'lines disagree',
    ],
    [
      'g_fs0 with I_DSS out of saturation',
      route('g_fs0 with I_DSS of a JFET'),
      { g_fs0: 5e-3, I_DSS: 10e-3, 'I_DSS@V_DS': 2 },
      'not saturated',
    ],
    [
      'g_os beyond I_D / V_DS',
      LAMBDA_ROUTES[0],
      { g_os: 1e-3, 'g_os@I_D': 1e-3, 'g_os@V_DS': 2 },
      'output conductance',
    ],
  ];
  for (const [name, kernel, values, status] of cases) {
    it(`${name}: ${status}, and no number`, () => {
      const { status: code, ...numbers } = call(kernel, { ...jfet, ...values });
      expect(ROUTE_STATUS[code].name).toBe(status);
      expect(ROUTE_STATUS[code].sentence).toMatch(/^[A-Zg].*\.$/);
      for (const number of Object.values(numbers)) expect(number).toBeNaN();
    });
  }

  it('every status can occur', () => {
    expect(new Set([...cases.map(([, , , status]) => status), 'ok'])).toEqual(
      new Set(ROUTE_STATUS.map(({ name }) => name)),
    );
  });
});

describe('lambda from g_os', () => {
  it('is got back at a current, and at I_DSS where none is stated', () => {
    const u = generator(21);
    for (let k = 0; k < 500; k++) {
      for (const channel of CHANNELS) {
        const part = { ...randomPart(u, 'JFET', true), channel };
        const sheet = dataSheet(part, u);
        expect(Math.abs(call(LAMBDA_ROUTES[0], sheet)['lambda'] - part.lambda)).toBeLessThan(1e-15);
        const atZero = call(FORMS['g_os'], {
          ...sheet,
          V_TO: part.vto,
          'g_os@I_D': NaN,
          'g_os@V_DS': sheet['I_DSS@V_DS'],
        })['value'];
        expect(Math.abs(call(LAMBDA_ROUTES[1], { ...sheet, g_os: atZero })['lambda'] - part.lambda)).toBeLessThan(
          1e-15,
        );
      }
    }
  });
});

describe('the sign of a field', () => {
  it('is what the trade writes on each channel', () => {
    const rows: [string, Family, string, string][] = [
      ['V_P', 'JFET', 'negative', 'positive'],
      ['V_GSoff', 'MOSFET', 'negative', 'positive'],
      ['V_TO', 'JFET', 'negative', 'negative'],
      ['V_TO', 'MOSFET', 'any', 'any'],
      ['V_GSth', 'MOSFET', 'positive', 'negative'],
      ['V_DS', 'MOSFET', 'positive', 'negative'],
      ['I_DSS', 'JFET', 'positive', 'positive'],
      ['lambda', 'JFET', 'not negative', 'not negative'],
      ['tempco', 'JFET', 'any', 'any'],
      ['toString', 'JFET', 'any', 'any'],
    ];
    for (const [field, family, n, p] of rows) {
      expect([field, wantedSign(field, family, 1), wantedSign(field, family, -1)]).toEqual([field, n, p]);
      expect(signReason(field, family)).toMatch(n === 'any' ? /^$/ : /^[A-Za-z].*\.$/);
    }
  });
});
