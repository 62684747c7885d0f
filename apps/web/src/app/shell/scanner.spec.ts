import { describe, expect, it } from 'vitest';
import { ScanWatch } from './scanner.js';

const type = (watch: ScanWatch, keys: readonly string[], everyMs: number, from = 0) => keys.map((key, i) => watch.key(key, from + i * everyMs)).at(-1) ?? null;

describe('telling a scanner from a hand', () => {
  it('takes a fast burst that ends with Enter or Tab as a scan', () => {
    expect(type(new ScanWatch(), [...'26-0412', 'Enter'], 8)).toBe('26-0412');
    expect(type(new ScanWatch(), [...'26-0412', 'Tab'], 8)).toBe('26-0412');
  });

  it('takes an address from a QR code, capital letters and slashes included', () => {
    const keys = [...'https://x/jobs/'].concat('Shift', 'A', '1', 'Enter');
    expect(type(new ScanWatch(), keys, 5)).toBe('https://x/jobs/A1');
  });

  it('leaves alone what a hand types, however it ends', () => {
    expect(type(new ScanWatch(), [...'26-0412', 'Enter'], 80)).toBeNull();
  });

  it('leaves alone an Enter that comes long after the letters', () => {
    const watch = new ScanWatch();
    type(watch, [...'26-0412'], 5);
    expect(watch.key('Enter', 500)).toBeNull();
  });

  it('takes a second scan without the letters of the first', () => {
    const watch = new ScanWatch();
    type(watch, [...'26-0412', 'Enter'], 5);
    expect(type(watch, [...'26-0413', 'Enter'], 5, 1000)).toBe('26-0413');
  });

  it('drops letters typed by hand before a scan', () => {
    const watch = new ScanWatch();
    type(watch, ['a', 'b'], 200);
    expect(type(watch, [...'26-0412', 'Enter'], 5, 1000)).toBe('26-0412');
  });

  it('knows that a slash in the middle of a scan belongs to it', () => {
    const watch = new ScanWatch();
    type(watch, [...'http:'], 5);
    expect(watch.isRunning(24)).toBe(true);
    expect(watch.isRunning(400)).toBe(false);
  });
});
