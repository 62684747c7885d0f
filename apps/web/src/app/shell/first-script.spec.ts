import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { globalConfig } from 'zod/v4/core';

const web = join(import.meta.dirname, '..', '..', '..');
const script = readFileSync(join(web, 'public/first.js'), 'utf8');
const page = readFileSync(join(web, 'index.html'), 'utf8');
const systemIsDark = (matches: boolean) => vi.stubGlobal('matchMedia', () => ({ matches }));
/** Runs the script as the page does. */
const run = () => window.eval(script);

describe('what runs before the modules of a page', () => {
  const before = (globalThis as { __zod_globalConfig?: unknown }).__zod_globalConfig;
  beforeEach(() => {
    localStorage.clear();
    document.body.className = '';
  });
  afterEach(() => {
    (globalThis as { __zod_globalConfig?: unknown }).__zod_globalConfig = before;
    vi.unstubAllGlobals();
  });

  it('stands in the page before them', () => {
    expect(page.indexOf('src="/first.js"')).toBeGreaterThan(page.indexOf('<body>'));
    expect(page.indexOf('src="/first.js"')).toBeLessThan(page.indexOf('type="module"'));
  });

  it('shows the theme this device showed last, whatever the system says', () => {
    systemIsDark(true);
    localStorage.setItem('loopbay.theme', 'light');
    run();
    expect(document.body.classList.contains('bp6-dark')).toBe(false);
    localStorage.setItem('loopbay.theme', 'dark');
    run();
    expect(document.body.classList.contains('bp6-dark')).toBe(true);
  });

  it('follows the system where nothing was chosen', () => {
    systemIsDark(true);
    run();
    expect(document.body.classList.contains('bp6-dark')).toBe(true);
    systemIsDark(false);
    run();
    expect(document.body.classList.contains('bp6-dark')).toBe(false);
  });

  it('sets the very object that Zod reads when it makes a contract', () => {
    expect(globalConfig).toBe(before);
    systemIsDark(false);
    run();
    expect((globalThis as { __zod_globalConfig?: unknown }).__zod_globalConfig).toEqual({ jitless: true });
  });
});
