import { ELAPSED_UNIT_UNKNOWN, findTimeColumn, type TimeHints } from './find-time-column.js';
import { readHeaderCell } from './header-cell.js';
import { decimalMarkOf, readNumberCell, type DecimalMark } from './number-cell.js';
import { SEPARATORS, splitCells, type Separator } from './row-cells.js';
import type { TemperatureUnit } from './temperature-unit.js';
import { unitFromText } from './temperature-unit.js';
import { createRowClock, readRowTime, type TimeColumn } from './time-column.js';

export interface HeadLine {
  readonly text: string;
  readonly line: number;
}
export interface LayoutHints extends TimeHints {
  readonly separator?: Separator | undefined;
  readonly decimalMark?: DecimalMark | undefined;
}
export interface ChannelColumn {
  readonly column: number;
  readonly name: string;
  readonly unit: TemperatureUnit | null;
}
export interface Layout {
  readonly separator: Separator;
  /** null while every figure of the first rows is whole */
  readonly decimalMark: DecimalMark | null;
  readonly time: TimeColumn;
  readonly channels: readonly ChannelColumn[];
  /** columns that are no temperatures, by their heading */
  readonly leftOut: readonly string[];
  /** cells in a row that has them all: cells past them are too many */
  readonly width: number;
  /** cells a row must have, so that no channel is missing */
  readonly needed: number;
  readonly firstDataLine: number;
  /** seconds from row to row, the middle one of the first rows; null where they do not show any */
  readonly stepS: number | null;
  readonly newestFirst: boolean;
}
export type NoLayoutCode = 'empty-file' | 'not-text' | 'no-table' | 'elapsed-unit-unknown' | 'decimal-comma-and-separator';
export interface NoLayout {
  readonly code: NoLayoutCode;
  readonly message: string;
}

const WORDS: Record<NoLayoutCode, string> = {
  'empty-file': 'The file is empty.',
  'not-text': 'This is no text file. Export the curve as CSV, in UTF-8.',
  'no-table': 'No rows with a time and a temperature were found. Export the curve as CSV with one row for each reading.',
  'elapsed-unit-unknown': 'The time is counted in numbers, but nothing says in what. Say whether they are seconds, minutes or hours.',
  'decimal-comma-and-separator': 'The comma stands both between cells and inside numbers. Export with semicolons, or with decimal points.',
};
const none = (code: NoLayoutCode): NoLayout => ({ code, message: WORDS[code] });

interface Candidate {
  readonly separator: Separator;
  readonly rows: readonly (readonly string[])[];
  readonly time: TimeColumn;
  /** indexes of rows that have a time and at least one number beside it */
  readonly data: readonly number[];
}

/**
 * How a file is laid out, from its first lines: separator, decimal mark, heading, time, channels.
 *
 * @returns the layout, or why there is none, in words that say what to do
 */
export function findLayout(head: readonly HeadLine[], hints: LayoutHints): Layout | NoLayout {
  if (head.length === 0) return none('empty-file');
  if (head.some(({ text }) => text.includes('\u0000'))) return none('not-text');
  let unitUnknown = false;
  let best: Candidate | undefined;
  for (const separator of hints.separator ? [hints.separator] : SEPARATORS) {
    const rows = head.map(({ text }) => splitCells(text, separator));
    const time = findTimeColumn(rows, hints);
    if (time === ELAPSED_UNIT_UNKNOWN) unitUnknown = true;
    else if (time) {
      const data = dataRows(rows, time);
      if (data.length > (best?.data.length ?? 0)) best = { separator, rows, time, data };
    }
  }
  if (!best) return none(unitUnknown ? 'elapsed-unit-unknown' : 'no-table');
  return laidOut(best, head, hints);
}

const reads = (cell: string | undefined) => cell !== undefined && (['.', ','] as const).some((mark) => typeof readNumberCell(cell, mark) !== 'string');
const timeColumns = (time: TimeColumn) => (time.kind === 'day-and-clock' ? [time.column, time.clockColumn] : [time.column]);

function dataRows(rows: readonly (readonly string[])[], time: TimeColumn): number[] {
  const own = timeColumns(time);
  const clock = createRowClock(time);
  const timed = (row: readonly string[]) => (clock.read(row, '.') ?? clock.read(row, ',')) !== null;
  return rows.flatMap((row, i) => (timed(row) && row.some((cell, c) => !own.includes(c) && reads(cell)) ? [i] : []));
}

function laidOut({ separator, rows, time, data }: Candidate, head: readonly HeadLine[], hints: LayoutHints): Layout | NoLayout {
  const own = timeColumns(time);
  const first = firstRow(rows, time, data[0]!);
  const table = data.map((i) => rows[i]!);
  const width = usualWidth(table);
  const heading = headingOf(rows.slice(0, first), own, width);
  if (separator === ',' && heading && table.every((row) => row.length - own.length === 2 * (heading.names.length - own.length))) return none('decimal-comma-and-separator');
  const { channels, leftOut } = columnsOf(heading, table, own, width);
  if (channels.length === 0) return none('no-table');
  const shown = table.flatMap((row) => [...channels.map((c) => row[c.column] ?? ''), ...(time.kind === 'elapsed' ? [row[time.column] ?? ''] : [])]);
  const decimalMark = hints.decimalMark ?? decimalMarkOf(shown);
  const clock = createRowClock(time);
  const times = table.map((row) => clock.read(row, decimalMark ?? '.')).filter((t) => t !== null);
  const needed = Math.max(...own, ...channels.map((c) => c.column)) + 1;
  return { separator, decimalMark, time, channels, leftOut, width: Math.max(width, needed, heading?.names.length ?? 0), needed, firstDataLine: head[first]!.line, ...pace(times) };
}

/** Rows just above the first reading that have a time already belong to the table: its thermocouples were still open. */
function firstRow(rows: readonly (readonly string[])[], time: TimeColumn, firstReading: number): number {
  let first = firstReading;
  while (first > 0 && (readRowTime(rows[first - 1]!, time, '.') ?? readRowTime(rows[first - 1]!, time, ',')) !== null) first -= 1;
  return first;
}

/** The commonest number of cells; one row with a cell too many does not make the others short. */
function usualWidth(table: readonly (readonly string[])[]): number {
  const counts = new Map<number, number>();
  for (const row of table) counts.set(row.length, (counts.get(row.length) ?? 0) + 1);
  return [...counts.entries()].reduce((best, each) => (each[1] > best[1] ? each : best))[0];
}

interface Heading {
  readonly names: readonly string[];
  readonly units: readonly string[];
}

/** The last row before the readings that is as wide as they are; with a row of units below it, or in it. */
function headingOf(before: readonly (readonly string[])[], own: readonly number[], width: number): Heading | undefined {
  const wide = before.filter((row) => row.length > Math.max(...own) && row.length >= 2 && row.length * 2 >= width);
  const last = wide.at(-1);
  if (!last) return undefined;
  const beside = last.filter((cell, c) => !own.includes(c) && cell !== '');
  const isUnits = beside.length > 0 && beside.every((cell) => unitFromText(cell) !== null || /^\W*\w{0,3}\W*$/.test(cell)) && beside.some((cell) => unitFromText(cell) !== null);
  const names = isUnits ? wide.at(-2) : last;
  return { names: names ?? last.map(() => ''), units: isUnits ? last : [] };
}

function columnsOf(heading: Heading | undefined, table: readonly (readonly string[])[], own: readonly number[], width: number): { channels: ChannelColumn[]; leftOut: string[] } {
  const channels: ChannelColumn[] = [];
  const leftOut: string[] = [];
  for (let column = 0; column < Math.max(width, heading?.names.length ?? 0); column += 1) {
    if (own.includes(column)) continue;
    const head = readHeaderCell(heading?.names[column] ?? '', heading?.units[column] ?? '');
    const cells = table.map((row) => row[column] ?? '').filter((cell) => cell !== '');
    const numbers = cells.filter(reads).length;
    const beforeTime = column < own[0]! && head.unit === null;
    const isChannel = !head.otherUnit && !beforeTime && (head.unit !== null || (numbers > 0 && numbers * 2 >= cells.length));
    if (isChannel) channels.push({ column, name: nameFor(head.name, channels), unit: head.unit });
    else if (!beforeTime && (head.name !== '' || cells.length > 0)) leftOut.push(head.name === '' ? `column ${column + 1}` : head.name);
  }
  return { channels, leftOut };
}

function nameFor(wanted: string, taken: readonly ChannelColumn[]): string {
  const base = wanted === '' ? `Channel ${taken.length + 1}` : wanted;
  const free = (name: string) => !taken.some((c) => c.name === name);
  let name = base;
  for (let n = 2; !free(name); n += 1) name = `${base} (${n})`;
  return name;
}

function pace(times: readonly number[]): { stepS: number | null; newestFirst: boolean } {
  const steps = times.slice(1).map((t, i) => t - times[i]!);
  const newestFirst = steps.filter((s) => s < 0).length > steps.filter((s) => s > 0).length;
  const sorted = [...new Set(times)].sort((a, b) => a - b);
  const between = sorted.slice(1).map((t, i) => t - sorted[i]!).sort((a, b) => a - b);
  return { stepS: between.length < 2 ? null : between[Math.floor((between.length - 1) / 2)]!, newestFirst };
}
