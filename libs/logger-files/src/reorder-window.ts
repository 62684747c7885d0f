/** So many rows are held back, so that a row that comes a little late still finds its place. */
export const ROWS_HELD_BACK = 64;

export interface TimedRow {
  readonly seconds: number;
  readonly line: number;
  readonly cells: readonly string[];
}
export type Arrival = 'in-order' | 'moved' | 'too-late';

export interface ReorderWindow {
  /** `too-late`: rows after it are already released; it is not held */
  push(row: TimedRow): Arrival;
  end(): void;
}

/**
 * Puts rows in order of time within a window of fixed size, and releases them one by one. A file of any length takes the room
 * of `ROWS_HELD_BACK` rows. With `newestFirst` the order is the falling one.
 */
export function createReorderWindow(newestFirst: boolean, release: (row: TimedRow) => void): ReorderWindow {
  const sign = newestFirst ? -1 : 1;
  const held: TimedRow[] = [];
  let released = -Infinity;
  let furthest = -Infinity;
  const letGo = () => {
    const row = held.shift()!;
    released = row.seconds * sign;
    release(row);
  };
  return {
    push(row) {
      const key = row.seconds * sign;
      if (key < released) return 'too-late';
      let at = held.length;
      while (at > 0 && held[at - 1]!.seconds * sign > key) at -= 1;
      held.splice(at, 0, row);
      if (held.length > ROWS_HELD_BACK) letGo();
      if (key < furthest) return 'moved';
      furthest = key;
      return 'in-order';
    },
    end() {
      while (held.length > 0) letGo();
    },
  };
}
