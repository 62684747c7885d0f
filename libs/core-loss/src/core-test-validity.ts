import type { CoreGeometry } from './core-geometry.js';
import type { CoreLimits } from './core-limits.js';
import type { CoreTestInput, CoreTestResult, Reason } from './core-test.js';

const percent = (fraction: number) => `${Math.round(fraction * 1000) / 10} %`;
/** A difference that sits exactly on its tolerance is still inside, whatever binary makes of it. */
export const beyond = (value: number, tolerance: number) => value > tolerance + 1e-9 * Math.max(Math.abs(tolerance), 1);

/** A test whose set-up makes its watts worthless, whatever they are compared with. */
export function validityReasons(input: CoreTestInput, fluxDensityT: number, limits: CoreLimits): Reason[] {
  const reasons: Reason[] = [];
  const say = (code: string, words: string) => void reasons.push({ code, words });
  const target = input.target.fluxDensityT;
  const share = fluxDensityT / target;
  if (beyond(limits.minimumTargetT, target)) {
    say('target-too-low', `A target below ${limits.minimumTargetT} T says too little about the core. Use a larger supply or more flux.`);
  }
  if (beyond(Math.abs(share - 1), limits.fluxTolerance)) {
    const way = share < 1 ? 'Raise' : 'Lower';
    say('flux-off-target', `The flux is ${percent(Math.abs(share - 1))} ${share < 1 ? 'below' : 'above'} its target; ${percent(limits.fluxTolerance)} is allowed. ${way} the volts and read again.`);
  }
  const { rotorOut, leadsOpen, parallelsOpened } = input.checks;
  if (!rotorOut) say('rotor-in', 'A rotor inside takes flux and watts of its own. Take it out, tick it, and test again.');
  if (!leadsOpen) say('leads-closed', 'Currents in closed leads add watts. Open and insulate the leads, tick it, and test again.');
  if (!parallelsOpened) say('parallels-closed', 'Currents between parallels or round a delta add watts. Open them, tick it, and test again; with no winding left, tick it too.');
  return reasons;
}

const SIZES = ['kind', 'outerDiameterM', 'innerDiameterM', 'slotDepthM', 'slots', 'stackLengthM', 'ducts', 'ductWidthM', 'stackingFactor', 'densityKgPerM3'] as const satisfies readonly (keyof CoreGeometry)[];
const sameSize = (a: CoreGeometry[keyof CoreGeometry], b: CoreGeometry[keyof CoreGeometry]) =>
  typeof a === 'number' && typeof b === 'number' ? Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b)) : a === b;

/** The same supply may drift by this much and still be the same frequency. */
const FREQUENCY_DRIFT = 0.005;
/** 85 kilolines and 1.32 T are the same target to the trade. */
const TARGET_SLACK = 0.005;

/** What keeps an after test from being held against its before test. Size, meters and set-up must be the same to cancel. */
export function comparisonReasons(before: CoreTestInput, after: CoreTestInput, valid: { before: boolean; after: boolean }, limits: CoreLimits): Reason[] {
  const reasons: Reason[] = [];
  const say = (code: string, words: string) => void reasons.push({ code, words });

  if (before.phase !== 'before') say('before-phase', 'What it is compared with is not a before test. Choose the before test of this job.');
  if (!valid.before) say('before-not-valid', 'The before test itself is not valid: nothing can be compared with it.');
  if (!valid.after) say('after-not-valid', 'This test itself is not valid. Put right what is named and read again.');
  if (beyond(Math.abs(after.target.fluxDensityT / before.target.fluxDensityT - 1), TARGET_SLACK)) {
    say('target-changed', `The before test was aimed at ${before.target.fluxDensityT} T. Test again at that flux.`);
  }
  if (beyond(Math.abs(after.reading.frequencyHz / before.reading.frequencyHz - 1), FREQUENCY_DRIFT)) {
    say('frequency-changed', `The before test was made at ${before.reading.frequencyHz} Hz. Test again at that frequency.`);
  }
  if (before.frame.state !== after.frame.state || before.frame.material !== after.frame.material) {
    say('frame-changed', `The before test was made with the core ${before.frame.state === 'bare' ? 'bare' : `in its frame (${before.frame.material})`}. The frame takes flux and watts: test again the same way.`);
  }
  if (before.cablePath !== after.cablePath) say('cable-path-changed', 'The cable ran another way in the before test. Lay it the same way and test again.');
  if (beyond(Math.abs(after.temperatures.startC - before.temperatures.startC), limits.startTemperatureToleranceK)) {
    say('start-temperature', `The core started at ${after.temperatures.startC} °C, in the before test at ${before.temperatures.startC} °C; ${limits.startTemperatureToleranceK} K are allowed. Let it cool and test again.`);
  }
  const changed = SIZES.filter((field) => !sameSize(before.geometry[field], after.geometry[field]));
  if (changed.length > 0) say('geometry-changed', 'The size of the core is not the one of the before test. Use the same figures, or give the new stack a before test of its own.');
  if (before.massBasis !== after.massBasis) say('mass-basis-changed', 'The two tests divide by different masses. Use the back iron in both.');

  const a = after.instruments;
  const b = before.instruments;
  if (!a.wattmeterId || !b.wattmeterId) say('wattmeter-not-named', 'Name the wattmeter of both tests: the comparison stands on one and the same meter.');
  else if (a.wattmeterId !== b.wattmeterId) say('wattmeter-changed', 'Another wattmeter served the before test. Test again with the same one.');
  if ((a.wattmeterRange ?? '') !== (b.wattmeterRange ?? '')) say('wattmeter-range-changed', 'The wattmeter stood on another range in the before test. Test again on the same range.');
  if (a.clampMeter !== b.clampMeter) say('clamp-changed', 'A clamp meter was used in one test only. Test again with the same meters.');
  if (before.reading.wattmeterLead !== after.reading.wattmeterLead) {
    say('wattmeter-lead-changed', `The voltage lead of the wattmeter sat on the ${before.reading.wattmeterLead === 'search' ? 'search coil' : 'exciting terminals'} in the before test. Put it there and test again.`);
  }
  return reasons;
}

/** Things worth knowing that make nothing invalid. */
export function setupWarnings(input: CoreTestInput, result: Pick<CoreTestResult, 'innerEdgeFluxT'>, formFactorAssumedSine: boolean): Reason[] {
  const warnings: Reason[] = [];
  const say = (code: string, words: string) => void warnings.push({ code, words });
  const { onePointEarthed, throughBoltsMeasured, boreClear, barrierUp } = input.checks;
  if (!onePointEarthed) say('not-earthed', 'One point of the winding or core was not ticked as earthed.');
  if (!throughBoltsMeasured) say('through-bolts', 'The insulation of the through-bolts was not measured: a bolt that touches is a shorted turn and looks like core loss.');
  if (!boreClear) say('bore-not-clear', 'The bore was not ticked as clear of tools and loose iron.');
  if (!barrierUp) say('no-barrier', 'The barrier was not ticked as up.');
  if (formFactorAssumedSine) say('form-factor-assumed', 'Form factor assumed sine: with a true-rms voltmeter the flux is right only for a sine.');
  const { formFactor } = input.reading;
  if (formFactor !== undefined && Math.abs(formFactor / 1.1107 - 1) > 0.01) {
    say('distorted-wave', 'The form factor is more than 1 % away from a sine: the watts differ from those of a sine at this flux.');
  }
  if (input.instruments.clampMeter) say('clamp-meter', 'A clamp meter was used: its phase error makes the watts uncertain at this power factor.');
  if (!input.instruments.wattmeterId) say('wattmeter-not-named', 'Name the wattmeter: without it this test cannot be compared with another.');
  if (result.innerEdgeFluxT > 1.7) {
    say('inner-edge', `A deep yoke: its inner edge may work at up to ${result.innerEdgeFluxT.toFixed(2)} T, so W/kg reads higher than in a shallow one.`);
  }
  return warnings;
}
