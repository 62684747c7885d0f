import type { InsulationReading, WindingResistanceReading } from '@libs/machine-tests';
import type { RecordKind, RecordView } from '@shared/records';
import { lastOfKind, readingsOf } from '../../lib/job-records.js';

interface Earlier {
  readonly insulation: InsulationReading | null;
  readonly windingResistance: WindingResistanceReading | null;
}

/** The last test of each of these kinds, the kind named first before the others: what it says of the winding is taken over. */
export function earlierTest(records: readonly RecordView[], kinds: readonly Extract<RecordKind, 'incoming-test' | 'before-varnish-test' | 'final-test'>[]): Earlier {
  const readings = kinds.flatMap((kind) => {
    const record = lastOfKind(records, kind);
    return record ? [readingsOf(record, kind)] : [];
  });
  return {
    insulation: readings[0]?.insulation ?? null,
    windingResistance: readings.find((r) => r.windingResistance !== null)?.windingResistance ?? null,
  };
}
