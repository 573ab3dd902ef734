import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

export type Lock = {
  release(): void /** The one before it ended without closing: killed, or a power cut. */;
  unclean: boolean;
};

/** One process owns the data folder. A lock left by a process that is gone is taken over. */
export function takeLock(folder: string): Lock {
  const file = join(folder, 'lock');
  const unclean = existsSync(file);
  const holder = holderOf(folder);
  if (holder && holder !== process.pid) {
    throw new Error(`Another Kinwater (process ${holder}) uses the data folder. Stop it first, or set DATA_FOLDER.`);
  }
  writeFileSync(file, `${process.pid} ${startOf(process.pid)}`);
  return { release: () => rmSync(file, { force: true }), unclean };
}

/** The process that uses the data folder now; 0 when none does. */
export function holderOf(folder: string): number {
  const file = join(folder, 'lock');
  if (!existsSync(file)) return 0;
  const [pid = '', start = ''] = readFileSync(file, 'utf8').trim().split(' ');
  const holder = Number(pid);
  if (!Number.isInteger(holder) || holder <= 0 || !isAlive(holder)) return 0;
  // After a restart of the machine another program may have the number: then it began at another time.
  return start && start !== startOf(holder) ? 0 : holder;
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

/** When a process began, in the kernel's ticks since the machine started (proc(5), field 22); '' where there is no /proc. */
function startOf(pid: number): string {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    return stat.slice(stat.lastIndexOf(')') + 2).split(' ')[19] ?? '';
  } catch {
    return '';
  }
}
