import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { keySet, newSheetKey, openSheetKey, sheetBytes, signSheet } from '@/server/sheets/signing';
import { addColony } from '@/shared/colonies/contract';
import { listFish, readFish } from '@/shared/fish/contract';
import { readPedigree } from '@/shared/lineage/contract';
import { inbreeding } from '@/shared/lineage/inbreeding';
import { kinship } from '@/shared/lineage/kinship';
import type { PedigreeEntry } from '@/shared/lineage/pedigree';
import { animalId } from '@/shared/sheets/ancestry';
import { SheetContent } from '@/shared/sheets/content';
import {
  changeSheetSettings,
  checkSheetPage,
  issueSheet,
  listKeys,
  previewSheet,
  rotateKey,
  withdrawSheet,
} from '@/shared/sheets/contract';
import {
  importSheet,
  listImported,
  previewImport,
  readImported,
  type SheetSource,
} from '@/shared/sheets/importContract';
import { readKeySet } from '@/shared/sheets/sheetFile';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { duboisi, wild } from '../support/sheetContent';
import { broodIn, type Colony, colonyIn, record, TODAY, tankIn, tryRecord } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

/** A fishroom with an owner, and a tank to put what comes in. */
type Room = { app: TestApp; owner: Known; roomId: string; quarantine: string };

/** Breeds: one colony of wild fish, a brood by either of two males, two of its young held back. */
let larkmoor: Room & { colony: Colony; broodId: string; son: string; daughter: string };
/** Buys, on another installation. */
let fennel: Room;
/** Buys from both, on the installation of the second. */
let third: Room;
let apps: TestApp[];

async function roomIn(app: TestApp): Promise<Room> {
  const { owner, roomId } = await ownerWithRoom(app);
  return { app, owner, roomId, quarantine: await tankIn(owner, roomId, 'Q1', 100) };
}

beforeAll(async () => {
  apps = [await testApp({ innerKeys: true }), await testApp({ innerKeys: true })];
  for (const app of apps) app.house.config.origin = app.origin;
  const [one, two] = apps;
  if (!one || !two) throw new Error('Two installations');
  const room = await roomIn(one);
  const colony = await colonyIn(room.owner, room.roomId);
  const { broodId, batchId } = await broodIn(room.owner, room.roomId, colony, { opening: 30 });
  const [son, daughter] = [makeId(), makeId()];
  await record(room.owner, room.roomId, {
    kind: 'heldBack',
    batchId,
    onDay: TODAY,
    keptAs: 'holdback',
    tankId: null,
    colonyId: null,
    note: null,
    fish: [
      { id: son, code: 'MOKA-H1', sex: 'male' },
      { id: daughter, code: 'MOKA-H2', sex: 'female' },
    ],
  });
  larkmoor = { ...room, colony, broodId, son, daughter };
  fennel = await roomIn(two);
  third = await roomIn(two);
});
afterAll(() => Promise.all(apps.map((app) => app.close())));

type Subject = { thing: 'fish' | 'brood'; subjectId: string; heads?: number; replaces?: string };

async function issued({ app, owner, roomId }: Room, { heads = 1, replaces, ...subject }: Subject) {
  const row = await owner.get(issueSheet, {
    params: { roomId },
    body: { ...subject, heads, replaces: replaces ?? null, because: replaces ? 'Told better' : null },
  });
  const page = await app.person().get(checkSheetPage, { params: { token: row.token } });
  const file: SheetSource = { from: 'file', jws: page.jws, keysAt: page.keysAt, keys: null };
  return { row, page, file, address: `${app.origin}/sheet/${row.token}` };
}

const look = ({ owner, roomId }: Room, source: SheetSource) =>
  owner.get(previewImport, { params: { roomId }, body: { source } });

const draftFor = (room: Room, source: SheetSource, more: object = {}) => ({
  source,
  heads: 1,
  taken: 0,
  strainId: null,
  newStrain: null,
  code: null,
  keptAs: 'breeder',
  receivedOn: TODAY,
  tankId: room.quarantine,
  quarantineUntil: '2026-06-11',
  unchecked: false,
  ...more,
});

const takeIn = (room: Room, source: SheetSource, more: object = {}) =>
  room.owner.ask(importSheet, { params: { roomId: room.roomId }, body: draftFor(room, source, more) });

async function taken(room: Room, source: SheetSource, more: object = {}) {
  const answer = await takeIn(room, source, more);
  if (answer.status >= 300) throw new Error(JSON.stringify(answer.body));
  return answer.body;
}

const newStrain = (code = 'MOKA') => ({ newStrain: { id: makeId(), code } });

const pedigree = async ({ owner, roomId }: Room) => (await owner.get(readPedigree, { params: { roomId } })).nodes;

const kin = async (room: Room, a: string, b: string) => kinship(await pedigree(room), [a, b]).between(a, b);

describe('a sheet from another installation', () => {
  let bought: string[];

  test('is shown before anything is written: who, how many, which ancestors, how far it can be trusted', async () => {
    const { address } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 4 });
    const before = await fennel.owner.get(listFish, { params: { roomId: fennel.roomId }, query: { which: 'all' } });
    const preview = await look(fennel, { from: 'address', at: address });
    expect(preview.trust).toMatchObject({ signature: 'valid', keysFrom: 'address' });
    expect([preview.heads, preview.taken, preview.refused]).toEqual([4, 0, null]);
    // Two possible fathers and the mother, all wild and new here.
    expect(preview.animals.map(({ fate, generation, origin }) => [fate, generation, origin])).toEqual([
      ['new', 'F0', 'wild'],
      ['new', 'F0', 'wild'],
      ['new', 'F0', 'wild'],
    ]);
    expect(preview.newStrain).toEqual({ code: 'MOKA', speciesId: 'tropheus-moorii', name: 'Tropheus moorii, Kasanga' });
    const after = await fennel.owner.get(listFish, { params: { roomId: fennel.roomId }, query: { which: 'all' } });
    expect(after).toEqual(before);
  });

  test('is taken in at once: fish in quarantine with parents, ancestors without a life here', async () => {
    const { file, row } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 4 });
    const imported = await taken(fennel, file, { heads: 2, ...newStrain() });
    expect(imported).toMatchObject({ number: row.number, signature: 'valid', keysFrom: 'address', ancestors: 3 });
    bought = imported.fish.map(({ id }) => id);
    const { fish } = await fennel.owner.get(listFish, { params: { roomId: fennel.roomId }, query: { which: 'all' } });
    expect(fish.map(({ id, tank, strainCode, arrivedOn }) => [id, tank?.code, strainCode, arrivedOn])).toEqual(
      bought.map((id) => [id, 'Q1', 'MOKA', TODAY]),
    );
    const page = await fennel.owner.get(readFish, { params: { roomId: fennel.roomId, fishId: bought[0] ?? '' } });
    expect(page.lot).toMatchObject({ provenance: 'bredElsewhere' });
    const nodes = await pedigree(fennel);
    const sire = nodes.find(({ id }) => id === bought[0]);
    if (!sire || !('sire' in sire) || sire.sire.kind !== 'oneOf') throw new Error('Its father is one of two');
    // As recorded at Larkmoor: three to one. Still uncertain here, and shared by all of the brood.
    expect(sire.sire.candidates.map(({ weight }) => weight)).toEqual([0.75, 0.25]);
    expect(nodes.filter(({ living }) => living).map(({ id }) => id)).toEqual(bought);
    expect(nodes.every(({ sheet }) => sheet?.signature === 'valid')).toBe(true);
  });

  test('gives its fish the kinship that they have: full sibs a quarter, and with a possible father his share of it', async () => {
    const [one = '', two = ''] = bought;
    expect(await kin(fennel, one, two)).toBeCloseTo(0.25, 12);
    const nodes = await pedigree(fennel);
    const father = nodes.find(({ id }) => id === one);
    const candidates = father && 'sire' in father && father.sire.kind === 'oneOf' ? father.sire.candidates : [];
    // A wild father is 1/4 with his young; he is the father with probability 3/4, else unrelated: 3/16.
    expect(await kin(fennel, one, candidates[0]?.id ?? '')).toBeCloseTo(3 / 16, 12);
    expect(await kin(fennel, one, candidates[1]?.id ?? '')).toBeCloseTo(1 / 16, 12);
  });

  test('and another sheet meet in the same ancestors: a sister that came by herself is a full sib', async () => {
    const { file } = await issued(larkmoor, { thing: 'fish', subjectId: larkmoor.daughter });
    const preview = await look(fennel, file);
    expect(preview.animals.map(({ fate }) => fate)).toEqual(['same', 'same', 'same']);
    expect(preview.code).toBe('MOKA-H2');
    const { fish, ancestors } = await taken(fennel, file, { strainId: preview.strains[0], code: 'MOKA-H2' });
    expect(ancestors).toBe(0);
    const sister = fish[0]?.id ?? '';
    expect(await kin(fennel, bought[0] ?? '', sister)).toBeCloseTo(0.25, 12);
    // Young of a brother and a sister: F is their kinship, a quarter (Wright 1922).
    const nodes: PedigreeEntry[] = await pedigree(fennel);
    const fry: PedigreeEntry = {
      id: 'fry',
      sire: { kind: 'known', id: bought[0] ?? '' },
      dam: { kind: 'known', id: sister },
    };
    expect(inbreeding([...nodes, fry]).get('fry')).toBeCloseTo(0.25, 12);
  });

  test('goes on under the names that its first fishroom gave, so that a third fishroom merges what comes by two ways', async () => {
    const sister = (await fennel.owner.get(listFish, { params: { roomId: fennel.roomId }, query: {} })).fish.find(
      ({ code }) => code === 'MOKA-H2',
    );
    const { content } = await fennel.owner.get(previewSheet, {
      params: { roomId: fennel.roomId },
      query: { thing: 'fish', id: sister?.id },
    });
    expect(content.subject.id).toBe(animalId(larkmoor.roomId, larkmoor.daughter));
    expect(content.ancestry.map(({ id }) => id).sort()).toEqual(
      [larkmoor.daughter, ...larkmoor.colony.males, larkmoor.colony.females[0] ?? '']
        .map((id) => animalId(larkmoor.roomId, id))
        .sort(),
    );
    // By way of Fennel, on the same installation; then her brother, straight from Larkmoor.
    const second = await issued(fennel, { thing: 'fish', subjectId: sister?.id ?? '' });
    const first = await taken(third, second.file, { code: 'HERS', ...newStrain() });
    expect(first).toMatchObject({ keysFrom: 'here', ancestors: 3 });
    const brother = await issued(larkmoor, { thing: 'fish', subjectId: larkmoor.son });
    const preview = await look(third, brother.file);
    expect(preview.animals.map(({ fate }) => fate)).toEqual(['same', 'same', 'same']);
    const next = await taken(third, brother.file, { strainId: preview.strains[0], code: 'HIS' });
    expect(await kin(third, first.fish[0]?.id ?? '', next.fish[0]?.id ?? '')).toBeCloseTo(0.25, 12);
  });

  test('that brings our own fish back meets them: nothing of ours is told anew', async () => {
    // Fennel sells on one of the brood it bought; Larkmoor takes it in.
    const { file } = await issued(fennel, { thing: 'fish', subjectId: bought[1] ?? '' });
    const preview = await look(larkmoor, file);
    expect(preview.animals.map(({ fate }) => fate)).toEqual(['ours', 'ours', 'ours']);
    const back = await taken(larkmoor, file, { strainId: larkmoor.colony.strainId, code: 'BACK' });
    expect(back.ancestors).toBe(0);
    const id = back.fish[0]?.id ?? '';
    // Brother and sister again, one of them by way of another fishroom; and the father with his three quarters.
    expect(await kin(larkmoor, id, larkmoor.son)).toBeCloseTo(0.25, 12);
    expect(await kin(larkmoor, id, larkmoor.colony.males[0] ?? '')).toBeCloseTo(3 / 16, 12);
  });
});

test('an ancestor that lives elsewhere is no fish to record, to move or to pair here, and gets no sheet here', async () => {
  const ancestor = (await pedigree(fennel)).find(({ living }) => !living)?.id ?? '';
  const params = { roomId: fennel.roomId };
  const found = { kind: 'dominant', fishId: ancestor, onDay: TODAY, note: null };
  const finding = await tryRecord(fennel.owner, fennel.roomId, found);
  expect([finding.status, Object.keys(finding.body.error?.fields ?? {})]).toEqual([422, ['fishId']]);
  const colony = await fennel.owner.ask(addColony, {
    params,
    body: {
      id: makeId(),
      code: 'MOKA-Z',
      strainId: (await look(fennel, (await issued(larkmoor, { thing: 'fish', subjectId: larkmoor.son })).file))
        .strains[0],
      startedOn: TODAY,
      note: null,
      tankId: fennel.quarantine,
      fishIds: [ancestor],
      newFish: { males: 0, females: 0, unsexed: 0, lotId: null, coded: true },
    },
  });
  expect([colony.status, colony.body.error?.fields]).toEqual([422, { fishIds: 'Choose fish of this fishroom' }]);
  const sheet = await fennel.owner.ask(previewSheet, { params, query: { thing: 'fish', id: ancestor } });
  expect(sheet.status).toBe(409);
});

describe('the same sheet again', () => {
  test('is refused in words for a fish, and for a brood once all have come; the rest are added knowingly', async () => {
    const { file, row } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 3 });
    const strain = (await look(fennel, file)).strains[0];
    const first = await taken(fennel, file, { heads: 2, strainId: strain });
    // Sent twice by mistake: the second says that it knew of none.
    const twice = await takeIn(fennel, file, { heads: 1, strainId: strain });
    expect([twice.status, twice.body.error?.message]).toEqual([
      409,
      '2 fish of this sheet were taken in meanwhile. Look at it again.',
    ]);
    expect(await look(fennel, file)).toMatchObject({ heads: 3, taken: 2, refused: null });
    const over = await takeIn(fennel, file, { heads: 2, taken: 2, strainId: strain });
    expect(over.body.error?.fields).toEqual({ heads: 'At most 1' });
    const rest = await taken(fennel, file, { heads: 1, taken: 2, strainId: strain });
    expect([rest.id, rest.fish.length]).toEqual([first.id, 3]);
    const again = await takeIn(fennel, file, { heads: 1, taken: 3, strainId: strain });
    expect(again.status).toBe(409);
    expect(again.body.error?.message).toMatch(
      new RegExp(`^Sheet ${row.number} of .* was taken in on 14 May 2026 already`),
    );
    const { sheets } = await fennel.owner.get(listImported, { params: { roomId: fennel.roomId }, query: {} });
    expect(sheets.filter(({ number }) => number === row.number)).toHaveLength(1);
  });

  test('a sheet that replaces it brings the record up to date without a fish', async () => {
    const first = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 1 });
    const strain = (await look(third, first.file)).strains[0];
    await taken(third, first.file, { strainId: strain });
    const fishBefore = (await third.owner.get(listFish, { params: { roomId: third.roomId }, query: {} })).fish.length;
    const second = await issued(larkmoor, {
      thing: 'brood',
      subjectId: larkmoor.broodId,
      heads: 1,
      replaces: first.row.id,
    });
    expect((await look(third, first.file)).recalled).toMatchObject({ state: 'replaced' });
    const preview = await look(third, second.file);
    expect(preview.before).toMatchObject([{ number: first.row.number, heads: 1 }]);
    await taken(third, second.file, { heads: 0, tankId: null });
    expect((await third.owner.get(listFish, { params: { roomId: third.roomId }, query: {} })).fish).toHaveLength(
      fishBefore,
    );
  });

  test('a sheet of our own is refused: its fish are known', async () => {
    const { file } = await issued(larkmoor, { thing: 'fish', subjectId: larkmoor.son });
    const answer = await takeIn(larkmoor, file);
    expect([answer.status, answer.body.error?.message]).toEqual([
      409,
      'This sheet is of this fishroom: its fish are known here.',
    ]);
  });
});

describe('trust', () => {
  test('a tampered file is refused with the reason, and nothing is written', async () => {
    const { page } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 1 });
    const [head, body = '', signature] = page.jws.split('.');
    const told = JSON.parse(Buffer.from(body, 'base64url').toString('utf8'));
    const forged = Buffer.from(JSON.stringify({ ...told, subject: { ...told.subject, code: 'BETTER-1' } }));
    const source: SheetSource = {
      from: 'file',
      jws: [head, forged.toString('base64url'), signature].join('.'),
      keysAt: page.keysAt,
      keys: null,
    };
    const rows = async () =>
      (await fennel.owner.get(listImported, { params: { roomId: fennel.roomId }, query: {} })).sheets.length;
    const before = await rows();
    const looked = await fennel.owner.ask(previewImport, { params: { roomId: fennel.roomId }, body: { source } });
    const sent = await takeIn(fennel, source, newStrain('TAMP'));
    const reason = 'Altered. This is not what the fishroom signed. Ask the seller for the sheet again.';
    expect([looked.status, looked.body.error?.message]).toEqual([422, reason]);
    expect([sent.status, sent.body.error?.message]).toEqual([422, reason]);
    expect(await rows()).toBe(before);
  });

  test('a withdrawn sheet is not taken in', async () => {
    const { row, file } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 1 });
    await larkmoor.owner.get(withdrawSheet, {
      params: { roomId: larkmoor.roomId, sheetId: row.id },
      body: { because: 'Wrong brood', revokeLink: false },
    });
    const preview = await look(fennel, file);
    expect(preview.refused).toMatch(/withdrew this sheet on 14 May 2026/);
    expect((await takeIn(fennel, file, newStrain('WITH'))).status).toBe(409);
  });

  test('keys that can be pasted check it, also after they were changed; without a key it is taken in only when that is said', async () => {
    const { file, page } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 1 });
    await larkmoor.owner.get(rotateKey, { params: { roomId: larkmoor.roomId } });
    const { keys } = await larkmoor.owner.get(listKeys, { params: { roomId: larkmoor.roomId } });
    expect(keys.length).toBeGreaterThan(1);
    const unreachable = { ...file, keysAt: 'http://127.0.0.1:9/keys/none.json' };
    const unknown = await look(fennel, unreachable);
    expect(unknown.trust).toMatchObject({ signature: 'keyUnknown', keysFrom: null });
    expect(unknown.trust.why).toContain('Nothing answers there.');
    const pasted: SheetSource = { ...unreachable, keys: readKeySet({ keys: page.keys }) };
    expect((await look(fennel, pasted)).trust).toMatchObject({ signature: 'valid', keysFrom: 'pasted' });
    const strainId = unknown.strains[0];
    const unsaid = await takeIn(fennel, unreachable, { strainId });
    expect(Object.keys(unsaid.body.error?.fields ?? {})).toEqual(['unchecked']);
    const said = await taken(fennel, unreachable, { strainId, unchecked: true });
    expect(said.signature).toBe('keyUnknown');
    const { sheets } = await fennel.owner.get(listImported, {
      params: { roomId: fennel.roomId },
      query: { fishId: said.fish[0]?.id },
    });
    expect(sheets.map(({ id, signature }) => [id, signature])).toEqual([[said.id, 'keyUnknown']]);
    const page_ = await fennel.owner.get(readImported, { params: { roomId: fennel.roomId, importId: said.id } });
    expect(page_.jws).toBe(page.jws);
    const node = (await pedigree(fennel)).find(({ id }) => id === said.fish[0]?.id);
    expect(node?.sheet).toMatchObject({ id: said.id, signature: 'keyUnknown' });
  });

  test('a file that names an inner address of keys is told so', async () => {
    const strict = await testApp();
    try {
      const room = await roomIn(strict);
      const { file } = await issued(larkmoor, { thing: 'fish', subjectId: larkmoor.son });
      const { trust } = await look(room, { ...file, keysAt: 'https://169.254.169.254/keys/x.json' });
      expect(trust.signature).toBe('keyUnknown');
      expect(trust.why).toContain('It leads into a private network, and those are not asked.');
    } finally {
      await strict.close();
    }
  });
});

describe('names of animals', () => {
  const SECRET = 'a secret of some other installation';
  const R1 = '01900000-0000-7000-8000-0000000000a1';
  const R2 = '01900000-0000-7000-8000-0000000000a2';

  /** A sheet of an invented fishroom, with keys that were pasted. */
  async function invented(change: (content: SheetContent) => SheetContent): Promise<SheetSource> {
    const stored = await newSheetKey(SECRET);
    const key = await openSheetKey(stored.sealedPrivateJwk, [SECRET]);
    const content = change(duboisi);
    const signed = { ...content, fishroom: { ...content.fishroom, keyId: key.keyId } };
    return {
      from: 'file',
      jws: await signSheet(sheetBytes(signed), key),
      keysAt: null,
      keys: readKeySet(keySet([stored.publicJwk])),
    };
  }

  /** The same sheet, its every animal named by another fishroom: local ids are alike. */
  const namedBy = (roomId: string) => (content: SheetContent) =>
    SheetContent.parse(JSON.parse(JSON.stringify(content).replaceAll(content.fishroom.id, roomId)));

  test('never clash: two fishrooms with the same ids of their own have different fish', async () => {
    const room = await roomIn(fennel.app);
    const first = await taken(room, await invented(namedBy(R1)), { heads: 2, ...newStrain('DUMA') });
    const second = await invented(namedBy(R2));
    const preview = await look(room, second);
    expect(new Set(preview.animals.map(({ fate }) => fate))).toEqual(new Set(['new']));
    const next = await taken(room, second, { heads: 2, strainId: preview.strains[0] });
    expect(next.ancestors).toBe(first.ancestors);
    expect(await kin(room, first.fish[0]?.id ?? '', next.fish[0]?.id ?? '')).toBe(0);
    // The F that the sheet gives is found again here, out of its ancestors alone.
    const nodes = await pedigree(room);
    expect(inbreeding(nodes).get(next.fish[0]?.id ?? '')).toBeCloseTo(duboisi.inbreeding?.f ?? Number.NaN, 12);
  });

  test('of a possible hybrid come in without a strain, and with their ancestors all the same', async () => {
    const room = await roomIn(fennel.app);
    const kinds = ['Tropheus duboisi', 'Tropheus moorii'].map((scientific) => ({ scientific, locality: null }));
    const source = await invented((content) => ({ ...content, strain: { claim: 'possibleHybrid', kinds } }));
    expect(await look(room, source)).toMatchObject({ strains: [], newStrain: null, refused: null });
    const { fish, ancestors } = await taken(room, source);
    expect(ancestors).toBe(duboisi.ancestry.length - 1);
    const page = await room.owner.get(readFish, { params: { roomId: room.roomId, fishId: fish[0]?.id ?? '' } });
    expect([page.fish.strainId, page.lot, page.fish.tank?.code]).toEqual([null, null, 'Q1']);
  });

  test('a sheet with a thousand ancestors comes in whole; one beyond all bounds is refused as too large', async () => {
    const room = await roomIn(fennel.app);
    const more = Array.from({ length: 1000 }, (_, i) => wild(1000 + i, `W${i}`, i % 2 ? 'male' : 'female'));
    const source = await invented((content) => ({ ...content, ancestry: [...content.ancestry, ...more] }));
    const { ancestors } = await taken(room, source, newStrain('DUMA'));
    expect(ancestors).toBe(duboisi.ancestry.length - 1 + 1000);
    const over = { ...source, jws: 'a'.repeat(7_000_000) };
    const answer = await room.owner.ask(previewImport, { params: { roomId: room.roomId }, body: { source: over } });
    expect(answer.status).toBe(413);
  });

  test('two sheets that make a fish its own ancestor are not both taken in, and nothing of the second is', async () => {
    const room = await roomIn(fennel.app);
    const id = (roomId: string) => animalId(roomId, '01900000-0000-7000-8000-0000000000f1');
    const entry = (roomId: string, sire: string | null) => ({
      ...wild(1, 'X', 'male'),
      id: id(roomId),
      origin: 'bred' as const,
      generation: null,
      sire: sire ? { kind: 'known' as const, id: id(sire) } : { kind: 'unknown' as const },
    });
    const telling = (issuer: string, sire: string) =>
      invented((content) => ({
        ...content,
        fishroom: { ...content.fishroom, id: issuer },
        subject: {
          ...content.subject,
          id: id(issuer),
          kind: 'fish',
          heads: { male: 1, female: 0, unsexed: 0 },
        },
        ancestry: [entry(issuer, sire), entry(sire, null)],
      }));
    await taken(room, await telling(R1, R2), { ...newStrain('DUMA') });
    const count = async () => (await pedigree(room)).length;
    const before = await count();
    const second = await telling(R2, R1);
    const preview = await look(room, second);
    const answer = await takeIn(room, second, { strainId: preview.strains[0] });
    expect([answer.status, answer.body.error?.message]).toEqual([
      409,
      'Together with what is known here, a fish would be its own ancestor. Ask the fishrooms which sheet is right.',
    ]);
    expect(await count()).toBe(before);
  });

  test('of one fishroom are not believed from another that poses as it', async () => {
    const room = await roomIn(fennel.app);
    await taken(room, await invented(namedBy(R1)), { ...newStrain('DUMA') });
    const posing = await invented((content) => ({
      ...namedBy(R1)(content),
      issue: { ...content.issue, number: '2026-0099' },
      fishroom: { ...content.fishroom, id: R1, address: 'https://elsewhere.example' },
    }));
    expect((await look(room, posing)).refused).toBe(
      'Earlier sheets of this fishroom came from https://larkmoor.example. Ask it whether it has moved to https://elsewhere.example.',
    );
    // A fishroom of this installation is checked by its own keys, whatever keys come with the sheet.
    const asThird = await invented(namedBy(third.roomId));
    const answer = await room.owner.ask(previewImport, { params: { roomId: room.roomId }, body: { source: asThird } });
    expect(answer.status).toBe(422);
  });
});

describe('who and what', () => {
  test('helpers and viewers take no sheet in; what is missing is named', async () => {
    const { file } = await issued(larkmoor, { thing: 'brood', subjectId: larkmoor.broodId, heads: 1 });
    for (const role of ['helper', 'viewer'] as const) {
      const member = await memberOf(fennel.app, fennel.roomId, role);
      const answer = await member.ask(importSheet, {
        params: { roomId: fennel.roomId },
        body: draftFor(fennel, file),
      });
      expect(answer.status, role).toBe(403);
    }
    const missing = await takeIn(fennel, file, { tankId: null });
    expect([missing.status, missing.body.error?.fields]).toEqual([422, { tankId: 'Choose a tank' }]);
    const foreignTank = await takeIn(fennel, file, { tankId: third.quarantine, ...newStrain('FORE') });
    expect([foreignTank.status, foreignTank.body.error?.fields]).toEqual([422, { tankId: 'Choose a tank' }]);
    const tomorrow = await takeIn(fennel, file, { receivedOn: '2026-05-15' });
    expect(tomorrow.body.error?.fields).toEqual({ receivedOn: 'That day is still to come' });
    const takenCode = await takeIn(fennel, file, newStrain('MOKA'));
    expect([takenCode.status, Object.keys(takenCode.body.error?.fields ?? {})]).toEqual([409, ['newStrain.code']]);
  });

  test('names of other fishrooms go on to a buyer only where the owner lets them', async () => {
    const [fish] = (await fennel.owner.get(listFish, { params: { roomId: fennel.roomId }, query: {} })).fish;
    const rooms = async () => {
      const { content } = await fennel.owner.get(previewSheet, {
        params: { roomId: fennel.roomId },
        query: { thing: 'fish', id: fish?.id },
      });
      return content.ancestry.map(({ room }) => room);
    };
    expect(await rooms()).toEqual([null, null, null, null]);
    await fennel.owner.get(changeSheetSettings, { params: { roomId: fennel.roomId }, body: { showPeople: true } });
    expect((await rooms()).every((room) => room !== null)).toBe(true);
  });
});
