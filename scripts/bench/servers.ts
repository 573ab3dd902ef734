import { spawn } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { Me } from '../../shared/accounts/contract';

export type Started = {
  origin: string;
  /** What is asked for over and over, signed in. */
  url: string;
  heavyUrl: string;
  roomUrl: string;
  headers: Record<string, string>;
  /** CPU that the process has used since it began. */
  cpuMs(): number;
  stop(): Promise<void>;
};

/** Clock ticks of /proc are hundredths of a second on Linux. */
function cpuMsOf(pid: number): number {
  const fields = readFileSync(`/proc/${pid}/stat`, 'utf8').split(') ')[1]?.split(' ') ?? [];
  return (Number(fields[11]) + Number(fields[12])) * 10;
}

async function start(script: string, env: Record<string, string>): Promise<{ pid: number; stop(): Promise<void> }> {
  const child = spawn(process.execPath, ['--import', 'tsx', script], {
    env: { ...process.env, ...env },
    stdio: ['ignore', 'ignore', 'inherit'],
  });
  const gone = new Promise<void>((done) => child.once('exit', () => done()));
  const stop = async () => {
    child.kill('SIGTERM');
    await gone;
  };
  for (let i = 0; i < 600; i += 1) {
    const up = await fetch(`http://localhost:${env['PORT']}/healthz`).catch(() => null);
    if (up?.ok) return { pid: child.pid ?? 0, stop };
    await new Promise((later) => setTimeout(later, 100));
  }
  await stop();
  throw new Error(`${script} did not start`);
}

const root = (path: string): string => join(fileURLToPath(new URL('../..', import.meta.url)), path);

/** The product with the demo fishroom, signed in as its owner; `web`: the folder of the exported app, where a page is opened. */
export async function startProduct(folder: string, web = join(folder, 'web')): Promise<Started> {
  const port = 4390;
  const origin = `http://localhost:${port}`;
  const env = {
    NODE_ENV: 'development',
    PORT: String(port),
    ORIGIN: origin,
    DATA_FOLDER: join(folder, 'data'),
    UPLOADS_FOLDER: join(folder, 'uploads'),
    WEB_FOLDER: web,
    LOG_LEVEL: 'info',
    DEMO: '1',
  };
  const { pid, stop } = await start(root('server/main.ts'), env);
  const signedIn = await fetch(`${origin}/api/sessions`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin },
    body: JSON.stringify({ email: 'nora@underhill.example', password: 'two racks and a heater' }),
  });
  const cookie = signedIn.headers.getSetCookie()[0]?.split(';')[0] ?? '';
  const me = Me.parse(await (await fetch(`${origin}/api/me`, { headers: { cookie } })).json());
  const room = `${origin}/api/rooms/${me.rooms[0]?.id}`;
  const url = `${room}/intervals`;
  return {
    origin,
    url,
    heavyUrl: `${room}/pedigree`,
    roomUrl: room,
    headers: { cookie },
    cpuMs: () => cpuMsOf(pid),
    stop,
  };
}

/** The same packages without anything of ours, over the same file: a token, a session, a member, one row. */
export async function bareServer(folder: string): Promise<Started> {
  const port = 4391;
  const origin = `http://localhost:${port}`;
  const env = { PORT: String(port), DB_FILE: join(folder, 'data', 'kinwater.db') };
  const { pid, stop } = await start(root('scripts/bench/bareServer.ts'), env);
  const token = await (await fetch(`${origin}/token`)).text();
  const headers = { cookie: `session=${token}` };
  return {
    origin,
    url: `${origin}/row`,
    heavyUrl: `${origin}/row`,
    roomUrl: origin,
    headers,
    cpuMs: () => cpuMsOf(pid),
    stop,
  };
}
