import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { AxeBuilder } from '@axe-core/playwright';
import type { Browser, Locator, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, onTestFailed, test } from 'vitest';
import { openBrowser, PHONE, type Running, startProduct, type Visitor, visitorAt, WIDE } from '../support/browser';
import { addFamilies, type Family } from '../support/pedigreeRoom';
import { seen, signUp } from '../support/steps';
import { colonyIn } from '../support/stock';
import { personAt } from '../support/testApp';

/*
 * A strain of 400 fish: 20 wild founders and 20 families of 19 holdbacks. Kinships of their kind, worked out by hand from
 * unrelated founders (Falconer & Mackay, Introduction to Quantitative Genetics, from memory): a fish with itself 1/2, parent
 * and young 1/4, full sibs 1/4, half sibs 1/8; half sibs for one of two equally likely sires 1/16.
 */

let product: Running;
let browser: Browser;
let visitor: Visitor;
let home: string;
const folder = mkdtempSync(join(tmpdir(), 'kinwater-kin-'));
const dataFolder = join(folder, 'data');

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct({ DATA_FOLDER: dataFolder }), openBrowser()]);
  visitor = await visitorAt(browser, WIDE);
  const { page, context } = visitor;
  home = await signUp(page, context, product, { name: 'Wanda', email: 'wanda@kin.example', room: 'Kin Cellar' });
  const roomId = home.split('/').at(-1) ?? '';
  const person = personAt(product.origin);
  person.cookie = (await context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
  const colony = await colonyIn(person, roomId, { males: 4, females: 16 });
  const { males, females } = colony;
  const family = (n: number): Family => ({
    code: `MOKA-26${String.fromCharCode(65 + n)}`,
    // By order of codes the males are A01 to A04, the females A05 to A20.
    sires: n === 19 ? males.slice(0, 2) : males.slice(n % 2, (n % 2) + 1),
    dam: females[n % 16] ?? '',
    heads: 19,
  });
  addFamilies(
    dataFolder,
    roomId,
    colony,
    Array.from({ length: 20 }, (_, n) => family(n)),
  );
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
  rmSync(folder, { recursive: true, force: true });
});

const open = async (page: Page, path: string) => {
  await page.goto(`${home}/${path}`);
  await page.getByText('Loading', { exact: false }).first().waitFor({ state: 'hidden' });
};

const cell = (page: Page, two: string) => page.getByRole('gridcell', { name: new RegExp(`^${two}: kinship`) });

/** Goes along the table until the cell of two fish is drawn. */
async function broughtIn(page: Page, two: string): Promise<Locator> {
  const found = cell(page, two);
  const table = page.getByRole('grid');
  await table.waitFor();
  for (let step = 0; step < 60 && (await found.count()) === 0; step += 1) {
    await table.evaluate((box) => box.scrollBy({ left: box.clientWidth / 2 }));
    await page.waitForTimeout(40);
  }
  return found;
}

/** The figure of two fish, found by searching for the one and going along its row to the other. */
async function kinshipOf(page: Page, down: string, across: string): Promise<string> {
  await page.getByRole('searchbox', { name: /Fish, tank, colony/ }).fill(down);
  const found = await broughtIn(page, down === across ? `${down} with itself` : `${across} with ${down}`);
  const said = (await found.first().getAttribute('aria-label')) ?? '';
  await page.getByRole('grid').evaluate((table) => table.scrollTo({ left: 0 }));
  return /kinship ([\d.]+)/.exec(said)?.[1] ?? said;
}

test('kinships of 400 fish are those worked out by hand', async () => {
  const { page } = visitor;
  onTestFailed(() => seen(page));
  await open(page, 'lineage/kinship?view=all&sort=code');
  await page.getByText('400 fish').waitFor();
  // Family A: A01 with A05; C: A01 with A07; B: A02 with A06; V: A01 or A02 with A08, as D: A02 with A08.
  expect(await kinshipOf(page, 'MOKA-26A-01', 'MOKA-26A-01')).toBe('0.500');
  expect(await kinshipOf(page, 'MOKA-26A-01', 'MOKA-26A-02')).toBe('0.250');
  expect(await kinshipOf(page, 'MOKA-26A-01', 'MOKA-26C-01')).toBe('0.125');
  expect(await kinshipOf(page, 'MOKA-26A-01', 'MOKA-26B-01')).toBe('0.000');
  expect(await kinshipOf(page, 'MOKA-26A-01', 'MOKA-A01')).toBe('0.250');
  expect(await kinshipOf(page, 'MOKA-26T-01', 'MOKA-26A-01')).toBe('0.063');
  expect(await kinshipOf(page, 'MOKA-A01', 'MOKA-A02')).toBe('0.000');
});

test('a figure says what it rests on, and doubt is named', async () => {
  const { page } = visitor;
  onTestFailed(() => seen(page));
  await open(page, 'lineage/kinship?view=all&sort=code&q=MOKA-26T-01');
  await (await broughtIn(page, 'MOKA-A01 with MOKA-26T-01')).click();
  const sheet = page.getByRole('dialog', { name: /MOKA-A01 and MOKA-26T-01/ });
  await sheet.getByText('0.125', { exact: true }).first().waitFor();
  const text = (await sheet.textContent())?.replaceAll('\u00a0', ' ') ?? '';
  expect(text).toContain('0 at 50 %, 0.250 at 50 %');
  expect(text).toContain('parent of MOKA-26T-01');
  expect(text).toContain('possible');
  expect(text).toMatch(/sire MOKA-A01 50 % or MOKA-A02 50 %/);
  expect(text).toContain('equal to 1.0 full generations');
});

/** What is asked of the page, and how many rows its table has once it has answered. */
type Asked = { search: string; rows: number } | { press: string; rows: number };

/** Milliseconds from the letter or the press until the table is drawn anew, measured in the page itself. */
const answeredIn = (page: Page, asked: Asked): Promise<number> =>
  page.evaluate(async (of) => {
    const table = () => document.querySelector('[role=grid]');
    const from = performance.now();
    if ('search' in of) {
      const field = document.querySelector<HTMLInputElement>('main input[type=search]');
      const set = Object.getOwnPropertyDescriptor(HTMLInputElement.prototype, 'value')?.set;
      set?.call(field, of.search);
      field?.dispatchEvent(new Event('input', { bubbles: true }));
    } else {
      const buttons = [
        ...document.querySelectorAll<HTMLElement>('main [role=group] button, main [role=group] [role=button]'),
      ];
      buttons.find(({ textContent }) => textContent?.startsWith(of.press))?.click();
    }
    while (Number(table()?.getAttribute('aria-rowcount')) !== of.rows + 1) {
      if (performance.now() - from > 5000) return 5000;
      await new Promise((drawn) => requestAnimationFrame(drawn));
    }
    // Until what was put in is laid out and painted.
    await new Promise((drawn) => requestAnimationFrame(() => setTimeout(drawn, 0)));
    return performance.now() - from;
  }, asked);

/** The quickest of a few: the machine may be busy with other things, the page is not. */
async function quickest(page: Page, there: Asked, back: Asked): Promise<number> {
  const times: number[] = [];
  for (let i = 0; i < 6; i += 1) {
    times.push(await answeredIn(page, there));
    await page.waitForTimeout(500);
    await answeredIn(page, back);
    await page.waitForTimeout(500);
  }
  return Math.min(...times);
}

test.each([
  ['phone', PHONE],
  ['wide screen', WIDE],
] as const)('filtering 400 fish answers at once on a %s slowed to a quarter', async (_where, viewport) => {
  const { page, context } = visitor;
  onTestFailed(() => seen(page));
  await page.setViewportSize(viewport);
  await open(page, 'lineage/kinship?view=all');
  await page.getByText('400 fish').waitFor();
  const cdp = await context.newCDPSession(page);
  await cdp.send('Emulation.setCPUThrottlingRate', { rate: 4 });
  const all = { search: '', rows: 400 };
  const searching = await quickest(page, { search: '26k', rows: 19 }, all);
  const founders = await quickest(page, { press: 'Breeders', rows: 20 }, { press: 'Breeders', rows: 400 });
  await cdp.send('Emulation.setCPUThrottlingRate', { rate: 1 });
  // The goal is 200 ms on a quiet machine; beyond twice that it is no noise any more.
  expect.soft(searching, 'a search').toBeLessThanOrEqual(400);
  expect.soft(founders, 'a filter').toBeLessThanOrEqual(400);
});

test('a fish among 400 is found on the graph’s page, and what is around it is drawn', async () => {
  const { page } = visitor;
  onTestFailed(() => seen(page));
  await page.setViewportSize(PHONE);
  await open(page, 'lineage');
  await page.getByRole('searchbox', { name: /Fish, brood/ }).fill('26k-03');
  const row = page.getByRole('link', { name: /^MOKA-26K-03, fish, sire MOKA-A01, dam MOKA-A15/ });
  await row.click();
  await page.getByRole('heading', { name: 'MOKA-26K-03' }).waitFor();
  await page.getByRole('button', { name: /^MOKA-A15, fish/ }).waitFor();
});

const SERIOUS = new Set(['serious', 'critical']);

/** What axe finds; of the second theme only what a theme can change. */
async function faultsOf(page: Page, where: string): Promise<string[]> {
  const wrong: string[] = [];
  for (const theme of ['dark', 'light'] as const) {
    await page.emulateMedia({ colorScheme: theme });
    await page.waitForTimeout(50);
    const axe = new AxeBuilder({ page }).setLegacyMode();
    const { violations } = await (theme === 'light' ? axe.withRules('color-contrast') : axe).analyze();
    const serious = violations.filter(({ impact }) => SERIOUS.has(impact ?? ''));
    wrong.push(
      ...serious.flatMap(({ id, nodes }) => nodes.slice(0, 2).map(({ html }) => `${where}, ${theme}: ${id} ${html}`)),
    );
  }
  const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  return over > 0 ? [...wrong, `${where}: ${over} px too wide`] : wrong;
}

test.each([
  ['phone', PHONE],
  ['wide screen', WIDE],
] as const)('kinship, a pair and the founders have no serious fault on a %s', async (_where, viewport) => {
  const { page } = visitor;
  onTestFailed(() => seen(page));
  await page.setViewportSize(viewport);
  await open(page, 'lineage/kinship?view=pairs');
  await cell(page, 'MOKA-\\S+ with MOKA-\\S+').first().waitFor();
  const wrong = await faultsOf(page, 'kinship');
  await cell(page, 'MOKA-\\S+ with MOKA-\\S+').first().click();
  await page
    .getByRole('dialog')
    .getByText(/kinship/)
    .first()
    .waitFor();
  wrong.push(...(await faultsOf(page, 'pair')));
  await open(page, 'lineage/founders');
  await page.getByText('What each colony keeps').waitFor();
  wrong.push(...(await faultsOf(page, 'founders')));
  expect(wrong).toEqual([]);
  expect(visitor.violations).toEqual([]);
  expect(visitor.broken).toEqual([]);
});

/*
 * By hand. A01 sired ten families of 19 whole (A, C, … S) and half of T, and is one of the 400: (190 + 9.5) / 2 + 1 = 100.75
 * of 400 genomes, 25 %, and 190 + 19 + 1 fish may carry it. The colony is its 20 founders: mean kinship 20 x 1/2 / 400 = 1/40, gene diversity 0.975; by heads
 * 4 x 4 x 16 / 20 = 12.8; a generation on 0.975 x (1 - 1 / 25.6) = 0.937.
 */
test('founders’ shares, the colony’s effective size and the forecast are those of the sums', async () => {
  const { page } = visitor;
  onTestFailed(() => seen(page));
  await page.setViewportSize(PHONE);
  await open(page, 'lineage/founders?generations=2');
  await page.getByRole('link', { name: /^MOKA-A01, 25\s%\. In 210 of 400 fish/ }).waitFor();
  await page.getByRole('button', { name: 'One generation less' }).click();
  await page.waitForURL(/generations=1(&|$)/);
  const colony = page.getByRole('button', { name: /^MOKA-A: gene diversity 0\.97, 0\.94 after 1/ });
  await colony.click();
  const sheet = page.getByRole('dialog', { name: 'MOKA-A' });
  await sheet.getByText('12.8, used for the forecast').waitFor();
  await sheet.getByText('0.937').waitFor();
  await sheet.getByText(/No brood of theirs is recorded/).waitFor();
});
