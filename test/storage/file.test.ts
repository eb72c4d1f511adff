// Files: what is taken for a sheet, and how one is saved.

import { afterEach, expect, test, vi } from 'vitest';
import { fileName, openFile, saveFile, TEXT_LIMIT } from '../../src/storage/index.ts';

afterEach(() => {
  vi.useRealTimers();
  vi.restoreAllMocks();
});

const file = (...parts: BlobPart[]) => new File(parts, 'stage.txt');
const bytes = (...values: number[]) => Uint8Array.from(values);

async function faultOf(chosen: File): Promise<[code: string, text: string]> {
  const opened = await openFile(chosen);
  if ('text' in opened) throw new Error('it was opened');
  return [opened.fault.code, opened.fault.text];
}

test('a UTF-8 file opens as it is, line ends and all', async () => {
  for (const text of ['', '# A\r\nR = 1 kΩ ± 1 %\r', '𝛽\0']) expect(await openFile(file(text))).toEqual({ text });
});

test('the byte order mark of a file is not part of the text, a second one is', async () => {
  expect(await openFile(file(bytes(0xef, 0xbb, 0xbf), '# A'))).toEqual({ text: '# A' });
  expect(await openFile(file('\uFEFF\uFEFF# A'))).toEqual({ text: '\uFEFF# A' });
});

test('what is not UTF-8 is refused whole', async () => {
  for (const wrong of [bytes(0xb1), bytes(0x41, 0xc3), bytes(0xed, 0xa0, 0x80), bytes(0x89, 0x50, 0x4e, 0x47)]) {
    expect(await faultOf(file('R = 1 ', wrong))).toEqual([
      'file-not-text',
      'stage.txt is not UTF-8 text. Save it as UTF-8 and open it again. Nothing was opened.',
    ]);
  }
});

test('UTF-16 is called by its name', async () => {
  for (const mark of [bytes(0xff, 0xfe, 0x41, 0), bytes(0xfe, 0xff, 0, 0x41)]) {
    expect(await faultOf(file(mark))).toEqual([
      'file-not-text',
      'stage.txt is UTF-16 text. Save it as UTF-8 and open it again. Nothing was opened.',
    ]);
  }
});

test('a file up to the limit opens, a longer one is not even read', async () => {
  expect(await openFile(file('a'.repeat(TEXT_LIMIT)))).toHaveProperty('text.length', TEXT_LIMIT);
  const long = file('a'.repeat(TEXT_LIMIT + 1));
  const read = vi.spyOn(long, 'arrayBuffer');
  expect(await faultOf(long)).toEqual([
    'file-too-large',
    'stage.txt has 2\u2009097\u2009153 bytes; a sheet has at most 2\u2009097\u2009152. Nothing was opened.',
  ]);
  expect(read).not.toHaveBeenCalled();
});

test('a file that cannot be read is said to be so', async () => {
  const gone = file('# A');
  vi.spyOn(gone, 'arrayBuffer').mockRejectedValue(new DOMException('', 'NotFoundError'));
  expect(await faultOf(gone)).toEqual([
    'file-unreadable',
    'stage.txt could not be read: it is a folder, was moved, or may not be read. Nothing was opened.',
  ]);
  vi.spyOn(gone, 'arrayBuffer').mockRejectedValue(new TypeError('our own'));
  await expect(openFile(gone)).rejects.toThrow('our own');
});

test('a title becomes a name that every system takes', () => {
  const names: [title: string, name: string][] = [
    ['Input stage, rev B', 'Input stage, rev B.txt'],
    ['Eingangsstufe Ω 1', 'Eingangsstufe Ω 1.txt'],
    ['a/b\\c:d*e?f"g<h>i|j', 'a b c d e f g h i j.txt'],
    ['  two\t\n words  ', 'two words.txt'],
    ['..hidden..', 'hidden.txt'],
    ['ends with a point.', 'ends with a point.txt'],
    ['../../etc', 'etc.txt'],
    ['turned \u202Etxt.exe', 'turned txt.exe.txt'],
    ['con', 'sheet con.txt'],
    ['Com1.old', 'sheet Com1.old.txt'],
    ['console', 'console.txt'],
    ['', 'sheet.txt'],
    ['///', 'sheet.txt'],
    ['...', 'sheet.txt'],
  ];
  for (const [title, name] of names) expect(fileName(title), title).toBe(name);
});

test('a long title is cut between characters', () => {
  expect(fileName('𝛽'.repeat(200))).toBe(`${'𝛽'.repeat(80)}.txt`);
  expect(fileName(`${'a'.repeat(79)} b`)).toBe(`${'a'.repeat(79)}.txt`);
});

test('a sheet is saved under its title as UTF-8 without a mark, and the browser gets time to read it', async () => {
  vi.useFakeTimers();
  const blobs: Blob[] = [];
  const revoked = vi.spyOn(URL, 'revokeObjectURL').mockReturnValue();
  vi.spyOn(URL, 'createObjectURL').mockImplementation((blob) => {
    blobs.push(blob as Blob);
    return 'blob:sheet';
  });
  const link = { href: '', download: '', clicked: 0, click: () => void link.clicked++ };
  saveFile('# Stage\r\nR = 1 kΩ\n', { createElement: () => link } as unknown as Document);
  expect(link).toMatchObject({ href: 'blob:sheet', download: 'Stage.txt', clicked: 1 });
  expect(new Uint8Array(await blobs[0].arrayBuffer())).toEqual(new TextEncoder().encode('# Stage\r\nR = 1 kΩ\n'));
  vi.advanceTimersByTime(30_000);
  expect(revoked).not.toHaveBeenCalled();
  vi.advanceTimersByTime(60_000);
  expect(revoked).toHaveBeenCalledExactlyOnceWith('blob:sheet');
});
