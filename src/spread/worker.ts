// The worker: takes a model, searches its extremes and counts its builds portion by portion, and says after each step what
// is known so far. A newer question takes the place of one that is still being worked on.

import { createSpreadJob } from './job.ts';
import type { SpreadAnswer, SpreadQuestion } from './job.ts';

let latest = 0;

self.addEventListener('message', ({ data }: MessageEvent<SpreadQuestion>) => {
  latest = data.id;
  void work(data);
});

async function work(question: SpreadQuestion): Promise<void> {
  const job = createSpreadJob(question);
  for (const answer of job) {
    post(answer);
    await others();
    if (latest !== question.id) return;
  }
}

function post(answer: SpreadAnswer): void {
  self.postMessage(answer);
}

/** Lets messages that wait come in. */
function others(): Promise<void> {
  return new Promise((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.addEventListener('message', () => {
      port1.close();
      resolve();
    });
    port1.start();
    port2.postMessage(null);
  });
}
