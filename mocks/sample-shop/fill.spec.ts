import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { KeptMail, testConfig } from '../../apps/api/test/test-app.js';
import { temporaryDataDir } from '../../apps/api/test/temporary-shop.js';
import { databaseFile } from '../../apps/api/src/database/data-folder.js';
import { openReader } from '../../apps/api/src/database/data-source.js';
import { ReadDb } from '../../apps/api/src/database/read-db.js';
import { HistoryService } from '../../apps/api/src/history/history.service.js';
import { fillSampleShop } from './fill.js';

const folder = temporaryDataDir();
let db: ReadDb;
let close: () => Promise<void>;
beforeAll(async () => {
  process.env['GRACE_MS'] = '100';
  await fillSampleShop(testConfig(folder.dataDir), { seedDay: new Date('2026-06-15T00:00:00.000Z'), mailer: new KeptMail() });
  const reader = await openReader(databaseFile(folder.dataDir));
  db = new ReadDb(reader);
  close = () => reader.destroy();
}, 120_000);
afterAll(async () => {
  await close?.();
  folder.remove();
});

const jobs = () =>
  db.all<{ serial: string; step: string; state: string; complaint: string }>('SELECT m.serial, j.step, j.state, j.complaint FROM jobs j JOIN machines m ON m.id = j.machineId ORDER BY j.number');

describe('the sample shop', () => {
  it.each([
    ['SQ-20031', 'released', 'released'],
    ['FS-1184', 'core-test-after', 'on-hold'],
    ['OW-77-02', 'assembly', 'on-hold'],
    ['TR-D9', 'treatment', 'open'],
    ['RW-M1', 'final-test', 'open'],
    ['LH-F2', 'rewind', 'open'],
    ['MP-P6', 'rewind', 'open'],
    ['HB-0080', 'incoming-test', 'replaced'],
    ['PP-405-3', 'ready', 'open'],
    ['SD-S11', 'released', 'released'],
    ['HK-H2', 'rewind', 'open'],
    ['CP-E37', 'core-test-after', 'open'],
    ['SD-W75', 'awaiting-approval', 'open'],
    ['OW-22-07', 'core-test-before', 'open'],
  ])('the machine %s stands at %s and is %s', async (serial, step, state) => {
    expect(await jobs()).toContainEqual(expect.objectContaining({ serial, step, state }));
  });

  it('the dairy’s motor is back under warranty, linked to its first job', async () => {
    const [back] = await db.all<{ step: string; first: string }>('SELECT j.step, f.state AS first FROM jobs j JOIN jobs f ON f.id = j.warrantyOfJobId');
    expect(back).toEqual({ step: 'received', first: 'released' });
  });

  // scenario figures: change of the referred loss in percent, and the verdict that follows from it
  it.each([
    ['SQ-20031', 1, -4.0, 'conforms'],
    ['FS-1184', 1, 61.2, 'does-not-conform'],
    ['OW-77-02', 1, -1.2, 'does-not-conform'],
    ['OW-77-02', 2, -5.7, 'conforms'],
    ['TR-D9', 1, 3.9, 'conforms'],
    ['LH-F2', 1, 1.3, 'conforms'],
    ['PP-405-3', 1, -5.1, 'not-valid'],
    ['PP-405-3', 2, -1.8, 'conforms'],
    ['SD-S11', 1, 3.1, 'conforms'],
    ['HK-H2', 1, -2.1, 'conforms'],
    ['CP-E37', 1, 18.6, 'inconclusive'],
  ])('the core of %s, test after no. %i, changed by %f %% and its verdict is %s', async (serial, ordinal, percent, verdict) => {
    const row = await db.one<{ increase: number; verdict: string }>(
      "SELECT r.increase, r.verdict FROM job_records r JOIN machines m ON m.id = r.machineId WHERE m.serial = ? AND r.kind = 'core-test-after' AND r.ordinal = ?",
      [serial, ordinal],
    );
    expect(row?.verdict).toBe(verdict);
    expect(Math.round(row!.increase * 1000) / 10).toBeCloseTo(percent, 1);
  });

  it('where there was no test before, the increase is not established and the core still conforms', async () => {
    const row = await db.one<{ increase: number | null; verdict: string }>("SELECT r.increase, r.verdict FROM job_records r JOIN machines m ON m.id = r.machineId WHERE m.serial = 'MP-P6' AND r.kind = 'core-test-after'");
    expect(row).toEqual({ increase: null, verdict: 'conforms' });
  });

  it('the quarry has paid, the dairy has an invoice to pay and a quote to answer', async () => {
    const rows = await db.all<{ name: string; balance: number }>('SELECT c.name, i.grossMinor - COALESCE((SELECT SUM(p.amountMinor) FROM payments p WHERE p.invoiceId = i.id), 0) AS balance FROM invoices i JOIN customers c ON c.id = i.customerId ORDER BY c.name');
    expect(rows.find((r) => r.name.startsWith('Steinmar'))?.balance).toBe(0);
    expect(rows.find((r) => r.name.startsWith('Senngrund'))?.balance).toBeGreaterThan(0);
    const [quote] = await db.all<{ state: string }>("SELECT q.state FROM quotes q JOIN customers c ON c.id = q.customerId WHERE c.name LIKE 'Senngrund%' AND q.state = 'sent'");
    expect(quote).toEqual({ state: 'sent' });
  });

  it('its history is an unbroken chain, and no row points to nothing', async () => {
    expect(await new HistoryService(db, undefined as never, undefined as never).firstBreak()).toBeNull();
    expect(await db.all('PRAGMA foreign_key_check')).toEqual([]);
  });
});
