import { existsSync, readdirSync, statSync, writeFileSync } from 'node:fs';
import { pathToFileURL } from 'node:url';
import { installPackages } from './install.mjs';
import { inRoot } from './paths.mjs';
import { runQuietly } from './processes.mjs';
import { giveUp, step } from './say.mjs';

const SOURCES = ['apps/api', 'apps/web', 'libs', 'shared', 'mocks', 'package.json', 'package-lock.json', 'nest-cli.json', 'tsconfig.base.json'];
const stamp = inRoot('dist', '.built');

function newest(path) {
  const stat = statSync(path);
  if (!stat.isDirectory()) return stat.mtimeMs;
  return readdirSync(path).reduce((latest, name) => Math.max(latest, newest(`${path}/${name}`)), stat.mtimeMs);
}

export const isBuilt = () => existsSync(stamp) && SOURCES.every((source) => newest(inRoot(source)) <= statSync(stamp).mtimeMs);

/** Builds server, fakes and pages, when a source is newer than the last build. */
export async function build({ always = false } = {}) {
  if (!always && isBuilt()) return;
  step('Building (half a minute)');
  const node = process.execPath;
  const nest = inRoot('node_modules/@nestjs/cli/bin/nest.js');
  const parts = [
    ['server', node, [nest, 'build', 'api']],
    ['fakes', node, [nest, 'build', 'mocks']],
    ['pages', node, [inRoot('node_modules/vite/bin/vite.js'), 'build', '-c', 'apps/web/vite.config.ts', '--logLevel', 'warn']],
    ['compressed pages', node, [inRoot('apps/run/precompress.mjs')]],
  ];
  for (const [name, command, args] of parts) {
    const { code, output } = await runQuietly(command, args);
    if (code !== 0) giveUp(`The ${name} could not be built.\n${output}`);
  }
  writeFileSync(stamp, '');
}

if (process.argv[1] && import.meta.url === pathToFileURL(process.argv[1]).href) {
  await installPackages();
  await build({ always: true });
}
