import type { BurnoutLimits } from './limits.js';
import type { ReadingsOf } from './records.js';

type Strip = ReadingsOf<'strip'>;
type Dismantling = ReadingsOf<'dismantling'>;

export interface StripResult {
  readonly limitC: number | null;
  readonly limitReason: string;
  readonly source: string;
  readonly standing: string;
  readonly overC: number | null;
  readonly ovenAllowed: boolean;
}

export interface PartLimit {
  readonly limitC: number;
  /** which of the limits it is, in words */
  readonly reason: string;
}

/** The lowest limit that applies to the part: core plate, frame, and what is still attached. Unknown counts as organic. */
export function partLimit(dismantling: Pick<Dismantling, 'corePlate' | 'frameMaterial'> | undefined, limits: BurnoutLimits): PartLimit {
  const plate = dismantling?.corePlate ?? 'unknown';
  const candidates = [
    plate === 'inorganic'
      ? { limitC: limits.inorganicC, reason: 'inorganic core plate' }
      : { limitC: limits.organicOrUnknownC, reason: plate === 'organic' ? 'organic core plate' : 'core plate unknown, counted as organic' },
    ...(dismantling?.frameMaterial === 'aluminium' ? [{ limitC: limits.aluminiumFrameC, reason: 'aluminium frame' }] : []),
  ];
  return candidates.reduce((lowest, c) => (c.limitC < lowest.limitC ? c : lowest));
}

/** Judges how the winding came out: within the part's limit, over it, or not to be told without a part temperature. */
export function judgeStrip(strip: Strip, dismantling: Dismantling | undefined, limits: BurnoutLimits): { verdict: string; result: StripResult } {
  const { limitC, reason } = partLimit(dismantling, limits);
  const common = { limitC, limitReason: reason, source: limits.source, standing: limits.standing, ovenAllowed: !strip.commutatorOrSlipRingsOn };
  if (strip.partPeakC === null) {
    const cold = strip.method === 'cold-pull' || strip.method === 'water-jet' || strip.method === 'chemical';
    return { verdict: cold ? 'conforms' : 'not-valid', result: { ...common, overC: null } };
  }
  const overC = strip.partPeakC - limitC;
  return { verdict: overC > 0 ? 'does-not-conform' : 'conforms', result: { ...common, overC } };
}

/** What must be right before anything goes into an oven. */
export function burnoutProblems(strip: Strip, dismantling: Dismantling | undefined): { path: string; code: string; message: string }[] {
  if (strip.method !== 'oven-burnout') return [];
  const problems = [];
  if (strip.commutatorOrSlipRingsOn) problems.push({ path: 'commutatorOrSlipRingsOn', code: 'rings-on', message: 'A part with its commutator or slip rings on is not put into an oven. Take them off, or strip another way.' });
  if (!dismantling) problems.push({ path: 'method', code: 'limit-unknown', message: 'Record the dismantling first: core plate and frame set the limit of the load.' });
  if (strip.wiresCountedAtCut === null) problems.push({ path: 'wiresCountedAtCut', code: 'not-counted', message: 'Count the wires at the cut before burnout; afterwards they are gone.' });
  if (!strip.sampleCoilKept) problems.push({ path: 'sampleCoilKept', code: 'no-sample', message: 'Keep a sample coil before burnout.' });
  if (strip.ovenId === null || strip.ovenId === '') problems.push({ path: 'ovenId', code: 'no-oven', message: 'Choose the oven.' });
  return problems;
}
