import { closeSync, mkdirSync, openSync, readFileSync, rmSync, writeSync } from 'node:fs';
import { join } from 'node:path';

export const databaseFile = (dataDir: string) => join(dataDir, 'loopbay.sqlite');
export const uploadsDir = (dataDir: string) => join(dataDir, 'uploads');
export const papersDir = (dataDir: string) => join(dataDir, 'papers');

export class DataFolderBusy extends Error {}

/** Makes the data folder, for the shop's own account alone, and takes it for this process; a second shop on the same folder is refused. */
export function takeDataFolder(dataDir: string): { release(): void } {
  for (const dir of [dataDir, uploadsDir(dataDir), papersDir(dataDir)]) mkdirSync(dir, { recursive: true, mode: 0o700 });
  const file = join(dataDir, 'loopbay.lock');
  const holder = liveHolder(file);
  if (holder) throw new DataFolderBusy(`The data folder is in use by another running shop (process ${holder}). Stop that one first.`);
  rmSync(file, { force: true });
  const handle = openSync(file, 'wx');
  writeSync(handle, String(process.pid));
  closeSync(handle);
  return { release: () => rmSync(file, { force: true }) };
}

function liveHolder(file: string): number | undefined {
  try {
    const pid = Number(readFileSync(file, 'utf8'));
    if (!Number.isInteger(pid) || pid <= 0 || pid === process.pid) return undefined;
    process.kill(pid, 0);
    return pid;
  } catch {
    return undefined;
  }
}
