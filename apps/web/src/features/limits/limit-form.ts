import type { UnitSystem } from '@libs/quantities';
import { sourcesToLookAt } from '@shared/limit-differences';
import { outOfOrder } from '@shared/limit-order';
import { LIMIT_ROWS, RULE_PATH, type LimitRow } from '@shared/limit-rows';
import { at, ruleOf, sourceOf, valueOf, type LimitSourceText } from '@shared/limit-values';
import { publishLimitsSchema, STANDINGS, type LimitsVersionView, type PublishLimits } from '@shared/limits';
import { problemsOf } from '../../lib/form-problems.js';
import { FormReader, typedFrom, untyped, type FormProblem, type Typed } from '../../lib/typed.js';

/** The limits as they are typed, at the paths of the contract, so that what the server finds lands on the same field. */
export interface LimitForm {
  /** the version it was filled from: a draft of last week knows that it is one */
  baseVersion: number;
  note: string;
  set: Record<string, unknown>;
  /** by source path without dots: the old source still stands for the new figure */
  confirmed: Record<string, boolean>;
}

const SOURCE_PATHS = [...new Set(LIMIT_ROWS.flatMap((row) => (row.sourcePath === null ? [] : [row.sourcePath])))];
const rowUnder = (sourcePath: string): LimitRow => LIMIT_ROWS.find((row) => row.sourcePath === sourcePath)!;
export const confirmedKey = (sourcePath: string): string => sourcePath.replaceAll('.', '_');

function put(into: Record<string, unknown>, path: string, value: unknown): void {
  const keys = path.split('.');
  const last = keys.pop()!;
  let holder = into;
  for (const key of keys) holder = (holder[key] ??= {}) as Record<string, unknown>;
  holder[last] = value;
}

/** What one limit's field is filled with. */
const typedOf = (set: unknown, row: LimitRow, system: UnitSystem): Typed => {
  const value = valueOf(set, row);
  return value === undefined ? untyped(system) : typedFrom(value / row.perShown, row.kind, system);
};
const sourceAt = (set: unknown, path: string): LimitSourceText => sourceOf(set, rowUnder(path)) ?? { source: '', standing: 'P' };

export function limitFormOf({ version, set }: Pick<LimitsVersionView, 'version' | 'set'>, system: UnitSystem): LimitForm {
  const filled: Record<string, unknown> = {};
  for (const row of LIMIT_ROWS) put(filled, row.valuePath, typedOf(set, row, system));
  for (const path of SOURCE_PATHS) {
    const { source, standing } = sourceAt(set, path);
    put(filled, `${path}.source`, source);
    // a version of earlier days may describe its standing in words: then it claims no standard until somebody says so
    put(filled, `${path}.standing`, (STANDINGS as readonly string[]).includes(standing) ? standing : 'P');
  }
  put(filled, RULE_PATH, ruleOf(set));
  return { baseVersion: version, note: '', set: filled, confirmed: {} };
}

/** A figure as it is kept: what was not touched stays to the last digit. */
function keptValue(row: LimitRow, si: number, base: unknown): number {
  const value = si * row.perShown;
  const before = valueOf(base, row);
  return before !== undefined && Math.abs(value - before) <= 1e-12 * Math.abs(before) ? before : value;
}

/** The set as far as it can be read; a figure that cannot is left out and named. */
export function readSet(form: LimitForm, base: unknown, reader = new FormReader()): Record<string, unknown> {
  const set: Record<string, unknown> = {};
  for (const row of LIMIT_ROWS) {
    const si = reader.need(`set.${row.valuePath}`, at(form.set, row.valuePath) as Typed | undefined, row.kind, 'A figure is needed.');
    if (!Number.isNaN(si)) put(set, row.valuePath, keptValue(row, si, base));
    if (row.group === 'machine') put(set, `machine.${row.key}.unit`, row.unit);
  }
  for (const path of SOURCE_PATHS) {
    put(set, `${path}.source`, String(at(form.set, `${path}.source`) ?? '').trim());
    put(set, `${path}.standing`, at(form.set, `${path}.standing`));
  }
  put(set, RULE_PATH, at(form.set, RULE_PATH));
  return set;
}

/** How far down the page a field stands: the first thing that is wrong is the one the cursor goes to. */
function placeOf(path: string): number {
  const place = LIMIT_ROWS.findIndex((row) => path === `set.${row.valuePath}` || (row.sourcePath !== null && path.startsWith(`set.${row.sourcePath}.`)));
  return place === -1 ? LIMIT_ROWS.length : place;
}

export interface ReadLimits {
  readonly input: PublishLimits | null;
  readonly problems: readonly FormProblem[];
}

/** What will be published, and what stands in its way, each at its field. */
export function readLimits(form: LimitForm, base: LimitsVersionView, words: { readonly lookAtSource: string }): ReadLimits {
  const reader = new FormReader();
  const set = readSet(form, base.set, reader);
  const confirmedSources = SOURCE_PATHS.filter((path) => form.confirmed[confirmedKey(path)] === true);
  const parsed = publishLimitsSchema.safeParse({ baseVersion: base.version, note: form.note, set, confirmedSources });
  const open = sourcesToLookAt(base.set, set, confirmedSources).map((path) => ({ path: `set.${path}.source`, message: words.lookAtSource }));
  // the contract looks at the order only when all is there; a person wants to hear everything at once
  const order = outOfOrder((path) => at(set, path)).map(({ path, message }) => ({ path: `set.${path}`, message }));
  const seen = new Set<string>();
  const found = [...reader.problems, ...(parsed.success ? [] : problemsOf(parsed.error)), ...order, ...open].filter(({ path }) => !seen.has(path) && seen.add(path));
  const problems = found.sort((a, b) => placeOf(a.path) - placeOf(b.path));
  return { input: problems.length === 0 && parsed.success ? parsed.data : null, problems };
}

/** What was changed here, put on top of what somebody else published meanwhile; where both changed a limit, it stays as here. */
export function onTopOf(form: LimitForm, base: LimitsVersionView, theirs: LimitsVersionView, system: UnitSystem): LimitForm {
  const next = limitFormOf(theirs, system);
  const mine = readSet(form, base.set);
  for (const row of LIMIT_ROWS) if (valueOf(mine, row) !== valueOf(base.set, row)) put(next.set, row.valuePath, at(form.set, row.valuePath));
  const before = limitFormOf(base, system).set;
  for (const path of SOURCE_PATHS) {
    for (const part of ['source', 'standing']) {
      const typed = at(form.set, `${path}.${part}`);
      if (typed !== at(before, `${path}.${part}`)) put(next.set, `${path}.${part}`, typed);
    }
  }
  if (at(form.set, RULE_PATH) !== ruleOf(base.set)) put(next.set, RULE_PATH, at(form.set, RULE_PATH));
  return { ...next, note: form.note, confirmed: form.confirmed };
}
