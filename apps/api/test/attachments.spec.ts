import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { request as httpRequest } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { attachmentViewSchema, type JobSheet } from '@shared/jobs';
import { uploadsDir } from '../src/database/data-folder.js';
import { bookedIn, sheetOf } from './jobs-booking.js';
import { openTestShop, type Person, type TestShop } from './test-app.js';

let shop: TestShop;
let counter: Person;
let job: JobSheet;
let photo: Buffer;
const PDF = Buffer.from('%PDF-1.7\n1 0 obj<</Type/Catalog>>endobj\ntrailer<</Root 1 0 R>>\n%%EOF\n');

beforeAll(async () => {
  shop = await openTestShop();
  await shop.app.listen(0, '127.0.0.1');
  counter = await shop.person(['counter']);
  job = await sheetOf(counter, (await bookedIn(counter)).id);
  // a phone's photo, held upright: the sensor's picture lies on its side, and the file says where it was taken
  photo = await sharp({ create: { width: 60, height: 40, channels: 3, background: '#b87333' } })
    .jpeg()
    .withMetadata({ orientation: 6 })
    .withExifMerge({ IFD0: { Make: 'SECRETPHONE' }, IFD3: { GPSLatitudeRef: 'N', GPSLatitude: '50/1 30/1 0/1' } })
    .toBuffer();
});
afterAll(() => shop.close());

const send = (bytes: Buffer, name: string, by = counter, to = job.id) => by.post(`/api/jobs/${to}/attachments`).attach('file', bytes, name);
const stored = () => readdirSync(uploadsDir(shop.config.dataDir));
const bytesOf = (path: string, by = counter) =>
  by.get(path).buffer(true).parse((res, done) => {
    const chunks: Buffer[] = [];
    res.on('data', (c: Buffer) => chunks.push(c));
    res.on('end', () => done(null, Buffer.concat(chunks)));
  });

describe('adding a photo', () => {
  it('it is drawn anew: upright, without place, time and camera, and kept under a name nobody can guess', async () => {
    expect(photo.includes('SECRETPHONE')).toBe(true);
    expect(await sharp(photo).metadata()).toMatchObject({ width: 60, height: 40, orientation: 6 });
    const view = attachmentViewSchema.parse((await send(photo, 'winding.jpg').expect(201)).body);
    expect(view).toMatchObject({ name: 'winding.jpg', mime: 'image/jpeg', recordId: null });
    const got = await bytesOf(`/api/attachments/${view.id}`).expect(200);
    const bytes = got.body as Buffer;
    expect(bytes.length).toBe(view.sizeBytes);
    expect(bytes.includes('SECRETPHONE')).toBe(false);
    const seen = await sharp(bytes).metadata();
    expect(seen).toMatchObject({ width: 40, height: 60 });
    expect(seen.exif).toBeUndefined();
    expect(got.headers).toMatchObject({ 'content-type': 'image/jpeg', 'x-content-type-options': 'nosniff', 'content-disposition': `inline; filename="winding.jpg"; filename*=UTF-8''winding.jpg` });
    expect(stored().every((name) => /^[0-9a-f]{40}\.(jpg|png|webp|pdf)$/.test(name))).toBe(true);
    expect((await sheetOf(counter, job.id)).attachments.map((a) => a.id)).toContain(view.id);
    expect((await counter.get(`/api/jobs/${job.id}/history`)).body[0]).toMatchObject({ event: 'attachment.added', data: { sha256: createHash('sha256').update(bytes).digest('hex') } });
  });

  it('a picture wider than 4000 points is made smaller, a small one stays', async () => {
    const wide = await sharp({ create: { width: 5000, height: 20, channels: 3, background: '#fff' } }).png().toBuffer();
    const view = (await send(wide, 'wide.png').expect(201)).body;
    const got = (await bytesOf(`/api/attachments/${view.id}`)).body as Buffer;
    expect(await sharp(got).metadata()).toMatchObject({ width: 4000, height: 16, format: 'png' });
  });

  it('has a small picture for lists, drawn once', async () => {
    const large = await sharp({ create: { width: 800, height: 400, channels: 3, background: '#123456' } }).webp().toBuffer();
    const view = (await send(large, 'a.webp').expect(201)).body;
    const first = await bytesOf(`/api/attachments/${view.id}/thumb`).expect(200);
    expect(first.headers['content-type']).toBe('image/webp');
    expect(await sharp(first.body as Buffer).metadata()).toMatchObject({ width: 320, height: 160 });
    expect(readdirSync(join(shop.config.dataDir, 'thumbs'))).toHaveLength(1);
    expect((await bytesOf(`/api/attachments/${view.id}/thumb`).expect(200)).body).toEqual(first.body);
  });

  it('a scanned paper is handed out to be saved, never shown inside the shop’s pages', async () => {
    const view = (await send(PDF, 'Bestellung für Prüfung.pdf').expect(201)).body;
    const got = await bytesOf(`/api/attachments/${view.id}`).expect(200);
    expect(got.headers['content-type']).toBe('application/pdf');
    expect(got.headers['content-disposition']).toBe(`attachment; filename="Bestellung fur Prufung.pdf"; filename*=UTF-8''Bestellung%20f%C3%BCr%20Pr%C3%BCfung.pdf`);
    expect(got.body).toEqual(PDF);
    await counter.get(`/api/attachments/${view.id}/thumb`).expect(404);
  });

  it.each([
    ['../../etc/passwd.png', 'passwd.png'],
    ['C:\\temp\\shaft.png', 'shaft.png'],
    ['photo.png.exe', 'photo.png.exe.png'],
    ['PHOTO.PNG', 'PHOTO.png'],
    ['evil\u202egnp.png', 'evilgnp.png'],
    [`${'x'.repeat(300)}.png`, `${'x'.repeat(115)}.png`],
    ['⚙️ motor.png', '⚙️ motor.png'],
  ])('the name %j is kept as %j', async (given, kept) => {
    const png = await sharp({ create: { width: 2, height: 2, channels: 3, background: '#fff' } }).png().toBuffer();
    expect((await send(png, given).expect(201)).body.name).toBe(kept);
  });
});

describe('what is not taken', () => {
  const left = () => stored().length;

  it.each([
    ['text', Buffer.from('this is no picture'), 'a.png'],
    ['a page', Buffer.from('<html><script>alert(1)</script></html>'), 'a.png'],
    ['a drawing with a script', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" onload="alert(1)"/>'), 'a.svg'],
    ['nothing at all', Buffer.alloc(0), 'a.png'],
    ['a picture’s beginning with rubbish behind it', Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52]), Buffer.alloc(400, 7)]), 'a.png'],
    ['a picture that claims a hundred thousand points a side', Buffer.concat([Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a, 0, 0, 0, 13, 0x49, 0x48, 0x44, 0x52, 0, 1, 0x86, 0xa0, 0, 1, 0x86, 0xa0, 8, 2, 0, 0, 0]), Buffer.alloc(60)]), 'bomb.png'],
  ])('%s is refused, and nothing of it stays on the disk', async (_what, bytes, name) => {
    const before = left();
    const answer = await send(bytes, name);
    expect([answer.status, answer.body.code]).toEqual([422, 'FILE_NOT_ACCEPTED']);
    expect(left()).toBe(before);
  });

  it('a page hidden behind a real picture does not survive its being drawn anew', async () => {
    const view = (await send(Buffer.concat([photo, Buffer.from('<script>alert(1)</script>')]), 'a.jpg').expect(201)).body;
    expect(((await bytesOf(`/api/attachments/${view.id}`)).body as Buffer).includes('<script>')).toBe(false);
  });

  it('without a form, without a file, for a job that is not there, or a record that is not of the job', async () => {
    expect((await counter.post(`/api/jobs/${job.id}/attachments`, { file: 'x' })).body.code).toBe('NOT_MULTIPART');
    expect((await counter.post(`/api/jobs/${job.id}/attachments`).field('note', 'x')).body.code).toBe('FILE_NOT_ACCEPTED');
    await send(photo, 'a.jpg', counter, '019f0000-0000-7000-8000-000000000000').expect(404);
    const before = left();
    await counter.post(`/api/jobs/${job.id}/attachments?recordId=019f0000-0000-7000-8000-000000000000`).attach('file', photo, 'a.jpg').expect(404);
    expect(left()).toBe(before);
  });

  it('a form that breaks off is refused, and leaves nothing', async () => {
    const before = left();
    const answer = await counter
      .post(`/api/jobs/${job.id}/attachments`)
      .set('content-type', 'multipart/form-data; boundary=xx')
      .send('--xx\r\nContent-Disposition: form-data; name="file"; filename="a.png"\r\nContent-Type: image/png\r\n\r\nhalf a pict' as never);
    expect(answer.status).toBe(400);
    expect(left()).toBe(before);
  });
});

describe('fifty megabytes', () => {
  const MB = 1024 * 1024;
  /** Sends until it is answered; tells how much had been sent by then, and what the process grew by. */
  function pour(declare: boolean): Promise<{ status: number; code: string; sentMb: number; grewMb: number }> {
    const { port } = shop.app.getHttpServer().address() as AddressInfo;
    const head = Buffer.from('--xx\r\nContent-Disposition: form-data; name="file"; filename="film.jpg"\r\nContent-Type: image/jpeg\r\n\r\n');
    const tail = Buffer.from('\r\n--xx--\r\n');
    const before = process.memoryUsage().rss;
    let peak = before;
    return new Promise((resolve, reject) => {
      let sent = 0;
      let answered = false;
      const req = httpRequest(
        { port, host: '127.0.0.1', method: 'POST', path: `/api/jobs/${job.id}/attachments`, headers: { origin: 'http://shop.test', cookie: cookieOf(counter), 'content-type': 'multipart/form-data; boundary=xx', ...(declare ? { 'content-length': head.length + 50 * MB + tail.length } : {}) } },
        (res) => {
          answered = true;
          const chunks: Buffer[] = [];
          res.on('data', (c: Buffer) => chunks.push(c));
          res.on('end', () => {
            const body = JSON.parse(Buffer.concat(chunks).toString()) as { code: string };
            req.destroy();
            resolve({ status: res.statusCode!, code: body.code, sentMb: sent / MB, grewMb: (peak - before) / MB });
          });
        },
      );
      req.on('error', (error) => (answered ? undefined : reject(error)));
      const chunk = Buffer.alloc(MB / 4, 0xff);
      const more = () => {
        if (answered) return;
        peak = Math.max(peak, process.memoryUsage().rss);
        if (sent >= 50 * MB) return void req.end(tail);
        sent += chunk.length;
        req.write(chunk, () => setTimeout(more, 1));
      };
      req.write(head, more);
    });
  }

  it('said beforehand, they are refused before they are sent', async () => {
    const answer = await pour(true);
    expect(answer).toMatchObject({ status: 413, code: 'FILE_TOO_LARGE' });
    expect(answer.sentMb).toBeLessThan(10);
  });

  it('not said beforehand, they are refused at the limit, and the shop’s computer hardly notices', async () => {
    const before = stored().length;
    const answer = await pour(false);
    expect(answer).toMatchObject({ status: 413, code: 'FILE_TOO_LARGE' });
    expect(answer.sentMb).toBeGreaterThan(14);
    expect(answer.sentMb).toBeLessThan(30);
    expect(answer.grewMb).toBeLessThan(60);
    expect(stored().length).toBe(before);
  });
});

describe('who sees what', () => {
  it('a customer sees the photos of their own jobs; another’s, a paper and nothing at all look alike', async () => {
    const other = await sheetOf(counter, (await bookedIn(counter)).id);
    const own = (await send(photo, 'own.jpg').expect(201)).body;
    const paper = (await send(PDF, 'supplier.pdf').expect(201)).body;
    const theirs = (await send(photo, 'theirs.jpg', counter, other.id).expect(201)).body;
    const portal = await shop.person(['customer'], { customerId: job.customer.id });
    await portal.get(`/api/portal/attachments/${own.id}`).expect(200);
    await portal.get(`/api/portal/attachments/${own.id}/thumb`).expect(200);
    const refusals = [];
    for (const id of [theirs.id, paper.id, '019f0000-0000-7000-8000-000000000000']) {
      for (const ending of ['', '/thumb']) {
        const { status, body } = await portal.get(`/api/portal/attachments/${id}${ending}`);
        refusals.push({ status, body: { ...body, requestId: '' } });
      }
    }
    expect(new Set(refusals.map((r) => JSON.stringify(r))).size).toBe(1);
    expect(refusals[0]!.status).toBe(404);
    await portal.get(`/api/attachments/${own.id}`).expect(403);
    await send(photo, 'a.jpg', portal).expect(403);
    await shop.nobody.get(`/api/attachments/${own.id}`).expect(401);
  });

  it('a file that was damaged or lost on the disk is never handed out as if it were good', async () => {
    const view = (await send(photo, 'hurt.jpg').expect(201)).body;
    const names = stored().map((name) => join(uploadsDir(shop.config.dataDir), name));
    for (const name of names) {
      const bytes = readFileSync(name);
      bytes[bytes.length - 1] = bytes[bytes.length - 1]! ^ 1;
      writeFileSync(name, bytes);
    }
    const answer = await counter.get(`/api/attachments/${view.id}`);
    expect(answer.status).toBe(500);
    expect(answer.body.message).toContain('backup');
    await counter.get(`/api/attachments/${view.id}/thumb`).expect(500);
  });
});

const cookieOf = (person: Person): string => (person as unknown as { cookie: string }).cookie;
