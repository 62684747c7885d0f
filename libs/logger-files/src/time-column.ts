import { readNumberCell, type DecimalMark } from './number-cell.js';
import { readClock, readDay, readStamp, type DateOrder } from './time-cell.js';

/** Where a row says when it was written. */
export type TimeColumn =
  | { readonly kind: 'stamp'; readonly column: number; readonly order: DateOrder; readonly orderAssumed: boolean }
  | { readonly kind: 'day-and-clock'; readonly column: number; readonly clockColumn: number; readonly order: DateOrder; readonly orderAssumed: boolean }
  | { readonly kind: 'clock'; readonly column: number }
  | { readonly kind: 'elapsed'; readonly column: number; readonly secondsPerUnit: number };

const DAY_S = 86_400;

/** Seconds of one row, read without looking at its neighbours. */
export function readRowTime(cells: readonly string[], time: TimeColumn, mark: DecimalMark, order?: DateOrder): number | null {
  const cell = cells[time.column] ?? '';
  if (time.kind === 'stamp') return readStamp(cell, order ?? time.order);
  if (time.kind === 'clock') return readClock(cell);
  if (time.kind === 'day-and-clock') {
    const day = readDay(cell, order ?? time.order);
    const clock = readClock(cells[time.clockColumn] ?? '');
    return day === null || clock === null ? null : day * DAY_S + clock;
  }
  const read = readNumberCell(cell, mark);
  return typeof read === 'string' || read.unit !== null ? null : read.value * time.secondsPerUnit;
}

export interface RowClock {
  /** seconds, or null where the row has no time */
  read(cells: readonly string[], mark: DecimalMark): number | null;
  /** the other order of day and month makes more of these dates than the one that was assumed */
  contradicted(): boolean;
}

/**
 * Reads the times of a file row by row. A bare clock that jumps by more than half a day has passed midnight. Where the order
 * of day and month was assumed, each step is held against the other order until one of them is seen to be right.
 */
export function createRowClock(time: TimeColumn): RowClock {
  const other: DateOrder | undefined = time.kind === 'stamp' || time.kind === 'day-and-clock' ? (time.order === 'dmy' ? 'mdy' : 'dmy') : undefined;
  let open = other !== undefined && (time as { orderAssumed: boolean }).orderAssumed;
  let wrong = false;
  let days = 0;
  let last: number | null = null;
  let lastOther: number | null = null;

  const weigh = (cells: readonly string[], mark: DecimalMark, own: number | null) => {
    const theOther = readRowTime(cells, time, mark, other);
    if (own === null && theOther !== null) [open, wrong] = [false, true];
    else if (own !== null && theOther === null) open = false;
    else if (own !== null && theOther !== null && last !== null && lastOther !== null) {
      const [step, otherStep] = [Math.abs(own - last), Math.abs(theOther - lastOther)];
      if (step !== otherStep) [open, wrong] = [false, otherStep < step];
    }
    lastOther = theOther ?? lastOther;
  };
  return {
    read(cells, mark) {
      const own = readRowTime(cells, time, mark);
      if (open) weigh(cells, mark, own);
      if (own === null) return null;
      let seconds = own;
      if (time.kind === 'clock') {
        seconds += days * DAY_S;
        if (last !== null && own < DAY_S && seconds < last - DAY_S / 2) {
          days += 1;
          seconds += DAY_S;
        } else if (last !== null && own < DAY_S && seconds > last + DAY_S / 2) {
          days -= 1;
          seconds -= DAY_S;
        }
      }
      last = seconds;
      return seconds;
    },
    contradicted: () => wrong,
  };
}
