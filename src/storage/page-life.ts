// The page's own timer, and its coming and going: what is not kept is put by before the page may vanish, and a page that
// comes back looks what others did meanwhile.

import type { Keeper, Schedule } from './keeper.ts';

/** The timer of the page. */
export const pageSchedule: Schedule = (run, milliseconds) => {
  const timer = setTimeout(run, milliseconds);
  return () => clearTimeout(timer);
};

/** Lets `keeper` put by what is not kept whenever `page` may vanish, and look again when it is back; the answer stops it. */
export function followPage(keeper: Pick<Keeper, 'leave' | 'look'>, page: Window): () => void {
  const leave = () => keeper.leave();
  const turn = () => void (page.document.visibilityState === 'hidden' ? keeper.leave() : keeper.look());
  // Not every browser tells a page that is closed that it is hidden, and a phone may tell it nothing else.
  page.addEventListener('pagehide', leave);
  page.addEventListener('pageshow', turn);
  page.document.addEventListener('visibilitychange', turn);
  return () => {
    page.removeEventListener('pagehide', leave);
    page.removeEventListener('pageshow', turn);
    page.document.removeEventListener('visibilitychange', turn);
  };
}
