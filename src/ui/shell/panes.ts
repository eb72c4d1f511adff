// The panes of the page in the order of the keyboard, and the way from one to the next.

/** Ids of the panes, in order. */
const PANES = ['commands', 'verdict', 'sheet', 'figures', 'workings'] as const;
type Pane = (typeof PANES)[number];

/** Focuses the first thing in a pane that takes the keyboard; says whether there was one. */
export function focusPane(page: Document, pane: Pane): boolean {
  const root = page.querySelector<HTMLElement>(`[data-pane="${pane}"]`);
  if (!root || root.offsetParent === null) return false;
  const first = root.querySelector<HTMLElement>(
    '[tabindex="0"], button:not([tabindex="-1"]), a[href], input, textarea, [tabindex="-1"]',
  );
  if (!first) return false;
  first.focus();
  return true;
}

/** The pane that holds the focus, or null. */
export function paneOf(element: Element | null): Pane | null {
  const holder = element?.closest<HTMLElement>('[data-pane]');
  return (holder?.dataset['pane'] as Pane | undefined) ?? null;
}

/** Goes to the next or previous pane that is there; false at the end, where the key belongs to the browser. */
export function cyclePane(page: Document, step: 1 | -1): boolean {
  const at = PANES.indexOf(paneOf(page.activeElement) ?? (step > 0 ? PANES.at(-1)! : PANES[0]));
  const present = paneOf(page.activeElement);
  for (
    let i = present === null ? (step > 0 ? 0 : PANES.length - 1) : at + step;
    i >= 0 && i < PANES.length;
    i += step
  ) {
    if (focusPane(page, PANES[i]!)) return true;
  }
  return false;
}
