import { existsSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { type BrowserContext, chromium } from 'playwright-core';
import type { Figure } from './figure';
import { fillRoom, SIZES } from './largeRoom';
import { startProduct } from './servers';

/** Pages of the Lineage place, and the words that stand there once their figures are worked out. */
const PAGES = [
  ['kinship', 'lineage/kinship', /Each figure: the F/],
  ['founders', 'lineage/founders', /What each colony keeps/],
  ['pairing plan', 'lineage/plan', /highest F of a pair|Nothing fits/],
  ['list of fish', 'stock/fish', /Breeders/],
] as const;

/** As quality asks: a phone a quarter as quick as this machine. */
const THROTTLE = 4;

type Task = { ms: number; by: string };

/**
 * What a finger may have to wait for in a fishroom of ten years, on a slow phone: the longest task of the page's thread that
 * takes rows or figures over from the workers, beside the longest of any kind once the page's own scripts are read.
 */
export async function bench(): Promise<Figure[]> {
  if (!existsSync('dist/index.html')) throw new Error('Export the app first: npm run build');
  const folder = mkdtempSync(join(tmpdir(), 'kinwater-bench-'));
  const product = await startProduct(folder, 'dist');
  const browser = await chromium.launch({
    executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-gpu'],
  });
  try {
    fillRoom(join(folder, 'data', 'kinwater.db'), new Date().toISOString().slice(0, 10));
    const context = await browser.newContext({ viewport: { width: 390, height: 844 }, locale: 'en-GB' });
    await context.request.post(`${product.origin}/api/sessions`, {
      data: { email: 'nora@underhill.example', password: 'two racks and a heater' },
      headers: { origin: product.origin },
    });
    const home = product.roomUrl.replace('/api/rooms/', '/r/');
    const figures: Figure[] = [];
    for (const [name, path, words] of PAGES) {
      const tasks = await tasksOf(context, `${home}/${path}`, words);
      figures.push({
        figure: `Longest task with a worker's answer, ${name}, ${SIZES.fish} fish, CPU ÷ ${THROTTLE}`,
        ours: Math.max(0, ...tasks.filter(({ by }) => by.startsWith('Worker')).map(({ ms }) => ms)),
        anchor: Math.max(0, ...tasks.map(({ ms }) => ms)),
        anchorName: 'longest task of any kind: drawing the page',
        unit: 'ms',
        goal: '50 ms at most',
      });
    }
    return figures;
  } finally {
    await browser.close();
    await product.stop();
    rmSync(folder, { recursive: true, force: true });
  }
}

async function tasksOf(context: BrowserContext, address: string, words: RegExp): Promise<Task[]> {
  const page = await context.newPage();
  await page.addInitScript({ content: WATCH });
  const cdp = await context.newCDPSession(page);
  await cdp.send('Emulation.setCPUThrottlingRate', { rate: THROTTLE });
  await page.goto(address);
  await page.getByText(words).first().waitFor({ timeout: 120_000 });
  await page.waitForTimeout(3_000);
  const tasks: Task[] = await page.evaluate('window.longTasks');
  await page.close();
  return tasks;
}

/** Tasks over 50 ms, by whoever called most of each. The reading of scripts is left out: it is the same for ten fish. */
const WATCH = `
  window.longTasks = [];
  new PerformanceObserver((list) => {
    for (const { scripts } of list.getEntries()) {
      const most = [...scripts].sort((a, b) => b.duration - a.duration)[0];
      if (most && most.invokerType !== 'classic-script' && !most.invoker.endsWith('.onload'))
        window.longTasks.push({ ms: most.duration, by: most.invoker });
    }
  }).observe({ type: 'long-animation-frame', buffered: true });`;
