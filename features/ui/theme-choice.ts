import { useSyncExternalStore } from 'react';

/** What a person chose: one of the two themes, or whatever the device asks for. */
export type ThemeChoice = 'sheet' | 'device' | 'plate';

const KEY = 'ritornel.theme';
const listeners = new Set<() => void>();

function storedChoice(): ThemeChoice {
  try {
    const stored = window.localStorage.getItem(KEY);
    return stored === 'sheet' || stored === 'plate' ? stored : 'device';
  } catch {
    return 'device';
  }
}

let choice: ThemeChoice = storedChoice();

/** Write the choice where the stylesheet looks for it. */
export function applyThemeChoice(): void {
  if (choice === 'device') delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = choice;
}

function setThemeChoice(next: ThemeChoice): void {
  choice = next;
  try {
    if (next === 'device') window.localStorage.removeItem(KEY);
    else window.localStorage.setItem(KEY, next);
  } catch {
    // A browser that keeps nothing still shows the theme for this visit.
  }
  applyThemeChoice();
  listeners.forEach((tell) => tell());
}

function subscribe(tell: () => void): () => void {
  listeners.add(tell);
  return () => listeners.delete(tell);
}

/** The theme as chosen on this device, and how to change it. */
export function useThemeChoice(): [ThemeChoice, (next: ThemeChoice) => void] {
  return [useSyncExternalStore(subscribe, () => choice), setThemeChoice];
}
