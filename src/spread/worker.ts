// The worker: answers a question step by step, each step when it is asked to go on. A new question takes the place of the
// one before.

import { createBandJob, createMendJob, createSpreadJob } from './job.ts';
import type { Answer, Question } from './job.ts';

function jobOf(question: Question): Generator<Answer> {
  switch (question.kind) {
    case 'spread':
      return createSpreadJob(question);
    case 'mend':
      return createMendJob(question);
    case 'band':
      return createBandJob(question);
  }
}

let job: Generator<Answer> | null = null;

/** A question, or null: go on with the one before. */
self.addEventListener('message', ({ data }: MessageEvent<Question | null>) => {
  if (data !== null) job = jobOf(data);
  const step = job?.next();
  if (!step || step.done) job = null;
  // oxlint-disable-next-line unicorn/require-post-message-target-origin -- windows have an origin, workers do not
  else self.postMessage(step.value);
});
