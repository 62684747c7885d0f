import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { inRoot } from './paths.mjs';
import { isRoot, isThere, run } from './processes.mjs';
import { giveUp, say, step } from './say.mjs';

const NODE_FROM = [20, 19];
const stamp = () => inRoot('node_modules', '.loopbay-installed');
const wanted = () => createHash('sha256').update(readFileSync(inRoot('package-lock.json'))).update(process.version).digest('hex');

export function assertNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < NODE_FROM[0] || (major === NODE_FROM[0] && minor < NODE_FROM[1])) giveUp(`Loopbay needs Node.js ${NODE_FROM.join('.')} or newer; this is ${process.versions.node}.`);
}

/** Installs what package-lock.json names, when that has not been done for this very list yet. */
export async function installPackages() {
  assertNode();
  if (existsSync(stamp()) && readFileSync(stamp(), 'utf8') === wanted()) return;
  await prepareCompiler();
  step('Installing packages (two to three minutes the first time; the database driver may have to compile)');
  const code = await run('npm', ['ci', '--no-audit', '--no-fund', '--loglevel=error']);
  if (code !== 0) giveUp(`The packages could not be installed.${isThere('g++') ? '' : compilerWords()}`);
  writeFileSync(stamp(), wanted());
}

const COMPILER = { 'g++': 'g++', make: 'make', python3: 'python3' };
const missingCompiler = () => Object.keys(COMPILER).filter((program) => !isThere(program));
const compilerWords = () => `\nWhere no ready-made database driver can be had, it is compiled here, which needs: ${missingCompiler().map((p) => COMPILER[p]).join(' ')}.\nOn Debian: apt-get install ${Object.values(COMPILER).join(' ')}`;

async function prepareCompiler() {
  const missing = missingCompiler();
  if (missing.length === 0) return;
  if (isRoot() && isThere('apt-get')) return installDebian(missing.map((p) => COMPILER[p]), 'the compiler the database driver may need');
  say(compilerWords());
}

/** Installs Debian packages when this is root on Debian; says so, and whether it worked. */
export async function installDebian(packages, whatFor) {
  step(`Installing ${packages.join(' ')} (${whatFor})`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  if ((await run('apt-get', ['update', '-qq'], { env })) !== 0) return false;
  return (await run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', ...packages], { env, stdio: ['ignore', 'ignore', 'inherit'] })) === 0;
}
