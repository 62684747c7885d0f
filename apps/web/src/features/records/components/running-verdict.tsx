import { VerdictTag } from '../../../components/verdict-tag.js';
import type { RunningTest } from '../live-machine-test.js';
import { t } from '../text.js';

type Part = 'insulation' | 'winding-resistance' | 'high-potential' | 'no-load' | 'vibration' | 'direction' | 'bearings' | 'core' | 'surge' | 'polarity';
const partWords = (parts: readonly string[]) => parts.map((p) => t(`part-${p as Part}`)).join(', ');

/** Where the whole test stands while it is typed: the same library will say the same on the server. */
export function RunningVerdict({ running }: { readonly running: RunningTest<unknown> | null }) {
  return (
    <section className="lb-running" aria-live="polite" aria-label={t('soFar')}>
      <span className="muted">{t('soFar')}</span>
      {running?.verdict ? <VerdictTag verdict={running.verdict} large /> : <span>{t('nothingYet')}</span>}
      {running && running.missing.length > 0 && <span>{t('missing', { parts: partWords(running.missing) })}</span>}
      {running?.warnings.map((w) => (
        <span key={w.path + w.code} className="lb-running-warning">
          {w.message}
        </span>
      ))}
    </section>
  );
}
