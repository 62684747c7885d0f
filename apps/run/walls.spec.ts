import { spawnSync } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { fileURLToPath } from 'node:url';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';

const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..');

/** One offence against each wall: file, what it imports, and the rule that must notice. */
const OFFENCES: readonly (readonly [rule: string, file: string, imports: string])[] = [
  ['no-circular', 'libs/money/src/a.ts', './b.js'],
  ['quantities-imports-only-what-it-may', 'libs/quantities/src/bad.ts', '../../money/src/index.js'],
  ['money-imports-only-what-it-may', 'libs/money/src/bad.ts', '../../quantities/src/index.js'],
  ['measurement-imports-only-what-it-may', 'libs/measurement/src/bad.ts', '../../quantities/src/index.js'],
  ['control-charts-imports-only-what-it-may', 'libs/control-charts/src/bad.ts', '../../quantities/src/index.js'],
  ['logger-files-imports-only-what-it-may', 'libs/logger-files/src/bad.ts', '../../quantities/src/index.js'],
  ['core-loss-imports-only-what-it-may', 'libs/core-loss/src/bad.ts', '../../money/src/index.js'],
  ['winding-imports-only-what-it-may', 'libs/winding/src/bad.ts', '../../core-loss/src/index.js'],
  ['machine-tests-imports-only-what-it-may', 'libs/machine-tests/src/bad.ts', '../../../shared/src/roles.js'],
  ['drawings-imports-only-what-it-may', 'libs/drawings/src/bad.ts', '../../money/src/index.js'],
  ['documents-imports-only-what-it-may', 'libs/documents/src/bad.ts', '../../../apps/api/src/index.js'],
  ['a-library-has-one-door', 'apps/api/src/side-door.ts', '../../../libs/money/src/inside.js'],
  ['a-library-has-one-door-for-its-sisters', 'libs/core-loss/src/side-door.ts', '../../quantities/src/inside.js'],
  ['libs-are-pure', 'libs/core-loss/src/impure.ts', 'typeorm'],
  ['shared-is-the-contract', 'shared/src/bad.ts', '../../apps/api/src/index.js'],
  ['web-not-api', 'apps/web/src/bad.ts', '../../api/src/index.js'],
  ['api-not-web', 'apps/api/src/bad.ts', '../../web/src/index.js'],
  ['mocks-stay-outside', 'apps/api/src/mocked.ts', '../../../mocks/index.js'],
  ['web-components-know-no-feature', 'apps/web/src/components/bad.ts', '../features/jobs/index.js'],
  ['web-features-stand-apart', 'apps/web/src/features/jobs/bad.ts', '../quotes/index.js'],
];
const TARGETS = [
  'libs/money/src/index', 'libs/money/src/inside', 'libs/quantities/src/index', 'libs/quantities/src/inside', 'libs/core-loss/src/index', 'shared/src/roles',
  'apps/api/src/index', 'apps/web/src/index', 'mocks/index', 'apps/web/src/features/jobs/index', 'apps/web/src/features/quotes/index',
];

let house: string;
let noticed: { rule: { name: string }; from: string }[];

function write(file: string, text: string): void {
  mkdirSync(dirname(join(house, file)), { recursive: true });
  writeFileSync(join(house, file), text);
}

function cruise(): typeof noticed {
  const run = spawnSync(process.execPath, [join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs'), '--config', '.dependency-cruiser.cjs', '--output-type', 'json', 'apps', 'libs', 'shared', 'mocks'], {
    cwd: house,
    encoding: 'utf8',
    maxBuffer: 64 * 1024 * 1024,
  });
  return (JSON.parse(run.stdout) as { summary: { violations: typeof noticed } }).summary.violations;
}

beforeAll(() => {
  house = mkdtempSync(join(tmpdir(), 'loopbay-walls-'));
  for (const file of ['.dependency-cruiser.cjs', 'tsconfig.base.json', 'package.json']) cpSync(join(root, file), join(house, file));
  write('node_modules/typeorm/package.json', '{ "name": "typeorm", "version": "1.0.0", "main": "index.js" }');
  write('node_modules/typeorm/index.js', 'module.exports = {};\n');
  for (const target of TARGETS) write(`${target}.ts`, 'export const here = true;\n');
  write('libs/money/src/b.ts', "import './a.js';\nexport const b = 1;\n");
  for (const [, file, imports] of OFFENCES) write(file, `import '${imports}';\nexport const offence = true;\n`);
  noticed = cruise();
});
afterAll(() => rmSync(house, { recursive: true, force: true }));

describe('the walls between the rooms', () => {
  it.each(OFFENCES)('%s: a planted import is noticed', (rule, file) => {
    expect(noticed.filter((v) => v.rule.name === rule).map((v) => v.from)).toContain(file);
  });

  it('every wall of the house has a planted offence here', async () => {
    const { default: config } = (await import(join(root, '.dependency-cruiser.cjs'))) as { default: { forbidden: { name: string }[] } };
    expect(config.forbidden.map((r) => r.name).sort()).toEqual([...new Set(OFFENCES.map(([rule]) => rule))].sort());
  });
});
