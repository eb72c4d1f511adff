// The record in the built page: on the screen, where its title block is filled in, and printed on paper.

import { expect } from 'vitest';
import type { Locator, Page } from 'playwright-core';
import { sha256Hex } from '../../src/numeric/index.ts';
import { writeLink } from '../../src/storage/index.ts';
import { test } from '../support/page-test.ts';
import { readPdf } from '../support/pdf-text.ts';
import type { PdfPage } from '../support/pdf-text.ts';

const TITLE = 'Crevasse listener, probe electronics';
/** The least size of print, 7 pt, in CSS pixels; a tenth is left for rounding. */
const LEAST_SIZE = (7 * 96) / 72 - 0.1;

async function openPage(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
  // What typesetting takes is loaded beforehand; a print before that would show formulas as text.
  await page.waitForLoadState('networkidle');
}

async function openSheet(page: Page, address: string, text: string): Promise<void> {
  const written = await writeLink(text, sha256Hex);
  if ('fault' in written) throw new Error(written.fault.text);
  await openPage(page, `${address}#${written.fragment}`);
}

async function openRecord(page: Page): Promise<Locator> {
  await page.getByRole('button', { name: 'Record', exact: true }).click();
  const view = page.getByRole('dialog', { name: 'Record' });
  await view.locator('.record h1').waitFor();
  return view;
}

async function print(page: Page): Promise<PdfPage[]> {
  return readPdf(await page.pdf({ preferCSSPageSize: true }));
}

/** Blanks are not told from gaps in a PDF. */
function packed(text: string): string {
  return text.replace(/\s+/g, '');
}

/** Mounts the record as for print and keeps it, so that it can be measured. */
async function mountPrinted(page: Page): Promise<Locator> {
  await page.emulateMedia({ media: 'print' });
  await page.evaluate(() => window.dispatchEvent(new Event('beforeprint')));
  return page.locator('.record-print .record');
}

test('every printed page has title, digest and its number, on A4', async ({ page, address }) => {
  await openPage(page, address);
  const pages = await print(page);
  expect(pages.length).toBeGreaterThan(5);
  const digest = /Squarelaw,text([0-9a-f]{16})/.exec(pages[0]!.text)![1]!;
  pages.forEach(({ text, width, height }, at) => {
    expect(text).toContain(packed(TITLE));
    expect(text).toContain(`Squarelaw,text${digest}`);
    expect(text).toContain(`page${at + 1}of${pages.length}`);
    expect([Math.round(width), Math.round(height)]).toEqual([595, 842]);
  });
  // The title block has the whole of it.
  expect(pages[0]!.text).toMatch(new RegExp(`SHA-256ofthesheettext${digest}[0-9a-f]{48}`));
  expect(pages[1]!.text).toContain('revisionB,draft');
});

test('the whole record prints, and nothing else of the page', async ({ page, address }) => {
  await openPage(page, address);
  const text = (await print(page)).map((each) => each.text).join('');
  const sections =
    'Result, Checks, To be confirmed, The sheet, Workings, Figures, Cautions and limits, Sign-off, The sheet text';
  sections.split(', ').forEach((title, at) => {
    expect(text).toContain(packed(`${at + 1} ${title}`));
  });
  expect(text).toContain(packed('All 9 checks hold at the nominal values.'));
  expect(text).toContain(packed('Local codes and licensed practice decide'));
  expect(text).toContain(packed('headroom = check A1.margin >= 1.5 V'));
  for (const chrome of ['This is a worked example', 'Stand at', 'follows the selection']) {
    expect(text).not.toContain(packed(chrome));
  }
});

test('print is the same from the screen view, and takes nothing away from the page', async ({ page, address }) => {
  await openPage(page, address);
  // A record of what was counted so far would be another one a moment later.
  await page
    .getByText(/of 10 000 builds .* hold all of them/)
    .first()
    .waitFor();
  const direct = await print(page);
  const view = await openRecord(page);
  const fromView = await print(page);
  const body = (pages: readonly PdfPage[]): string[] =>
    pages.map(({ text }) => text.replace(/20\d\d-\d\d-\d\d\d\d:\d\d/g, ''));
  expect(body(fromView)).toEqual(body(direct));
  await expect(page.locator('.record-print').count()).resolves.toBe(0);
  await view.getByRole('button', { name: 'Close' }).click();
  await view.waitFor({ state: 'detached' });
  await page.getByRole('grid', { name: 'Sheet' }).waitFor();
});

test('a sheet that asks for Letter is printed on Letter', async ({ page, address }) => {
  await openSheet(page, address, '# Letter sheet\n  paper: Letter\nx = 1 V  [bench]\n');
  const pages = await print(page);
  expect(pages.length).toBeGreaterThan(0);
  for (const { width, height } of pages) expect([Math.round(width), Math.round(height)]).toEqual([612, 792]);
});

/** Texts of the record that are smaller than print may be, and those that reach beyond its right edge. */
function misfits(record: Locator): Promise<{ small: string[]; wide: string[] }> {
  return record.evaluate((root, least) => {
    const small: string[] = [];
    const wide: string[] = [];
    const right = root.getBoundingClientRect().right + 1;
    const walker = document.createTreeWalker(root, NodeFilter.SHOW_TEXT);
    for (let node = walker.nextNode(); node; node = walker.nextNode()) {
      const text = node.textContent!.replace(/[\s\u200b]+/g, '');
      const element = node.parentElement!;
      // Titles of drawings are read, not shown.
      if (text === '' || element.closest('title, desc')) continue;
      // Drawings are scaled to their place.
      const svg = element.closest<SVGSVGElement>('svg.sq-figure');
      const scale = svg ? svg.getBoundingClientRect().width / svg.viewBox.baseVal.width : 1;
      const size = Number.parseFloat(getComputedStyle(element).fontSize) * scale;
      // Subscripts of subscripts are the one thing that KaTeX sets smaller.
      if (size < least && !element.closest('.mtight .mtight, .mfrac .mfrac')) small.push(`${text} ${size}`);
      const range = document.createRange();
      range.selectNodeContents(node);
      if (range.getBoundingClientRect().right > right) wide.push(text);
    }
    return { small, wide };
  }, LEAST_SIZE);
}

test('formulas are typeset and fit, and no text is smaller than 7 pt', async ({ page, address }) => {
  await openPage(page, address);
  const record = await mountPrinted(page);
  await expect(record.locator('[data-tex] .katex').count()).resolves.toBe(await record.locator('[data-tex]').count());
  await expect(record.locator('.katex-error').count()).resolves.toBe(0);
  await expect(misfits(record)).resolves.toEqual({ small: [], wide: [] });
});

test('a formula too long for its column gets the whole width, one too long for that breaks as text', async ({
  page,
  address,
}) => {
  const sum = (terms: number): string => Array.from({ length: terms }, () => 'R_0').join(' + ');
  const formulas = [3, 10, 16].map((terms) => `share_${terms} = R_0 / (${sum(terms)})`).join('\n');
  await openSheet(
    page,
    address,
    `# Long\nR_0 = 1.5 kohm  [bench]\n${formulas}\nlimit = check R_0 / (${sum(12)}) >= 0.01\n`,
  );
  const record = await mountPrinted(page);
  const steps = record.locator('.record-step');
  const kinds = await steps.evaluateAll((all) =>
    all.map((step) => [step.querySelector('.record-wide') !== null, step.querySelectorAll('code').length]),
  );
  expect(kinds).toEqual([
    [false, 0],
    [true, 0],
    [true, 1],
  ]);
  await expect(record.locator('.record-table-checks code').count()).resolves.toBe(2);
  await expect(misfits(record)).resolves.toEqual({ small: [], wide: [] });
});

test('print is light in the dark', async ({ page, address }) => {
  await page.emulateMedia({ colorScheme: 'dark' });
  await openPage(page, address);
  const record = await mountPrinted(page);
  await page.emulateMedia({ media: 'print', colorScheme: 'dark' });
  const colors = await record.evaluate((root) => {
    const look = (element: Element): string[] => {
      const { color, backgroundColor } = getComputedStyle(element);
      return [color, backgroundColor];
    };
    return [look(root), look(document.body)[1]];
  });
  expect(colors).toEqual([['rgb(26, 31, 36)', 'rgb(255, 255, 255)'], 'rgb(255, 255, 255)']);
});

test('the record of an incomplete sheet says so on every page', async ({ page, address }) => {
  const lines = Array.from({ length: 120 }, (_, at) => `x${at} = ${at + 1} V`).join('\n');
  await openSheet(page, address, `# Half done\n  revision: A\n${lines}\nbad = 1 V + 1 A\n`);
  const pages = await print(page);
  expect(pages.length).toBeGreaterThan(2);
  expect(pages[0]!.text).toContain(packed('Record of an incomplete sheet: 1 cell is broken.'));
  for (const { text } of pages.slice(1)) expect(text).toContain('incomplete,revisionA');
});

test('what a sheet says is text in the record, whatever it says', async ({ page, address }) => {
  const hostile = '<img src=x onerror=alert(1)> "\\2022" </style> \\href{javascript:alert(1)}{x}';
  await openSheet(page, address, `# ${hostile}\n  project: ${hostile}\n> ${hostile}\nx = 1 V  [bench]  ; ${hostile}\n`);
  const [first] = await print(page);
  expect(first!.text.split(packed(hostile)).length).toBeGreaterThan(4);
  const view = await openRecord(page);
  await expect(view.locator('.record img, .record script, .record a').count()).resolves.toBe(0);
  await expect(view.locator('.record h1').textContent()).resolves.toBe(hostile);
});

test('the title block is filled in on the screen, as edits of the sheet', async ({ page, address }) => {
  await openPage(page, address);
  const view = await openRecord(page);
  await view.getByText('Made by: not given.').waitFor();
  await view.getByLabel('Made by').fill('N. N.');
  await view.getByLabel('Date').fill('2 March 2027');
  await view.getByLabel('Date').press('Enter');
  await expect.poll(() => view.getByText(/: not given\.$/).allTextContents()).toEqual(['Checked by: not given.']);
  await view.getByRole('region', { name: 'The record as it prints' }).getByText('2 March 2027').first().waitFor();
  await view.getByRole('button', { name: 'Close' }).click();
  // Two steps back, and the sheet is as it was.
  await page.getByRole('button', { name: /^Undo/ }).click();
  await page.getByRole('button', { name: /^Undo/ }).click();
  await openRecord(page);
  await expect(view.getByLabel('Date').inputValue()).resolves.toBe('');
});

test('what is open leads to its cell', async ({ page, address }) => {
  await openSheet(page, address, '# A\nx = 1 V  [bench]\nlimit = check x >= 2 V\n');
  await page.getByRole('button', { name: 'Record', exact: true }).click();
  const view = page.getByRole('dialog', { name: 'Record' });
  await view.getByRole('button', { name: 'limit fails, 1.00 V short.' }).click();
  await view.waitFor({ state: 'detached' });
  await expect
    .poll(() => page.evaluate(() => document.activeElement?.closest('[data-key]')?.getAttribute('data-key')))
    .toBe('cell:limit');
});

test('Escape closes the record', async ({ page, address }) => {
  await openPage(page, address);
  const view = await openRecord(page);
  await page.keyboard.press('Escape');
  await view.waitFor({ state: 'detached' });
});
