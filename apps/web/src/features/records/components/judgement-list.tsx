import type { TestJudgement } from '@libs/machine-tests';
import { Fold } from '../../../components/fold.js';
import { useUnits } from '../../../components/units.js';
import { VerdictTag } from '../../../components/verdict-tag.js';
import { limitWords } from '../judged-words.js';
import { t } from '../text.js';

/** Each judgement in words as it stands; its limit and where that comes from one tap away. */
export function JudgementList({ judgements }: { readonly judgements: readonly TestJudgement[] }) {
  const system = useUnits();
  if (judgements.length === 0) return null;
  return (
    <>
      {judgements.map((j) => (
        <p key={j.test} className="lb-judged">
          <VerdictTag verdict={j.verdict} />
          <span>{j.words}</span>
        </p>
      ))}
      <Fold summary={t('limitsAndSources')}>
        <dl className="lb-sources">
          {judgements.map((j) => {
            const limit = limitWords(j, system);
            return (
              <div key={j.test}>
                <dt>{testName(j.test)}</dt>
                <dd>{limit === '' ? t('sourceOf', j) : t('sourceLine', { limit, source: j.source, standing: j.standing })}</dd>
              </div>
            );
          })}
        </dl>
      </Fold>
    </>
  );
}

const testName = (test: TestJudgement['test']): string => t(test === 'polarity' ? 'polarity-test' : test);
