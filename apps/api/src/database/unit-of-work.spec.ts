import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { temporaryDatabase, type TemporaryDatabase } from '../../test/temporary-shop.js';
import { NumberSeries } from '../series/number-series.entity.js';

let shop: TemporaryDatabase;
beforeEach(async () => {
  shop = await temporaryDatabase();
});
afterEach(() => shop.close());

const rows = async () => (await shop.db.all<{ id: string }>('SELECT id FROM number_series ORDER BY id')).map((r) => r.id);
const turn = () => new Promise((resolve) => setImmediate(resolve));

describe('what the queue is there for', () => {
  it('without it, of two overlapping transactions none comes through', async () => {
    const write = (id: string) => shop.writer.transaction((manager) => manager.insert(NumberSeries, { id, last: 1 }));
    const outcomes = await Promise.allSettled([write('a'), write('b')]);
    expect(outcomes.map((o) => o.status)).toContain('rejected');
  });

  it('without it, a write beside an open transaction is acknowledged and then lost', async () => {
    const failing = shop.writer.transaction(async (manager) => {
      await manager.insert(NumberSeries, { id: 'mine', last: 1 });
      await shop.writer.manager.insert(NumberSeries, { id: 'a stranger’s', last: 1 });
      throw new Error('the first one fails');
    });
    await expect(failing).rejects.toThrow('the first one fails');
    expect(await rows()).toEqual([]);
  });
});

describe('UnitOfWork', () => {
  it('a failing unit of work does not undo another one running beside it', async () => {
    const good = shop.unitOfWork.run(async (manager) => {
      await manager.insert(NumberSeries, { id: 'good', last: 1 });
      await turn();
    });
    const bad = shop.unitOfWork.run(async (manager) => {
      await manager.insert(NumberSeries, { id: 'bad', last: 1 });
      throw new Error('refused');
    });
    await good;
    await expect(bad).rejects.toThrow('refused');
    expect(await rows()).toEqual(['good']);
  });

  it('thirty units at once, a third of them failing, leave exactly the rows of those that were acknowledged', async () => {
    const outcomes = await Promise.allSettled(
      Array.from({ length: 30 }, (_, i) =>
        shop.unitOfWork.run(async (manager) => {
          await manager.insert(NumberSeries, { id: `n${String(i).padStart(2, '0')}`, last: 1 });
          await turn();
          if (i % 3 === 0) throw new Error('designed to fail');
        }),
      ),
    );
    const acknowledged = outcomes.flatMap((o, i) => (o.status === 'fulfilled' ? [`n${String(i).padStart(2, '0')}`] : []));
    expect(acknowledged).toHaveLength(20);
    expect(await rows()).toEqual(acknowledged);
  });

  it('a hundred increments of one counter at once all count', async () => {
    await shop.unitOfWork.run((manager) => manager.insert(NumberSeries, { id: 'counter', last: 0 }));
    await Promise.all(
      Array.from({ length: 100 }, () =>
        shop.unitOfWork.run(async (manager) => {
          const row = await manager.findOneByOrFail(NumberSeries, { id: 'counter' });
          await turn();
          await manager.update(NumberSeries, { id: 'counter' }, { last: row.last + 1 });
        }),
      ),
    );
    expect((await shop.db.one<{ last: number }>("SELECT last FROM number_series WHERE id = 'counter'"))?.last).toBe(100);
  });

  it('refuses to nest instead of waiting for itself', async () => {
    await expect(shop.unitOfWork.run(() => shop.unitOfWork.run(async () => undefined))).rejects.toThrow('called inside another');
    await shop.unitOfWork.run((manager) => manager.insert(NumberSeries, { id: 'after', last: 1 }));
    expect(await rows()).toEqual(['after']);
  });

  it('a manager kept beyond the end of its unit refuses to write', async () => {
    let kept: { insert: (...a: never[]) => unknown } | undefined;
    await shop.unitOfWork.run(async (manager) => {
      kept = manager as never;
    });
    expect(() => kept!.insert(NumberSeries as never, { id: 'late', last: 1 } as never)).toThrow('has ended');
    expect(await rows()).toEqual([]);
  });

  it('a reader never sees the rows of a unit that is still open', async () => {
    let seenInside: string[] = ['not looked yet'];
    await shop.unitOfWork.run(async (manager) => {
      await manager.insert(NumberSeries, { id: 'half done', last: 1 });
      seenInside = await rows();
    });
    expect(seenInside).toEqual([]);
    expect(await rows()).toEqual(['half done']);
  });

  it('a write on the reading connection fails loudly', async () => {
    await expect(shop.db.all("INSERT INTO number_series (id, last) VALUES ('x', 1)")).rejects.toThrow(/readonly/);
  });

  it('a unit that hangs is rolled back and the next one goes on', async () => {
    await shop.close();
    shop = await temporaryDatabase({ timeLimitMs: 30 });
    const hanging = shop.unitOfWork.run(async (manager) => {
      await manager.insert(NumberSeries, { id: 'hanging', last: 1 });
      await new Promise(() => undefined);
    });
    await expect(hanging).rejects.toThrow('rolled back');
    await shop.unitOfWork.run((manager) => manager.insert(NumberSeries, { id: 'next', last: 1 }));
    expect(await rows()).toEqual(['next']);
  });

  it('the writing connection is durable: every commit is on the disk, and foreign keys are watched', async () => {
    expect(await shop.writer.query('PRAGMA synchronous')).toEqual([{ synchronous: 2 }]);
    expect(await shop.writer.query('PRAGMA journal_mode')).toEqual([{ journal_mode: 'wal' }]);
    expect(await shop.writer.query('PRAGMA foreign_keys')).toEqual([{ foreign_keys: 1 }]);
  });
});
