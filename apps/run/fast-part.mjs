import { oneCheck } from './count-tests.mjs';
import { bin, inRoot } from './paths.mjs';
import { step } from './say.mjs';

/** Lint, types, walls and the examples of the libraries. */
export async function fastPart() {
  const node = process.execPath;
  const tsc = inRoot('node_modules/typescript/bin/tsc');
  const counts = [];
  const check = async (name, command, args) => {
    step(name);
    counts.push(await oneCheck(name, command, args));
  };
  await check('lint', node, [inRoot('node_modules/eslint/bin/eslint.js'), '.']);
  await check('types of the server', node, [tsc, '-p', 'apps/api', '--noEmit']);
  await check('types of the pages', node, [tsc, '-p', 'apps/web', '--noEmit']);
  await check('types of the fakes', node, [tsc, '-p', 'mocks', '--noEmit']);
  await check('walls between the rooms', bin('depcruise'), ['--config', '.dependency-cruiser.cjs', '--output-type', 'err', 'apps', 'libs', 'shared', 'mocks']);
  await check('examples of the libraries', bin('tsx'), ['--tsconfig', 'apps/api/tsconfig.json', 'apps/run/examples.ts']);
  return counts;
}
