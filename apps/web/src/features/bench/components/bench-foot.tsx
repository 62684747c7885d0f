import type { BeforeTest, CoreLimits } from '@libs/core-loss';
import { formatUsual } from '@libs/quantities';
import { BeforeAfterStrip } from '../../../components/before-after-strip.js';
import { useUnits } from '../../../components/units.js';
import type { Phase } from '../bench-form.js';
import type { LiveTest } from '../live-test.js';
import { stripOf } from '../strip-of.js';
import { t } from '../text.js';
import { ResultPanel } from './result-panel.js';

interface BenchFootProps {
  readonly live: LiveTest;
  readonly phase: Phase;
  readonly limits: CoreLimits;
  readonly before: BeforeTest | null;
}

/** Before and after side by side, and what the readings come to: always in sight. */
export function BenchFoot({ live, phase, limits, before }: BenchFootProps) {
  const system = useUnits();
  const { result } = live;
  const strip = stripOf({
    before: phase === 'before' ? result : (before?.result ?? null),
    after: phase === 'after' && result ? [{ label: t('after'), result }] : [],
    increaseLimit: limits.increaseLimit,
    system,
  });
  return (
    <section className="lb-bench-foot" aria-label={t('result')}>
      <div className="lb-bench-strip">
        <BeforeAfterStrip {...strip} withTable={false} />
      </div>
      {result ? <ResultPanel result={result} /> : <NotYet live={live} limits={limits} />}
    </section>
  );
}

function NotYet({ live, limits }: { readonly live: LiveTest; readonly limits: CoreLimits }) {
  const system = useUnits();
  return (
    <div className="lb-bench-result lb-bench-notyet">
      <h3>{t('notYet')}</h3>
      {live.missing > 0 && <p className="muted">{t('notYetWords', { missing: live.missing })}</p>}
      {live.wrong.size === 0 ? (
        <ol>
          <li>{t('stepSize')}</li>
          <li>{t('stepTrial')}</li>
          <li>{t('stepRead')}</li>
          <li>
            {t('stepStop', {
              mean: formatUsual(limits.stopMeanC, 'temperature', system),
              spot: formatUsual(limits.stopSpotC, 'temperature', system),
              over: formatUsual(limits.stopSpotOverMeanK, 'temperature-difference', system),
            })}
          </li>
        </ol>
      ) : (
        <>
          <p>{t('notYetWrong')}</p>
          <ul>
            {[...live.wrong].map(([path, words]) => (
              <li key={path}>{words}</li>
            ))}
          </ul>
        </>
      )}
    </div>
  );
}
