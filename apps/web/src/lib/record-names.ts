import type { RecordKind } from '@shared/records';
import type { Step } from '@shared/route';

/** What the shop calls its records. */
const NAMES: Record<RecordKind, string> = {
  'incoming-test': 'Incoming test',
  dismantling: 'Dismantling',
  'winding-as-found': 'Winding as found',
  'core-test-before': 'Core test before',
  strip: 'Strip and burnout',
  'core-test-after': 'Core test after',
  'core-repair': 'Core repair',
  'winding-as-wound': 'Winding as wound',
  'before-varnish-test': 'Test before varnish',
  treatment: 'Treatment',
  assembly: 'Assembly',
  'final-test': 'Final test',
};
export const recordName = (kind: RecordKind): string => NAMES[kind];

/** Which records belong to a step: what its page shows and offers. */
export const STEP_RECORDS: Record<Step, readonly RecordKind[]> = {
  received: [],
  'incoming-test': ['incoming-test'],
  dismantled: ['dismantling', 'winding-as-found'],
  'core-test-before': ['core-test-before'],
  'awaiting-approval': [],
  'strip-and-burnout': ['strip'],
  'core-test-after': ['core-test-after', 'core-repair'],
  rewind: ['winding-as-wound'],
  'before-varnish-test': ['before-varnish-test'],
  treatment: ['treatment'],
  assembly: ['assembly'],
  'final-test': ['final-test'],
  ready: [],
  released: [],
};
