// Printing gives the record, however it was asked for: before it the record is put beside the page, whose own
// elements do not print then, and after it it is taken away.

import { recordOf } from '../../record/index.ts';
import type { Desk } from '../desk/index.ts';
import { momentText } from './moment.ts';
import { pageWords } from './page-words.ts';
import { loadTypesetter, recordElement, typesetFormulas } from './typeset-record.ts';
import './print.css';

const PRINTING = 'record-printing';

/** Makes every print of the page one of the record of its sheet; `digestOf` gives the SHA-256 of a text. The result undoes it. */
export function installPrint(desk: Desk, digestOf: (text: string) => string): () => void {
  let place: HTMLElement | null = null;

  const end = (): void => {
    place?.remove();
    place = null;
    document.documentElement.classList.remove(PRINTING);
  };
  const begin = (): void => {
    end();
    const { sheet } = desk.document;
    const tree = recordOf(sheet, {
      judged: desk.spread.isStale() ? null : desk.spread.judged(),
      digest: digestOf(sheet.tree.text),
      printedAt: momentText(new Date()),
    });
    const root = document.documentElement;
    for (const [property, value] of Object.entries(pageWords(tree))) root.style.setProperty(property, value);
    root.classList.add(PRINTING);
    place = document.createElement('div');
    place.className = `record-print record-on-${tree.paper.toLowerCase()}`;
    const record = recordElement(tree);
    place.append(record);
    document.body.append(place);
    typesetFormulas(record);
  };

  void loadTypesetter();
  window.addEventListener('beforeprint', begin);
  window.addEventListener('afterprint', end);
  return () => {
    window.removeEventListener('beforeprint', begin);
    window.removeEventListener('afterprint', end);
    end();
  };
}
