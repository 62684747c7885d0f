import type { EndJob, HoldJob, UpdateJob } from '@shared/jobs';
import type { Step } from '@shared/route';

/** Words of the shop as they stand in a job's history. */
export const STEP_WORDS: Record<Step, string> = {
  received: 'received',
  'incoming-test': 'incoming test',
  dismantled: 'dismantled',
  'core-test-before': 'core test before',
  'awaiting-approval': 'awaiting approval',
  'strip-and-burnout': 'strip and burnout',
  'core-test-after': 'core test after',
  rewind: 'rewind',
  'before-varnish-test': 'before-varnish test',
  treatment: 'treatment',
  assembly: 'assembly',
  'final-test': 'final test',
  ready: 'ready',
  released: 'released',
};

export const WAITING_WORDS: Record<HoldJob['waitingFor'], string> = { customer: 'the customer', part: 'a part', 'outside-work': 'outside work', manager: 'a manager', other: 'something else' };

export const END_WORDS: Record<EndJob['end'], string> = { 'returned-unrepaired': 'Returned unrepaired', replaced: 'Replaced', scrapped: 'Scrapped' };

export const FIELD_WORDS: Record<Exclude<keyof UpdateJob, 'version'>, string> = {
  complaint: 'complaint',
  accessories: 'accessories',
  contamination: 'contamination',
  contaminationWords: 'words on contamination',
  promisedOn: 'promise date',
  customerReference: 'customer’s reference',
};
