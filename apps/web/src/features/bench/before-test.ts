import type { BeforeTest, CoreTestResult } from '@libs/core-loss';
import type { JobSheet } from '@shared/jobs';
import type { RecordView } from '@shared/records';
import { countingBefore } from '../../lib/core-figures.js';
import { readingsOf } from '../../lib/job-records.js';
import { coreTestInput } from './bench-form.js';

/** The before test that an after test is held against; one that is “not valid” is none. The server chooses by the same rule. */
export function beforeRecord(records: readonly RecordView[]): RecordView | undefined {
  const before = countingBefore(records);
  return before?.verdict === 'not-valid' ? undefined : before;
}

/** A waiver counts once a manager has countersigned it; the countersignature bears the hash of what it signs. */
export const waiverInForce = (job: Pick<JobSheet, 'signOffs'>): boolean =>
  job.signOffs.some((s) => s.kind === 'waiver' && job.signOffs.some((c) => c.kind === 'waiver-countersignature' && c.contentHash === s.contentHash));

export const beforeTestOf = (record: RecordView): BeforeTest => ({
  input: coreTestInput('before', readingsOf(record, 'core-test-before')),
  result: record.result as unknown as CoreTestResult,
});
