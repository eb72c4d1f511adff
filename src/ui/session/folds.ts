// What the user has folded and unfolded. The default that was met first stays, so that nothing folds under the hands
// of someone who types: the wiring of a stage that is being written stays open when it becomes solvable.

import { createSignal } from 'solid-js';

export interface Folds {
  isFolded(key: string, byDefault: boolean): boolean;
  set(keys: readonly string[], folded: boolean): void;
  /** What the user said so far, as it is kept with the sheet. */
  said(): readonly string[];
  /** Another sheet with what was said of it. */
  reset(said: readonly string[]): void;
}

/** How a key is kept that was folded, and one that was unfolded. */
const FOLDED = 'folded ';
const OPEN = 'open ';

/** Creates the folds of the open sheet. */
export function createFolds(): Folds {
  const known = new Map<string, boolean>();
  const byUser = new Set<string>();
  const [changed, setChanged] = createSignal(0);
  return {
    isFolded(key, byDefault) {
      changed();
      const present = known.get(key);
      if (present !== undefined) return present;
      known.set(key, byDefault);
      return byDefault;
    },
    set(keys, folded) {
      for (const key of keys) {
        known.set(key, folded);
        byUser.add(key);
      }
      setChanged((n) => n + 1);
    },
    said: () => (changed(), [...byUser].map((key) => (known.get(key) ? FOLDED : OPEN) + key)),
    reset(said) {
      known.clear();
      byUser.clear();
      for (const each of said) {
        const folded = each.startsWith(FOLDED);
        const key = each.slice((folded ? FOLDED : OPEN).length);
        known.set(key, folded);
        byUser.add(key);
      }
      setChanged((n) => n + 1);
    },
  };
}
