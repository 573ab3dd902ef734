import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, onTestFailed, test } from 'vitest';
import { getRoom } from '@/shared/rooms/contract';
import { TenthsMm } from '@/shared/units';
import { letterTo, openBrowser, PHONE, type Running, startProduct, visitorAt, WIDE } from '../support/browser';
import { field, heading, press, save, seen, signUp } from '../support/steps';
import { broodIn, colonyIn, record } from '../support/stock';
import { makeId, type Person, personAt } from '../support/testApp';

/*
 * A visitor on a phone reads the public page, asks for four fish, confirms by the mailed link; the owner on a wide screen
 * makes the order of it. The brood has ten fish of about 50 mm at 15.00 (pounds, which a British browser proposes): four cost 60.00.
 */

let product: Running;
let browser: Browser;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), openBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

/** Ten fish measured at 48, 50 and 52 mm; the owner's own listing is done on the screen. */
async function stocked(person: Person, roomId: string): Promise<string> {
  const colony = await colonyIn(person, roomId, { females: 2 });
  const { broodId } = await broodIn(person, roomId, colony, { opening: 10 });
  await record(person, roomId, {
    kind: 'lengthSampled',
    sampleId: makeId(),
    of: { thing: 'brood', id: broodId },
    onDay: '2026-05-13',
    measure: 'total',
    method: 'ruler',
    readings: [480, 500, 520].map((mm) => ({ lengthTenthsMm: TenthsMm.parse(mm), weightG: null })),
    note: null,
  });
  return broodId;
}

test('a visitor asks on a phone, confirms by letter, and the owner makes the order', async () => {
  const owner = await visitorAt(browser, WIDE, 'dark');
  onTestFailed(() => seen(owner.page));
  const home = await signUp(owner.page, owner.context, product, {
    name: 'Runa Ekdal',
    email: 'runa@mail.example',
    room: 'Ekdal Fishroom',
  });
  const roomId = home.split('/').at(-1) ?? '';
  const person = personAt(product.origin);
  person.cookie = (await owner.context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
  const broodId = await stocked(person, roomId);
  const { slug } = await person.get(getRoom, { params: { roomId } });

  // The owner lists the brood. Six at 5 cm: of ten with their mean there, five are expected.
  await owner.page.goto(`${home}/buyers/availability/${broodId}`);
  await heading(owner.page, 'Size today').waitFor();
  await owner.page.getByText('6 can’t be promised: only about 5 are there.').waitFor();
  await owner.page.getByRole('checkbox', { name: /List this brood/ }).click();
  await press(owner.page, 'Add a price');
  await field(owner.page, 'From').fill('3');
  await field(owner.page, 'Price each').fill('15');
  await press(owner.page, 'Save listing');
  await owner.page.getByText('listed', { exact: true }).waitFor();

  // Anyone reads it, with scripts off.
  const bare = await browser.newContext({ viewport: PHONE, javaScriptEnabled: false });
  const paper = await bare.newPage();
  await paper.goto(`${product.origin}/available/${slug}`);
  expect(await paper.title()).toBe('Ekdal Fishroom: fish available');
  const read = (await paper.locator('#boot').allInnerTexts()).join(' ').replace(/\s+/g, ' ');
  for (const words of ['Tropheus moorii', '£15.00', '10 available', '5.0 cm', 'How to ask'])
    expect(read).toContain(words);
  await bare.close();

  // A visitor asks on a phone, and confirms by the mailed link.
  const visitor = await visitorAt(browser, PHONE);
  onTestFailed(() => seen(visitor.page));
  await visitor.page.goto(`${product.origin}/available/${slug}`);
  await visitor.page.getByRole('link', { name: 'Ask for Tropheus moorii, brood MOKA-26A' }).click();
  await field(visitor.page, 'How many').fill('4');
  await field(visitor.page, 'Your name').fill('Wanda Prest');
  await field(visitor.page, 'Email').fill('wanda@pond.example');
  await press(visitor.page, 'Ask for these fish');
  await visitor.page.getByText('A letter is on its way to wanda@pond.example').waitFor();
  const { text } = await letterTo(product.origin, 'wanda@pond.example', /^Confirm what you asked of Ekdal Fishroom/);
  await visitor.page.goto(/https?:\/\/\S+\/asked\/\S+/.exec(text)?.[0] ?? '');
  await press(visitor.page, 'Confirm');
  await visitor.page.getByText('Ekdal Fishroom has your request and will answer.').waitFor();

  // The owner makes the order of it: held, priced by the list, and said in a letter.
  await owner.page.goto(`${home}/buyers/requests`);
  await owner.page.getByRole('link', { name: /^Wanda Prest, 4 × Tropheus moorii/ }).click();
  await save(owner.page, 'Make order');
  await heading(owner.page, /Wanda Prest|1001/).waitFor();
  await owner.page.getByText('£60.00').first().waitFor();
  const held = await letterTo(product.origin, 'wanda@pond.example', /the fish are held for you/);
  expect(held.text).toContain('4 × MOKA-26A');
  await visitor.page.reload();
  await visitor.page.getByText('It has become an order').waitFor();

  // What is held is not offered twice.
  await visitor.page.goto(`${product.origin}/available/${slug}`);
  await visitor.page.getByText('6', { exact: true }).first().waitFor();
  expect([...owner.violations, ...visitor.violations]).toEqual([]);
  expect([...owner.broken, ...visitor.broken]).toEqual([]);
  await Promise.all([owner.context.close(), visitor.context.close()]);
});
