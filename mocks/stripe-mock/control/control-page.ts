import { html, type Markup } from '../../look/html.js';
import { page } from '../../look/page.js';
import { moneyText } from '../objects/money.js';
import type { World } from '../world.js';
import type { Control } from './control.js';
import { TEXT } from './text.js';

const SHOWN = 20;

/** One page to look at the fake and to make things go wrong on purpose. Plain forms; each comes back here. */
export function controlPage(world: World, control: Control): string {
  return page({
    title: TEXT.title,
    name: TEXT.name,
    strip: TEXT.strip,
    wide: true,
    body: html`<h1>${TEXT.title}</h1>
${clockPart(world)}${eventsPart(control)}${callsPart(control)}${sessionsPart(world)}${paymentsPart(world)}${refundsPart(world)}${disputesPart(world)}${deliveriesPart(control)}`,
  });
}

function clockPart(world: World): Markup {
  const now = new Date(world.clock.nowMs()).toISOString().slice(0, 19).replace('T', ' ');
  return html`<h2>${TEXT.clock}</h2><p>${TEXT.clockNow(now)}</p>
<form class="row" method="post" action="/_control/clock/advance">${input('seconds', TEXT.seconds, '3600')}<button>${TEXT.advance}</button></form>`;
}

function eventsPart(control: Control): Markup {
  return html`<h2>${TEXT.events}</h2><p class="quiet">${TEXT.eventsHint}</p>
${control.rules().map((rule) => html`<div class="note"><p>${TEXT.rule(TEXT.actions[rule.action], rule.type, rule.left)}</p></div>`)}
<form class="row" method="post" action="/_control/webhooks/rules">${choice('action', TEXT.action, TEXT.actions)}${input('type', TEXT.type, '*')}${input('left', TEXT.left, '1')}${input('copies', TEXT.copies, '2')}<button>${TEXT.addRule}</button></form>
<div class="tools">${button('webhooks/rules/clear', TEXT.clearRules)}${button('webhooks/release', TEXT.releaseInOrder, { order: 'as-they-happened' })}${button('webhooks/release', TEXT.releaseBackwards, { order: 'backwards' })}${button('webhooks/retry-now', TEXT.retryNow)}</div>`;
}

function callsPart(control: Control): Markup {
  return html`<h2>${TEXT.calls}</h2><p class="quiet">${TEXT.callsHint}</p>
${control.faults().map((fault) => html`<div class="note"><p>${TEXT.fault(TEXT.kinds[fault.kind], TEXT.whens[fault.when], fault.path, fault.left)}</p></div>`)}
<form class="row" method="post" action="/_control/faults">${input('path', TEXT.path, '/v1')}${choice('kind', TEXT.kind, TEXT.kinds)}${choice('when', TEXT.when, TEXT.whens)}${input('status', TEXT.status, '500')}${input('left', TEXT.howManyCalls, '1')}<button>${TEXT.addFault}</button></form>
<div class="tools">${button('faults/clear', TEXT.clearFaults)}${button('faults/let-go', TEXT.letGo)}</div>`;
}

function sessionsPart(world: World): Markup {
  const rows = world.state.sessions.newestFirst().slice(0, SHOWN).map((session) => [
    moneyText(session.amount_total ?? 0, session.currency ?? 'usd'),
    `${session.status}, ${session.payment_status}`,
    session.url ? html`<a href="/c/pay/${session.id}">${session.client_reference_id ?? short(session.id)}</a>` : (session.client_reference_id ?? short(session.id)),
    session.status === 'open' && button('sessions/expire', TEXT.expire, { session: session.id }),
  ]);
  return table(TEXT.sessions, [TEXT.columns.amount, TEXT.columns.state, TEXT.columns.number, TEXT.columns.act], rows);
}

function paymentsPart(world: World): Markup {
  const rows = world.state.charges.newestFirst().slice(0, SHOWN).map((charge) => [
    moneyText(charge.amount, charge.currency),
    `${charge.status}${charge.failure_code ? `: ${charge.failure_code}` : ''}${charge.amount_refunded ? `, ${moneyText(charge.amount_refunded, charge.currency)} back` : ''}${charge.disputed ? ', disputed' : ''}`,
    html`<a href="/c/receipt/${charge.id}">${short(charge.id)}</a>`,
    charge.status === 'succeeded' && [button('disputes/open', TEXT.sendDispute, { charge: charge.id }), ' ', button('disputes/open', TEXT.sendInquiry, { charge: charge.id, inquiry: 'true' })],
  ]);
  return table(TEXT.payments, [TEXT.columns.amount, TEXT.columns.state, TEXT.columns.number, TEXT.columns.act], rows);
}

function refundsPart(world: World): Markup {
  const rows = world.state.refunds.newestFirst().slice(0, SHOWN).map((refund) => [
    moneyText(refund.amount, refund.currency),
    refund.status,
    short(refund.id),
    [
      refund.status === 'pending' && button('refunds/settle', TEXT.settleRefund, { refund: refund.id }),
      (refund.status === 'pending' || refund.status === 'succeeded') && [' ', button('refunds/fail', TEXT.failRefund, { refund: refund.id })],
    ],
  ]);
  return table(TEXT.refunds, [TEXT.columns.amount, TEXT.columns.state, TEXT.columns.number, TEXT.columns.act], rows);
}

function disputesPart(world: World): Markup {
  const over = ['won', 'lost', 'warning_closed'];
  const rows = world.state.disputes.newestFirst().slice(0, SHOWN).map((dispute) => [
    moneyText(dispute.amount, dispute.currency),
    `${dispute.status}, ${dispute.reason}`,
    short(dispute.id),
    !over.includes(dispute.status) && [button('disputes/decide', TEXT.win, { dispute: dispute.id, outcome: 'won' }), ' ', button('disputes/decide', TEXT.lose, { dispute: dispute.id, outcome: 'lost' })],
  ]);
  return table(TEXT.disputes, [TEXT.columns.amount, TEXT.columns.state, TEXT.columns.number, TEXT.columns.act], rows);
}

function deliveriesPart(control: Control): Markup {
  const rows = control.deliveries().slice(0, SHOWN * 2).map((delivery) => [
    delivery.eventType,
    delivery.state,
    delivery.attempts.map((attempt) => attempt.status ?? attempt.error).join(', '),
    button('webhooks/resend', TEXT.resend, { event: delivery.eventId }),
  ]);
  return table(TEXT.deliveries, [TEXT.columns.event, TEXT.columns.state, TEXT.columns.tries, TEXT.columns.act], rows);
}

type Cell = Markup | string | null | undefined | false | readonly Cell[];

function table(title: string, heads: readonly string[], rows: readonly (readonly Cell[])[]): Markup {
  if (rows.length === 0) return html`<h2>${title}</h2><p class="quiet">${TEXT.none}</p>`;
  return html`<h2>${title}</h2><div class="scroll"><table><thead><tr>${heads.map((head) => html`<th scope="col">${head}</th>`)}</tr></thead>
<tbody>${rows.map((row) => html`<tr>${row.map((cell) => html`<td>${cell}</td>`)}</tr>`)}</tbody></table></div>`;
}

function input(name: string, label: string, value: string): Markup {
  return html`<label>${label}<input name="${name}" value="${value}"></label>`;
}

function choice(name: string, label: string, options: Record<string, string>): Markup {
  return html`<label>${label}<select name="${name}">${Object.entries(options).map(([value, text]) => html`<option value="${value}">${text}</option>`)}</select></label>`;
}

function button(act: string, text: string, fields: Record<string, string> = {}): Markup {
  return html`<form method="post" action="/_control/${act}">${Object.entries(fields).map(([name, value]) => html`<input type="hidden" name="${name}" value="${value}">`)}<button class="plain">${text}</button></form>`;
}

const short = (id: string): string => (id.length > 20 ? `${id.slice(0, 16)}…` : id);
