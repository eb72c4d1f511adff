// The whole page: shows the lines of the sheet that opens at first.

import { For } from 'solid-js';
import exampleSheet from '../../public/examples/input-stage.txt?raw';
import './page.css';

const lines = exampleSheet.split('\n').filter((line) => line !== '');

/** The page with its one sheet. */
export function App() {
  return (
    <main>
      <h1>Squarelaw</h1>
      <ol aria-label="Lines of the sheet">
        <For each={lines}>{(line) => <li>{line}</li>}</For>
      </ol>
    </main>
  );
}
