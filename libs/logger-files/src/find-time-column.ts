import { readNumberCell } from './number-cell.js';
import { readClock, readDay, readStamp, type DateOrder } from './time-cell.js';
import { readRowTime, type TimeColumn } from './time-column.js';

export type ElapsedUnit = 's' | 'min' | 'h';
export interface TimeHints {
  readonly dateOrder?: DateOrder | undefined;
  readonly elapsedUnit?: ElapsedUnit | undefined;
}
/** Numbers count the time since the start, but nothing says in what. */
export const ELAPSED_UNIT_UNKNOWN = 'elapsed-unit-unknown';

const SECONDS: Record<ElapsedUnit, number> = { s: 1, min: 60, h: 3600 };
const TIME_WORD = /^(?:run ?|elapsed ?|rel(?:ative|\.)? ?)?(?:time|zeit|temps|tiempo|elapsed|t)?\b[\s_]*[[(,/]?\s*(ms|s|secs?|seconds?|mins?|minutes?|h|hrs?|hours?)?\.?\s*[\])]?$/i;
const anyDay = (cell: string) => readDay(cell, 'dmy') ?? readDay(cell, 'mdy');
const anyStamp = (cell: string) => readStamp(cell, 'dmy') ?? readStamp(cell, 'mdy');

/**
 * Finds the column of times among the first rows of a file: day and clock in one cell, in two cells side by side, a clock
 * alone, or numbers counted since the start, whose unit stands in the heading.
 *
 * @returns undefined where no column is one; `ELAPSED_UNIT_UNKNOWN` where the numbers may be seconds as well as minutes
 */
export function findTimeColumn(rows: readonly (readonly string[])[], hints: TimeHints): TimeColumn | typeof ELAPSED_UNIT_UNKNOWN | undefined {
  const width = Math.max(0, ...rows.map((r) => r.length));
  const columns = [...Array(width).keys()];
  const most = (reads: (cell: string, row: readonly string[], column: number) => boolean): number | undefined => {
    const counts = columns.map((c) => rows.filter((row) => reads(row[c] ?? '', row, c)).length);
    const best = Math.max(0, ...counts);
    return best > 0 ? counts.indexOf(best) : undefined;
  };
  const stamp = most((cell) => anyStamp(cell) !== null);
  if (stamp !== undefined) return ordered(rows, { kind: 'stamp', column: stamp }, hints);
  const day = most((cell, row, c) => anyDay(cell) !== null && readClock(row[c + 1] ?? '') !== null);
  if (day !== undefined) return ordered(rows, { kind: 'day-and-clock', column: day, clockColumn: day + 1 }, hints);
  const clock = most((cell) => readClock(cell) !== null);
  if (clock !== undefined) return { kind: 'clock', column: clock };
  return elapsedColumn(rows, columns, hints);
}

type WithDay = { kind: 'stamp'; column: number } | { kind: 'day-and-clock'; column: number; clockColumn: number };

/** Day or month first? Where the first rows fit both ways, the way in which they lie closer together; else day first, as an assumption. */
function ordered(rows: readonly (readonly string[])[], found: WithDay, { dateOrder }: TimeHints): TimeColumn {
  if (dateOrder !== undefined) return { ...found, order: dateOrder, orderAssumed: false };
  const times = (order: DateOrder) => rows.map((row) => readRowTime(row, { ...found, order, orderAssumed: false }, '.'));
  const [dmy, mdy] = [times('dmy'), times('mdy')];
  if (dmy.every((t, i) => t === mdy[i])) return { ...found, order: 'ymd', orderAssumed: false };
  const readable = (all: readonly (number | null)[]) => all.filter((t) => t !== null).length;
  if (readable(dmy) !== readable(mdy)) return { ...found, order: readable(dmy) > readable(mdy) ? 'dmy' : 'mdy', orderAssumed: false };
  if (rows.some((row) => /^\d{1,2}\.\d{1,2}\.\d{2}/.test(row[found.column] ?? ''))) return { ...found, order: 'dmy', orderAssumed: false };
  const [near, far] = [spread(dmy), spread(mdy)];
  return { ...found, order: far < near ? 'mdy' : 'dmy', orderAssumed: near === far };
}

function spread(times: readonly (number | null)[]): number {
  const known = times.filter((t) => t !== null);
  return known.slice(1).reduce((sum, t, i) => sum + Math.abs(t - known[i]!), 0);
}

function elapsedColumn(rows: readonly (readonly string[])[], columns: readonly number[], { elapsedUnit }: TimeHints): TimeColumn | typeof ELAPSED_UNIT_UNKNOWN | undefined {
  const isNumber = (cell: string | undefined) => cell !== undefined && (['.', ','] as const).some((mark) => typeof readNumberCell(cell, mark) !== 'string');
  const numeric = columns.filter((c) => rows.some((row) => isNumber(row[c]) && row.some((cell, i) => i !== c && isNumber(cell))));
  const headed = numeric
    .map((column) => ({ column, head: rows.map((row) => row[column] ?? '').find((cell) => cell !== '' && !isNumber(cell) && TIME_WORD.test(cell)) }))
    .filter((c) => c.head !== undefined);
  const named = headed.find((c) => /[a-z]{3}|^t\b/i.test(c.head!)) ?? headed[0];
  const unit = named && unitOf(named.head!);
  const column = named?.column ?? numeric[0];
  if (column === undefined) return undefined;
  if (elapsedUnit !== undefined) return { kind: 'elapsed', column, secondsPerUnit: SECONDS[elapsedUnit] };
  return unit === undefined ? ELAPSED_UNIT_UNKNOWN : { kind: 'elapsed', column, secondsPerUnit: unit };
}

function unitOf(head: string): number | undefined {
  const word = TIME_WORD.exec(head)?.[1]?.toLowerCase();
  if (word === undefined) return undefined;
  if (word === 'ms') return 0.001;
  return word.startsWith('s') ? 1 : word.startsWith('m') ? 60 : 3600;
}
