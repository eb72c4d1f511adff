// The worker of the page that answers questions about spread.

import type { Answer, Question } from '../../spread/index.ts';

/** Starts a worker; answers come one by one until the last, or until it is ended. */
export function startWorker<Q extends Question, A extends Answer>(
  onAnswer: (answer: A) => void,
): { ask(question: Q): void; end(): void } {
  const worker = new Worker(new URL('../../spread/worker.ts', import.meta.url), { type: 'module' });
  // oxlint-disable-next-line unicorn/require-post-message-target-origin -- windows have an origin, workers do not
  const send = (message: Q | null): void => worker.postMessage(message);
  worker.addEventListener('message', ({ data }: MessageEvent<A>) => {
    onAnswer(data);
    if (!data.isLast) send(null);
  });
  return { ask: send, end: () => worker.terminate() };
}
