// The page's coming and going, its timer, and the channel between real tabs.

import { afterEach, expect, test, vi } from 'vitest';
import { followPage, joinTabs, pageSchedule, timeText } from '../../src/storage/index.ts';
import type { KeepState, TabNews } from '../../src/storage/index.ts';

afterEach(() => {
  vi.useRealTimers();
  vi.unstubAllGlobals();
});

function standIn() {
  const document = Object.assign(new EventTarget(), { visibilityState: 'visible' });
  const page = Object.assign(new EventTarget(), { document });
  const calls: string[] = [];
  const state: KeepState = { state: 'keeping' };
  const call = (name: string) => () => Promise.resolve((calls.push(name), state));
  const stop = followPage({ leave: () => void calls.push('leave'), look: call('look') }, page as unknown as Window);
  return { document, page, calls, stop };
}

test('a page that may vanish puts by what is not kept, and one that is back looks', () => {
  const { document, page, calls, stop } = standIn();
  document.visibilityState = 'hidden';
  document.dispatchEvent(new Event('visibilitychange'));
  expect(calls).toEqual(['leave']);
  document.visibilityState = 'visible';
  document.dispatchEvent(new Event('visibilitychange'));
  expect(calls).toEqual(['leave', 'look']);
  page.dispatchEvent(new Event('pagehide'));
  page.dispatchEvent(new Event('pageshow'));
  expect(calls).toEqual(['leave', 'look', 'leave', 'look']);
  stop();
  page.dispatchEvent(new Event('pagehide'));
  page.dispatchEvent(new Event('pageshow'));
  document.dispatchEvent(new Event('visibilitychange'));
  expect(calls.length).toBe(4);
});

test('the timer runs what is due, unless it was called off', () => {
  vi.useFakeTimers();
  const ran: string[] = [];
  pageSchedule(() => ran.push('first'), 100);
  pageSchedule(() => ran.push('second'), 100)();
  vi.advanceTimersByTime(99);
  expect(ran).toEqual([]);
  vi.advanceTimersByTime(1000);
  expect(ran).toEqual(['first']);
});

test('a tab hears the others and not itself, until it stops listening', async () => {
  const [a, b] = [joinTabs(), joinTabs()];
  const heard: [string, TabNews][] = [];
  a.listen((news) => heard.push(['a', news]));
  const stop = b.listen((news) => heard.push(['b', news]));
  const news: TabNews = { type: 'kept', id: 'x', changed: 1, writer: 'a' };
  a.tell(news);
  await vi.waitFor(() => expect(heard).toEqual([['b', news]]));
  stop();
  a.tell(news);
  b.tell(news);
  await vi.waitFor(() => expect(heard.length).toBe(2));
  expect(heard[1]).toEqual(['a', news]);
  a.close();
  b.close();
});

test('what another version of the program tells is passed over', async () => {
  const tabs = joinTabs();
  const other = new BroadcastChannel('squarelaw-shelf');
  const heard: TabNews[] = [];
  tabs.listen((news) => heard.push(news));
  const news = { type: 'removed', id: 'x', changed: 1, writer: 'a' };
  // oxlint-disable unicorn/require-post-message-target-origin -- a channel has no target; only windows do
  for (const strange of [null, 'kept', {}, { ...news, type: 'moved' }, { ...news, id: 7 }, { ...news, writer: null }]) {
    other.postMessage(strange);
  }
  other.postMessage({ ...news, more: true });
  // oxlint-enable unicorn/require-post-message-target-origin
  await vi.waitFor(() => expect(heard.length).toBe(1));
  expect(heard[0].id).toBe('x');
  other.close();
  tabs.close();
});

test('without a channel between tabs nothing is heard, and nothing fails', () => {
  vi.stubGlobal('BroadcastChannel', undefined);
  const tabs = joinTabs();
  const stop = tabs.listen(() => expect.unreachable());
  tabs.tell({ type: 'kept', id: 'x', changed: 1, writer: 'a' });
  stop();
  tabs.close();
});

test('a time is told in hours and minutes, with the date where it was another day', () => {
  const at = new Date(2031, 4, 6, 9, 5).getTime();
  expect(timeText(at, at)).toBe('09:05');
  expect(timeText(at, new Date(2031, 4, 6, 23, 59).getTime())).toBe('09:05');
  expect(timeText(at, new Date(2031, 4, 7, 0, 0).getTime())).toBe('2031-05-06 09:05');
});
