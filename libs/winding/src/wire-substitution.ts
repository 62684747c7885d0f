import { OutOfRangeError } from '@libs/quantities';
import { conductorArea } from './wire.js';
import { positive, type RoundWire } from './winding-data.js';

export interface Substitute {
  wires: readonly RoundWire[];
  areaM2: number;
  /** Over the area asked for: 0.0012 is 0.12 % more copper. */
  change: number;
}

export interface SubstituteRequest {
  areaM2: number;
  /** Bare sizes on the shelf. */
  sizesM: readonly number[];
  /** Strands in all, of one size or of two neighbouring ones. */
  mostStrands: number;
  /** Least and most change of area, as fractions: 0 and 0.05 unless told, since no copper may be lost. */
  leastChange?: number;
  mostChange?: number;
}

/** Sizes this close may be mixed in one turn; with more the thin strands bury themselves between the thick ones. */
const NEIGHBOURS = 2;

/**
 * What can be wound from the shelf instead of a wire that is not there, nearest in area first.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | A | `areaM2` | m² | copper of one turn, more than 0 |
 * | – | `sizesM` | m | bare diameters on the shelf |
 * | – | `mostStrands` | – | whole, 1 to 40 |
 * | – | `leastChange`, `mostChange` | fraction | 0 and 0.05 unless told |
 *
 * @returns one or two sizes each; an empty list says that nothing on the shelf fits
 * @throws OutOfRangeError outside those ranges
 *
 * Source: conductor area at least as large as the original (ANSI/EASA AR100-2020, read); the upper end is common practice.
 * @example
 * substituteWires({ areaM2: 8.8247e-7, sizesM: [0.00075, 0.0009], mostStrands: 2 })[0].change
 * // → 0.0012
 */
export function substituteWires({ areaM2, sizesM, mostStrands, leastChange = 0, mostChange = 0.05 }: SubstituteRequest): Substitute[] {
  if (!positive(areaM2)) throw new OutOfRangeError('areaM2', 'Enter the wire that is to be replaced.');
  if (!Number.isInteger(mostStrands) || mostStrands < 1 || mostStrands > 40) throw new OutOfRangeError('mostStrands', 'Say how many strands at most: 1 to 40.');
  if (!sizesM.every(positive)) throw new OutOfRangeError('sizesM', 'Every size on the shelf must be more than 0.');
  if (!(leastChange <= mostChange) || leastChange <= -1) throw new OutOfRangeError('leastChange', 'The least change must not stand above the most.');
  const sizes = [...new Set(sizesM)].sort((a, b) => b - a);
  const found: Substitute[] = [];
  const offer = (wires: RoundWire[]) => {
    const area = conductorArea(wires);
    const change = area / areaM2 - 1;
    if (change >= leastChange && change <= mostChange) found.push({ wires, areaM2: area, change });
  };
  sizes.forEach((size, i) => {
    for (let n = 1; n <= mostStrands; n++) {
      offer([{ strands: n, bareDiameterM: size }]);
      for (const thinner of sizes.slice(i + 1, i + 1 + NEIGHBOURS)) {
        for (let m = 1; m <= mostStrands - n; m++) offer([{ strands: n, bareDiameterM: size }, { strands: m, bareDiameterM: thinner }]);
      }
    }
  });
  const strands = (s: Substitute) => s.wires.reduce((sum, w) => sum + w.strands, 0);
  return found.sort((a, b) => Math.abs(a.change) - Math.abs(b.change) || a.wires.length - b.wires.length || strands(a) - strands(b));
}
