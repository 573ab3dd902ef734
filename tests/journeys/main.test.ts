import type { Browser, Page } from 'playwright-core';
import sharp from 'sharp';
import { afterAll, beforeAll, describe, expect, onTestFailed, test } from 'vitest';
import { openBrowser, PHONE, type Running, startProduct, visitorAt, WIDE } from '../support/browser';
import { readPdf } from '../support/readPdf';
import { choose, field, heading, press, record, save, seen, signUp, typeDay } from '../support/steps';

/*
 * From sign-up to a printed lineage sheet, with a story made up for this test: two wild males and three wild females; a
 * mouthful whose sire was seen; a brother and a sister of it held back and paired; their young raised, measured,
 * photographed. All figures on the sheet are worked out by hand here.
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

/** Fifteen lengths in mm around a mean: their mean is the number itself. */
const around = (mean: number): string =>
  [-3, -2.5, -2, -1.5, -1, -0.5, 0, 0, 0, 0.5, 1, 1.5, 2, 2.5, 3].map((off) => mean + off).join(' ');

const MONTHS = 'Jan Feb Mar Apr May Jun Jul Aug Sep Oct Nov Dec'.split(' ');

/**
 * What the sheet must say. F of the young of full sibs of unrelated founders is 1/4 (Falconer & Mackay, Introduction to
 * Quantitative Genetics, from memory); both wild grandparents known: two full generations, F2; 36 free-swimming less 2
 * dead are 34, 94 %; stripped 23 days after the spawn's day, which is day 1; the means of the last sample 35 mm.
 */
function worked(nowMs: number): string[] {
  const day = (ago: number): string => {
    const on = new Date(nowMs - ago * 86_400_000);
    return `${on.getUTCDate()} ${MONTHS[on.getUTCMonth()]} ${on.getUTCFullYear()}`;
  };
  return [
    'Tropheus moorii Chaitika, strain MOCH',
    'Fish 12, not sexed, of brood',
    'Founders wild caught',
    `Spawned ${day(200)}, 6 months old`,
    `Stripped ${day(177)}, day 24 of the hold`,
    'Generation F2',
    'Inbreeding F = 0.250',
    'Pedigree known equal to 2.0 full generations',
    'Raised 34 of 36, 94 %',
    'Photos 2 recorded',
    'F1 · sire MOCH-A01 wild, MOCH MOCH-A03 wild, MOCH',
    'F1 · dam MOCH-A01 wild, MOCH MOCH-A03 wild, MOCH',
    '3.5 cm 3 samples of 15 fish,',
  ];
}

async function addTank(page: Page, room: string, code: string, litres: string, purpose?: string): Promise<void> {
  await page.goto(`${room}/tanks/new`);
  await field(page, 'Code, as painted on the glass').fill(code);
  await field(page, 'Water in it').fill(litres);
  if (purpose) await choose(page, 'What for', purpose);
  await save(page, 'Save tank');
  await heading(page, code).waitFor();
}

async function spawnSeen(
  page: Page,
  room: string,
  colony: string,
  female: string,
  male: string,
  day: string,
): Promise<void> {
  await page.goto(`${room}/stock/colonies`);
  await page.getByRole('link', { name: new RegExp(`^${colony},`) }).click();
  await page.getByRole('link', { name: 'Spawn seen' }).click();
  await typeDay(page, 'Spawned on', day);
  await page
    .getByRole('radiogroup', { name: /female/i })
    .getByRole('radio', { name: new RegExp(female) })
    .click();
  await page
    .getByRole('radiogroup', { name: 'Which male?' })
    .getByRole('radio', { name: new RegExp(male) })
    .click();
  await record(page, 'Save hold');
}

/** From the colony's page: she who holds, then Strip. */
async function strip(
  page: Page,
  room: string,
  of: { colony: string; female: string },
  end: { fry: string; tank: string; day: string },
): Promise<void> {
  await page.goto(`${room}/stock/colonies`);
  await page.getByRole('link', { name: new RegExp(`^${of.colony},`) }).click();
  await page.getByRole('link', { name: new RegExp(`${of.female}, female, Holding`) }).click();
  await page
    .getByRole('link', { name: /^Strip/ })
    .first()
    .click();
  await field(page, 'In all, alive').fill(end.fry);
  await page.getByRole('radio', { name: 'Free-swimming' }).click();
  await choose(page, 'Into which tank', end.tank);
  await typeDay(page, 'Stripped on', end.day);
  await record(page, 'Save strip');
}

async function sample(page: Page, brood: string, day: string, mean: number): Promise<void> {
  await page.goto(brood);
  await page.getByRole('link', { name: 'Length sample' }).first().click();
  await press(page, 'Another day');
  await typeDay(page, 'Measured on', day);
  await press(page, 'How');
  await page.getByRole('menuitem', { name: 'Paste a list' }).click();
  await field(page, 'Lengths in mm').fill(around(mean));
  await press(page, 'Take 15 lengths');
  await record(page, 'Finish sample');
}

async function fromMenu(page: Page, place: string, item: string): Promise<void> {
  await page.goto(place);
  await press(page, 'More');
  await page.getByRole('menuitem', { name: item }).click();
}

/** Codes on a colony's page, males first. */
async function codesOfMembers(page: Page): Promise<string[]> {
  const rows = page.getByRole('link', { name: /, (male|female), / });
  await rows.first().waitFor();
  const names = await rows.evaluateAll((links) => links.map((link) => link.getAttribute('aria-label') ?? ''));
  return names.map((name) => name.split(',')[0] ?? '');
}

const picture = async (name: string, background: string) => ({
  name,
  mimeType: 'image/jpeg',
  buffer: await sharp({ create: { width: 640, height: 420, channels: 3, background } })
    .jpeg()
    .toBuffer(),
});

describe.each([
  ['on a phone', PHONE, 'dark'],
  ['on a wide screen', WIDE, 'light'],
] as const)('%s', (where, viewport, theme) => {
  test('from sign-up to a printed lineage sheet', async () => {
    const { page, context, violations, broken } = await visitorAt(browser, viewport, theme);
    onTestFailed(() => seen(page));
    const email = `main-${where.replaceAll(' ', '-')}@mail.example`;
    const room = await signUp(page, context, product, { name: 'Runa Ekdal', email, room: 'Ekdal Fishroom' });

    await addTank(page, room, 'T01', '450');
    await addTank(page, room, 'T02', '300');
    await addTank(page, room, 'N1', '60', 'Nursery');
    await addTank(page, room, 'N2', '60', 'Nursery');

    await page.goto(`${room}/strains/new`);
    await choose(page, 'Species', 'Tropheus moorii');
    await field(page, 'Locality').fill('Chaitika');
    await choose(page, 'Its founders', 'Wild caught');
    await save(page, 'Save strain');
    await heading(page, 'MOCH').waitFor();

    await page.goto(`${room}/colonies/new`);
    await choose(page, 'In which tank', 'T01');
    await field(page, 'Males').fill('2');
    await field(page, 'Females').fill('3');
    await typeDay(page, 'Together since', '-900');
    await save(page, 'Save colony');
    await heading(page, 'MOCH-A').waitFor();

    await spawnSeen(page, room, 'MOCH-A', '03', '01', '-800');
    await strip(page, room, { colony: 'MOCH-A', female: 'MOCH-A03' }, { fry: '20', tank: 'N1', day: '-775' });
    const first = page.url();
    await heading(page, /^MOCH-\d\d[A-Z]$/).waitFor();

    // A brother and a sister of it are kept, and paired.
    await fromMenu(page, first, 'Hold back');
    await choose(page, 'Sex', 'Male');
    await press(page, 'Another fish');
    await page.getByRole('combobox', { name: /^Sex/ }).last().click();
    await page.getByRole('dialog').last().getByRole('radio', { name: 'Female' }).click();
    await page.getByRole('radio', { name: 'Breeder' }).click();
    await choose(page, 'Into which tank', 'T02');
    await typeDay(page, 'When', '-400');
    await record(page, 'Hold back 2 fish');

    await page.goto(`${room}/colonies/new`);
    await choose(page, 'In which tank', 'T02');
    await typeDay(page, 'Together since', '-395');
    for (const box of await page.getByRole('checkbox', { name: /^MOCH-.*(male|female)/ }).all()) await box.click();
    await save(page, 'Save colony');
    await heading(page, 'MOCH-B').waitFor();

    const [brother = '', sister = ''] = await codesOfMembers(page);
    await spawnSeen(page, room, 'MOCH-B', sister, brother, '-200');
    await strip(page, room, { colony: 'MOCH-B', female: sister }, { fry: '36', tank: 'N2', day: '-177' });
    const brood = page.url();

    await page.getByRole('link', { name: 'Loss', exact: true }).click();
    await field(page, 'Heads lost').fill('2');
    await typeDay(page, 'When', '-150');
    await record(page, 'Save loss');
    await page.goto(brood);
    await page.getByRole('link', { name: 'Head count' }).first().click();
    await field(page, 'Heads seen').fill('34');
    await typeDay(page, 'When', '-140');
    await record(page, 'Save head count');

    await sample(page, brood, '-140', 20);
    await sample(page, brood, '-100', 28);
    await sample(page, brood, '-60', 35);

    await page.goto(brood);
    await page.getByRole('link', { name: 'Photo', exact: true }).first().click();
    const choosing = page.waitForEvent('filechooser');
    await press(page, 'Choose photos');
    await (await choosing).setFiles([await picture('one.jpg', '#c2913f'), await picture('two.jpg', '#6f8f4a')]);
    await save(page, 'Save 2 photos');
    await page.goto(brood);
    await expect.poll(() => page.locator('img').count()).toBeGreaterThanOrEqual(2);

    // Three samples make a forecast; four are more than needed.
    await page.getByRole('heading', { name: /Half at [\d.]+ cm (by|since) / }).waitFor();
    await page.getByText('94%', { exact: false }).first().waitFor();

    await fromMenu(page, brood, 'Hold back');
    await record(page, 'Hold back 1 fish');

    await page.goto(brood);
    await page.getByRole('link', { name: 'Lineage graph' }).click();
    await page.getByText(/F\s=\s0\.250/).waitFor();
    await page.getByText(/2\.0\sfull\sgenerations/).waitFor();

    await page.getByRole('link', { name: 'Lineage sheet' }).click();
    await field(page, 'For how many fish').fill('12');
    await save(page, 'Issue and sign');
    await heading(page, /^\d{4}-0001$/).waitFor();
    const sheetId = page.url().split('/').at(-1);
    const roomId = room.split('/').at(-1);
    const pdf = await context.request.get(`${product.origin}/api/rooms/${roomId}/sheets/${sheetId}/pdf/a4`);
    const said = (await readPdf(await pdf.body()))
      .flatMap(({ lines }) => lines.map(({ text }) => text))
      .join(' ')
      .replace(/\s+/g, ' ');
    for (const figure of worked(await page.evaluate(() => Date.now()))) expect(said).toContain(figure);

    // The paper's own address, opened by somebody who is not signed in: the signature is verified in that browser.
    const token = /sheet\/([\w-]{22})/.exec(said)?.[1] ?? '';
    const reader = await visitorAt(browser, viewport);
    await reader.page.goto(`${product.origin}/sheet/${token}`);
    await reader.page
      .getByText(/^Valid/)
      .first()
      .waitFor();
    await reader.page
      .getByText(/0\.250/)
      .first()
      .waitFor();
    expect(reader.violations).toEqual([]);
    await reader.context.close();

    expect(violations).toEqual([]);
    expect(broken).toEqual([]);
    await context.close();
  });
});
