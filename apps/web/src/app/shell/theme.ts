import { useEffect } from 'react';
import type { Preferences } from '@shared/session';

/** Puts the theme on the page: the device's own, or the one that is forced. */
export function useTheme(theme: Preferences['theme']): void {
  useEffect(() => {
    const media = window.matchMedia('(prefers-color-scheme: dark)');
    const apply = () => document.body.classList.toggle('bp6-dark', theme === 'dark' || (theme === 'system' && media.matches));
    apply();
    media.addEventListener('change', apply);
    return () => media.removeEventListener('change', apply);
  }, [theme]);
}
