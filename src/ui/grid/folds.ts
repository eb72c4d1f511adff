// What the user has folded and unfolded. The default that was met first stays, so that nothing folds under the hands
// of someone who types: the wiring of a stage that is being written stays open when it becomes solvable.

import { createSignal } from 'solid-js';

export interface Folds {
  isFolded(key: string, byDefault: boolean): boolean;
  set(keys: readonly string[], folded: boolean): void;
  /** What was said so far, to be kept with the shelf. */
  kept(): ReadonlyMap<string, boolean>;
}

/** Creates the folds of one sheet. */
export function createFolds(kept: ReadonlyMap<string, boolean> = new Map()): Folds {
  const known = new Map(kept);
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
      for (const key of keys) known.set(key, folded);
      setChanged((n) => n + 1);
    },
    kept: () => (changed(), known),
  };
}
