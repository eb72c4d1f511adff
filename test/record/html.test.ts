import { describe, expect, it } from 'vitest';
import { recordHtml, recordOf } from '../../src/record/index.ts';
import { createSheet } from '../../src/sheet/index.ts';
import { PROBE } from './record-sheet.ts';

const DIGEST = '0123456789abcdef'.repeat(4);
const html = (text: string): string => recordHtml(recordOf(createSheet(text), { digest: DIGEST }));

/** Names of the elements in a text, and of their attributes. */
function markup(text: string): { readonly elements: ReadonlySet<string>; readonly attributes: ReadonlySet<string> } {
  const elements = new Set<string>();
  const attributes = new Set<string>();
  for (const [, name, inside] of text.matchAll(/<([A-Za-z][\w-]*)((?:\s[^<>]*)?)\/?>/g)) {
    elements.add(name!);
    for (const [, attribute] of inside!.matchAll(/([\w:-]+)="[^"]*"/g)) attributes.add(attribute!);
  }
  return { elements, attributes };
}

/** What opens must close, in order; nothing else is a tag. */
function unbalanced(text: string): string[] {
  const open: string[] = [];
  const faults: string[] = [];
  const EMPTY = new Set(['col', 'path', 'circle', 'rect', 'line']);
  for (const [tag, slash, name] of text.matchAll(/<(\/?)([A-Za-z][\w-]*)[^<>]*>/g)) {
    if (slash === '/') {
      if (open.pop() !== name) faults.push(tag);
    } else if (!EMPTY.has(name!) && !tag.endsWith('/>')) open.push(name!);
  }
  return [...faults, ...open];
}

const HOSTILE = [
  '<script>alert(1)</script>',
  '<img src=x onerror=alert(1)>',
  '"><svg onload=alert(1)>',
  "' onclick='alert(1)",
  '</code></li></ol><iframe src=//x>',
  '&lt;b&gt; &amp; &#60;i&#62;',
  '\\href{javascript:alert(1)}{x} $x^2$ \\textbf{b} %',
  '{{x}} ${x} `x`',
];

/** A sheet that says the same hostile thing wherever a text may stand. */
function hostileSheet(words: string): string {
  return `# Title ${words}
  project: ${words}
  author: ${words}
  reason: ${words}
  checked: ${words} [${words.replace(/[[\]]/g, '')}]
> Prose ${words}

## Section ${words}
> More ${words}
V_DD = 18 V ± 4 %  [${words.replace(/[[\];]/g, '')}]  ; ${words}
R_D = 6.8 kohm  ; ${words}
x = ${words}
Q1 = n-JFET  ; ${words}
  I_DSS: 4 mA  [${words.replace(/[[\];]/g, '')}]  ; ${words}
  V_P: -2 V
  ${words}: 3 V
drop = R_D * 1 mA  ; ${words}
c = check drop >= 1 V  ; ${words}
${words}
`;
}

describe('the record as HTML', () => {
  const plain = markup(html(PROBE));

  it('is one article whose elements all close', () => {
    const text = html(PROBE);
    expect(text).toMatch(/^<article class="record" lang="en">.*<\/article>$/s);
    expect(unbalanced(text)).toEqual([]);
  });

  it('has no style, no script, no handler, no address', () => {
    for (const name of ['script', 'style', 'iframe', 'img', 'a', 'link', 'object', 'form']) {
      expect(plain.elements).not.toContain(name);
    }
    const allowed =
      /^(?:class|lang|role|scope|colspan|id|viewBox|width|height|xmlns|data-tex|aria-[a-z]+|d|x|y|x1|y1|x2|y2|cx|cy|r|rx|dy|fill|stroke|points|transform|clip-path|paint-order|text-anchor|font-[a-z]+|(?:fill|stroke)-[a-z]+)$/;
    expect([...plain.attributes].filter((attribute) => !allowed.test(attribute))).toEqual([]);
  });

  it.each(HOSTILE)('takes %s for text wherever it stands', (words) => {
    const text = html(hostileSheet(words));
    const found = markup(text);
    expect(unbalanced(text)).toEqual([]);
    expect([...found.elements].filter((name) => !plain.elements.has(name))).toEqual([]);
    expect([...found.attributes].filter((name) => !plain.attributes.has(name))).toEqual([]);
    // It is there all the same, as it was written.
    const escaped = words
      .replace(/&/g, '&amp;')
      .replace(/</g, '&lt;')
      .replace(/>/g, '&gt;')
      .replace(/"/g, '&quot;')
      .replace(/'/g, '&#39;');
    expect(text.split(escaped).length).toBeGreaterThan(8);
  });

  it('names characters that turn or hide what follows', () => {
    const text = html('# Title\n> safe \u202eevil\u202c and hid\u200bden\n');
    expect(text).toContain('safe ⟨U+202E⟩evil⟨U+202C⟩ and hid⟨U+200B⟩den');
    expect(text).not.toMatch(/[\u200b-\u200f\u202a-\u202e]/);
  });

  it('sets names as the trade does, and leaves formulas to be typeset', () => {
    const text = html(PROBE);
    expect(text).toContain('<span class="name"><i>V</i><sub>DD</sub></span>');
    expect(text).toMatch(
      /role="math" aria-label="V_GS = |aria-label="A1.margin &gt;= 1.5 V" data-tex="\\mathrm\{margin\}/,
    );
    const inText = text
      .replace(/<code>.*?<\/code>/g, '')
      .replace(/ (?:aria-label|data-tex)="[^"]*"/g, '')
      .replace(/<span class="record-formula"[^>]*>[^<]*<\/span>/g, '');
    expect(inText.replace(/<svg.*?<\/svg>/gs, '').match(/>[^<]*\b[A-Za-z]+_[A-Za-z]+/g)).toBeNull();
  });

  it('keeps a number and its unit in one line', () => {
    expect(html('# A\n> Rated 24 V d.c. at 3 places, 40 °C.\n')).toContain('24\u00a0V d.c. at 3 places, 40\u00a0°C.');
  });
});
