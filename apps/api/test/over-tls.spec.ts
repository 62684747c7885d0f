import { getDataSourceToken } from '@nestjs/typeorm';
import type { DataSource } from 'typeorm';
import { afterEach, describe, expect, it } from 'vitest';
import { openTestShop, TEST_PASSWORD, type TestShop } from './test-app.js';

let shop: TestShop | undefined;
afterEach(async () => {
  await shop?.close();
  shop = undefined;
});

describe('a shop behind TLS', () => {
  it('gives a cookie that goes nowhere else and belongs to this very host, and tells the browser to stay with TLS', async () => {
    shop = await openTestShop({ publicUrl: 'https://shop.test' });
    await shop.person(['counter'], { email: 'cookie@shop.test' });
    const answer = await shop.nobody.post('/api/session', { email: 'cookie@shop.test', password: TEST_PASSWORD }).set('origin', 'https://shop.test').expect(200);
    expect(String(answer.headers['set-cookie'])).toMatch(/^__Host-loopbay_sid=[^;]+;.*Secure/);
    expect(String(answer.headers['set-cookie'])).toMatch(/Path=\//);
    expect(String(answer.headers['set-cookie'])).not.toMatch(/Domain=/i);
    expect(answer.headers['strict-transport-security']).toMatch(/max-age=31536000/);
    const pair = String(answer.headers['set-cookie']).split(';')[0]!;
    await shop.nobody.get('/api/session').set('cookie', pair).expect(200);
    await shop.nobody.get('/api/session').set('cookie', pair.replace('__Host-', '')).expect(401);
    const end = await shop.nobody.post('/api/session/end').set('cookie', pair).set('origin', 'https://shop.test').expect(204);
    expect(String(end.headers['set-cookie'])).toMatch(/^__Host-loopbay_sid=;.*Secure/);
  });
});

describe('a shop whose database cannot be read', () => {
  it('says so with the status a watchdog looks for, and nothing of the inside', async () => {
    shop = await openTestShop();
    await shop.app.get<DataSource>(getDataSourceToken('read')).destroy();
    const answer = await shop.nobody.get('/api/health/ready').expect(503);
    expect(answer.text).not.toMatch(/sqlite|typeorm|connection|\n\s+at /i);
    await shop.nobody.get('/api/health/live').expect(200);
  });
});
