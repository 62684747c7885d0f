import { useEffect } from 'react';
import type { Preferences } from '@shared/session';

/** `public/first.js` reads it before anything else runs */
const KEPT = 'loopbay.theme';
const show = (theme: Preferences['theme']) =>
  void document.body.classList.toggle('bp6-dark', theme === 'dark' || (theme === 'system' && window.matchMedia('(prefers-color-scheme: dark)').matches));

function lastTheme(): Preferences['theme'] {
  const kept = localStorage.getItem(KEPT);
  return kept === 'light' || kept === 'dark' ? kept : 'system';
}

/** Puts the theme on the page: the device's own, or the one that is forced. Without one, what this device showed last. */
export function useTheme(wanted?: Preferences['theme']): void {
  useEffect(() => {
    const theme = wanted ?? lastTheme();
    if (wanted) localStorage.setItem(KEPT, wanted);
    const media = window.matchMedia('(prefers-color-scheme: dark)');
    const apply = () => show(theme);
    apply();
    media.addEventListener('change', apply);
    return () => media.removeEventListener('change', apply);
  }, [wanted]);
}
