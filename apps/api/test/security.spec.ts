import { mkdirSync, mkdtempSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { papersDir, uploadsDir } from '../src/database/data-folder.js';
import { handlersOf } from './handlers.js';
import { jobInShop, QUOTE, shopProfile } from './job-in-shop.js';
import { bookedIn, bookIn, NEW_CUSTOMER, PLATE } from './jobs-booking.js';
import { openTestShop, Person, TEST_PASSWORD, type TestShop } from './test-app.js';
import { claimsOf, selfSigned, token, unsigned } from './tokens.js';
import { faultOf, openWire, type Wire } from './wire.js';

let shop: TestShop;
let wire: Wire;
let manager: Person;
let webRoot: string;
beforeAll(async () => {
  webRoot = mkdtempSync(join(tmpdir(), 'loopbay-web-'));
  mkdirSync(join(webRoot, 'assets'));
  writeFileSync(join(webRoot, 'index.html'), '<!doctype html><title>Loopbay</title>');
  writeFileSync(join(webRoot, 'assets', 'app-1234.js'), 'export {};');
  shop = await openTestShop({ webRoot });
  wire = await openWire(shop);
  await shopProfile(shop);
  manager = await shop.person(['manager']);
});
afterAll(async () => {
  wire.close();
  await shop.close();
  rmSync(webRoot, { recursive: true, force: true });
});
const get = (path: string, headers: Record<string, string> = {}, by: Person | null = manager) => wire.send(by, { method: 'GET', path, headers });

describe('a session’s token', () => {
  const own = () => claimsOf(manager.carries()['cookie']!.split('=')[1]!);
  const asks = async (jwt: string) => (await get('/api/session', { cookie: `loopbay_sid=${jwt}` }, null)).status;
  const now = () => Math.floor(Date.now() / 1000);
  const secret = () => shop.config.jwtSecret;

  it('made with our key for a session that lives is taken: the tests below fail for their own reason', async () => {
    expect(await asks(token(own(), { secret: secret() }))).toBe(200);
  });

  it.each([
    ['without a signature', () => unsigned(own(), 'none')],
    ['without a signature, in capitals', () => unsigned(own(), 'NONE')],
    ['without a signature, in both', () => unsigned(own(), 'nOnE')],
    ['with an empty signature', () => unsigned(own(), 'HS256')],
    ['with any signature', () => unsigned(own(), 'HS256', 'AAAA')],
    ['by another key', () => token(own(), { secret: 'another secret, long enough to be one' })],
    ['by an empty key', () => token(own(), { secret: '' })],
    ['by our key, in another way', () => token(own(), { secret: secret(), alg: 'HS512' })],
    ['by a key it brings along', () => selfSigned(own())],
    ['by a key from a path', () => token(own(), { secret: '', header: { kid: '../../../../dev/null' } })],
    ['by a key from a query', () => token(own(), { secret: 'x', header: { kid: "' UNION SELECT 'x" } })],
    ['that has run out', () => token({ ...own(), exp: now() - 1 }, { secret: secret() })],
    ['that is for later', () => token({ ...own(), nbf: now() + 3600 }, { secret: secret() })],
    ['for another audience', () => token({ ...own(), aud: 'another-shop' }, { secret: secret() })],
    ['for nobody', () => token({ ...own(), aud: undefined }, { secret: secret() })],
    ['by another issuer', () => token({ ...own(), iss: 'evil' }, { secret: secret() })],
    ['of a session nobody has', () => token({ ...own(), sid: '01900000-0000-7000-8000-000000000000' }, { secret: secret() })],
    ['of a user, not a session', () => token({ ...own(), sid: manager.userId }, { secret: secret() })],
    ['whose session is a list', () => token({ ...own(), sid: [own()['sid']] }, { secret: secret() })],
    ['whose session is a query', () => token({ ...own(), sid: "' OR 1=1--" }, { secret: secret() })],
    ['without a session', () => token({ ...own(), sid: undefined }, { secret: secret() })],
    ['that is no token', () => 'a.b.c'],
  ])('%s is not taken', async (_, make) => {
    expect(await asks(make())).toBe(401);
  });

  it('altered after it was signed is not taken', async () => {
    const [head, , signature] = token(own(), { secret: secret() }).split('.');
    const other = Buffer.from(JSON.stringify({ ...own(), sid: 'other' })).toString('base64url');
    expect(await asks(`${head}.${other}.${signature}`)).toBe(401);
  });

  it('counts in its cookie only: not in a header, an address or a body', async () => {
    const jwt = manager.carries()['cookie']!.split('=')[1]!;
    expect((await get('/api/session', { authorization: `Bearer ${jwt}` }, null)).status).toBe(401);
    expect((await get(`/api/session?loopbay_sid=${jwt}&access_token=${jwt}`, {}, null)).status).toBe(401);
  });

  it('names the session and nothing else: no role, no name, no customer', () => {
    expect(Object.keys(own()).sort()).toEqual(['aud', 'exp', 'iat', 'iss', 'sid']);
  });

  it('is a new one at every sign-in, whatever the browser brought along', async () => {
    const { email } = (await manager.get('/api/session')).body;
    const answer = await manager.post('/api/session', { email, password: TEST_PASSWORD }).set('cookie', 'loopbay_sid=chosen-by-somebody').expect(200);
    const fresh = String(answer.headers['set-cookie']).split(';')[0]!.split('=')[1]!;
    expect(claimsOf(fresh)['sid']).not.toBe(own()['sid']);
    expect(await asks('chosen-by-somebody')).toBe(401);
  });
});

describe('the cookie', () => {
  it('is out of reach for scripts and for other sites', async () => {
    await shop.person(['counter'], { email: 'cookie@shop.test' });
    const answer = await shop.nobody.post('/api/session', { email: 'cookie@shop.test', password: TEST_PASSWORD }).expect(200);
    const cookie = String(answer.headers['set-cookie']);
    expect(cookie).toMatch(/^loopbay_sid=/);
    for (const flag of ['HttpOnly', 'SameSite=Lax', 'Path=/', 'Max-Age=43200']) expect(cookie).toContain(flag);
    expect(cookie).not.toMatch(/Domain=/i);
  });
});

describe('who tries to get in', () => {
  const tries = (email: string, password = 'not it at all') => wire.send(null, { method: 'POST', path: '/api/session', body: JSON.stringify({ email, password }) });

  it('is not told whether the name, the password or the person is wrong', async () => {
    const disabled = await shop.person(['counter'], { email: 'gone@shop.test', name: 'Gone' });
    await manager.put(`/api/users/${disabled.userId}`, { version: 1, name: 'Gone', roles: ['counter'], disabled: true }).expect(200);
    await shop.person(['counter'], { email: 'here@shop.test' });
    const answers = await Promise.all([tries('here@shop.test'), tries('nobody@shop.test'), tries('gone@shop.test'), tries('gone@shop.test', TEST_PASSWORD)]);
    const shown = answers.map(({ status, text, headers }) => JSON.stringify({ status, text: text.replace(/"requestId":"[^"]+"/, ''), headers: Object.keys(headers).sort() }));
    expect(answers[0]!.status).toBe(401);
    expect(new Set(shown).size).toBe(1);
  });

  it('does not learn it from the time the answer takes either', async () => {
    await shop.person(['counter'], { email: 'timed@shop.test' });
    const fastest = async (emails: readonly string[]) => {
      const times: number[] = [];
      for (const email of emails) times.push((await tries(email)).ms);
      return Math.min(...times);
    };
    const known = await fastest(Array.from({ length: 9 }, () => 'timed@shop.test'));
    const unknown = await fastest(Array.from({ length: 9 }, (_, i) => `untimed${i}@shop.test`));
    expect(unknown / known).toBeGreaterThan(0.5);
    expect(unknown / known).toBeLessThan(2);
  });

  it('has ten tries, and no more by sending forty at once', async () => {
    await shop.person(['counter'], { email: 'braked@shop.test' });
    const statuses = (await Promise.all(Array.from({ length: 40 }, (_, i) => tries('braked@shop.test', `guess ${i}`)))).map((a) => a.status);
    expect(statuses.filter((s) => s === 401)).toHaveLength(10);
    expect(statuses.filter((s) => s === 429)).toHaveLength(30);
  });

  it('does not get more of them by writing the name in capitals', async () => {
    await shop.person(['counter'], { email: 'cased@shop.test' });
    for (let i = 0; i < 10; i += 1) await tries(i % 2 ? 'CASED@shop.test' : ' cased@SHOP.test');
    expect((await tries('cased@shop.test', TEST_PASSWORD)).status).toBe(429);
  });
});

describe('every answer', () => {
  const paths = ['/api/session', '/api/nothing', '/nothing.php', '/api/docs', '/api/docs-json', '/api/jobs.csv', '/api/health/ready', '/', '/jobs/anything', '/assets/app-1234.js', '/assets/nothing.js', '/api/jobs/%', `/api/jobs/${'a'.repeat(300)}`];

  it('is read as what it says it is, framed by nobody, and runs no script but ours', async () => {
    for (const path of paths) {
      const { headers } = await get(path);
      expect(headers['x-content-type-options'], path).toBe('nosniff');
      const csp = String(headers['content-security-policy']);
      expect(csp, path).toMatch(/frame-ancestors 'none'/);
      expect(csp, path).not.toMatch(/script-src[^;]*(unsafe|\*|http:)/);
      expect(headers['referrer-policy'], path).toBe('same-origin');
      expect(headers['x-powered-by'] ?? headers['server'], path).toBeUndefined();
      if (String(headers['content-type']).startsWith('text/')) expect(headers['content-type'], path).toMatch(/charset=utf-8/i);
    }
    const page = String((await get('/')).headers['content-security-policy']);
    for (const rule of ["default-src 'self'", "script-src 'self'", "object-src 'none'", "base-uri 'none'", "form-action 'self'"]) expect(page).toContain(rule);
  });

  it('of the shop’s data is kept by no cache, however its address is written', async () => {
    for (const path of ['/api/session', '/api/jobs', '/api/jobs.csv', '/%61pi/jobs', '/api/nothing', '/api/portal', '/api/jobs/%']) expect((await get(path)).headers['cache-control'], path).toBe('no-store');
    const refused = await wire.send(manager, { method: 'POST', path: '/api/customers', body: '{}', headers: { origin: 'http://evil.test' } });
    expect(refused.headers).toMatchObject({ 'cache-control': 'no-store', 'x-content-type-options': 'nosniff' });
    expect(faultOf(refused)).toBeNull();
    expect((await get('/assets/app-1234.js')).headers['cache-control']).toMatch(/immutable/);
    expect((await get('/')).headers['cache-control']).toBe('no-cache');
  });

  it('is for our own pages: no other site is let in', async () => {
    for (const origin of ['http://evil.test', 'null', 'http://shop.test.evil.test', 'http://shop.test:81']) {
      const { headers } = await get('/api/session', { origin });
      expect(Object.keys(headers).filter((name) => name.startsWith('access-control')), origin).toEqual([]);
      const preflight = await wire.send(null, { method: 'OPTIONS', path: '/api/customers', headers: { origin, 'access-control-request-method': 'POST' } });
      expect(Object.keys(preflight.headers).filter((name) => name.startsWith('access-control')), origin).toEqual([]);
      for (const type of ['text/plain', 'application/x-www-form-urlencoded', 'application/json']) {
        const sent = await wire.send(manager, { method: 'POST', path: '/api/session/end', body: '{}', headers: { origin, 'content-type': type } });
        expect(`${origin} ${type} ${sent.status}`).toBe(`${origin} ${type} 403`);
      }
    }
    expect((await get('/api/session')).status).toBe(200);
  });

  it('sends nobody anywhere else', async () => {
    const traps = ['//evil.test', '///evil.test/..', '/\\evil.test', '//evil.test/%2e%2e', '/https:evil.test', '/assets//evil.test', '/assets/..//evil.test', '/assets'];
    const gets = handlersOf(shop).filter((h) => h.method === 'get').map((h) => h.path.replace(/:\w+/g, '01900000-0000-7000-8000-000000000000'));
    for (const path of [...traps, ...gets.flatMap((p) => [`${p}?next=//evil.test`, `${p}?returnTo=https:evil.test&url=%2F%5Cevil.test`]), '/?next=//evil.test']) {
      const { status, headers } = await get(path);
      expect(headers['location'] ?? `none ${status}`, path).toMatch(/^none/);
      expect(status < 300 || status >= 400, `${path} ${status}`).toBe(true);
    }
  });

  it('of a file that is no screen of ours: there is none', async () => {
    for (const path of ['/.env', '/.git/HEAD.x', '/package.json', '/app.js.map', '/uploads/x.png', '/metrics.txt', '/loopbay.sqlite', '/..%2f..%2f..%2fetc%2fpasswd.x', '/assets/..%2f..%2findex.html', '/assets/%2e%2e/%2e%2e/package.json', '/assets/app-1234.js.map', '/assets/', '/%2e%2e/loopbay.sqlite']) {
      const { status, text } = await get(path);
      expect(`${path} ${status}`).toMatch(/ (400|403|404)$/);
      expect(text).not.toContain('root:');
    }
    for (const path of ['/.git/config', '/uploads/', '/metrics']) expect((await get(path)).text).not.toMatch(/\[core\]|process_cpu|SQLite/);
  });
});

describe('a method', () => {
  it('nobody offers does nothing, and is not echoed', async () => {
    for (const method of ['TRACE', 'PATCH', 'DELETE', 'PROPFIND', 'LINK', 'QUERY', 'MOVE']) {
      const answer = await wire.send(manager, { method, path: '/api/customers', headers: { 'x-canary': 'ECHOED' } });
      expect(`${method} ${answer.status}`).toMatch(/ (400|404|405|501)$/);
      expect(answer.text).not.toContain('ECHOED');
    }
  });

  it('is the one of the request, whatever a header or an address says', async () => {
    for (const header of ['x-http-method-override', 'x-http-method', 'x-method-override']) {
      expect((await get('/api/session/end?_method=POST', { [header]: 'POST' })).status).toBe(404);
      await wire.send(manager, { method: 'POST', path: '/api/session?_method=PUT', body: '{"_method":"PUT"}', headers: { [header]: 'DELETE' } });
    }
    expect((await get('/api/session')).status).toBe(200);
  });

  it('that only reads changes nothing: no GET ends a session or writes a line of history', async () => {
    for (const h of handlersOf(shop)) if (h.method !== 'get') expect((await get(h.path.replace(/:\w+/g, '01900000-0000-7000-8000-000000000000'))).status, h.path).not.toBe(500);
    expect((await get('/api/session')).status).toBe(200);
  });
});

describe('a body', () => {
  it('that is no JSON is refused without a word of how it was read', async () => {
    const answer = await wire.send(manager, { method: 'POST', path: '/api/customers', body: '{"name": <script>' });
    expect(answer.status).toBe(400);
    expect(answer.text).not.toMatch(/JSON|position|token|script/i);
    expect(faultOf(answer)).toBeNull();
  });

  it('larger than half a megabyte is refused by what it says of itself, before it has come', async () => {
    const large = await wire.send(manager, { method: 'POST', path: '/api/customers', body: JSON.stringify({ name: 'x'.repeat(600_000) }) });
    expect(large.status).toBe(413);
    expect(faultOf(large)).toBeNull();
    const just = await wire.send(manager, { method: 'POST', path: '/api/customers', body: JSON.stringify({ name: 'x'.repeat(500_000) }) });
    expect(just.status).toBe(400);
  });

  it('with more in it than was asked for is refused by name, and changes nothing', async () => {
    const customer = (await manager.post('/api/customers', { ...NEW_CUSTOMER, name: 'Assigned' }).expect(201)).body;
    const { id, terms: _t, netDays: _n, creditStop: _c, ...details } = customer;
    for (const more of [{ id: 'chosen-by-me' }, { creditStop: true }, { terms: 'account' }, { createdAt: '2000-01-01' }, { role: 'manager' }]) {
      const answer = await manager.put(`/api/customers/${id}`, { ...details, ...more });
      expect(answer.status).toBe(400);
      expect(JSON.stringify(answer.body.fields)).toContain(Object.keys(more)[0]);
    }
    expect((await manager.get(`/api/customers/${id}`)).body).toEqual(customer);
  });

  it('with __proto__ in it changes no other object', async () => {
    await wire.send(manager, { method: 'POST', path: '/api/customers', body: '{"__proto__":{"polluted":true},"constructor":{"prototype":{"polluted":true}}}' });
    await get('/api/customers?__proto__[polluted]=1&constructor[prototype][polluted]=1');
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });
});

describe('the data folder', () => {
  it.runIf(process.platform !== 'win32')('is entered by the shop’s own account alone', () => {
    for (const dir of [uploadsDir(shop.config.dataDir), papersDir(shop.config.dataDir)]) expect(statSync(dir).mode & 0o077, dir).toBe(0);
  });
});

describe('what people write', () => {
  const HOSTILE = '<img src=x onerror="alert(1)">';

  it('stands in the mail as text, not as a picture, and links lead to the shop’s own address whatever host was asked', async () => {
    shop.mail.sent.length = 0;
    const evil = { host: 'evil.test', origin: 'http://evil.test', 'x-forwarded-host': 'evil.test', 'x-forwarded-proto': 'https', forwarded: 'host=evil.test' };
    const body = bookIn({ customer: { kind: 'new', details: { ...NEW_CUSTOMER, name: HOSTILE, contactName: HOSTILE } }, machine: { kind: 'new', details: { description: HOSTILE, nameplate: { ...PLATE, serial: HOSTILE } } }, complaint: `${HOSTILE} javascript:alert(1) {{7*7}}` });
    const booked = await wire.send(manager, { method: 'POST', path: '/api/jobs', body: JSON.stringify(body), headers: evil });
    expect(booked.status).toBe(201);
    const job = await jobInShop(shop, manager, { name: HOSTILE, contactName: HOSTILE, email: 'hostile@customers.test' });
    await shop.person(['customer'], { customerId: job.customerId });
    const quote = (await manager.post(`/api/jobs/${job.jobId}/quotes`, { ...QUOTE, note: HOSTILE }).expect(201)).body;
    expect((await wire.send(manager, { method: 'POST', path: `/api/quotes/${quote.id}/send`, body: '{"version":1}', headers: evil })).status).toBe(201);
    await shop.postman();
    expect(shop.mail.sent).toHaveLength(2);
    for (const { html, text, subject } of shop.mail.sent) {
      expect(html).not.toMatch(/<img|<script/i);
      expect(html).toContain('&lt;img src=x onerror=&quot;alert(1)&quot;&gt;');
      expect(html + text + subject).not.toContain('evil.test');
      for (const [, link] of html.matchAll(/href="([^"]*)"/g)) expect(link).toMatch(/^http:\/\/shop\.test\//);
    }
    expect(shop.mail.sent.at(-1)!.html).toContain(`http://shop.test/portal/quotes/${quote.id}`);
  });

  it('never becomes a line of its own: names with line breaks are refused at their field', async () => {
    for (const name of ['Evil\r\nBcc: all@evil.test', 'Evil\nSubject: x', 'Evil\rX', 'Evil\u0000']) {
      for (const field of ['name', 'contactName', 'phone', 'city']) {
        const answer = await manager.post('/api/customers', { ...NEW_CUSTOMER, [field]: name });
        expect(answer.status).toBe(400);
        expect(answer.body.fields[0].path).toBe(field);
      }
    }
    for (const email of ['a@b.test\r\nBcc: x@evil.test', 'a@b.test, x@evil.test', '"x@evil.test" <a@b.test>', 'a@b.test;x@evil.test']) expect((await manager.post('/api/customers', { ...NEW_CUSTOMER, email })).status).toBe(400);
  });

  it('is no formula in the exported list', async () => {
    for (const name of ['=cmd|A0', '+1+1', '-2+3', '@SUM(A1)', '＝1']) await bookedIn(manager, { customer: { kind: 'new', details: { ...NEW_CUSTOMER, name } } });
    const { text } = await get('/api/jobs.csv?state=all');
    const csv = Buffer.from(text, 'latin1').toString('utf8');
    for (const cell of ["'=cmd|A0", "'+1+1", "'-2+3", "'@SUM(A1)", "'＝1"]) expect(csv).toContain(cell);
    expect(csv).not.toMatch(/(^|,)"?[=+@＝]/m);
  });
});

describe('a paper opened in a tab of its own', () => {
  const opened = { 'sec-fetch-dest': 'document', accept: 'text/html' };

  it('that is not there is answered with words and a way on, and a page that asks for it still gets data', async () => {
    const path = '/api/papers/01a1e84e-0000-7000-8000-000000000000/pdf';
    const page = await get(path, opened);
    expect([page.status, String(page.headers['content-type'])]).toEqual([404, 'text/html; charset=utf-8']);
    expect(page.text).toContain('<a href="/">To the start</a>');
    expect(String((await get(path)).headers['content-type'])).toContain('application/json');
  });

  it('by somebody who is not signed in asks to sign in, and shows nothing of the paper', async () => {
    const page = await get('/api/papers/01a1e84e-0000-7000-8000-000000000000/pdf', opened, null);
    expect([page.status, page.text]).toEqual([401, expect.stringContaining('Sign in')]);
  });
});
