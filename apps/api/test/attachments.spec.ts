import { createHash } from 'node:crypto';
import { existsSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { attachmentViewSchema } from '@shared/jobs';
import { AttachmentFiles } from '../src/attachments/attachment-files.js';
import { uploadsDir } from '../src/database/data-folder.js';
import { ReadDb } from '../src/database/read-db.js';
import { jobInShop, type JobInShop } from './job-in-shop.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

const MB = 1024 * 1024;
const PDF = Buffer.from('%PDF-1.4\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n');

let shop: TestShop;
let counter: Person;
let job: JobInShop;
beforeAll(async () => {
  shop = await openTestShop();
  counter = await shop.person(['counter'], { name: 'Ilse Harm' });
  job = await jobInShop(shop, counter);
});
afterAll(() => shop.close());

const send = (by: Person, bytes: Buffer, filename: string, jobId = job.jobId) => by.post(`/api/jobs/${jobId}/attachments`).attach('file', bytes, filename);
const added = async (bytes: Buffer, filename: string) => attachmentViewSchema.parse((await send(counter, bytes, filename).expect(201)).body);
const kept = () => readdirSync(uploadsDir(shop.config.dataDir)).sort();
const colours = (width: number, height: number) => sharp({ create: { width, height, channels: 3, background: { r: 40, g: 90, b: 120 } } });
/** A photo as a phone takes it: lying on its side, with the place it was taken at. */
const phonePhoto = () =>
  colours(60, 40)
    .withExif({ IFD0: { Make: 'A phone', Orientation: '6' }, IFD3: { GPSLatitude: '48/1 0/1 0/1' } })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer();

describe('a photo or a paper hung on a job', () => {
  it('is kept with who brought it and when, stands on the job sheet, and comes back the same', async () => {
    const view = await added(await colours(30, 20).png().toBuffer(), 'Typenschild Größe 4.png');
    expect(view).toMatchObject({ name: 'Typenschild Größe 4.png', mime: 'image/png', addedBy: 'Ilse Harm', addedAt: shop.clock.iso(), recordId: null });
    expect((await counter.get(`/api/jobs/${job.jobId}`).expect(200)).body.attachments).toContainEqual(view);
    const file = await counter.get(`/api/attachments/${view.id}`).buffer(true).expect(200);
    expect(file.headers).toMatchObject({ 'content-type': 'image/png', 'x-content-type-options': 'nosniff', 'cache-control': 'no-store', 'content-length': String(view.sizeBytes) });
    const row = await shop.app.get(ReadDb).one<{ sha256: string }>('SELECT sha256 FROM attachments WHERE id = ?', [view.id]);
    expect(createHash('sha256').update(file.body as Buffer).digest('hex')).toBe(row?.sha256);
  });

  it('is told in the history of the job', async () => {
    const view = await added(PDF, 'order 4500017.pdf');
    const [entry] = (await counter.get(`/api/jobs/${job.jobId}/history`).expect(200)).body;
    expect(entry).toMatchObject({ event: 'attachment.added', who: 'Ilse Harm', words: 'Document added: order 4500017.pdf', data: { sizeBytes: view.sizeBytes } });
  });

  it('has its name written for every browser, in plain letters and in full', async () => {
    const view = await added(await colours(8, 8).png().toBuffer(), 'Wicklung „A“ 50%.png');
    const file = await counter.get(`/api/attachments/${view.id}`).expect(200);
    // RFC 8187 section 3.2.3 encodes in UTF-8 what is no plain letter
    expect(file.headers['content-disposition']).toContain(`filename*=UTF-8''${encodeURIComponent('Wicklung „A“ 50%.png')}`);
    expect(file.headers['content-disposition']).toMatch(/^inline; filename="Wicklung A 50.png"; /);
  });

  it('loses the way it came by: folders, line breaks and a wrong ending are taken off its name', async () => {
    const view = await added(await colours(8, 8).png().toBuffer(), '..\\..\\x\\report.exe');
    expect(view.name).toBe('report.exe.png');
  });
});

describe('a picture', () => {
  it('stands upright and does not tell where and with what it was taken', async () => {
    const photo = await phonePhoto();
    const before = await sharp(photo).metadata();
    expect(before.orientation).toBe(6);
    expect(before.exif).toBeDefined();
    const view = await added(photo, 'photo.jpg');
    const file = await counter.get(`/api/attachments/${view.id}`).buffer(true).expect(200);
    const after = await sharp(file.body as Buffer).metadata();
    expect(after).toMatchObject({ format: 'jpeg', width: 40, height: 60 });
    expect(after.exif).toBeUndefined();
    expect(after.orientation).toBeUndefined();
  });

  it('is at most 4000 pixels long, and its small picture 320', async () => {
    const view = await added(await colours(4400, 100).png().toBuffer(), 'long.png');
    const file = await counter.get(`/api/attachments/${view.id}`).buffer(true).expect(200);
    expect((await sharp(file.body as Buffer).metadata()).width).toBe(4000);
    const small = await counter.get(`/api/attachments/${view.id}/thumb`).buffer(true).expect(200);
    expect(small.headers['content-type']).toBe('image/webp');
    expect((await sharp(small.body as Buffer).metadata()).width).toBe(320);
  });

  it('that is broken in the middle is refused, and nothing of it stays', async () => {
    const whole = await colours(400, 400).png({ compressionLevel: 0 }).toBuffer();
    const before = kept();
    const answer = await send(counter, whole.subarray(0, Math.floor(whole.length / 2)), 'half.png');
    expect(answer.status).toBe(422);
    expect(answer.body.code).toBe('FILE_NOT_ACCEPTED');
    expect(kept()).toEqual(before);
  });

  it('of which the disk lost a byte is not served as if it were good', async () => {
    const view = await added(await colours(16, 16).png().toBuffer(), 'plate.png');
    const row = await shop.app.get(ReadDb).one<{ storedName: string }>('SELECT storedName FROM attachments WHERE id = ?', [view.id]);
    writeFileSync(join(uploadsDir(shop.config.dataDir), row!.storedName), Buffer.alloc(view.sizeBytes));
    await counter.get(`/api/attachments/${view.id}`).expect(500);
  });
});

describe('what is not taken', () => {
  it('a text that is called a.png is refused, whatever the browser says it is', async () => {
    const before = kept();
    const answer = await counter.post(`/api/jobs/${job.jobId}/attachments`).attach('file', Buffer.from('<script>alert(1)</script>'), { filename: 'a.png', contentType: 'image/png' });
    expect(answer.status).toBe(422);
    expect(answer.body).toMatchObject({ code: 'FILE_NOT_ACCEPTED' });
    expect(kept()).toEqual(before);
  });

  it('a drawing that could carry a script (SVG) is refused', async () => {
    const answer = await send(counter, Buffer.from('<?xml version="1.0"?><svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>'), 'a.svg');
    expect(answer.body.code).toBe('FILE_NOT_ACCEPTED');
  });

  it('fifty megabytes are refused by what the browser says of them', async () => {
    const before = kept();
    const answer = await send(counter, Buffer.alloc(50 * MB), 'film.png');
    expect(answer.status).toBe(413);
    expect(answer.body).toMatchObject({ code: 'FILE_TOO_LARGE', message: expect.stringContaining('15 MB') });
    expect(kept()).toEqual(before);
  });

  it('a file over the limit that hides its length is stopped on the way, and nothing of it stays', async () => {
    const before = kept();
    const boundary = 'xxFORMxx';
    const head = `--${boundary}\r\ncontent-disposition: form-data; name="file"; filename="a.png"\r\ncontent-type: image/png\r\n\r\n`;
    const request = counter.post(`/api/jobs/${job.jobId}/attachments`).set('content-type', `multipart/form-data; boundary=${boundary}`).set('transfer-encoding', 'chunked');
    request.write(head);
    for (let sent = 0; sent < 17; sent += 1) request.write(Buffer.alloc(MB) as unknown as string);
    request.write(`\r\n--${boundary}--\r\n`);
    const answer = await request;
    expect(answer.status).toBe(413);
    expect(answer.body.code).toBe('FILE_TOO_LARGE');
    expect(kept()).toEqual(before);
  });

  it('a message that is no form, a form without a file, and a job that is not there', async () => {
    expect((await counter.post(`/api/jobs/${job.jobId}/attachments`, { file: 'x' })).body.code).toBe('NOT_MULTIPART');
    const empty = await counter.post(`/api/jobs/${job.jobId}/attachments`).field('note', 'no file');
    expect(empty.status).toBeGreaterThanOrEqual(400);
    expect(empty.status).toBeLessThan(500);
    await send(counter, PDF, 'a.pdf', 'no-such-job').expect(404);
  });

  it('a record of another job is no place for it', async () => {
    await counter.post(`/api/jobs/${job.jobId}/attachments?recordId=no-such-record`).attach('file', PDF, 'a.pdf').expect(404);
    await counter.post(`/api/jobs/${job.jobId}/attachments?owner=me`).attach('file', PDF, 'a.pdf').expect(400);
  });
});

describe('what a customer may see', () => {
  it('the pictures of their own jobs, and of nobody else’s: those answer as if they did not exist', async () => {
    const mine = await shop.person(['customer'], { customerId: job.customerId });
    const other = await jobInShop(shop, counter);
    const stranger = await shop.person(['customer'], { customerId: other.customerId });
    const view = await added(await colours(20, 20).webp().toBuffer(), 'winding.webp');
    await mine.get(`/api/portal/attachments/${view.id}`).expect(200);
    await mine.get(`/api/portal/attachments/${view.id}/thumb`).expect(200);
    const notMine = await stranger.get(`/api/portal/attachments/${view.id}`);
    const notThere = await stranger.get('/api/portal/attachments/no-such-file');
    expect(notMine.status).toBe(404);
    expect({ ...notMine.body, requestId: '' }).toEqual({ ...notThere.body, requestId: '' });
    await stranger.get(`/api/portal/attachments/${view.id}/thumb`).expect(404);
  });

  it('no papers hung on the job by the shop, and nothing through the shop’s own addresses', async () => {
    const mine = await shop.person(['customer'], { customerId: job.customerId });
    const paper = await added(PDF, 'price of the bearing.pdf');
    await mine.get(`/api/portal/attachments/${paper.id}`).expect(404);
    await mine.get(`/api/attachments/${paper.id}`).expect(403);
    await send(mine, PDF, 'a.pdf').expect(403);
    await shop.nobody.get(`/api/attachments/${paper.id}`).expect(401);
  });
});

describe('a paper', () => {
  it('is kept as it came, is saved rather than shown, and has no small picture', async () => {
    const view = await added(PDF, 'drawing.pdf');
    const file = await counter.get(`/api/attachments/${view.id}`).buffer(true).parse((res, done) => {
      const pieces: Buffer[] = [];
      res.on('data', (piece: Buffer) => pieces.push(piece));
      res.on('end', () => done(null, Buffer.concat(pieces)));
    });
    expect(Buffer.compare(file.body as Buffer, PDF)).toBe(0);
    expect(file.headers['content-disposition']).toMatch(/^attachment; /);
    await counter.get(`/api/attachments/${view.id}/thumb`).expect(404);
  });
});

it('what a broken-off upload left behind is gone when the shop starts again', async () => {
  const second = await openTestShop();
  const left = join(uploadsDir(second.config.dataDir), 'abc.part');
  writeFileSync(left, 'half');
  await new AttachmentFiles(second.config.dataDir).sweep();
  expect(existsSync(left)).toBe(false);
  await second.close();
});
