import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { inRoot } from './paths.mjs';
import { run } from './processes.mjs';

/** Runs vitest and counts: a run that found no test has failed. */
export async function vitest(args) {
  const folder = mkdtempSync(join(tmpdir(), 'loopbay-counts-'));
  const file = join(folder, 'counts.json');
  const code = await run(process.execPath, [inRoot('node_modules/vitest/vitest.mjs'), 'run', '--reporter=dot', '--reporter=json', `--outputFile.json=${file}`, ...args]);
  try {
    const { numPassedTests, numFailedTests, numPendingTests, numFailedTestSuites } = JSON.parse(readFileSync(file, 'utf8'));
    const failed = numFailedTests > 0 ? numFailedTests : code === 0 && numPassedTests > 0 ? 0 : Math.max(1, numFailedTestSuites);
    return { passed: numPassedTests, failed, skipped: numPendingTests };
  } catch {
    return { passed: 0, failed: 1, skipped: 0 };
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

/** A step that passes or fails as a whole counts as one. */
export async function oneCheck(name, command, args) {
  const code = await run(command, args);
  if (code !== 0) process.stdout.write(`\n✗ ${name}\n`);
  return { passed: code === 0 ? 1 : 0, failed: code === 0 ? 0 : 1, skipped: 0 };
}

export const sum = (counts) => counts.reduce((a, b) => ({ passed: a.passed + b.passed, failed: a.failed + b.failed, skipped: a.skipped + b.skipped }), { passed: 0, failed: 0, skipped: 0 });
