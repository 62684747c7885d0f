import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import type { PaperModel, TagModel } from '@libs/documents';
import { afterAll, afterEach, describe, expect, it } from 'vitest';
import { PaperPress } from './draw-paper.js';

const tag = (jobNumber: string): TagModel => ({
  kind: 'tag',
  edition: 1,
  number: jobNumber,
  issuedAt: '2026-11-27T13:05:00.000Z',
  timeZone: 'Europe/Berlin',
  paperSize: 'A4',
  units: 'si',
  shop: { name: 'Ambach Rewinding Works', addressLines: [], phone: '', email: '', website: '', taxNumber: '', registration: '' },
  jobNumber,
  customerName: 'Corvel Plastics',
  machineDescription: '37 kW 4-pole motor',
  serial: 'A-22/4471-Ω',
  route: 'rewind',
  step: 'received',
  receivedAt: '2026-11-10T08:00:00.000Z',
  promisedOn: null,
  part: '',
  jobUrl: 'http://localhost:3000/jobs/01jd8zkq3v5m',
  caution: '',
});

const folder = mkdtempSync(join(tmpdir(), 'paper-worker-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

/** A worker that answers with the job number, dies at "die", and never ends at "hang". */
const workerFile = pathToFileURL(join(folder, 'worker.mjs'));
writeFileSync(
  workerFile,
  `import { parentPort, threadId } from 'node:worker_threads';
   let drawing = 0;
   parentPort.on('message', ({ id, model }) => {
     if (model.jobNumber === 'die') throw new Error('the worker died');
     if (model.jobNumber === 'exit') process.exit(3);
     if (model.jobNumber === 'hang') return;
     if (model.jobNumber === 'bad') return parentPort.postMessage({ id, message: 'no such paper', stack: 'here' });
     drawing += 1;
     setTimeout(() => { parentPort.postMessage({ id, bytes: new TextEncoder().encode(model.jobNumber + ' ' + threadId + ' ' + drawing) }); drawing -= 1; }, 5);
   });`,
);

const presses: PaperPress[] = [];
const pressOf = (options: ConstructorParameters<typeof PaperPress>[0] = { workerFile }) => {
  const press = new PaperPress(options);
  presses.push(press);
  return press;
};
afterEach(async () => {
  for (const press of presses.splice(0)) await press.close();
});
const text = async (bytes: Promise<Uint8Array>) => new TextDecoder().decode(await bytes);

describe('the paper press', () => {
  it('draws here where no compiled worker stands beside it, and the same model gives the same bytes', async () => {
    const press = pressOf({});
    expect(press.offMainThread).toBe(false);
    const [first, second] = await Promise.all([press.draw(tag('J-2026-0112')), press.draw(tag('J-2026-0112'))]);
    expect(new TextDecoder('latin1').decode(first.subarray(0, 5))).toBe('%PDF-');
    expect(Buffer.compare(Buffer.from(first), Buffer.from(second))).toBe(0);
  });

  it('draws a paper that was stored as JSON to the same bytes', async () => {
    const press = pressOf({});
    const stored = JSON.parse(JSON.stringify(tag('J-2026-0112'))) as PaperModel;
    expect(Buffer.compare(Buffer.from(await press.draw(stored)), Buffer.from(await press.draw(tag('J-2026-0112'))))).toBe(0);
  });

  it('hands papers to one worker, one after the other, and each caller gets their own', async () => {
    const press = pressOf();
    const told = await Promise.all(['J-1', 'J-2', 'J-3'].map((number) => text(press.draw(tag(number)))));
    const [first] = told;
    const thread = first?.split(' ')[1];
    expect(told).toEqual([`J-1 ${thread} 1`, `J-2 ${thread} 1`, `J-3 ${thread} 1`]);
  });

  it('passes the worker’s words on, and goes on with the next paper', async () => {
    const press = pressOf();
    const bad = press.draw(tag('bad'));
    const good = text(press.draw(tag('J-1')));
    await expect(bad).rejects.toThrow('no such paper');
    expect(await good).toMatch(/^J-1 /);
  });

  it.each(['die', 'exit'])('loses only the paper it was drawing when the worker dies (%s), and hires a new one', async (how) => {
    const press = pressOf();
    const before = text(press.draw(tag('J-1')));
    const lost = press.draw(tag(how));
    const after = text(press.draw(tag('J-2')));
    await expect(lost).rejects.toThrow(/died|ended \(3\)/);
    expect((await after).split(' ')[1]).not.toBe((await before).split(' ')[1]);
  });

  it('gives a paper up that takes too long', async () => {
    const press = pressOf({ workerFile, timeLimitMs: 80 });
    await expect(press.draw(tag('hang'))).rejects.toThrow('given up');
    expect(await text(press.draw(tag('J-2')))).toMatch(/^J-2 /);
  });

  it('fails what is waiting when it is closed, and takes nothing more', async () => {
    const press = pressOf();
    const hanging = press.draw(tag('hang'));
    const waiting = press.draw(tag('J-1'));
    const both = Promise.allSettled([hanging, waiting]);
    await press.close();
    expect((await both).map((result) => result.status)).toEqual(['rejected', 'rejected']);
    await expect(press.draw(tag('J-2'))).rejects.toThrow('closed');
  });
});
