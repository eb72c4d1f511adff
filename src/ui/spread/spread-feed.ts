// The spread of the open sheet as it becomes known: a first answer from a quick look that follows every change, and the whole
// one once the text rests. Both are worked out aside, so that typing never waits.
//
// Two workers: one answers quick questions, the latest first; the other counts all builds and is ended and begun again
// whenever the sheet changes meanwhile.

import { createEffect, createMemo, createSignal, on, onCleanup } from 'solid-js';
import { samplingOf } from '../../record/index.ts';
import type { JudgedSpread, Sampling } from '../../record/index.ts';
import { readSpread } from '../../spread/index.ts';
import type { SheetSpread, SpreadAnswer, SpreadQuestion } from '../../spread/index.ts';
import type { SpreadModel } from '../../sheet/index.ts';
import type { SheetDocument } from '../document/index.ts';

export interface SpreadFeed {
  /** What is known of the spread of the sheet as it is shown; null where nothing spreads, or nothing is known yet. */
  now(): SheetSpread | null;
  /** The same with what is asked of the builds. */
  judged(): JudgedSpread | null;
  /** How many builds are counted of how many; null once all are. */
  progress(): { readonly builds: number; readonly of: number } | null;
  /** Ends the counting; what was counted stays. */
  stop(): void;
}

/** Builds of a quick look. */
const QUICK_BUILDS = 256;
/** The text must rest so long before all builds are counted, ms. */
const REST = 250;

/** A worker as the feed uses it; tests supply their own. */
export interface SpreadWorker {
  ask(question: SpreadQuestion): void;
  end(): void;
}
export type MakeWorker = (onAnswer: (answer: SpreadAnswer) => void) => SpreadWorker;

/** The page's worker. */
export function pageWorker(onAnswer: (answer: SpreadAnswer) => void): SpreadWorker {
  const worker = new Worker(new URL('../../spread/worker.ts', import.meta.url), { type: 'module' });
  worker.addEventListener('message', ({ data }: MessageEvent<SpreadAnswer>) => onAnswer(data));
  return { ask: (question) => worker.postMessage(question), end: () => worker.terminate() };
}

/** Follows a document; to be called inside a component or root. */
export function createSpreadFeed(document: SheetDocument, makeWorker: MakeWorker = pageWorker): SpreadFeed {
  const [known, setKnown] = createSignal<SheetSpread | null>(null);
  const [progress, setProgress] = createSignal<{ builds: number; of: number } | null>(null);
  const sampling = createMemo<Sampling>(() => samplingOf(document.tree()));
  let ids = 0;
  /** The model of the sheet as it stands, and the question that asked about it first. */
  let present: { model: SpreadModel; since: number } | null = null;
  let quick: SpreadWorker | null = null;
  let isQuickBusy = false;
  let isQuickDue = false;
  let full: SpreadWorker | null = null;
  let fullId = 0;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function take(answer: SpreadAnswer): void {
    if (present === null || answer.id < present.since) return;
    // A quick look says nothing that the full one has not said better.
    if (answer.id !== fullId && (known()?.report.builds ?? 0) > QUICK_BUILDS && knownSince >= present.since) return;
    knownSince = answer.id;
    setKnown(readSpread(present.model, answer.report));
    if (answer.id !== fullId) return;
    setProgress(answer.isLast ? null : { builds: answer.report.builds, of: sampling().samples });
    if (answer.isLast) fullId = 0;
  }
  let knownSince = 0;

  function askQuick(): void {
    isQuickDue = false;
    if (present === null) return;
    isQuickBusy = true;
    quick ??= makeWorker((answer) => {
      take(answer);
      if (!answer.isLast) return;
      isQuickBusy = false;
      if (isQuickDue) askQuick();
    });
    quick.ask({ id: ++ids, model: present.model, samples: QUICK_BUILDS, seed: sampling().seed, effort: 'quick' });
  }

  function askFull(): void {
    if (present === null) return;
    full ??= makeWorker(take);
    fullId = ++ids;
    const { samples, seed } = sampling();
    setProgress({ builds: 0, of: samples });
    full.ask({ id: fullId, model: present.model, samples, seed, effort: 'full' });
  }

  function endFull(): void {
    clearTimeout(timer);
    if (fullId !== 0) {
      full?.end();
      full = null;
      fullId = 0;
    }
    setProgress(null);
  }

  createEffect(
    on([document.version, sampling], () => {
      endFull();
      const model = document.sheet.spreadModel();
      if (model.drawn.length === 0) {
        present = null;
        setKnown(null);
        return;
      }
      present = { model, since: ids + 1 };
      if (isQuickBusy) isQuickDue = true;
      else askQuick();
      timer = setTimeout(askFull, REST);
    }),
  );
  onCleanup(() => {
    endFull();
    quick?.end();
    full?.end();
  });

  return {
    now: known,
    judged: () => {
      const spread = known();
      return spread && { spread, leastYield: sampling().leastYield };
    },
    progress,
    stop: endFull,
  };
}
