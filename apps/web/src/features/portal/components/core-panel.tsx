import type { CorePair } from '@shared/portal';
import { BeforeAfterStrip } from '../../../components/before-after-strip.js';
import { Panel } from '../../../components/panel.js';
import { useUnits } from '../../../components/units.js';
import { isVerdict, VerdictTag } from '../../../components/verdict-tag.js';
import { coreStripOf, coreWords } from '../core-words.js';
import { t } from '../text.js';

/** What the two core tests say: a sentence, the verdict, the picture. */
export function CorePanel({ core }: { readonly core: CorePair }) {
  const units = useUnits();
  const strip = coreStripOf(core, units);
  return (
    <Panel title={t('core')} actions={isVerdict(core.verdict) && <VerdictTag verdict={core.verdict} />}>
      <div className="stack">
        <p>{coreWords(core).join(' ')}</p>
        {strip && <BeforeAfterStrip {...strip} title={t('corePicture')} />}
      </div>
    </Panel>
  );
}
