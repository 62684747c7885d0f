export type ProblemCode =
  | 'row-not-read'
  | 'line-too-long'
  | 'cells-missing'
  | 'cells-extra'
  | 'text-in-number'
  | 'other-decimal-mark'
  | 'implausible-reading'
  | 'wrong-order'
  | 'too-late'
  | 'duplicate-time'
  | 'newest-first'
  | 'unit-assumed'
  | 'date-order-assumed'
  | 'column-left-out';

export interface Problem {
  readonly code: ProblemCode;
  /** counted from 1 in the file as it is */
  readonly line: number;
  readonly channel?: string;
  readonly message: string;
}

/** Of each kind this many are kept with their line; all are counted. */
export const KEPT_OF_EACH_KIND = 20;

export interface ProblemList {
  add(code: ProblemCode, line: number, message: string, channel?: string): void;
  /** in the order of their lines */
  kept(): Problem[];
  counts(): Partial<Record<ProblemCode, number>>;
}

/** What was wrong in a file, with line numbers; a file that is wrong in every row takes no more room than one with twenty slips. */
export function createProblemList(): ProblemList {
  const list: Problem[] = [];
  const counts = new Map<ProblemCode, number>();
  return {
    add(code, line, message, channel) {
      const count = (counts.get(code) ?? 0) + 1;
      counts.set(code, count);
      if (count <= KEPT_OF_EACH_KIND) list.push({ code, line, message, ...(channel === undefined ? {} : { channel }) });
    },
    kept: () => [...list].sort((a, b) => a.line - b.line),
    counts: () => Object.fromEntries(counts),
  };
}
