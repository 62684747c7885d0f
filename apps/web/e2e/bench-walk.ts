import type { Page } from 'playwright-core';
import { button, choose, fill, panel, press, tick } from './forms.js';

export type RingFigures = Readonly<Record<string, string>>;

/** The walks through the bay that several journeys make, by what stands on the screen. */
export class BenchWalk {
  async moveOn(page: Page, step: string): Promise<void> {
    const forward = button(page, `Move on to ${step}`);
    await forward.click();
    await forward.waitFor({ state: 'detached' });
  }

  async passCaution(page: Page): Promise<void> {
    const read = button(page, /^Read\. I begin/);
    const form = button(page, /^Save/);
    await read.or(form).first().waitFor();
    if (await read.isVisible()) await read.click();
  }

  /** From the job sheet to the form of a record. */
  async openRecord(page: Page, name: string | RegExp): Promise<void> {
    const words = typeof name === 'string' ? `Record: ${name}` : name;
    await page.getByRole('link', { name: words }).first().click();
    await this.passCaution(page);
  }

  /** Saves, and goes back to the job. */
  async saveRecord(page: Page): Promise<void> {
    await button(page, 'Save').click();
    await page.getByText(/Kept as no\./).waitFor();
    await page.getByRole('link', { name: /To the job/ }).first().click();
    await page.getByRole('heading', { level: 1, name: /^J\d{4}-\d{4}/ }).waitFor();
  }

  async insulation(page: Page, megohms: string, celsius: string): Promise<void> {
    await fill(panel(page, 'Insulation resistance'), { 'After one minute': megohms, 'Winding temperature': celsius });
  }

  async resistance(page: Page, ohms: readonly [string, string, string], celsius: string): Promise<void> {
    await fill(panel(page, 'Winding resistance'), { 'Leads 1-2': ohms[0], 'Leads 2-3': ohms[1], 'Leads 3-1': ohms[2], 'Winding temperature': celsius });
  }

  async winding(page: Page): Promise<void> {
    await fill(page, { Slots: '48', Poles: '4', Coils: '48', 'Turns of a coil': '12', 'Span, 1 to': '11', 'Parallel circuits': '2', 'Wire 1: Strands': '4', 'Bare diameter': '1,06', Grouping: '4 coils a group', 'Mean turn': '975' });
    await press(page, 'Coil sides in a slot', 'two');
    await press(page, 'Connection', 'delta');
  }

  async openBench(page: Page): Promise<void> {
    await page.getByRole('link', { name: 'Open the bench' }).first().click();
    await this.passCaution(page);
  }

  async size(page: Page): Promise<void> {
    await fill(page, { Outside: '340', Bore: '218', 'Slot depth': '28', Slots: '48', Stack: '220', Density: '7700' });
  }

  async checks(page: Page): Promise<void> {
    await tick(page, 'Rotor out', 'Leads open and insulated', 'Parallels and delta opened', 'One point earthed', 'Through-bolts measured', 'Bore clear', 'Barrier up');
  }

  async setUp(page: Page): Promise<void> {
    await fill(page, { Turns: '16', 'Search coil': '4' });
    await press(page, 'Core stands', 'in its frame');
    await press(page, 'Frame of', 'cast iron');
    await choose(page, { 'Cable runs': 'over the frame', Ammeter: /A-01/, Wattmeter: /W-01/, Thermometer: /T-01/ });
    await this.checks(page);
  }

  async saveTest(page: Page): Promise<void> {
    await button(page, /^Save the (test|correction)/).click();
    await page.getByText(/Kept as no\./).waitFor();
  }

  async quoteLines(page: Page): Promise<void> {
    await fill(page, { 'What it is for, line 1': 'Rewind, core tests and final test', 'Quantity, line 1': '30,5', 'Unit, line 1': 'h', 'Price, line 1': '78', 'Tax %, line 1': '19' });
  }

  async finalTest(page: Page): Promise<void> {
    await this.insulation(page, '2400', '24');
    await this.resistance(page, ['0.1547', '0.1550', '0.1545'], '24');
    const highPotential = panel(page, 'High potential');
    await button(highPotential, /^Take 1800/).click();
    await fill(highPotential, { 'Held for, seconds': '60' });
    await press(highPotential, 'It held', 'yes');
    const noLoad = panel(page, 'No-load run');
    await fill(noLoad, { 'Volts 1': '401', 'Volts 2': '400', 'Volts 3': '399', 'Amps 1': '22.4', 'Amps 2': '22.3', 'Amps 3': '22,2', 'Watts in': '980', 'Resistance between two leads, warm': '0.156', Frequency: '50', Speed: '1497' });
    const vibration = panel(page, 'Vibration');
    await press(vibration, 'Judged by', 'IEC 60034-14 (2003)');
    await press(vibration, 'Machine stands', 'freely suspended');
    await fill(vibration, { 'Shaft height': '225', 'Place 1': '1.4', 'Place 2': '1.1', 'Place 3': '0.9' });
    await press(panel(page, 'Direction of rotation is right'), 'Direction of rotation is right', 'yes');
    const bearings = page.getByRole('checkbox', { name: 'Bearings: done' });
    if (await bearings.isChecked()) await bearings.uncheck({ force: true });
  }
}
