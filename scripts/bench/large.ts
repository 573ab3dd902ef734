import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import { type Figure, median } from './figure';
import { fillRoom, SIZES } from './largeRoom';
import { startProduct } from './servers';

/** What a list asks for, and the tables whose bare rows are its anchor. */
const LISTS = [
  ['Today', 'today', ['hold', 'brood', 'tank']],
  ['Broods here', 'broods?which=here', ['brood']],
  ['All broods', 'broods?which=all', ['brood', 'headEntry', 'batch', 'batchSource']],
  ['Living fish', 'fish', ['fish']],
  ['All fish', 'fish?which=all', ['fish', 'finding', 'fishExit']],
  ['Tanks', 'tanks', ['tank', 'stay']],
  ['All holds', 'holds?which=all', ['hold', 'parentageCandidate']],
  ['Colonies', 'colonies', ['colony', 'colonyMember']],
  ['The whole pedigree', 'pedigree', ['fish', 'brood', 'parentageCandidate', 'finding']],
] as const;

const ROUNDS = 5;

/** Every list of a fishroom of ten years, asked over http, beside reading the same tables' rows and writing them as JSON. */
export async function bench(): Promise<Figure[]> {
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-bench-'));
  const product = await startProduct(folder);
  const file = join(folder, 'data', 'kinwater.db');
  const raw = new BetterSqlite3(file, { readonly: true });
  try {
    fillRoom(file, new Date().toISOString().slice(0, 10));
    const figures: Figure[] = [];
    for (const [name, path, tables] of LISTS)
      figures.push({
        figure: `${name} of ${SIZES.fish} fish, ${SIZES.broods} broods`,
        ours: await spanOf(async () => {
          const answer = await fetch(`${product.roomUrl}/${path}`, {
            headers: { ...product.headers, connection: 'close' },
          });
          await answer.arrayBuffer();
          if (!answer.ok) throw new Error(`${path} answered ${answer.status}`);
        }),
        anchor: await spanOf(async () => {
          for (const table of tables) JSON.stringify(raw.prepare(`select * from ${table}`).all());
        }),
        anchorName: `select * from ${tables.join(', ')}; JSON`,
        unit: 'ms',
        goal: '200 ms at most',
      });
    return figures;
  } finally {
    raw.close();
    await product.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function spanOf(work: () => Promise<void>): Promise<number> {
  await work();
  const spans: number[] = [];
  for (let round = 0; round < ROUNDS; round += 1) {
    const from = performance.now();
    await work();
    spans.push(performance.now() - from);
  }
  return median(spans);
}
