import type { InstrumentDue } from '@shared/calibrations';
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import { DataTable, type Column } from '../../../components/data-table.js';
import { Answer } from '../../../components/faces.js';
import { Panel } from '../../../components/panel.js';
import { calendarDay } from '../../../lib/format.js';
import { instrumentKindName } from '../../../lib/instrument-kinds.js';
import { dueQuery } from '../api/instrument-queries.js';
import { t } from '../instrument-text.js';
import { daysWords, StandingMark } from './standing-mark.js';

const COLUMNS: readonly Column<InstrumentDue>[] = [
  { key: 'tag', title: t('tag'), cell: (i) => <Link to={`/bay/instruments/${i.id}`}>{i.tag}</Link> },
  { key: 'kind', title: t('kind'), cell: (i) => instrumentKindName(i.kind) },
  { key: 'due', title: t('dueOn'), cell: (i) => <span className="num">{calendarDay(i.dueOn)}</span> },
  { key: 'days', title: t('days'), cell: (i) => <span className="num">{daysWords(i.daysLeft)}</span> },
  { key: 'standing', title: t('standing'), cell: (i) => <StandingMark standing={i.standing} /> },
];

/** What must go to calibration, the most urgent first. */
export function DueList() {
  const due = useQuery(dueQuery);
  return (
    <Panel title={t('dueTitle')}>
      <Answer query={due} isEmpty={(all) => all.length === 0} empty={<p className="muted">{t('dueNone')}</p>}>
        {(all) => (
          <>
            <p className="muted">{t('dueHelp')}</p>
            <DataTable caption={t('dueTitle')} columns={COLUMNS} rows={all} rowKey={(i) => i.id} />
          </>
        )}
      </Answer>
    </Panel>
  );
}
