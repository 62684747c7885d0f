import nodemailer, { type Transporter } from 'nodemailer';

export interface OutgoingMail {
  readonly to: string;
  readonly subject: string;
  readonly text: string;
  readonly html: string;
  readonly messageId: string;
  readonly attachments: readonly { readonly filename: string; readonly content: Buffer; readonly contentType: string }[];
}

/** The shop's mail server. */
export abstract class Mailer {
  abstract send(mail: OutgoingMail): Promise<void>;
  abstract close(): void;
}

export class SmtpMailer extends Mailer {
  private readonly transport: Transporter;

  constructor(
    smtpUrl: string,
    private readonly from: string,
  ) {
    super();
    const url = new URL(smtpUrl);
    const loopback = ['127.0.0.1', 'localhost', '[::1]'].includes(url.hostname);
    this.transport = nodemailer.createTransport({
      host: url.hostname,
      port: Number(url.port || 587),
      secure: url.protocol === 'smtps:',
      ignoreTLS: loopback,
      requireTLS: !loopback && url.protocol !== 'smtps:',
      ...(url.username ? { auth: { user: decodeURIComponent(url.username), pass: decodeURIComponent(url.password) } } : {}),
      connectionTimeout: 10_000,
      greetingTimeout: 10_000,
      socketTimeout: 20_000,
    });
  }

  async send(mail: OutgoingMail): Promise<void> {
    await this.transport.sendMail({ from: this.from, ...mail, attachments: mail.attachments.map((a) => ({ ...a })) });
  }

  override close(): void {
    this.transport.close();
  }
}
