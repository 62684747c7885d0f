import type { BeforeTest, CoreTestResult } from '@libs/core-loss';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { readingsOf, recordsOfKind } from '../../lib/job-records.js';
import { coreTestInput } from './bench-form.js';

/**
 * The before test that counts: the last one that is not “not valid” and was made before the strip. Identifiers sort by
 * time, so the younger record has the larger one. The server chooses by the same rule.
 */
export function beforeRecord(records: readonly RecordView[]): RecordView | undefined {
  const strip = recordsOfKind(records, 'strip')[0];
  return recordsOfKind(records, 'core-test-before')
    .filter((r) => r.verdict !== 'not-valid' && !(strip && r.id > strip.id))
    .at(-1);
}

/** A waiver counts once a manager has countersigned it; the countersignature bears the hash of what it signs. */
export const waiverInForce = (job: Pick<JobSheet, 'signOffs'>): boolean =>
  job.signOffs.some((s) => s.kind === 'waiver' && job.signOffs.some((c) => c.kind === 'waiver-countersignature' && c.contentHash === s.contentHash));

export const beforeTestOf = (record: RecordView): BeforeTest => ({
  input: coreTestInput('before', readingsOf(record, 'core-test-before')),
  result: record.result as unknown as CoreTestResult,
});
