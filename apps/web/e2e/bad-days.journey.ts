import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { DEMO_PASSWORD } from '../../../mocks/sample-shop/sign-ins.js';
import { BenchWalk } from './bench-walk.js';
import { button, fill } from './forms.js';
import { OpenShop } from './open-shop.js';

let shop: OpenShop;
const bench = new BenchWalk();
/** a job at the core test after, whose first test could not tell; another customer's than the one in the portal */
let job = '';
beforeAll(async () => {
  shop = await OpenShop.open();
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await shop.pictureAll('failed');
});
afterAll(() => shop?.close());

const heading = (page: Page, name: RegExp) => page.getByRole('heading', { level: 1, name }).waitFor();
const field = (page: Page, label: string) => page.getByLabel(new RegExp(`^${label}\\s*(\\(optional\\))?$`)).first();
/** Words that stand on the page where a person sees them. */
const says = (page: Page, words: RegExp) => page.getByText(words).locator('visible=true').first().waitFor();
/** What the server answers to a person who is signed in there. */
const ask = (page: Page, path: string) => page.evaluate(async (p) => (await fetch(`/api${p}`)).json() as Promise<unknown>, path);
const recordsOf = async (page: Page) => ((await ask(page, `${job}/records`)) as { kind: string }[]).filter((r) => r.kind === 'core-test-after').length;

async function units(page: Page, name: 'SI' | 'inch-pound'): Promise<void> {
  await button(page, /^Signed in as/).click();
  // a person taps the word
  const kept = page.waitForResponse((r) => r.url().endsWith('/api/session/preferences'));
  await page.getByText(name, { exact: true }).click();
  await kept;
  await page.getByRole('radio', { name, exact: true, checked: true }).waitFor({ state: 'attached' });
  await page.keyboard.press('Escape');
  await page.locator('.lb-account').waitFor({ state: 'detached' });
}

/** Opens the facts of the job for changing. */
async function changeFacts(page: Page): Promise<void> {
  await page.goto(`${shop.address}${job}`);
  await heading(page, /^J\d{4}-\d{4}/);
  await button(page, 'Change').click();
  await field(page, 'What is wrong with it').waitFor();
}

describe('bad days in the bay', () => {
  it('a figure that cannot be is named in words, and stays as it was typed', async () => {
    const technician = await shop.as('technician', { width: 1280, height: 800 });
    await technician.goto(`${shop.address}/floor`);
    await technician.getByRole('row', { name: /Corvel Plastics/ }).getByRole('link', { name: /^J\d{4}-\d{4}$/ }).click();
    await heading(technician, /^J\d{4}-\d{4}/);
    job = new URL(technician.url()).pathname;
    await technician.goto(`${shop.address}${job}/work/core-test-after?again=1`);
    await bench.passCaution(technician);
    await bench.checks(technician);
    await fill(technician, { 'Search-coil volts': '8.084', 'Exciting amps': '26,6', 'Watts as read': '41.2', Ambient: '22', 'Core at start': '22', Mean: '28.1', Hottest: '32.0', 'at slot': '9', 'Full flux for': '20' });
    await says(technician, /^conforms$/);
    const wrong: readonly (readonly [label: string, typed: string, words: RegExp])[] = [
      ['Watts as read', 'forty-one', /“forty-one” is not a number/],
      ['Search-coil volts', '8,084', /“8,084” can be 8084 or 8\.084\. Write the one you mean without the comma/],
      ['Turns', '-16', /Count the exciting turns: a whole number, 1 or more/],
      ['Slot depth', '280', /nothing is left for the back iron/],
      ['Search-coil volts', '80', /which no steel carries\. Check volts, search turns/],
      ['Density', '0', /density/i],
    ];
    for (const [label, typed, words] of wrong) {
      const right = await field(technician, label).inputValue();
      await fill(technician, { [label]: typed });
      await field(technician, label).press('Tab');
      await says(technician, words);
      expect(await field(technician, label).inputValue(), label).toBe(typed);
      expect(await technician.getByText('conforms', { exact: true }).locator('visible=true').count(), `no verdict stands beside ${label} ${typed}`).toBe(0);
      await fill(technician, { [label]: right });
      await says(technician, /^conforms$/);
    }
  });

  it('units changed in the middle of a test and back lose nothing', async () => {
    const technician = await shop.as('technician');
    await units(technician, 'inch-pound');
    await expect.poll(() => field(technician, 'Hottest').inputValue()).toBe('89.6');
    await says(technician, /^conforms$/);
    await shop.accessible(technician, 'the bench in inch-pound');
    await units(technician, 'SI');
    await expect.poll(() => field(technician, 'Hottest').inputValue()).toBe('32.0');
    expect(await field(technician, 'Exciting amps').inputValue(), 'the decimal comma as it was typed').toBe('26,6');
    expect(await field(technician, 'Slot depth').inputValue()).toBe('28');
  });

  it('a sign-in that ended meanwhile is taken up over the form, and a double tap keeps one record', async () => {
    const technician = await shop.as('technician');
    const before = await recordsOf(technician);
    // the same person, signed out everywhere from another device
    expect(await technician.evaluate(async () => (await fetch('/api/session/end-all', { method: 'POST' })).status)).toBe(204);
    await button(technician, 'Save the test').dblclick();
    const dialog = technician.getByRole('dialog', { name: 'Sign in again' });
    await dialog.waitFor();
    expect(await field(technician, 'Exciting amps').inputValue()).toBe('26,6');
    await fill(dialog, { Password: 'not my password' });
    await button(dialog, 'Sign in').click();
    await dialog.getByRole('alert').waitFor();
    await fill(dialog, { Password: DEMO_PASSWORD });
    await button(dialog, 'Sign in').click();
    await technician.getByText(/^Kept as no\./).waitFor();
    expect(await recordsOf(technician)).toBe(before + 1);
  });
});

describe('bad days at the counter', () => {
  it('two people change one job: both see both values, and each may take theirs or keep their own', async () => {
    const counter = await shop.as('counter', { width: 1024, height: 768 });
    const manager = await shop.as('manager');
    await changeFacts(counter);
    await changeFacts(manager);
    await fill(manager, { 'What is wrong with it': 'Hums, and smells of varnish.' });
    await button(manager, 'Save').click();
    await manager.getByText('Hums, and smells of varnish.').first().waitFor();

    await fill(counter, { 'What is wrong with it': 'Trips after ten minutes.', 'Customer’s reference': 'CP-4711' });
    await button(counter, 'Save').click();
    const conflict = counter.getByRole('alert').filter({ hasText: 'Somebody else changed this meanwhile' });
    await conflict.getByRole('row', { name: /Hums, and smells of varnish\..*Trips after ten minutes\./ }).waitFor();
    await shop.picture(counter, 'two-people');
    await shop.accessible(counter, 'two people at one job');
    await changeFacts(manager);
    await button(conflict, 'Keep mine and save').click();
    await counter.getByText('Trips after ten minutes.').first().waitFor();
    await button(counter, 'Change').waitFor();

    await fill(manager, { 'What is wrong with it': 'Runs hot.' });
    await button(manager, 'Save').click();
    await button(manager, 'Take theirs').click();
    expect(await field(manager, 'What is wrong with it').inputValue()).toBe('Trips after ten minutes.');
    expect(await field(manager, 'Customer’s reference').inputValue()).toBe('CP-4711');
    await button(manager, 'Save').click();
    await button(manager, 'Change').waitFor();
  });

  it('a shop’s computer that does not answer is said, the form stays, and saving again works', async () => {
    const counter = await shop.as('counter');
    await changeFacts(counter);
    await counter.route('**/api/**', (route) => route.abort());
    await fill(counter, { 'What came with it': 'half coupling' });
    await button(counter, 'Save').click();
    await says(counter, /does not answer\. What you typed is kept/);
    expect(await field(counter, 'What came with it').inputValue()).toBe('half coupling');
    await counter.unroute('**/api/**');
    await button(counter, 'Save').click();
    await counter.getByText('half coupling').first().waitFor();
    await button(counter, 'Change').waitFor();
  });

  it('a photo that is none, and a film of fifty megabytes, are refused with words', async () => {
    const counter = await shop.as('counter');
    await counter.goto(`${shop.address}${job}`);
    await counter.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: /Photos/ }).click();
    const files = counter.locator('input[type=file][multiple]');
    await files.setInputFiles({ name: 'plate.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('this is a shopping list') });
    await says(counter, /plate\.jpg: /);
    await says(counter, /PNG, JPEG, WebP or PDF/);
    await files.evaluate((input: HTMLInputElement) => {
      const chosen = new DataTransfer();
      chosen.items.add(new File([new Uint8Array(50 * 1024 * 1024)], 'film.jpg', { type: 'image/jpeg' }));
      input.files = chosen.files;
      input.dispatchEvent(new Event('change', { bubbles: true }));
    });
    await says(counter, /film\.jpg: This file has .*at most 15 MB/);
    // past the page, straight at the server
    const answer = await counter.evaluate(async (path) => {
      const form = new FormData();
      form.append('file', new File([new Uint8Array(50 * 1024 * 1024)], 'film.jpg', { type: 'image/jpeg' }));
      const response = await fetch(`/api${path}/attachments`, { method: 'POST', body: form });
      return { status: response.status, body: (await response.json()) as { message: string } };
    }, job);
    expect(answer.status).toBe(413);
    expect(answer.body.message).toMatch(/15 MB at most/);
    await shop.accessible(counter, 'photos that were refused');
  });

  it('a job is found by the keyboard alone, and the dark theme stays readable', async () => {
    const counter = await shop.as('counter');
    const { number } = (await ask(counter, job)) as { number: string };
    await counter.goto(`${shop.address}/counter`);
    await heading(counter, /Counter/);
    await counter.keyboard.press('/');
    await counter.getByRole('combobox').waitFor();
    await counter.keyboard.type(number);
    await counter.getByRole('option', { name: new RegExp(number) }).waitFor();
    await counter.keyboard.press('Enter');
    await heading(counter, new RegExp(`^${number}`));
    await button(counter, /^Signed in as/).click();
    await counter.getByText('dark', { exact: true }).click();
    await counter.locator('body.bp6-dark').waitFor();
    await counter.keyboard.press('Escape');
    // half faded out, its words are too pale to judge
    await counter.locator('.lb-account').waitFor({ state: 'detached' });
    await shop.picture(counter, 'dark');
    await shop.accessible(counter, 'a job in the dark theme');
  });
});

describe('a customer who tries addresses', () => {
  it('finds nothing at the addresses of another customer’s job, quote, invoice, paper and photo', async () => {
    const manager = await shop.as('manager');
    const customer = await shop.as('customer', { width: 390, height: 844 });
    const { customerId } = (await ask(customer, '/session')) as { customerId: string };
    type Sheet = { customer: { id: string }; papers: { id: string }[] };
    const found = new Map<string, string>();
    const { rows } = (await ask(manager, '/jobs?state=all&size=100')) as { rows: { id: string }[] };
    for (const { id } of rows) {
      const sheet = (await ask(manager, `/jobs/${id}`)) as Sheet;
      if (sheet.customer.id === customerId) continue;
      const [quote] = (await ask(manager, `/jobs/${id}/quotes`)) as { id: string }[];
      const [invoice] = (await ask(manager, `/jobs/${id}/invoices`)) as { id: string }[];
      found.set('job', id);
      if (quote) found.set('quote', quote.id);
      if (invoice) found.set('invoice', invoice.id);
      if (sheet.papers[0]) found.set('paper', sheet.papers[0].id);
    }
    // a photo of another customer’s machine
    const photo = await manager.evaluate(async (id) => {
      const canvas = new OffscreenCanvas(40, 30);
      canvas.getContext('2d')!.fillRect(0, 0, 20, 30);
      const form = new FormData();
      form.append('file', new File([await canvas.convertToBlob()], 'plate.png', { type: 'image/png' }));
      const response = await fetch(`/api/jobs/${id}/attachments`, { method: 'POST', body: form });
      return (await response.json()) as { id: string };
    }, found.get('job')!);
    found.set('photo', photo.id);
    expect([...found.keys()].sort()).toEqual(['invoice', 'job', 'paper', 'photo', 'quote']);
    for (const kind of ['job', 'quote', 'invoice']) {
      await customer.goto(`${shop.address}/portal/${kind}s/${found.get(kind)}`);
      await heading(customer, /nothing at this address/);
      await shop.accessible(customer, `another customer’s ${kind}`);
    }
    for (const address of [`/portal/papers/${found.get('paper')}/pdf`, `/portal/attachments/${found.get('photo')}`, `/papers/${found.get('paper')}/pdf`, `/attachments/${found.get('photo')}`, `/jobs/${found.get('job')}`]) {
      const status = await customer.evaluate(async (path) => (await fetch(`/api${path}`)).status, address);
      expect(address.startsWith('/portal') ? [404] : [403, 404], address).toContain(status);
    }
    expect(shop.complaints.filter((c) => !/ERR_FAILED/.test(c))).toEqual([]);
  });
});
