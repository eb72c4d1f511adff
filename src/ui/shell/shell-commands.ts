// The commands of the page as a whole.

import type { Command } from '../desk/index.ts';

export type DialogName =
  | 'shelf'
  | 'share'
  | 'help'
  | 'record'
  | 'rows'
  | 'card'
  | 'divider'
  | 'parts'
  | 'data-sheet'
  | 'band';

interface ShellActions {
  readonly show: (dialog: DialogName) => void;
  readonly find: () => void;
  readonly toggleText: () => void;
  readonly turnTheme: () => void;
  readonly themeTitle: () => string;
  readonly textTitle: () => string;
}

/** Undo, redo and the rows' own commands come with the grid. */
export function shellCommands(actions: ShellActions): Command[] {
  return [
    { id: 'find', title: 'Find', keys: ['Ctrl+F'], run: actions.find },
    {
      id: 'text',
      get title() {
        return actions.textTitle();
      },
      keys: [],
      run: actions.toggleText,
    },
    { id: 'shelf', title: 'Shelf', keys: ['Ctrl+O'], run: () => actions.show('shelf') },
    { id: 'share', title: 'Share', keys: [], run: () => actions.show('share') },
    { id: 'record', title: 'Record', keys: [], run: () => actions.show('record') },
    {
      id: 'theme',
      get title() {
        return actions.themeTitle();
      },
      keys: [],
      run: actions.turnTheme,
    },
    {
      id: 'rows-from-spreadsheet',
      title: 'bench',
      keys: [],
      run: () => actions.show('rows'),
      insert: { words: 'measured points, pasted from a spreadsheet', group: 'part' },
    },
    {
      id: 'data-sheet',
      title: 'data sheet',
      keys: [],
      run: () => actions.show('data-sheet'),
      insert: { words: 'a part from rows typed as printed', group: 'part' },
    },
    {
      id: 'model-card',
      title: 'model card',
      keys: [],
      run: () => actions.show('card'),
      insert: { words: 'a part from a pasted card of level 1', group: 'part' },
    },
    {
      id: 'divider-pair',
      title: 'divider pair',
      keys: [],
      run: () => actions.show('divider'),
      insert: { words: 'two preferred resistors for a voltage', group: 'quantity' },
    },
    {
      id: 'band',
      title: 'band',
      keys: [],
      run: () => actions.show('band'),
      insert: { words: 'a bias that keeps the drain current between two limits', group: 'stage' },
    },
    {
      id: 'parts',
      title: 'part of your own',
      keys: [],
      run: () => actions.show('parts'),
      insert: { words: 'kept before, from any sheet', group: 'part' },
    },
    { id: 'help', title: 'Help', keys: ['F1'], run: () => actions.show('help') },
  ];
}
