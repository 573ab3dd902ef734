import { cpSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { brotliCompressSync, gzipSync } from 'node:zlib';
import { type BrowserContext, chromium, type Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { readFish } from '@/shared/fish/contract';
import { listHolds, readHold } from '@/shared/holds/contract';
import { listPhotos } from '@/shared/photos/contract';
import { listEntries } from '@/shared/record/contract';
import { BROWSER_ARGS, PHONE, type Running, startProduct } from '../support/browser';
import { likePhoto } from '../support/pictureBytes';
import { press, signUp } from '../support/steps';
import { broodIn, type Colony, colonyIn, holdIn } from '../support/stock';
import { type Person, personAt } from '../support/testApp';

let product: Running;
let folder: string;

beforeAll(async () => {
  product = await startProduct();
  folder = mkdtempSync(join(tmpdir(), 'kinwater-phone-'));
});
afterAll(async () => {
  await product?.stop();
  rmSync(folder, { recursive: true, force: true });
});

/** A phone whose browser can be closed and taken up again: what it keeps, it keeps on disk. */
const phone = (name: string): Promise<BrowserContext> =>
  chromium.launchPersistentContext(join(folder, name), {
    executablePath: process.env['CHROMIUM'] ?? '/usr/bin/chromium',
    args: BROWSER_ARGS,
    viewport: PHONE,
    reducedMotion: 'reduce',
  });

async function pageOf(context: BrowserContext): Promise<Page> {
  const page = context.pages()[0] ?? (await context.newPage());
  page.setDefaultTimeout(15_000);
  return page;
}

/** The same person without a screen, to prepare a fishroom and to see what the server has. */
async function serverSide(context: BrowserContext): Promise<Person> {
  const person = personAt(product.origin);
  person.cookie = (await context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
  return person;
}

type Room = {
  home: string;
  roomId: string;
  person: Person;
  colony: Colony;
  brood: Awaited<ReturnType<typeof broodIn>>;
};

async function roomOn(context: BrowserContext, who: { name: string; email: string; room: string }): Promise<Room> {
  const page = await pageOf(context);
  const home = await signUp(page, context, product, who);
  const roomId = home.split('/').at(-1) ?? '';
  const person = await serverSide(context);
  const colony = await colonyIn(person, roomId);
  const brood = await broodIn(person, roomId, colony);
  return { home, roomId, person, colony, brood };
}

/** Until the app's files and what the forms need are on the device. */
async function settled(page: Page): Promise<void> {
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await page.waitForTimeout(4000);
  await page.waitForLoadState('networkidle');
}

const waitingOn = (page: Page) => page.getByRole('list', { name: 'Records that wait here' }).getByRole('listitem');

const open = async (page: Page, address: string, heading: string | RegExp) => {
  await page.goto(address);
  await page.getByRole('heading', { name: heading }).first().waitFor();
};

test('ten records made without a signal, photos too, survive the browser being closed and go up once, in order', async () => {
  let context = await phone('keeper');
  const room = await roomOn(context, { name: 'Runa Ekdal', email: 'runa@mail.example', room: 'Ekdal Fishroom' });
  const { home, roomId, person, colony, brood } = room;
  let page = await pageOf(context);
  await page.goto(home);
  await settled(page);
  const before = (await person.get(listEntries, { params: { roomId } })).entries.map(({ id }) => id);

  await context.setOffline(true);
  const at = (form: string, query: string) => `${home}/record/${form}?${query}`;
  const tank = `tank=${colony.tankId}`;
  const kept = () =>
    page
      .getByText(/Waits here for a signal/)
      .first()
      .waitFor();

  for (const percent of ['20 %', '30 %', '50 %']) {
    await open(page, at('water-change', tank), 'Water change');
    await page.getByRole('radio', { name: percent }).click();
    await press(page, 'Save water change');
    await kept();
  }
  await open(page, at('water-test', tank), 'Water test');
  await page.getByRole('textbox', { name: /^pH/ }).fill('8.4');
  await press(page, 'Save test');
  await kept();
  await open(page, at('seen-well', tank), 'Seen well');
  await press(page, /^Save/);
  await kept();
  await open(page, at('loss', `batch=${brood.batchId}&one=1`), /Loss/);
  await press(page, /^Save/);
  await kept();
  await open(page, at('head-count', `batch=${brood.batchId}`), 'Head count');
  await page.getByRole('textbox').first().fill('33');
  await press(page, /^Save/);
  await kept();
  for (const name of ['one.jpg', 'two.jpg']) {
    await open(page, at('photo', `brood=${brood.broodId}`), 'Photo');
    const chooser = page.waitForEvent('filechooser');
    await press(page, 'Choose photos');
    await (await chooser).setFiles({
      name,
      mimeType: 'image/jpeg',
      buffer: await likePhoto(name.length * 40, 320)
        .jpeg()
        .toBuffer(),
    });
    await press(page, /^Save photo/);
    await kept();
  }
  await open(page, at('dominant', `fish=${colony.males[0]}`), 'Dominant');
  await press(page, /^Save/);
  await kept();

  await page.getByRole('button', { name: 'No signal. 10 records wait here' }).click();
  await waitingOn(page).nth(9).waitFor();
  expect(await waitingOn(page).count()).toBe(10);
  expect((await person.get(listEntries, { params: { roomId } })).entries).toHaveLength(before.length);

  await context.close();
  context = await phone('keeper');
  await context.setOffline(true);
  page = await pageOf(context);
  await open(page, `${home}/waiting`, 'Waiting records');
  await waitingOn(page).nth(9).waitFor();
  expect(await waitingOn(page).count()).toBe(10);

  await context.setOffline(false);
  await page.getByText('Nothing waits here').waitFor({ timeout: 30_000 });
  const { entries } = await person.get(listEntries, { params: { roomId } });
  const made = entries.filter(({ id }) => !before.includes(id)).sort((a, b) => (a.receivedAt < b.receivedAt ? -1 : 1));
  expect(made.map(({ kind }) => kind)).toEqual([
    'waterChanged',
    'waterChanged',
    'waterChanged',
    'waterTested',
    'seenWell',
    'headsLost',
    'headCounted',
    'photoTaken',
    'photoTaken',
    'dominant',
  ]);
  expect(made.map(({ said }) => said).slice(0, 3)).toEqual([
    expect.stringContaining('20'),
    expect.stringContaining('30'),
    expect.stringContaining('50'),
  ]);
  expect((await person.get(listPhotos, { params: { roomId } })).photos).toHaveLength(2);
  await context.close();
});

test('two records of one mouth stand side by side; theirs is kept, and what was recorded on top of mine goes along', async () => {
  const context = await phone('conflict');
  const room = await roomOn(context, { name: 'Odd Lerke', email: 'odd@mail.example', room: 'Lerke Fishroom' });
  const { home, roomId, person, colony } = room;
  const page = await pageOf(context);
  await page.goto(home);
  await settled(page);
  const female = colony.females[1] ?? '';
  const { fish } = await person.get(readFish, { params: { roomId, fishId: female } });

  await context.setOffline(true);
  await open(page, `${home}/record/holding?tank=${colony.tankId}`, /Holding seen/);
  await page.getByRole('radio', { name: (fish.code ?? '').slice(-2) }).click();
  await page.getByText('A week', { exact: true }).click();
  await press(page, /^Save hold/);
  await page
    .getByText(/Waits here for a signal/)
    .first()
    .waitFor();
  await open(page, `${home}/record/check?tank=${colony.tankId}`, 'Check');
  await page.getByRole('radio', { name: /Still holding/ }).click();
  await press(page, 'Save check');
  await page
    .getByText(/Waits here for a signal/)
    .first()
    .waitFor();

  const theirs = await holdIn(person, roomId, colony, { holderId: female });
  await context.setOffline(false);
  await page.getByRole('button', { name: '1 not saved' }).click({ timeout: 30_000 });
  await page.getByRole('link', { name: 'See both' }).click();
  await page.getByText('Not saved yet. Odd Lerke recorded this too.').waitFor();
  expect(await page.getByRole('radio').count()).toBe(2);
  await page.getByRole('button', { name: /yours as a check/ }).click();
  await page.getByText('Nothing waits here').waitFor();

  const { holds } = await person.get(listHolds, { params: { roomId }, query: { holderId: female, which: 'all' } });
  expect(holds.map(({ id }) => id)).toEqual([theirs]);
  const { checks } = await person.get(readHold, { params: { roomId, holdId: theirs } });
  expect(checks.map(({ seen }) => seen)).toEqual(['holding', 'holding']);
  expect(checks.some(({ note }) => note?.startsWith('I saw her not holding'))).toBe(true);
  await context.close();
});

test('a page that was never opened says so without a signal, one that was opens to what was last seen', async () => {
  const context = await phone('reader');
  const room = await roomOn(context, { name: 'Liv Hauge', email: 'liv@mail.example', room: 'Hauge Fishroom' });
  const { home, colony, brood } = room;
  const page = await pageOf(context);
  await open(page, `${home}/broods/${brood.broodId}`, /MOKA-26A/);
  await settled(page);
  await context.setOffline(true);
  await open(page, `${home}/broods/${brood.broodId}`, /MOKA-26A/);
  await page.getByText('No signal', { exact: true }).waitFor();
  await page.goto(`${home}/colonies/${colony.colonyId}`);
  await page.getByText(/not on this device yet/).waitFor();
  await context.close();
});

test('after signing out nothing of the person is left on the device, and going back shows nothing', async () => {
  const context = await phone('leaver');
  const room = await roomOn(context, { name: 'Kari Moen', email: 'kari@mail.example', room: 'Moen Fishroom' });
  const page = await pageOf(context);
  await page.goto(room.home);
  await settled(page);
  expect(await keptOn(page)).not.toEqual([]);
  await open(page, `${room.home}/settings`, 'Settings');
  await press(page, 'Sign out');
  await page.getByRole('button', { name: 'Sign in' }).waitFor();
  expect(await keptOn(page)).toEqual([]);
  await page.goBack();
  await page.waitForTimeout(1500);
  expect(await page.getByText('MOKA').count()).toBe(0);
  await context.close();
});

/** Every row of every database of the browser, and what its plain storage holds; the theme is the device's own. */
const keptOn = (page: Page): Promise<string[]> =>
  page.evaluate(async () => {
    const rows: string[] = Object.keys(localStorage).filter((key) => key !== 'kinwater.theme');
    for (const { name } of await indexedDB.databases()) {
      const db = await new Promise<IDBDatabase>((done, failed) => {
        const asked = indexedDB.open(name ?? '');
        asked.onsuccess = () => done(asked.result);
        asked.onerror = () => failed(asked.error);
      });
      for (const store of db.objectStoreNames) {
        const keys = await new Promise<IDBValidKey[]>((done) => {
          const asked = db.transaction(store).objectStore(store).getAllKeys();
          asked.onsuccess = () => done(asked.result);
        });
        rows.push(...keys.map((key) => `${name} ${String(key)}`));
      }
      db.close();
    }
    return rows;
  });

test('a new version waits until it is taken, and pages that are open keep working until then', async () => {
  const web = join(folder, 'web');
  cpSync('dist', web, { recursive: true });
  const own = await startProduct({ WEB_FOLDER: web });
  const context = await phone('updater');
  const page = await pageOf(context);
  await page.goto(`${own.origin}/sign-in`);
  await page.evaluate(async () => {
    await navigator.serviceWorker.ready;
  });
  await page.reload();
  for (const [file, from, to] of [
    ['index.html', '<html ', '<html data-build="next" '],
    ['sw.js', "const VERSION = '", "const VERSION = 'next-"],
  ] as const) {
    const next = readFileSync(join(web, file), 'utf8').replace(from, to);
    writeFileSync(join(web, file), next);
    writeFileSync(join(web, `${file}.br`), brotliCompressSync(next));
    writeFileSync(join(web, `${file}.gz`), gzipSync(next));
  }
  const build = () => page.evaluate(() => document.documentElement.dataset['build'] ?? 'first');
  await page.reload();
  await page.getByText('A new version of Kinwater is ready').waitFor();
  expect(await build()).toBe('first');
  await page.getByRole('button', { name: 'Use it' }).click();
  await expect.poll(build).toBe('next');
  await context.close();
  await own.stop();
});
