import type Stripe from 'stripe';
import { z } from 'zod';
import { balanceOf, ripen } from '../engine/balance.js';
import { missing } from '../http/api-error.js';
import type { Operation } from '../http/api.js';
import { createdFits, listPage } from '../http/list-page.js';
import { created, currency, onList, text } from '../http/params.js';
import type { World } from '../world.js';

export function moneyRoutes(on: Operation, world: World): void {
  const { balanceTransactions } = world.state;

  on('GET', '/v1/balance', z.strictObject({}), () => balanceOf(world));
  on('GET', '/v1/balance_transactions/:id', z.strictObject({}), (_params, id) => {
    ripen(world);
    const line = balanceTransactions.find(id);
    if (!line) throw missing('balance transaction', id);
    return line;
  });
  on('GET', '/v1/balance_transactions', z.strictObject({ ...onList, created: created(), currency: currency().optional(), source: text().optional(), type: text().optional() }), (params) => {
    ripen(world);
    const lines = balanceTransactions
      .newestFirst()
      .filter(
        (line) =>
          createdFits(line.created, params.created) &&
          (params.currency === undefined || line.currency === params.currency) &&
          (params.source === undefined || line.source === params.source) &&
          (params.type === undefined || line.type === params.type),
      );
    return listPage(lines, params, '/v1/balance_transactions', 'balance transaction');
  });
  on(
    'GET',
    '/v1/account',
    z.strictObject({}),
    () =>
      ({
        id: world.state.accountId,
        object: 'account',
        charges_enabled: true,
        country: 'US',
        default_currency: 'usd',
        details_submitted: true,
        email: null,
        metadata: {},
        payouts_enabled: true,
        type: 'standard',
      }) satisfies Stripe.Account,
  );
}
