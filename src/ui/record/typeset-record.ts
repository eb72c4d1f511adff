// The record as elements, its formulas set by KaTeX. In print there is no time to wait: what is to be typeset then is
// loaded beforehand, with the faces, and until it has come formulas stand as text.

import { recordHtml } from '../../record/index.ts';
import type { RecordTree } from '../../record/index.ts';
import { isTexReady, loadTex, setTex } from '../typeset/index.ts';
import './record.css';

/** The faces that formulas of a sheet use. */
const FACES = ['10pt KaTeX_Main', 'bold 10pt KaTeX_Main', 'italic 10pt KaTeX_Math'].concat(
  ['KaTeX_Size1', 'KaTeX_Size2', 'KaTeX_Size3', 'KaTeX_Size4'].map((face) => `10pt ${face}`),
);

let loading: Promise<void> | null = null;

/** Loads what typesetting takes, once. */
export function loadTypesetter(): Promise<void> {
  loading ??= load();
  return loading;
}

async function load(): Promise<void> {
  // A face that cannot be had leaves the browser's own; the record prints all the same.
  const faces = FACES.map((face) => document.fonts.load(face).catch(() => []));
  await loadTex();
  await Promise.all(faces);
}

/** The record as an element that is in no document yet; its formulas are text until `typesetFormulas`. */
export function recordElement(tree: RecordTree): HTMLElement {
  const template = document.createElement('template');
  // The text is escaped where it is made, and the page's policy runs no script it might hold.
  template.innerHTML = recordHtml(tree);
  return template.content.firstElementChild as HTMLElement;
}

/** Typesets the formulas of a record at once and finds room for those that are too long; nothing where KaTeX has not come. */
export function typesetFormulas(record: HTMLElement): void {
  if (!isTexReady()) return;
  for (const place of record.querySelectorAll<HTMLElement>('[data-tex]')) setTex(place.dataset.tex!, place, 'html');
  // First the whole width below the sentence; what is too long for that stands as text, which breaks anywhere.
  const lines = [...record.querySelectorAll<HTMLElement>('.record-equation, .record-table-checks td')];
  const long = lines.filter(isTooLong);
  for (const line of long) line.classList.add('record-wide');
  for (const line of long.filter(isTooLong)) {
    for (const place of line.querySelectorAll<HTMLElement>('[data-tex]')) {
      if (place.offsetWidth > line.clientWidth) asText(place);
    }
  }
}

function isTooLong(line: HTMLElement): boolean {
  return line.scrollWidth > line.clientWidth + 1;
}

function asText(place: HTMLElement): void {
  const text = document.createElement('code');
  text.textContent = place.ariaLabel;
  place.replaceChildren(text);
}
