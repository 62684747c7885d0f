export interface Person {
  name: string;
  address: string;
}
export interface Attachment {
  name: string;
  type: string;
  bytes: number;
  /** Shown inside the HTML rather than beside it. */
  inline: boolean;
  contentBase64: string;
}
/** A received mail, taken apart. What the envelope said is kept beside what the headers say. */
export interface Mail {
  id: string;
  receivedAt: string;
  envelope: { from: string; to: string[] };
  from: Person[];
  to: Person[];
  cc: Person[];
  replyTo: Person[];
  subject: string;
  sentAt: string | null;
  messageId: string | null;
  text: string | null;
  html: string | null;
  headers: { name: string; value: string }[];
  attachments: Attachment[];
  rawBase64: string;
}

export type MailSummary = Pick<Mail, 'id' | 'receivedAt' | 'envelope' | 'from' | 'to' | 'subject'> & { attachments: number };

export const summaryOf = (mail: Mail): MailSummary => ({
  id: mail.id, receivedAt: mail.receivedAt, envelope: mail.envelope, from: mail.from, to: mail.to, subject: mail.subject, attachments: mail.attachments.length,
});

export interface MailFilter {
  /** Part of an address the mail was delivered to. */
  to?: string | undefined;
  subject?: string | undefined;
  /** Received after this moment (ISO 8601). */
  since?: string | undefined;
}

export function fits(mail: Mail, filter: MailFilter): boolean {
  const within = (part: string | undefined, texts: readonly string[]) => part === undefined || texts.some((text) => text.toLowerCase().includes(part.toLowerCase()));
  return within(filter.to, [...mail.envelope.to, ...mail.to.map((person) => person.address)]) && within(filter.subject, [mail.subject]) && (filter.since === undefined || mail.receivedAt > filter.since);
}
