// Arrows, Home, End and first letters in a menu.

/** Moves the focus among the items of a menu; says whether the key was one of the menu's. */
export function menuStep(menu: HTMLElement, event: KeyboardEvent): boolean {
  const items = [...menu.querySelectorAll<HTMLElement>('[role=menuitem]')];
  const at = items.findIndex((item) => item === document.activeElement);
  const go = (index: number): true => {
    items[(index + items.length) % items.length]?.focus();
    return true;
  };
  switch (event.key) {
    case 'ArrowDown':
      return go(at + 1);
    case 'ArrowUp':
      return go(at - 1);
    case 'Home':
      return go(0);
    case 'End':
      return go(items.length - 1);
  }
  if (event.key.length !== 1 || event.ctrlKey || event.metaKey || event.altKey) return false;
  const letter = event.key.toLowerCase();
  const order = [...items.slice(at + 1), ...items.slice(0, at + 1)];
  const found = order.find((item) => item.querySelector('.insert-title')?.textContent?.startsWith(letter));
  if (!found) return event.key !== ' ' && event.key !== 'Enter';
  found.focus();
  return true;
}
