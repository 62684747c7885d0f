import { html } from '../../look/html.js';
import { moneyText } from '../objects/money.js';
import type { Charge, PaymentIntent } from '../objects/stored.js';
import { frame } from './pay-view.js';
import { TEXT } from './text.js';

/** The bank's extra step: one question, two answers. */
export function stepPage(intent: PaymentIntent): string {
  return frame(
    TEXT.stepTitle,
    html`<h1>${TEXT.stepTitle}</h1>
<p>${TEXT.stepBody(moneyText(intent.amount, intent.currency))}</p>
<form method="post">
<button class="full" name="result" value="pass">${TEXT.stepPass}</button>
<button class="full plain" name="result" value="fail">${TEXT.stepFail}</button>
</form>`,
    TEXT.stepName,
  );
}

export function receiptPage(charge: Charge): string {
  const lines = TEXT.receiptLines;
  const card = charge.payment_method_details?.card;
  return frame(
    TEXT.receiptTitle,
    html`<h1>${TEXT.receiptTitle}</h1>
<div class="card"><dl class="lines">
<div><dt>${lines.amount}</dt><dd>${moneyText(charge.amount, charge.currency)}</dd></div>
${charge.amount_refunded > 0 && html`<div><dt>${lines.refunded}</dt><dd>${moneyText(charge.amount_refunded, charge.currency)}</dd></div>`}
${card && html`<div><dt>${lines.card}</dt><dd>${card.brand} … ${card.last4}</dd></div>`}
<div><dt>${lines.when}</dt><dd>${new Date(charge.created * 1000).toISOString().slice(0, 16).replace('T', ' ')}</dd></div>
</dl></div>
<p class="quiet small">${lines.charge}: ${charge.id}</p>`,
  );
}
