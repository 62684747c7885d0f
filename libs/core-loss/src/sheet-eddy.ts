import { OutOfRangeError } from '@libs/quantities';

const MU0 = 4e-7 * Math.PI;

function positive(values: Record<string, number>): void {
  for (const [field, value] of Object.entries(values)) {
    if (!(Number.isFinite(value) && value > 0)) throw new OutOfRangeError(field, `${field} must be a number, more than 0.`);
  }
}

/** One sheet and the flux in it. */
export interface SheetInFlux {
  fluxDensityT: number;
  frequencyHz: number;
  thicknessM: number;
  resistivityOhmM: number;
  densityKgPerM3: number;
}

/**
 * Classical eddy loss: what the currents inside one sound sheet take, the flux spread evenly over its thickness. What a core
 * takes beyond it and beyond hysteresis runs from sheet to sheet, or is excess loss of the domains.
 *
 * `p = π²·B²·f²·t² / (6·ρ_e·D)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B | `sheet.fluxDensityT` | T peak | more than 0 |
 * | f | `sheet.frequencyHz` | Hz | more than 0 |
 * | t | `sheet.thicknessM` | m | more than 0; 0.00035, 0.0005, 0.00065 usual |
 * | ρ_e | `sheet.resistivityOhmM` | Ω·m | more than 0; see `steelResistivityOhmM` |
 * | D | `sheet.densityKgPerM3` | kg/m³ | more than 0 |
 *
 * @returns W/kg
 * @throws OutOfRangeError outside those ranges
 *
 * Source: text books of magnetic materials. Standing: from memory; values computed.
 * @example
 * classicalEddyWPerKg({ fluxDensityT: 1.5, frequencyHz: 50, thicknessM: 0.0005, resistivityOhmM: 4.2e-7, densityKgPerM3: 7700 })
 * // → 0.7153
 */
export function classicalEddyWPerKg(sheet: SheetInFlux): number {
  const { fluxDensityT, frequencyHz, thicknessM, resistivityOhmM, densityKgPerM3 } = sheet;
  positive({ fluxDensityT, frequencyHz, thicknessM, resistivityOhmM, densityKgPerM3 });
  return (Math.PI * fluxDensityT * frequencyHz * thicknessM) ** 2 / (6 * resistivityOhmM * densityKgPerM3);
}

/**
 * Resistivity of silicon steel by its silicon.
 *
 * `ρ_e = (12 + 11·Si + 0.06·(θ − 20)) µΩ·cm`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | Si | `siliconPercent` | % | 0 to 4 |
 * | θ | `temperatureC` | °C | −40 to 200, 20 when left out |
 *
 * @returns Ω·m; makers' figures lie within about 15 % of it
 * @throws OutOfRangeError outside those ranges
 *
 * Source: text books of magnetic materials; the temperature term is the same for every silicon (Matthiessen). Standing: from memory.
 * @example
 * steelResistivityOhmM(3)
 * // → 4.5e-7
 */
export function steelResistivityOhmM(siliconPercent: number, temperatureC = 20): number {
  if (!(siliconPercent >= 0 && siliconPercent <= 4)) throw new OutOfRangeError('siliconPercent', 'Lamination steel holds 0 to 4 % of silicon.');
  if (!(temperatureC >= -40 && temperatureC <= 200)) throw new OutOfRangeError('temperatureC', 'The temperature lies between −40 and 200 °C.');
  return (12 + 11 * siliconPercent + 0.06 * (temperatureC - 20)) * 1e-8;
}

/**
 * Skin depth: how deep an alternating flux reaches into solid steel.
 *
 * `δ = √(ρ_e / (π·f·µ₀·µ_r))`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | f | `frequencyHz` | Hz | more than 0 |
 * | ρ_e | `resistivityOhmM` | Ω·m | more than 0 |
 * | µ_r | `relativePermeability` | – | more than 0; 1000 to 8000 usual below the knee |
 *
 * @returns m
 * @throws OutOfRangeError outside those ranges
 *
 * Source: text books of electromagnetics. Standing: from memory; values computed.
 * @example
 * skinDepthM(50, 4.6e-7, 5000) * 1000
 * // → 0.683
 */
export function skinDepthM(frequencyHz: number, resistivityOhmM: number, relativePermeability: number): number {
  positive({ frequencyHz, resistivityOhmM, relativePermeability });
  return Math.sqrt(resistivityOhmM / (Math.PI * frequencyHz * MU0 * relativePermeability));
}

/** Below this the closed form loses its figures in the difference of two near numbers; the series has them. */
const SERIES_BELOW = 0.6;

/**
 * Exact lamination factor: the share of the classical eddy loss that is left when the sheet's own currents push the flux to
 * its faces. At 50 and 60 Hz and sheets up to 0.65 mm it is 0.98 and more and may be left out.
 *
 * `F(x) = (3/x)·(sinh x − sin x)/(cosh x − cos x)`, `x = t/δ`; `F → 3/x` for a thick sheet
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | x | `thicknessOverSkinDepth` | – | 0 or more |
 *
 * @returns 1 for a thin sheet, falling to 0
 * @throws OutOfRangeError when x is negative or not finite
 *
 * Source: text books of electromagnetics, linear permeability. Standing: from memory; values computed.
 * @example
 * laminationFactor(2)
 * // → 0.975589
 */
export function laminationFactor(thicknessOverSkinDepth: number): number {
  const x = thicknessOverSkinDepth;
  if (!(Number.isFinite(x) && x >= 0)) throw new OutOfRangeError('thicknessOverSkinDepth', 'Thickness over skin depth must be 0 or more.');
  if (x < SERIES_BELOW) {
    const q = x ** 4;
    return (1 + q / 840 + (q * q) / 6652800) / (1 + q / 360 + (q * q) / 1814400);
  }
  // beyond 40 the hyperbolic functions are equal to all figures, and soon too large for the machine
  return x > 40 ? 3 / x : ((3 / x) * (Math.sinh(x) - Math.sin(x))) / (Math.cosh(x) - Math.cos(x));
}
