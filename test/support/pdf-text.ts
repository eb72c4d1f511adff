// Reads the text of a PDF as Chromium writes it: objects in plain sight, deflated streams, glyphs by number with a table
// that says which characters they are. Whatever else a PDF may be is refused.

import { inflateSync } from 'node:zlib';

export interface PdfPage {
  /** Texts in the order they are painted, without the blanks between them. */
  readonly text: string;
  /** In points. */
  readonly width: number;
  readonly height: number;
}

/** The pages of a PDF in order. Throws for one that Chromium would not write. */
export function readPdf(bytes: Uint8Array): PdfPage[] {
  const objects = readObjects(Buffer.from(bytes));
  const pages = [...objects.values()].filter(({ head }) => /\/Type \/Page\b/.test(head));
  const byKids = [...objects.values()].flatMap(({ head }) => kids(head));
  const inOrder = byKids.map((number) => objects.get(number)!).filter((object) => pages.includes(object));
  if (pages.length === 0 || inOrder.length !== pages.length) throw new Error('The pages of the PDF were not found.');
  return inOrder.map((page) => readPage(page.head, objects));
}

interface PdfObject {
  readonly number: number;
  /** The dictionary. */
  readonly head: string;
  readonly stream: Buffer | null;
}
type Objects = ReadonlyMap<number, PdfObject>;

function readObjects(bytes: Buffer): Objects {
  const text = bytes.toString('latin1');
  const objects = new Map<number, PdfObject>();
  const start = /(?:^|\n)(\d+) 0 obj\n/g;
  for (let found = start.exec(text); found; found = start.exec(text)) {
    const number = Number(found[1]);
    const from = start.lastIndex;
    const end = text.indexOf('endobj', from);
    const at = text.indexOf('stream\n', from);
    if (at < 0 || at > end) {
      objects.set(number, { number, head: text.slice(from, end), stream: null });
      continue;
    }
    const head = text.slice(from, at);
    const length = Number(/\/Length (\d+)/.exec(head)![1]);
    const body = at + 'stream\n'.length;
    const raw = bytes.subarray(body, body + length);
    objects.set(number, { number, head, stream: head.includes('/FlateDecode') ? inflateSync(raw) : raw });
    start.lastIndex = body + length;
  }
  return objects;
}

function kids(head: string): number[] {
  const list = /\/Kids \[([^\]]*)\]/.exec(head);
  return list ? [...list[1]!.matchAll(/(\d+) 0 R/g)].map(([, number]) => Number(number)) : [];
}

function readPage(head: string, objects: Objects): PdfPage {
  const [, , , width, height] = /\/MediaBox \[([\d.]+) ([\d.]+) ([\d.]+) ([\d.]+)\]/.exec(head)!;
  const fonts = new Map<string, Map<number, string>>();
  const list = /\/Font <<(.*?)>>/s.exec(head)?.[1] ?? '';
  for (const [, name, number] of list.matchAll(/\/(\w+) (\d+) 0 R/g)) {
    fonts.set(name!, characters(objects.get(Number(number))!, objects));
  }
  const content = objects.get(Number(/\/Contents (\d+) 0 R/.exec(head)![1]))!.stream!.toString('latin1');
  let font = new Map<number, string>();
  let text = '';
  for (const [, name, glyphs] of content.matchAll(/\/(\w+) [\d.]+ Tf|<([0-9A-F]+)> Tj/g)) {
    if (name !== undefined) font = fonts.get(name)!;
    else for (const [glyph] of glyphs!.matchAll(/.{4}/g)) text += font.get(Number.parseInt(glyph, 16)) ?? '?';
  }
  // Two letters in one glyph are two letters.
  text = text.replace(/\s+/g, '').replace(/[\ufb00-\ufb04]/g, (ligature) => ligature.normalize('NFKC'));
  return { text, width: Number(width), height: Number(height) };
}

/** Which characters the glyphs of a font stand for. */
function characters({ head }: PdfObject, objects: Objects): Map<number, string> {
  const found = new Map<number, string>();
  const table = /\/ToUnicode (\d+) 0 R/.exec(head);
  if (!table) return found;
  const text = objects.get(Number(table[1]))!.stream!.toString('latin1');
  const hex = (digits: string): number => Number.parseInt(digits, 16);
  for (const [, block] of text.matchAll(/beginbfchar\n(.*?)endbfchar/gs)) {
    for (const [, glyph, units] of block!.matchAll(/<(\w+)> <(\w+)>/g)) {
      found.set(hex(glyph!), String.fromCharCode(...units!.match(/.{4}/g)!.map(hex)));
    }
  }
  for (const [, block] of text.matchAll(/beginbfrange\n(.*?)endbfrange/gs)) {
    for (const [, first, last, unit] of block!.matchAll(/<(\w+)> <(\w+)> <(\w+)>/g)) {
      for (let glyph = hex(first!); glyph <= hex(last!); glyph++) {
        found.set(glyph, String.fromCharCode(hex(unit!) + glyph - hex(first!)));
      }
    }
  }
  return found;
}
