import type { RecordView } from '@shared/records';
import { Panel } from '../../../components/panel.js';
import { Quantity } from '../../../components/quantity.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { coreResultOf, countingAfter, countingBefore } from '../../../lib/core-figures.js';
import { momentOf } from '../../../lib/format.js';
import { t } from '../text.js';

/** The core as its last test found it: shown beside the final test, judged at its own gate. */
export function CoreOnceMore({ records }: { readonly records: readonly RecordView[] }) {
  const record = countingAfter(records) ?? countingBefore(records);
  const result = record && coreResultOf(record);
  return (
    <Panel title={t('core')}>
      {record && result ? (
        <div className="row">
          <span className="lb-core-figure measured">
            <Quantity si={result.wattsPerKgReferred} kind="specific-loss" />
          </span>
          {isVerdict(record.verdict) && <VerdictTag verdict={record.verdict} />}
          <span className="muted">{t('coreLine', { when: momentOf(record.at) })}</span>
        </div>
      ) : (
        <p className="muted">{t('coreNone')}</p>
      )}
    </Panel>
  );
}
