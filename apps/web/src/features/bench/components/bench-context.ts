import type { CoreTestReadings } from '@shared/core-tests';
import { createContext, useContext } from 'react';

interface BenchContext {
  /** what is typed and wrong, by path */
  readonly wrong: ReadonlyMap<string, string>;
  /** what is missing, by path; empty until somebody tried to save */
  readonly missing: ReadonlyMap<string, string>;
  /** the readings of the test before, shown beside each field of the test after */
  readonly before: CoreTestReadings | null;
}

export const BenchLive = createContext<BenchContext>({ wrong: new Map(), missing: new Map(), before: null });
export const useBenchLive = () => useContext(BenchLive);
