import type { BrowserContext, Locator, Page } from 'playwright-core';
import { letterTo, type Running } from './browser';

/** What a person does in the app, by the words that are on the screen. */

export type Person = { name: string; email: string; room: string };

/** Signs up, confirms the address by the letter, makes a fishroom; answers the fishroom's address. */
export async function signUp(page: Page, context: BrowserContext, { origin }: Running, who: Person): Promise<string> {
  await page.goto(`${origin}/sign-up`);
  await page.getByLabel('Your name').fill(who.name);
  await page.getByLabel('Email').fill(who.email);
  await page.getByLabel('Password', { exact: true }).fill('green tank by the window');
  await page.getByRole('button', { name: 'Sign up' }).click();
  const { text } = await letterTo(origin, who.email, /confirm/i);
  const confirming = await context.newPage();
  await confirming.goto(/https?:\/\/\S+/.exec(text)?.[0] ?? '');
  await confirming.getByRole('button', { name: /confirm/i }).click();
  await confirming
    .getByText(/confirmed/i)
    .first()
    .waitFor();
  await confirming.close();
  await page.goto(origin);
  await page.getByLabel('Name', { exact: false }).first().fill(who.room);
  await page
    .getByRole('button', { name: /make|create|start/i })
    .first()
    .click();
  await page.getByRole('heading', { name: 'Holding' }).waitFor();
  return page.url();
}

/** Chooses one of a list that opens: by searching where it is long. */
export async function choose(page: Page, label: string, option: string): Promise<void> {
  await page.getByRole('combobox', { name: new RegExp(`^${label}`) }).click();
  const dialog = page.getByRole('dialog').last();
  const search = dialog.getByRole('searchbox');
  if ((await search.count()) > 0) await search.first().fill(option);
  await dialog
    .getByRole('radio', { name: new RegExp(option) })
    .first()
    .click();
}

/** Types a date into a stepper: "-120" is a hundred and twenty days ago. */
export async function typeDay(page: Page, label: string, typed: string): Promise<void> {
  const field = page.getByRole('spinbutton', { name: label });
  await field.fill(typed);
  await field.blur();
}

export const press = (page: Page, name: string | RegExp): Promise<void> =>
  page
    .getByRole('button', { name, exact: typeof name === 'string' })
    .last()
    .click();

/** The page's own heading: a form that has gone means that it was saved. */
export const heading = (page: Page, name: string | RegExp): Locator => page.getByRole('heading', { name }).first();

/** Presses the save button and waits until the form's page is left. */
export async function save(page: Page, name: string): Promise<void> {
  const before = page.url();
  await press(page, name);
  await page
    .waitForURL((url) => url.href !== before)
    .catch(async () => {
      const said = await page.locator('main').last().textContent();
      throw new Error(`"${name}" did not leave the form, which says:\n${said}`);
    });
}

/** A text or number field by how its label begins: units come after it. */
export const field = (page: Page, label: string): Locator =>
  page.getByRole('textbox', { name: new RegExp(`^${label}`) }).last();

/** What was on the screen when a test failed: kept where the environment names a folder for it. */
export async function seen(page: Page): Promise<void> {
  const folder = process.env['SHOTS'];
  if (folder) await page.screenshot({ path: `${folder}/failed.png` });
}

/** Saves a Record form and waits until the strip says that it was kept. */
export async function record(page: Page, name: string): Promise<void> {
  await save(page, name);
  await page
    .getByText(/\. Saved\.$/)
    .last()
    .waitFor();
}
