import type { RecordKind } from '@shared/records';

/** How history and papers call a record. */
export const RECORD_NAMES: Record<RecordKind, string> = {
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
