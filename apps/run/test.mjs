import { build } from './build.mjs';
import { findChromium } from './chromium.mjs';
import { sum, vitest } from './count-tests.mjs';
import { fastPart } from './fast-part.mjs';
import { installPackages } from './install.mjs';
import { say, step } from './say.mjs';

await installPackages();
const counts = await fastPart();
step('tests of libraries, services, HTTP and screens');
counts.push(await vitest([]));
step('browser journeys');
await build();
const chromium = await findChromium();
let skippedJourneys = 0;
if (chromium) {
  process.env.LOOPBAY_CHROMIUM = chromium;
  counts.push(await vitest(['--config', 'apps/web/e2e/vitest.config.ts']));
} else {
  skippedJourneys = 1;
  say('There is no Chromium here, and it could not be installed.');
}
const { passed, failed, skipped } = sum(counts);
say(`\nBrowser journeys skipped: ${skippedJourneys === 0 ? 0 : 'all'}`);
if (skipped > 0) say(`Other tests skipped: ${skipped}`);
const missed = process.env.CI === 'true' && (skippedJourneys > 0 || skipped > 0) ? 1 : 0;
say(`${passed} passed, ${failed + missed} failed`);
process.exit(failed + missed === 0 ? 0 : 1);
