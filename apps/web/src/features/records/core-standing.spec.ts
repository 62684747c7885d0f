import type { JobSheet } from '@shared/jobs';
import { describe, expect, it } from 'vitest';
import { keptTest, sampleBefore } from '../../../test/sample-job.js';
import { coreStanding } from './core-standing.js';

const record = (verdict: string) => ({ ...keptTest('core-test-before', sampleBefore(12)), verdict });
const signed = (kind: string, contentHash = 'a'.repeat(64)) => ({ signOffs: [{ kind, recordId: record('').id, contentHash }] }) as unknown as Pick<JobSheet, 'signOffs'>;

describe('the core beside the final test', () => {
  it('needs no words when it conforms', () => {
    expect(coreStanding({ signOffs: [] }, record('conforms'))).toBeNull();
  });

  it('that does not conform says whether a concession is signed', () => {
    expect(coreStanding({ signOffs: [] }, record('does-not-conform'))).toMatchObject({ settled: false, words: expect.stringContaining('No concession') as string });
    expect(coreStanding(signed('concession'), record('does-not-conform'))).toMatchObject({ settled: true });
  });

  it('that is inconclusive says whether a manager released it', () => {
    expect(coreStanding(signed('concession'), record('inconclusive'))).toMatchObject({ settled: false });
    expect(coreStanding(signed('inconclusive-release'), record('inconclusive'))).toMatchObject({ settled: true });
  });

  it('takes no signature that was given for an earlier revision', () => {
    expect(coreStanding(signed('concession', 'b'.repeat(64)), record('does-not-conform'))).toMatchObject({ settled: false });
  });
});
