// Formula lines that are longer than their place can be scrolled by keys: they become stops for Tab, but only
// while there is something to scroll to, and fade at the end behind which more stands.

import { onCleanup, onMount } from 'solid-js';

/** A subscript at the end of a formula claims up to so many pixels more than it shows. */
const SLACK = 4;

/** Watches an element that scrolls sideways, through the children that fill it. */
export function createScrollStop(element: () => HTMLElement): void {
  onMount(() => {
    const place = element();
    const look = (): void => {
      const beyond = place.scrollWidth - place.clientWidth;
      if (beyond > SLACK) place.tabIndex = 0;
      else place.removeAttribute('tabindex');
      place.classList.toggle('has-more', beyond - place.scrollLeft > SLACK);
    };
    const observer = new ResizeObserver(look);
    observer.observe(place);
    for (const child of place.children) observer.observe(child);
    place.addEventListener('scroll', look, { passive: true });
    onCleanup(() => {
      observer.disconnect();
      place.removeEventListener('scroll', look);
    });
  });
}
