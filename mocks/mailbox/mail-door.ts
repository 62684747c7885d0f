import type { AddressInfo } from 'node:net';
import { SMTPServer, type SMTPServerDataStream, type SMTPServerSession } from 'smtp-server';
import type { Mail } from './mail.js';

/**
 * `accepting`: mails come in. `refusing`: 550, for good. `busy`: 451, try later. `silent`: the line opens and nobody
 * speaks. `down`: nobody listens.
 */
export type DoorMode = 'accepting' | 'refusing' | 'busy' | 'silent' | 'down';
export const DOOR_MODES: readonly DoorMode[] = ['accepting', 'refusing', 'busy', 'silent', 'down'];

const LARGEST_MAIL = 25 * 1024 * 1024;

class Refusal extends Error {
  constructor(
    readonly responseCode: number,
    message: string,
  ) {
    super(message);
  }
}

/** The SMTP side of the mailbox. */
export class MailDoor {
  mode: DoorMode = 'accepting';
  port = 0;
  private server: SMTPServer | undefined;
  private silenced: (() => void)[] = [];

  constructor(
    private readonly host: string,
    private readonly receive: (raw: Buffer, envelope: Mail['envelope']) => Promise<void>,
  ) {}

  async open(port: number): Promise<void> {
    const server = new SMTPServer({
      authOptional: true,
      allowInsecureAuth: true,
      disabledCommands: ['STARTTLS'],
      disableReverseLookup: true,
      size: LARGEST_MAIL,
      closeTimeout: 200,
      onAuth: (auth, _session, done) => done(null, { user: auth.username ?? 'anyone' }),
      onConnect: (_session, done) => {
        if (this.mode === 'silent') this.silenced.push(() => done());
        else done();
      },
      onRcptTo: (_address, _session, done) => {
        if (this.mode === 'refusing') done(new Refusal(550, 'This mailbox refuses mail'));
        else if (this.mode === 'busy') done(new Refusal(451, 'This mailbox is busy, try again later'));
        else done();
      },
      onData: (stream, session, done) => {
        this.take(stream, session).then(
          () => done(),
          (error: unknown) => done(error instanceof Error ? error : new Error(String(error))),
        );
      },
    });
    // A caller that breaks off is the caller's affair.
    server.on('error', () => undefined);
    await new Promise<void>((resolve, reject) => {
      server.server.once('error', reject);
      server.listen(port, this.host, resolve);
    });
    this.port = (server.server.address() as AddressInfo).port;
    this.server = server;
  }

  async setMode(mode: DoorMode): Promise<void> {
    this.mode = mode;
    if (mode !== 'silent') for (const speak of this.silenced.splice(0)) speak();
    if (mode === 'down') await this.close();
    else if (!this.server) await this.open(this.port);
  }

  async close(): Promise<void> {
    const { server } = this;
    this.server = undefined;
    for (const speak of this.silenced.splice(0)) speak();
    if (server) await new Promise<void>((resolve) => server.close(() => resolve()));
  }

  private async take(stream: SMTPServerDataStream, session: SMTPServerSession): Promise<void> {
    const chunks: Buffer[] = [];
    for await (const chunk of stream) chunks.push(Buffer.from(chunk));
    if (stream.sizeExceeded) throw new Refusal(552, 'This mail is too large');
    const from = session.envelope.mailFrom ? session.envelope.mailFrom.address : '';
    await this.receive(Buffer.concat(chunks), { from, to: session.envelope.rcptTo.map((recipient) => recipient.address) });
  }
}
