'use client';

import { useEffect, useState } from 'react';

const THEMES = ['light', 'dark', 'sun'] as const;
type Theme = (typeof THEMES)[number];
const NEXT_LABEL: Record<Theme, string> = {
  light: 'Light theme. Change to dark, for an attic',
  dark: 'Dark theme. Change to sun, for a driveway',
  sun: 'Sun theme. Change to light',
};
const KEY = 'ohmstead-walk-theme';

/** Walk keeps its theme apart from the rest of the program. */
export function WalkTheme() {
  const [theme, setTheme] = useState<Theme>('light');
  useEffect(() => {
    const kept = THEMES.find((known) => known === localStorage.getItem(KEY));
    const preferred = window.matchMedia('(prefers-color-scheme: dark)').matches ? 'dark' : 'light';
    setTheme(kept ?? preferred);
  }, []);
  useEffect(() => {
    document.documentElement.dataset.theme = theme;
  }, [theme]);

  function change() {
    const next = THEMES[(THEMES.indexOf(theme) + 1) % THEMES.length] ?? 'light';
    localStorage.setItem(KEY, next);
    setTheme(next);
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
