import { Button } from '@blueprintjs/core';
import type { InstrumentView } from '@shared/instruments';
import { Link } from 'react-router-dom';
import { DataTable } from '../../../components/data-table.js';
import { calendarDay } from '../../../lib/format.js';
import { instrumentKindName, t } from '../text.js';
import { CalibrationMark } from './calibration-mark.js';

/** What is out of calibration stands on top; the rest by tag. */
const byUrgency = (a: InstrumentView, b: InstrumentView) => Number(b.standing === 'overdue') - Number(a.standing === 'overdue') || Number(b.standing === 'due-soon') - Number(a.standing === 'due-soon') || a.tag.localeCompare(b.tag);

export function InstrumentList({ instruments, onEdit }: { readonly instruments: readonly InstrumentView[]; readonly onEdit: ((instrument: InstrumentView) => void) | null }) {
  return (
    <DataTable
      caption={t('list')}
      rows={[...instruments].sort(byUrgency)}
      rowKey={(i) => i.id}
      columns={[
        {
          key: 'tag',
          title: t('tag'),
          cell: (i) => (
            <span className="row">
              <Link to={`/bay/instruments/${i.id}`}>{i.tag}</Link>
              {onEdit && <Button size="small" variant="minimal" text={t('change')} aria-label={t('edit', { tag: i.tag })} onClick={() => onEdit(i)} />}
            </span>
          ),
        },
        { key: 'kind', title: t('kind'), cell: (i) => instrumentKindName(i.kind) },
        { key: 'description', title: t('description'), cell: (i) => [i.description, i.rangeText].filter(Boolean).join(', ') },
        { key: 'error', title: t('errorTitle'), cell: (i) => t('error', { reading: i.percentOfReading, range: i.percentOfRange }) },
        { key: 'due', title: t('dueOn'), cell: (i) => <span className="num">{calendarDay(i.dueOn)}</span> },
        { key: 'certificate', title: t('certificateNumber'), cell: (i) => i.certificateNumber },
        { key: 'standing', title: t('standing'), cell: (i) => <CalibrationMark standing={i.standing} /> },
      ]}
    />
  );
}
