import type { RecordView } from '@shared/records';
import { Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { momentOf } from '../../../lib/format.js';
import { changesBetween } from '../reading-words.js';
import { t } from '../text.js';
import { nameOfInstruments } from './kept-record.js';
import '../records.css';
import '../../../components/data-table.css';

/** Every revision of a record, youngest first: who, when, why, and what changed. */
export function Revisions({ revisions }: { readonly revisions: readonly RecordView[] }) {
  const system = useUnits();
  return (
    <div className="stack">
      {revisions.map((revision) => {
        const earlier = revisions.find((r) => r.revision === revision.revision - 1);
        const changes = earlier ? changesBetween(earlier.readings, revision.readings, system, nameOfInstruments(revision)) : [];
        return (
          <Panel key={revision.revision} title={t('revision', { n: revision.revision })} actions={isVerdict(revision.verdict) && <VerdictTag verdict={revision.verdict} />}>
            <div className="stack">
              <p>
                {t('revisionBy', { by: revision.by, when: momentOf(revision.at) })}. {earlier ? revision.reason : t('first')}
              </p>
              {earlier && changes.length === 0 && <p className="muted">{t('nothingChanged')}</p>}
              {changes.length > 0 && (
                <table className="lb-table">
                  <thead>
                    <tr>
                      <th scope="col">{t('changed')}</th>
                      <th scope="col">{t('was')}</th>
                      <th scope="col">{t('is')}</th>
                    </tr>
                  </thead>
                  <tbody>
                    {changes.map((c) => (
                      <tr key={c.label}>
                        <th scope="row">{c.label}</th>
                        <td className="num">{c.was}</td>
                        <td className="num">{c.is}</td>
                      </tr>
                    ))}
                  </tbody>
                </table>
              )}
              <p className="muted lb-source">{t('fingerprint', { hash: revision.contentHash.slice(0, 16) })}</p>
            </div>
          </Panel>
        );
      })}
    </div>
  );
}
