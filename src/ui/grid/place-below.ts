// Where a list stands: below the field it belongs to, or above where there is more room.

export interface Placed {
  readonly left: number;
  readonly top: number;
  readonly above: boolean;
}

/** The list's place inside its positioned parent, in pixels. */
export function placeBelow(field: HTMLElement, list: HTMLElement): Placed {
  const frame = list.offsetParent?.getBoundingClientRect() ?? new DOMRect();
  const seen = scrollerOf(list)?.getBoundingClientRect() ?? new DOMRect(0, 0, innerWidth, innerHeight);
  const at = field.getBoundingClientRect();
  const room = seen.bottom - at.bottom;
  const above = room < list.offsetHeight && at.top - seen.top > room;
  const most = Math.max(0, frame.width - list.offsetWidth - 8);
  const left = Math.min(at.left - frame.left, most);
  const top = (above ? at.top - list.offsetHeight - 2 : at.bottom + 2) - frame.top;
  return { left, top, above };
}

/** The nearest ancestor that scrolls. */
export function scrollerOf(element: HTMLElement): HTMLElement | null {
  for (let at = element.parentElement; at; at = at.parentElement) {
    if (/auto|scroll/.test(getComputedStyle(at).overflowY)) return at;
  }
  return null;
}
