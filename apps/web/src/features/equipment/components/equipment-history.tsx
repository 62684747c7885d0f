import type { EquipmentView } from '@shared/equipment';
import { Panel } from '../../../components/panel.js';
import { calendarDay, momentOf } from '../../../lib/format.js';
import { t } from '../text.js';
import './equipment.css';

/** Who changed the lists last, and what records may still name. */
export function EquipmentHistory({ changes, removed }: Pick<EquipmentView, 'changes' | 'removed'>) {
  return (
    <div className={removed.length > 0 ? 'two-columns' : undefined}>
      <Panel title={t('changes')}>
        {changes.length === 0 ? (
          <p className="muted">{t('noChanges')}</p>
        ) : (
          <ul className="lb-change-list">
            {changes.map((c) => (
              <li key={`${c.at}${c.words}`}>
                {c.words} <span className="muted num">{`${c.who}, ${momentOf(c.at)}`}</span>
              </li>
            ))}
          </ul>
        )}
      </Panel>
      {removed.length > 0 && (
        <Panel title={t('removed')}>
          <ul className="lb-change-list">
            {removed.map((r) => (
              <li key={r.id}>{t('removedOn', { name: r.name, day: calendarDay(r.removedOn) })}</li>
            ))}
          </ul>
        </Panel>
      )}
    </div>
  );
}
