import { OutOfRangeError } from '@libs/quantities';

/** Peak field (A/m) that strip takes at 1.0, 1.2, 1.32 and 1.5 T, sine flux. */
const FLUXES = [1.0, 1.2, 1.32, 1.5] as const;
const STRIP = {
  'M-19': [106, 164, 264, 1108],
  'M235-35A': [91, 151, 297, 1480],
  'M270-35A': [112, 178, 337, 1700],
  'M400-50A': [121, 168, 248, 1148],
  'M530-65A': [140, 195, 282, 1127],
  'M800-50A': [209, 254, 324, 660],
} as const satisfies Record<string, readonly [number, number, number, number]>;

export type StripSteel = keyof typeof STRIP;
/** The named steels, for a list on a screen. */
export const STRIP_STEELS = Object.keys(STRIP) as readonly StripSteel[];

/**
 * What became of the strip's field when it was cut and built into a stack: strip and three stator rings of one steel, peak A/m at 1.0,
 * 1.3 and 1.5 T. The factor (3.3, 2.2, 1.08) goes with the field and not with the flux, so that a hard steel is not raised twice.
 */
const BUILT: readonly (readonly [strip: number, built: number])[] = [
  [94, 315],
  [280, 623],
  [1670, 1800],
];
/** Peak over rms of the exciting current on real stator cores, by the peak field: the wave grows a point as the iron fills. */
const CREST: readonly (readonly [peak: number, crest: number])[] = [
  [318, 1.64],
  [615, 1.87],
  [1788, 2.33],
  [3362, 2.37],
];
/** Beyond 1.5 T the field grows as on a measured stack: 768 to 1420 A/m rms in 0.1 T. */
const GROWTH_BEYOND = (1420 / 768.4) ** (1 / (1.6 - 1.4986));

/** Straight between points of the logarithm of the first column; `outside` says what follows before the first and after the last. */
function between(points: readonly (readonly [number, number])[], x: number, logarithmic: boolean): number {
  const scale = (value: number) => (logarithmic ? Math.log(value) : value);
  const back = (value: number) => (logarithmic ? Math.exp(value) : value);
  const above = points.findIndex(([at]) => at >= x);
  const [last] = points.slice(-1);
  const [first] = points;
  if (above === 0 || above === -1) {
    const [at, value] = (above === 0 ? first : last) as readonly [number, number];
    return logarithmic ? (value * x) / at : value;
  }
  const [x1, y1] = points[above - 1] as readonly [number, number];
  const [x2, y2] = points[above] as readonly [number, number];
  return back(scale(y1) + ((scale(y2) - scale(y1)) * (Math.log(x) - Math.log(x1))) / (Math.log(x2) - Math.log(x1)));
}

/** Peak field of the strip: `ln H` straight over B between the points, proportional below 1.0 T, as a stack beyond 1.5 T. */
function stripPeak(fluxT: number, steel: StripSteel): number {
  const fields = STRIP[steel];
  if (fluxT <= FLUXES[0]) return (fields[0] * fluxT) / FLUXES[0];
  const above = FLUXES.findIndex((b) => b >= fluxT);
  if (above === -1) return fields[3] * GROWTH_BEYOND ** (fluxT - FLUXES[3]);
  const [b1, b2] = [FLUXES[above - 1] ?? FLUXES[0], FLUXES[above] ?? FLUXES[3]];
  const [h1, h2] = [fields[above - 1] ?? fields[0], fields[above] ?? fields[3]];
  return h1 * (h2 / h1) ** ((fluxT - b1) / (b2 - b1));
}

/**
 * Rms field that a core built of a named steel takes at 50 or 60 Hz: from the field of its strip, for choosing turns, cable and supply.
 * Cutting and pressing eat permeability, below the knee most of all.
 *
 * `H_rms = H_built / c(H_built)`, `H_built = H_strip · F(H_strip)`, F = 3.3 at 94, 2.2 at 280, 1.08 at 1670 A/m; c = 1.64 at 318 to 2.37 at 3362 A/m
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B | `fluxT` | T | 0.1 to 1.6 |
 * | – | `steel` | – | one of `STRIP_STEELS` |
 *
 * @returns A/m rms; expect 0.7 to 2 times that (`FIELD_BAND`)
 * @throws OutOfRangeError outside that range
 *
 * Source: strip fields of open datasets (pyleecan, Apache-2.0; Modelica Standard Library, BSD, for M400-50A); built-core and crest factors from strip and
 * rings of one steel (pfyhr/statordata, MIT). Standing: points read, factors computed from one steel and carried over to the others.
 * @example
 * builtCoreFieldAPerM(1.32, 'M400-50A')
 * // → 312
 */
export function builtCoreFieldAPerM(fluxT: number, steel: StripSteel): number {
  if (!(Number.isFinite(fluxT) && fluxT >= 0.1 && fluxT <= 1.6)) throw new OutOfRangeError('fluxT', 'The field can be estimated from 0.1 to 1.6 T.');
  if (!Object.hasOwn(STRIP, steel)) throw new OutOfRangeError('steel', `The field of ${String(steel)} is not known. Take the typical one.`);
  const built = between(BUILT, stripPeak(fluxT, steel), true);
  return built / between(CREST, built, false);
}

/** Peak field of a built core from the peak field of its strip; for the check against the rings it was taken from. */
export const builtPeakFromStrip = (stripAPerM: number): number => between(BUILT, stripAPerM, true);
/** Peak over rms at a peak field of the built core. */
export const crestAt = (builtAPerM: number): number => between(CREST, builtAPerM, false);
