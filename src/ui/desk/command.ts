// Commands as data: toolbar, keys and help are made from one list.

export interface Command {
  /** Stable, in words joined by dashes: `undo`, `new-line-below`. */
  readonly id: string;
  /** As on a button or in help. */
  readonly title: string;
  /** `Ctrl+Z`, `Ctrl+Shift+Z`, `F8`, `Alt+PageUp`; Ctrl stands for Cmd on a Mac, too. */
  readonly keys: readonly string[];
  /** null when it can be run, else why not, as a sentence. */
  readonly unavailable?: () => string | null;
  readonly run: () => void;
  /** Where it stands in the menu of what can be inserted: its words there and what the lines it writes are. */
  readonly insert?: { readonly words: string; readonly group: 'part' | 'stage' | 'quantity' };
}

/** The key of an event in the spelling of `Command.keys`. */
export function keyOf(event: Pick<KeyboardEvent, 'key' | 'ctrlKey' | 'metaKey' | 'shiftKey' | 'altKey'>): string {
  const name = event.key.length === 1 ? event.key.toUpperCase() : event.key.replace(/^Arrow/, '');
  const parts = [];
  if (event.ctrlKey || event.metaKey) parts.push('Ctrl');
  if (event.altKey) parts.push('Alt');
  if (event.shiftKey) parts.push('Shift');
  return [...parts, name].join('+');
}

/** The command that a key stands for, or null. */
export function commandForKey(commands: readonly Command[], key: string): Command | null {
  return commands.find((command) => command.keys.includes(key)) ?? null;
}
