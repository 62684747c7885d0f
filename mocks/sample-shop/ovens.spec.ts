import { firstSignal, individualsChart } from '@libs/control-charts';
import { createLoggerReader } from '@libs/logger-files';
import { jobLoadsSchema, loadPageSchema } from '@shared/burnouts';
import { ovenInsightSchema, type OvenInsight } from '@shared/insight';
import { Test } from '@nestjs/testing';
import type { NestFastifyApplication } from '@nestjs/platform-fastify';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { AppModule } from '../../apps/api/src/app.module.js';
import { setup, createAdapter } from '../../apps/api/src/http/setup.js';
import { ReadDb } from '../../apps/api/src/database/read-db.js';
import { Mailer } from '../../apps/api/src/outbox/mailer.js';
import { Clock, SteppingClock } from '../../apps/api/src/clock/clock.js';
import { KeptMail, testConfig } from '../../apps/api/test/test-app.js';
import { temporaryDataDir } from '../../apps/api/test/temporary-shop.js';
import { fillSampleShop } from './fill.js';
import { LOADS, loggerFile, OLDER_BOOK } from './ovens.js';
import { SamplePerson } from './people.js';
import { DEMO_PASSWORD, SIGN_INS } from './sign-ins.js';

const SEED_DAY = new Date('2026-06-15T00:00:00.000Z');
const folder = temporaryDataDir();
let app: NestFastifyApplication;
let technician: SamplePerson;
beforeAll(async () => {
  process.env['GRACE_MS'] = '100';
  const config = testConfig(folder.dataDir);
  await fillSampleShop(config, { seedDay: SEED_DAY, mailer: new KeptMail() });
  const module = await Test.createTestingModule({ imports: [AppModule.register(config)] })
    .overrideProvider(Clock)
    .useValue(new SteppingClock(new Date(SEED_DAY.getTime() + 9 * 3_600_000)))
    .overrideProvider(Mailer)
    .useValue(new KeptMail())
    .compile();
  app = module.createNestApplication<NestFastifyApplication>(createAdapter(false), { rawBody: true, logger: false });
  await setup(app, config);
  await app.init();
  await app.getHttpAdapter().getInstance().ready();
  technician = await SamplePerson.signIn(app, config.publicUrl, SIGN_INS.find((s) => s.role === 'technician')!.email, DEMO_PASSWORD);
}, 180_000);
afterAll(async () => {
  await app?.close();
  folder.remove();
});

const oven = async (id: string): Promise<OvenInsight> => ovenInsightSchema.parse(await technician.get(`/insight/ovens/${id}`));
const percent = (fraction: number) => Math.round(fraction * 1000) / 10;
const pointAt = (of: OvenInsight, position: number | null) => of.points.find((p) => p.position === position);

describe('the second oven of the sample shop', () => {
  it('is flagged by its chart before its first core fails the limit of 20 %', async () => {
    const o2 = await oven('O2');
    expect(o2.increaseLimit).toBe(0.2);
    const [spoke, failed] = [pointAt(o2, o2.spokeAt)!, pointAt(o2, o2.failedAt)!];
    expect([spoke.position, percent(spoke.change)]).toEqual([23, 0.6]);
    expect(spoke.hits.map((h) => h.words)).toEqual(['4 of 5 beyond 1 sigma, same side']);
    expect([failed.position, percent(failed.change)]).toEqual([29, 61.2]);
    expect(spoke.day < failed.day).toBe(true);
    expect(o2.points.filter((p) => p.position > spoke.position && p.position < failed.position && p.overLimit)).toEqual([]);
  });

  it('has 2 of 3 beyond 2 sigma, one beyond 3 sigma and 8 in a row on one side before that core too', async () => {
    const o2 = await oven('O2');
    expect(o2.points.filter((p) => p.hits.some((h) => h.rule === 'one-beyond-3-sigma')).map((p) => percent(p.change))).toEqual([4.9, 6.8, 9.7, 61.2, 18.6]);
    const first = (rule: string) => percent(o2.points.find((p) => p.hits.some((h) => h.rule === rule))!.change);
    expect([first('two-of-three-beyond-2-sigma'), first('one-beyond-3-sigma'), first('eight-on-one-side')]).toEqual([3.1, 4.9, 9.7]);
  });

  // figures of the invented shop, in percent, worked out beside this program
  it('has its limits from the first twenty jobs', async () => {
    const { chart } = await oven('O2');
    if (chart.outcome !== 'chart') throw new Error(chart.message);
    expect([chart.centre, chart.lowerLimit, chart.upperLimit, chart.meanMovingRange, chart.movingRangeLimit].map((x) => x * 100)).toEqual([expect.closeTo(-1.26, 2), expect.closeTo(-6.55, 2), expect.closeTo(4.03, 2), expect.closeTo(1.989, 2), expect.closeTo(6.5, 2)]);
    expect(chart).toMatchObject({ base: { first: 1, last: 20 }, provisional: false });
  });
});

describe('the first oven', () => {
  it('keeps as it was: no pattern, no core over the limit', async () => {
    const o1 = await oven('O1');
    if (o1.chart.outcome !== 'chart') throw new Error(o1.chart.message);
    expect([o1.spokeAt, o1.failedAt]).toEqual([null, null]);
    expect([o1.chart.centre, o1.chart.lowerLimit, o1.chart.upperLimit].map((x) => x * 100)).toEqual([expect.closeTo(-1.455, 1), expect.closeTo(-7.54, 1), expect.closeTo(4.63, 1)]);
  });

  it('its last five points are the jobs of these weeks, in the order of their burnouts; a test that was not valid does not count, nor one after a repair', async () => {
    const { points } = await oven('O1');
    expect(points).toHaveLength(20);
    expect(points.slice(15).map((p) => [p.job?.machine.slice(0, 8), percent(p.change)])).toEqual([
      [expect.any(String), 1.3],
      [expect.any(String), -4.0],
      [expect.any(String), -1.2],
      [expect.any(String), -2.1],
      [expect.any(String), -1.8],
    ]);
    expect(points.slice(0, 15).every((p) => p.job === null && p.entry?.remark === 'paper book')).toBe(true);
  });
});

describe('the older book', () => {
  it('alone speaks already: nobody had to lose a core for it', () => {
    const chart = individualsChart(OLDER_BOOK.O2, { basePeriod: { first: 1, last: 20 } });
    if (chart.outcome !== 'chart') throw new Error(chart.message);
    expect(firstSignal(chart)?.position).toBe(23);
    expect(Math.max(...OLDER_BOOK.O2)).toBeLessThan(20);
  });
});

describe('the loads of the sample shop', () => {
  it.each(LOADS.flatMap((load) => load.couples.map((c) => [c.name, load.oven, c.peakC, c.minutesAbove345C] as const)))('the logger’s file of %s in %s has its peak of %i °C and %i minutes above 345 °C', (name, _oven, peakC, minutes) => {
    const load = LOADS.find((l) => l.couples.some((c) => c.name === name && c.peakC === peakC))!;
    const reader = createLoggerReader();
    reader.write(loggerFile('2026-05-19', load.couples));
    const read = reader.end();
    if (read.outcome !== 'read') throw new Error(read.message);
    const channel = read.channels.find((c) => c.name === name);
    if (channel?.outcome !== 'read') throw new Error('no such channel');
    expect(channel.peakC).toBeCloseTo(peakC, 0);
    expect(channel.minutesAbove[0]!.minutes).toBeCloseTo(minutes, -1);
  });

  it('the overheated load is over by 76 K, the one with the sensor that read low by 9 K once that was known', async () => {
    const { rows } = loadPageSchema.parse(await technician.get('/burnouts'));
    expect(rows.map((r) => [r.ovenId, r.verdict, r.limitC, Math.round(r.peakC!)])).toEqual([
      ['O2', 'does-not-conform', 370, 379],
      ['O1', 'conforms', 370, 349],
      ['O1', 'conforms', 370, 344],
      ['O2', 'does-not-conform', 370, 446],
      ['O1', 'conforms', 370, 356],
      ['O1', 'conforms', 400, 371],
    ]);
  });

  it('a job finds its load with the figures its strip record has', async () => {
    const job = await app.get(ReadDb).one<{ id: string }>("SELECT j.id FROM jobs j JOIN machines m ON m.id = j.machineId WHERE m.serial = 'SQ-20031'");
    const [load] = jobLoadsSchema.parse(await technician.get(`/jobs/${job!.id}/burnouts`));
    expect(load).toMatchObject({ ovenId: 'O1', peakC: 356, others: 1, own: { limitC: 370, overK: -14 } });
    expect(load!.minutesAbove345C).toBeCloseTo(95, -1);
  });
});
