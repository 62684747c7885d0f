import { existsSync, mkdirSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { end, freePort, run, startAndWait } from './processes.mjs';

const API = 'dist/api/apps/api/src/main.js';
const MOCKS = 'dist/mocks/mocks/main.js';
const SAMPLE = 'dist/mocks/mocks/sample-shop/main.js';

/** The demo's secrets are well known; a shop that starts for real is refused with them. */
const SECRETS = { JWT_SECRET: 'demo-only-secret-never-for-a-real-shop', STRIPE_SECRET_KEY: 'sk_test_demo_loopbay', STRIPE_WEBHOOK_SECRET: 'whsec_demo_loopbay' };

/** Starts fakes and application on free ports, and fills the sample shop where there is no database yet. */
export async function startDemo({ dataDir = inRoot('data', 'demo'), port = 3000, fakePort = 3010, host = process.env.HOST ?? '127.0.0.1', publicUrl, tell = () => undefined, logLevel = 'warn', onLine } = {}) {
  mkdirSync(dataDir, { recursive: true });
  const apiPort = await freePort(port, host);
  // 0 asks for any free ports
  const after = (step) => (fakePort === 0 ? 0 : fakePort + step);
  const [stripePort, mailboxPort, smtpPort] = [await freePort(after(0)), await freePort(after(1)), await freePort(after(2))];
  const address = publicUrl ?? `http://localhost:${apiPort}`;
  const env = {
    ...SECRETS,
    DEMO: 'on',
    HOST: host,
    PORT: String(apiPort),
    PUBLIC_URL: address,
    DATA_DIR: dataDir,
    WEB_ROOT: process.env.WEB_ROOT ?? inRoot('dist/web'),
    SMTP_URL: `smtp://127.0.0.1:${smtpPort}`,
    MAIL_FROM: 'Kupferring Rewind Works <workshop@kupferring.example>',
    STRIPE_API_URL: `http://127.0.0.1:${stripePort}`,
    MAILBOX_URL: `http://127.0.0.1:${mailboxPort}`,
    LOG_LEVEL: logLevel,
  };
  tell('Starting mailbox and payment fake');
  const mocks = await startAndWait('mailbox and payment fake', [inRoot(MOCKS)], {
    MOCKS_HOST: '127.0.0.1',
    STRIPE_MOCK_PORT: String(stripePort),
    MAILBOX_HTTP_PORT: String(mailboxPort),
    MAILBOX_SMTP_PORT: String(smtpPort),
    STRIPE_MOCK_SECRET_KEY: SECRETS.STRIPE_SECRET_KEY,
    STRIPE_WEBHOOK_SECRET: SECRETS.STRIPE_WEBHOOK_SECRET,
    STRIPE_WEBHOOK_URL: `http://127.0.0.1:${apiPort}/api/payments/events`,
    MOCKS_STATE_DIR: `${dataDir}/outside`,
  });
  try {
    if (!existsSync(`${dataDir}/loopbay.sqlite`)) {
      tell('Filling the sample shop');
      const code = await run(process.execPath, [inRoot(SAMPLE)], { env: { ...process.env, ...env }, stdio: ['ignore', 'ignore', 'inherit'] });
      if (code !== 0) throw new Error('The sample shop could not be filled.');
    }
    tell('Starting the application');
    const app = await startAndWait('the application', [inRoot(API)], env, { onLine });
    const stop = async () => {
      await end(app.child);
      await end(mocks.child);
    };
    return { address, mailbox: env.MAILBOX_URL, payments: env.STRIPE_API_URL, app: app.child, mocks: mocks.child, env, stop };
  } catch (error) {
    await end(mocks.child);
    throw error;
  }
}
