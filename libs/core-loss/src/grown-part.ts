import { OutOfRangeError } from '@libs/quantities';
import type { Reason } from './core-test.js';
import type { Separation, SeparationFigures } from './two-frequency-separation.js';

/** What each part of the loss says about the core, in the words of the bay. */
export const GROWN_WORDS = {
  'sheet-insulation': 'The eddy part grew: sheet insulation. Sheets touch each other; look for overheated plate, burrs, rubbed or smeared teeth, and separate and re-insulate them.',
  'cold-work-and-strain': 'The hysteresis part grew: cold work and strain. The iron was hammered, bent, pressed or overheated; separating sheets will not bring it back.',
  both: 'Both parts grew: sheet insulation, and cold work and strain. Separate and re-insulate first, then test again.',
  neither: 'Neither part grew by more than the readings can tell.',
  inconclusive: 'The readings do not tell which part grew.',
} as const satisfies Record<string, string>;
export type GrownPart = keyof typeof GROWN_WORDS;

export interface GrownAnswer {
  outcome: GrownPart;
  words: string;
  /** Growth of each part in W/kg at the frequency asked for, with expanded uncertainties; absent when a separation is. */
  growth?: { frequencyHz: number; hysteresis: number; eddy: number; uHysteresis: number; uEddy: number };
  reasons: Reason[];
}

export interface GrownOptions {
  /** Where the parts are held against each other; 50 Hz when left out. */
  frequencyHz?: number;
  /** Growth smaller than this share of the loss before is nobody's trouble: 'neither' needs both parts surely below it. */
  smallShare?: number;
}

/** Two fluxes that differ by less are one: the separations were referred to it already. */
const SAME_FLUX = 0.005;

const answer = (outcome: GrownPart, reasons: Reason[] = [], growth?: GrownAnswer['growth']): GrownAnswer => ({
  outcome,
  words: GROWN_WORDS[outcome],
  ...(growth ? { growth } : {}),
  reasons,
});

const told = (separation: Separation): (SeparationFigures & { outcome: 'separated' }) | undefined => (separation.outcome === 'separated' ? separation : undefined);

function unusable(name: 'before' | 'after', separation: Separation): Reason[] {
  if (separation.outcome === 'separated') return [];
  return separation.reasons.map(({ code, words }) => ({ code: `${name}-${code}`, words: `${name === 'before' ? 'Before' : 'After'}: ${words}` }));
}

/**
 * Which part of the loss grew between two separations of one core: the eddy part (sheet insulation) or the hysteresis part (cold work
 * and strain). A part grew when its growth is more than its expanded uncertainty; which of the two it is, is said only when the one
 * that grew outgrew the other by more than the uncertainty of their difference.
 *
 * `ΔP_h = (a_2 − a_1)·f`, `ΔP_e = (b_2 − b_1)·f²`, `u²(ΔP_e − ΔP_h) = u²_e + u²_h − 2·r·u_e·u_h` for each test
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | a_1, b_1 | `before` | J/kg, J/(kg·Hz) | from `separateTwoFrequencies` |
 * | a_2, b_2 | `after` | J/kg, J/(kg·Hz) | same flux |
 * | f | `options.frequencyHz` | Hz | more than 0, 50 when left out |
 * | – | `options.smallShare` | – | 0.1 when left out |
 *
 * The two tests are taken as independent, which is on the careful side where one set of meters served both.
 *
 * @returns the part by name with its words and the growth of both; `inconclusive` with reasons when a separation does not tell, the
 *   fluxes differ, or the uncertainties swallow the answer
 * @throws OutOfRangeError when frequency or share are out of range
 *
 * Source: overheating destroys core plate, cold work and strain raise hysteresis. Standing: common practice; uncertainties computed.
 * @example
 * const before = separateTwoFrequencies({ frequencyHz: 25, fluxDensityT: 1.32, wattsPerKg: 1.1 }, { frequencyHz: 50, fluxDensityT: 1.32, wattsPerKg: 2.6 })
 * const after = separateTwoFrequencies({ frequencyHz: 25, fluxDensityT: 1.32, wattsPerKg: 1.4 }, { frequencyHz: 50, fluxDensityT: 1.32, wattsPerKg: 3.8 })
 * partThatGrew(before, after).outcome
 * // → 'sheet-insulation'
 */
export function partThatGrew(before: Separation, after: Separation, options: GrownOptions = {}): GrownAnswer {
  const { frequencyHz = 50, smallShare = 0.1 } = options;
  if (!(Number.isFinite(frequencyHz) && frequencyHz > 0)) throw new OutOfRangeError('frequencyHz', 'The frequency must be more than 0.');
  if (!(smallShare > 0 && smallShare < 1)) throw new OutOfRangeError('smallShare', 'The share lies between 0 and 1.');
  const [first, second] = [told(before), told(after)];
  if (!first || !second) return answer('inconclusive', [...unusable('before', before), ...unusable('after', after)]);
  if (Math.abs(second.referredToT / first.referredToT - 1) > SAME_FLUX) {
    return answer('inconclusive', [{ code: 'flux-differs', words: `The two separations stand at ${first.referredToT.toFixed(3)} and ${second.referredToT.toFixed(3)} T. Refer both to one flux.` }]);
  }
  const k = first.coverageFactor;
  const inWatts = (s: SeparationFigures) => {
    const [h, e] = [s.uHysteresisPerCycle * frequencyHz, s.uEddyPerCycleHz * frequencyHz ** 2];
    return { h, e, apart: h * h + e * e - 2 * s.correlation * h * e };
  };
  const [u1, u2] = [inWatts(first), inWatts(second)];
  const hysteresis = (second.hysteresisPerCycle - first.hysteresisPerCycle) * frequencyHz;
  const eddy = (second.eddyPerCycleHz - first.eddyPerCycleHz) * frequencyHz ** 2;
  const uHysteresis = k * Math.hypot(u1.h, u2.h);
  const uEddy = k * Math.hypot(u1.e, u2.e);
  const uApart = k * Math.sqrt(Math.max(u1.apart + u2.apart, 0));
  const growth = { frequencyHz, hysteresis, eddy, uHysteresis, uEddy };
  const [eddyGrew, hysteresisGrew] = [eddy > uEddy, hysteresis > uHysteresis];
  if (eddyGrew && hysteresisGrew) return answer('both', [], growth);
  if (eddyGrew && eddy - hysteresis > uApart) return answer('sheet-insulation', [], growth);
  if (hysteresisGrew && hysteresis - eddy > uApart) return answer('cold-work-and-strain', [], growth);
  const small = smallShare * (first.hysteresisPerCycle * frequencyHz + first.eddyPerCycleHz * frequencyHz ** 2);
  if (!eddyGrew && !hysteresisGrew && eddy + uEddy <= small && hysteresis + uHysteresis <= small) return answer('neither', [], growth);
  return answer('inconclusive', [{ code: 'within-uncertainty', words: 'What the parts differ by lies within their uncertainty. Read again with steadier meters, or at frequencies farther apart.' }], growth);
}
