import type { UnitSystem } from '@libs/quantities';
import type { LoadView } from '@shared/burnouts';
import type { Difference } from '../../components/notices.js';
import { calendarDay } from '../../lib/format.js';
import { channelKey, readCorrection, type CorrectionValues, type JobOfLoad } from './load-form.js';
import { kelvinWords } from './load-words.js';
import { t } from './text.js';

/** Where a correction that is being typed differs from what somebody else has saved meanwhile. */
export function differencesTo(current: LoadView, values: CorrectionValues, seen: LoadView, candidates: readonly JobOfLoad[], system: UnitSystem): Difference[] {
  const { offsetK } = readCorrection(values, seen, candidates).candidate as { readonly offsetK: number };
  const jobs = (of: readonly { readonly number: string }[]) => of.map((j) => j.number).join(', ') || '–';
  const parts = (of: readonly { readonly name: string }[]) => of.map((c) => c.name).join(', ') || '–';
  const rows: Difference[] = [
    { label: t('oven'), theirs: current.ovenId, yours: values.ovenId ?? '–' },
    { label: t('day'), theirs: calendarDay(current.day), yours: values.day ? calendarDay(values.day) : '–' },
    { label: t('jobs'), theirs: jobs(current.jobs), yours: jobs(candidates.filter((j) => values.jobs[j.jobId])) },
    { label: t('whichOnPart'), theirs: parts(current.file?.channels.filter((c) => c.onPart) ?? []), yours: parts(seen.file?.channels.filter((_, i) => values.onPart[channelKey(i)]) ?? []) },
    { label: t('offsetLabel'), theirs: kelvinWords(current.offsetK, system), yours: kelvinWords(offsetK, system) },
    { label: t('remark'), theirs: current.remark || '–', yours: values.remark || '–' },
  ];
  return rows.filter((row) => row.theirs !== row.yours);
}
