import { useEffect, useRef, useState } from 'react';

/** Between two letters of a scanner lie a few milliseconds; no hand types a whole number that fast. */
const FASTEST_HAND_MS = 35;
const SHORTEST_SCAN = 4;
const TYPING = new Set(['INPUT', 'TEXTAREA', 'SELECT']);

export const isTyping = (target: EventTarget | null): boolean => target instanceof HTMLElement && (TYPING.has(target.tagName) || target.isContentEditable);

/** Tells a scanner's burst from a hand by the time between its keys. */
export class ScanWatch {
  private letters = '';
  private last = Number.NEGATIVE_INFINITY;

  /** A key at a time in milliseconds; the scanned text when this key ends a scan. */
  key(key: string, atMs: number): string | null {
    const fast = atMs - this.last <= FASTEST_HAND_MS;
    this.last = atMs;
    if (key.length === 1) {
      this.letters = fast ? this.letters + key : key;
      return null;
    }
    if (key === 'Shift') return null;
    const scanned = fast && (key === 'Enter' || key === 'Tab') && this.letters.length >= SHORTEST_SCAN ? this.letters : null;
    this.letters = '';
    return scanned;
  }

  /** A letter at this time would belong to a scan that is running. */
  isRunning(atMs: number): boolean {
    return this.letters.length > 1 && atMs - this.last <= FASTEST_HAND_MS;
  }
}

/**
 * A barcode scanner types like a keyboard. Whatever has the focus, short of a field, a scanned tag arrives here;
 * in a field it stays what was typed.
 */
export function useScanner(onScan: (text: string) => void): ScanWatch {
  const [scan] = useState(() => new ScanWatch());
  const told = useRef(onScan);
  useEffect(() => {
    told.current = onScan;
  });
  useEffect(() => {
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || isTyping(event.target)) return;
      const text = scan.key(event.key, event.timeStamp);
      if (text === null) return;
      // the Enter at the end of a scan must not press the button that has the focus
      event.preventDefault();
      event.stopPropagation();
      told.current(text);
    };
    window.addEventListener('keydown', onKey, { capture: true });
    return () => window.removeEventListener('keydown', onKey, { capture: true });
  }, [scan]);
  return scan;
}
