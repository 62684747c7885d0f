import { existsSync } from 'node:fs';
import { installDebian } from './install.mjs';
import { isRoot, isThere } from './processes.mjs';

const PLACES = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome', '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome'];
const found = () => [process.env.LOOPBAY_CHROMIUM, ...PLACES].find((place) => place && existsSync(place));

/** Where the browser is; on Debian as root it is installed when it is not there. */
export async function findChromium() {
  if (!found() && isRoot() && isThere('apt-get')) await installDebian(['chromium'], 'the browser journeys');
  return found() ?? null;
}
