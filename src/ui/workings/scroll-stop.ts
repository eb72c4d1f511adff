// Formula lines that are longer than their place can be scrolled by keys: they become stops for Tab, but only
// while there is something to scroll to.

import { onCleanup, onMount } from 'solid-js';

/** Watches an element that scrolls sideways, through the child that fills it. */
export function createScrollStop(element: () => HTMLElement): void {
  onMount(() => {
    const place = element();
    const observer = new ResizeObserver(() => {
      if (place.scrollWidth > place.clientWidth + 1) place.tabIndex = 0;
      else place.removeAttribute('tabindex');
    });
    observer.observe(place);
    for (const child of place.children) observer.observe(child);
    onCleanup(() => observer.disconnect());
  });
}
