import type { InstrumentDue } from '@shared/calibrations';
import { Notice } from '../../../components/notice.js';
import { Facts, Panel } from '../../../components/panel.js';
import { calendarDay } from '../../../lib/format.js';
import { instrumentKindName } from '../../../lib/instrument-kinds.js';
import { t } from '../instrument-text.js';
import { daysWords, StandingMark } from './standing-mark.js';

/** What an instrument is, and how it stands today. */
export function InstrumentFacts({ instrument }: { readonly instrument: InstrumentDue }) {
  return (
    <Panel title={t('facts')} actions={<StandingMark standing={instrument.standing} />}>
      <div className="stack">
        {instrument.notCounted ? (
          <Notice intent="danger">{t('notCountedWords')}</Notice>
        ) : (
          instrument.standing === 'overdue' && <Notice intent="warning">{t('graceWords')}</Notice>
        )}
        <Facts
          rows={[
            [t('kind'), instrumentKindName(instrument.kind)],
            [t('description'), instrument.description || '–'],
            [t('serial'), instrument.serial || '–'],
            [t('ranges'), instrument.rangeText || '–'],
            [t('error'), t('errorWords', { reading: instrument.percentOfReading, range: instrument.percentOfRange })],
            [t('dueOn'), <span key="due" className="num">{`${calendarDay(instrument.dueOn)}, ${daysWords(instrument.daysLeft)}`}</span>],
            [t('certificate'), instrument.certificateNumber || '–'],
          ]}
        />
      </div>
    </Panel>
  );
}
