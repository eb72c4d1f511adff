// Keeping sheets in a real browser: its store, its quota, its tabs, its compressor, its downloads.

import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { expect } from 'vitest';
import type { Page } from 'playwright-core';
import { openUnwatchedContext, test } from '../support/page-test.ts';
import { openStoragePage } from '../support/storage-page.ts';

/** Opens a sheet, or a new one, and answers its name. */
function openDesk(page: Page, id?: string): Promise<string> {
  return page.evaluate(async (id) => {
    globalThis.desk = await underTest.openDesk(id);
    return desk.record.id;
  }, id);
}

const type = (page: Page, text: string) => page.evaluate((text) => desk.type(text), text);
const flush = (page: Page) => page.evaluate(() => desk.keeper.flush());
const state = (page: Page) => page.evaluate(() => desk.keeper.state());

function textOnShelf(page: Page, id: string): Promise<string | null> {
  return page.evaluate(async (id) => {
    const { record } = await underTest.openDesk(id);
    return record.text;
  }, id);
}

test('every edit is kept within a second, without leaving the page', async ({ context, address }) => {
  const page = await openStoragePage(context, address);
  const id = await openDesk(page);
  const took = await page.evaluate(async () => {
    const start = performance.now();
    desk.type('# Stage');
    while (desk.keeper.state().state !== 'kept') await new Promise((done) => setTimeout(done, 5));
    return performance.now() - start;
  });
  expect(took).toBeLessThan(1000);
  const other = await openStoragePage(context, address);
  expect(await textOnShelf(other, id)).toBe('# Stage');
});

test('an edit right before the page goes is kept', async ({ context, address }) => {
  const page = await openStoragePage(context, address);
  const id = await openDesk(page);
  await page.evaluate(() => {
    desk.type('# First');
    void desk.keeper.flush();
    desk.type('# Last');
    location.reload();
  });
  await page.waitForFunction(() => 'underTest' in globalThis && !('desk' in globalThis));
  await expect.poll(() => textOnShelf(page, id)).toBe('# Last');
});

test('undo goes on behind a reload', async ({ context, address }) => {
  const page = await openStoragePage(context, address);
  const id = await openDesk(page);
  await type(page, 'R = 1 kohm');
  await type(page, 'R = 1.2 kohm');
  await flush(page);
  await page.reload();
  await openDesk(page, id);
  const trail = await page.evaluate(() => {
    const once = underTest.storage.undo(desk.record)!;
    return [desk.record.text, once.text, underTest.storage.undo(once)!.text];
  });
  expect(trail).toEqual(['R = 1.2 kohm', 'R = 1 kohm', '']);
});

test('a crash of the page loses nothing that was said to be kept', async ({ address }) => {
  const context = await openUnwatchedContext();
  try {
    const page = await openStoragePage(context, address);
    const id = await openDesk(page);
    await type(page, '# Kept');
    expect(await flush(page)).toHaveProperty('state', 'kept');
    const crashed = page.waitForEvent('crash');
    const session = await context.newCDPSession(page);
    void session.send('Page.crash').catch(() => undefined);
    await crashed;
    const next = await openStoragePage(context, address);
    expect(await textOnShelf(next, id)).toBe('# Kept');
  } finally {
    await context.close();
  }
});

test('on a full disk the last kept version stays and the change is said not to be kept', async ({
  context,
  address,
}) => {
  const page = await openStoragePage(context, address);
  // The browser remembers an allowance once it has written: this has to come first.
  const session = await context.newCDPSession(page);
  await session.send('Storage.overrideQuotaForOrigin', { origin: new URL(address).origin, quotaSize: 400_000 });
  const id = await openDesk(page);
  await type(page, '# Small');
  expect(await flush(page)).toHaveProperty('state', 'kept');
  await page.evaluate(() => {
    const numbers = crypto.getRandomValues(new Uint32Array(10_000));
    const noise = Array.from({ length: 100 }, (_, turn) => numbers.map((n) => n ^ turn).join(' '));
    desk.type(noise.join('\n'));
  });
  const said = await flush(page);
  expect(said).toMatchObject({ state: 'not kept', code: 'storage-full' });
  expect(said).toHaveProperty(
    'reason',
    expect.stringMatching(
      /^The last change, at \d\d:\d\d, could not be kept: storage is full\. The version of \d\d:\d\d is safe\. Save a file now, then make room on the shelf\.$/,
    ),
  );
  const other = await openStoragePage(context, address);
  expect(await textOnShelf(other, id)).toBe('# Small');
  // A smaller text finds room at once.
  await type(page, '# Smaller');
  await expect.poll(() => state(page).then(({ state }) => state)).toBe('kept');
  expect(await textOnShelf(other, id)).toBe('# Smaller');
});

test('where the browser refuses storage, that is said', async ({ context, address }) => {
  const page = await openStoragePage(context, address, { 'Content-Security-Policy': 'sandbox allow-scripts' });
  await openDesk(page);
  await type(page, '# Stage');
  expect(await flush(page)).toEqual({
    state: 'not kept',
    code: 'storage-refused',
    reason:
      'This browser refuses to store anything, perhaps because the window is private. ' +
      'Your sheet lives in this tab only; save it as a file or copy a link before you close it.',
  });
});

test('two tabs with one sheet: an idle one hears of a change, and neither overwrites the other', async ({
  context,
  address,
}) => {
  const [a, b] = [await openStoragePage(context, address), await openStoragePage(context, address)];
  const id = await openDesk(a);
  await type(a, 'one');
  await flush(a);
  await openDesk(b, id);
  await type(b, 'two');
  await flush(b);
  await expect
    .poll(() => state(a))
    .toMatchObject({ state: 'elsewhere', kind: 'changed', own: 'unchanged', theirs: { text: 'two' } });
  // The first one goes on regardless: its text is kept beside the other's.
  await type(a, 'three');
  expect(await flush(a)).toMatchObject({ state: 'elsewhere', own: 'set aside' });
  expect(await textOnShelf(b, id)).toBe('two');
  const titles = await b.evaluate(async () => {
    const listed = await desk.shelf.list();
    return 'sheets' in listed ? listed.sheets.map(({ asideOf }) => asideOf) : [];
  });
  expect(titles).toEqual([id, null]);
  await a.evaluate(() => desk.keeper.keepMine());
  expect(await textOnShelf(b, id)).toBe('three');
  await expect.poll(() => state(b)).toMatchObject({ state: 'elsewhere', theirs: { text: 'three' } });
});

test('saves of two tabs at the same moment: one goes through, both texts live', async ({ context, address }) => {
  const [a, b] = [await openStoragePage(context, address), await openStoragePage(context, address)];
  const id = await openDesk(a);
  await type(a, 'start');
  await flush(a);
  await openDesk(b, id);
  for (let round = 0; round < 10; round++) {
    await Promise.all([type(a, `a ${round}`), type(b, `b ${round}`)]);
    await Promise.all([flush(a), flush(b)]);
    const kept = await a.evaluate(async () => {
      const listed = await desk.shelf.list();
      if ('fault' in listed) throw new Error(listed.fault.text);
      const loaded = await Promise.all(listed.sheets.map((sheet) => desk.shelf.load(sheet.id)));
      return loaded.map((found) => ('record' in found ? found.record.text : found.fault.text));
    });
    expect(kept).toContain(`a ${round}`);
    expect(kept).toContain(`b ${round}`);
  }
});

test('links are written and read by this browser, too', async ({ context, address }) => {
  const page = await openStoragePage(context, address);
  const results = await page.evaluate(async () => {
    const { sha256Hex, storage } = underTest;
    const texts = ['', '\uFEFF# A\r\n', '# Ω µ 𝛽\n'.repeat(3000)];
    const back: unknown[] = [];
    for (const text of texts) {
      const written = await storage.writeLink(text, sha256Hex);
      const read = 'fragment' in written ? await storage.readLink(written.fragment, sha256Hex) : null;
      back.push(read && 'text' in read && read.text === text);
    }
    const settled = 'sheet-1.28.U1YILklMT-XlClKwVTBUyD63kgsA.3932520cf9cb';
    back.push(await storage.readLink(settled, sha256Hex));
    const cut = await storage.readLink(settled.slice(0, 30), sha256Hex);
    back.push(cut && 'fault' in cut && cut.fault.code);
    return back;
  });
  expect(results).toEqual([true, true, true, { text: '# Stage\r\nR = 1 kΩ\n' }, 'link-cut']);
});

test('a small link that unpacks to a huge text is stopped', async ({ context, address }) => {
  const page = await openStoragePage(context, address);
  const code = await page.evaluate(async () => {
    const { sha256Hex, storage } = underTest;
    const packer = new Blob(['a'.repeat(8_000_000)]).stream().pipeThrough(new CompressionStream('deflate-raw'));
    const packed = new Uint8Array(await new Response(packer).arrayBuffer());
    const body = btoa(Array.from(packed, (byte) => String.fromCharCode(byte)).join(''))
      .replaceAll('+', '-')
      .replaceAll('/', '_')
      .replaceAll('=', '');
    const read = await storage.readLink(`sheet-1.${body.length}.${body}.000000000000`, sha256Hex);
    return read && 'fault' in read && read.fault.code;
  });
  expect(code).toBe('link-too-large');
});

test('a sheet is saved as a download and opened from a file, under the policy of the page', async ({
  context,
  address,
}) => {
  const page = await openStoragePage(context, address);
  const text = '# Stage: rev B\r\nR = 1 kΩ\n';
  const downloading = page.waitForEvent('download');
  await page.evaluate((text) => underTest.storage.saveFile(text, document), text);
  const download = await downloading;
  expect(download.suggestedFilename()).toBe('Stage rev B.txt');
  const folder = mkdtempSync(path.join(tmpdir(), 'saved-sheet-'));
  try {
    const file = path.join(folder, download.suggestedFilename());
    await download.saveAs(file);
    expect(readFileSync(file, 'utf8')).toBe(text);
    await page.evaluate(() => {
      const chooser = document.createElement('input');
      chooser.type = 'file';
      document.body.append(chooser);
    });
    await page.locator('input').setInputFiles(file);
    const opened = await page.evaluate(() =>
      underTest.storage.openFile(document.querySelector('input')!.files!.item(0)!),
    );
    expect(opened).toEqual({ text });
  } finally {
    rmSync(folder, { recursive: true });
  }
});
