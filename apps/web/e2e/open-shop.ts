import { mkdirSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createRequire } from 'node:module';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type BrowserContext, type Page } from 'playwright-core';
import { expect } from 'vitest';
import { DEMO_PASSWORD, SECOND_TECHNICIAN, SIGN_INS } from '../../../mocks/sample-shop/sign-ins.js';
// the scripts that start the demo are plain Node.js
// @ts-expect-error no types
import { startDemo } from '../../run/demo.mjs';

const FLAGS = ['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run', '--disable-background-networking', '--disable-component-update', '--disable-sync'];
const axeSource = () => readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8');

interface Demo {
  readonly address: string;
  readonly mailbox: string;
  readonly payments: string;
  readonly stop: () => Promise<void>;
}
export type Who = (typeof SIGN_INS)[number]['role'] | 'second';

/** The built application with a sample shop of its own, seen through a real browser. */
export class OpenShop {
  private readonly contexts = new Map<string, BrowserContext>();
  /** what the browser complained about on the way */
  readonly complaints: string[] = [];

  private constructor(
    private readonly demo: Demo,
    private readonly browser: Browser,
    private readonly dataDir: string,
  ) {}

  static async open(): Promise<OpenShop> {
    const dataDir = mkdtempSync(join(tmpdir(), 'loopbay-journey-'));
    const demo = (await startDemo({ dataDir, port: 0, fakePort: 0, logLevel: 'error' })) as Demo;
    const browser = await chromium.launch({ executablePath: process.env['LOOPBAY_CHROMIUM'] ?? '/usr/bin/chromium', args: FLAGS });
    return new OpenShop(demo, browser, dataDir);
  }

  get address(): string {
    return this.demo.address;
  }

  /** Signs somebody in through the sign-in page; the same person keeps the same browser. */
  async as(who: Who, viewport = { width: 1280, height: 800 }): Promise<Page> {
    const known = this.contexts.get(who);
    if (known) return known.pages()[0]!;
    const context = await this.browser.newContext({ viewport, locale: 'en-GB', timezoneId: 'Europe/Berlin', acceptDownloads: true });
    this.contexts.set(who, context);
    const page = await context.newPage();
    page.on('pageerror', (error) => this.complaints.push(`${who}: ${error.message}`));
    page.on('console', (message) => {
      // a refusal that the page shows is also noted by the browser; it is no complaint
      if (message.type() === 'error' && !/status of 4\d\d/.test(message.text())) this.complaints.push(`${who}: ${message.text()}`);
    });
    page.setDefaultTimeout(Number(process.env['LOOPBAY_PATIENCE_MS'] ?? 20_000));
    await page.goto(`${this.address}/`);
    const email = who === 'second' ? SECOND_TECHNICIAN.email : SIGN_INS.find((s) => s.role === who)!.email;
    await page.getByLabel('E-mail').fill(email);
    await page.getByLabel('Password').fill(DEMO_PASSWORD);
    await page.getByRole('button', { name: 'Sign in' }).click();
    await page.locator('#content').waitFor();
    return page;
  }

  /** Mails to somebody, newest first; waits until one with this subject is there. */
  async mailTo(address: string, subject: RegExp): Promise<{ subject: string; text: string }> {
    for (let tries = 0; tries < 60; tries += 1) {
      const { messages } = (await (await fetch(`${this.demo.mailbox}/api/messages?to=${encodeURIComponent(address)}&wait=1000`)).json()) as { messages: { id: string; subject: string }[] };
      const found = messages.find((m) => subject.test(m.subject));
      if (found) return (await (await fetch(`${this.demo.mailbox}/api/messages/${found.id}`)).json()) as { subject: string; text: string };
      await new Promise((resolve) => setTimeout(resolve, 250));
    }
    throw new Error(`no mail to ${address} with a subject like ${subject}`);
  }

  async picture(page: Page, name: string): Promise<void> {
    const folder = process.env['LOOPBAY_PICTURES'];
    if (!folder) return;
    mkdirSync(folder, { recursive: true });
    await page.screenshot({ path: join(folder, `${name}.png`) });
  }

  /** Pictures of what everybody sees, for whoever looks into a journey that failed. */
  async pictureAll(name: string): Promise<void> {
    for (const [who, context] of this.contexts) {
      const page = context.pages()[0];
      if (page) await this.picture(page, `${name}-${who}`);
    }
  }

  /** Nothing on the page breaks the rules of WCAG 2.2 A and AA that a program can see. */
  async accessible(page: Page, where: string): Promise<void> {
    await page.evaluate(axeSource());
    const found = await page.evaluate(async () => {
      const axe = (window as unknown as { axe: { run(o: object): Promise<{ violations: { id: string; nodes: { html: string }[] }[] }> } }).axe;
      const { violations } = await axe.run({ runOnly: ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'] });
      return violations.map((v) => `${v.id}: ${v.nodes.map((n) => n.html.slice(0, 160)).join(' | ')}`);
    });
    expect(found, where).toEqual([]);
  }

  async close(): Promise<void> {
    await this.browser.close();
    await this.demo.stop();
    rmSync(this.dataDir, { recursive: true, force: true });
  }
}
