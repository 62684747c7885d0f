/** Round or flat conductor of one size; several sizes may lie in parallel in one turn. */
export interface RoundWire {
  strands: number;
  bareDiameterM: number;
}
export interface FlatWire {
  strands: number;
  widthM: number;
  thicknessM: number;
}
export type Conductor = RoundWire | FlatWire;

export type WindingConnection = 'star' | 'delta' | 'single' | 'dc';

/** A winding as found or as wound: what is needed to copy it and to check it. */
export interface WindingData {
  slots: number;
  poles: number;
  layers: 1 | 2;
  coils: number;
  turnsPerCoil: number;
  /** As the trade counts it: first slot 1, so that 1-13 spans 12 slots. */
  spanTo: number;
  connection: WindingConnection;
  /** Parallel circuits in a phase; in a DC armature the paths between brushes. */
  circuits: number;
  /** All strands of one turn. */
  wires: readonly Conductor[];
  /** How far the coil ends stand out beyond the core, one end. */
  coilExtensionM?: number | null | undefined;
  meanTurnM?: number | null | undefined;
}

/** A figure that cannot be, or must not be: the box it stands in and what to do. */
export interface WindingProblem {
  /** Dotted path into the data, such as `wires.0.bareDiameterM`. */
  path: string;
  code: string;
  message: string;
}

export const finite = (value: unknown): value is number => typeof value === 'number' && Number.isFinite(value);
export const positive = (value: unknown): value is number => finite(value) && value > 0;
const whole = (value: unknown, least: number, most: number): value is number => finite(value) && Number.isInteger(value) && value >= least && value <= most;

/** Looser than any machine: beyond them it is a slip of the pen or of the unit. */
const LONGEST_CONDUCTOR_SIDE_M = 0.03;
const LONGEST_TURN_M = 30;

type Say = (path: string, code: string, message: string) => void;

function wireProblems(wires: unknown, say: Say): void {
  if (!Array.isArray(wires) || wires.length === 0) return say('wires', 'missing', 'Gauge the bare wire and count the strands.');
  (wires as Partial<Record<keyof RoundWire | keyof FlatWire, unknown>>[]).forEach((wire, i) => {
    if (!whole(wire?.strands, 1, 1000)) say(`wires.${i}.strands`, 'whole', 'Count the strands: a whole number, 1 or more.');
    const sides = wire?.bareDiameterM === undefined ? (['widthM', 'thicknessM'] as const) : (['bareDiameterM'] as const);
    for (const side of sides) {
      if (!positive(wire?.[side])) say(`wires.${i}.${side}`, 'not-positive', 'Gauge the bare conductor, film off: more than 0.');
      else if (wire[side] > LONGEST_CONDUCTOR_SIDE_M) say(`wires.${i}.${side}`, 'too-large', 'Check the size of the conductor and its unit: it is over 30 mm.');
    }
  });
}

/** Whether the counts agree with one another, once each of them can be. */
function countProblems(w: WindingData, say: Say): void {
  const span = w.spanTo - 1;
  const slotsPerPole = w.slots / w.poles;
  if (span >= w.slots) say('spanTo', 'span', 'The coil reaches further than the core has slots. Count the span again.');
  else if (w.connection !== 'single' && span >= 2 * slotsPerPole) say('spanTo', 'span', 'The coil spans two poles or more. Count the span, the slots and the poles again.');
  if (w.connection === 'dc' || w.connection === 'single') return;
  const coils = (w.slots * w.layers) / 2;
  if (w.coils !== coils) {
    say('coils', 'coils', `${w.slots} slots in ${w.layers} ${w.layers === 1 ? 'layer' : 'layers'} hold ${coils} coils, one side a slot and layer. Count coils, slots and layers again.`);
  }
  if (w.poles % w.circuits !== 0) say('circuits', 'circuits', `${w.poles} poles cannot be shared out evenly among ${w.circuits} circuits. Trace the connection again.`);
  if (phaseBeltSlots(w.slots, w.poles) === undefined) {
    say('slots', 'unbalanced', 'Three phases of this many poles cannot be wound alike in this many slots. Count slots and poles again.');
  }
}

/**
 * Everything that is wrong with winding data, each with the box it belongs to. It never throws.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `w` | m | anything; a missing or wrong figure is a problem, not an error |
 *
 * @returns an empty list when the functions of this library will accept the winding
 *
 * Standing: common practice.
 * @example
 * windingProblems({ slots: 48, poles: 4, layers: 2, coils: 48, turnsPerCoil: 12, spanTo: 11, connection: 'delta', circuits: 3, wires: [{ strands: 4, bareDiameterM: 0.00106 }] }).map((p) => p.path)
 * // → ['circuits']
 */
export function windingProblems(w: Partial<Record<keyof WindingData, unknown>>): WindingProblem[] {
  const problems: WindingProblem[] = [];
  const say: Say = (path, code, message) => void problems.push({ path, code, message });
  if (!whole(w.slots, 3, 1000)) say('slots', 'whole', 'Count the slots: a whole number, 3 or more.');
  if (!whole(w.poles, 2, 200) || w.poles % 2 !== 0) say('poles', 'even', 'Count the poles: an even number, 2 or more.');
  if (w.layers !== 1 && w.layers !== 2) say('layers', 'layers', 'Say whether one or two coil sides lie in a slot.');
  if (!whole(w.coils, 1, 2000)) say('coils', 'whole', 'Count the coils: a whole number, 1 or more.');
  if (!positive(w.turnsPerCoil) || w.turnsPerCoil > 10_000) say('turnsPerCoil', 'turns', 'Count the turns of a coil: more than 0. Where coils differ, enter their mean.');
  if (!whole(w.spanTo, 2, 1000)) say('spanTo', 'span', 'Count the span from slot 1: 1-13 is 13.');
  if (!['star', 'delta', 'single', 'dc'].includes(w.connection as string)) say('connection', 'connection', 'Say how the winding is connected: star, delta, single-phase or DC.');
  if (!whole(w.circuits, 1, 200)) say('circuits', 'whole', 'Count the parallel circuits: a whole number, 1 or more.');
  wireProblems(w.wires, say);
  for (const field of ['coilExtensionM', 'meanTurnM'] as const) {
    const value = w[field];
    if (value === undefined || value === null) continue;
    if (!positive(value)) say(field, 'not-positive', field === 'meanTurnM' ? 'Measure the mean turn: more than 0. Leave it empty when it was not measured.' : 'Measure how far the coil ends stand out: more than 0. Leave it empty when it was not measured.');
    else if (value > LONGEST_TURN_M) say(field, 'too-large', 'Check this length and its unit: no coil is that long.');
  }
  if (problems.length === 0) countProblems(w as unknown as WindingData, say);
  return problems;
}

const greatestDivisor = (a: number, b: number): number => (b === 0 ? a : greatestDivisor(b, a % b));

/** Slots in the phase belt that the distribution is reckoned over: q where q is whole, else the numerator of q in lowest terms. */
export function phaseBeltSlots(slots: number, poles: number): number | undefined {
  const shared = greatestDivisor(slots, 3 * poles);
  // three phases come out alike only when three does not divide what is left of the denominator
  return ((3 * poles) / shared) % 3 === 0 ? undefined : slots / shared;
}
