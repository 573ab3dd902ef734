import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, onTestFailed, test } from 'vitest';
import { changeFish, readFish } from '@/shared/fish/contract';
import { readPedigree } from '@/shared/lineage/contract';
import { openBrowser, PHONE, type Running, startProduct, visitorAt } from '../support/browser';
import { press, seen, signUp } from '../support/steps';
import { broodIn, colonyIn, record } from '../support/stock';
import { personAt } from '../support/testApp';

let product: Running;
let browser: Browser;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), openBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

/*
 * A mouthful spawned from 2 to 4 April; MOKA-A01 dominant from 25 March on. Looked at are the days from 19 March (a fortnight
 * before) to 4 April: 17 of them, 11 with A01 dominant. A male never seen dominant counts as one day, and one day is added to
 * each: 12 to 1, so 92.3 % and 7.7 %.
 */
test('parents are set later: shared by days dominant, doubted, settled by a DNA result, and held against the days', async () => {
  const { page, context, violations, broken } = await visitorAt(browser, PHONE, 'dark');
  onTestFailed(() => seen(page));
  const who = { name: 'Ylva Sund', email: 'ylva@mail.example', room: 'Sund Fishroom' };
  const home = await signUp(page, context, product, who);
  const roomId = home.split('/').at(-1) ?? '';
  const person = personAt(product.origin);
  person.cookie = (await context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
  const colony = await colonyIn(person, roomId);
  const [first = '', second = ''] = colony.males;
  await record(person, roomId, { kind: 'dominant', fishId: first, onDay: '2026-03-25', note: null });
  const { broodId } = await broodIn(person, roomId, colony);

  await page.goto(`${home}/lineage/${broodId}`);
  const toParents = page.getByRole('link', { name: 'Set parents' });
  await toParents.click();
  const shareOf = (code: string) => page.getByRole('textbox', { name: `Share of ${code}, percent` });
  const basis = page.getByRole('textbox', { name: 'What it rests on' });
  await expect.poll(() => shareOf('MOKA-A01').inputValue()).toBe('75');
  await page.getByText('Dominant 11 of 17 days').waitFor();

  await press(page, /^Share by days dominant/);
  expect(await shareOf('MOKA-A01').inputValue()).toBe('92.3');
  expect(await shareOf('MOKA-A02').inputValue()).toBe('7.7');
  expect(await basis.inputValue()).toBe('MOKA-A01 dominant 11 of 17 days');

  // A slip is named beside its field, and stands there still after a look elsewhere.
  await shareOf('MOKA-A02').fill('a little');
  await press(page, 'Show what it changes');
  await page.getByText('Type a share').waitFor();
  expect(await shareOf('MOKA-A02').getAttribute('aria-invalid')).toBe('true');
  await page.goBack();
  await toParents.click();
  await expect.poll(() => shareOf('MOKA-A02').inputValue()).toBe('a little');
  expect(await basis.inputValue()).toBe('MOKA-A01 dominant 11 of 17 days');

  await press(page, 'Leave out MOKA-A02');
  await basis.fill('DNA: MOKA-A02 excluded');
  await press(page, 'Show what it changes');
  await page.getByText('No F, generation or known pedigree changes').waitFor();
  const { nodes: before } = await person.get(readPedigree, { params: { roomId } });
  expect(before.find(({ id }) => id === broodId)).toMatchObject({ sire: { kind: 'oneOf' } });
  await press(page, 'Save parents');
  await page.getByRole('button', { name: /^MOKA-A01, fish/ }).waitFor();
  const { nodes } = await person.get(readPedigree, { params: { roomId } });
  expect(nodes.find(({ id }) => id === broodId)).toMatchObject({ sire: { kind: 'known', id: first } });
  expect(nodes.find(({ id }) => id === second)).toBeDefined();

  // Its father turns out to be younger than the brood: listed, with the way to mend it.
  const { fish } = await person.get(readFish, { params: { roomId, fishId: first } });
  const { version, code, keptAs } = fish;
  await person.get(changeFish, {
    params: { roomId, fishId: first },
    body: { version, code, keptAs, bornOn: '2026-05-01', arrivedOn: null, note: null },
  });
  await page.goto(`${home}/lineage`);
  await page.getByRole('link', { name: /contradict/i }).click();
  await page.getByRole('heading', { name: 'Younger than its young' }).waitFor();
  await page.getByRole('link', { name: 'Parents of MOKA-26A' }).click();
  await page.getByText('DNA: MOKA-A02 excluded').first().waitFor();
  expect(violations).toEqual([]);
  expect(broken).toEqual([]);
});
