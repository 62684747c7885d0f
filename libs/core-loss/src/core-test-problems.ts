import { OutOfRangeError } from '@libs/quantities';
import { deriveGeometry, geometryProblems } from './core-geometry.js';
import type { CoreTemperatures, CoreTestInput, CoreTestProblem } from './core-test.js';
import { SATURATION_T, readingProblems, reduceReading } from './ring-reading.js';

type Say = (path: string, code: string, message: string) => void;

const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);

function temperatureProblems(t: Partial<CoreTemperatures>, slots: number, say: Say): void {
  const reading = (field: 'ambientC' | 'startC' | 'meanC' | 'coolestC' | 'hottestC', words: string, most: number) => {
    const value = t[field];
    if (!(finite(value) && value >= -40 && value <= most)) say(`temperatures.${field}`, 'temperature', `Read ${words}: −40 to ${most} °C.`);
  };
  reading('ambientC', 'the ambient temperature', 70);
  reading('startC', 'the core at the start', 200);
  if (t.meanC !== undefined) reading('meanC', 'the mean of the core', 300);
  if (t.coolestC !== undefined) reading('coolestC', 'the coolest place of the core', 300);
  if (t.hottestC !== undefined) reading('hottestC', 'the hottest place of the core', 600);
  if (!(finite(t.minutes) && t.minutes >= 0 && t.minutes <= 600)) say('temperatures.minutes', 'minutes', 'Note the minutes at full flux: 0 to 600.');
  const { coolestC, meanC, hottestC, hottestSlot } = t;
  if (finite(coolestC) && finite(meanC) && coolestC > meanC) say('temperatures.coolestC', 'order', 'The coolest place cannot be warmer than the mean.');
  if (finite(meanC) && finite(hottestC) && hottestC < meanC) say('temperatures.hottestC', 'order', 'The hottest place cannot be cooler than the mean.');
  if (finite(coolestC) && finite(hottestC) && hottestC < coolestC && meanC === undefined) {
    say('temperatures.hottestC', 'order', 'The hottest place cannot be cooler than the coolest.');
  }
  if (hottestSlot !== undefined && Number.isInteger(slots) && !(Number.isInteger(hottestSlot) && hottestSlot >= 1 && hottestSlot <= slots)) {
    say('temperatures.hottestSlot', 'slot', `Number the slot from 1 to ${slots}.`);
  }
}

const STATOR_PATHS = ['bore-and-outside', 'over-frame', 'under-ribs'];
const ARMATURE_PATHS = ['bore-and-outside', 'through-spider', 'through-shaft', 'through-vents'];

function setupProblems(input: CoreTestInput, say: Say): void {
  const { frame, cablePath, geometry } = input;
  if (frame.state === 'in-frame' && frame.material === 'none') say('frame.material', 'frame-material', 'The core is in its frame: say what the frame is made of.');
  if (frame.state === 'bare' && cablePath === 'over-frame') say('cablePath', 'cable-path', 'A bare core has no frame for the cable to run over.');
  const paths = geometry.kind === 'stator' ? STATOR_PATHS : ARMATURE_PATHS;
  const known = geometry.kind === 'stator' || geometry.kind === 'armature';
  if (known && !paths.includes(cablePath)) {
    say('cablePath', 'cable-path', geometry.kind === 'stator' ? 'A stator has no spider, shaft or vents of its own to run the cable through.' : 'An armature has no frame for the cable to run over.');
  }
  const target = input.target.fluxDensityT;
  if (!(finite(target) && target > 0 && target <= SATURATION_T)) say('target.fluxDensityT', 'target', `Set the target flux: more than 0, at most ${SATURATION_T} T.`);
}

/**
 * Everything that is wrong with a core test's figures, with the path of each and words that say what to do. The form calls it
 * while the technician types, the server before it stores. It never throws. What is possible but breaks a rule of the test
 * (flux off target, core too warm) is not here: `evaluateCoreTest` says it among its reasons.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `input` | SI, °C, min | a whole core test, with any figures |
 *
 * @returns an empty list when `evaluateCoreTest` will accept the input
 *
 * Standing: common practice.
 * @example
 * const first = {
 *   phase: 'before',
 *   geometry: { kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 },
 *   target: { basis: 'standard', fluxDensityT: 1.32 },
 *   frame: { state: 'in-frame', material: 'cast-iron' },
 *   cablePath: 'over-frame',
 *   massBasis: 'back-iron',
 *   reading: { excitingTurns: 24, searchTurns: 4, searchVoltsV: 209.9, voltmeter: 'average', excitingA: 25.1, wattsW: 102.1, wattmeterLead: 'search', frequencyHz: 50 },
 *   temperatures: { ambientC: 21, startC: 21, meanC: 26.9, hottestC: 30, minutes: 20 },
 *   instruments: { wattmeterId: 'w-1', clampMeter: false },
 *   checks: { rotorOut: true, leadsOpen: true, parallelsOpened: true, onePointEarthed: true, throughBoltsMeasured: true, boreClear: true, barrierUp: true },
 * }
 * coreTestProblems(first).map((p) => [p.path, p.code])
 * // → [['reading.searchVoltsV', 'saturation']]
 */
export function coreTestProblems(input: CoreTestInput): CoreTestProblem[] {
  const problems: CoreTestProblem[] = [];
  const say: Say = (path, code, message) => void problems.push({ path, code, message });
  const sizes = geometryProblems(input.geometry);
  const readings = readingProblems(input.reading);
  for (const p of sizes) say(`geometry.${p.field}`, p.code, p.message);
  setupProblems(input, say);
  for (const p of readings) say(`reading.${p.field}`, p.code, p.message);
  if (sizes.length === 0 && readings.length === 0) reducedProblems(input, say);
  temperatureProblems(input.temperatures, input.geometry.slots, say);
  return problems;
}

/** Below these a reading is a lead that fell off or a unit that was mistaken: real ring tests run at 0.05 and more. */
const LEAST_FLUX_T = 0.01;
const LEAST_POWER_FACTOR = 0.005;
/** µ₀ times a relative permeability that no lamination steel has (T per A/m). */
const MOST_PERMEABILITY = 4e-7 * Math.PI * 1e5;

function reducedProblems(input: CoreTestInput, say: Say): void {
  try {
    const { fluxDensityT, powerFactor, fieldRmsAPerM } = reduceReading(input.reading, deriveGeometry(input.geometry));
    if (fluxDensityT > SATURATION_T) {
      say('reading.searchVoltsV', 'saturation', `These volts make ${fluxDensityT.toFixed(2)} T, which no steel carries. Check volts, search turns and the size of the core.`);
    }
    if (!(fluxDensityT >= LEAST_FLUX_T)) say('reading.searchVoltsV', 'no-flux', 'These volts make next to no flux. Check the search coil, its turns and the unit.');
    else if (!(fieldRmsAPerM * MOST_PERMEABILITY >= fluxDensityT)) {
      say('reading.excitingA', 'field-low', 'No steel carries this flux on so little current. Check the current, its range and the exciting turns.');
    } else if (!(powerFactor >= LEAST_POWER_FACTOR)) {
      say('reading.wattsW', 'power-factor-low', 'The watts are next to nothing beside volts times amps. Check the leads and the range of the wattmeter, and the current.');
    }
    if (powerFactor > 1) {
      say('reading.wattsW', 'power-factor', 'The watts are more than volts times amps. Check the watts, the current and where the wattmeter lead sat.');
    }
  } catch (error) {
    if (!(error instanceof OutOfRangeError)) throw error;
    say(`reading.${error.field}`, 'reading', error.message);
  }
}
