// What can be done with rows of the sheet, as commands for keys, toolbar and help.

import type { Command } from '../desk/index.ts';
import type { Grid } from './grid.ts';
import { moveRows, newLineBeside, nextFault, removeRows } from './row-commands.ts';
import { stepNumber } from './turn-commands.ts';

/** The commands of a grid. */
export function gridCommands(grid: Grid): Command[] {
  const { document } = grid.desk;
  const noRow = (): string | null => (grid.desk.selection() ? null : 'No row is selected.');
  return [
    {
      id: 'undo',
      title: 'Undo',
      keys: ['Ctrl+Z'],
      unavailable: () => (document.canUndo() ? null : 'Nothing was done yet.'),
      run: () => document.undo(),
    },
    {
      id: 'redo',
      title: 'Redo',
      keys: ['Ctrl+Shift+Z', 'Ctrl+Y'],
      unavailable: () => (document.canRedo() ? null : 'Nothing was taken back.'),
      run: () => document.redo(),
    },
    { id: 'insert', title: 'Insert', keys: ['Alt+I'], run: () => grid.setInserting(true) },
    {
      id: 'new-line-below',
      title: 'New line below',
      keys: ['Ctrl+Enter'],
      run: () => newLineBeside(grid, 'below'),
    },
    {
      id: 'new-line-above',
      title: 'New line above',
      keys: ['Ctrl+Shift+Enter'],
      run: () => newLineBeside(grid, 'above'),
    },
    { id: 'move-up', title: 'Move up', keys: ['Alt+Up'], unavailable: noRow, run: () => moveRows(grid, 'up') },
    { id: 'move-down', title: 'Move down', keys: ['Alt+Down'], unavailable: noRow, run: () => moveRows(grid, 'down') },
    {
      id: 'remove-rows',
      title: 'Remove',
      keys: ['Ctrl+Delete', 'Ctrl+Backspace'],
      unavailable: noRow,
      run: () => removeRows(grid),
    },
    {
      id: 'clear-cell',
      title: 'Clear the cell',
      keys: ['Delete'],
      unavailable: noRow,
      run: () => {
        if (grid.edit({ text: '' })) grid.commit('stay');
      },
    },
    {
      id: 'step-up',
      title: 'Next value up',
      keys: ['Alt+PageUp'],
      unavailable: noRow,
      run: () => stepNumber(grid, 'up'),
    },
    {
      id: 'step-down',
      title: 'Next value down',
      keys: ['Alt+PageDown'],
      unavailable: noRow,
      run: () => stepNumber(grid, 'down'),
    },
    { id: 'next-fault', title: 'Next failing or broken', keys: ['F8'], run: () => nextFault(grid, 1) },
    { id: 'previous-fault', title: 'Previous failing or broken', keys: ['Shift+F8'], run: () => nextFault(grid, -1) },
  ];
}
