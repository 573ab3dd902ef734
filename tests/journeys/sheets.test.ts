import { readFile } from 'node:fs/promises';
import { AxeBuilder } from '@axe-core/playwright';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { afterAll, beforeAll, expect, onTestFailed, test } from 'vitest';
import { readPedigree } from '@/shared/lineage/contract';
import { kinship } from '@/shared/lineage/kinship';
import { listImported } from '@/shared/sheets/importContract';
import { openBrowser, PHONE, type Running, startProduct, visitorAt, WIDE } from '../support/browser';
import { readPdf } from '../support/readPdf';
import { choose, field, heading, press, save, seen, signUp } from '../support/steps';
import { broodIn, colonyIn, record, tankIn } from '../support/stock';
import { makeId, type Person, personAt } from '../support/testApp';

/*
 * Two fishrooms, each in a browser of its own. Larkmoor has wild fish, a brood of one of two males, and a daughter of it
 * held back; Fennel Yard buys. The stock is entered through the contract, the sheets are all done by hand.
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

/** Asks the contract as the person who is signed in in a browser. */
async function asIn(context: BrowserContext): Promise<Person> {
  const cookies = await context.cookies(product.origin);
  return Object.assign(personAt(product.origin), {
    cookie: cookies.map(({ name, value }) => `${name}=${value}`).join('; '),
  });
}

const idOf = (room: string): string => room.split('/').at(-1) ?? '';

async function stockOf(person: Person, roomId: string): Promise<{ broodId: string; daughter: string }> {
  const colony = await colonyIn(person, roomId);
  const { broodId, batchId } = await broodIn(person, roomId, colony, { opening: 30 });
  const daughter = makeId();
  await record(person, roomId, {
    kind: 'heldBack',
    batchId,
    onDay: '2026-05-10',
    keptAs: 'holdback',
    tankId: null,
    colonyId: null,
    note: null,
    fish: [{ id: daughter, code: 'MOKA-H1', sex: 'female' }],
  });
  return { broodId, daughter };
}

async function serious(page: Page): Promise<string[]> {
  const { violations } = await new AxeBuilder({ page }).setLegacyMode().analyze();
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) => nodes.slice(0, 3).map(({ html }) => `${id}: ${html.slice(0, 160)}`));
}

/** The token of a sheet's check page, out of its own page. */
async function tokenOn(page: Page): Promise<string> {
  const href = await page.getByRole('link', { name: 'Its check page, for the buyer' }).getAttribute('href');
  return /sheet\/([\w-]{22})/.exec(href ?? '')?.[1] ?? '';
}

async function chooseFile(page: Page, text: string): Promise<void> {
  const choosing = page.waitForEvent('filechooser');
  await press(page, 'Choose the file');
  const file = { name: 'sheet.kinwater.json', mimeType: 'application/json', buffer: Buffer.from(text) };
  await (await choosing).setFiles([file]);
}

/** The file with the code of its fish written over. */
function tampered(text: string): string {
  const file: { jws: string } = JSON.parse(text);
  const [head = '', body = '', signature = ''] = file.jws.split('.');
  const told = Buffer.from(body, 'base64url').toString('utf8').replaceAll('MOKA-H1', 'MOKA-H9');
  return JSON.stringify({ ...file, jws: [head, Buffer.from(told).toString('base64url'), signature].join('.') });
}

test('a sheet is issued, printed, checked, replaced, taken in by another fishroom, and withdrawn', async () => {
  const seller = await visitorAt(browser, WIDE);
  const buyer = await visitorAt(browser, PHONE, 'dark');
  onTestFailed(() => seen(buyer.page));
  const [larkmoor, fennel] = await Promise.all([
    signUp(seller.page, seller.context, product, {
      name: 'Ines Hallworth',
      email: 'ines@mail.example',
      room: 'Larkmoor',
    }),
    signUp(buyer.page, buyer.context, product, { name: 'Tove Brask', email: 'tove@mail.example', room: 'Fennel Yard' }),
  ]);
  const { broodId, daughter } = await stockOf(await asIn(seller.context), idOf(larkmoor));
  const tove = await asIn(buyer.context);
  await tankIn(tove, idOf(fennel), 'Q1', 100);

  // Issued and printed.
  await seller.page.goto(`${larkmoor}/sheets/new?brood=${broodId}`);
  await field(seller.page, 'For how many fish').fill('3');
  await save(seller.page, 'Issue and sign');
  await heading(seller.page, /^\d{4}-0001$/).waitFor();
  const sheetId = seller.page.url().split('/').at(-1);
  const address = `${product.origin}/api/rooms/${idOf(larkmoor)}/sheets/${sheetId}/pdf/a4`;
  const pdf = await readPdf(await (await seller.context.request.get(address)).body());
  const said = pdf
    .flatMap(({ lines }) => lines.map(({ text }) => text))
    .join(' ')
    .replace(/\s+/g, ' ');
  for (const words of ['Fish 3, not sexed, of brood MOKA-26A', 'Tropheus moorii', 'Generation F1', 'sire, 75 %'])
    expect(said).toContain(words);
  const first = await tokenOn(seller.page);

  // Checked by the buyer, in the buyer's browser.
  await buyer.page.goto(`${product.origin}/sheet/${first}`);
  await buyer.page.getByText('Valid', { exact: true }).waitFor();
  await buyer.page.getByText('Signed by Larkmoor,', { exact: false }).waitFor();

  // Replaced: the old page says so and leads on.
  await press(seller.page, 'More');
  await seller.page.getByRole('menuitem', { name: 'Replace it' }).click();
  await field(seller.page, 'Why is it replaced').fill('The count was wrong');
  await field(seller.page, 'For how many fish').fill('2');
  await save(seller.page, 'Issue and sign');
  await heading(seller.page, /^\d{4}-0002$/).waitFor();
  const second = await tokenOn(seller.page);
  await buyer.page.reload();
  await buyer.page.getByText(/^Replaced on /).waitFor();
  await buyer.page.getByRole('link', { name: /^See \d{4}-0002$/ }).click();
  await buyer.page.getByText('Valid', { exact: true }).waitFor();

  // Taken in, by way of the check page.
  await buyer.page.getByRole('link', { name: 'Take it into Fennel Yard' }).click();
  await buyer.page.getByText('3 ancestors, new here.').waitFor();
  expect(await serious(buyer.page)).toEqual([]);
  await choose(buyer.page, 'Into which tank', 'Q1');
  await save(buyer.page, 'Take in 2 fish');
  await buyer.page.getByRole('heading', { name: 'Fish that came with it' }).waitFor();
  expect(await serious(buyer.page)).toEqual([]);

  // Her sister comes by the file.
  await seller.page.goto(`${larkmoor}/sheets/new?fish=${daughter}`);
  await save(seller.page, 'Issue and sign');
  await heading(seller.page, /^\d{4}-0003$/).waitFor();
  const saving = seller.page.waitForEvent('download');
  await press(seller.page, 'File');
  const file = await readFile(await (await saving).path(), 'utf8');
  const third = await tokenOn(seller.page);

  // Altered on the way, it is refused with the reason: on the page that checks files, and where sheets are taken in.
  await buyer.page.goto(`${product.origin}/sheet`);
  await chooseFile(buyer.page, tampered(file));
  await buyer.page.getByText('This is not what the fishroom signed. Ask the seller for the sheet again.').waitFor();
  await buyer.page.goto(`${fennel}/sheets/import`);
  expect(await serious(buyer.page)).toEqual([]);
  await chooseFile(buyer.page, tampered(file));
  await buyer.page.getByRole('heading', { name: 'This sheet is not taken in' }).waitFor();
  await buyer.page.getByText('Altered. This is not what the fishroom signed.', { exact: false }).waitFor();

  await press(buyer.page, 'Choose another sheet');
  await chooseFile(buyer.page, file);
  await buyer.page.getByText('3 ancestors, known here already: they are not entered twice.').waitFor();
  await choose(buyer.page, 'Into which tank', 'Q1');
  await save(buyer.page, 'Take in 1 fish');
  await heading(buyer.page, 'MOKA-H1').waitFor();
  await buyer.page.getByRole('link', { name: /^2026-0003, Larkmoor|^\d{4}-0003, Larkmoor/ }).waitFor();

  // Full sibs of unrelated parents: a quarter (Falconer & Mackay, from memory), though they came by two sheets.
  const { nodes } = await tove.get(readPedigree, { params: { roomId: idOf(fennel) } });
  const { sheets } = await tove.get(listImported, { params: { roomId: idOf(fennel) } });
  const [sister = '', one = '', two = ''] = sheets.flatMap(({ fish }) => fish.map(({ id }) => id));
  const kin = kinship(nodes, [sister, one, two]);
  for (const [a, b] of [
    [sister, one],
    [sister, two],
    [one, two],
  ] as const)
    expect(kin.between(a, b)).toBeCloseTo(0.25, 12);

  // The same again, and one that was withdrawn, are refused in words.
  await buyer.page.goto(`${fennel}/sheets/import?from=${encodeURIComponent(`${product.origin}/sheet/${second}`)}`);
  await buyer.page.getByText(/was taken in on .* already\.$/).waitFor();
  await press(seller.page, 'More');
  await seller.page.getByRole('menuitem', { name: 'Withdraw it' }).click();
  await field(seller.page, 'Why').fill('The wrong fish went out');
  await press(seller.page, 'Withdraw it');
  await seller.page.getByText('Withdrawn: The wrong fish went out.', { exact: false }).waitFor();
  await buyer.page.goto(`${product.origin}/sheet/${third}`);
  await buyer.page.getByText(/^Withdrawn on /).waitFor();
  await buyer.page.getByText('The wrong fish went out').waitFor();
  // Its file still carries a good signature: the fishroom's published list says that it does not count.
  await buyer.page.goto(`${product.origin}/sheet`);
  await chooseFile(buyer.page, file);
  await buyer.page.getByText(/^Withdrawn on /).waitFor();

  await seller.page.goto(`${larkmoor}/settings/sheets`);
  await seller.page.getByText('Name whom founders came from').waitFor();
  expect(await serious(seller.page)).toEqual([]);
  for (const { violations, broken } of [seller, buyer]) expect([violations, broken]).toEqual([[], []]);
}, 150_000);
