import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import type { Page } from 'playwright-core';
import { DEMO_PASSWORD } from '../../../mocks/sample-shop/sign-ins.js';
import { BenchWalk, type RingFigures } from './bench-walk.js';
import { button, choose, fill, press, tick } from './forms.js';
import { OpenShop } from './open-shop.js';

/** A 37 kW motor of the dairy, from the counter to a paid invoice, by five people through their screens only. */
const BEFORE: RingFigures = { 'Search-coil volts': '8.096', 'Exciting amps': '26,5', 'Watts as read': '40.01', Ambient: '21', 'Core at start': '21', Mean: '27.2', Hottest: '31.0', 'at slot': '9', 'Full flux for': '20' };
const AFTER: RingFigures = { 'Search-coil volts': '8.084 V', 'Exciting amps': '26.6', 'Watts as read': '41.2', Ambient: '22', 'Core at start': '22', Mean: '28.1', Hottest: '32.0', 'at slot': '9', 'Full flux for': '20' };

let shop: OpenShop;
let bench: BenchWalk;
let job = '';
beforeAll(async () => {
  shop = await OpenShop.open();
  bench = new BenchWalk();
});
afterEach(async ({ task }) => {
  if (task.result?.state === 'fail') await shop.pictureAll('failed');
});
afterAll(() => shop?.close());

async function atJob(page: Page): Promise<void> {
  await page.goto(`${shop.address}${job}`);
  await page.getByRole('heading', { level: 1, name: /J\d{4}-\d{4}/ }).waitFor();
}

describe('one real line through the whole shop', () => {
  it('the counter books a machine in, with a photo, a tag and a receipt by mail', async () => {
    const counter = await shop.as('counter');
    await counter.getByRole('link', { name: 'Book in a machine' }).first().click();
    await counter.getByRole('searchbox', { name: 'Whose machine is it?' }).fill('Senngrund');
    await counter.getByRole('radio', { name: /Senngrund Dairy/ }).click();
    await button(counter, 'Next').click();
    await button(counter, 'Enter a new machine').click();
    await fill(counter, { 'What it is': '37 kW 4-pole fan motor', 'Serial number': 'SD-F37', 'Rated power': '37', 'Rated voltage': '400', 'Rated frequency': '50', 'Rated speed': '1478', 'Rated current': '67,0', Poles: '4' });
    await choose(counter, { Connection: 'delta' });
    await button(counter, 'Next').click();
    await button(counter, 'Next').click();
    await counter.getByText('What is wrong with it, in the customer’s words?').waitFor();
    await fill(counter, { 'What is wrong with it, in the customer’s words': 'Trips after an hour.', 'What came with it': 'Coupling half' });
    await choose(counter, { Contamination: 'food' });
    await button(counter, 'Next').click();
    await button(counter, 'in 2 weeks').click();
    await shop.accessible(counter, 'booking in');
    await button(counter, 'Book in').click();
    await counter.getByRole('heading', { name: 'Booked in' }).waitFor();
    await counter.locator('input[type=file]').first().setInputFiles({ name: 'plate.png', mimeType: 'image/png', buffer: await counter.screenshot() });
    await counter.getByText('plate.png is here.').waitFor();
    await counter.locator('input[type=file]').first().setInputFiles({ name: 'notes.png', mimeType: 'image/png', buffer: Buffer.from('this is no picture') });
    await counter.getByText(/this is neither, whatever it is called/).first().waitFor();
    await shop.picture(counter, 'booked-in');
    await button(counter, 'Print tag').click();
    await counter.getByRole('link', { name: 'Open the tag as PDF' }).waitFor();
    await counter.getByRole('link', { name: 'Open the job' }).click();
    const heading = counter.getByRole('heading', { level: 1, name: /J\d{4}-\d{4}/ });
    await heading.waitFor();
    const number = /J\d{4}-\d{4}/.exec(await heading.innerText())![0];
    job = new URL(counter.url()).pathname;
    expect((await shop.mailTo('voss@senngrund.example', new RegExp(number))).text).toContain('fan motor');
  });

  it('the technician records the incoming test, the dismantling and the winding as found', async () => {
    const technician = await shop.as('technician');
    await atJob(technician);
    await bench.moveOn(technician, 'Incoming test');
    await bench.openRecord(technician, 'Incoming test');
    await bench.insulation(technician, '0.4', '20');
    await bench.resistance(technician, ['0.1523', '0.1540', '0.1526'], '20');
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Dismantled');
    await bench.openRecord(technician, 'Dismantling');
    await tick(technician, 'Rotor is out');
    await press(technician, 'Core plate (insulation of the sheets)', 'unknown');
    await press(technician, 'Frame of', 'cast iron');
    await fill(technician, { 'What was seen': 'Turn fault in phase V, core sound to the eye.' });
    await bench.saveRecord(technician);
    await bench.openRecord(technician, 'Winding as found');
    await bench.winding(technician);
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Core test before');
  });

  it('the core test before shows its result while it is typed, and the shop’s computer agrees', async () => {
    const technician = await shop.as('technician');
    await bench.openBench(technician);
    await bench.size(technician);
    await bench.setUp(technician);
    await fill(technician, BEFORE);
    await technician.getByText('3.12', { exact: true }).first().waitFor();
    await shop.picture(technician, 'bench');
    await shop.accessible(technician, 'the bench');
    await bench.saveTest(technician);
    await atJob(technician);
    await bench.moveOn(technician, 'Awaiting approval');
  });

  it('the counter quotes, the customer approves in the portal, and the strip may start', async () => {
    const counter = await shop.as('counter');
    await atJob(counter);
    await counter.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: 'Money' }).click();
    await counter.getByRole('link', { name: 'New quote' }).or(button(counter, 'New quote')).first().click();
    await bench.quoteLines(counter);
    await shop.picture(counter, 'quote');
    await button(counter, 'Save the draft').click();
    await button(counter, 'Send to the customer').click();
    await button(counter, 'Send it').click();
    await counter.getByText(/sent, waits for the answer/).first().waitFor();

    const customer = await shop.as('customer', { width: 390, height: 844 });
    await shop.mailTo('voss@senngrund.example', /Q\d{4}-\d{4}|[Qq]uote/);
    await customer.goto(`${shop.address}${job.replace('/jobs/', '/portal/jobs/')}`);
    await customer.getByRole('link', { name: /Quote Q/ }).first().click();
    await shop.picture(customer, 'portal-quote');
    await shop.accessible(customer, 'a quote in the portal');
    await button(customer, /^Approve /).click();
    await fill(customer, { 'Your name': 'Anneke Voss' });
    await button(customer, /^Yes, approve/).click();
    await customer.getByText('Approved', { exact: true }).first().waitFor();

    await atJob(counter);
    await bench.moveOn(counter, 'Strip and burnout');
  });

  it('the burnout is recorded within the lowest limit, and the core test after conforms', async () => {
    const technician = await shop.as('technician');
    await atJob(technician);
    await bench.openRecord(technician, 'Strip and burnout');
    await press(technician, 'How the winding comes out', 'oven burnout');
    await bench.passCaution(technician);
    await choose(technician, { Oven: /O1/ });
    await fill(technician, { 'Wires counted at the cut': '48', 'Part peak': '352', 'Time above 345 °C': '60', 'Where the sensor sat': 'tooth, drive end' });
    await tick(technician, 'A sample coil is kept');
    await technician.getByText(/Limit of this load: 370/).waitFor();
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Core test after');
    await bench.openBench(technician);
    await bench.checks(technician);
    await fill(technician, AFTER);
    await technician.getByText(/\+3\.\d/).locator('visible=true').first().waitFor();
    await bench.saveTest(technician);
    await technician.getByText('conforms', { exact: true }).first().waitFor();
    await atJob(technician);
    await bench.moveOn(technician, 'Rewind');
  });

  it('the winding goes in, passes its test before varnish, is treated and assembled', async () => {
    const technician = await shop.as('technician');
    await bench.openRecord(technician, 'Winding as wound');
    await bench.winding(technician);
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Before-varnish test');
    await bench.openRecord(technician, 'Test before varnish');
    await bench.insulation(technician, '900', '24');
    await bench.resistance(technician, ['0.1547', '0.1550', '0.1545'], '24');
    await fill(technician, { 'Difference of the waves': '3', 'Peak volts': '1800' });
    await press(technician, 'Polarity and phase order right', 'yes');
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Treatment');
    await bench.openRecord(technician, 'Treatment');
    await press(technician, 'Process', 'vacuum pressure');
    await fill(technician, { 'Varnish or resin': 'polyester resin, class H', Batch: 'PR-2613', 'Bake temperature': '150', 'Bake time': '480', Cycles: '1' });
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Assembly');
    await bench.openRecord(technician, 'Assembly');
    await fill(technician, { 'Bearing fitted, drive end': '6313/C3', 'Bearing fitted, non-drive end': '6312/C3' });
    await tick(technician, 'The shaft turns freely by hand');
    await bench.saveRecord(technician);
    await bench.moveOn(technician, 'Final test');
  });

  it('the final test conforms, is signed by the technician and released by a second person', async () => {
    const technician = await shop.as('technician');
    await bench.openRecord(technician, 'Final test');
    await bench.finalTest(technician);
    await shop.picture(technician, 'final-test');
    await shop.accessible(technician, 'the final test');
    await bench.saveRecord(technician);
    await button(technician, 'Sign the final test…').click();
    await fill(technician, { 'Your own password': DEMO_PASSWORD });
    await button(technician, 'Sign').click();
    await technician.getByText(/Signed by the technician/).waitFor();

    const second = await shop.as('second');
    await atJob(second);
    await button(second, 'Release as second person…').click();
    await fill(second, { 'Your own password': DEMO_PASSWORD });
    await button(second, 'Sign').click();
    await second.getByText(/Released by a second person/).waitFor();
    await bench.moveOn(second, 'Ready');
    await button(second, 'Issue the certificate').click();
    await second.getByText(/Certificate C\d{4}-\d{4} is (issued|in force)/).first().waitFor();
    await shop.picture(second, 'ready');
  });

  it('the office issues the invoice, and the customer pays it: declined first, then with the bank’s extra step', async () => {
    const office = await shop.as('office');
    await atJob(office);
    await office.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: 'Money' }).click();
    await button(office, 'Issue the invoice').click();
    await button(office, 'Issue it').click();
    await office.getByText(/R\d{4}-\d{4}/).first().waitFor();

    const customer = await shop.as('customer');
    await customer.goto(`${shop.address}${job.replace('/jobs/', '/portal/jobs/')}`);
    await customer.getByRole('link', { name: /Invoice R/ }).first().click();
    await shop.picture(customer, 'portal-invoice');
    await button(customer, /^Pay /).click();
    await customer.waitForURL(/\/c\/pay\//);
    const card = async (number: string) => {
      await fill(customer, { 'E-mail': 'voss@senngrund.example', 'Card number': number, 'Expires (MM / YY)': '12 / 30', 'Security code': '123', 'Name on the card': 'Anneke Voss' });
      await customer.getByRole('button', { name: /^Pay / }).first().click();
    };
    await card('4000000000000002');
    await customer.getByRole('alert').first().waitFor();
    expect(await customer.getByRole('alert').first().innerText()).toMatch(/declined/i);
    await card('4000002500003155');
    await customer.locator('button[name=result][value=pass]').click();
    await customer.waitForURL(/\/portal\/invoices\/.*\/paid/);
    await customer.getByText(/is paid/).first().waitFor();
    await shop.picture(customer, 'portal-paid');
    expect((await shop.mailTo('voss@senngrund.example', /receipt|paid|P\d{4}-\d{4}/i)).subject).toMatch(/R\d{4}|P\d{4}|receipt/i);
    await atJob(office);
    await office.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: 'Money' }).click();
    await office.getByText('paid', { exact: true }).first().waitFor();
  });

  it('the counter hands the machine over, and the job is released with its whole history', async () => {
    const counter = await shop.as('counter');
    await atJob(counter);
    await fill(counter, { 'Who takes it?': 'Anneke Voss' });
    await button(counter, 'Record the delivery').click();
    await counter.getByText(/Taken by Anneke Voss/).waitFor();
    await button(counter, 'Release the job').click();
    await counter.getByText(/This job has ended|released/).first().waitFor();
    await counter.getByRole('navigation', { name: 'Parts of the job' }).getByRole('link', { name: 'History' }).click();
    await counter.getByText(/Certificate C\d{4}-\d{4} issued/).first().waitFor();
    await shop.accessible(counter, 'the job’s history');
    await counter.getByRole('link', { name: 'Floor' }).click();
    await counter.getByRole('heading', { name: 'Floor' }).waitFor();
    await shop.accessible(counter, 'the floor');
    await shop.picture(counter, 'floor');
    expect(shop.complaints).toEqual([]);
  });
});
