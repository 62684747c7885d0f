import { html, type Markup } from '../../look/html.js';
import { page } from '../../look/page.js';
import { TEST_ACCOUNTS } from '../cards/test-accounts.js';
import { TEST_CARDS, type TestCard } from '../cards/test-cards.js';
import { moneyText } from '../objects/money.js';
import type { LineItem, Session } from '../objects/stored.js';
import type { Typed, Wrong } from './read-form.js';
import { TEXT } from './text.js';

export interface PayFace {
  session: Session;
  lines: readonly LineItem[];
  description: string | null;
  typed: Typed;
  wrong: Wrong;
  /** What went wrong with the whole try, in words. */
  failure?: string | undefined;
  filled?: string | undefined;
  bankOpen?: boolean;
}

export const sumOf = (session: Session): string => moneyText(session.amount_total ?? 0, session.currency ?? 'usd');

export function payPage(face: PayFace): string {
  const { session } = face;
  const sum = sumOf(session);
  const takesCards = session.payment_method_types.includes('card');
  const takesDebits = session.payment_method_types.includes('us_bank_account');
  return frame(
    TEXT.title(sum),
    html`
${orderCard(face, sum)}
${face.failure && html`<div class="note bad" role="alert"><p><b>${TEXT.lastTry}</b></p><p>${face.failure}</p></div>`}
${face.filled && html`<div class="note" role="status"><p>${TEXT.filled(face.filled)}</p></div>`}
${session.amount_total === 0 ? freeForm(face) : [takesCards && cardForm(face, sum), takesDebits && bankForm(face, sum)]}`,
  );
}

function orderCard({ session, lines, description }: PayFace, sum: string): Markup {
  const reference = session.client_reference_id;
  return html`<h1 class="quiet small">${TEXT.payTo}</h1>
<p class="sum">${sum}</p>
${description && html`<p>${description}</p>`}
<div class="card"><dl class="lines">
${lines.map((line) => html`<div><dt>${(line.quantity ?? 1) > 1 && `${TEXT.quantity(line.quantity ?? 1)} `}${line.description}</dt><dd>${moneyText(line.amount_total, line.currency)}</dd></div>`)}
${reference && html`<div><dt class="quiet">${TEXT.reference}</dt><dd class="quiet">${reference}</dd></div>`}
</dl></div>`;
}

function field(face: PayFace, name: keyof Typed, label: string, attributes: Markup, hint?: string, id: string = name): Markup {
  const wrong = face.wrong[name];
  const about = [wrong && `${id}-wrong`, hint && `${id}-hint`].filter(Boolean).join(' ');
  return html`<div><label for="${id}">${label}</label>
<input id="${id}" name="${name}" value="${face.typed[name]}" ${attributes} ${wrong && html`aria-invalid="true"`} ${about && html`aria-describedby="${about}"`}>
${wrong && html`<p class="wrong" id="${id}-wrong">${wrong}</p>`}
${hint && html`<p class="hint" id="${id}-hint">${hint}</p>`}</div>`;
}

function emailField(face: PayFace, id: string): Markup {
  const fixed = face.session.customer_email;
  return field(
    fixed ? { ...face, typed: { ...face.typed, email: fixed } } : face,
    'email', TEXT.email, html`type="email" inputmode="email" autocomplete="email" required ${fixed && html`readonly`}`, undefined, id,
  );
}

function cardForm(face: PayFace, sum: string): Markup {
  return html`<form method="post" id="pay">
<input type="hidden" name="method" value="card">
${emailField(face, 'email')}
${field(face, 'number', TEXT.number, html`inputmode="numeric" autocomplete="off" required maxlength="23"`, TEXT.numberHint)}
<div class="pair">
${field(face, 'expiry', TEXT.expiry, html`inputmode="text" autocomplete="off" required maxlength="9"`)}
${field(face, 'cvc', TEXT.cvc, html`inputmode="numeric" autocomplete="off" required maxlength="4"`)}
</div>
${field(face, 'name', TEXT.holder, html`autocomplete="off" required maxlength="200"`)}
<button class="full">${TEXT.pay(sum)}</button>
${backLink(face)}
<h2>${TEXT.testCards}</h2>
<p class="quiet small">${TEXT.testCardsHint}</p>
<ul class="cards">${TEST_CARDS.filter((card) => card.listed).map(cardButton)}</ul>
</form>`;
}

const cardButton = (card: TestCard): Markup =>
  html`<li><button name="fill" value="${card.number}" formnovalidate><b>${spaced(card.number)}</b><span>${card.listed}</span></button></li>`;

export const spaced = (number: string): string => (number.length === 15 ? number.replace(/^(\d{4})(\d{6})(\d{5})$/, '$1 $2 $3') : number.replace(/(\d{4})(?=\d)/g, '$1 '));

function bankForm(face: PayFace, sum: string): Markup {
  return html`<details ${(face.bankOpen || !face.session.payment_method_types.includes('card')) && html`open`}>
<summary>${TEXT.bank}</summary>
<p class="quiet small">${TEXT.bankHint}</p>
<form method="post">
<input type="hidden" name="method" value="bank">
${emailField(face, 'bank-email')}
${field(face, 'account', TEXT.account, html`inputmode="numeric" autocomplete="off" required maxlength="17"`)}
${field(face, 'name', TEXT.holderOfAccount, html`autocomplete="off" required maxlength="200"`, undefined, 'bank-name')}
<button class="full">${TEXT.payByBank(sum)}</button>
${backLink(face)}
<p class="hint">${TEXT.testAccountsHint}</p>
<ul class="cards">${TEST_ACCOUNTS.map((account) => html`<li><button name="fill" value="${account.number}" formnovalidate><b>${account.number}</b><span>${account.listed}</span></button></li>`)}</ul>
</form></details>`;
}

const freeForm = (face: PayFace): Markup => html`<div class="note"><p>${TEXT.freeNote}</p></div>
<form method="post"><input type="hidden" name="method" value="free">${emailField(face, 'email')}<button class="full">${TEXT.free}</button>${backLink(face)}</form>`;

const backLink = (face: PayFace): Markup | null => (face.session.cancel_url ? html`<p class="back"><a href="${face.session.cancel_url}">${TEXT.back}</a></p>` : null);

export function frame(title: string, body: Markup, name: string = TEXT.name): string {
  return page({ title, name, strip: TEXT.strip, body });
}

/** A page that only says how things stand, with one way on. */
export function standing(title: string, text: string, link?: { href: string; text: string } | null): string {
  return frame(title, html`<h1>${title}</h1><p>${text}</p>${link && html`<p><a href="${link.href}">${link.text}</a></p>`}`);
}
