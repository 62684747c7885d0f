import { Test } from '@nestjs/testing';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import type { Role } from '@shared/roles';
import { AppModule } from '../../apps/api/src/app.module.js';
import { hashPassword } from '../../apps/api/src/auth/password.js';
import { Session } from '../../apps/api/src/auth/session.entity.js';
import { Clock, SteppingClock } from '../../apps/api/src/clock/clock.js';
import type { Config } from '../../apps/api/src/config/config.js';
import { migrate } from '../../apps/api/src/database/migrate.js';
import { UnitOfWork } from '../../apps/api/src/database/unit-of-work.js';
import { createAdapter, setup } from '../../apps/api/src/http/setup.js';
import { Ids, TimeSortedIds } from '../../apps/api/src/ids/ids.js';
import { Mailer } from '../../apps/api/src/outbox/mailer.js';
import { OutboxWorker } from '../../apps/api/src/outbox/outbox.worker.js';
import { ShopService } from '../../apps/api/src/shop/shop.service.js';
import { User } from '../../apps/api/src/users/user.entity.js';
import { CUSTOMERS, TERMS, type CustomerKey } from './customers.js';
import { MACHINES } from './machines.js';
import { copyOlderBook } from './ovens.js';
import { SamplePerson } from './people.js';
import { script } from './script.js';
import { BAY, INSTRUMENTS, PROFILE } from './shop.js';
import { DEMO_PASSWORD, SECOND_TECHNICIAN, SIGN_INS } from './sign-ins.js';
import { Stage, type Cast } from './stage.js';
import { steadyRandom } from './steady-random.js';

const DAY_MS = 24 * 3_600_000;
const FIRST_DAY = -40;

export interface FillOptions {
  /** midnight UTC of the day the sample shop stands at */
  readonly seedDay: Date;
  /** set where the mails of the last weeks shall not leave, as in tests */
  readonly mailer?: Mailer;
  readonly tell?: (words: string) => void;
}

/** Fills an empty data folder with the sample shop, by playing its last five weeks through the real application. */
export async function fillSampleShop(config: Config, { seedDay, mailer, tell = () => undefined }: FillOptions): Promise<void> {
  await migrate(config.dataDir, seedDay.toISOString());
  const clock = new SteppingClock(new Date(seedDay.getTime() + FIRST_DAY * DAY_MS + 7 * 3_600_000));
  const building = Test.createTestingModule({ imports: [AppModule.register(config)] })
    .overrideProvider(Clock)
    .useValue(clock)
    .overrideProvider(Ids)
    .useValue(new TimeSortedIds(clock, steadyRandom('sample shop')));
  if (mailer) building.overrideProvider(Mailer).useValue(mailer);
  const app = (await building.compile()).createNestApplication<NestFastifyApplication>(createAdapter(false), { rawBody: true, logger: false });
  await setup(app, config);
  await app.init();
  await app.getHttpAdapter().getInstance().ready();
  try {
    const stage = new Stage(app, clock, seedDay, await hire(app, config, clock, seedDay));
    await furnish(app, stage);
    await copyOlderBook(stage);
    for (const scene of script(stage)) {
      stage.day(scene.day, scene.hour);
      await scene.play();
    }
    await customerUser(app, stage, clock);
    clock.set(new Date(seedDay.getTime() + 6 * 3_600_000));
    tell('Sending the mail of the last weeks to the mailbox');
    while ((await app.get(OutboxWorker).drain()) > 0);
  } finally {
    await app.close();
  }
}

async function addUser(app: NestFastifyApplication, clock: Clock, person: { role: Role; name: string; email: string }, customerId: string | null): Promise<void> {
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const user = { id: app.get(Ids).next(), email: person.email, name: person.name, passwordHash, roles: [person.role], customerId, units: 'si' as const, theme: 'system' as const, disabledAt: null, createdAt: clock.iso(), version: 1 };
  await app.get(UnitOfWork).run((manager) => manager.insert(User, user));
}

/** The staff, signed in for the five weeks that are played. */
async function hire(app: NestFastifyApplication, config: Config, clock: Clock, seedDay: Date): Promise<Cast> {
  const staff = [...SIGN_INS.filter((s) => s.role !== 'customer'), SECOND_TECHNICIAN];
  for (const person of staff) await addUser(app, clock, person, null);
  const signIn = (email: string) => SamplePerson.signIn(app, config.publicUrl, email, DEMO_PASSWORD);
  const of = (role: Role) => signIn(SIGN_INS.find((s) => s.role === role)!.email);
  const cast: Cast = { counter: await of('counter'), technician: await of('technician'), office: await of('office'), manager: await of('manager'), second: await signIn(SECOND_TECHNICIAN.email) };
  const expiresAt = new Date(seedDay.getTime() + DAY_MS).toISOString();
  await app.get(UnitOfWork).run((manager) => manager.createQueryBuilder().update(Session).set({ expiresAt }).execute());
  return cast;
}

async function furnish(app: NestFastifyApplication, stage: Stage): Promise<void> {
  await app.get(UnitOfWork).run(async (manager) => {
    await app.get(ShopService).write(manager, 'profile', { ...PROFILE, addressLines: [...PROFILE.addressLines] });
    await app.get(ShopService).write(manager, 'bay', BAY);
  });
  for (const { dueInDays, ...instrument } of INSTRUMENTS) {
    const { id } = await stage.cast.manager.post<{ id: string }>('/instruments', { ...instrument, calibratedOn: stage.date(dueInDays - 365), dueOn: stage.date(dueInDays) });
    stage.meters[instrument.kind] = id;
  }
  for (const [key, details] of Object.entries(CUSTOMERS) as [CustomerKey, (typeof CUSTOMERS)[CustomerKey]][]) {
    const { id } = await stage.cast.counter.post<{ id: string }>('/customers', details);
    stage.customers[key] = id;
  }
  for (const key of Object.keys(CUSTOMERS) as CustomerKey[]) {
    const terms = TERMS[key] ?? { terms: 'account', netDays: 30, creditStop: false };
    const { version } = await stage.cast.office.get<{ version: number }>(`/customers/${stage.customers[key]}`);
    await stage.cast.office.put(`/customers/${stage.customers[key]}/terms`, { version, ...terms });
  }
  for (const [number, machine] of Object.entries(MACHINES)) {
    const { id } = await stage.cast.counter.post<{ id: string }>(`/customers/${stage.customers[machine.customer]}/machines`, { description: machine.description, nameplate: machine.nameplate });
    stage.machines[Number(number)] = id;
  }
}

async function customerUser(app: NestFastifyApplication, stage: Stage, clock: Clock): Promise<void> {
  const person = SIGN_INS.find((s) => s.role === 'customer')!;
  await addUser(app, clock, person, stage.customer('dairy'));
}
