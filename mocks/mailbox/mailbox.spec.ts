import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createTransport, type Transporter } from 'nodemailer';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import type { MailSummary } from './mail.js';
import { parseMail } from './parse-mail.js';
import { startMailbox, type Mailbox } from './start-mailbox.js';

const sender = (box: Mailbox): Transporter => createTransport({ host: '127.0.0.1', port: box.smtp.port, ignoreTLS: true, greetingTimeout: 300 });

describe('the demo mailbox', () => {
  let box: Mailbox;
  let post: Transporter;
  beforeEach(async () => {
    box = await startMailbox();
    post = sender(box);
  });
  afterEach(async () => {
    post.close();
    await box.close();
  });
  const get = async (path: string): Promise<unknown> => (await fetch(`${box.http.url}${path}`)).json();
  const list = async (query = ''): Promise<{ count: number; messages: MailSummary[] }> => JSON.parse(await (await fetch(`${box.http.url}/api/messages${query}`)).text());
  const invoice = {
    from: '"Motorenwerk Müller" <shop@example.com>',
    to: 'Plant Office <office@example.com>, second@example.com',
    replyTo: 'desk@example.com',
    subject: 'Invoice 42 — Prüfung',
    text: 'Good day,\nlook here: http://127.0.0.1:3000/portal/42.',
    html: '<p>Good day, <a href="http://127.0.0.1:3000/portal/42">look here</a></p><script>document.title="x"</script>',
    attachments: [{ filename: 'Rechnung Ü 42.pdf', content: Buffer.from('%PDF-1.7\nbytes\0\xff', 'latin1') }],
  };

  it('takes a mail apart: people, subject, both texts and the files', async () => {
    await post.sendMail(invoice);
    const mail = await box.waitForMail({ to: 'office@example.com' });
    expect(mail).toMatchObject({
      from: [{ name: 'Motorenwerk Müller', address: 'shop@example.com' }],
      to: [{ name: 'Plant Office', address: 'office@example.com' }, { name: '', address: 'second@example.com' }],
      replyTo: [{ address: 'desk@example.com' }],
      envelope: { from: 'shop@example.com', to: ['office@example.com', 'second@example.com'] },
      subject: 'Invoice 42 — Prüfung',
    });
    expect(mail.text?.trim()).toBe(invoice.text);
    expect(mail.html).toContain('look here</a>');
    const file = await fetch(`${box.http.url}/messages/${mail.id}/attachments/0`);
    expect(Buffer.from(await file.arrayBuffer())).toEqual(invoice.attachments[0]?.content);
    expect(file.headers.get('content-disposition')).toBe("attachment; filename*=UTF-8''Rechnung%20%C3%9C%2042.pdf");
  });

  it('lists newest first, by addressee, and waits for a mail that is still to come', async () => {
    await post.sendMail({ ...invoice, to: 'a@example.com', subject: 'first' });
    const waiting = list('?to=b@example.com&wait=5000');
    await post.sendMail({ ...invoice, to: 'b@example.com', subject: 'second' });
    expect(await waiting).toMatchObject({ count: 1, messages: [{ subject: 'second', attachments: 1 }] });
    const all = await list();
    expect(all.messages.map((mail) => mail.subject)).toEqual(['second', 'first']);
    expect((await list('?to=nobody')).count).toBe(0);
    const one = await get(`/api/messages/${all.messages[1]?.id}`);
    expect(one).toMatchObject({ subject: 'first', attachments: [{ name: 'Rechnung Ü 42.pdf', type: 'application/pdf' }] });
    expect(one).not.toHaveProperty('rawBase64');
  });

  it('shows a mail without letting anything in it run', async () => {
    await post.sendMail(invoice);
    const { id } = await box.waitForMail();
    const page = await (await fetch(`${box.http.url}/messages/${id}`)).text();
    expect(page).toContain('Invoice 42 — Prüfung');
    expect(page).toMatch(/<iframe [^>]*sandbox="allow-popups allow-popups-to-escape-sandbox"/);
    expect(page).toContain('<a href="http://127.0.0.1:3000/portal/42" target="_blank" rel="noreferrer noopener">');
    const inside = await fetch(`${box.http.url}/messages/${id}/html`);
    expect(inside.headers.get('content-security-policy')).toMatch(/default-src 'none'.*sandbox/);
    expect((await fetch(`${box.http.url}/messages/none`)).status).toBe(404);
  });

  it('says so when nothing has come, and deletes one or all', async () => {
    expect(await (await fetch(box.http.url)).text()).toContain('No mail has come yet');
    await post.sendMail(invoice);
    await post.sendMail(invoice);
    const [newest] = box.mails();
    expect((await fetch(`${box.http.url}/api/messages/${newest?.id}`, { method: 'DELETE' })).status).toBe(200);
    expect(box.mails()).toHaveLength(1);
    await fetch(`${box.http.url}/api/messages`, { method: 'DELETE' });
    expect(box.mails()).toEqual([]);
    const foreign = await fetch(`${box.http.url}/api/messages`, { method: 'DELETE', headers: { origin: 'http://elsewhere.example' } });
    expect(foreign.status).toBe(403);
  });

  it.each([
    ['refusing', { responseCode: 550 }],
    ['busy', { responseCode: 451 }],
    ['silent', { code: 'ETIMEDOUT' }],
    ['down', { code: 'ECONNREFUSED' }],
  ] as const)('can be %s, and works again afterwards on the same port', async (mode, error) => {
    const { port } = box.smtp;
    await fetch(`${box.http.url}/api/door`, { method: 'POST', body: JSON.stringify({ mode }), headers: { 'content-type': 'application/json' } });
    await expect(post.sendMail(invoice)).rejects.toMatchObject(mode === 'down' ? { message: expect.stringContaining(error.code) } : error);
    expect(box.mails()).toEqual([]);
    await box.setMode('accepting');
    expect(await get('/api/door')).toEqual({ mode: 'accepting', port });
    await sender(box).sendMail(invoice);
    expect(box.mails()).toHaveLength(1);
  });

  it('keeps its mails through a restart when it has a folder', async () => {
    const stateDir = await mkdtemp(join(tmpdir(), 'mailbox-'));
    const first = await startMailbox({ stateDir });
    await sender(first).sendMail(invoice);
    await first.close();
    const second = await startMailbox({ stateDir });
    expect(second.mails().map((mail) => mail.subject)).toEqual([invoice.subject]);
    await second.close();
    await rm(stateDir, { recursive: true });
  });
});

describe('a raw message', () => {
  // Forms of RFC 2045-2047 and RFC 5322: folded headers, encoded words, quoted-printable, base64, nested multiparts.
  it('is read whatever its encoding', async () => {
    const raw = [
      'From: =?iso-8859-1?Q?J=F6rg?= <j@example.com>',
      'To: Crew: a@example.com, =?utf-8?B?QsO2cnNl?= <b@example.com>;',
      'Subject: =?utf-8?Q?Kern=C2=ADpr?= =?utf-8?Q?=C3=BCfung?=',
      ' vor dem Ausbrennen',
      'MIME-Version: 1.0',
      'Content-Type: multipart/mixed; boundary=outer',
      '',
      '--outer',
      'Content-Type: multipart/alternative; boundary=inner',
      '',
      '--inner',
      'Content-Type: text/plain; charset=iso-8859-1',
      'Content-Transfer-Encoding: quoted-printable',
      '',
      'Verlust 4,2 W/kg, =FCber dem Grenzwert; eine lange Zeile, die weich umbro=',
      'chen ist.',
      '--inner',
      'Content-Type: text/html; charset=utf-8',
      'Content-Transfer-Encoding: base64',
      '',
      Buffer.from('<p>über</p>').toString('base64'),
      '--inner--',
      '--outer',
      'Content-Type: text/csv; name="a.csv"',
      'Content-Disposition: attachment; filename="a.csv"',
      '',
      'x;y',
      '--outer--',
    ].join('\r\n');
    const mail = await parseMail(Buffer.from(raw), { from: 'j@example.com', to: ['a@example.com'] }, new Date(0));
    expect(mail).toMatchObject({
      from: [{ name: 'Jörg' }],
      to: [{ address: 'a@example.com' }, { name: 'Börse', address: 'b@example.com' }],
      subject: 'Kern\u00adprüfung vor dem Ausbrennen',
      attachments: [{ name: 'a.csv', type: 'text/csv' }],
    });
    expect(mail.text?.trim()).toBe('Verlust 4,2 W/kg, über dem Grenzwert; eine lange Zeile, die weich umbrochen ist.');
    expect(mail.html).toBe('<p>über</p>');
  });
});
