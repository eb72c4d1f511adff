// Word between the tabs that have the shelf open: what one keeps or removes, the others hear of.
//
// Nothing rests on it: where a browser has no such channel, or a page slept while the word went out, the shelf's own
// comparison at the next save finds out.

export interface TabNews {
  readonly type: 'kept' | 'removed';
  /** The sheet. */
  readonly id: string;
  /** When, in milliseconds of the epoch. */
  readonly changed: number;
  /** The page that did it. */
  readonly writer: string;
}
export interface Tabs {
  tell(news: TabNews): void;
  /** Hears what other tabs tell; the answer stops it. */
  listen(hear: (news: TabNews) => void): () => void;
  close(): void;
}

const CHANNEL = 'squarelaw-shelf';

/** Joins the tabs of this browser. */
export function joinTabs(): Tabs {
  if (typeof BroadcastChannel === 'undefined') {
    return { tell: () => undefined, listen: () => () => undefined, close: () => undefined };
  }
  const channel = new BroadcastChannel(CHANNEL);
  const listeners = new Set<(news: TabNews) => void>();
  channel.addEventListener('message', ({ data }: MessageEvent<unknown>) => {
    if (isNews(data)) for (const hear of listeners) hear(data);
  });
  return {
    // oxlint-disable-next-line unicorn/require-post-message-target-origin -- a channel has no target; only windows do
    tell: (news) => channel.postMessage(news),
    listen(hear) {
      listeners.add(hear);
      return () => void listeners.delete(hear);
    },
    close: () => channel.close(),
  };
}

/** Another version of the program may speak otherwise. */
function isNews(data: unknown): data is TabNews {
  if (typeof data !== 'object' || data === null) return false;
  const { type, id, changed, writer } = data as Record<string, unknown>;
  return (
    (type === 'kept' || type === 'removed') &&
    typeof id === 'string' &&
    typeof changed === 'number' &&
    typeof writer === 'string'
  );
}
