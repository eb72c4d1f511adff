// Light or dark: the system's choice, or the user's, which this browser remembers.

import { createSignal } from 'solid-js';

type Theme = 'system' | 'light' | 'dark';
const KEY = 'squarelaw-theme';
const NEXT: Readonly<Record<Theme, Theme>> = { system: 'light', light: 'dark', dark: 'system' };

interface ThemeChoice {
  theme(): Theme;
  /** system, light, dark, system .. */
  turn(): void;
}

/** The choice as it was left; applies it to the root element. */
export function createThemeChoice(page: Window): ThemeChoice {
  const [theme, setTheme] = createSignal<Theme>(stored(page));
  const apply = (choice: Theme): void => {
    const { documentElement } = page.document;
    if (choice === 'system') documentElement.removeAttribute('data-theme');
    else documentElement.setAttribute('data-theme', choice);
  };
  apply(theme());
  return {
    theme,
    turn() {
      const next = NEXT[theme()];
      setTheme(next);
      apply(next);
      try {
        page.localStorage.setItem(KEY, next);
      } catch {
        // Without storage the choice lasts as long as the page.
      }
    },
  };
}

function stored(page: Window): Theme {
  try {
    const kept = page.localStorage.getItem(KEY);
    return kept === 'light' || kept === 'dark' ? kept : 'system';
  } catch {
    return 'system';
  }
}
