import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';

const css = readFileSync(join(import.meta.dirname, 'tokens.css'), 'utf8');
type Tokens = Record<string, string>;
const block = (selector: string): Tokens => {
  const body = css.slice(css.indexOf(`${selector} {`)).split('}')[0]!;
  return Object.fromEntries([...body.matchAll(/--lb-([a-z-]+): (#[0-9a-f]{6});/g)].map((m) => [m[1]!, m[2]!]));
};

/** Relative luminance and contrast ratio as WCAG 2.2 defines them. */
const luminance = (hex: string): number => {
  const [r, g, b] = [1, 3, 5].map((i) => parseInt(hex.slice(i, i + 2), 16) / 255).map((v) => (v <= 0.04045 ? v / 12.92 : ((v + 0.055) / 1.055) ** 2.4)) as [number, number, number];
  return 0.2126 * r + 0.7152 * g + 0.0722 * b;
};
const contrast = (a: string, b: string): number => {
  const [light, dark] = [luminance(a), luminance(b)].sort((x, y) => y - x) as [number, number];
  return (light + 0.05) / (dark + 0.05);
};

describe.each([
  ['light', block(':root')],
  ['dark', block('.bp6-dark')],
] as const)('the inks of the %s theme', (_, ink) => {
  it.each(['text', 'muted', 'copper', 'copper-hover', 'steel', 'conforms', 'fails', 'unsure', 'invalid'])('let %s be read on paper, card and tint', (name) => {
    for (const ground of ['ground', 'card', 'tint']) expect(contrast(ink[name]!, ink[ground]!)).toBeGreaterThanOrEqual(4.5);
  });
  it('let the edge of a control be seen', () => {
    for (const ground of ['ground', 'card']) expect(contrast(ink['line']!, ink[ground]!)).toBeGreaterThanOrEqual(3);
  });
  it('let the words on a copper button be read, touched or not', () => {
    for (const copper of ['copper', 'copper-hover']) expect(contrast(ink['on-copper']!, ink[copper]!)).toBeGreaterThanOrEqual(4.5);
  });
});

it('computes contrast as the standard does: black on white is 21 to 1', () => expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 6));
