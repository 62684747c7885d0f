import type { Entered } from '@shared/fields';
import type { RecordKind, RecordView } from '@shared/records';

export interface RecordRow {
  id: string;
  jobId: string;
  kind: RecordKind;
  ordinal: number;
  revision: number;
  verdict: string | null;
  readings: string;
  entered: string;
  result: string;
  calculation: string;
  limitsVersion: number;
  instruments: string;
  reason: string;
  byName: string;
  at: string;
  contentHash: string;
  version: number;
}

export const RECORD_SELECT = `SELECT r.id, r.jobId, r.kind, r.ordinal, v.revision, v.verdict, v.readings, v.entered, v.result, v.calculation, v.limitsVersion, v.instruments, v.reason, v.byName, v.at, v.contentHash, r.version
  FROM job_records r JOIN record_revisions v ON v.recordId = r.id`;

export function toRecordView(row: RecordRow): RecordView {
  const { byName, readings, entered, result, instruments, ...rest } = row;
  return {
    ...rest,
    by: byName,
    readings: JSON.parse(readings) as Record<string, unknown>,
    entered: JSON.parse(entered) as Entered,
    result: JSON.parse(result) as Record<string, unknown>,
    instruments: JSON.parse(instruments) as RecordView['instruments'],
  };
}
