// Follows a sheet with questions about its spread: a quick look that follows every change, and the whole count once the sheet
// rests. Both are worked out aside, so that typing never waits.
//
// Two workers: one answers quick looks, the latest sheet first; the other counts all builds and is ended and begun again
// whenever the sheet changes meanwhile. No answer to a sheet that was is passed on.

import type { Sampling } from '../../record/index.ts';
import { readSpread } from '../../spread/index.ts';
import type { SheetSpread, SpreadAnswer, SpreadQuestion } from '../../spread/index.ts';
import type { SpreadModel } from '../../sheet/index.ts';

/** A worker as it is used here; its maker takes its answers. */
interface SpreadWorker {
  ask(question: SpreadQuestion): void;
  end(): void;
}
export type MakeWorker = (onAnswer: (answer: SpreadAnswer) => void) => SpreadWorker;

/** How many builds are counted of how many. */
export interface Progress {
  readonly builds: number;
  readonly of: number;
}

interface Follower {
  /** The sheet is another: what was asked of the one before is dropped. */
  follow(model: SpreadModel, sampling: Sampling): void;
  /** Ends the counting; what was counted stays. */
  stop(): void;
  end(): void;
}

interface Listener {
  /** null: nothing spreads. */
  readonly onKnown: (spread: SheetSpread | null) => void;
  /** What is known is of the sheet as it was. */
  readonly onStale: () => void;
  /** null: nothing is being counted. */
  readonly onProgress: (progress: Progress | null) => void;
}

/** A sheet that is followed. */
interface Followed {
  readonly model: SpreadModel;
  readonly sampling: Sampling;
}

/** Builds of a quick look. */
const QUICK_BUILDS = 256;
/** The sheet must rest so long before all builds are counted, ms. */
const REST = 250;

/** Starts following; nothing is asked before the first sheet. */
export function createFollower(makeWorker: MakeWorker, { onKnown, onStale, onProgress }: Listener): Follower {
  let present: Followed | null = null;
  let ids = 0;
  let quick: SpreadWorker | null = null;
  /** The quick question that waits for its answer, and the sheet it is about. */
  let asked: Followed | null = null;
  let full: SpreadWorker | null = null;
  let isCounting = false;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function askQuick(): void {
    if (present === null) return;
    quick ??= makeWorker(takeQuick);
    asked = present;
    const { model, sampling } = present;
    quick.ask({ kind: 'spread', id: ++ids, model, samples: QUICK_BUILDS, seed: sampling.seed, effort: 'quick' });
  }

  function takeQuick({ report }: SpreadAnswer): void {
    const about = asked;
    asked = null;
    // The whole count says it better once it has begun to answer.
    if (about === present && present !== null && !isCounting) onKnown(readSpread(present.model, report));
    if (about !== present) askQuick();
  }

  function askFull(): void {
    if (present === null) return;
    full ??= makeWorker(takeFull);
    isCounting = true;
    const { model, sampling } = present;
    onProgress({ builds: 0, of: sampling.samples });
    full.ask({ kind: 'spread', id: ++ids, model, samples: sampling.samples, seed: sampling.seed, effort: 'full' });
  }

  function takeFull({ report, isLast }: SpreadAnswer): void {
    if (present === null || !isCounting) return;
    isCounting = !isLast;
    onKnown(readSpread(present.model, report));
    onProgress(isLast ? null : { builds: report.builds, of: present.sampling.samples });
  }

  function stop(): void {
    clearTimeout(timer);
    if (isCounting) {
      full?.end();
      full = null;
    }
    isCounting = false;
    onProgress(null);
  }

  return {
    follow(model, sampling) {
      stop();
      if (model.drawn.length === 0) {
        present = null;
        onKnown(null);
        return;
      }
      present = { model, sampling };
      onStale();
      if (asked === null) askQuick();
      timer = setTimeout(askFull, REST);
    },
    stop,
    end() {
      stop();
      quick?.end();
      full?.end();
    },
  };
}
