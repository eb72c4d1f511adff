// The bands of a plot of the sheet, searched by a worker once the sheet rests.

import { createEffect, createSignal, on, onCleanup } from 'solid-js';
import { plotBands, wantedBands } from '../../figure/index.ts';
import type { PlotBands } from '../../figure/index.ts';
import type { BandAnswer, BandQuestion } from '../../spread/index.ts';
import type { Desk } from '../desk/index.ts';
import { createRested } from '../pace/index.ts';
import { startWorker } from '../spread/index.ts';

/** In ms. */
const PACE = { rest: 500, most: 60_000 };

/** The bands of a plot cell as far as they are known; null while they are not, and while it is folded. */
export function createBands(desk: Desk, name: () => string, isOpen: () => boolean): () => PlotBands | null {
  const [bands, setBands] = createSignal<PlotBands | null>(null);
  const judged = createRested(desk.spread.judged, PACE);
  let worker: ReturnType<typeof startWorker<BandQuestion, BandAnswer>> | null = null;
  const end = (): void => {
    worker?.end();
    worker = null;
  };
  createEffect(
    on([judged, name, isOpen], ([now, plot, open]) => {
      end();
      setBands(null);
      const wanted = now && open ? wantedBands(desk.document.sheet, plot, now.spread) : null;
      if (!now || !wanted) return;
      worker = startWorker<BandQuestion, BandAnswer>((answer) => {
        end();
        setBands(plotBands(wanted, answer.bands));
      });
      const { input, places, slots } = wanted;
      worker.ask({ kind: 'band', id: 1, model: now.spread.model, input, places, wanted: slots });
    }),
  );
  onCleanup(end);
  return bands;
}
