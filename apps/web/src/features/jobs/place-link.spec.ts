import type { RecordKind } from '@shared/records';
import { describe, expect, it } from 'vitest';
import { placeLink } from './place-link.js';

const around = (recorded: RecordKind[] = [], mayRecord = true) => ({ jobId: 'j-12', recorded: new Set(recorded), mayRecord });

describe('where a missing condition is put right', () => {
  it('is the bench, for a test that is not made yet', () => {
    expect(placeLink('core-test-before', around())).toBe('/jobs/j-12/work/core-test-before');
  });

  it('is the step on the sheet, once the test is there and an answer or a signature is missing', () => {
    expect(placeLink('core-test-after', around(['core-test-after']))).toBe('/jobs/j-12?step=core-test-after#work');
  });

  it('is the step on the sheet for somebody who may not record', () => {
    expect(placeLink('winding-as-found', around([], false))).toBe('/jobs/j-12?step=dismantled#work');
  });

  it('is the money part for quote and payment, and the last step for certificate and delivery', () => {
    expect(placeLink('quote', around())).toBe('/jobs/j-12?tab=money');
    expect(placeLink('money', around())).toBe('/jobs/j-12?tab=money');
    expect(placeLink('certificate', around())).toBe('/jobs/j-12?step=ready#certificate');
    expect(placeLink('delivery', around())).toBe('/jobs/j-12?step=ready#delivery');
  });
});
