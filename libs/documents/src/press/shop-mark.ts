import type { Mark } from './marks.js';

/** The mark: a ring with slots, and one heavy loop of cable through the bore and round the outside. Drawn in a box of 104 by 84. */
const SLOTS = 12;
const OUTER = 38;
const BORE = 19;
const SLOT_DEPTH = 8;

const at = (radius: number, angle: number) => `${(radius * Math.sin(angle)).toFixed(2)} ${(-radius * Math.cos(angle)).toFixed(2)}`;

function ringPath(): string {
  let bore = '';
  for (let slot = 0; slot < SLOTS; slot += 1) {
    const turn = (share: number) => ((slot + share) / SLOTS) * 2 * Math.PI;
    const from = turn(-0.17);
    const to = turn(0.17);
    bore += `${slot === 0 ? 'M' : 'L'}${at(BORE, from)}L${at(BORE + SLOT_DEPTH, from)}L${at(BORE + SLOT_DEPTH, to)}L${at(BORE, to)}A${BORE} ${BORE} 0 0 1 ${at(BORE, turn(0.83))}`;
  }
  return `M0 ${-OUTER}A${OUTER} ${OUTER} 0 1 1 0 ${OUTER}A${OUTER} ${OUTER} 0 1 1 0 ${-OUTER}Z${bore}Z`;
}

const CABLE_BEHIND = 'M6 3C4 -14 14 -25 30 -25C47 -25 54 -12 52 3';
const CABLE_BEFORE = 'M5.6 -1C6 16 14 27 30 27C45 27 53 15 52 -1';
const RING = ringPath();

/** At a height; the front of the cable is parted from the ring by a line of paper. */
export function shopMark(heightPt: number): { readonly widthPt: number; readonly heightPt: number; readonly marks: readonly Mark[] } {
  const scale = heightPt / 84;
  const place = { kind: 'path', x: 42 * scale, y: 42 * scale, scale } as const;
  return {
    widthPt: 104 * scale,
    heightPt,
    marks: [
      { ...place, d: CABLE_BEHIND, stroke: 'copper', strokeWidth: 9 },
      { ...place, d: RING, fill: 'text', evenOdd: true },
      { ...place, d: CABLE_BEFORE, stroke: 'card', strokeWidth: 14 },
      { ...place, d: CABLE_BEFORE, stroke: 'copper', strokeWidth: 9 },
    ],
  };
}
