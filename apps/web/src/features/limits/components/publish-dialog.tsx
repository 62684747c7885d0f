import type { LimitDifference } from '@shared/limit-differences';
import { LIMIT_ROWS } from '@shared/limit-rows';
import { limitWords, standingWords } from '@shared/limit-values';
import type { UnitSystem } from '@libs/quantities';
import { ConfirmDialog } from '../../../components/confirm-dialog.js';
import type { Difference } from '../../../components/notices.js';
import { useUnits } from '../../../components/units.js';
import { sourceTitle } from '../limit-sections.js';
import { t } from '../text.js';
import './limits.css';

interface Line {
  readonly key: string;
  readonly name: string;
  readonly from: string;
  readonly to: string;
}

const sourceWords = (side: LimitDifference['from']) => (side.source === '' ? '–' : `${side.source} (${standingWords(side.standing)})`);

/** What differs, as it is read in the person's units: figures one by one, and each source that was written anew once. */
export function linesOf(differences: readonly LimitDifference[], units: UnitSystem): Line[] {
  const told = new Set<string>();
  return differences.flatMap((d) => {
    const row = LIMIT_ROWS.find((r) => r.valuePath === d.path);
    const words = (side: LimitDifference['from']) => (row && side.value !== null ? limitWords(side.value, row, units) : side.words);
    const lines: Line[] = d.valueChanged ? [{ key: d.path, name: d.name, from: words(d.from), to: words(d.to) }] : [];
    const sourcePath = row?.sourcePath ?? null;
    if (d.sourceChanged && sourcePath !== null && !told.has(sourcePath)) {
      told.add(sourcePath);
      lines.push({ key: sourcePath, name: t('sourceOf', { name: sourceTitle(sourcePath) }), from: sourceWords(d.from), to: sourceWords(d.to) });
    }
    return lines;
  });
}

export const conflictLines = (differences: readonly LimitDifference[], units: UnitSystem): Difference[] => linesOf(differences, units).map(({ name, from, to }) => ({ label: name, theirs: from, yours: to }));

interface PublishDialogProps {
  readonly open: boolean;
  readonly version: number;
  readonly note: string;
  readonly differences: readonly LimitDifference[];
  readonly pending: boolean;
  readonly error: unknown;
  readonly onPublish: () => void;
  readonly onClose: () => void;
}

/** Everything that changes, once more, before it counts. */
export function PublishDialog({ open, version, note, differences, pending, error, onPublish, onClose }: PublishDialogProps) {
  const units = useUnits();
  return (
    <ConfirmDialog open={open} title={t('publishTitle', { version })} confirm={t('publish')} wide pending={pending} error={error} onConfirm={onPublish} onClose={onClose}>
      <p>{t('publishWords')}</p>
      <p>
        <b>{t('note')}:</b> {note}
      </p>
      <div className="lb-publish-list" tabIndex={0} role="region" aria-label={t('publishTitle', { version })}>
        <table className="lb-conflict">
          <thead>
            <tr>
              <th scope="col">{t('limit')}</th>
              <th scope="col">{t('from')}</th>
              <th scope="col">{t('to')}</th>
            </tr>
          </thead>
          <tbody>
            {linesOf(differences, units).map((line) => (
              <tr key={line.key}>
                <th scope="row">{line.name}</th>
                <td>{line.from}</td>
                <td>{line.to}</td>
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </ConfirmDialog>
  );
}
