// What the verdict's live region says: the sentence as it stands after a commit or after a rest, and only when it
// is another than the one said before.

import { createEffect, createSignal, on } from 'solid-js';
import type { Accessor } from 'solid-js';
import { createRested } from '../pace/index.ts';

/** How long a preview must stand before it is said, in ms. */
const REST = 1000;

/** The sentence to be said; it follows `sentence` whenever `committed` changes, else once it has rested. */
export function createAnnouncement(sentence: Accessor<string>, committed: Accessor<unknown>): Accessor<string> {
  const [said, setSaid] = createSignal(sentence());
  const rested = createRested(sentence, { rest: REST });
  createEffect(on([committed, rested], () => void setSaid(sentence()), { defer: true }));
  return said;
}
