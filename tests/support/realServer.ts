import { type ChildProcess, spawn } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { mkdtempSync, rmSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { buildHouse } from '@/server/buildHouse';
import { type Config, readConfig } from '@/server/config';
import { createRoom } from '@/shared/rooms/contract';
import { METRIC } from '@/shared/units';
import { personWithAccount } from './accounts';
import { type Person, personAt } from './testApp';

/** A fishroom on a disk, and the real server as a process of its own that can be killed and started again. */
export type RealServer = {
  folders: { dataFolder: string; uploadsFolder: string };
  config: Config;
  owner: Person;
  roomId: string;
  start(crashAt?: string): Promise<void>;
  /** As a pulled plug would. */
  kill(): Promise<void>;
  /** When the process has ended, by itself or otherwise. */
  ended(): Promise<string | number | null>;
  cleanUp(): Promise<void>;
};

const freePort = (): Promise<number> =>
  new Promise((found) => {
    const server = createServer().listen(0, '127.0.0.1', () => {
      const address = server.address();
      const port = typeof address === 'object' && address ? address.port : 0;
      server.close(() => found(port));
    });
  });

export async function realServer(): Promise<RealServer> {
  const home = mkdtempSync(join(tmpdir(), 'kinwater-real-'));
  const port = await freePort();
  const origin = `http://127.0.0.1:${port}`;
  const env = {
    NODE_ENV: 'test' as const,
    DEMO: '0',
    LOG_LEVEL: 'silent',
    HOST: '127.0.0.1',
    PORT: String(port),
    ORIGIN: origin,
    SECRET: randomBytes(48).toString('base64url'),
    DATA_FOLDER: join(home, 'data'),
    UPLOADS_FOLDER: join(home, 'uploads'),
  };
  const config = readConfig(env);
  const owner = await signedIn(config, origin);
  let child: ChildProcess | null = null;
  let end: Promise<string | number | null> = Promise.resolve(null);

  async function start(crashAt = ''): Promise<void> {
    const running = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
      env: { ...process.env, ...env, CRASH_AT: crashAt },
      stdio: ['ignore', 'ignore', 'pipe'],
    });
    child = running;
    let errors = '';
    running.stderr.on('data', (chunk) => {
      errors += String(chunk);
    });
    let over = false;
    end = new Promise((done) =>
      running.on('close', (code, signal) => {
        over = true;
        done(signal ?? code);
      }),
    );
    for (let tries = 0; tries < 600; tries += 1) {
      if (over) throw new Error(`The server did not start: ${errors}`);
      if (
        await fetch(`${origin}/healthz`)
          .then(({ ok }) => ok)
          .catch(() => false)
      )
        return;
      await new Promise((later) => setTimeout(later, 50));
    }
    throw new Error('The server did not start in time');
  }
  const kill = async () => {
    child?.kill('SIGKILL');
    await end;
  };

  await start();
  const { id } = await owner.get(createRoom, {
    body: { name: 'Back Room', place: null, timeZone: 'UTC', currency: 'EUR', units: METRIC },
  });
  return {
    folders: { dataFolder: env.DATA_FOLDER, uploadsFolder: env.UPLOADS_FOLDER },
    config,
    owner,
    roomId: id,
    start,
    kill,
    ended: () => end,
    cleanUp: async () => {
      await kill();
      rmSync(home, { recursive: true, force: true });
    },
  };
}

/** The account is written while the server is down, and its cookie is good at the real server. */
async function signedIn(config: Config, origin: string): Promise<Person> {
  const { house, close } = await buildHouse(config);
  try {
    return await personWithAccount({
      house,
      origin,
      later: () => {},
      person: () => personAt(origin),
      close,
    });
  } finally {
    await close();
  }
}
