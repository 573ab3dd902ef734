import type { Browser } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { letterTo, openBrowser, PHONE, type Running, startProduct, visitorAt, WIDE } from '../support/browser';

let product: Running;
let browser: Browser;

beforeAll(async () => {
  [product, browser] = await Promise.all([startProduct(), openBrowser()]);
});
afterAll(async () => {
  await browser?.close();
  await product?.stop();
});

describe.each([
  ['on a phone', PHONE, 'dark'],
  ['on a wide screen', WIDE, 'light'],
] as const)('%s', (where, viewport, theme) => {
  test('a breeder signs up, confirms the address by letter, makes a fishroom and lands on an empty Today', async () => {
    const { page, context, violations, broken } = await visitorAt(browser, viewport, theme);
    const email = `breeder-${where.replaceAll(' ', '-')}@mail.example`;
    await page.goto(`${product.origin}/sign-up`);
    await page.getByLabel('Your name').fill('Runa Ekdal');
    await page.getByLabel('Email').fill(email);
    await page.getByLabel('Password', { exact: true }).fill('short');
    await page.getByRole('button', { name: 'Sign up' }).click();
    await expect.poll(() => page.getByText(/8 letters/).count()).toBeGreaterThan(0);
    await page.getByLabel('Password', { exact: true }).fill('green tank by the window');
    await page.getByRole('button', { name: 'Sign up' }).click();
    const { text } = await letterTo(product.origin, email, /confirm/i);
    const link = /https?:\/\/\S+/.exec(text)?.[0] ?? '';
    expect(link.startsWith(product.origin)).toBe(true);
    const confirming = await context.newPage();
    await confirming.goto(link);
    await confirming.getByRole('button', { name: /confirm/i }).click();
    await confirming
      .getByText(/confirmed/i)
      .first()
      .waitFor();
    await confirming.close();
    await page.goto(product.origin);
    await page.getByLabel('Name', { exact: false }).first().fill('Ekdal Fishroom');
    await page
      .getByRole('button', { name: /make|create|start/i })
      .first()
      .click();
    await page.getByRole('heading', { name: 'Holding' }).waitFor();
    expect(page.url()).toMatch(/\/r\/[0-9a-f-]{36}$/);
    expect(violations).toEqual([]);
    expect(broken).toEqual([]);
    await context.close();
  });
});

test('an address that nobody has leads to one calm sentence, and no stack', async () => {
  const { page, context } = await visitorAt(browser, PHONE);
  await page.goto(`${product.origin}/no/such/page`);
  await page
    .getByText(/not found|nothing/i)
    .first()
    .waitFor();
  await context.close();
});
