import { OutOfRangeError } from '@libs/quantities';
import type { DerivedGeometry } from './core-geometry.js';

/** One reading of a ring test, as taken from the instruments. */
export interface RingReading {
  excitingTurns: number;
  searchTurns: number;
  searchVoltsV: number;
  /** An average-sensing meter scaled in rms shows flux rightly whatever the wave; a true-rms one needs the form factor. */
  voltmeter: 'average' | 'true-rms';
  /** rms over rectified mean of the search-coil volts; 1.1107 for a sine. */
  formFactor?: number;
  excitingA: number;
  /** Watts as the meter shows them, before any turns ratio or cable loss is taken off. */
  wattsW: number;
  /** Where the wattmeter's voltage lead sat. */
  wattmeterLead: 'search' | 'exciting';
  /** Needed when the lead sat on the exciting terminals: the loop cable's loss is in the watts. */
  cableResistanceOhm?: number;
  /** Parallel resistance of the instruments on the search coil, when it is not negligible. */
  searchBurdenOhm?: number;
  frequencyHz: number;
}

/** One reading reduced to what the core did. */
export interface ReducedReading {
  fluxDensityT: number;
  coreWatts: number;
  wattsPerKg: number;
  apparentVA: number;
  vaPerKg: number;
  fieldRmsAPerM: number;
  powerFactor: number;
  voltsPerTurn: number;
  excitingVoltsV: number;
  /** Loss of the exciting cable that was taken off the watts; absent when the lead sat on the search coil. */
  cableLossW?: number;
  /** True when a true-rms voltmeter was used without a form factor and a sine was taken for granted. */
  formFactorAssumedSine: boolean;
}

export interface ReadingProblem {
  field: keyof RingReading;
  code: string;
  message: string;
}

/** rms over rectified mean of a sine, π/(2√2) = 1.1107. */
export const SINE_FORM_FACTOR = Math.PI / (2 * Math.SQRT2);

/** Above this mean flux no lamination steel is left unsaturated: the reading or the size is wrong. */
export const SATURATION_T = 2.1;

const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
const positive = (value: unknown): value is number => finite(value) && value > 0;

/**
 * Everything that is wrong with a reading on its own, before any size is known. It never throws.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `r` | V, A, W, Ω, Hz | anything; a missing or wrong figure is a problem, not an error |
 *
 * @returns an empty list when `reduceReading` will accept the reading
 *
 * Standing: common practice.
 * @example
 * readingProblems({ excitingTurns: 24, searchTurns: 4, searchVoltsV: 20.99, voltmeter: 'average', excitingA: 25.1, wattsW: -1, wattmeterLead: 'search', frequencyHz: 50 }).map((p) => p.field)
 * // → ['wattsW']
 */
export function readingProblems(r: Partial<Record<keyof RingReading, unknown>>): ReadingProblem[] {
  const problems: ReadingProblem[] = [];
  const say = (field: keyof RingReading, code: string, message: string) => void problems.push({ field, code, message });
  const turns = (field: 'excitingTurns' | 'searchTurns', words: string) => {
    const value = r[field];
    if (!(finite(value) && Number.isInteger(value) && value >= 1)) say(field, 'turns', `Count the ${words} turns: a whole number, 1 or more.`);
    else if (value > 10_000) say(field, 'turns', `Check the count of ${words} turns: no loop has that many.`);
  };
  turns('excitingTurns', 'exciting');
  turns('searchTurns', 'search');
  if (!positive(r.searchVoltsV)) say('searchVoltsV', 'not-positive', 'Read the volts on the search coil: more than 0.');
  if (!positive(r.excitingA)) say('excitingA', 'not-positive', 'Read the exciting current: more than 0.');
  if (!positive(r.wattsW)) say('wattsW', 'not-positive', 'Read the watts: more than 0. A negative reading means a lead is the wrong way round.');
  if (!(positive(r.frequencyHz) && r.frequencyHz >= 10 && r.frequencyHz <= 1000)) {
    say('frequencyHz', 'frequency', 'Read the supply frequency: 10 to 1000 Hz.');
  }
  if (r.voltmeter !== 'average' && r.voltmeter !== 'true-rms') say('voltmeter', 'voltmeter', 'Say which kind of voltmeter: average-sensing or true rms.');
  if (r.formFactor !== undefined && !(finite(r.formFactor) && r.formFactor >= 1 && r.formFactor <= 2)) {
    say('formFactor', 'form-factor', 'The form factor lies between 1 and 2; a sine has 1.111. Leave it empty when it was not measured.');
  }
  if (r.wattmeterLead !== 'search' && r.wattmeterLead !== 'exciting') {
    say('wattmeterLead', 'wattmeter-lead', 'Say where the voltage lead of the wattmeter sat: search coil or exciting terminals.');
  }
  if (r.cableResistanceOhm === undefined) {
    if (r.wattmeterLead === 'exciting') say('cableResistanceOhm', 'cable-resistance', 'The wattmeter sat on the exciting terminals: measure the resistance of the loop cable.');
  } else if (!(finite(r.cableResistanceOhm) && r.cableResistanceOhm >= 0)) {
    say('cableResistanceOhm', 'cable-resistance', 'The resistance of the loop cable must be 0 or more.');
  }
  if (r.searchBurdenOhm !== undefined && !positive(r.searchBurdenOhm)) {
    say('searchBurdenOhm', 'search-burden', 'The resistance of the instruments on the search coil must be more than 0. Leave it empty when it does not matter.');
  }
  return problems;
}

/**
 * Reduces one reading of a ring test to flux, loss, field and apparent power.
 *
 * `B = V_s / (4.44288·f·N_s·A)` with an average-sensing meter scaled in rms: right for any wave with two zero crossings.
 * A true-rms meter is turned into it by its form factor FF: `B = (V_s/FF) / (4·f·N_s·A)`, FF = 1.1107 (sine) when unknown.
 *
 * Lead on the search coil: `P = W·N_e/N_s − V²/R_b`; on the exciting terminals: `P = W − I²·R − V²/R_b`.
 * `S = V·N_e/N_s·I`, `H = N_e·I/l`, `cos φ = P/S`, per kilogram: divided by the back-iron mass m. V is the rms value.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | N_e, N_s | `reading.excitingTurns`, `.searchTurns` | – | whole, 1 or more |
 * | V_s | `reading.searchVoltsV` | V | more than 0 |
 * | FF | `reading.formFactor` | – | 1 to 2, or absent |
 * | I | `reading.excitingA` | A | more than 0 |
 * | W | `reading.wattsW` | W | more than 0 |
 * | R | `reading.cableResistanceOhm` | Ω | 0 or more; needed with the lead on the exciting terminals |
 * | R_b | `reading.searchBurdenOhm` | Ω | more than 0, or absent (negligible) |
 * | f | `reading.frequencyHz` | Hz | 10 to 1000 |
 * | A, l, m | `derived` | m², m, kg | from `deriveGeometry` |
 *
 * @returns SI values; `formFactorAssumedSine` says when a sine was taken for granted
 * @throws OutOfRangeError for a reading that cannot be, or when cable and instruments would take more than the watts read
 *
 * Source: machine text books; IEC 60404-2 uses the same constant and the same search-coil arrangement. Standing: from memory.
 * @example
 * const core = deriveGeometry({ kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 })
 * const reading = { excitingTurns: 24, searchTurns: 4, searchVoltsV: 20.99, voltmeter: 'average', excitingA: 25.1, wattsW: 102.1, wattmeterLead: 'search', frequencyHz: 50 }
 * reduceReading(reading, core).fluxDensityT
 * // → 1.3177
 * reduceReading(reading, core).wattsPerKg
 * // → 2.949
 */
export function reduceReading(reading: RingReading, derived: Pick<DerivedGeometry, 'areaM2' | 'meanPathM' | 'massKg'>): ReducedReading {
  const [problem] = readingProblems(reading);
  if (problem) throw new OutOfRangeError(problem.field, problem.message);
  for (const field of ['areaM2', 'meanPathM', 'massKg'] as const) {
    if (!positive(derived[field])) throw new OutOfRangeError(field, 'The core has no iron. Check its size.');
  }
  const { excitingTurns, searchTurns, searchVoltsV, excitingA, wattsW, frequencyHz } = reading;
  const turnsRatio = excitingTurns / searchTurns;
  const trueRms = reading.voltmeter === 'true-rms';
  const formFactor = reading.formFactor ?? SINE_FORM_FACTOR;
  const meanVolts = searchVoltsV / (trueRms ? formFactor : SINE_FORM_FACTOR);
  const rmsVolts = trueRms ? searchVoltsV : meanVolts * formFactor;

  const burdenW = reading.searchBurdenOhm === undefined ? 0 : rmsVolts ** 2 / reading.searchBurdenOhm;
  const onExciting = reading.wattmeterLead === 'exciting';
  const cableLossW = onExciting ? excitingA ** 2 * (reading.cableResistanceOhm ?? 0) : undefined;
  const coreWatts = (onExciting ? wattsW - (cableLossW ?? 0) : wattsW * turnsRatio) - burdenW;
  if (!(coreWatts > 0)) {
    throw new OutOfRangeError('wattsW', 'Cable and instruments take more than the watts that were read. Check watts, current and resistances.');
  }
  const excitingVoltsV = rmsVolts * turnsRatio;
  const apparentVA = excitingVoltsV * excitingA;
  return {
    fluxDensityT: meanVolts / (4 * frequencyHz * searchTurns * derived.areaM2),
    coreWatts,
    wattsPerKg: coreWatts / derived.massKg,
    apparentVA,
    vaPerKg: apparentVA / derived.massKg,
    fieldRmsAPerM: (excitingTurns * excitingA) / derived.meanPathM,
    powerFactor: coreWatts / apparentVA,
    voltsPerTurn: searchVoltsV / searchTurns,
    excitingVoltsV,
    ...(cableLossW === undefined ? {} : { cableLossW }),
    formFactorAssumedSine: trueRms && reading.formFactor === undefined,
  };
}

/**
 * Volts per turn for a wanted flux.
 *
 * `V/N = 4.44288·f·B·A`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B | `fluxDensityT` | T | more than 0 |
 * | f | `frequencyHz` | Hz | more than 0 |
 * | A | `areaM2` | m² | more than 0 |
 *
 * @returns V rms of a sine
 * @throws OutOfRangeError outside those ranges
 *
 * Source: machine text books. Standing: from memory.
 * @example
 * voltsPerTurnFor(1.3175, 60, 9.31e-3)
 * // → 3.2698
 */
export function voltsPerTurnFor(fluxDensityT: number, frequencyHz: number, areaM2: number): number {
  for (const [field, value] of Object.entries({ fluxDensityT, frequencyHz, areaM2 })) {
    if (!positive(value)) throw new OutOfRangeError(field, `${field} must be more than 0.`);
  }
  return Math.PI * Math.SQRT2 * frequencyHz * fluxDensityT * areaM2;
}

/**
 * A loss measured at one flux, referred to another.
 *
 * `p₂ = p₁·(B₂/B₁)^n`, n = 2.0 ± 0.3
 *
 * The exponent is good for a few percent of flux only: never correct by more than 5 %. Whether a correction is small
 * enough to be valid is for the caller to decide; the figure is given all the same, because it is what is shown.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | p₁ | `wattsPerKg` | W/kg | 0 or more |
 * | B₁, B₂ | `fromT`, `toT` | T | more than 0 |
 * | n | `exponent` | – | 1 to 4 |
 *
 * @returns W/kg at B₂
 * @throws OutOfRangeError outside those ranges
 *
 * Source: losses of open datasets and of real stator rings, n 1.9 to 2.6 between 1.0 and 1.5 T. Standing: computed.
 * @example
 * referLoss(2.949, 1.3177, 1.32)
 * // → 2.959
 */
export function referLoss(wattsPerKg: number, fromT: number, toT: number, exponent = 2): number {
  if (!(finite(wattsPerKg) && wattsPerKg >= 0)) throw new OutOfRangeError('wattsPerKg', 'The loss must be 0 or more.');
  if (!positive(fromT)) throw new OutOfRangeError('fromT', 'The measured flux must be more than 0.');
  if (!positive(toT)) throw new OutOfRangeError('toT', 'The flux to refer to must be more than 0.');
  if (!(finite(exponent) && exponent >= 1 && exponent <= 4)) throw new OutOfRangeError('exponent', 'The exponent lies between 1 and 4.');
  return wattsPerKg * (toT / fromT) ** exponent;
}
