import { cpus } from 'node:os';
import type { Figure } from './bench/figure';

/*
 * npm run bench [part…]: every figure beside its anchor, measured in the same run on the same machine. Nothing fails by
 * time: the ratio is what is read. Parts: lineage, growth, pictures, server, large,
 * browser (wants an export: npm run build).
 */

const PARTS: Record<string, () => Promise<{ bench(): Promise<Figure[]> }>> = {
  lineage: () => import('./bench/lineage'),
  growth: () => import('./bench/growth'),
  pictures: () => import('./bench/pictures'),
  server: () => import('./bench/server'),
  large: () => import('./bench/large'),
  browser: () => import('./bench/browser'),
};

const round = (value: number): string => value.toLocaleString('en-GB', { maximumSignificantDigits: 3 });

function lineOf({ figure, ours, anchor, anchorName, unit, goal }: Figure): string[] {
  const ratio = anchor > 0 ? `${round(ours / anchor)}×` : '';
  return [figure, `${round(ours)} ${unit}`, `${round(anchor)} ${unit}`, ratio, anchorName, goal ?? ''];
}

function print(rows: string[][]): void {
  const widths = rows[0]?.map((_cell, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0))) ?? [];
  for (const row of rows)
    console.log(
      row
        .map((cell, column) => cell.padEnd(widths[column] ?? 0))
        .join('  ')
        .trimEnd(),
    );
}

async function main(asked: string[]): Promise<void> {
  const unknown = asked.filter((part) => !(part in PARTS));
  if (unknown.length > 0) {
    console.error(`No such part: ${unknown.join(', ')}. There are ${Object.keys(PARTS).join(', ')}.`);
    process.exit(2);
  }
  const rows = [['Figure', 'Kinwater', 'Anchor', 'Ratio', 'What the anchor is', 'Goal']];
  for (const [part, load] of Object.entries(PARTS)) {
    if (asked.length > 0 && !asked.includes(part)) continue;
    const { bench } = await load();
    rows.push(...(await bench()).map(lineOf));
    console.log(`${part} done`);
  }
  console.log(`\nNode ${process.versions.node}, ${cpus().length} × ${cpus()[0]?.model ?? 'unknown processor'}\n`);
  print(rows);
}

void main(process.argv.slice(2));
