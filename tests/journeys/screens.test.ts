import { readdirSync } from 'node:fs';
import { AxeBuilder } from '@axe-core/playwright';
import type { Browser, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { listBroods } from '@/shared/broods/contract';
import { listOffers } from '@/shared/buyers/offers';
import { listRequests } from '@/shared/buyers/requests';
import { listColonies } from '@/shared/colonies/contract';
import { listFish } from '@/shared/fish/contract';
import { listHolds } from '@/shared/holds/contract';
import { listOrders, readOrder } from '@/shared/orders/contract';
import { listSheets } from '@/shared/sheets/contract';
import { listStrains } from '@/shared/strains/contract';
import { listTanks } from '@/shared/tanks/contract';
import { openBrowser, PHONE, type Running, startProduct, type Visitor, visitorAt, WIDE } from '../support/browser';
import { type Person, personAt } from '../support/testApp';

/*
 * Every address of the app, in the demo fishroom, on a phone and on a wide screen, in the dim room and in daylight: axe
 * finds no serious fault, nothing is wider than the screen, nothing breaks, and the content security policy refuses nothing.
 */

const NORA = { email: 'nora@underhill.example', password: 'two racks and a heater' };

let product: Running;
let browser: Browser;
let owner: Person;
let roomId: string;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct({ DEMO: '1' }), openBrowser()]);
  owner = personAt(product.origin);
  await owner.raw('POST', '/api/sessions', {
    body: JSON.stringify(NORA),
    headers: { 'content-type': 'application/json' },
  });
  const me = await (await owner.raw('GET', '/api/me')).json();
  roomId = me.rooms[0].id;
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

/** Every address that a file of `app` answers, without the groups' brackets. */
const routes = readdirSync('app', { recursive: true, encoding: 'utf8' })
  .filter((file) => file.endsWith('.tsx') && !/_layout|\+/.test(file))
  .map((file) => `/${file}`.replace(/\/\([^)]*\)/g, '').replace(/(\/index)?\.tsx$/, ''))
  .sort();

/** An id that nobody has: what the address then says is looked at too. */
const NOBODY = '01980000-0000-7000-8000-000000000000';

type Found = Record<string, string>;

/** One of everything that an address may name. */
async function somethingOfEach(): Promise<Found> {
  const params = { roomId };
  const [{ broods }, { colonies }, { fish }, { holds }, { sheets }, { strains }, { tanks }] = await Promise.all([
    owner.get(listBroods, { params }),
    owner.get(listColonies, { params }),
    owner.get(listFish, { params }),
    owner.get(listHolds, { params }),
    owner.get(listSheets, { params }),
    owner.get(listStrains, { params }),
    owner.get(listTanks, { params }),
  ]);
  const { orders } = await owner.get(listOrders, { params });
  const { owner: owned } = await owner.get(readOrder, { params: { roomId, orderId: orders[0]?.id ?? '' } });
  const { requests } = await owner.get(listRequests, { params });
  const { offers } = await owner.get(listOffers, { params });
  const full = broods.find(({ code }) => code.includes('-'));
  const open = holds.find(({ endedOn }) => endedOn === null);
  const batchTank = tanks.find(({ residents }) => residents.some(({ thing }) => thing === 'batch'));
  return {
    roomId,
    broodId: full?.id ?? '',
    id: full?.id ?? '',
    colonyId: colonies[0]?.id ?? '',
    fishId: fish.find(({ code }) => code)?.id ?? '',
    holdId: open?.id ?? '',
    sheetId: sheets[0]?.id ?? NOBODY,
    strainId: strains[0]?.id ?? '',
    tankId: tanks[0]?.id ?? '',
    speciesId: strains[0]?.speciesId ?? '',
    batchId: batchTank?.residents.find(({ thing }) => thing === 'batch')?.id ?? '',
    thing: 'brood',
    thingId: full?.id ?? '',
    entryId: NOBODY,
    planId: NOBODY,
    taskId: NOBODY,
    animalId: full?.id ?? '',
    orderId: orders[0]?.id ?? '',
    orderToken: owned?.link.split('/').at(-1) ?? '',
    importId: NOBODY,
    requestId: requests[0]?.id ?? '',
    slug: 'underhill',
    listedBrood: offers[0]?.broodId ?? '',
    token: 'AAAAAAAAAAAAAAAAAAAAAA',
    holdTank: open?.tank.id ?? '',
    batchTank: batchTank?.id ?? '',
  };
}

/** Record's forms open for what is in a tank: a hold's, or a batch's. */
const OF_HOLDS = /record\/(check|strip|release|swallowed|hold-correction)$/;
function addressOf(route: string, found: Found): string {
  const path = route.replace(/\[(\w+)\]/g, (_all, name: string) => {
    const id = found[route.startsWith('/order') && name === 'token' ? 'orderToken' : name];
    if (!id) throw new Error(`Say in this test how to find a [${name}] for ${route}`);
    return id;
  });
  if (route.endsWith('/ask')) return `${path}?brood=${found['listedBrood']}`;
  if (!/\/record\/./.test(route) || /scan$/.test(route)) return path;
  return `${path}?tank=${OF_HOLDS.test(route) ? found['holdTank'] : found['batchTank']}`;
}

async function signedIn(viewport: typeof PHONE): Promise<Visitor> {
  const visitor = await visitorAt(browser, viewport);
  await visitor.context.request.post(`${product.origin}/api/sessions`, { data: NORA });
  return visitor;
}

const SERIOUS = new Set(['serious', 'critical']);

async function faults(page: Page, contrastOnly: boolean): Promise<string[]> {
  const axe = new AxeBuilder({ page }).setLegacyMode();
  const { violations } = await (contrastOnly ? axe.withRules('color-contrast') : axe).analyze();
  const serious = violations
    .filter(({ impact }) => SERIOUS.has(impact ?? ''))
    .flatMap(({ id, nodes }) => nodes.slice(0, 3).map(({ html }) => `${id}: ${html.slice(0, 160)}`));
  const over = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
  return over > 0 ? [...serious, `${over} px wider than the screen`] : serious;
}

async function settled(page: Page): Promise<void> {
  await page.waitForLoadState('networkidle');
  await page.getByText('Loading', { exact: false }).first().waitFor({ state: 'hidden' });
}

/** Both sizes and both themes once each; `EVERY_VIEW=1` also looks at the contrast of the other two, for twice the time. */
const VIEWS = [
  ['phone, dim room', PHONE, 'dark', false],
  ['wide, daylight', WIDE, 'light', false],
  ...(process.env['EVERY_VIEW']
    ? ([
        ['phone, daylight', PHONE, 'light', true],
        ['wide, dim room', WIDE, 'dark', true],
      ] as const)
    : []),
] as const;

/** Every view of each address; answers what is wrong, by address. */
async function look(at: string[], visitor: Visitor): Promise<string[]> {
  const wrong: string[] = [];
  for (const path of at) {
    await visitor.page.goto(`${product.origin}${path}`);
    await settled(visitor.page);
    for (const [where, viewport, theme, contrastOnly] of VIEWS) {
      await visitor.page.setViewportSize(viewport);
      await visitor.page.emulateMedia({ colorScheme: theme });
      await visitor.page.waitForTimeout(50);
      wrong.push(...(await faults(visitor.page, contrastOnly)).map((fault) => `${path} (${where}): ${fault}`));
    }
    wrong.push(...[...visitor.violations.splice(0), ...visitor.broken.splice(0)].map((what) => `${path}: ${what}`));
  }
  await visitor.context.close();
  return wrong;
}

test('every address is whole in both themes and sizes: no serious fault, no overflow, nothing refused', async () => {
  const found = await somethingOfEach();
  const inside = routes.filter((route) => route.startsWith('/r/')).map((route) => addressOf(route, found));
  const outside = routes.filter((route) => !route.startsWith('/r/')).map((route) => addressOf(route, found));
  const half = Math.ceil(inside.length / 2);
  const wrong = await Promise.all([
    signedIn(PHONE).then((visitor) => look(inside.slice(0, half), visitor)),
    signedIn(PHONE).then((visitor) => look(inside.slice(half), visitor)),
    visitorAt(browser, PHONE).then((visitor) => look(outside, visitor)),
  ]);
  expect(wrong.flat()).toEqual([]);
}, 900_000);
