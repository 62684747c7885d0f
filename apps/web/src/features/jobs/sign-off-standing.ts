import type { RecordView } from '@shared/records';
import type { SignOff } from '@shared/waivers';

type SignOffs = readonly SignOff[];
type Signed = Pick<RecordView, 'id' | 'contentHash'>;

/** A signature counts only for the very revision it was given for. */
const signedFor = (signOffs: SignOffs, kind: SignOff['kind'], record: Signed): SignOff | undefined => signOffs.find((s) => s.kind === kind && s.recordId === record.id && s.contentHash === record.contentHash);

export interface WaiverStanding {
  readonly waiver: SignOff | undefined;
  readonly countersignature: SignOff | undefined;
}
export const waiverStanding = (signOffs: SignOffs): WaiverStanding => ({
  waiver: signOffs.find((s) => s.kind === 'waiver'),
  countersignature: signOffs.find((s) => s.kind === 'waiver-countersignature'),
});

export interface DecisionStanding {
  /** the last answer on this question, whatever it was given on */
  readonly decision: SignOff | undefined;
  /** it was given on the test that counts, as it stands now */
  readonly holds: boolean;
}
export function decisionStanding(signOffs: SignOffs, about: 'core-test-before' | 'core-test-after', record: Signed): DecisionStanding {
  const decision = signOffs.filter((s) => s.kind === 'decision' && s.detail['about'] === about).at(-1);
  return { decision, holds: decision !== undefined && decision.recordId === record.id && decision.contentHash === record.contentHash };
}

export const concessionOn = (signOffs: SignOffs, record: Signed): SignOff | undefined => signedFor(signOffs, 'concession', record);
export const releaseOfInconclusive = (signOffs: SignOffs, record: Signed): SignOff | undefined => signedFor(signOffs, 'inconclusive-release', record);

export interface FinalSignatures {
  readonly tested: SignOff | undefined;
  readonly released: SignOff | undefined;
  /** there is a signature, but for an older revision */
  readonly correctedSince: boolean;
}
export function finalSignatures(signOffs: SignOffs, record: Signed): FinalSignatures {
  const tested = signedFor(signOffs, 'tested', record);
  return { tested, released: signedFor(signOffs, 'released-by-second', record), correctedSince: !tested && signOffs.some((s) => s.kind === 'tested' && s.recordId === record.id) };
}
