export type CrashPoint = 'before-file' | 'mid-file' | 'after-file' | 'after-commit';

/** For the crash test only: dies as a pulled plug would, without a word, when the named point is reached. */
export function crashPoint(chosen: string | null | undefined) {
  return (point: CrashPoint): void => {
    if (point === chosen) process.kill(process.pid, 'SIGKILL');
  };
}
