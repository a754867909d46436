import { useSyncExternalStore } from 'react';

export type Theme = 'day' | 'night' | 'sun';
const KEY = 'driprail-theme';
const watchers = new Set<() => void>();

function chosen(): Theme | null {
  const value = localStorage.getItem(KEY);
  return value === 'day' || value === 'night' || value === 'sun' ? value : null;
}

/** A choice in the menu wins; else more contrast means sun, a dark scheme means night. */
export function currentTheme(): Theme {
  const choice = chosen();
  if (choice) return choice;
  if (matchMedia('(prefers-contrast: more)').matches) return 'sun';
  return matchMedia('(prefers-color-scheme: dark)').matches ? 'night' : 'day';
}

export function applyTheme(): void {
  document.documentElement.dataset['theme'] = currentTheme();
}

export function chooseTheme(theme: Theme): void {
  localStorage.setItem(KEY, theme);
  applyTheme();
  watchers.forEach((watch) => watch());
}

export function useTheme(): Theme {
  return useSyncExternalStore((watch) => {
    watchers.add(watch);
    return () => watchers.delete(watch);
  }, currentTheme);
}
