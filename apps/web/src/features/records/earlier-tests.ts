import type { InsulationReading, WindingResistanceReading } from '@libs/machine-tests';
import type { RecordView } from '@shared/records';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';

export type MachineTestKind = 'incoming-test' | 'before-varnish-test' | 'final-test';
export interface EarlierTests {
  readonly insulation: InsulationReading | null;
  readonly windingResistance: WindingResistanceReading | null;
}

/** What the last tests of these kinds say of the winding, the kind named first before the others; never a reading. */
export function earlierTests(records: readonly RecordView[], kinds: readonly MachineTestKind[]): EarlierTests {
  const readings = kinds.flatMap((kind) => {
    const record = lastOfKind(records, kind);
    return record ? [readingsOf(record, kind)] : [];
  });
  return { insulation: readings[0]?.insulation ?? null, windingResistance: readings.find((r) => r.windingResistance !== null)?.windingResistance ?? null };
}

/** A full test that held is not made twice: the next one is a repeat at less. */
export function fullTestHeld(records: readonly RecordView[]): boolean {
  const last = lastOfKind(records, 'final-test');
  const test = last && readingsOf(last, 'final-test').highPotential;
  return test?.held === true && (test.case === 'new-winding' || test.case === 'repeat');
}
