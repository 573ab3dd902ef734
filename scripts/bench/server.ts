import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { openFile } from '../../server/db/open';
import { type Figure, median, percentile } from './figure';
import { bareServer, type Started, startProduct } from './servers';

const READS = 20_000;
const REQUESTS = 3_000;
const CONNECTIONS = 10;

/** Reads by key, signed-in requests, and whether others can still be answered while heavy work runs. */
export async function bench(): Promise<Figure[]> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-bench-'));
  const product = await startProduct(folder);
  try {
    const requests = await requestFigures(product, folder);
    const health = await healthFigure(product);
    return [await readFigure(join(folder, 'data', 'kinwater.db')), ...requests, health];
  } finally {
    await product.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

/** CPU of a read by key through Kysely as the product opens it, beside a prepared statement. */
async function readFigure(file: string): Promise<Figure> {
  const db = openFile(file);
  const raw = new BetterSqlite3(file, { readonly: true });
  const { id } = await db.selectFrom('room').select('id').executeTakeFirstOrThrow();
  const prepared = raw.prepare('select id, name from room where id = ?');
  const ours = await cpuOf(async () => {
    for (let i = 0; i < READS; i += 1)
      await db.selectFrom('room').where('id', '=', id).select(['id', 'name']).executeTakeFirst();
  });
  const anchor = await cpuOf(async () => {
    for (let i = 0; i < READS; i += 1) await Promise.resolve(prepared.get(id));
  });
  await db.destroy();
  raw.close();
  return {
    figure: 'A read by key through Kysely',
    ours: (ours / READS) * 1_000,
    anchor: (anchor / READS) * 1_000,
    anchorName: 'a prepared statement',
    unit: 'µs CPU',
    goal: '3× at most',
  };
}

async function cpuOf(work: () => Promise<void>): Promise<number> {
  await work();
  const from = process.cpuUsage();
  await work();
  const { user, system } = process.cpuUsage(from);
  return (user + system) / 1_000;
}

async function requestFigures(product: Started, folder: string): Promise<Figure[]> {
  const bare = await bareServer(folder);
  try {
    const rounds = [1, 2, 3];
    const ours: Load[] = [];
    const anchor: Load[] = [];
    await load(product);
    await load(bare);
    for (const _round of rounds) {
      ours.push(await load(product));
      anchor.push(await load(bare));
    }
    const of = (loads: Load[], figure: (one: Load) => number) => median(loads.map(figure));
    return [
      {
        figure: 'A signed-in GET, CPU',
        ours: of(ours, ({ cpuMs }) => (cpuMs / REQUESTS) * 1_000),
        anchor: of(anchor, ({ cpuMs }) => (cpuMs / REQUESTS) * 1_000),
        anchorName: 'bare Express + Kysely + jose, the same rows',
        unit: 'µs CPU',
        goal: '1.3× at most',
      },
      {
        figure: `A signed-in GET at ${CONNECTIONS} connections, p99`,
        ours: of(ours, ({ spans }) => percentile(spans, 0.99)),
        anchor: of(anchor, ({ spans }) => percentile(spans, 0.99)),
        anchorName: 'bare Express + Kysely + jose, the same rows',
        unit: 'ms',
        goal: '50 ms at most',
      },
    ];
  } finally {
    await bare.stop();
  }
}

type Load = { cpuMs: number; spans: number[] };

/** So many requests over ten connections; the server's own CPU, and how long each took. */
async function load(server: Started): Promise<Load> {
  const spans: number[] = [];
  const before = server.cpuMs();
  let left = REQUESTS;
  await Promise.all(
    Array.from({ length: CONNECTIONS }, async () => {
      while (left > 0) {
        left -= 1;
        const from = performance.now();
        const answer = await fetch(server.url, { headers: server.headers });
        await answer.text();
        if (!answer.ok) throw new Error(`${server.url} answered ${answer.status}`);
        spans.push(performance.now() - from);
      }
    }),
  );
  return { cpuMs: server.cpuMs() - before, spans };
}

/** How long "are you there" takes while sheets are printed, as many at once as there are connections. */
async function healthFigure(product: Started): Promise<Figure> {
  const ask = async () => {
    const from = performance.now();
    await (await fetch(`${product.origin}/healthz`)).text();
    return performance.now() - from;
  };
  const idle: number[] = [];
  for (let i = 0; i < 200; i += 1) idle.push(await ask());
  let working = true;
  const work = Array.from({ length: 6 }, async () => {
    while (working) await (await fetch(product.heavyUrl, { headers: product.headers })).arrayBuffer();
  });
  const busy: number[] = [];
  for (let i = 0; i < 150; i += 1) {
    busy.push(await ask());
    await new Promise((later) => setTimeout(later, 20));
  }
  working = false;
  await Promise.all(work);
  return {
    figure: 'GET /healthz while pedigrees are read, p99',
    ours: percentile(busy, 0.99),
    anchor: percentile(idle, 0.99),
    anchorName: 'the same server idle',
    unit: 'ms',
    goal: '100 ms at most',
  };
}
