'use client';

import { useEffect, useSyncExternalStore } from 'react';

const THEMES = ['light', 'dark', 'sun'] as const;
type Theme = (typeof THEMES)[number];
const NEXT_LABEL: Record<Theme, string> = {
  light: 'Light theme. Change to dark, for an attic',
  dark: 'Dark theme. Change to sun, for a driveway',
  sun: 'Sun theme. Change to light',
};
const KEY = 'ohmstead-walk-theme';
const CHANGED = 'ohmstead-walk-theme-changed';

/** Walk keeps its theme apart from the rest of the program. */
export function WalkTheme() {
  const theme = useSyncExternalStore(onChange, keptTheme, () => 'light' as const);
  useEffect(() => {
    document.documentElement.dataset.theme = theme;
  }, [theme]);

  function change() {
    localStorage.setItem(KEY, THEMES[(THEMES.indexOf(theme) + 1) % THEMES.length] ?? 'light');
    window.dispatchEvent(new Event(CHANGED));
  }
  return (
    <button
      type="button"
      onClick={change}
      aria-label={NEXT_LABEL[theme]}
      className="grid size-[56px] shrink-0 place-items-center text-xl"
    >
      <span aria-hidden="true">◐</span>
    </button>
  );
}

function onChange(notify: () => void) {
  window.addEventListener(CHANGED, notify);
  window.addEventListener('storage', notify);
  return () => {
    window.removeEventListener(CHANGED, notify);
    window.removeEventListener('storage', notify);
  };
}

function keptTheme(): Theme {
  const kept = THEMES.find((known) => known === localStorage.getItem(KEY));
  return kept ?? (window.matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light');
}
