import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { verifySheet } from '@/server/sheets';
import { readPedigree } from '@/shared/lineage/contract';
import { kinship } from '@/shared/lineage/kinship';
import {
  changeSheetSettings,
  checkSheetPage,
  issueSheet,
  listSheets,
  previewSheet,
  printCheckedSheet,
  printSheet,
  readSheet,
  readSheetSettings,
  rotateKey,
  withdrawSheet,
} from '@/shared/sheets/contract';
import { readKeySet } from '@/shared/sheets/sheetFile';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { broodIn, type Colony, colonyIn, record, TODAY } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let colony: Colony;
let brood: Awaited<ReturnType<typeof broodIn>>;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId);
  brood = await broodIn(owner, roomId, colony, { opening: 30 });
  await record(owner, roomId, {
    kind: 'lengthSampled',
    sampleId: makeId(),
    of: { thing: 'batch', id: brood.batchId },
    onDay: '2026-05-10',
    measure: 'total',
    method: 'ruler',
    note: null,
    readings: [180, 190, 200].map((lengthTenthsMm) => ({ lengthTenthsMm: lengthTenthsMm as never, weightG: null })),
  });
});
afterAll(() => app.close());

const issue = (more: object = {}) =>
  owner.get(issueSheet, {
    params: { roomId },
    body: { thing: 'brood', subjectId: brood.broodId, heads: 6, replaces: null, because: null, ...more },
  });

describe('a sheet', () => {
  test('says what was recorded: parents with their shares, F, generation, lengths, who saw what', async () => {
    const { content } = await owner.get(previewSheet, {
      params: { roomId },
      query: { thing: 'brood', id: brood.broodId },
    });
    expect(content.subject.code).toBe('MOKA-26A');
    // Wild founders: their young are F1, and strangers' young are not inbred.
    expect(content.generation).toMatchObject({ low: 1, high: 1 });
    expect(content.inbreeding).toMatchObject({ f: 0, generationsKnown: 1 });
    const self = content.ancestry.find(({ id }) => id === content.subject.id);
    if (!self || !('sire' in self) || self.sire.kind !== 'oneOf') throw new Error('One of two males is the father');
    expect(self.sire.candidates.map(({ weight }) => weight)).toEqual([0.75, 0.25]);
    expect(self.dam.kind).toBe('known');
    expect(content.growth?.samples).toEqual([{ on: '2026-05-10', n: 3, meanMm: 19, sdMm: 1 }]);
    expect(content.birth.raised).toEqual({ alive: 30, of: 30 });
    expect(content.known.map(({ what }) => what)).toContain('30 free-swimming counted.');
  });

  test('is numbered, signed, and checkable by anyone with its address', async () => {
    const row = await issue();
    expect(row).toMatchObject({ number: '2026-0001', state: 'valid', heads: 6, issuedOn: TODAY });
    const page = await app.person().get(checkSheetPage, { params: { token: row.token } });
    const keys = readKeySet({ keys: page.keys });
    const verdict = await verifySheet(page.jws, { keys: keys ?? [], at: page.keysAt });
    expect(verdict.state).toBe('valid');
    const published = await app.person().raw('GET', new URL(page.keysAt).pathname);
    expect(await published.json()).toEqual({ keys: page.keys, recalled: [] });
    const tampered = page.jws.replace(/\.(\w)/, (_all, letter: string) => `.${letter === 'A' ? 'B' : 'A'}`);
    expect((await verifySheet(tampered, { keys: keys ?? [], at: page.keysAt })).state).not.toBe('valid');
  });

  test('stays checkable when the key changes, and the next is signed by the new one', async () => {
    const before = await issue();
    await owner.get(rotateKey, { params: { roomId } });
    const after = await issue();
    for (const { token } of [before, after]) {
      const page = await app.person().get(checkSheetPage, { params: { token } });
      expect(
        (await verifySheet(page.jws, { keys: readKeySet({ keys: page.keys }) ?? [], at: page.keysAt })).state,
      ).toBe('valid');
      expect(page.keys).toHaveLength(2);
    }
  });

  test('is replaced, never edited: the old page says so and leads to the new', async () => {
    const first = await issue();
    const second = await issue({ replaces: first.id, because: 'A sire was left out' });
    const page = await app.person().get(checkSheetPage, { params: { token: first.token } });
    expect(page).toMatchObject({
      state: 'replaced',
      because: 'A sire was left out',
      replacedBy: { number: second.number, token: second.token },
    });
    const again = await owner.ask(issueSheet, {
      params: { roomId },
      body: { thing: 'brood', subjectId: brood.broodId, heads: 6, replaces: first.id, because: null },
    });
    expect([again.status, again.body.error?.fields]).toEqual([409, { replaces: 'Choose a valid sheet' }]);
  });

  test('is withdrawn with its reason by an owner; a revoked link is as if it had never been', async () => {
    const row = await issue();
    const keeper = await memberOf(app, roomId, 'keeper');
    expect(
      (
        await keeper.ask(withdrawSheet, {
          params: { roomId, sheetId: row.id },
          body: { because: 'x', revokeLink: false },
        })
      ).status,
    ).toBe(403);
    await owner.get(withdrawSheet, {
      params: { roomId, sheetId: row.id },
      body: { because: 'Wrong brood', revokeLink: false },
    });
    expect(await app.person().get(checkSheetPage, { params: { token: row.token } })).toMatchObject({
      state: 'withdrawn',
      because: 'Wrong brood',
    });
    const gone = await issue();
    await owner.get(withdrawSheet, {
      params: { roomId, sheetId: gone.id },
      body: { because: 'Wrong brood', revokeLink: true },
    });
    const answers = await Promise.all(
      [gone.token, 'A'.repeat(22)].map((token) => app.person().ask(checkSheetPage, { params: { token } })),
    );
    expect(answers.map(({ status }) => status)).toEqual([404, 404]);
    expect(answers[0]?.headers.get('x-robots-tag')).toBe('noindex');
  });

  test('is printed by the server for A4 and Letter, for members and for whoever has the address', async () => {
    const row = await issue();
    for (const paper of ['a4', 'letter']) {
      const own = await owner.ask(printSheet, { params: { roomId, sheetId: row.id, paper } });
      const anyone = await app.person().ask(printCheckedSheet, { params: { token: row.token, paper } });
      expect([own.status, anyone.status]).toEqual([200, 200]);
      expect(own.headers.get('content-type')).toBe('application/pdf');
    }
    expect((await owner.get(readSheet, { params: { roomId, sheetId: row.id } })).content.issue.number).toBe(row.number);
    const { sheets } = await owner.get(listSheets, {
      params: { roomId },
      query: { thing: 'brood', thingId: brood.broodId },
    });
    expect(sheets[0]?.number).toBe(row.number);
  });

  test('is not made for more fish than there are', async () => {
    const many = await owner.ask(issueSheet, {
      params: { roomId },
      body: { thing: 'brood', subjectId: brood.broodId, heads: 31, replaces: null, because: null },
    });
    expect([many.status, many.body.error?.fields]).toEqual([422, { heads: 'At most 30' }]);
  });
});

describe('what a sheet tells of people', () => {
  test('names whom the founders came from only where the owner lets it', async () => {
    await app.house.db
      .updateTable('strain')
      .set({ fromWhom: 'Aldous Merrow', note: 'paid far too much' })
      .where('roomId', '=', roomId)
      .execute();
    const preview = async () =>
      JSON.stringify(
        await owner.get(previewSheet, { params: { roomId }, query: { thing: 'brood', id: brood.broodId } }),
      );
    expect(await preview()).not.toContain('Aldous Merrow');
    const keeper = await memberOf(app, roomId, 'keeper');
    const refused = await keeper.ask(changeSheetSettings, { params: { roomId }, body: { showPeople: true } });
    expect(refused.status).toBe(403);
    await owner.get(changeSheetSettings, { params: { roomId }, body: { showPeople: true } });
    expect(await owner.get(readSheetSettings, { params: { roomId } })).toEqual({ showPeople: true });
    expect(await preview()).toContain('Aldous Merrow');
    await owner.get(changeSheetSettings, { params: { roomId }, body: { showPeople: false } });
    expect(await preview()).not.toContain('Aldous Merrow');
  });

  test('S37: its public page holds no address of anyone, no note and no id of an account', async () => {
    const row = await issue();
    const page = await app.person().get(checkSheetPage, { params: { token: row.token } });
    const [, body = ''] = page.jws.split('.');
    const told = `${JSON.stringify(page)} ${Buffer.from(body, 'base64url').toString('utf8')}`;
    expect(told).toContain('MOKA-26A');
    for (const secret of [owner.email, owner.id, 'paid far too much', 'passwordHash'])
      expect(told).not.toContain(secret);
  });

  test('S39: a letter of the address changed leads nowhere; the page tells of these fish and their ancestors alone', async () => {
    const row = await issue();
    // 22 letters of base64url carry 132 bits, of which 128 are random.
    expect(Buffer.from(row.token, 'base64url')).toHaveLength(16);
    const other = `${row.token.startsWith('A') ? 'B' : 'A'}${row.token.slice(1)}`;
    expect((await app.person().ask(checkSheetPage, { params: { token: other } })).status).toBe(404);
    const answer = await app.person().ask(checkSheetPage, { params: { token: row.token } });
    expect(answer.headers.get('x-robots-tag')).toBe('noindex');
    expect(answer.headers.get('referrer-policy')).toBe('no-referrer');
    const html = await app.person().raw('GET', `/sheet/${row.token}`);
    expect([html.headers.get('x-robots-tag'), html.headers.get('referrer-policy')]).toEqual(['noindex', 'no-referrer']);
    const { content } = await owner.get(readSheet, { params: { roomId, sheetId: row.id } });
    const ids = content.ancestry.map(({ id }) => id.split('/')[1]).sort();
    // The brood, its dam, and the two males; the five other females of the colony have no place on it.
    expect(ids).toEqual([brood.broodId, ...colony.males, colony.females[0] ?? ''].sort());
  });
});

describe('the pedigree', () => {
  test('gives two holdbacks of one brood the kinship of full sibs, and of their young a quarter', async () => {
    const [one, two] = [makeId(), makeId()];
    await record(owner, roomId, {
      kind: 'heldBack',
      batchId: brood.batchId,
      onDay: TODAY,
      keptAs: 'holdback',
      tankId: null,
      colonyId: null,
      note: null,
      fish: [
        { id: one, code: 'MOKA-H1', sex: 'male' },
        { id: two, code: 'MOKA-H2', sex: 'female' },
      ],
    });
    const { nodes } = await owner.get(readPedigree, { params: { roomId } });
    // One male of two sired all of a mouthful: full sibs, whichever he was. Falconer & Mackay 1996, table 4.1 (from memory).
    expect(kinship(nodes, [one, two]).between(one, two)).toBeCloseTo(0.25, 12);
    const around = await owner.get(readPedigree, { params: { roomId }, query: { around: one } });
    expect(around.nodes.map(({ id }) => id).sort()).toEqual([one, ...colony.males, colony.females[0] ?? ''].sort());
  });
});
