import Fastify from 'fastify';
import type { AddressInfo } from 'node:net';
import { KeptFile } from '../kept-file.js';
import { lookRoutes } from '../look/look-routes.js';
import type { Mail, MailFilter } from './mail.js';
import { MailDoor, type DoorMode } from './mail-door.js';
import { MailStore } from './mail-store.js';
import { mailboxRoutes } from './mailbox-routes.js';
import { parseMail } from './parse-mail.js';

export interface MailboxOptions {
  host?: string;
  /** 0 or nothing: a free port. */
  smtpPort?: number;
  httpPort?: number;
  /** Kept on disk here; without it, in memory only. */
  stateDir?: string | undefined;
}

export interface Mailbox {
  smtp: { port: number };
  http: { port: number; url: string };
  mails(filter?: MailFilter): Mail[];
  /** The newest mail that fits, waiting for it if need be. */
  waitForMail(filter?: MailFilter, withinMs?: number): Promise<Mail>;
  clear(): void;
  /** Let the mail server accept, refuse, stall or be switched off. */
  setMode(mode: DoorMode): Promise<void>;
  close(): Promise<void>;
}

/** Start the demo mailbox: an SMTP server that delivers to nobody, and pages to read what came. */
export async function startMailbox(options: MailboxOptions = {}): Promise<Mailbox> {
  const host = options.host ?? '127.0.0.1';
  const file = new KeptFile<Mail[]>(options.stateDir, 'mailbox.json');
  let kept = file.read() ?? [];
  const store = new MailStore(kept, (mails) => {
    kept = mails;
    file.writeSoon(() => kept);
  });
  const door = new MailDoor(host, async (raw, envelope) => store.add(await parseMail(raw, envelope, new Date())));
  await door.open(options.smtpPort ?? 0);

  const app = Fastify({ logger: false, forceCloseConnections: true });
  lookRoutes(app);
  mailboxRoutes(app, store, door);
  await app.listen({ host, port: options.httpPort ?? 0 });
  const { port } = app.server.address() as AddressInfo;

  return {
    smtp: { port: door.port },
    http: { port, url: `http://${host}:${port}` },
    mails: (filter) => store.newestFirst(filter),
    async waitForMail(filter = {}, withinMs = 10_000) {
      const mail = (await store.waitFor(filter, withinMs))[0];
      if (!mail) throw new Error(`No mail came within ${withinMs} ms: ${JSON.stringify(filter)}`);
      return mail;
    },
    clear: () => store.clear(),
    setMode: (mode) => door.setMode(mode),
    async close() {
      await door.close();
      await app.close();
      file.writeNow(kept);
    },
  };
}
