// The spread of the open sheet as it becomes known, for everything that shows it.

import { batch, createEffect, createMemo, createSignal, on, onCleanup } from 'solid-js';
import { samplingOf } from '../../record/index.ts';
import type { JudgedSpread } from '../../record/index.ts';
import type { SheetSpread } from '../../spread/index.ts';
import type { SheetDocument } from '../document/index.ts';
import { createFollower } from './follower.ts';
import type { Progress } from './follower.ts';
import { startWorker } from './page-worker.ts';

export interface SpreadFeed {
  /** What is known of the spread of the sheet as it is shown; null where nothing spreads, or nothing is known yet. */
  now(): SheetSpread | null;
  /** The same with what is asked of the builds. */
  judged(): JudgedSpread | null;
  /** Whether what is known is still of the sheet as it was before the last change. */
  isStale(): boolean;
  /** null once all builds are counted. */
  progress(): Progress | null;
  /** Ends the counting; what was counted stays. */
  stop(): void;
}

/** One frame, ms. */
const FRAME = 17;

/** Follows a document; to be called inside a component or root. */
export function createSpreadFeed(document: SheetDocument): SpreadFeed {
  const [now, setNow] = createSignal<SheetSpread | null>(null);
  const [isStale, setStale] = createSignal(false);
  const onKnown = (spread: SheetSpread | null): void =>
    batch(() => {
      setNow(spread);
      setStale(false);
    });
  const onStale = (): void => void setStale(true);
  const [progress, onProgress] = createSignal<Progress | null>(null);
  const sampling = createMemo(() => samplingOf(document.tree()));
  const follower = createFollower(startWorker, { onKnown, onStale, onProgress });
  // The edited row is painted first; what spreads is collected behind it.
  let behind: ReturnType<typeof setTimeout> | undefined;
  createEffect(
    on([document.version, sampling], () => {
      setStale(true);
      clearTimeout(behind);
      behind = setTimeout(() => follower.follow(document.sheet.spreadModel(), sampling()), FRAME);
    }),
  );
  onCleanup(() => {
    clearTimeout(behind);
    follower.end();
  });
  const judged = createMemo<JudgedSpread | null>(() => {
    const spread = now();
    return spread && { spread, leastYield: sampling().leastYield };
  });
  return { now, judged, isStale, progress, stop: () => follower.stop() };
}
