import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { listBroods } from '@/shared/broods/contract';
import { listFish } from '@/shared/fish/contract';
import { listTanks } from '@/shared/tanks/contract';
import { listImports, previewImport, runImport, undoImport } from '@/shared/transfer/contract';
import type { ImportKind } from '@/shared/transfer/importFields';
import { type Known, memberOf, ownerWithRoom } from '../support/accounts';
import { colonyIn, record, TODAY, tankIn } from '../support/stock';
import { type TestApp, testApp } from '../support/testApp';

let app: TestApp;
let owner: Known;
let roomId: string;
beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
});
afterEach(() => app.close());

const METRIC = { length: 'cm', temperature: 'C', volume: 'L' };
const askOf = (kind: ImportKind, lines: string[], units = METRIC, columns: unknown = null) => ({
  kind,
  fileName: `${kind}.csv`,
  text: lines.join('\n'),
  columns,
  units,
});
const bring = (ask: unknown) => owner.ask(runImport, { params: { roomId }, body: ask });
const look = (ask: unknown) => owner.get(previewImport, { params: { roomId }, body: ask });

/** A breeder's usual sheet: a line a brood, what was counted at the end of each month beside it. */
const SHEET = [
  'Brood;Strain;Tank;Released;Mother;Fry;Jan 2026;Feb 2026;2026-03;Remarks',
  'M-26A;MOKA;T-MOKA;14.1.2026;MOKA-A03;34;31;30;28;first of the year',
  'M-26B;MOKA;T-MOKA;2 Feb 2026;;20;;18;18;',
];

describe('a breeder’s sheet of broods', () => {
  beforeEach(async () => {
    await colonyIn(owner, roomId);
  });

  test('is read by its header words, its months as head counts', async () => {
    const read = await look(askOf('broods', SHEET));
    expect(read).toMatchObject({
      rows: 2,
      bad: [],
      badRows: 0,
      missing: [],
      counts: ['Jan 2026', 'Feb 2026', '2026-03'],
    });
    expect(read.columns).toMatchObject({
      code: 'Brood',
      day: 'Released',
      female: 'Mother',
      heads: 'Fry',
      note: 'Remarks',
    });
    expect((await owner.get(listBroods, { params: { roomId } })).broods).toEqual([]);
  });

  test('comes in whole: broods, mothers, and the heads of the last count', async () => {
    expect((await bring(askOf('broods', SHEET))).status).toBe(200);
    const { broods } = await owner.get(listBroods, { params: { roomId } });
    const heads = new Map(broods.map((brood) => [brood.code, brood.heads]));
    expect(heads).toEqual(
      new Map([
        ['M-26A', 28],
        ['M-26B', 18],
      ]),
    );
  });

  test('with bad lines is named line by line and value by value, and nothing of it comes in', async () => {
    const ask = askOf('broods', [
      SHEET[0] ?? '',
      'M-26A;MOKA;T-MOKA;14.1.2026;MOKA-A03;34;31;30;28;',
      'M-26B;NOPE;T-MOKA;2.2.2026;;20;;18;18;',
      'M-26C;MOKA;T-MOKA;3/4/2026;;20;;18;18;',
      'M-26D;MOKA;T-MOKA;2.2.2026;;20;;many;18;',
      'M-26A;MOKA;T-MOKA;2.2.2026;;20;;;;',
    ]);
    const { bad, badRows } = await look(ask);
    expect(badRows).toBe(4);
    expect(bad.map(({ row, column, value }) => [row, column, value])).toEqual([
      [3, 'Strain', 'NOPE'],
      [4, 'Released', '3/4/2026'],
      [5, 'Feb 2026', 'many'],
      [6, 'Brood', 'M-26A'],
    ]);
    expect(bad[0]?.why).toBe('There is no strain NOPE here yet');
    const { status, body } = await bring(ask);
    expect(status).toBe(422);
    expect(body.error?.message).toBe('4 lines need another look. Nothing was brought in.');
    expect((await owner.get(listBroods, { params: { roomId } })).broods).toEqual([]);
  });

  test('is taken back as a whole, and can come in again', async () => {
    const { body } = await bring(askOf('broods', SHEET));
    app.later({ days: 3 });
    const params = { roomId, importId: body.id };
    expect((await owner.get(undoImport, { params })).undoneAt).not.toBeNull();
    expect((await owner.get(listBroods, { params: { roomId } })).broods).toEqual([]);
    expect((await bring(askOf('broods', SHEET))).status).toBe(200);
    expect((await owner.get(listImports, { params: { roomId } })).imports).toHaveLength(2);
  });
});

describe('units, and what is remembered', () => {
  test('gallons and Fahrenheit come in as litres and Celsius', async () => {
    const units = { ...METRIC, temperature: 'F', volume: 'usGal' };
    expect((await bring(askOf('tanks', ['Tank,Gallons,Temp', 'A1,55,78.8'], units))).status).toBe(200);
    const { tanks } = await owner.get(listTanks, { params: { roomId } });
    // 55 US gallons of 3.785411784 L are 208.2 L; 78.8 °F are 26 °C.
    expect(tanks).toMatchObject([{ code: 'A1', litres: 208.2, heaterC: 26 }]);
  });

  test('columns that were chosen by hand are proposed for the next file', async () => {
    const ask = askOf('tanks', ['Bezeichnung,Inhalt', 'A1,200']);
    expect((await look(ask)).missing).toEqual(['code', 'litres']);
    const columns = { code: 'Bezeichnung', litres: 'Inhalt' };
    expect((await bring({ ...ask, columns })).status).toBe(200);
    expect(await look(askOf('tanks', ['Inhalt,Bezeichnung', '90,A2']))).toMatchObject({ columns, missing: [] });
  });
});

describe('taking back', () => {
  test('is refused once something was built on it', async () => {
    const { body } = await bring(askOf('tanks', ['Tank,Litres', 'A1,200']));
    const [tank] = (await owner.get(listTanks, { params: { roomId } })).tanks;
    await record(owner, roomId, { kind: 'seenWell', tankId: tank?.id ?? '', onDay: TODAY, note: null });
    const refused = await owner.ask(undoImport, { params: { roomId, importId: body.id } });
    expect(refused.status).toBe(409);
    expect((await owner.get(listTanks, { params: { roomId } })).tanks).toHaveLength(1);
  });

  test('takes fish, colonies, holds, counts and samples along', async () => {
    await colonyIn(owner, roomId);
    await tankIn(owner, roomId, 'T-2');
    const before = (await owner.get(listFish, { params: { roomId } })).fish.length;
    const files: [ImportKind, string[]][] = [
      ['colonies', ['Colony,Strain,Tank,Started', 'MOKA-Z,MOKA,T-2,2026-02-01']],
      ['fish', ['Fish,Strain,Sex,Colony,Arrived', 'X-1,MOKA,f,MOKA-Z,2026-02-01', 'X-2,MOKA,m,,2026-02-01']],
      ['holds', ['Tank,Female,Seen,Ended,Outcome', 'T-2,X-1,2026-03-01,2026-03-09,swallowed']],
      ['broods', ['Brood,Strain,Tank,Date,Fry', 'X-26A,MOKA,T-2,2026-04-01,12']],
      ['counts', ['Brood,Date,Heads', 'X-26A,2026-04-20,11']],
      ['samples', ['Brood,Date,Lengths (cm)', 'X-26A,2026-04-20,"1.1 1,2 1.3"']],
    ];
    const ids: string[] = [];
    for (const [kind, lines] of files) {
      const { status, body } = await bring(askOf(kind, lines));
      expect(`${kind} ${status} ${JSON.stringify(body.error?.fields)}`).toBe(`${kind} 200 undefined`);
      ids.push(body.id);
    }
    expect((await owner.get(listFish, { params: { roomId } })).fish).toHaveLength(before + 2);
    for (const importId of ids.reverse()) {
      const undone = await owner.ask(undoImport, { params: { roomId, importId } });
      expect(undone.status, JSON.stringify(undone.body)).toBe(200);
    }
    expect((await owner.get(listFish, { params: { roomId } })).fish).toHaveLength(before);
  });

  test('and bringing in are for owners alone', async () => {
    const keeper = await memberOf(app, roomId, 'keeper');
    const asked = await keeper.ask(runImport, { params: { roomId }, body: askOf('tanks', ['Tank,Litres', 'A1,200']) });
    expect(asked.status).toBe(403);
  });
});
