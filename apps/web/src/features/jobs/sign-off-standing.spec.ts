import type { SignOff } from '@shared/waivers';
import { describe, expect, it } from 'vitest';
import { concessionOn, decisionStanding, finalSignatures, releaseOfInconclusive, waiverStanding } from './sign-off-standing.js';

const sign = (over: Partial<SignOff>): SignOff => ({ id: 's-000001', kind: 'tested', recordId: 'r-1', by: 'Jonas Feldt', byRoles: 'technician', at: '2026-11-23T11:00:00.000Z', reason: '', detail: {}, contentHash: 'rev-1', version: 1, ...over });
const first = { id: 'r-1', contentHash: 'rev-1' };
const corrected = { id: 'r-1', contentHash: 'rev-2' };

describe('which signatures stand under a record', () => {
  it('counts a signature for the revision it was given for, and asks anew after a correction', () => {
    const signOffs = [sign({}), sign({ id: 's-000002', kind: 'released-by-second', by: 'Mira Talvik' })];
    expect(finalSignatures(signOffs, first)).toMatchObject({ tested: { by: 'Jonas Feldt' }, released: { by: 'Mira Talvik' }, correctedSince: false });
    expect(finalSignatures(signOffs, corrected)).toEqual({ tested: undefined, released: undefined, correctedSince: true });
  });

  it('takes the customer’s last answer, and says when it was given on an older test', () => {
    const answer = (id: string, choice: string, over: Partial<SignOff> = {}) => sign({ id, kind: 'decision', detail: { about: 'core-test-after', choice }, ...over });
    const signOffs = [answer('s-000001', 'replace'), answer('s-000002', 'accept-with-concession')];
    expect(decisionStanding(signOffs, 'core-test-after', first)).toMatchObject({ decision: { id: 's-000002' }, holds: true });
    expect(decisionStanding(signOffs, 'core-test-after', corrected).holds).toBe(false);
    expect(decisionStanding(signOffs, 'core-test-before', first)).toEqual({ decision: undefined, holds: false });
  });

  it('lets a concession and a release stand for their own revision only', () => {
    const signOffs = [sign({ kind: 'concession' }), sign({ id: 's-000002', kind: 'inconclusive-release' })];
    expect(concessionOn(signOffs, first)?.id).toBe('s-000001');
    expect(concessionOn(signOffs, corrected)).toBeUndefined();
    expect(releaseOfInconclusive(signOffs, corrected)).toBeUndefined();
  });

  it('knows a waiver that waits from one that is countersigned', () => {
    const waiver = sign({ kind: 'waiver', recordId: null });
    expect(waiverStanding([waiver]).countersignature).toBeUndefined();
    expect(waiverStanding([waiver, sign({ id: 's-000002', kind: 'waiver-countersignature', recordId: null })]).countersignature?.id).toBe('s-000002');
  });
});
