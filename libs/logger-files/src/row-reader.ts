import { createChannelTally, type ChannelTally } from './channel-tally.js';
import type { ChannelColumn, Layout } from './layout.js';
import type { ChannelSummary, LoggerSummary } from './logger-summary.js';
import { decimalMarkOf, readNumberCell, type DecimalMark, type NoReading, type ReadCell } from './number-cell.js';
import type { ProblemList } from './problem-list.js';
import type { CheckedOptions } from './reader-options.js';
import { createReorderWindow, type TimedRow } from './reorder-window.js';
import { splitCells } from './row-cells.js';
import { toCelsius, type TemperatureUnit } from './temperature-unit.js';
import { createRowClock } from './time-column.js';

interface Channel extends ChannelColumn {
  readonly unit: TemperatureUnit;
  readonly offsetK: number;
  readonly tally: ChannelTally;
  emptyCells: number;
}
interface End {
  readonly seconds: number;
  readonly clock: string;
}

/** A gap is a step of more than three usual ones. Source: common practice. */
const GAP_STEPS = 3;

/** Reads the rows of a file whose layout is known. Holds no row longer than the reorder window does. */
export function createRowReader(layout: Layout, options: CheckedOptions, problems: ProblemList) {
  const gapAfterS = options.gapAfterS ?? (layout.stepS === null ? null : layout.stepS * GAP_STEPS);
  const rowClock = createRowClock(layout.time);
  const clockCells = layout.time.kind === 'day-and-clock' ? [layout.time.column, layout.time.clockColumn] : [layout.time.column];
  const channels = layout.channels.map((c): Channel => ({
    ...c,
    unit: c.unit ?? options.unit,
    offsetK: options.offsetFor(c.name),
    tally: createChannelTally({ limitsC: options.limitsC, gapAfterS, rateOverS: options.rateOverS, curveWidthS: layout.stepS ?? 1 }),
    emptyCells: 0,
  }));
  let mark: DecimalMark | null = layout.decimalMark;
  let rows = 0;
  let origin: number | undefined;
  let [from, to]: [End | undefined, End | undefined] = [undefined, undefined];

  const clockOf = (row: TimedRow) => clockCells.map((c) => row.cells[c]).join(' ');
  const read = (cell: string): ReadCell | NoReading => {
    if (mark === null) mark = decimalMarkOf([cell]);
    return readNumberCell(cell, mark ?? '.');
  };
  const celsiusIn = (cell: string, channel: Channel, line: number): number | null => {
    const found = read(cell);
    if (found === 'empty') channel.emptyCells += 1;
    else if (found === 'text') problems.add('text-in-number', line, `Line ${line}, ${channel.name}: "${cell.slice(0, 40)}" is no temperature.`, channel.name);
    else if (found === 'other-decimal-mark') problems.add('other-decimal-mark', line, `Line ${line}, ${channel.name}: "${cell.slice(0, 40)}" has another decimal mark than the rest of the file.`, channel.name);
    if (typeof found === 'string') return null;
    const celsius = toCelsius(found.value, found.unit ?? channel.unit);
    if (celsius < options.plausibleC.lowest || celsius > options.plausibleC.highest) {
      problems.add('implausible-reading', line, `Line ${line}, ${channel.name}: ${cell.slice(0, 40)} is no temperature of an oven. Look at the thermocouple.`, channel.name);
      return null;
    }
    return celsius + channel.offsetK;
  };
  const each = (row: TimedRow, take: (tally: ChannelTally, celsius: number) => boolean | void): boolean => {
    let repeated = false;
    for (const channel of channels) {
      const celsius = celsiusIn(row.cells[channel.column] ?? '', channel, row.line);
      if (celsius !== null && take(channel.tally, celsius) === true) repeated = true;
    }
    return repeated;
  };
  const window = createReorderWindow(layout.newestFirst, (row) => {
    const repeated = each(row, (tally, celsius) => tally.step(row.seconds, celsius, row.line, clockOf(row)));
    if (repeated) problems.add('duplicate-time', row.line, `Line ${row.line}: a reading with the time ${clockOf(row)} was there already. The higher one counts.`);
  });

  const place = (row: TimedRow) => {
    if (!from || row.seconds < from.seconds) from = { seconds: row.seconds, clock: clockOf(row) };
    if (!to || row.seconds > to.seconds) to = { seconds: row.seconds, clock: clockOf(row) };
    const arrival = window.push(row);
    if (arrival === 'moved') problems.add('wrong-order', row.line, `Line ${row.line}: ${clockOf(row)} is out of order. It was put in its place.`);
    if (arrival === 'too-late') {
      problems.add('too-late', row.line, `Line ${row.line}: ${clockOf(row)} comes far too late. It counts for the peak only, not for times and rates.`);
      each(row, (tally, celsius) => tally.loose(row.seconds, celsius, row.line, clockOf(row)));
    }
  };
  const summaryOf = (channel: Channel): ChannelSummary => {
    const { name, unit, emptyCells, tally } = channel;
    const start = from?.seconds ?? 0;
    const minute = (seconds: number) => (seconds - start) / 60;
    const found = tally.result(start, to?.seconds ?? 0);
    const head = { name, unit, samples: found.samples, emptyCells };
    if (!found.peak) return { ...head, outcome: 'no-readings', message: `${name} has no reading in this file. Check that the thermocouple was plugged in.` };
    const { celsius, seconds, line, clock } = found.peak;
    return {
      ...head,
      outcome: 'read',
      peakC: celsius,
      peakAt: { minute: minute(seconds), clock, line },
      minutesAbove: found.above.map((a) => ({ limitC: a.limitC, minutes: a.seconds / 60, unknownMinutes: a.unknownS / 60 })),
      rampKPerH: found.rates?.heatingKPerH ?? null,
      coolKPerH: found.rates?.coolingKPerH ?? null,
      gaps: gapAfterS === null ? null : found.gaps.map((g) => ({ fromMinute: minute(g.fromS), toMinute: minute(g.toS) })),
      gapCount: found.gapCount,
      gapMinutes: found.gapS / 60,
      curve: found.curve.map((p) => ({ minute: minute(p.seconds), celsius: p.celsius })),
    };
  };
  return {
    row(text: string, line: number): void {
      if (text.trim() === '') return;
      const cells = splitCells(text, layout.separator);
      const seconds = rowClock.read(cells, mark ?? '.');
      if (seconds === null) {
        problems.add('row-not-read', line, `Line ${line} has no time that can be read: "${text.trim().slice(0, 40)}".`);
        return;
      }
      rows += 1;
      // times near zero keep their fractions of a second; whole days, so that rates fall into the same stretches in any order
      origin ??= Math.floor(seconds / 86_400) * 86_400;
      if (cells.length < layout.needed) problems.add('cells-missing', line, `Line ${line} has ${cells.length} cells instead of ${layout.width}.`);
      if (cells.length > layout.width && cells.slice(layout.width).some((cell) => cell !== '')) problems.add('cells-extra', line, `Line ${line} has ${cells.length} cells instead of ${layout.width}.`);
      place({ seconds: seconds - origin, line, cells });
    },
    end(): LoggerSummary {
      window.end();
      const all = channels.map(summaryOf);
      const found = { problems: problems.kept(), problemCounts: problems.counts() };
      if (rowClock.contradicted()) {
        return { outcome: 'unreadable', code: 'date-order-contradicted', message: 'The dates cannot be told: day first does not fit all rows. Say that they name the month first.', ...found };
      }
      return {
        outcome: 'read',
        channels: all,
        rows,
        startClock: from?.clock ?? '',
        endClock: to?.clock ?? '',
        minutes: ((to?.seconds ?? 0) - (from?.seconds ?? 0)) / 60,
        stepS: layout.stepS,
        separator: layout.separator,
        decimalMark: mark,
        newestFirst: layout.newestFirst,
        ...found,
      };
    },
  };
}
export type RowReader = ReturnType<typeof createRowReader>;
