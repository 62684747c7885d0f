import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openTestShop, TEST_PASSWORD, type TestShop } from './test-app.js';

let shop: TestShop;
beforeAll(async () => {
  shop = await openTestShop();
});
afterAll(() => shop.close());

describe('signing in', () => {
  it('a stranger is told to sign in, with the number of the request', async () => {
    const answer = await shop.nobody.get('/api/session');
    expect(answer.status).toBe(401);
    expect(answer.body).toMatchObject({ code: 'NOT_SIGNED_IN', requestId: answer.headers['x-request-id'] });
  });

  it('who signs in is told who they are and what they may do', async () => {
    const technician = await shop.person(['technician'], { name: 'Mara Winkel' });
    const me = await technician.get('/api/session').expect(200);
    expect(me.body).toMatchObject({ name: 'Mara Winkel', roles: ['technician'], preferences: { units: 'si' } });
    expect(me.body.permissions).toContain('records.write');
    expect(me.body.permissions).not.toContain('concessions.sign');
  });

  it('a wrong password and an unknown name get the same answer', async () => {
    await shop.person(['office'], { email: 'office@shop.test' });
    const wrong = await shop.nobody.post('/api/session', { email: 'office@shop.test', password: 'not it at all' });
    const unknown = await shop.nobody.post('/api/session', { email: 'nobody@shop.test', password: 'not it at all' });
    expect(wrong.status).toBe(401);
    expect({ ...wrong.body, requestId: '' }).toEqual({ ...unknown.body, requestId: '' });
  });

  it('after ten wrong tries for one name there is a pause, and others still get in', async () => {
    await shop.person(['counter'], { email: 'counter@shop.test' });
    for (let i = 0; i < 10; i += 1) await shop.nobody.post('/api/session', { email: 'counter@shop.test', password: `wrong ${i}` }).expect(401);
    await shop.nobody.post('/api/session', { email: 'counter@shop.test', password: TEST_PASSWORD }).expect(429);
    await shop.person(['counter'], { email: 'other@shop.test' });
  });

  it('a session is dead at once after signing out', async () => {
    const person = await shop.person(['counter']);
    await person.get('/api/session').expect(200);
    await person.post('/api/session/end').expect(204);
    await person.get('/api/session').expect(401);
  });

  it('a session is dead at once when its user is disabled', async () => {
    const manager = await shop.person(['manager']);
    const person = await shop.person(['counter']);
    const user = (await manager.get('/api/users')).body.find((u: { id: string }) => u.id === person.userId);
    await manager.put(`/api/users/${person.userId}`, { version: user.version, name: user.name, roles: ['counter'], disabled: true }).expect(200);
    await person.get('/api/session').expect(401);
  });

  it('a manager who loses the role loses its powers at the next request, token or not', async () => {
    const first = await shop.person(['manager']);
    const second = await shop.person(['manager']);
    await second.get('/api/users').expect(200);
    const user = (await first.get('/api/users')).body.find((u: { id: string }) => u.id === second.userId);
    await first.put(`/api/users/${second.userId}`, { version: user.version, name: user.name, roles: ['counter'], disabled: false }).expect(200);
    await second.get('/api/users').expect(403);
  });

  it('a request from another site’s page is refused although the browser sends the cookie along', async () => {
    const person = await shop.person(['counter']);
    const answer = await person.post('/api/session/end').set('origin', 'http://evil.test');
    expect(answer.status).toBe(403);
    expect(answer.body.code).toBe('CROSS_SITE_REQUEST');
    await person.get('/api/session').expect(200);
  });

  it('an unknown key in a message is refused by name', async () => {
    const answer = await shop.nobody.post('/api/session', { email: 'a@shop.test', password: 'x', role: 'manager' });
    expect(answer.status).toBe(400);
    expect(JSON.stringify(answer.body.fields)).toContain('role');
  });

  it('a user changed by somebody else meanwhile is shown as it is now', async () => {
    const manager = await shop.person(['manager']);
    const person = await shop.person(['counter']);
    const change = { version: 1, name: 'New Name', roles: ['counter'], disabled: false };
    await manager.put(`/api/users/${person.userId}`, change).expect(200);
    const stale = await manager.put(`/api/users/${person.userId}`, { ...change, name: 'Other Name' });
    expect(stale.status).toBe(409);
    expect(stale.body).toMatchObject({ code: 'CHANGED_MEANWHILE', current: { name: 'New Name', version: 2 } });
  });
});
