// The whole page.

import exampleSheet from '../../public/examples/crevasse-listener.txt?raw';
import { createDesk } from './desk/index.ts';
import { createSheetDocument } from './document/index.ts';
import { SheetGrid } from './grid/index.ts';
import './theme.css';
import './page.css';

/** The page with its one sheet. */
export function App() {
  const desk = createDesk(createSheetDocument(exampleSheet));
  return (
    <main>
      <SheetGrid desk={desk} />
    </main>
  );
}
