import { formatQuantity } from '@libs/quantities';
import type { CoreTestReadings } from '@shared/core-tests';
import type { RecordView } from '@shared/records';
import { ConflictNotice, type Difference } from '../../../components/notices.js';
import { useUnits } from '../../../components/units.js';
import { readingsOf } from '../../../lib/job-records.js';
import { BENCH_FIGURES, type BenchFigure } from '../bench-form.js';
import { t } from '../text.js';

type Figures = Record<string, Record<string, number | undefined>>;

/** Two people corrected one test: every figure that differs, side by side. */
export function BenchConflict({ theirs, mine, onTakeTheirs, onKeepMine }: { readonly theirs: RecordView; readonly mine: CoreTestReadings; readonly onTakeTheirs: () => void; readonly onKeepMine: () => void }) {
  const system = useUnits();
  const [a, b] = [readingsOf(theirs, 'core-test-before') as unknown as Figures, mine as unknown as Figures];
  const differences = Object.entries(BENCH_FIGURES).flatMap(([path, kind]): Difference[] => {
    const [part, name] = path.split('.') as [string, string];
    const shown = (si: number | undefined) => (si === undefined || !Number.isFinite(si) ? '–' : formatQuantity(si, kind, system));
    const [theirText, myText] = [shown(a[part]?.[name]), shown(b[part]?.[name])];
    return theirText === myText ? [] : [{ label: t(name === 'fluxDensityT' ? 'target' : (name as FigureName)), theirs: theirText, yours: myText }];
  });
  return <ConflictNotice differences={differences} onTakeTheirs={onTakeTheirs} onKeepMine={onKeepMine} />;
}

type FigureName = BenchFigure extends `${string}.${infer Name}` ? Exclude<Name, 'fluxDensityT'> : never;
