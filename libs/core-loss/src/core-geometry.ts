import { OutOfRangeError } from '@libs/quantities';

/** A stator has its slots open to the bore; an armature (and a wound rotor) has them on the outside diameter. */
export type CoreKind = 'stator' | 'armature';

/** The size of a core as measured with rule and caliper, in metres. */
export interface CoreGeometry {
  kind: CoreKind;
  outerDiameterM: number;
  /** Bore of a stator; shaft, spider or bottom-of-vent diameter of an armature. */
  innerDiameterM: number;
  slotDepthM: number;
  slots: number;
  /** Gross stack, radial ducts included. */
  stackLengthM: number;
  ducts: number;
  ductWidthM: number;
  /** Share of the stack that is iron, 0.95 when nothing better is known. */
  stackingFactor: number;
  densityKgPerM3: number;
}

/** What follows from the size. The flux of a ring test runs in the back iron, so area and mass are the back iron's. */
export interface DerivedGeometry {
  backIronDepthM: number;
  meanDiameterM: number;
  meanPathM: number;
  netLengthM: number;
  areaM2: number;
  massKg: number;
  /** Flux density at the inner edge of the back iron over its mean, if the permeability were constant. */
  innerToMeanFluxRatio: number;
}

export interface GeometryProblem {
  field: keyof CoreGeometry;
  code: string;
  message: string;
}

/** Loose bounds: a figure outside them is a slip of the pen or of the unit, not a core. */
const LONGEST_M = 25;
const DENSITY = { least: 6500, most: 8200 };
const STACKING = { least: 0.7, most: 1 };

const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
const positive = (value: unknown): value is number => finite(value) && value > 0;

const LENGTHS = {
  outerDiameterM: 'the outside diameter',
  innerDiameterM: 'the bore or inside diameter',
  slotDepthM: 'the slot depth',
  stackLengthM: 'the stack length',
} as const satisfies Partial<Record<keyof CoreGeometry, string>>;

/**
 * Everything that is wrong with a core's size, each with the field it belongs to. It never throws: the form calls it
 * while the figures are still being typed, the server before it stores them.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `g` | m, kg/m³ | anything; a missing or wrong figure is a problem, not an error |
 *
 * @returns an empty list when `deriveGeometry` will accept the core
 *
 * Standing: common practice.
 * @example
 * geometryProblems({ kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.07, slots: 48, stackLengthM: 0.3, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 }).map((p) => p.code)
 * // → ['no-back-iron']
 */
export function geometryProblems(g: Partial<Record<keyof CoreGeometry, unknown>>): GeometryProblem[] {
  const problems: GeometryProblem[] = [];
  const say = (field: keyof CoreGeometry, code: string, message: string) => void problems.push({ field, code, message });

  if (g.kind !== 'stator' && g.kind !== 'armature') say('kind', 'kind', 'Say whether this is a stator or an armature.');
  for (const [field, words] of Object.entries(LENGTHS) as [keyof typeof LENGTHS, string][]) {
    const value = g[field];
    if (!positive(value)) say(field, 'not-positive', `Measure ${words}: it must be more than 0.`);
    else if (value > LONGEST_M) say(field, 'too-large', `Check ${words} and its unit: no core is that large.`);
  }
  if (!(finite(g.slots) && Number.isInteger(g.slots) && g.slots >= 3 && g.slots <= 1000)) say('slots', 'slots', 'Count the slots: a whole number, 3 or more.');
  if (!(finite(g.ducts) && Number.isInteger(g.ducts) && g.ducts >= 0 && g.ducts <= 500)) say('ducts', 'ducts', 'Count the radial ducts: 0 when there are none.');
  if (!(finite(g.ductWidthM) && g.ductWidthM >= 0)) say('ductWidthM', 'duct-width', 'Measure the width of a duct: 0 when there are none.');
  else if (finite(g.ducts) && g.ducts > 0 && g.ductWidthM === 0) say('ductWidthM', 'duct-width', 'Ducts are counted: measure how wide one is.');
  if (!(finite(g.stackingFactor) && g.stackingFactor >= STACKING.least && g.stackingFactor <= STACKING.most)) {
    say('stackingFactor', 'stacking-factor', 'The stacking factor lies between 0.70 and 1. Take 0.95 when it is unknown.');
  }
  if (!(finite(g.densityKgPerM3) && g.densityKgPerM3 >= DENSITY.least && g.densityKgPerM3 <= DENSITY.most)) {
    say('densityKgPerM3', 'density', 'The density of lamination steel lies between 6500 and 8200 kg/m³. Take 7700 when it is unknown.');
  }
  if (problems.length > 0) return problems;

  const core = g as unknown as CoreGeometry;
  if (core.innerDiameterM >= core.outerDiameterM) {
    say('innerDiameterM', 'diameters', 'The inside diameter must be smaller than the outside diameter.');
  } else if ((core.outerDiameterM - core.innerDiameterM) / 2 - core.slotDepthM <= 0) {
    say('slotDepthM', 'no-back-iron', 'The slots are as deep as the core: nothing is left for the back iron. Measure the slot depth again.');
  }
  if (core.ducts * core.ductWidthM >= core.stackLengthM) {
    say('ducts', 'no-iron-length', 'The ducts take up the whole stack. Check their number and width.');
  }
  return problems;
}

/**
 * Back iron of a core: where the flux of a ring test runs.
 *
 * `h = (D_o − D_i)/2 − h_s`, `D_m = D_o − h` (stator) or `D_i + h` (armature), `l = π·D_m`,
 * `L_n = k·(L − n_v·w_v)`, `A = h·L_n`, `m = ρ·A·l` (exact for a ring)
 *
 * Inner edge: with constant permeability B falls as 1/r, so `B_inner/B_mean = D_log/D_1`,
 * `D_log = (D_2 − D_1)/ln(D_2/D_1)` of the back iron's own diameters D_1 and D_2. Saturation evens this out.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | D_o | `g.outerDiameterM` | m | more than D_i |
 * | D_i | `g.innerDiameterM` | m | bore, or shaft / spider / bottom of axial vents |
 * | h_s | `g.slotDepthM` | m | leaves some back iron |
 * | L | `g.stackLengthM` | m | ducts included |
 * | n_v, w_v | `g.ducts`, `g.ductWidthM` | –, m | together less than L |
 * | k | `g.stackingFactor` | – | 0.70 to 1 |
 * | ρ | `g.densityKgPerM3` | kg/m³ | 6500 to 8200 |
 *
 * @returns lengths in m, area in m², back-iron mass in kg
 * @throws OutOfRangeError naming the first field that is wrong; `geometryProblems` names them all
 *
 * Source: geometry of a ring; the mass rule (back iron only) is the trade's. Standing: from memory, area and mass computed.
 * @example
 * deriveGeometry({ kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.035, slots: 48, stackLengthM: 0.3, ducts: 2, ductWidthM: 0.01, stackingFactor: 0.95, densityKgPerM3: 7700 }).massKg
 * // → 82.20
 */
export function deriveGeometry(g: CoreGeometry): DerivedGeometry {
  const [problem] = geometryProblems(g);
  if (problem) throw new OutOfRangeError(problem.field, problem.message);
  const backIronDepthM = (g.outerDiameterM - g.innerDiameterM) / 2 - g.slotDepthM;
  const meanDiameterM = g.kind === 'stator' ? g.outerDiameterM - backIronDepthM : g.innerDiameterM + backIronDepthM;
  const meanPathM = Math.PI * meanDiameterM;
  const netLengthM = g.stackingFactor * (g.stackLengthM - g.ducts * g.ductWidthM);
  const areaM2 = backIronDepthM * netLengthM;
  const inner = meanDiameterM - backIronDepthM;
  const outer = meanDiameterM + backIronDepthM;
  return {
    backIronDepthM,
    meanDiameterM,
    meanPathM,
    netLengthM,
    areaM2,
    massKg: g.densityKgPerM3 * areaM2 * meanPathM,
    innerToMeanFluxRatio: (outer - inner) / Math.log(outer / inner) / inner,
  };
}

/**
 * Mass of the teeth: the whole core is back iron and teeth. A ring test divides by the back iron only; the no-load core
 * loss of the finished machine is spread over both.
 *
 * `m_t = ρ·L_n·[π/4·(D_2² − D_1²) − Q·A_s]`, D_1 and D_2 the diameters at the two ends of a slot
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | Q | `g.slots` | – | 3 or more |
 * | A_s | `slotAreaM2` | m² | 0 or more, less than the slot pitch allows |
 *
 * @returns kg
 * @throws OutOfRangeError when the core's size is wrong or the slots leave no teeth
 *
 * Source: geometry of a ring. Standing: from memory.
 * @example
 * toothMassKg({ kind: 'stator', outerDiameterM: 0.4, innerDiameterM: 0.26, slotDepthM: 0.035, slots: 48, stackLengthM: 0.3, ducts: 2, ductWidthM: 0.01, stackingFactor: 0.95, densityKgPerM3: 7700 }, 0.0003)
 * // → 36.94
 */
export function toothMassKg(g: CoreGeometry, slotAreaM2: number): number {
  const { netLengthM } = deriveGeometry(g);
  if (!(finite(slotAreaM2) && slotAreaM2 >= 0)) throw new OutOfRangeError('slotAreaM2', 'The area of a slot must be 0 or more.');
  const [d1, d2] =
    g.kind === 'stator' ? [g.innerDiameterM, g.innerDiameterM + 2 * g.slotDepthM] : [g.outerDiameterM - 2 * g.slotDepthM, g.outerDiameterM];
  const teeth = (Math.PI / 4) * (d2 ** 2 - d1 ** 2) - g.slots * slotAreaM2;
  if (teeth <= 0) throw new OutOfRangeError('slotAreaM2', 'These slots leave no teeth. Check the area of one slot and their number.');
  return g.densityKgPerM3 * netLengthM * teeth;
}
