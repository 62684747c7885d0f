import { sum, vitest } from './count-tests.mjs';
import { fastPart } from './fast-part.mjs';
import { installPackages } from './install.mjs';
import { say, step } from './say.mjs';

await installPackages();
const counts = await fastPart();
step('tests of libraries and contracts');
counts.push(await vitest(['--project', 'libs']));
const { passed, failed } = sum(counts);
say(`\n${passed} passed, ${failed} failed`);
process.exit(failed === 0 ? 0 : 1);
