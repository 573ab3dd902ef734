import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** One process owns the data folder. A lock left by a process that is gone is taken over. */
export function takeLock(folder: string): () => void {
  const file = join(folder, 'lock');
  const holder = existsSync(file) ? Number(readFileSync(file, 'utf8')) : 0;
  if (holder && holder !== process.pid && isAlive(holder)) {
    throw new Error(`Another Kinwater (process ${holder}) uses the data folder. Stop it first, or set DATA_FOLDER.`);
  }
  writeFileSync(file, String(process.pid));
  return () => rmSync(file, { force: true });
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    // A process of another user is alive, and may not be signalled.
    return error instanceof Error && 'code' in error && error.code === 'EPERM';
  }
}
