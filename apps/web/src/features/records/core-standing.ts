import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { t } from './text.js';

/** What was decided of a core that did not simply pass; a signature holds for the record as it was when it was signed. */
export function coreStanding({ signOffs }: Pick<JobSheet, 'signOffs'>, record: RecordView): { readonly words: string; readonly settled: boolean } | null {
  const signed = (kind: 'concession' | 'inconclusive-release') => signOffs.some((s) => s.kind === kind && s.recordId === record.id && s.contentHash === record.contentHash);
  if (record.verdict === 'does-not-conform') return signed('concession') ? { words: t('coreConceded'), settled: true } : { words: t('coreNotConceded'), settled: false };
  if (record.verdict === 'inconclusive') return signed('inconclusive-release') ? { words: t('corePassed'), settled: true } : { words: t('coreNotPassed'), settled: false };
  return null;
}
