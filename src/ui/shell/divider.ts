// The divider between the sheet and the panes beside it: a share of the width, turned by keys or dragged.

import { createSignal } from 'solid-js';

export const NARROWEST = 48;
export const WIDEST = 70;
const STEP = 2;

interface Divider {
  /** Width of the sheet, per cent. */
  share(): number;
  onKeyDown(event: KeyboardEvent): void;
  onPointerDown(event: PointerEvent & { readonly currentTarget: HTMLElement }): void;
}

/** A divider that begins at 61 %. */
export function createDivider(): Divider {
  const [share, setShare] = createSignal(61);
  const set = (percent: number): void => void setShare(Math.min(WIDEST, Math.max(NARROWEST, percent)));
  return {
    share,
    onKeyDown(event) {
      const target = { ArrowLeft: share() - STEP, ArrowRight: share() + STEP, Home: NARROWEST, End: WIDEST }[event.key];
      if (target === undefined) return;
      event.preventDefault();
      set(target);
    },
    onPointerDown(event) {
      const handle = event.currentTarget;
      const { left, width } = handle.parentElement!.getBoundingClientRect();
      handle.setPointerCapture(event.pointerId);
      const move = (at: PointerEvent): void => set(((at.clientX - left) / width) * 100);
      handle.addEventListener('pointermove', move);
      handle.addEventListener('pointerup', () => handle.removeEventListener('pointermove', move), { once: true });
    },
  };
}
