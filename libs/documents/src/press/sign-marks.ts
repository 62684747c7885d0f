import type { Sign } from './blocks.js';
import type { Ink } from './inks.js';
import type { Mark } from './marks.js';

export const SIGN_INKS: Record<Sign, Ink> = {
  conforms: 'conforms',
  'does-not-conform': 'does-not-conform',
  inconclusive: 'inconclusive',
  'not-valid': 'not-valid',
  'shown-not-judged': 'muted',
};

/** In a box of 16: filled disc, filled square, half-filled diamond, open triangle; a short bar for what is only shown. */
const DISC = 'M14 8A6 6 0 0 1 2 8A6 6 0 0 1 14 8Z';
const SQUARE = 'M2.5 2.5H13.5V13.5H2.5Z';
const DIAMOND = 'M8 1L15 8L8 15L1 8Z';
const HALF_DIAMOND = 'M8 1V15L1 8Z';
const TRIANGLE = 'M8 2.2L14.6 13.8H1.4Z';
const BAR = 'M3 7H13V9H3Z';

/** The sign beside a word set at this size, standing on the same baseline. */
export function signMarks(sign: Sign, x: number, baseline: number, sizePt: number): Mark[] {
  const scale = (sizePt * 0.98) / 16;
  const y = baseline - sizePt * 0.86;
  const ink = SIGN_INKS[sign];
  const at = { kind: 'path', x, y, scale } as const;
  switch (sign) {
    case 'conforms':
      return [{ ...at, d: DISC, fill: ink }];
    case 'does-not-conform':
      return [{ ...at, d: SQUARE, fill: ink }];
    case 'inconclusive':
      return [
        { ...at, d: HALF_DIAMOND, fill: ink },
        { ...at, d: DIAMOND, stroke: ink, strokeWidth: 1.8 },
      ];
    case 'not-valid':
      return [{ ...at, d: TRIANGLE, stroke: ink, strokeWidth: 2 }];
    case 'shown-not-judged':
      return [{ ...at, d: BAR, fill: ink }];
  }
}
