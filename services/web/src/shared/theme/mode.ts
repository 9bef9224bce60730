import { useSyncExternalStore } from 'react';

export const THEME_CHOICES = ['system', 'light', 'dark'] as const;
export type ThemeChoice = (typeof THEME_CHOICES)[number];
export type ThemeMode = 'light' | 'dark';

const STORAGE_KEY = 'noonwell.theme';
const DARK_QUERY = '(prefers-color-scheme: dark)';
const listeners = new Set<() => void>();

export function readThemeChoice(): ThemeChoice {
  try {
    const stored = localStorage.getItem(STORAGE_KEY);
    return THEME_CHOICES.find((choice) => choice === stored) ?? 'system';
  } catch {
    // Storage can be switched off: follow the system.
    return 'system';
  }
}

export function setThemeChoice(choice: ThemeChoice): void {
  try {
    localStorage.setItem(STORAGE_KEY, choice);
  } catch {
    // Not stored; it still holds until the page is left.
  }
  listeners.forEach((listener) => {
    listener();
  });
}

function subscribe(listener: () => void): () => void {
  const system = window.matchMedia(DARK_QUERY);
  listeners.add(listener);
  system.addEventListener('change', listener);
  window.addEventListener('storage', listener);
  return () => {
    listeners.delete(listener);
    system.removeEventListener('change', listener);
    window.removeEventListener('storage', listener);
  };
}

function readMode(): ThemeMode {
  const choice = readThemeChoice();
  if (choice !== 'system') return choice;
  return window.matchMedia(DARK_QUERY).matches ? 'dark' : 'light';
}

export function useThemeChoice(): ThemeChoice {
  return useSyncExternalStore(subscribe, readThemeChoice);
}

/** The mode in force: the reader's choice, or the system's. */
export function useThemeMode(): ThemeMode {
  return useSyncExternalStore(subscribe, readMode);
}
