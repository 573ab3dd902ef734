import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { daysBetween } from '@/shared/days';
import { readToday } from '@/shared/today/contract';
import { DEFAULT_INTERVALS } from '@/shared/today/intervals';
import { type Today, todayOf } from '@/shared/today/todayOf';
import { METRIC } from '@/shared/units';
import { ownerWithRoom } from '../support/accounts';
import { broodIn, colonyIn, holdIn, TODAY, tryRecord } from '../support/stock';
import { type TestApp, testApp } from '../support/testApp';

/*
 * A small fishroom on 14 May 2026, put together by hand: a hold seen on 4 April that nobody looked at since, and one seen on
 * 2 February that should be over; a brood stripped and counted (34) on 28 April, never measured; its nursery tank, and the
 * colony's tank, whose water was tested on 10 May. What is due is worked out here from the intervals.
 */

let app: TestApp;
let today: Today;
let holdIds: { open: string; old: string };

beforeAll(async () => {
  app = await testApp();
  const { owner, roomId } = await ownerWithRoom(app);
  const colony = await colonyIn(owner, roomId, { females: 4 });
  await broodIn(owner, roomId, colony);
  const open = await holdIn(owner, roomId, colony, { holderId: colony.females[1] ?? null });
  const days = { from: '2026-02-01', until: '2026-02-02' };
  const old = await holdIn(owner, roomId, colony, { holderId: colony.females[2] ?? null, ...days });
  holdIds = { open, old };
  const asRead = {};
  const untested = { ghCaCo3MgL: null, khCaCo3MgL: null, totalAmmoniaNMgL: null, nitriteNMgL: null, nitrateNMgL: null };
  const tested = await tryRecord(owner, roomId, {
    kind: 'waterTested',
    tankId: colony.tankId,
    onDay: '2026-05-10',
    celsius: 26,
    ph: 8.4,
    ...untested,
    conductivityUs: null,
    asRead,
    note: null,
  });
  expect(tested.status, JSON.stringify(tested.body.error)).toBe(200);
  today = todayOf(await owner.get(readToday, { params: { roomId } }), METRIC);
});
afterAll(() => app.close());

test('what is due again after how many days, where the fishroom has not said otherwise (common practice, no source)', () => {
  expect(DEFAULT_INTERVALS).toEqual({
    holdCheck: 7,
    stageCheck: 2,
    headCount: { fry: 14, juvenile: 30, subadult: 60, adult: 180 },
    lengthSample: { fry: 14, juvenile: 30, subadult: 45, adult: 120 },
    waterTest: 14,
    waterChange: 7,
    reservationEnds: 2,
  });
});

const dueOf = (kind: string, code: string) => today.due.find((one) => one.kind === kind && one.code === code);

describe('what is due', () => {
  test.each([
    // Counted on 28 April, fry are counted again after 14 days: 12 May, two days ago. As many as make a sample: 15 of 34.
    ['headCount', 'MOKA-26A', '2026-05-12', 2, null],
    ['lengthSample', 'MOKA-26A', '2026-05-12', 2, 15],
    // Tested on 10 May and never since the new year: the nursery's water fourteen days after the fish came in.
    ['waterTest', 'N-MOKA-26A', '2026-05-12', 2, null],
  ])('%s of %s on %s', (kind, code, dueOn, lateDays, amount) => {
    expect(dueOf(kind, code)).toMatchObject({ dueOn, lateDays, amount });
  });

  test('water tested four days ago is not due, but comes', () => {
    expect(dueOf('waterTest', 'T-MOKA')).toBeUndefined();
    expect(today.ahead.find(({ kind, code }) => kind === 'waterTest' && code === 'T-MOKA')?.dueOn).toBe('2026-05-24');
  });

  test('a look at each female that holds, seven days after the last: the latest first', () => {
    const looks = today.due.filter(({ kind }) => kind === 'holdCheck');
    // First seen on 2 February and on 4 April: due on 9 February and on 11 April.
    expect(looks.map(({ id, dueOn }) => [id, dueOn])).toEqual([
      [holdIds.old, '2026-02-09'],
      [holdIds.open, '2026-04-11'],
    ]);
    expect(looks.map(({ lateDays }) => lateDays)).toEqual([daysBetween('2026-02-09', TODAY), 33]);
  });
});

test('a hold that should have been over for weeks stays on Today, before all others', () => {
  expect(today.holds.map(({ hold }) => hold.id)).toEqual([holdIds.old, holdIds.open]);
  const [old] = today.holds;
  expect(old?.clock?.releaseLatest ?? TODAY).toMatch(/^2026-03/);
  expect(today.due.some(({ kind, id, lateDays }) => kind === 'release' && id === holdIds.old && lateDays > 30)).toBe(
    true,
  );
});
