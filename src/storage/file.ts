// Sheets as text files: opening one from the disk, and saving one as a download.
//
// A file is UTF-8. A byte order mark at its start belongs to the file and not to the text: it is dropped on opening,
// as the terminal does, and none is written. Line ends stay as they are.

import { countText } from './sentences.ts';
import type { StorageFault } from './sentences.ts';
import { titleOf } from './sheet-record.ts';
import { TEXT_LIMIT } from './share-link.ts';

type Opened = { readonly text: string } | { readonly fault: StorageFault };

/** Milliseconds for which the browser may take to read the text it saves. */
const SAVING_TIME = 60_000;

/** Reads a sheet from a file that the user chose or dropped. */
export async function openFile(file: File): Promise<Opened> {
  const { name, size } = file;
  if (size > TEXT_LIMIT) {
    return fault(
      'file-too-large',
      `${name} has ${countText(size)} bytes; a sheet has at most ${countText(TEXT_LIMIT)}. Nothing was opened.`,
    );
  }
  let bytes: Uint8Array;
  try {
    bytes = new Uint8Array(await file.arrayBuffer());
  } catch (thrown) {
    if (!(thrown instanceof DOMException)) throw thrown;
    return fault(
      'file-unreadable',
      `${name} could not be read: it is a folder, was moved, or may not be read. Nothing was opened.`,
    );
  }
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes) };
  } catch {
    const found = isUtf16(bytes) ? 'is UTF-16 text' : 'is not UTF-8 text';
    return fault('file-not-text', `${name} ${found}. Save it as UTF-8 and open it again. Nothing was opened.`);
  }
}

/** Hands the text to the browser as a download named after its title. */
export function saveFile(text: string, document: Document): void {
  const address = URL.createObjectURL(new Blob([text], { type: 'text/plain;charset=utf-8' }));
  const link = document.createElement('a');
  link.href = address;
  link.download = fileName(titleOf(text));
  link.click();
  setTimeout(() => URL.revokeObjectURL(address), SAVING_TIME);
}

/** A file name of at most 84 characters that all systems take, from a title. */
export function fileName(title: string): string {
  // oxlint-disable-next-line no-control-regex -- they are what is taken out
  const plain = title.replace(/[\u0000-\u001f\u007f-\u009f\u200e\u200f\u202a-\u202e\u2066-\u2069\\/:*?"<>|]+/g, ' ');
  const words = plain.replace(/\s+/g, ' ').trim();
  const short = Array.from(words).slice(0, LONGEST_NAME).join('');
  // Hidden files begin with a point; Windows drops points and blanks at the end of a name.
  const name = short.replace(/^[. ]+|[. ]+$/g, '');
  if (name === '') return 'sheet.txt';
  return WINDOWS_DEVICE.test(name) ? `sheet ${name}.txt` : `${name}.txt`;
}

const LONGEST_NAME = 80;
/** Names that mean a device on Windows, with any ending. */
const WINDOWS_DEVICE = /^(?:con|prn|aux|nul|com\d|lpt\d)(?:\.|$)/i;

function isUtf16(bytes: Uint8Array): boolean {
  return (bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff);
}

function fault(code: string, text: string): Opened {
  return { fault: { code, text } };
}
