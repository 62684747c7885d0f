import { may, ROLES, type Permission, type Role } from '@shared/roles';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { handlersOf, type Handler } from './handlers.js';
import { Person, openTestShop, type TestShop } from './test-app.js';

let shop: TestShop;
let handlers: Handler[];
const people = new Map<Role, Person>();
beforeAll(async () => {
  shop = await openTestShop();
  handlers = handlersOf(shop);
  for (const role of ROLES) people.set(role, await shop.person([role], role === 'customer' ? { customerId: await someCustomer() } : {}));
});
afterAll(() => shop.close());

async function someCustomer(): Promise<string> {
  const counter = await shop.person(['counter']);
  return (await counter.post('/api/customers', { name: 'Someone', email: 'someone@shop.test' }).expect(201)).body.id as string;
}

const filled = (path: string) => path.replace(/:(number)/g, 'J2026-9999').replace(/:version/g, '999').replace(/:code/g, 'AAAA-BBBB-CCCC').replace(/:\w+/g, '01900000-0000-7000-8000-000000000000');
const ask = (person: Person, h: Handler) => (h.method === 'get' ? person.get(filled(h.path)) : h.method === 'put' ? person.put(filled(h.path), {}) : person.post(filled(h.path), {}));
const PUBLIC = ['HealthController.live', 'HealthController.ready', 'SessionController.signIn', 'CertificatesController.check'];

describe('who may do what', () => {
  it('every handler says what it needs', () => {
    expect(handlers.length).toBeGreaterThan(50);
    expect(handlers.filter((h) => h.needs === undefined).map((h) => h.name)).toEqual([]);
  });

  it('only health, sign-in, the certificate check and the payment service’s events are open to everybody', () => {
    const open = handlers.filter((h) => h.needs === 'public').map((h) => h.name);
    expect(open.filter((name) => !PUBLIC.includes(name)).every((name) => /event/i.test(name))).toBe(true);
    expect(open).toHaveLength(PUBLIC.length + 1);
  });

  it('a stranger is asked to sign in at every other address', async () => {
    for (const h of handlers.filter((x) => x.needs !== 'public')) {
      const answer = await ask(shop.nobody, h);
      expect(`${h.method} ${h.path} ${answer.status}`).toBe(`${h.method} ${h.path} 401`);
    }
  });

  it.each(ROLES.map((role) => [role]))('a %s is refused exactly where the table says so', async (role) => {
    const person = people.get(role)!;
    for (const h of handlers.filter((x) => x.needs !== 'public' && !x.path.includes('session/end'))) {
      const answer = await ask(person, h);
      const refused = answer.status === 403 && answer.body.code === 'FORBIDDEN';
      expect(`${h.method} ${h.path} refused: ${refused}`).toBe(`${h.method} ${h.path} refused: ${!may([role], h.needs as Permission)}`);
      expect(answer.status, `${h.method} ${h.path}`).toBeLessThan(500);
    }
  });

  it('every address of the API stands in its document', async () => {
    const document = (await people.get('manager')!.get('/api/docs-json').expect(200)).body as { paths: Record<string, object> };
    const known = new Set(Object.entries(document.paths).flatMap(([path, methods]) => Object.keys(methods).map((m) => `${m} ${path.replace(/\{(\w+)\}/g, ':$1')}`)));
    expect(handlers.filter((h) => !known.has(`${h.method} ${h.path}`)).map((h) => `${h.method} ${h.path}`)).toEqual([]);
  });
});
