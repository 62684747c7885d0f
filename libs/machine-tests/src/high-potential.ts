import { OutOfRangeError } from '@libs/quantities';
import { DEFAULT_MACHINE_TEST_LIMITS, type MachineTestLimit, type MachineTestLimits, type Standing } from './limits.js';
import { figureWords, percentWords } from './figure-words.js';
import type { HighPotentialReading } from './readings.js';

const positive = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value) && value > 0;

/** Half a horsepower: up to here, and up to 250 V, the test is 1000 V. */
const SMALL_W = 373;
const SMALL_V = 250;
const LOW_VOLTAGE_V = 35;

export type HighPotentialRequest = Pick<HighPotentialReading, 'case' | 'ratedVoltageV' | 'secondaryVoltsV' | 'ratedPowerW' | 'supply'>;

/** The volts to test with, how they came about, and where the rule comes from. */
export interface HighPotentialLevel {
  voltsV: number;
  words: string;
  source: string;
  standing: Standing;
}

/** 2 U + 1000 V and its small brothers, before any share is taken. */
function newWindingLevel(r: HighPotentialRequest, limits: MachineTestLimits): { voltsV: number; words: string; row: MachineTestLimit } {
  const base = limits.highPotentialBaseV;
  if (r.case === 'wound-rotor' || r.case === 'wound-rotor-reversing') {
    if (!positive(r.secondaryVoltsV)) throw new OutOfRangeError('secondaryVoltsV', 'Enter the volts between slip rings at standstill.');
    const times = r.case === 'wound-rotor' ? 2 : 4;
    return { voltsV: base.value + times * r.secondaryVoltsV, words: `${base.value} V + ${times} × ${figureWords(r.secondaryVoltsV)} V`, row: base };
  }
  if (r.ratedVoltageV <= LOW_VOLTAGE_V) {
    return { voltsV: limits.highPotentialLowVoltageV.value, words: `rated ${LOW_VOLTAGE_V} V or less`, row: limits.highPotentialLowVoltageV };
  }
  if (r.ratedPowerW !== null && r.ratedPowerW <= SMALL_W && r.ratedVoltageV <= SMALL_V) {
    return { voltsV: limits.highPotentialSmallV.value, words: `up to ${SMALL_W} W and ${SMALL_V} V`, row: limits.highPotentialSmallV };
  }
  const formula = `2 × ${r.ratedVoltageV} V + ${base.value} V`;
  const voltsV = 2 * r.ratedVoltageV + base.value;
  const floor = limits.highPotentialFloorV;
  return voltsV < floor.value ? { voltsV: floor.value, words: `${formula}, at least ${floor.value} V`, row: floor } : { voltsV, words: formula, row: base };
}

/**
 * Volts of the high-potential test to ground, held for one minute.
 *
 * new winding: `V = 2U + 1000`; up to 0.5 hp and 250 V: 1000; rated 35 V or less: 500;
 * wound rotor: `1000 + 2·U_2`, reversing `1000 + 4·U_2`;
 * second test 80 %, partly rewound 75 %, reconditioned 65 % of the new winding's; DC = 1.7 · AC
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | U | `request.ratedVoltageV` | V | more than 0; of the winding under test |
 * | U_2 | `request.secondaryVoltsV` | V | slip rings at standstill, only for a wound rotor |
 * | P | `request.ratedPowerW` | W | null when unknown: then the full test |
 * | – | `limits` | V, 1 | the shop's |
 *
 * @returns volts, AC rms or DC, with the words for the form
 * @throws OutOfRangeError when the volts are not more than 0
 *
 * Source: ANSI/EASA AR100-2020 Tables 4-4 and 4-5, IEC 60034-1 9.2, NEMA MG 1 3.1. Standing: DC columns read, AC rows and
 * shares from memory.
 * @example
 * highPotentialLevel({ case: 'new-winding', ratedVoltageV: 400, ratedPowerW: 200e3, supply: 'ac' }).voltsV
 * // → 1800
 */
export function highPotentialLevel(request: HighPotentialRequest, limits: MachineTestLimits = DEFAULT_MACHINE_TEST_LIMITS): HighPotentialLevel {
  if (!positive(request.ratedVoltageV)) throw new OutOfRangeError('ratedVoltageV', 'Enter the rated volts of the winding: more than 0.');
  if (request.ratedPowerW !== null && !positive(request.ratedPowerW)) throw new OutOfRangeError('ratedPowerW', 'Enter the rated power, or leave it empty.');
  const { row, ...full } = newWindingLevel(request, limits);
  const share = {
    'new-winding': null,
    'wound-rotor': null,
    'wound-rotor-reversing': null,
    repeat: limits.highPotentialRepeat,
    reconditioned: limits.highPotentialReconditioned,
    'part-rewound': limits.highPotentialPartRewound,
  }[request.case];
  const dc = request.supply === 'dc' ? limits.highPotentialDcFactor : null;
  const words = [share || dc ? `(${full.words})` : full.words, share && `× ${percentWords(share.value)}`, dc && `× ${dc.value} for DC`].filter(Boolean).join(' ');
  const { source, standing } = share ?? row;
  // 2150 × 0.65 is 1397.5 on paper; binary tails stay out of it
  const voltsV = Math.round(full.voltsV * (share?.value ?? 1) * (dc?.value ?? 1) * 1e6) / 1e6;
  return { voltsV, words, source, standing };
}
