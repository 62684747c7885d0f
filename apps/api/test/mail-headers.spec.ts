import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { startMailbox, type Mailbox } from '../../../mocks/mailbox/start-mailbox.js';
import { SmtpMailer } from '../src/outbox/mailer.js';

let mailbox: Mailbox;
let mailer: SmtpMailer;
beforeAll(async () => {
  mailbox = await startMailbox();
  mailer = new SmtpMailer(`smtp://127.0.0.1:${mailbox.smtp.port}`, 'Shop <shop@shop.test>');
});
afterAll(async () => {
  mailer.close();
  await mailbox.close();
});

const sent = async (more: { to?: string; subject?: string; filename?: string }) => {
  mailbox.clear();
  await mailer.send({
    to: more.to ?? 'h.brandt@customers.test',
    subject: more.subject ?? 'Job J2026-0001 received',
    text: 'Words.\n.\nMore words.\n',
    html: '<p>Words.</p>',
    messageId: '<1@loopbay.invalid>',
    attachments: [{ filename: more.filename ?? 'quote.pdf', content: Buffer.from('%PDF-1.7'), contentType: 'application/pdf' }],
  });
  const mail = await mailbox.waitForMail();
  return { mail, names: mail.headers.map((h) => h.name.toLowerCase()), raw: Buffer.from(mail.rawBase64, 'base64').toString('utf8') };
};

describe('a mail on its way to the mail server', () => {
  it.each(['Evil\r\nBcc: all@evil.test', 'Evil\nX-Evil: yes', 'Evil\rX-Evil: yes', 'Evil\r\n\r\n<script>', `${'long '.repeat(400)}\r\nBcc: all@evil.test`])('has no header more for a subject like %j', async (subject) => {
    const plain = await sent({});
    const hostile = await sent({ subject });
    expect(hostile.names.sort()).toEqual(plain.names.sort());
    expect(hostile.mail.envelope.to).toEqual(['h.brandt@customers.test']);
    expect(hostile.mail.text).toContain('More words.');
  });

  it('has no header more for a file called like one', async () => {
    const plain = await sent({});
    const hostile = await sent({ filename: 'a.pdf"\r\nX-Evil: yes\r\n\r\n<script>.pdf' });
    expect(hostile.names.sort()).toEqual(plain.names.sort());
    expect(hostile.raw).not.toMatch(/^X-Evil/im);
    expect(hostile.mail.attachments).toHaveLength(1);
  });

  it('goes to one person, and names nobody in hidden copies', async () => {
    const { mail, names } = await sent({});
    expect(mail.envelope).toEqual({ from: 'shop@shop.test', to: ['h.brandt@customers.test'] });
    expect(names).not.toContain('bcc');
    expect(names).not.toContain('x-mailer');
  });
});
