import { randomUUID } from 'node:crypto';
import { existsSync } from 'node:fs';
import type { IncomingMessage } from 'node:http';
import { join } from 'node:path';
import fastifyCompress from '@fastify/compress';
import fastifyCookie from '@fastify/cookie';
import fastifyHelmet from '@fastify/helmet';
import fastifyMultipart from '@fastify/multipart';
import fastifyStatic from '@fastify/static';
import { FastifyAdapter, type NestFastifyApplication } from '@nestjs/platform-fastify';
import { DocumentBuilder, SwaggerModule } from '@nestjs/swagger';
import type { FastifyBaseLogger, FastifyReply, FastifyRequest, RawServerDefault } from 'fastify';
import type { Logger } from 'pino';
import { isSecure, sessionCookie } from '../auth/session-cookie.js';
import type { Config } from '../config/config.js';
import { answerNoAddress } from './no-address.js';
import { requestContext } from './request-context.js';
import { assertSameOrigin } from './same-origin.js';

export const WEBHOOK_PATH = '/api/payments/events';
/** Photos and purchase orders; larger than a phone's photo, smaller than a film. */
export const UPLOAD_LIMIT_BYTES = 15 * 1024 * 1024;

export function createAdapter(logger: Logger | false) {
  return new FastifyAdapter<RawServerDefault>({
    ...(logger ? { loggerInstance: logger as FastifyBaseLogger } : { logger: false }),
    requestIdHeader: false,
    genReqId: (req: IncomingMessage) => {
      const given = req.headers['x-request-id'];
      return typeof given === 'string' && /^[\w-]{1,64}$/.test(given) ? given : randomUUID();
    },
    bodyLimit: 512 * 1024,
    trustProxy: 'loopback',
    forceCloseConnections: 'idle',
    routerOptions: { maxParamLength: 200 },
    frameworkErrors: answerNoAddress,
  });
}

const CSP = {
  defaultSrc: ["'self'"],
  scriptSrc: ["'self'"],
  // Blueprint sets inline styles on its floating parts
  styleSrc: ["'self'", "'unsafe-inline'"],
  imgSrc: ["'self'", 'data:', 'blob:'],
  fontSrc: ["'self'"],
  connectSrc: ["'self'"],
  objectSrc: ["'none'"],
  frameAncestors: ["'none'"],
  baseUri: ["'none'"],
  formAction: ["'self'"],
};

export async function setup(app: NestFastifyApplication, config: Config): Promise<void> {
  const fastify = app.getHttpAdapter().getInstance();
  app.setGlobalPrefix('api');
  fastify.addHook('onRequest', (request, reply, done) => {
    reply.raw.setHeader('x-request-id', request.id);
    // files of the screens say otherwise for themselves; an address may be written in ways that a look at its beginning misses
    reply.header('cache-control', 'no-store');
    requestContext.run({ requestId: request.id }, done);
  });
  // after all the headers are set, before a byte of the body is read
  fastify.addHook('preParsing', (request, _reply, payload, done) => {
    try {
      assertSameOrigin({ method: request.method, path: request.url.split('?')[0]!, origin: request.headers.origin, host: request.headers.host }, config.publicUrl, WEBHOOK_PATH);
      done(null, payload);
    } catch (error) {
      done(error as Error);
    }
  });
  fastify.addHook('onSend', (_request, reply, payload, done) => {
    const type = reply.getHeader('content-type');
    if (typeof type === 'string' && /^(text\/|application\/javascript)/.test(type) && !type.includes('charset')) reply.header('content-type', `${type}; charset=utf-8`);
    done(null, payload);
  });
  // Connections that become idle after close() began would live on for the keep-alive time: sweep them, cut the rest after ten seconds.
  fastify.addHook('preClose', (done) => {
    setInterval(() => fastify.server.closeIdleConnections(), 50).unref();
    setTimeout(() => fastify.server.closeAllConnections(), Number(process.env['GRACE_MS'] ?? 10_000)).unref();
    done();
  });
  await app.register(fastifyCookie);
  await app.register(fastifyHelmet, {
    contentSecurityPolicy: { useDefaults: false, directives: CSP },
    strictTransportSecurity: isSecure(config.publicUrl) ? { maxAge: 31_536_000 } : false,
    referrerPolicy: { policy: 'same-origin' },
  });
  await app.register(fastifyMultipart, { limits: { fileSize: UPLOAD_LIMIT_BYTES, files: 1, fields: 10, fieldSize: 10_000 } });
  await app.register(fastifyCompress, { encodings: ['br', 'gzip'], threshold: 1024, customTypes: /^(application\/json|text\/(?!event-stream)[\w-]+|image\/svg\+xml)(;|$)/u });
  const description = new DocumentBuilder().setTitle('Loopbay').setDescription('The shop’s API. Every message has one contract, shared with the screens.').setVersion('1').addCookieAuth(sessionCookie(isSecure(config.publicUrl))).build();
  SwaggerModule.setup('api/docs', app, () => SwaggerModule.createDocument(app, description), { jsonDocumentUrl: 'api/docs-json' });
  if (config.webRoot && existsSync(join(config.webRoot, 'index.html'))) await serveWeb(app, config.webRoot);
  app.enableShutdownHooks([], { useProcessExit: true });
}

async function serveWeb(app: NestFastifyApplication, webRoot: string): Promise<void> {
  await app.register(fastifyStatic, { root: join(webRoot, 'assets'), prefix: '/assets/', decorateReply: false, index: false, preCompressed: true, immutable: true, maxAge: '365d' });
  await app.register(fastifyStatic, {
    root: webRoot,
    prefix: '/',
    wildcard: false,
    globIgnore: ['assets/**', '**/*.br', '**/*.gz'],
    index: false,
    preCompressed: true,
    cacheControl: false,
    setHeaders: (reply: { header?: (k: string, v: string) => void; setHeader?: (k: string, v: string) => void }) => (reply.setHeader ?? reply.header)?.call(reply, 'cache-control', 'no-cache'),
  });
  const page = (request: FastifyRequest, reply: FastifyReply) =>
    /^\/(api|assets)(\/|$|\?)/.test(request.url) || /\.[a-z0-9]+$/i.test(request.url.split('?')[0]!) ? reply.callNotFound() : reply.sendFile('index.html');
  app.getHttpAdapter().getInstance().route({ method: ['GET'], url: '/*', handler: page });
}
