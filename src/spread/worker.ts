// The worker: answers a question about the spread of a model step by step, each step when it is asked to go on. A new
// question takes the place of the one before.

import { createSpreadJob } from './job.ts';
import type { SpreadAnswer, SpreadQuestion } from './job.ts';

let job: Generator<SpreadAnswer> | null = null;

/** A question, or null: go on with the one before. */
self.addEventListener('message', ({ data }: MessageEvent<SpreadQuestion | null>) => {
  if (data !== null) job = createSpreadJob(data);
  const step = job?.next();
  if (!step || step.done) job = null;
  // oxlint-disable-next-line unicorn/require-post-message-target-origin -- windows have an origin, workers do not
  else self.postMessage(step.value);
});
