// The keys of the grid: moving and starting to edit here, everything else through the commands of the desk.

import { commandForKey, keyOf } from '../desk/index.ts';
import type { Grid } from './grid.ts';

/** Rows that Page Up and Page Down go. */
const PAGE = 20;

/** Does what a key stands for while no cell is edited; says whether it was one of the grid's. */
export function navigate(grid: Grid, event: KeyboardEvent): boolean {
  const key = keyOf(event);
  const extend = event.shiftKey;
  const selection = grid.desk.selection();
  switch (key) {
    case 'Up':
    case 'Shift+Up':
      return done(grid.move(-1, 0, extend));
    case 'Down':
    case 'Shift+Down':
      return done(grid.move(1, 0, extend));
    case 'Left':
      return done(grid.move(0, -1));
    case 'Right':
      return done(grid.move(0, 1));
    case 'Home':
      return done(grid.move(0, -Infinity));
    case 'End':
      return done(grid.move(0, Infinity));
    case 'Ctrl+Home':
      return done(grid.moveTo('first'));
    case 'Ctrl+End':
      return done(grid.moveTo('last'));
    case 'PageUp':
      return done(grid.move(-PAGE, 0));
    case 'PageDown':
      return done(grid.move(PAGE, 0));
    case 'Ctrl+A':
      return done(grid.selectAll());
    case 'Escape':
      if (grid.range().length < 2) return false;
      return done(grid.clearRange());
    case 'Shift+ ':
      return true;
    case ' ':
      if (selection?.column === 'name') grid.toggle(selection.row);
      else if (selection) pressMore(event);
      return true;
    case 'Enter':
    case 'F2': {
      const type = selection ? grid.row(selection.row)?.type : undefined;
      if (selection && (type === 'more' || type === 'wiring')) grid.toggle(selection.row);
      else grid.edit();
      return true;
    }
  }
  const command = commandForKey(grid.desk.commands(), key);
  if (command) {
    const reason = command.unavailable?.() ?? null;
    if (reason === null) command.run();
    else grid.desk.say(reason);
    return true;
  }
  if (event.key.length === 1 && !event.ctrlKey && !event.metaKey && !event.altKey)
    return grid.edit({ text: event.key });
  return false;
}

/** Does what a key stands for in the text field of a cell; all that is left to the field is false. */
export function whileEditing(grid: Grid, event: KeyboardEvent): boolean {
  if (event.isComposing) return false;
  const { completing } = grid;
  const open = completing.list() !== null;
  switch (keyOf(event)) {
    case 'Enter':
      return open && grid.take() ? true : done(grid.commit('down'));
    case 'Tab':
      return open && grid.take() ? true : done(grid.commit('right'));
    case 'Down':
      return open && done(completing.move(1));
    case 'Up':
      return open && done(completing.move(-1));
    case 'Alt+Down':
    case 'Ctrl+ ':
      return done(grid.followText(true));
    case 'Shift+Tab':
      return done(grid.commit('left'));
    case 'Escape':
      return done(open ? completing.close() : grid.cancel());
    case 'Ctrl+Enter':
    case 'Ctrl+Shift+Enter': {
      grid.commit('stay');
      const command = commandForKey(grid.desk.commands(), keyOf(event));
      command?.run();
      return true;
    }
    default:
      return false;
  }
}

/** Opens or closes the rest of a long text in the cell that has the focus. */
function pressMore({ target }: KeyboardEvent): void {
  if (target instanceof Element) target.querySelector<HTMLElement>('.more-text')?.click();
}

function done(_effect: void): true {
  return true;
}
