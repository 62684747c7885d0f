import type Stripe from 'stripe';
import { newBalanceTransaction, type Booking } from '../objects/new-balance-transaction.js';
import type { BalanceTransaction } from '../objects/stored.js';
import type { World } from '../world.js';

/** Book a movement. Money that comes in is available after the usual wait; money that goes out is gone at once. */
export function book(world: World, booking: Omit<Booking, 'availableOn'>, atOnce = booking.amount < 0): BalanceTransaction {
  const created = world.clock.seconds();
  const availableOn = atOnce ? created : created + Math.ceil(world.settings.moneyAvailableAfterMs / 1000);
  return world.state.balanceTransactions.add(newBalanceTransaction({ ...booking, availableOn }, created));
}

/** Turn pending money whose day has come into available money. */
export function ripen(world: World): void {
  const now = world.clock.seconds();
  for (const line of world.state.balanceTransactions.all()) if (line.available_on <= now) line.status = 'available';
}

export function balanceOf(world: World): Stripe.Balance {
  ripen(world);
  const lines = world.state.balanceTransactions.all();
  const currencies = [...new Set(lines.map((line) => line.currency))];
  const sum = (currency: string, status: 'available' | 'pending') => ({
    amount: lines.filter((line) => line.currency === currency && line.status === status).reduce((total, line) => total + line.net, 0),
    currency,
    source_types: {},
  });
  const all = currencies.length > 0 ? currencies : ['usd'];
  return {
    object: 'balance',
    available: all.map((currency) => sum(currency, 'available')),
    livemode: false,
    pending: all.map((currency) => sum(currency, 'pending')),
    refund_and_dispute_prefunding: { available: [], pending: [] },
  } satisfies Stripe.Balance;
}
