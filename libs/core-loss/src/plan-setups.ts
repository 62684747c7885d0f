import { OutOfRangeError } from '@libs/quantities';
import type { Cable, SetupOption, Supply } from './bay.js';
import { deriveGeometry, type CoreGeometry, type DerivedGeometry } from './core-geometry.js';
import { FIELD_BAND, hRmsEstimate, type CoreSteel } from './field-estimate.js';
import { voltsPerTurnFor } from './ring-reading.js';
import type { Reason } from './core-test.js';

export interface SetupRequest {
  geometry: CoreGeometry;
  targetT: number;
  frequencyHz: number;
  supplies: readonly Supply[];
  cables: readonly Cable[];
  /** The steel of the sheets where it is known; a measured stack of good steel when left out. */
  steel?: CoreSteel;
  /** Turns that already lie in the core: kept when they will do. */
  turnsWound?: number;
  /** Field of this very core from an earlier test: a far better guide than any table. */
  measured?: { fluxDensityT: number; fieldRmsAPerM: number };
  /** The least flux worth testing at when no supply reaches the target. */
  minimumTargetT?: number;
}

/** Head room a set-up should leave: the estimate may be short by this factor. */
const ROOM_ESTIMATED = 1.4;
const ROOM_MEASURED = 1.1;
const MEASURED_BAND = { low: 0.9, high: 1.2 } as const;
/** Below this share of its range a variable supply is hard to set. */
const LEAST_SHARE_OF_RANGE = 0.05;
/** A tap may miss the target by this much; the rest is referred. */
const TAP_TOLERANCE = 0.05;
const MOST_PARALLELS = 4;
/** Cable for one turn over the bare rectangle it must go round, and for the two leads to the supply. */
const TURN_SLACK = 1.2;
const LEADS_M = 4;
const MOST_TURNS = 2000;
/** Volts that a panel meter reads well. */
const LEAST_SEARCH_VOLTS = 8;
const SEARCH_TURNS = [1, 2, 4, 5, 10, 20, 50, 100];

interface Plan {
  request: SetupRequest;
  derived: DerivedGeometry;
  room: number;
  band: { low: number; high: number };
  fieldAt: (fluxT: number) => number;
}

interface Candidate {
  supply: Supply;
  turns: number;
  volts: number;
  fluxT: number;
}

const positive = (value: number, field: string) => {
  if (!(Number.isFinite(value) && value > 0)) throw new OutOfRangeError(field, `${field} must be more than 0.`);
};

function prepare(request: SetupRequest): Plan {
  const derived = deriveGeometry(request.geometry);
  positive(request.frequencyHz, 'frequencyHz');
  const { measured, steel } = request;
  hRmsEstimate(request.targetT, steel); // refuses a target that no estimate covers
  if (measured) positive(measured.fieldRmsAPerM, 'fieldRmsAPerM');
  const scale = measured ? measured.fieldRmsAPerM / hRmsEstimate(measured.fluxDensityT, steel) : 1;
  return {
    request,
    derived,
    room: measured ? ROOM_MEASURED : ROOM_ESTIMATED,
    band: measured ? MEASURED_BAND : FIELD_BAND,
    fieldAt: (fluxT) => hRmsEstimate(fluxT, steel) * scale,
  };
}

/** One turn goes through the bore, along the stack, and back outside: the rectangle round the iron, and slack. */
const turnLengthM = ({ outerDiameterM, innerDiameterM, stackLengthM }: CoreGeometry) =>
  2 * (stackLengthM + (outerDiameterM - innerDiameterM) / 2) * TURN_SLACK;

const cableLengthM = (geometry: CoreGeometry, turns: number, parallels: number) => parallels * (turns * turnLengthM(geometry) + LEADS_M);

/** Fewest parallels first, then the thinnest cable that carries the current and is long enough. */
function chooseCable(plan: Plan, turns: number, amps: number): { cable: Cable; parallels: number } | undefined {
  const byThickness = [...plan.request.cables].sort((a, b) => a.crossSectionM2 - b.crossSectionM2 || b.lengthM - a.lengthM);
  for (let parallels = 1; parallels <= MOST_PARALLELS; parallels += 1) {
    const cable = byThickness.find((c) => amps <= c.maxAmpsA * parallels && cableLengthM(plan.request.geometry, turns, parallels) <= c.lengthM);
    if (cable) return { cable, parallels };
  }
  return undefined;
}

const ampsOf = (plan: Plan, { fluxT, turns }: Candidate) => (plan.fieldAt(fluxT) * plan.derived.meanPathM) / turns;
const possible = (plan: Plan, c: Candidate) => ampsOf(plan, c) <= c.supply.maxAmpsA && chooseCable(plan, c.turns, ampsOf(plan, c)) !== undefined;
const roomy = (plan: Plan, c: Candidate) =>
  ampsOf(plan, c) * plan.room <= c.supply.maxAmpsA && (c.supply.kind === 'taps' || c.volts >= LEAST_SHARE_OF_RANGE * c.supply.maxVoltsV);

/** Whole-turn set-ups of one supply at one flux; a tapped one may miss the flux a little. */
function candidates(plan: Plan, supply: Supply, fluxT: number): Candidate[] {
  const perTurn = voltsPerTurnFor(fluxT, plan.request.frequencyHz, plan.derived.areaM2);
  if (supply.kind === 'taps') {
    return (supply.tapsV ?? []).flatMap((volts) => {
      if (volts > supply.maxVoltsV) return [];
      const exact = volts / perTurn;
      return [Math.floor(exact), Math.ceil(exact)]
        .filter((turns, i, both) => turns >= 1 && both.indexOf(turns) === i)
        .map((turns) => ({ supply, turns, volts, fluxT: (fluxT * exact) / turns }))
        .filter((c) => Math.abs(c.fluxT / fluxT - 1) <= TAP_TOLERANCE && c.fluxT <= 1.6)
        .filter((c) => possible(plan, c));
    });
  }
  const found: Candidate[] = [];
  for (let turns = 1; turns <= Math.min(MOST_TURNS, supply.maxVoltsV / perTurn); turns += 1) {
    const volts = turns * perTurn;
    const candidate = { supply, turns, volts, fluxT };
    if (volts >= supply.minVoltsV && possible(plan, candidate)) found.push(candidate);
  }
  return found;
}

/** The few that are worth choosing between: roomy with fewest turns, sure to carry the worst steel, tightest, most turns. */
function shortlist(plan: Plan, all: Candidate[]): Candidate[] {
  const sure = (c: Candidate) => ampsOf(plan, c) * plan.band.high <= c.supply.maxAmpsA && roomy(plan, c);
  const picks = [
    all.find((c) => c.turns === plan.request.turnsWound),
    all.find((c) => roomy(plan, c)),
    all.find(sure),
    all[0],
    all.at(-1),
  ];
  return picks.filter((c): c is Candidate => c !== undefined).filter((c, i, list) => list.indexOf(c) === i);
}

const number = (value: number) => (value >= 100 ? value.toFixed(0) : value >= 10 ? value.toFixed(1) : value.toFixed(2));

function problemsOf(plan: Plan, c: Candidate, amps: number, parallels: number): string[] {
  const problems: string[] = [];
  const { supply } = c;
  const target = plan.request.targetT;
  if (c.fluxT < target * (1 - TAP_TOLERANCE)) {
    problems.push(`No supply reaches ${target} T. Test at ${c.fluxT.toFixed(2)} T, the same both times, and do not judge absolute W/kg.`);
  } else if (Math.abs(c.fluxT / target - 1) > 0.005) {
    problems.push(`Whole turns on this tap give ${c.fluxT.toFixed(3)} T instead of ${target} T. Take the same step both times.`);
  }
  const worst = amps * plan.band.high;
  if (worst > supply.maxAmpsA) {
    problems.push(`Should the steel take ${plan.band.high} times the estimate, ${number(worst)} A would flow; ${supply.name} gives ${number(supply.maxAmpsA)} A. Look at the current in the trial, and add turns if it is high.`);
  }
  if (supply.kind === 'variable' && c.volts < LEAST_SHARE_OF_RANGE * supply.maxVoltsV) {
    problems.push(`${number(c.volts)} V is the very beginning of ${supply.name}: hard to set. More turns make it easier.`);
  }
  if (supply.kind === 'taps') problems.push('Switching on straight to a tap draws an inrush of several times the current. Begin on the lowest tap.');
  if (parallels > 1) problems.push(`${parallels} cables in parallel: cut them to one length and lay them side by side.`);
  return problems;
}

function reasonFor(plan: Plan, c: Candidate, amps: number, leastRoomy: boolean): string {
  const of = `${number(amps)} A of ${number(c.supply.maxAmpsA)} A`;
  const start = `${c.turns} turns on ${c.supply.name}: ${number(c.volts)} V and about ${of}.`;
  if (c.turns === plan.request.turnsWound && possible(plan, c)) return `${start} These turns are wound already.`;
  if (leastRoomy) return `${start} The fewest turns that leave room for ${plan.room} times the estimated current.`;
  if (!roomy(plan, c)) return `${start} Fewer turns to pull, but little room if the estimate is short.`;
  if (amps * plan.band.high <= c.supply.maxAmpsA && (amps * plan.band.high * c.turns) / (c.turns - 1) > c.supply.maxAmpsA) {
    return `${start} Room even for ${plan.band.high} times the estimated current, for a little more cable.`;
  }
  return `${start} More turns than needed: more cable, less current.`;
}

function toOption(plan: Plan, c: Candidate, leastRoomy: boolean): SetupOption {
  const { request } = plan;
  const amps = ampsOf(plan, c);
  const chosen = chooseCable(plan, c.turns, amps);
  if (!chosen) throw new OutOfRangeError('cables', 'No cable carries this set-up.');
  const voltsPerTurn = c.volts / c.turns;
  const searchTurns = SEARCH_TURNS.find((n) => n * voltsPerTurn >= LEAST_SEARCH_VOLTS) ?? SEARCH_TURNS[SEARCH_TURNS.length - 1]!;
  const share = c.fluxT / request.targetT;
  const reachesTarget = share >= 1 - TAP_TOLERANCE;
  const score =
    (reachesTarget ? 4000 : 2000 * share) +
    (roomy(plan, c) ? 2000 : 0) +
    (c.turns === request.turnsWound ? 1000 : 0) -
    (reachesTarget ? 2000 * Math.abs(share - 1) : 0) -
    Math.min(c.turns, MOST_TURNS) * 0.4 -
    (chosen.parallels - 1) * 20;
  return {
    supplyId: c.supply.id,
    turns: c.turns,
    volts: c.volts,
    amps,
    ampsLow: amps * plan.band.low,
    ampsHigh: amps * plan.band.high,
    cableId: chosen.cable.id,
    parallelCables: chosen.parallels,
    cableLengthNeededM: cableLengthM(request.geometry, c.turns, chosen.parallels),
    kva: (c.volts * amps) / 1000,
    fluxReachedT: c.fluxT,
    reachesTarget,
    voltsPerTurn,
    trialVolts: c.volts / 3,
    searchTurns,
    searchVolts: searchTurns * voltsPerTurn,
    problems: problemsOf(plan, c, amps, chosen.parallels),
    score,
    why: reasonFor(plan, c, amps, leastRoomy),
  };
}

const matching = ({ supplies, frequencyHz }: SetupRequest) => supplies.filter((s) => Math.abs(s.frequencyHz / frequencyHz - 1) < 0.01);

function optionsAt(plan: Plan, supply: Supply, fluxT: number): { options: SetupOption[]; roomy: boolean } {
  const all = candidates(plan, supply, fluxT).sort((a, b) => a.turns - b.turns);
  const least = all.find((c) => roomy(plan, c));
  return { options: shortlist(plan, all).map((c) => toOption(plan, c, c === least)), roomy: least !== undefined };
}

/** Round fluxes below the target, highest first: the one that is taken must be easy to set the same again. */
function lowerTargets(targetT: number, leastT: number): number[] {
  const steps: number[] = [];
  for (let n = Math.ceil(targetT * 20) - 1; n / 20 >= leastT - 1e-9; n -= 1) steps.push(n / 20);
  return steps;
}

/**
 * Ways to set a ring test up with what the bay has, best first: turns, volts, current, cable and search coil.
 *
 * `V/N = 4.44288·f·B·A`, `I = H_rms(B)·l/N`, cable `N·2·(L + (D_o − D_i)/2)·1.2 + 4 m`
 *
 * Best is what reaches the target with room in amps (1.4 times the estimate, 1.1 when the core's field is known) with the
 * fewest turns to pull; turns that are wound already come first when they will do. If no supply reaches the target, the
 * highest round flux that can be reached is offered instead, 0.9 T at least, and said so.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | B | `request.targetT` | T | 0.1 to 1.6 |
 * | f | `request.frequencyHz` | Hz | more than 0; supplies of another frequency are left out |
 * | A, l, L, D | `request.geometry` | m | as `deriveGeometry` |
 * | – | `request.supplies`, `request.cables` | V, A, m | the bay's |
 * | – | `request.measured` | T, A/m | field of this core in an earlier test, if any |
 *
 * @returns options sorted by `score`; an empty list when nothing in the bay will do, and `setupObstacles` says why
 * @throws OutOfRangeError when the size is wrong, or the target outside what can be estimated
 *
 * Source: machine text books for volts and ampere-turns; field as `hRmsEstimate`; room, slack and order are common practice.
 * Standing: computed from an estimate that holds within 0.7 to 2 times.
 * @example
 * const bay = {
 *   supplies: [{ id: 's1', name: 'S1', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50, kind: 'variable' }],
 *   cables: [{ id: 'c10', name: '10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 }],
 * }
 * const geometry = { kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 }
 * const [best] = planSetups({ geometry, targetT: 1.32, frequencyHz: 50, ...bay })
 * best.turns
 * // → 19
 * best.volts
 * // → 99.9
 * best.why
 * // → '19 turns on S1: 99.9 V and about 28.5 A of 40.0 A. The fewest turns that leave room for 1.4 times the estimated current.'
 */
export function planSetups(request: SetupRequest): SetupOption[] {
  const plan = prepare(request);
  const byScore = (a: SetupOption, b: SetupOption) => b.score - a.score || a.turns - b.turns || (a.supplyId < b.supplyId ? -1 : 1);
  const supplies = matching(request);
  const full = supplies.flatMap((supply) => optionsAt(plan, supply, request.targetT).options);
  if (full.length > 0) return full.sort(byScore);
  return supplies
    .flatMap((supply) => {
      const reached = lowerTargets(request.targetT, request.minimumTargetT ?? 0.9)
        .map((fluxT) => optionsAt(plan, supply, fluxT))
        .filter((at) => at.options.length > 0);
      const withRoom = reached.find((at) => at.roomy);
      const [highest] = reached;
      return [...(withRoom?.options ?? []), ...(highest && highest !== withRoom ? highest.options : [])];
    })
    .sort(byScore);
}

/**
 * Why `planSetups` finds nothing: what the bay lacks, in words that say what to get.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `request` | as `planSetups` | as `planSetups` |
 *
 * @returns an empty list when there is at least one set-up
 * @throws OutOfRangeError as `planSetups`
 *
 * Standing: common practice.
 * @example
 * const bay = {
 *   supplies: [{ id: 's1', name: 'S1', minVoltsV: 0, maxVoltsV: 260, maxAmpsA: 40, frequencyHz: 50, kind: 'variable' }],
 *   cables: [{ id: 'c10', name: '10 mm²', crossSectionM2: 10e-6, lengthM: 35, maxAmpsA: 60 }],
 * }
 * const geometry = { kind: 'stator', outerDiameterM: 0.53, innerDiameterM: 0.34, slotDepthM: 0.044, slots: 72, stackLengthM: 0.37, ducts: 0, ductWidthM: 0, stackingFactor: 0.95, densityKgPerM3: 7700 }
 * setupObstacles({ geometry, targetT: 1.32, frequencyHz: 60, ...bay })
 * // → [{ code: 'no-frequency', words: 'No supply of the bay has 60 Hz.' }]
 */
export function setupObstacles(request: SetupRequest): Reason[] {
  if (planSetups(request).length > 0) return [];
  if (request.supplies.length === 0) return [{ code: 'no-supply', words: 'Enter the supplies of the bay first.' }];
  if (request.cables.length === 0) return [{ code: 'no-cable', words: 'Enter the loop cables of the bay first.' }];
  const supplies = matching(request);
  if (supplies.length === 0) return [{ code: 'no-frequency', words: `No supply of the bay has ${request.frequencyHz} Hz.` }];
  const endless: Cable = { id: '', name: '', crossSectionM2: 1, lengthM: 1e6, maxAmpsA: 1e6 };
  if (planSetups({ ...request, cables: [endless] }).length > 0) {
    return [{ code: 'cable-short', words: 'The cables are too short or too thin for the turns this core needs. Get a longer one, or use cables in parallel.' }];
  }
  return [{ code: 'supply-small', words: `No supply drives this core to ${request.minimumTargetT ?? 0.9} T: volts or amps run out. Waive the test with this reason, or hire a larger supply.` }];
}
