import { useSyncExternalStore } from 'react';

const KEPT = 'loopbay.single-keys';
const listeners = new Set<() => void>();
const read = () => localStorage.getItem(KEPT) !== 'off';

/** Shortcuts of one letter can be turned off: whoever speaks to the computer would set them off by talking. */
export function setSingleKeys(on: boolean): void {
  localStorage.setItem(KEPT, on ? 'on' : 'off');
  for (const listener of listeners) listener();
}
export function useSingleKeys(): boolean {
  return useSyncExternalStore((listener) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  }, read);
}
