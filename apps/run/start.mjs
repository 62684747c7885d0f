import { build } from './build.mjs';
import { startDemo } from './demo.mjs';
import { installPackages } from './install.mjs';
import { inRoot } from './paths.mjs';
import { end, startAndWait } from './processes.mjs';
import { giveUp, say, step } from './say.mjs';

const production = process.argv.includes('--production');

async function startForReal() {
  const app = await startAndWait('the application', [inRoot('dist/api/apps/api/src/main.js')], { DEMO: 'off', WEB_ROOT: inRoot('dist/web'), NODE_ENV: 'production' }, { onLine: (line) => say(line) });
  say(`\nLoopbay answers on port ${app.ready.port}. It stops with Ctrl C.`);
  return { app: app.child, stop: () => end(app.child) };
}

async function startTheDemo() {
  const demo = await startDemo({ tell: step, ...(process.env.PORT ? { port: Number(process.env.PORT) } : {}), onLine: (line) => process.env.LOG_LEVEL && say(line) });
  const { SIGN_INS, DEMO_PASSWORD } = await import('../../dist/mocks/mocks/sample-shop/sign-ins.js');
  say(`
Loopbay is open at            ${demo.address}
The demo's mailbox            ${demo.mailbox}
The demo's payment service    ${demo.payments}/_control
The API's pages               ${demo.address}/api/docs

Sign in as${SIGN_INS.map((s) => `\n  ${s.role.padEnd(11)} ${s.email.padEnd(34)} ${s.name}`).join('')}
  password for all of them:  ${DEMO_PASSWORD}

The sample shop lies in data/demo; delete that folder to begin again. It stops with Ctrl C.`);
  return demo;
}

await installPackages();
await build();
const running = await (production ? startForReal() : startTheDemo()).catch((error) => giveUp(error.message));
let stopping = false;
const stop = () => {
  if (stopping) return;
  stopping = true;
  say('\nStopping; what is under way is finished first.');
  void running.stop().then(() => process.exit(0));
};
process.on('SIGINT', stop);
process.on('SIGTERM', stop);
running.app.on('exit', (code) => {
  if (!stopping) void running.stop().then(() => giveUp(`The application ended by itself (${code}).`));
});
