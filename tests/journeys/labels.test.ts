import jsQR from 'jsqr';
import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, expect, onTestFailed, test } from 'vitest';
import { listHolds } from '@/shared/holds/contract';
import { typedCode } from '@/shared/labels/typedCode';
import { openBrowser, PHONE, type Running, startProduct, visitorAt } from '../support/browser';
import { printedPage } from '../support/readPdf';
import { seen, signUp } from '../support/steps';
import { colonyIn } from '../support/stock';
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

test('a printed label is scanned, and a holding is saved within four taps', async () => {
  const { page, context, violations, broken } = await visitorAt(browser, PHONE, 'dark');
  onTestFailed(() => seen(page));
  const who = { name: 'Tarja Ilves', email: 'tarja@mail.example', room: 'Ilves Fishroom' };
  const home = await signUp(page, context, product, who);
  const roomId = home.split('/').at(-1) ?? '';
  const person = personAt(product.origin);
  person.cookie = (await context.cookies()).map(({ name, value }) => `${name}=${value}`).join('; ');
  const { tankId } = await colonyIn(person, roomId);

  await page.goto(`${home}/stock/tanks`);
  await page.getByRole('link', { name: 'Print labels' }).click();
  await page.getByRole('checkbox', { name: /^T-MOKA/ }).click();
  await page.getByRole('radio', { name: 'One a page' }).click();
  const [asked] = await Promise.all([
    context.waitForEvent('request', (request) => request.url().includes('/labels/')),
    page.getByRole('button', { name: 'Print one label' }).click(),
  ]);
  const answer = await context.request.get(asked.url());
  expect(answer.headers()['content-type']).toBe('application/pdf');
  const { data, width, height } = await printedPage(await answer.body(), 1, 200);
  const address = jsQR(data, width, height)?.data ?? '';
  expect(address).toBe(`${home}/record?tank=${tankId}`);

  // As the phone's own camera opens it.
  await page.goto(address);
  let taps = 0;
  const tap = async (what: ReturnType<typeof page.getByRole>) => {
    taps += 1;
    await what.click();
  };
  await tap(page.getByRole('button', { name: 'Holding seen' }));
  await tap(page.getByRole('radio', { name: /04/ }).first());
  await tap(
    page
      .getByRole('button', { name: 'Yesterday' })
      .or(page.getByRole('radio', { name: 'Yesterday' }))
      .first(),
  );
  await tap(page.getByRole('button', { name: /^Save/ }).last());
  await page
    .getByText(/\. Saved\.$/)
    .last()
    .waitFor();
  expect(taps).toBeLessThanOrEqual(4);
  const { holds } = await person.get(listHolds, { params: { roomId }, query: { which: 'open' } });
  expect(holds.map(({ holder }) => holder?.code)).toEqual(['MOKA-A04']);

  // The short code under the square, typed where there is no camera.
  await page.goto(`${home}/record/scan`);
  await page
    .getByRole('textbox', { name: 'The code under the square' })
    .fill(typedCode('T-MOKA', tankId).toLowerCase());
  await page.waitForURL(`**/record?tank=${tankId}`);
  expect(violations).toEqual([]);
  expect(broken).toEqual([]);
});
