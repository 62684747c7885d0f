import { CONTAMINATIONS } from '@shared/jobs';
import { z } from 'zod';
import type { Difference } from '../../components/notices.js';
import { calendarDay } from '../../lib/format.js';
import { factsFormOf, type FactsForm } from './move-form.js';
import { CONTAMINATION_WORDS, t } from './text.js';

/** As much of the server's current job as the form can show beside what was typed. */
const currentSchema = z.object({
  version: z.number().int(),
  complaint: z.string(),
  accessories: z.string(),
  contamination: z.enum(CONTAMINATIONS),
  contaminationWords: z.string(),
  promisedOn: z.string().nullable(),
  customerReference: z.string(),
});

export function theirsOf(current: unknown): { readonly version: number; readonly form: FactsForm } | null {
  const parsed = currentSchema.safeParse(current);
  return parsed.success ? { version: parsed.data.version, form: factsFormOf(parsed.data) } : null;
}

const LABELS: Record<keyof FactsForm, string> = {
  complaint: t('complaint'),
  accessories: t('accessories'),
  contamination: t('contamination'),
  contaminationWords: t('contaminationWords'),
  promisedOn: t('promisedOn'),
  customerReference: t('customerReference'),
};

function shown(key: keyof FactsForm, form: FactsForm): string {
  if (key === 'contamination') return CONTAMINATION_WORDS[form.contamination] ?? form.contamination;
  if (key === 'promisedOn') return form.promisedOn ? calendarDay(form.promisedOn) : t('noPromise');
  return form[key];
}

/** Only the fields that differ, each as it stands and as it was typed. */
export function differencesOf(theirs: FactsForm, yours: FactsForm): Difference[] {
  return (Object.keys(LABELS) as (keyof FactsForm)[]).flatMap((key) => {
    const difference = { label: LABELS[key], theirs: shown(key, theirs), yours: shown(key, yours) };
    return difference.theirs === difference.yours ? [] : [difference];
  });
}
