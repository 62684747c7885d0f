import type { PortalJob } from '@shared/portal';
import type { Step } from '@shared/route';

/** The steps in the words of somebody who owns the machine and has never stood in the bay. */
const NAMES: Record<Step, string> = {
  received: 'Arrived',
  'incoming-test': 'First test',
  dismantled: 'Taken apart',
  'core-test-before': 'Core tested',
  'awaiting-approval': 'Your approval',
  'strip-and-burnout': 'Old winding out',
  'core-test-after': 'Core tested again',
  rewind: 'New winding',
  'before-varnish-test': 'Winding tested',
  treatment: 'Impregnated',
  assembly: 'Put together',
  'final-test': 'Final test',
  ready: 'Ready',
  released: 'Handed over',
};
const NOW: Record<Step, string> = {
  received: 'It has arrived and is booked in. Next we test it as it came.',
  'incoming-test': 'We test it as it came.',
  dismantled: 'It is taken apart, and we look at every part.',
  'core-test-before': 'We test the iron core before the old winding comes out.',
  'awaiting-approval': 'We have looked at everything. It goes on as soon as we have your word.',
  'strip-and-burnout': 'The old winding comes out.',
  'core-test-after': 'The old winding is out. We test the iron core again, to see that it took no harm.',
  rewind: 'It gets its new winding.',
  'before-varnish-test': 'The new winding is tested before it is impregnated.',
  treatment: 'The winding is impregnated and cured.',
  assembly: 'It is put together.',
  'final-test': 'It stands on the test bench for its final test.',
  ready: 'It is ready. You can collect it.',
  released: 'It has left our shop.',
};
const ENDS = {
  released: 'It is done and has left our shop.',
  'returned-unrepaired': 'It went back to you unrepaired, as agreed.',
  replaced: 'It was replaced by another machine, as agreed.',
  scrapped: 'It was scrapped, as agreed.',
} as const;
const SEE_QUOTE = 'We have looked at everything. Open it to see how its quote stands.';
const QUOTE_COMES = 'We have looked at everything and prepare your quote.';
const RESTS = 'The work rests at the moment. We call you when we need you; call us when you want to know more.';

export const plainStep = (step: Step): string => NAMES[step];

type QuoteState = PortalJob['quotes'][number]['state'];

/** What happens to the machine right now, in one or two sentences; with the states of its quotes, as far as they are known. */
export function happensNow({ step, state }: Pick<PortalJob, 'step' | 'state'>, quotes: readonly QuoteState[] | 'unknown'): string {
  if (state === 'on-hold') return RESTS;
  if (state !== 'open') return ENDS[state];
  if (step !== 'awaiting-approval' || (quotes !== 'unknown' && quotes.includes('sent'))) return NOW[step];
  if (quotes === 'unknown') return SEE_QUOTE;
  return quotes.includes('approved') ? 'We have your word and go on.' : QUOTE_COMES;
}
