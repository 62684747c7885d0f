import { newCustomer } from '../objects/new-customer.js';
import type { PaymentIntent, Session } from '../objects/stored.js';
import { emit, type World } from '../world.js';

export const sessionOf = (world: World, intent: PaymentIntent): Session | undefined =>
  world.state.sessions.all().find((session) => session.payment_intent === intent.id);

/**
 * The customer has done their part. Complete is not paid: with a method whose money arrives later the session completes
 * `unpaid`, and says so again when the money has come or failed.
 */
export function completeSession(world: World, session: Session, paymentStatus: Session['payment_status']): void {
  if (session.status !== 'open') return;
  world.agenda.cancel('session.expire', session.id);
  if (!session.customer && session.customer_creation === 'always') {
    const { email, name } = session.customer_details ?? { email: null, name: null };
    const customer = world.state.customers.add(newCustomer({ email, name }, world.clock.seconds()));
    session.customer = customer.id;
    emit(world, 'customer.created', customer);
  }
  session.status = 'complete';
  session.payment_status = paymentStatus;
  session.url = null;
  emit(world, 'checkout.session.completed', session);
}

export function debitArrived(world: World, session: Session): void {
  session.payment_status = 'paid';
  emit(world, 'checkout.session.async_payment_succeeded', session);
}

export function debitFailed(world: World, session: Session): void {
  emit(world, 'checkout.session.async_payment_failed', session);
}
