import type { QuoteState } from '@shared/quotes';

/** What can be done to a quote. */
export type QuoteAct = 'change' | 'send' | 'approve' | 'decline' | 'revise';

/** Every move there is; what is not here is refused. */
const MOVES: Record<QuoteAct, Partial<Record<QuoteState, QuoteState>>> = {
  change: { draft: 'draft' },
  send: { draft: 'sent' },
  approve: { sent: 'approved' },
  decline: { sent: 'declined' },
  // the quote itself goes out of force; its next revision begins as a draft
  revise: { sent: 'superseded', approved: 'superseded', declined: 'superseded' },
};

/** The state a quote is in after an act, or null where the act is not allowed. */
export const nextQuoteState = (state: QuoteState, act: QuoteAct): QuoteState | null => MOVES[act][state] ?? null;

/** Done already: the same act again, as a double click or a second person does it. */
export const isDoneAlready = (state: QuoteState, act: QuoteAct): boolean =>
  (act === 'approve' && state === 'approved') || (act === 'decline' && state === 'declined') || (act === 'send' && state === 'sent');

const STANDS: Record<QuoteState, string> = {
  draft: 'This quote is still a draft',
  sent: 'This quote has been sent',
  approved: 'This quote has been approved',
  declined: 'This quote has been declined',
  superseded: 'A newer revision has taken this quote’s place',
};
const GO_ON: Record<QuoteAct, Partial<Record<QuoteState, string>> & { otherwise: string }> = {
  change: { otherwise: 'make a new revision to change it' },
  send: { superseded: 'send the newest one', otherwise: 'make a new revision to send another' },
  approve: { draft: 'send it first', superseded: 'only the newest can be approved', declined: 'the shop makes a new revision', otherwise: 'nothing more is needed' },
  decline: { draft: 'send it first', superseded: 'answer the newest', approved: 'speak with the shop to change that', otherwise: 'nothing more is needed' },
  revise: { draft: 'change the draft itself', superseded: 'revise the newest', otherwise: 'it cannot be revised' },
};

/** Why an act is refused in this state, and what to do instead. */
export const moveRefusal = (state: QuoteState, act: QuoteAct): string => `${STANDS[state]}: ${GO_ON[act][state] ?? GO_ON[act].otherwise}.`;

/** A quote holds through its last day, counted in the shop's time zone. */
export const isExpired = (validUntil: string, today: string): boolean => validUntil < today;
