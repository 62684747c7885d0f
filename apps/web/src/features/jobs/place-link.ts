import { RECORD_FROM_STEP, RECORD_KINDS, type RecordKind } from '@shared/records';

export interface PlaceAround {
  readonly jobId: string;
  /** kinds that have a record already: what is missing then is a signature, an answer or a look, on the job sheet */
  readonly recorded: ReadonlySet<RecordKind>;
  readonly mayRecord: boolean;
}

const isRecordKind = (place: string): place is RecordKind => (RECORD_KINDS as readonly string[]).includes(place);

/** Where a condition is put right: the bench for a record that is not there yet, else its place on the job sheet. */
export function placeLink(place: string, { jobId, recorded, mayRecord }: PlaceAround): string {
  const sheet = `/jobs/${jobId}`;
  if (place === 'quote' || place === 'money') return `${sheet}?tab=money`;
  if (place === 'certificate' || place === 'delivery') return `${sheet}?step=ready#${place}`;
  if (!isRecordKind(place)) return sheet;
  return mayRecord && !recorded.has(place) ? `${sheet}/work/${place}` : `${sheet}?step=${RECORD_FROM_STEP[place]}#work`;
}
