import { LIMIT_ROWS, type LimitRow } from './limit-rows.js';

/** The lower figure, the higher one, and what to say when they have changed places. */
type Pair = readonly [lower: string, higher: string, strictly: boolean];

const AT: readonly Pair[] = [
  ['core.increaseWarn', 'core.increaseLimit', true],
  ['core.hotSpotWarnK', 'core.hotSpotLimitK', true],
  ['core.absoluteWPerKg50', 'core.absoluteWPerKg60', false],
  ['core.minimumTargetT', 'core.referenceFluxT', false],
  ['core.stopMeanC', 'core.stopSpotC', false],
  ['burnout.organicOrUnknownC', 'burnout.inorganicC', false],
  ['burnout.aluminiumFrameC', 'burnout.inorganicC', false],
  ...(
    [
      ['insulationRandomOhm', 'insulationFormOhm'],
      ['unbalanceForm', 'unbalanceRandom'],
      ['highPotentialReconditioned', 'highPotentialRepeat'],
      ['highPotentialLowVoltageV', 'highPotentialSmallV'],
      ['vibrationFreeTo132', 'vibrationFreeTo280'],
      ['vibrationFreeTo280', 'vibrationFreeAbove280'],
      ['vibrationRigidTo132', 'vibrationRigidTo280'],
      ['vibrationRigidTo280', 'vibrationRigidAbove280'],
      ['vibrationRigidTo132', 'vibrationFreeTo132'],
      ['vibrationRigidTo280', 'vibrationFreeTo280'],
      ['vibrationRigidAbove280', 'vibrationFreeAbove280'],
      ['vibrationGradeBFreeTo132', 'vibrationFreeTo132'],
      ['vibrationGradeBFreeTo280', 'vibrationFreeTo280'],
      ['vibrationGradeBFreeAbove280', 'vibrationFreeAbove280'],
      ['vibrationGradeBRigidTo280', 'vibrationRigidTo280'],
      ['vibrationGradeBRigidAbove280', 'vibrationRigidAbove280'],
      ['vibrationNemaRigid', 'vibrationNemaResilient'],
      ['bearingRiseK', 'bearingRiseTwoPoleK'],
    ] as const
  ).map(([lower, higher]): Pair => [`machine.${lower}.value`, `machine.${higher}.value`, false]),
];

const rowAt = (path: string): LimitRow => {
  const row = LIMIT_ROWS.find((r) => r.valuePath === path);
  if (!row) throw new Error(`No limit stands at ${path}.`);
  return row;
};

export interface OutOfOrder {
  readonly path: string;
  readonly message: string;
}

/** Figures that contradict one another, each said at the one that should be lower; one that is missing contradicts none. */
export function outOfOrder(valueAt: (path: string) => unknown): OutOfOrder[] {
  return AT.flatMap(([lower, higher, strictly]) => {
    const [low, high] = [valueAt(lower), valueAt(higher)];
    if (typeof low !== 'number' || typeof high !== 'number') return [];
    if (low < high || (!strictly && low === high)) return [];
    return [{ path: lower, message: `${strictly ? 'Must be below' : 'Not above'}: ${rowAt(higher).name.charAt(0).toLowerCase()}${rowAt(higher).name.slice(1)}.` }];
  });
}

/** Every pair stands for figures there are; a test holds it. */
export const ORDERED_PATHS: readonly string[] = AT.flatMap(([lower, higher]) => [lower, higher]);
