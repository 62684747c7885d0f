import { useWatch, type Control } from 'react-hook-form';
import { ChoiceField } from '../../../components/fields.js';
import type { LimitForm } from '../limit-form.js';
import { ruleHelp, ruleName, RULE_OPTIONS } from '../rule-names.js';
import { t } from '../text.js';

/** What an inconclusive result does at a gate: explained, since the verdict itself does not change. */
export function RuleField({ control, before }: { readonly control: Control<LimitForm>; readonly before: string }) {
  const rule = String(useWatch({ control, name: 'set.core.decisionRule' }));
  return (
    <div className="lb-limit-block">
      <ChoiceField control={control} name="set.core.decisionRule" label={t('rule')} options={RULE_OPTIONS} help={ruleHelp(rule)} />
      <p className="muted">{t('ruleHelp')}</p>
      {rule !== before && (
        <p className="lb-limit-mark">
          {t('changedMark')}, {t('nowValue', { words: ruleName(before) })}
        </p>
      )}
    </div>
  );
}
