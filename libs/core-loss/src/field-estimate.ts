import { OutOfRangeError } from '@libs/quantities';
import { builtCoreFieldAPerM, type StripSteel } from './strip-field.js';

/** Steel whose field the planner can estimate. Built cores of the same grade differ more than grades do. */
export type CoreSteel = 'typical' | StripSteel;

/** A built core takes between these shares of the estimate: good steel well pressed, or old and strained. */
export const FIELD_BAND = { low: 0.7, high: 2 } as const;

/**
 * Flux density (T) and rms field (A/m) at 50 Hz of a built stator stack. Cutting and pressing eat permeability: below the
 * knee a stack takes two to three times the field of its own strip.
 */
const BUILT_CORE: readonly (readonly [fluxT: number, fieldRmsAPerM: number])[] = [
  [0.5002, 89.07],
  [0.9988, 194.2],
  [1.2016, 268.3],
  [1.2994, 329.8],
  [1.4986, 768.4],
  [1.6, 1420],
];
const LEAST_T = 0.1;
const MOST_T = 1.6;

/**
 * Estimate of the rms field that a built core takes: for choosing turns, cable and supply, never for judging.
 *
 * `ln H` runs straight between the measured points; below the first one H is proportional to B. For a steel that is named, the field
 * of its strip is raised to that of a built core (`builtCoreFieldAPerM`).
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B | `fluxT` | T | 0.1 to 1.6 |
 * | – | `steel` | – | `'typical'` when left out: a measured stack of good steel |
 *
 * @returns H rms in A/m; expect 0.7 to 2 times that (`FIELD_BAND`)
 * @throws OutOfRangeError outside 0.1 to 1.6 T, where saturation makes any estimate worthless
 *
 * Source: open dataset of a real stator stack (pfyhr/statordata, MIT), 50 Hz. Standing: points read, between them computed.
 * @example
 * hRmsEstimate(1.2994)
 * // → 329.8
 */
export function hRmsEstimate(fluxT: number, steel: CoreSteel = 'typical'): number {
  if (!(Number.isFinite(fluxT) && fluxT >= LEAST_T && fluxT <= MOST_T)) {
    throw new OutOfRangeError('fluxT', 'The field can be estimated from 0.1 to 1.6 T.');
  }
  if (steel !== 'typical') return builtCoreFieldAPerM(fluxT, steel);
  const above = BUILT_CORE.findIndex(([t]) => t >= fluxT);
  const [t2, h2] = BUILT_CORE[above] ?? BUILT_CORE[BUILT_CORE.length - 1]!;
  const below = BUILT_CORE[above - 1];
  if (!below) return (h2 * fluxT) / t2;
  const [t1, h1] = below;
  return h1 * (h2 / h1) ** ((fluxT - t1) / (t2 - t1));
}
