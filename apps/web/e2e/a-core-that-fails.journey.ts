import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { DEMO_PASSWORD } from '../../../mocks/sample-shop/sign-ins.js';
import { BenchWalk } from './bench-walk.js';
import { button, choose, fill, press } from './forms.js';
import { OpenShop } from './open-shop.js';

let shop: OpenShop;
const bench = new BenchWalk();
let job = '';
beforeAll(async () => {
  shop = await OpenShop.open();
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await shop.pictureAll('failed');
});
afterAll(() => shop?.close());

/** The search box, as a scanner or a hurried hand uses it. */
async function find(page: Page, words: string): Promise<void> {
  await page.keyboard.press('/');
  await page.getByRole('combobox').fill(words);
  await page.getByRole('option', { name: new RegExp(words) }).first().click();
  await page.getByRole('heading', { level: 1, name: /^J\d{4}-\d{4}/ }).waitFor();
}

describe('a core that fails after burnout', () => {
  it('a test that cannot tell is repeated, and what is typed wrong is named without losing anything', async () => {
    const technician = await shop.as('technician', { width: 1024, height: 768 });
    await technician.getByRole('link', { name: 'Floor' }).click();
    await technician.getByRole('link', { name: /^J\d{4}-\d{4}$/ }).first().waitFor();
    await technician.getByRole('row', { name: /Corvel Plastics/ }).getByRole('link', { name: /^J\d{4}-\d{4}$/ }).click();
    await technician.getByRole('heading', { level: 1, name: /^J\d{4}-\d{4}/ }).waitFor();
    job = new URL(technician.url()).pathname;
    await technician.getByText('inconclusive', { exact: true }).locator('visible=true').first().waitFor();
    await technician.goto(`${shop.address}${job}/work/core-test-after?again=1`);
    await bench.passCaution(technician);
    await bench.checks(technician);
    await fill(technician, { 'Search-coil volts': 'eight', 'Slot depth': '280' });
    await technician.getByText('Readings').first().click();
    await technician.getByText(/letters|figure|number/i).locator('visible=true').first().waitFor();
    await technician.reload();
    await technician.getByRole('button', { name: /^Save the/ }).waitFor();
    expect(await technician.getByLabel(/^Search-coil volts/).first().inputValue(), 'the draft is back after a reload').toBe('eight');
    await fill(technician, { 'Search-coil volts': '8.084', 'Slot depth': '28', 'Exciting amps': '27.4', 'Watts as read': '66,5', Ambient: '22', 'Core at start': '22', Mean: '33', Hottest: '49.5', 'at slot': '31', 'Full flux for': '20' });
    await technician.getByText('does not conform', { exact: true }).locator('visible=true').first().waitFor();
    await shop.picture(technician, 'bench-fails');
    await shop.accessible(technician, 'the bench with a core that fails');
    await bench.saveTest(technician);
  });

  it('the gate to the rewind stays shut and says what is missing', async () => {
    const counter = await shop.as('counter');
    await find(counter, new RegExp(/J\d{4}-\d{4}/).exec(await (await shop.as('technician')).title())![0]);
    expect(new URL(counter.url()).pathname).toBe(job);
    await counter.getByText(/a manager signs a concession/).locator('visible=true').first().waitFor();
    expect(await button(counter, 'Move on to Rewind').isDisabled()).toBe(true);
    await shop.picture(counter, 'gate-shut');
    await shop.accessible(counter, 'a shut gate');
  });

  it('the customer’s answer is recorded, and a manager signs with his own password', async () => {
    const counter = await shop.as('counter');
    await button(counter, 'Record the answer…').click();
    const dialog = counter.getByRole('dialog');
    await choose(dialog, { 'What does the customer want?': 'Accept the core as it is, by concession' });
    await fill(dialog, { 'Who answered?': 'Jan Corvel' });
    await press(dialog, 'How?', 'by phone');
    await button(dialog, 'Record the answer').click();
    await counter.getByText(/Jan Corvel answered/).first().waitFor();

    const manager = await shop.as('manager');
    await manager.goto(`${shop.address}${job}`);
    await button(manager, 'Sign the concession…').click();
    const signing = manager.getByRole('dialog');
    await fill(signing, { 'Why is it accepted?': 'Runs at half load until the new core is here.', 'Your own password': 'not my password' });
    await button(signing, 'Sign').click();
    await signing.getByText(/not your password/i).first().waitFor();
    expect(await signing.getByLabel('Why is it accepted?').inputValue()).toContain('half load');
    await fill(signing, { 'Your own password': DEMO_PASSWORD });
    await button(signing, 'Sign').click();
    await manager.getByText(/Concession signed by Rolf Steenbeck/).first().waitFor();
  });

  it('then the gate opens, and the history says who did what', async () => {
    const manager = await shop.as('manager');
    await bench.moveOn(manager, 'Rewind');
    await manager.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: /History/ }).click();
    await manager.getByText(/Concession signed: Runs at half load/).first().waitFor();
    await manager.getByText(/Jan Corvel answered \(phone\)/).first().waitFor();
    expect(shop.complaints).toEqual([]);
  });
});
