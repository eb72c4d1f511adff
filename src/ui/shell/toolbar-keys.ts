// Arrow keys inside a toolbar: one stop for Tab, the arrows, Home and End go along it.

/** Moves the focus among the buttons of `toolbar` and tells which command has it. */
export function moveInToolbar(event: KeyboardEvent, toolbar: HTMLElement, onMove: (id: string) => void): void {
  const buttons = [...toolbar.querySelectorAll<HTMLButtonElement>('button')];
  const at = buttons.indexOf(event.target as HTMLButtonElement);
  if (at < 0) return;
  const last = buttons.length - 1;
  const target = { ArrowRight: Math.min(at + 1, last), ArrowLeft: Math.max(at - 1, 0), Home: 0, End: last }[event.key];
  if (target === undefined) return;
  event.preventDefault();
  const button = buttons[target]!;
  onMove(button.dataset['command'] ?? '');
  button.focus();
}
