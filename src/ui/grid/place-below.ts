// Where a list stands: below the field it belongs to, or above where there is more room.

export interface Placed {
  readonly left: number;
  readonly top: number;
  readonly above: boolean;
}

/** The list's place inside its positioned parent, in pixels. */
export function placeBelow(field: HTMLElement, list: HTMLElement): Placed {
  const parent = list.offsetParent;
  const frame = parent?.getBoundingClientRect() ?? new DOMRect();
  const [inX, inY] = [parent?.scrollLeft ?? 0, parent?.scrollTop ?? 0];
  const at = field.getBoundingClientRect();
  const room = Math.min(frame.bottom, innerHeight) - at.bottom;
  const above = room < list.offsetHeight && at.top - frame.top > room;
  const most = Math.max(0, frame.width - list.offsetWidth - 8);
  const left = Math.min(at.left - frame.left + inX, most + inX);
  const top = (above ? at.top - list.offsetHeight - 2 : at.bottom + 2) - frame.top + inY;
  return { left, top, above };
}
