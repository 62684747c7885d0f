/**
 * The inks of a printed paper, by what they mean. Light theme only: paper is white, and a copy
 * made in grey must still be read, so no ink carries a meaning alone.
 */
export const PAPER_INKS = {
  text: '#23292C',
  muted: '#566066',
  line: '#8D877B',
  hair: '#DDD6C9',
  ground: '#F5F2EC',
  card: '#FFFFFF',
  copper: '#9C4A17',
  steel: '#285A7B',
  conforms: '#1F6B45',
  'does-not-conform': '#A12C24',
  inconclusive: '#7A4F00',
  'not-valid': '#5F5878',
} as const;

export type Ink = keyof typeof PAPER_INKS;

/** Red, green and blue from 0 to 1, as the page wants them. */
export interface Rgb {
  readonly red: number;
  readonly green: number;
  readonly blue: number;
}

/** `#RRGGBB` to shares of one. */
export function rgbOf(hex: string): Rgb {
  const digits = /^#([0-9a-f]{6})$/i.exec(hex)?.[1];
  if (digits === undefined) throw new Error(`An ink is written #RRGGBB, not ${hex}.`);
  const value = Number.parseInt(digits, 16);
  return { red: ((value >> 16) & 255) / 255, green: ((value >> 8) & 255) / 255, blue: (value & 255) / 255 };
}
