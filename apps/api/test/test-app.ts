import { Test } from '@nestjs/testing';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { Role } from '@shared/roles';
import type { Logger } from 'pino';
import request from 'supertest';
import { AppModule } from '../src/app.module.js';
import { house } from '../src/auth/actor.js';
import { Clock, SteppingClock } from '../src/clock/clock.js';
import type { Config } from '../src/config/config.js';
import { migrate } from '../src/database/migrate.js';
import { UnitOfWork } from '../src/database/unit-of-work.js';
import { PinoNestLogger } from '../src/http/logger.js';
import { createAdapter, setup } from '../src/http/setup.js';
import { Ids } from '../src/ids/ids.js';
import { Mailer, type OutgoingMail } from '../src/outbox/mailer.js';
import { OutboxWorker } from '../src/outbox/outbox.worker.js';
import { User } from '../src/users/user.entity.js';
import { hashPassword } from '../src/auth/password.js';
import { temporaryDataDir } from './temporary-shop.js';

export const TEST_PASSWORD = 'correct horse battery';
const ORIGIN = 'http://shop.test';
let passwordHash: Promise<string> | undefined;

/** Keeps what would have been mailed. */
export class KeptMail extends Mailer {
  readonly sent: OutgoingMail[] = [];
  down = false;
  async send(mail: OutgoingMail): Promise<void> {
    if (this.down) throw new Error('connect ECONNREFUSED');
    this.sent.push(mail);
  }
  override close(): void {}
}

export const testConfig = (dataDir: string, more: Partial<Config> = {}): Config => ({
  demo: false,
  host: '127.0.0.1',
  port: 0,
  publicUrl: ORIGIN,
  dataDir,
  webRoot: undefined,
  jwtSecret: 'a secret for tests, long enough to be one',
  smtpUrl: 'smtp://127.0.0.1:1',
  mailFrom: 'Shop <shop@shop.test>',
  stripe: { secretKey: 'sk_test_shop', webhookSecret: 'whsec_test_shop', apiUrl: 'http://127.0.0.1:1' },
  mailboxUrl: undefined,
  timeZone: 'Europe/Berlin',
  logLevel: 'silent',
  ...more,
});

type Verb = 'get' | 'post' | 'put' | 'delete' | 'patch';

/** A signed-in person (or nobody) talking to the API as a browser on our own page would. */
export class Person {
  constructor(
    private readonly app: NestFastifyApplication,
    readonly userId: string | null,
    private readonly cookie: string | null,
  ) {}

  /** what the browser sends along by itself */
  carries(): Record<string, string> {
    return this.cookie ? { cookie: this.cookie } : {};
  }
  private call(verb: Verb, path: string) {
    const r = request(this.app.getHttpServer())[verb](path).set('origin', ORIGIN);
    return this.cookie ? r.set('cookie', this.cookie) : r;
  }
  get(path: string) {
    return this.call('get', path);
  }
  post(path: string, body?: object, key?: string) {
    const r = this.call('post', path);
    return (key ? r.set('idempotency-key', key) : r).send(body);
  }
  put(path: string, body?: object) {
    return this.call('put', path).send(body);
  }
  delete(path: string) {
    return this.call('delete', path);
  }
}

export interface TestShop {
  readonly app: NestFastifyApplication;
  readonly clock: SteppingClock;
  readonly mail: KeptMail;
  readonly config: Config;
  readonly nobody: Person;
  /** makes a user with these roles and signs in */
  person(roles: Role[], options?: { customerId?: string; name?: string; email?: string }): Promise<Person>;
  /** sends what the outbox holds */
  postman(): Promise<number>;
  close(): Promise<void>;
}

/** The whole application on a database file of its own, with a clock that is told what time it is and mail that is kept. */
export async function openTestShop(more: Partial<Config> = {}, logger?: Logger): Promise<TestShop> {
  process.env['GRACE_MS'] = '100';
  const { dataDir, remove } = temporaryDataDir();
  const config = testConfig(dataDir, more);
  await migrate(dataDir, '2026-01-01T00:00:00.000Z');
  const clock = new SteppingClock(new Date('2026-03-02T09:00:00.000Z'));
  const mail = new KeptMail();
  const module = await Test.createTestingModule({ imports: [AppModule.register(config)] })
    .overrideProvider(Clock)
    .useValue(clock)
    .overrideProvider(Mailer)
    .useValue(mail)
    .compile();
  const app = module.createNestApplication<NestFastifyApplication>(createAdapter(logger ?? false), { rawBody: true, logger: logger ? new PinoNestLogger(logger) : false });
  await setup(app, config);
  await app.init();
  await app.getHttpAdapter().getInstance().ready();
  let made = 0;
  return {
    app,
    clock,
    mail,
    config,
    nobody: new Person(app, null, null),
    async person(roles, options = {}) {
      made += 1;
      const email = options.email ?? `${roles.join('-')}${made}@shop.test`;
      const id = app.get(Ids).next();
      passwordHash ??= hashPassword(TEST_PASSWORD);
      const hash = await passwordHash;
      await app.get(UnitOfWork).run((manager) =>
        manager.insert(User, { id, email, name: options.name ?? `${roles[0]} ${made}`, passwordHash: hash, roles, customerId: options.customerId ?? null, units: 'si', theme: 'system', disabledAt: null, createdAt: clock.iso(), version: 1 }),
      );
      const answer = await request(app.getHttpServer()).post('/api/session').set('origin', ORIGIN).send({ email, password: TEST_PASSWORD });
      const cookie = String(answer.headers['set-cookie']).split(';')[0]!;
      return new Person(app, id, cookie);
    },
    async postman() {
      // a round that is under way may have begun before the last promise was given: it is let go by, then all that is left goes
      const underWay = await app.get(OutboxWorker).drain();
      return underWay + (await app.get(OutboxWorker).drain());
    },
    async close() {
      await app.close();
      remove();
    },
  };
}

export { house };
