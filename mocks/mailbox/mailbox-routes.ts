import type { FastifyInstance, FastifyReply } from 'fastify';
import { isFromHere } from '../from-here.js';
import { PAGE_HEADERS } from '../look/page.js';
import { summaryOf, type Mail, type MailFilter } from './mail.js';
import { DOOR_MODES, type DoorMode, type MailDoor } from './mail-door.js';
import type { MailStore } from './mail-store.js';
import { listPage, mailPage, unknownPage } from './mailbox-pages.js';

type Id = { Params: { id: string; at?: string } };
type Search = { Querystring: { to?: string; subject?: string; since?: string; wait?: string } };

const LONGEST_WAIT_MS = 30_000;
/** A mail's own HTML: nothing runs, nothing is fetched; links open outside the frame. */
const MAIL_HTML_POLICY = "default-src 'none'; img-src data:; style-src 'unsafe-inline'; font-src data:; base-uri 'none'; form-action 'none'; frame-ancestors 'self'; sandbox allow-popups allow-popups-to-escape-sandbox";

export function mailboxRoutes(app: FastifyInstance, store: MailStore, door: MailDoor): void {
  app.addContentTypeParser('application/x-www-form-urlencoded', { parseAs: 'string' }, (_request, body, done) => done(null, Object.fromEntries(new URLSearchParams(String(body)))));
  app.addHook('onRequest', async (request, reply) => {
    void reply.headers(PAGE_HEADERS);
    if (request.method !== 'GET' && !isFromHere(request)) await reply.status(403).send({ error: 'The mailbox answers its own page and programs on this machine only.' });
  });

  app.get<Search>('/', async (request, reply) => page(reply, 200, listPage(store.newestFirst({ to: request.query.to || undefined }), request.query.to ?? '', door.mode)));
  app.get<Id>('/messages/:id', async (request, reply) => withMail(request.params.id, reply, (mail) => page(reply, 200, mailPage(mail))));
  app.get<Id>('/messages/:id/html', async (request, reply) =>
    withMail(request.params.id, reply, (mail) =>
      reply.header('content-security-policy', MAIL_HTML_POLICY).type('text/html; charset=utf-8').send(`<!doctype html><base target="_blank"><meta name="referrer" content="no-referrer">${mail.html ?? ''}`),
    ),
  );
  app.get<Id>('/messages/:id/raw', async (request, reply) => withMail(request.params.id, reply, (mail) => reply.type('text/plain; charset=utf-8').send(Buffer.from(mail.rawBase64, 'base64'))));
  app.get<Id>('/messages/:id/attachments/:at', async (request, reply) =>
    withMail(request.params.id, reply, (mail) => {
      const file = mail.attachments[Number(request.params.at)];
      if (!file) return page(reply, 404, unknownPage());
      return reply
        .header('content-disposition', `attachment; filename*=UTF-8''${encodeURIComponent(file.name).replace(/['()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`)}`)
        .type(file.type)
        .send(Buffer.from(file.contentBase64, 'base64'));
    }),
  );
  app.post<Id>('/messages/:id/delete', async (request, reply) => {
    store.remove(request.params.id);
    return reply.redirect('/', 303);
  });
  app.post('/delete-all', async (_request, reply) => {
    store.clear();
    return reply.redirect('/', 303);
  });
  app.post<{ Body: { mode?: string } | null }>('/mode', async (request, reply) => {
    const mode = DOOR_MODES.find((known) => known === request.body?.mode);
    if (mode) await door.setMode(mode);
    return reply.redirect('/', 303);
  });

  app.get<Search>('/api/messages', async (request) => {
    const { to, subject, since, wait } = request.query;
    const filter: MailFilter = { to: to || undefined, subject: subject || undefined, since: since || undefined };
    const mails = await store.waitFor(filter, Math.min(LONGEST_WAIT_MS, Number(wait) || 0));
    return { count: mails.length, messages: mails.map(summaryOf) };
  });
  app.delete('/api/messages', async () => {
    store.clear();
    return { ok: true };
  });
  app.get<Id>('/api/messages/:id', async (request, reply) => {
    const mail = store.find(request.params.id);
    return mail ? detailOf(mail) : reply.status(404).send({ error: 'No such mail.' });
  });
  app.delete<Id>('/api/messages/:id', async (request, reply) => (store.remove(request.params.id) ? { ok: true } : reply.status(404).send({ error: 'No such mail.' })));
  app.get('/api/door', async () => ({ mode: door.mode, port: door.port }));
  app.post<{ Body: { mode?: DoorMode } | null }>('/api/door', async (request, reply) => {
    const mode = DOOR_MODES.find((known) => known === request.body?.mode);
    if (!mode) return reply.status(400).send({ error: `mode must be one of ${DOOR_MODES.join(', ')}.` });
    await door.setMode(mode);
    return { mode: door.mode, port: door.port };
  });

  function withMail(id: string, reply: FastifyReply, work: (mail: Mail) => FastifyReply): FastifyReply {
    const mail = store.find(id);
    return mail ? work(mail) : page(reply, 404, unknownPage());
  }
}

function page(reply: FastifyReply, status: number, text: string): FastifyReply {
  return reply.status(status).type('text/html; charset=utf-8').send(text);
}

/** A mail as the API gives it; the files are fetched under their own address. */
function detailOf(mail: Mail): object {
  return {
    ...mail,
    rawBase64: undefined,
    attachments: mail.attachments.map((file, at) => ({ name: file.name, type: file.type, bytes: file.bytes, inline: file.inline, url: `/messages/${mail.id}/attachments/${at}` })),
  };
}
