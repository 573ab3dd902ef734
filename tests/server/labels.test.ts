import { afterAll, beforeAll, expect, test } from 'vitest';
import { printLabels } from '@/shared/labels/contract';
import { typedCode } from '@/shared/labels/typedCode';
import { type Known, ownerWithRoom } from '../support/accounts';
import { readPdf } from '../support/readPdf';
import { type Colony, colonyIn, tankIn } from '../support/stock';
import { makeId, type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
let colony: Colony;
let nursery: string;

beforeAll(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  colony = await colonyIn(owner, roomId);
  nursery = await tankIn(owner, roomId, 'N1', 60);
});
afterAll(() => app.close());

type Paper = 'single' | 'a4' | 'letter';
type Query = Record<string, string>;
const pdfOf = async (paper: Paper, query: Query): Promise<Buffer> => {
  const path = `/api/rooms/${roomId}/labels/${paper}?${new URLSearchParams(query)}`;
  const answer = await owner.raw('GET', path);
  expect(answer.status).toBe(200);
  return Buffer.from(await answer.arrayBuffer());
};
test('labels come in the order asked for, tanks before colonies, each with the code to type', async () => {
  const pages = await readPdf(
    await pdfOf('single', { tanks: `${nursery},${colony.tankId}`, colonies: colony.colonyId }),
  );
  // What the squares say is read off the printed page in labelsPdf and in the journey.
  expect(
    pages.map(({ lines }) =>
      lines
        .map(({ text }) => text)
        .join(' ')
        .replace(/\s+/g, ' '),
    ),
  ).toEqual([
    `N1 60 L ${typedCode('N1', nursery)}`,
    `T-MOKA 450 L ${typedCode('T-MOKA', colony.tankId)}`,
    `MOKA-A Tropheus moorii Kasanga ${typedCode('MOKA-A', colony.colonyId)}`,
  ]);
});

test('places of a sheet that are used up stay free', async () => {
  const [page] = await readPdf(await pdfOf('a4', { tanks: nursery, skip: '3' }));
  const code = page?.lines.find(({ text }) => text === 'N1');
  // The fourth place: the right column, 92 mm from the margin of 14; the second row, below 25 + 55.5 mm.
  expect(code?.leftMm).toBeGreaterThan(14 + 92);
  expect(code?.baselineMm).toBeGreaterThan(25 + 55.5);
  expect(code?.baselineMm).toBeLessThan(25 + 55.5 + 52);
});

test('what is not of this fishroom is named beside its field, and nothing chosen is no print', async () => {
  const fieldsOf = async (query: Query) => {
    const { status, body } = await owner.ask(printLabels, { params: { roomId, paper: 'a4' }, query });
    return [status, Reflect.get(Reflect.get(Object(body), 'error'), 'fields')];
  };
  expect(await fieldsOf({ tanks: makeId() })).toEqual([422, { tanks: 'That tank is not in this fishroom' }]);
  expect(await fieldsOf({ colonies: makeId() })).toEqual([422, { colonies: 'That colony is not in this fishroom' }]);
  expect(await fieldsOf({})).toEqual([422, { tanks: 'Choose a tank or a colony' }]);
  expect(await fieldsOf({ tanks: nursery, skip: '8' })).toEqual([422, { skip: 'At most 7' }]);
  expect(await fieldsOf({ tanks: 'N1' })).toEqual([422, { tanks: 'Send ids with commas between them' }]);
});

test('a typed code ends in three signs of the id, none that looks like another', () => {
  // 0x1234 is 1_0010_0011_0100 in binary: five bits each are 4, 17 and 20, which Crockford writes 4, H and M.
  expect(typedCode('T03', '01938311-5bac-750f-9385-d87f78e11234')).toBe('T03-4HM');
  expect(typedCode('T03', '01938311-5bac-750f-9385-d87f78e1ffff')).toBe('T03-ZZZ');
});
