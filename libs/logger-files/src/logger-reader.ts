import { findLayout, type HeadLine, type Layout } from './layout.js';
import { createLineSplitter } from './line-splitter.js';
import type { LoggerSummary, LoggerUnreadable, UnreadableCode } from './logger-summary.js';
import { OutOfRangeError } from './out-of-range-error.js';
import { createProblemList, type ProblemList } from './problem-list.js';
import { checkedOptions, type CheckedOptions, type LoggerReaderOptions } from './reader-options.js';
import { createRowReader, type RowReader } from './row-reader.js';

export interface LoggerReader {
  /** the next piece of the file, cut anywhere */
  write(chunk: string): void;
  end(): LoggerSummary;
}

/** So many lines are looked at before the layout is settled. */
const HEAD_LINES = 200;
/** No logger has more; a wider table is something else. */
const MOST_CHANNELS = 64;

/**
 * Reads the temperature record of a burnout as it streams in: peak, time above limits, heating and cooling, gaps, and a curve
 * for drawing, channel by channel. No rows are held: a file of a million rows takes the room of a short one.
 *
 * | symbol | argument | unit | range |
 * |---|---|---|---|
 * | – | `write(chunk)` | text | pieces of the file in order |
 * | – | `options` | – | as `LoggerReaderOptions`; a limit in °C, an offset in K, times in minutes |
 *
 * Between two readings the temperature is taken to run straight, except over a gap: there nothing is counted, and what may
 * have been above a limit stands as unknown minutes.
 *
 * @returns `end()` gives the summary, or `unreadable` with words that say what to do
 * @throws OutOfRangeError when an option cannot be used, when a piece is no text, and for anything written after the end
 *
 * Source: own; separators and quotes after RFC 4180, read loosely. Standing: from memory.
 * @example
 * const reader = createLoggerReader({ limitsC: [345] });
 * reader.write('Time;Core (°C)\n06:00:00;340,0\n06:10:00;35');
 * reader.write('0,0\n06:20:00;350,0\n');
 * reader.end().channels[0].minutesAbove[0].minutes
 * // → 15
 */
export function createLoggerReader(options: LoggerReaderOptions = {}): LoggerReader {
  const settings = checkedOptions(options);
  const problems = createProblemList();
  let head: HeadLine[] | null = [];
  let rows: RowReader | null = null;
  let failure: LoggerUnreadable | null = null;
  let ended = false;

  const settle = () => {
    if (head === null) return;
    const layout = findLayout(head, options);
    if ('code' in layout) failure = unreadable(layout.code, layout.message);
    else if (layout.channels.length > MOST_CHANNELS) failure = unreadable('too-many-channels', `The file has ${layout.channels.length} columns of temperatures; more than ${MOST_CHANNELS} cannot be read.`);
    else {
      noteAssumptions(layout, settings, problems);
      rows = createRowReader(layout, settings, problems);
      for (const { text, line } of head) if (line >= layout.firstDataLine) rows.row(text, line);
    }
    head = null;
  };
  const splitter = createLineSplitter((text, line, cut) => {
    if (cut) problems.add('line-too-long', line, `Line ${line} is too long for a row of readings. It was left out.`);
    else if (head === null) rows?.row(text, line);
    else if (text.trim() !== '') {
      head.push({ text, line });
      if (head.length === HEAD_LINES) settle();
    }
  });
  return {
    write(chunk) {
      if (ended) throw new OutOfRangeError('chunk', 'The file has ended; nothing can be added.');
      if (typeof chunk !== 'string') throw new OutOfRangeError('chunk', 'A piece of the file must be text.');
      if (failure === null) splitter.write(chunk);
    },
    end() {
      if (ended) throw new OutOfRangeError('end', 'The file has ended already.');
      ended = true;
      splitter.end();
      settle();
      if (rows) return (rows as RowReader).end();
      return { ...(failure ?? unreadable('empty-file', 'The file is empty.')), problems: problems.kept(), problemCounts: problems.counts() };
    },
  };
}

const unreadable = (code: UnreadableCode, message: string): LoggerUnreadable => ({ outcome: 'unreadable', code, message, problems: [], problemCounts: {} });

/** What the file did not say and was taken as usual: the reader of the summary must see it. */
function noteAssumptions(layout: Layout, settings: CheckedOptions, problems: ProblemList): void {
  const line = layout.firstDataLine;
  for (const channel of layout.channels) {
    if (channel.unit === null) problems.add('unit-assumed', line, `${channel.name}: the file states no unit; ${settings.unit === 'K' ? 'kelvin' : `°${settings.unit}`} was taken.`, channel.name);
  }
  for (const name of layout.leftOut) problems.add('column-left-out', line, `The column ${name} holds no temperatures and was left out.`, name);
  if ('orderAssumed' in layout.time && layout.time.orderAssumed) problems.add('date-order-assumed', line, 'The dates may name day or month first; day first was taken.');
  if (layout.newestFirst) problems.add('newest-first', line, 'The newest row comes first; the file was read backwards.');
}
