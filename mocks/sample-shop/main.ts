import 'reflect-metadata';
import { readConfig } from '../../apps/api/src/config/config.js';
import { takeDataFolder } from '../../apps/api/src/database/data-folder.js';
import { fillSampleShop } from './fill.js';

/** Fills the data folder named in the environment; for the demo only. */
const config = readConfig(process.env);
if (!config.demo) throw new Error('The sample shop is for the demo only.');
const folder = takeDataFolder(config.dataDir);
try {
  const today = new Date();
  await fillSampleShop(config, { seedDay: new Date(Date.UTC(today.getUTCFullYear(), today.getUTCMonth(), today.getUTCDate())), tell: (words) => process.stdout.write(`${words}\n`) });
} catch (error) {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exitCode = 1;
} finally {
  folder.release();
}
