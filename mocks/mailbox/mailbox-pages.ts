import { html, Markup } from '../look/html.js';
import { page } from '../look/page.js';
import { summaryOf, type Mail, type Person } from './mail.js';
import { DOOR_MODES, type DoorMode } from './mail-door.js';
import { TEXT } from './text.js';

const when = (iso: string): string => iso.slice(0, 19).replace('T', ' ');
const written = (people: readonly Person[]): string => people.map((person) => (person.name ? `${person.name} <${person.address}>` : person.address)).join(', ');
const addressees = (mail: Mail): string => written(mail.to) || mail.envelope.to.join(', ');

export function listPage(mails: readonly Mail[], filterTo: string, mode: DoorMode): string {
  return page({
    title: TEXT.title,
    name: TEXT.name,
    strip: TEXT.strip,
    wide: true,
    body: html`<h1>${TEXT.title}</h1>
<p class="quiet">${TEXT.count(mails.length)}</p>
<form class="row" method="get" role="search"><label>${TEXT.filterTo}<input name="to" type="search" value="${filterTo}"></label><button class="plain">${TEXT.filter}</button></form>
${filterTo && html`<p><a href="/">${TEXT.all}</a></p>`}
${mails.length === 0 ? emptyFace(filterTo) : html`<ul class="mails">${mails.map(row)}</ul>`}
${mails.length > 0 && html`<form method="post" action="/delete-all"><button class="plain">${TEXT.removeAll}</button></form>`}
${doorPart(mode)}`,
  });
}

function emptyFace(filterTo: string): Markup {
  return html`<div class="card"><p><b>${filterTo ? TEXT.noneFits(filterTo) : TEXT.empty}</b></p><p class="quiet">${TEXT.emptyHint}</p></div>`;
}

function row(mail: Mail): Markup {
  const files = summaryOf(mail).attachments;
  return html`<li><a href="/messages/${mail.id}"><b>${mail.subject || TEXT.noSubject}</b><time datetime="${mail.receivedAt}">${when(mail.receivedAt)}</time><span class="quiet">${addressees(mail)}</span><span class="quiet small">${files > 0 && TEXT.fileCount(files)}</span></a></li>`;
}

function doorPart(mode: DoorMode): Markup {
  return html`<h2>${TEXT.door}</h2><p class="quiet">${TEXT.doorHint}</p>
<div class="note${mode === 'accepting' ? ' good' : ' bad'}"><p>${TEXT.modeIs(TEXT.modes[mode])}</p></div>
<form class="row" method="post" action="/mode"><label>${TEXT.doorMode}<select name="mode">${DOOR_MODES.map((choice) => html`<option value="${choice}" ${choice === mode && html`selected`}>${TEXT.modes[choice]}</option>`)}</select></label><button class="plain">${TEXT.setMode}</button></form>`;
}

export function mailPage(mail: Mail): string {
  const lines: [string, string][] = [
    [TEXT.from, written(mail.from) || mail.envelope.from],
    [TEXT.to, addressees(mail)],
    [TEXT.cc, written(mail.cc)],
    [TEXT.replyTo, written(mail.replyTo)],
    [TEXT.received, when(mail.receivedAt)],
  ];
  return page({
    title: mail.subject || TEXT.noSubject,
    name: TEXT.name,
    strip: TEXT.strip,
    links: [{ href: '/', text: TEXT.back }],
    wide: true,
    body: html`<h1>${mail.subject || TEXT.noSubject}</h1>
<div class="card">${lines.filter(([, value]) => value !== '').map(([label, value]) => html`<p><span class="quiet">${label}</span> ${value}</p>`)}</div>
${filesPart(mail)}
${mail.html !== null && html`<h2>${TEXT.asPage}</h2><iframe title="${TEXT.asPage}" sandbox="allow-popups allow-popups-to-escape-sandbox" src="/messages/${mail.id}/html"></iframe>`}
<h2>${TEXT.asText}</h2>
${mail.text ? html`<pre>${linked(mail.text)}</pre>` : html`<p class="quiet">${mail.html === null ? TEXT.noBody : TEXT.noText}</p>`}
<details><summary>${TEXT.headers}</summary><pre>${mail.headers.map((header) => `${header.name}: ${header.value}\n`)}</pre></details>
<p><a href="/messages/${mail.id}/raw">${TEXT.source}</a></p>
<form method="post" action="/messages/${mail.id}/delete"><button class="plain">${TEXT.remove}</button></form>`,
  });
}

function filesPart(mail: Mail): Markup | false {
  return (
    mail.attachments.length > 0 &&
    html`<h2>${TEXT.files}</h2><ul>${mail.attachments.map((file, at) => html`<li><a href="/messages/${mail.id}/attachments/${at}">${file.name}</a> <span class="quiet">${file.type}, ${sizeText(file.bytes)}</span></li>`)}</ul>`
  );
}

const sizeText = (bytes: number): string => (bytes < 1000 ? `${bytes} B` : bytes < 1_000_000 ? `${(bytes / 1000).toFixed(1)} kB` : `${(bytes / 1_000_000).toFixed(1)} MB`);

/** Addresses in plain text become links; nothing else in it becomes anything. */
function linked(text: string): Markup[] {
  return text.split(/(https?:\/\/[^\s<>"']+[^\s<>"'.,;:!?)\]])/).map((part, at) => (at % 2 === 1 ? html`<a href="${part}" target="_blank" rel="noreferrer noopener">${part}</a>` : html`${part}`));
}

export function unknownPage(): string {
  return page({ title: TEXT.unknown, name: TEXT.name, strip: TEXT.strip, links: [{ href: '/', text: TEXT.back }], body: html`<h1>${TEXT.unknown}</h1><p>${TEXT.unknownHint}</p>` });
}
