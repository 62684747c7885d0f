import { judgeUpperLimit } from '@libs/measurement';
import { OutOfRangeError } from '@libs/quantities';
import type { CorePhase, FrameMaterial, FrameState, Reason } from './core-test.js';

/** One core test of a machine's life, as it was kept. */
export interface CoreVisit {
  id: string;
  /** Day of the test, `2026-03-14`. */
  date: string;
  phase: CorePhase;
  /** Referred to `referredToT`. */
  wattsPerKg: number;
  /** Expanded, as a fraction of the W/kg. */
  expandedUncertaintyRel: number;
  referredToT: number;
  frequencyHz: number;
  frame: { state: FrameState; material: FrameMaterial };
  valid: boolean;
}

export interface CoreChange {
  /** 0.12 is +12 %. */
  change: number;
  expandedUncertainty: number;
}

export interface LifePoint {
  visit: CoreVisit;
  /** It can be held against the first test of this life. */
  comparable: boolean;
  sinceFirst?: CoreChange;
  sinceLast?: CoreChange;
  flags: Reason[];
}

export type CoreTrend = 'steady' | 'rose' | 'crept' | 'fell' | 'inconclusive' | 'not-told';

export interface CoreLife {
  points: LifePoint[];
  trend: CoreTrend;
  words: string;
  first?: CoreVisit;
  last?: CoreVisit;
}

export interface LifeLimits {
  /** Over the first test of this life, as for a single job: 0.2. */
  increaseLimit: number;
  /** A larger fall asks whether the first test was right: 0.1. */
  fallAsk: number;
  /** What all tests of one core share (size, mass), as an expanded fraction: it cancels between visits. */
  sharedRel?: number;
}

const TREND_WORDS: Record<CoreTrend, string> = {
  steady: 'The core has kept its loss over the visits on record.',
  rose: 'The core lost more in one step than the limit allows.',
  crept: 'No single visit passed the limit, but together they did: the core has worsened visit by visit.',
  fell: 'The loss is well below that of the first test on record. Check that one: warm core, cable path, currents between parallels.',
  inconclusive: 'The change over the years lies within the uncertainty of its limit.',
  'not-told': 'There are fewer than two tests that can be held against each other.',
};

function checked(visits: readonly CoreVisit[], limits: LifeLimits): void {
  visits.forEach((visit, i) => {
    const positive = (field: 'wattsPerKg' | 'referredToT' | 'frequencyHz') => {
      if (!(Number.isFinite(visit[field]) && visit[field] > 0)) throw new OutOfRangeError(`visits.${i}.${field}`, `${field} must be a number, more than 0.`);
    };
    positive('wattsPerKg');
    positive('referredToT');
    positive('frequencyHz');
    if (!(visit.expandedUncertaintyRel >= 0 && visit.expandedUncertaintyRel < 1)) throw new OutOfRangeError(`visits.${i}.expandedUncertaintyRel`, 'The uncertainty is a fraction from 0 to 1.');
    if (!/^\d{4}-\d{2}-\d{2}$/.test(visit.date)) throw new OutOfRangeError(`visits.${i}.date`, 'The day of a test is written like 2026-03-14.');
  });
  for (const field of ['increaseLimit', 'fallAsk'] as const) {
    if (!(Number.isFinite(limits[field]) && limits[field] > 0)) throw new OutOfRangeError(field, `${field} must be a number, more than 0.`);
  }
  if (!((limits.sharedRel ?? 0) >= 0)) throw new OutOfRangeError('sharedRel', 'The shared part must be 0 or more.');
}

/** Why a test cannot be held against the first: what would change the watts without the core having changed. */
function obstacles(visit: CoreVisit, first: CoreVisit): Reason[] {
  const flags: Reason[] = [];
  const say = (code: string, words: string) => void flags.push({ code, words });
  if (!visit.valid) say('not-valid', 'This test is not valid: it is shown and not compared.');
  if (Math.abs(visit.referredToT / first.referredToT - 1) > 0.005) say('other-flux', `Stated at ${visit.referredToT} T, the first test at ${first.referredToT} T.`);
  if (Math.abs(visit.frequencyHz / first.frequencyHz - 1) > 0.005) say('other-frequency', `Tested at ${visit.frequencyHz} Hz, first at ${first.frequencyHz} Hz.`);
  if (visit.frame.state !== first.frame.state || visit.frame.material !== first.frame.material) say('other-frame', 'Tested in another frame state than the first time; the frame takes flux and watts.');
  return flags;
}

/** Two tests of one core: what they share cancels, the rest counts twice. */
function changeBetween(from: CoreVisit, to: CoreVisit, sharedRel: number): CoreChange {
  const ratio = to.wattsPerKg / from.wattsPerKg;
  const own = (visit: CoreVisit) => Math.max(visit.expandedUncertaintyRel ** 2 - sharedRel ** 2, 0);
  return { change: ratio - 1, expandedUncertainty: ratio * Math.sqrt(own(from) + own(to)) };
}

const verdictOn = ({ change, expandedUncertainty }: CoreChange, limit: number) => judgeUpperLimit(change, expandedUncertainty, limit);
const percent = (fraction: number) => `${fraction >= 0 ? '+' : '−'}${Math.abs(fraction * 100).toFixed(1)} %`;

/**
 * A core's loss over its visits: every test of one machine in order, each held against the first valid one and the one before it, with flags for
 * what cannot be compared, what rose, and what crept: several small rises that pass the limit together though none did alone.
 *
 * `change = p_i/p_1 − 1`, `U = p_i/p_1 · √(U_1² + U_i² − 2·s²)`
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | p | `visits[i].wattsPerKg` | W/kg | more than 0, referred to `referredToT` |
 * | U | `visits[i].expandedUncertaintyRel` | – | 0 to 1, fraction |
 * | s | `limits.sharedRel` | – | 0 or more, not more than U counts |
 * | – | `limits.increaseLimit`, `.fallAsk` | – | more than 0 |
 *
 * Different meters served over the years, so that only size and mass cancel; within one job the comparison of before and after is the sharper one.
 *
 * @returns all tests in order of their day, with flags, and the trend in a word; `not-told` below two comparable tests
 * @throws OutOfRangeError for figures that cannot be
 *
 * Source: verdicts as ISO 14253-1. Standing: common practice.
 * @example
 * const visit = (date, phase, wattsPerKg) => ({ id: date + phase, date, phase, wattsPerKg, expandedUncertaintyRel: 0.02, referredToT: 1.32, frequencyHz: 50, frame: { state: 'bare', material: 'none' }, valid: true })
 * const life = coreLife([visit('2015-05-04', 'before', 3.0), visit('2019-02-11', 'after', 3.45), visit('2026-03-14', 'after', 3.95)], { increaseLimit: 0.2, fallAsk: 0.1 })
 * life.trend
 * // → 'crept'
 * life.points[2].sinceFirst.change
 * // → 0.317
 */
export function coreLife(visits: readonly CoreVisit[], limits: LifeLimits): CoreLife {
  checked(visits, limits);
  const phaseOrder = (v: CoreVisit) => (v.phase === 'before' ? 0 : 1);
  const inOrder = [...visits].sort((a, b) => (a.date < b.date ? -1 : a.date > b.date ? 1 : phaseOrder(a) - phaseOrder(b)));
  const first = inOrder.find((v) => v.valid);
  if (!first) return { points: inOrder.map((visit) => ({ visit, comparable: false, flags: [{ code: 'not-valid', words: 'This test is not valid: it is shown and not compared.' }] })), trend: 'not-told', words: TREND_WORDS['not-told'] };
  const shared = limits.sharedRel ?? 0;
  let previous: CoreVisit | undefined;
  const points = inOrder.map((visit): LifePoint => {
    const flags = obstacles(visit, first);
    if (flags.length > 0) return { visit, comparable: false, flags };
    if (visit === first) {
      previous = visit;
      return { visit, comparable: true, flags: [{ code: 'first', words: 'The first test on record: the others are held against it.' }] };
    }
    const sinceFirst = changeBetween(first, visit, shared);
    const sinceLast = changeBetween(previous ?? first, visit, shared);
    previous = visit;
    return { visit, comparable: true, sinceFirst, sinceLast, flags: changeFlags(sinceFirst, sinceLast, limits) };
  });
  const compared = points.filter((p) => p.comparable);
  const trend = trendOf(compared, limits);
  const last = compared.at(-1)?.visit;
  return { points, trend, words: TREND_WORDS[trend], first, ...(last ? { last } : {}) };
}

function changeFlags(sinceFirst: CoreChange, sinceLast: CoreChange, limits: LifeLimits): Reason[] {
  const flags: Reason[] = [];
  const say = (code: string, words: string) => void flags.push({ code, words });
  const step = verdictOn(sinceLast, limits.increaseLimit);
  const whole = verdictOn(sinceFirst, limits.increaseLimit);
  if (step === 'does-not-conform') say('rose', `${percent(sinceLast.change)} since the test before.`);
  if (step === 'inconclusive') say('rose-perhaps', `${percent(sinceLast.change)} since the test before, within the uncertainty of the limit.`);
  if (whole === 'does-not-conform' && step !== 'does-not-conform') say('crept', `${percent(sinceFirst.change)} since the first test, in small steps.`);
  if (sinceFirst.change + sinceFirst.expandedUncertainty < -limits.fallAsk) say('fell', `${percent(sinceFirst.change)} since the first test: more than burnout explains. Check the set-up of the first.`);
  return flags;
}

function trendOf(compared: readonly LifePoint[], limits: LifeLimits): CoreTrend {
  const last = compared.at(-1);
  if (compared.length < 2 || !last?.sinceFirst) return 'not-told';
  const verdict = verdictOn(last.sinceFirst, limits.increaseLimit);
  if (verdict === 'inconclusive') return 'inconclusive';
  if (verdict === 'does-not-conform') return compared.some((p) => p.flags.some((f) => f.code === 'rose')) ? 'rose' : 'crept';
  return last.flags.some((f) => f.code === 'fell') ? 'fell' : 'steady';
}
