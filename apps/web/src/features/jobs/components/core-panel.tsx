import type { RecordView } from '@shared/records';
import { BeforeAfterStrip } from '../../../components/before-after-strip.js';
import { Panel } from '../../../components/panel.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { useUnits } from '../../../components/units.js';
import { countingAfter, countingBefore } from '../../../lib/core-figures.js';
import { coreStrip } from '../../../lib/core-strip.js';
import { t } from '../work-text.js';

/** The core before and after on one strip, and the verdict that counts. */
export function CorePanel({ records }: { readonly records: readonly RecordView[] }) {
  const verdict = (countingAfter(records) ?? countingBefore(records))?.verdict;
  return (
    <Panel title={t('core')} actions={isVerdict(verdict) ? <VerdictTag verdict={verdict} /> : undefined}>
      <BeforeAfterStrip {...coreStrip(records, useUnits())} />
    </Panel>
  );
}
