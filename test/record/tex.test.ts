import fc from 'fast-check';
import katex from 'katex';
import { describe, expect, it } from 'vitest';
import { parseExpression } from '../../src/language/index.ts';
import { OFFERED_VALUES } from '../../src/network/index.ts';
import { texOfExpression, texOfName, texOfPath, texOfUnit } from '../../src/record/index.ts';
import { typeset } from '../../src/figure/index.ts';
import { strictTex } from './strict-tex.ts';
import { anyArithmetic, anyExpression, ARITHMETIC_SYMBOLS } from './random-expression.ts';
import { texValue } from './tex-value.ts';

const SEED = 20260117;

function texOf(text: string, subject: string | null = null): string {
  const expr = parseExpression(text);
  if ('code' in expr) throw new Error(`${text}: ${expr.text}`);
  return texOfExpression(expr, { text, subject });
}

function rendered(tex: string): string {
  return katex.renderToString(tex, { throwOnError: true, strict: strictTex, output: 'html', trust: false });
}

describe('names', () => {
  it.each([
    ['I_D', 'I_{\\mathrm{D}}'],
    ['V_DSsat', 'V_{\\mathrm{DSsat}}'],
    ['V_GSoff', 'V_{\\mathrm{GS(off)}}'],
    ['R_DSon', 'R_{\\mathrm{DS(on)}}'],
    ['V_DD_max', 'V_{\\mathrm{DD},\\,\\mathrm{max}}'],
    ['gain_band', '\\mathit{gain}_{\\mathrm{band}}'],
    ['Q1', '\\mathrm{Q1}'],
    ['headroom', '\\mathrm{headroom}'],
    ['beta', '\\beta'],
    ['lambda_1', '\\lambda_{\\mathrm{1}}'],
    ['V_beta', 'V_{\\beta}'],
    ['Alpha', '\\mathrm{A}'],
    ['a_', 'a'],
    ['constructor', '\\mathrm{constructor}'],
    ['V_toString', 'V_{\\mathrm{toString}}'],
    ['swing_up', '\\hat{v}_{\\mathrm{up}}'],
  ])('%s is set as %s', (name, tex) => {
    expect(texOfName(name)).toBe(tex);
    rendered(tex);
  });

  it('names the cell of a path only where it is another one than the subject', () => {
    expect(texOfPath(['A1', 'I_D'], 'A1')).toBe('I_{\\mathrm{D}}');
    expect(texOfPath(['A1', 'I_D'], 'headroom')).toBe('I_{\\mathrm{D},\\,\\mathrm{A1}}');
    expect(texOfPath(['A1', 'Qa', 'I_D'], 'A1')).toBe('I_{\\mathrm{D},\\,\\mathrm{Qa}}');
    expect(texOfPath(['A1', 'Qa', 'I_D'], null)).toBe('I_{\\mathrm{D},\\,\\mathrm{A1.Qa}}');
    expect(texOfPath(['A1', 'margin'], null)).toBe('\\mathrm{margin}_{\\mathrm{A1}}');
    expect(texOfPath(['A1', 'swing_up'], null)).toBe('\\hat{v}_{\\mathrm{up},\\,\\mathrm{A1}}');
  });
});

describe('offered values', () => {
  const shown = (tex: string): string => rendered(tex).replace(/<[^>]*>/g, '');
  it.each(OFFERED_VALUES.filter(({ per }) => per !== 'place').map(({ name, tex }) => [name, tex]))(
    '%s reads as in the table of what a stage offers',
    (name, tex) => {
      expect(shown(texOfName(name))).toBe(shown(tex));
    },
  );
});

describe('names in running text', () => {
  it.each([
    'V_GSoff',
    'V_GSth',
    'R_DSon_2',
    'V_DD',
    'Q1',
    'beta',
    'V_beta',
    'Gamma_1',
    'Alpha',
    'omicron_x',
    'headroom',
    'A1.I_D',
    'A1.Qa.I_D',
    'Q1.V_GSoff',
    'Q1.lambda',
    'I_D_max',
    'theta_JA',
    'mu_n',
  ])('%s reads on the page as in a formula', (path) => {
    const html = rendered(texOfPath(path.split('.'), null));
    const [head, ...below] = typeset(path);
    const bare = (text: string): string => text.replace(/[\s\u200b]/g, '');
    expect(bare([head!, ...below].map(({ text }) => text).join(''))).toBe(bare(html.replace(/<[^>]*>/g, '')));
    expect(head!.style === 'italic').toBe(/mathnormal|mathit/.test(html.split('msupsub')[0]!));
  });
});

describe('units', () => {
  it.each([
    ['kΩ', '\\mathrm{k\\Omega{}}'],
    ['mA/V²', '\\mathrm{mA}/\\mathrm{V}^{2}'],
    ['nV/√Hz', '\\mathrm{nV}/\\sqrt{\\mathrm{Hz}}'],
    ['°C', '{}^{\\circ}\\mathrm{C}'],
    ['%', '\\%'],
    ['µA', '\\mathrm{\\text{\\char"B5}A}'],
    ['/V', '/\\mathrm{V}'],
    ['V·s', '\\mathrm{V}{\\cdot}\\mathrm{s}'],
    ['V⁻¹', '\\mathrm{V}^{-1}'],
  ])('%s is set as %s', (unit, tex) => {
    expect(texOfUnit(unit)).toBe(tex);
    expect(rendered(tex)).not.toMatch(/mathnormal|mathit/);
  });
});

describe('expressions', () => {
  it.each([
    ['-R_m * I_D', '-R_{\\mathrm{m}}\\,I_{\\mathrm{D}}'],
    [
      'V_DD - I_D * (R_D + R_S)',
      'V_{\\mathrm{DD}} - I_{\\mathrm{D}}\\,\\left(R_{\\mathrm{D}} + R_{\\mathrm{S}}\\right)',
    ],
    ['beta * (V_GS - V_TO)^2', '\\beta\\,\\left(V_{\\mathrm{GS}} - V_{\\mathrm{TO}}\\right)^{2}'],
    ['I_DSS / V_P²', '\\frac{I_{\\mathrm{DSS}}}{{V_{\\mathrm{P}}}^{2}}'],
    [
      '-g_m * (r_o || R_D || 100 kohm)',
      '-g_{\\mathrm{m}}\\,\\left(r_{\\mathrm{o}} \\parallel R_{\\mathrm{D}} \\parallel 100\\,\\mathrm{k\\Omega{}}\\right)',
    ],
    ['1/g_m || R_S', '\\frac{1}{g_{\\mathrm{m}}} \\parallel R_{\\mathrm{S}}'],
    ['abs(A_v)', '\\left|A_{\\mathrm{v}}\\right|'],
    ['a_1 - (b_1 + c_1)', 'a_{\\mathrm{1}} - \\left(b_{\\mathrm{1}} + c_{\\mathrm{1}}\\right)'],
    ['a_1 + (b_1 - c_1)', 'a_{\\mathrm{1}} + b_{\\mathrm{1}} - c_{\\mathrm{1}}'],
    ['a_1 - -2', 'a_{\\mathrm{1}} - \\left(-2\\right)'],
    ['2 * 3 V', '2 \\cdot 3\\,\\mathrm{V}'],
    ['2 * a_1', '2\\,a_{\\mathrm{1}}'],
    ['3 V * a_1', '3\\,\\mathrm{V} \\cdot a_{\\mathrm{1}}'],
    ['x_1^(1/2)', '{x_{\\mathrm{1}}}^{1/2}'],
    ['4k7', '4.7\\,\\mathrm{k\\Omega{}}'],
    ['1.50 mA', '1.50\\,\\mathrm{mA}'],
    ['12345.6 ohm', '12\\,345.6\\,\\mathrm{\\Omega{}}'],
    ['2e-5', '2 \\times 10^{-5}'],
    ['E24_up(R_S0)', '\\mathrm{E24}_{\\mathrm{up}}\\left(R_{\\mathrm{S0}}\\right)'],
    [
      'x_1 >= 2 V and y_1 <= 3 V',
      'x_{\\mathrm{1}} \\ge 2\\,\\mathrm{V}\\;\\mathrm{and}\\;y_{\\mathrm{1}} \\le 3\\,\\mathrm{V}',
    ],
    ['abs(A_v) within 4 .. 12', '\\left|A_{\\mathrm{v}}\\right|\\;\\mathrm{within}\\;4 \\ldots 12'],
    ['I_D within 5 mA ± 10 %', 'I_{\\mathrm{D}}\\;\\mathrm{within}\\;4.5\\,\\mathrm{mA} \\ldots 5.5\\,\\mathrm{mA}'],
  ])('%s is set as %s', (text, tex) => {
    expect(texOf(text)).toBe(tex);
    rendered(tex);
  });

  it('renders in strict KaTeX whatever is written, and no underscore or backslash shows', () => {
    fc.assert(
      fc.property(anyExpression, (text) => {
        const html = rendered(texOf(text, 'A1'));
        const shown = html.replace(/<[^>]*>/g, '');
        expect(shown).not.toMatch(/[_\\]/);
      }),
      { seed: SEED, numRuns: 2000 },
    );
  }, 60_000);

  it('means, read as formulas are read, what the expression computes', () => {
    let compared = 0;
    fc.assert(
      fc.property(anyArithmetic, ({ text, value }) => {
        if (!Number.isFinite(value)) return;
        const read = texValue(texOf(text), ARITHMETIC_SYMBOLS);
        compared++;
        expect(Math.abs(read - value), texOf(text)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(value)));
      }),
      { seed: SEED, numRuns: 5000 },
    );
    expect(compared).toBeGreaterThan(4000);
  });
});
