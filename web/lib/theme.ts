import { readLocal, writeLocal } from './local-store.ts';

export type Theme = 'system' | 'light' | 'dark';

const KEY = 'antinode:theme';

export function storedTheme(): Theme {
  const stored = readLocal(KEY);
  return stored === 'light' || stored === 'dark' ? stored : 'system';
}

/** Shows a theme, and remembers it on this device. */
export function applyTheme(theme: Theme): void {
  writeLocal(KEY, theme === 'system' ? null : theme);
  showTheme(theme);
}

export function showTheme(theme: Theme): void {
  if (theme === 'system') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = theme;
}
