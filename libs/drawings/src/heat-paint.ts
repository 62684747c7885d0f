import type { Paint } from './drawing.js';

/** The heat of a place: cold iron is steel on card, the limit and above is the colour of failure. */
export function heatPaint(kelvin: number | undefined, fullK: number): Paint {
  const cold: Paint = { from: 'card', to: 'steel', share: 0.24 };
  if (kelvin === undefined) return cold;
  const share = Math.min(1, Math.max(0, kelvin / fullK));
  if (share < 0.25) return cold;
  return share < 0.7 ? { from: 'card', to: 'unsure', share: 0.35 + share * 0.6 } : { from: 'unsure', to: 'fails', share: Math.min(1, (share - 0.7) / 0.3) };
}
