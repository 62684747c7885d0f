import { randomUUID } from 'node:crypto';
import { simpleParser, type AddressObject, type EmailAddress } from 'mailparser';
import type { Mail, Person } from './mail.js';

/** Take a raw message apart: encoded words, quoted-printable and base64, alternatives, attachments. */
export async function parseMail(raw: Buffer, envelope: Mail['envelope'], receivedAt: Date): Promise<Mail> {
  const parsed = await simpleParser(raw, { skipTextToHtml: true });
  return {
    id: randomUUID(),
    receivedAt: receivedAt.toISOString(),
    envelope,
    from: people(parsed.from),
    to: people(parsed.to),
    cc: people(parsed.cc),
    replyTo: people(parsed.replyTo),
    subject: parsed.subject ?? '',
    sentAt: parsed.date?.toISOString() ?? null,
    messageId: parsed.messageId ?? null,
    text: parsed.text ?? null,
    html: typeof parsed.html === 'string' ? parsed.html : null,
    headers: parsed.headerLines.map(({ key, line }) => ({ name: key, value: line.slice(line.indexOf(':') + 1).replace(/\r?\n\s*/g, ' ').trim() })),
    attachments: parsed.attachments.map((part, at) => ({
      name: part.filename ?? `part-${at + 1}`,
      type: part.contentType,
      bytes: part.content.length,
      inline: part.related === true,
      contentBase64: part.content.toString('base64'),
    })),
    rawBase64: raw.toString('base64'),
  };
}

function people(field: AddressObject | AddressObject[] | undefined): Person[] {
  const flat = (entry: EmailAddress): Person[] => (entry.group ? entry.group.flatMap(flat) : [{ name: entry.name, address: entry.address ?? '' }]);
  return [field ?? []].flat().flatMap((part) => part.value.flatMap(flat));
}
