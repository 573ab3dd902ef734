import ICAL from 'ical.js';
import { beforeEach, describe, expect, test } from 'vitest';
import { writeDailyLetters } from '@/server/today';
import { hourOf } from '@/shared/days';
import { addOrder, agreeTime } from '@/shared/orders/contract';
import { addTask, decideTask, endCalendar, newCalendar, readMyDay, setDailyLetter } from '@/shared/today/contract';
import { type Known, lettersTo, memberOf, ownerWithRoom } from '../support/accounts';
import { buyerIn, draftOf, lineOf, offered } from '../support/sales';
import { broodIn, colonyIn, TODAY, tryRecord } from '../support/stock';
import { makeId, type Person, type TestApp, testApp } from '../support/testApp';

const TITLE = 'Reseal the glass; rack B, left: "mind the ö", and lift out the second shelf before the silicone is cut';

let app: TestApp;
let owner: Known;
let helper: Known;
let roomId: string;

/** On Thursday 14 May 2026, 11:12 in Oslo: a hold of 20 April at 27 °C, a brood counted on 28 April, an order, a task. */
beforeEach(async () => {
  app = await testApp();
  ({ owner, roomId } = await ownerWithRoom(app));
  helper = await memberOf(app, roomId, 'helper');
  return () => app.close();
});

async function fill() {
  const colony = await colonyIn(owner, roomId);
  const unread = { ph: null, ghCaCo3MgL: null, khCaCo3MgL: null, totalAmmoniaNMgL: null, nitriteNMgL: null };
  const tested = await tryRecord(owner, roomId, {
    kind: 'waterTested',
    tankId: colony.tankId,
    onDay: '2026-04-20',
    celsius: 27,
    ...unread,
    nitrateNMgL: null,
    conductivityUs: null,
    asRead: {},
    note: null,
  });
  expect(tested.status).toBe(200);
  const begun = await tryRecord(owner, roomId, {
    kind: 'holdingSeen',
    holdId: makeId(),
    tankId: colony.tankId,
    colonyId: colony.colonyId,
    holderId: colony.females[1],
    plan: 'strip',
    note: null,
    firstSeenOn: '2026-04-20',
    spawnEarliest: '2026-04-20',
    spawnLatest: '2026-04-20',
    parentage: { paternity: 'single', basis: null, sires: [{ fishId: colony.males[0], weight: 1 }], dams: [] },
  });
  expect(begun.status).toBe(200);
  const { broodId } = await broodIn(owner, roomId, colony);
  await offered(app, roomId, broodId);
  const buyer = await buyerIn(app, roomId, 'Wanda Prest');
  const order = await owner.get(addOrder, { params: { roomId }, body: draftOf(buyer.id, [lineOf(broodId, 2)]) });
  const at = { params: { roomId, orderId: order.id } };
  await owner.get(agreeTime, { ...at, body: { version: order.version, time: '2026-05-15T16:30' } });
  await add({ title: TITLE, dueOn: '2026-05-30', assignedTo: helper.id });
}

const add = (facts: object) => {
  const rest = { dueOn: TODAY, everyDays: null, onWeekday: null, assignedTo: null, about: null };
  return owner.get(addTask, { params: { roomId }, body: { id: makeId(), ...rest, ...facts } });
};

describe('the calendar feed', () => {
  const urlOf = async (person: Person) => {
    const { calendarUrl } = await person.get(newCalendar, { params: { roomId } });
    return new URL(calendarUrl ?? 'none:');
  };
  /** As a phone asks: without a session. */
  const fetched = (url: URL) => app.person().raw('GET', url.pathname);
  const eventsOf = (text: string) => {
    const events = new ICAL.Component(ICAL.parse(text)).getAllSubcomponents('vevent').map((one) => new ICAL.Event(one));
    return events.map((event) => ({
      summary: event.summary,
      description: event.description,
      uid: event.uid,
      from: event.startDate.toString(),
      // The end of an all-day event is the day after its last (RFC 5545, 3.6.1).
      to: event.endDate.toString(),
      isDate: event.startDate.isDate,
    }));
  };

  test('is read by a calendar, with the days worked out by hand', async () => {
    await fill();
    const answer = await fetched(await urlOf(owner));
    expect(answer.headers.get('content-type')).toBe('text/calendar; charset=utf-8');
    const events = eventsOf(await answer.text());
    const of = (summary: string) => events.filter((one) => one.summary === summary).map(({ from, to }) => [from, to]);
    // Strip window: days 21 to 28 of the hold, 20 and 27 days after 20 April. Release 28 days after.
    expect(of('Strip window, MOKA-A04')).toEqual([['2026-05-10', '2026-05-18']]);
    expect(of('Release expected, MOKA-A04')).toEqual([['2026-05-18', '2026-05-19']]);
    // Looked at on 20 April, every 7 days.
    expect(of('Check, MOKA-A04')).toEqual([['2026-04-27', '2026-04-28']]);
    // Counted on 28 April, fry every 14 days.
    expect(of('Head count, MOKA-26A')).toEqual([['2026-05-12', '2026-05-13']]);
    // Tested on 20 April, every 14 days.
    expect(of('Water test, T-MOKA')).toEqual([['2026-05-04', '2026-05-05']]);
    expect(of('Collection, 1001')).toEqual([['2026-05-15', '2026-05-16']]);
    expect(of(TITLE)).toEqual([['2026-05-30', '2026-05-31']]);
    expect(events.every(({ isDate }) => isDate)).toBe(true);
    expect(events.find(({ summary }) => summary === TITLE)?.description).toBe(`For ${helper.name}.`);
  });

  test('keeps to the form of RFC 5545: lines of at most 75 octets, ended by CRLF, each event with UID and DTSTAMP', async () => {
    await fill();
    const text = await (await fetched(await urlOf(owner))).text();
    expect(text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    for (const line of text.split('\r\n')) expect(Buffer.byteLength(line), line).toBeLessThanOrEqual(75);
    const events = text.split('BEGIN:VEVENT').slice(1);
    for (const event of events) {
      expect(event.match(/\r\nUID:/g)).toHaveLength(1);
      expect(event).toMatch(/\r\nDTSTAMP:20260514T091200Z\r\n/);
      expect(event).toMatch(/\r\nDTSTART;VALUE=DATE:\d{8}\r\n/);
    }
    const uids = eventsOf(text).map(({ uid }) => uid);
    expect(new Set(uids).size).toBe(uids.length);
  });

  test('names each event for good: the next day the same, moved when it is put off', async () => {
    const { id } = await add({ title: 'Move the heater' });
    const url = await urlOf(owner);
    const event = async () => eventsOf(await (await fetched(url)).text());
    const [before] = await event();
    app.later({ days: 1 });
    expect(await event()).toEqual([before]);
    const body = { decision: 'snooze', until: '2026-05-20', because: null, assignedTo: null };
    await owner.get(decideTask, { params: { roomId, taskKey: `own:${id}` }, body });
    expect(await event()).toMatchObject([{ uid: before?.uid, from: '2026-05-20' }]);
  });

  test('tells no money and no buyer, and a helper nothing of orders', async () => {
    await fill();
    const ofOwner = await (await fetched(await urlOf(owner))).text();
    const ofHelper = await (await fetched(await urlOf(helper))).text();
    for (const text of [ofOwner, ofHelper])
      expect(text).not.toMatch(/Wanda|Weir Lane|pond\.example|1234567|15[.,]00|€|EUR/);
    expect(ofOwner).toContain('Collection');
    expect(ofHelper).toContain('Head count');
    expect(ofHelper).not.toMatch(/Collection|Reservation|buyer|1001/);
  });

  test('has an address that is no one’s to guess, that a new one ends, and that ends with the membership', async () => {
    const first = await urlOf(helper);
    expect(first.pathname).toMatch(/^\/calendar\/[\w-]{43}\.ics$/);
    const { calendarHash } = await app.house.db
      .selectFrom('member')
      .where('accountId', '=', helper.id)
      .select('calendarHash')
      .executeTakeFirstOrThrow();
    expect(first.pathname).not.toContain(calendarHash ?? 'none');
    const second = await urlOf(helper);
    expect((await helper.get(readMyDay, { params: { roomId } })).calendarUrl).toBe(second.href);
    expect([(await fetched(first)).status, (await fetched(second)).status]).toEqual([404, 200]);
    await app.house.db.deleteFrom('member').where('roomId', '=', roomId).where('accountId', '=', helper.id).execute();
    expect((await fetched(second)).status).toBe(404);
    const own = await urlOf(owner);
    await owner.get(endCalendar, { params: { roomId } });
    expect((await fetched(own)).status).toBe(404);
    for (const odd of ['x.ics', `${'a'.repeat(43)}.ics`, 'a'.repeat(43)])
      expect((await app.person().raw('GET', `/calendar/${odd}`)).status).toBe(404);
  });
});

describe('the daily letter', () => {
  const at = (hour: number | null, person: Person = owner) =>
    person.get(setDailyLetter, { params: { roomId }, body: { hour } });
  const letters = async (person: Known) =>
    (await lettersTo(app, person.email)).filter(({ subject }) => /due/.test(subject));

  test('comes once a day at the hour of the fishroom’s clock, in words and as a page', async () => {
    await fill();
    // It is 11:12 in Oslo: twelve has not come.
    await at(12);
    expect(await writeDailyLetters(app.house)).toBe(0);
    app.later({ minutes: 47 });
    expect(await writeDailyLetters(app.house)).toBe(0);
    app.later({ minutes: 2 });
    expect(await writeDailyLetters(app.house)).toBe(1);
    expect(await writeDailyLetters(app.house)).toBe(0);
    const [letter] = await letters(owner);
    expect(letter?.subject).toMatch(/^Back Room, Thu 14 May: \d+ due$/);
    expect(letter?.text).toContain('Head count, MOKA-26A: 34 heads, last 28 Apr, N-MOKA-26A. 2 days late.');
    expect(letter?.text).toContain('Strip window, MOKA-A04: T-MOKA, 10 May to 17 May.');
    expect(letter?.text).toContain(`${app.house.config.origin}/r/${roomId}/settings/daily`);
    expect(letter?.html).toContain('34 heads, last 28 Apr, N-MOKA-26A. 2 days late.');
    expect(letter?.headers['list-unsubscribe']).toContain('/settings/daily');
    app.later({ days: 1 });
    expect(await writeDailyLetters(app.house)).toBe(1);
    expect(await letters(owner)).toHaveLength(2);
  });

  test('comes not at all when nothing is due, and is caught up on when the server was down at its hour', async () => {
    await at(12);
    app.later({ minutes: 60 });
    expect(await writeDailyLetters(app.house)).toBe(0);
    await add({ title: 'Too late for today’s letter' });
    expect(await writeDailyLetters(app.house)).toBe(0);
    app.later({ days: 1, minutes: 300 });
    expect(await writeDailyLetters(app.house)).toBe(1);
    expect((await letters(owner))[0]?.subject).toBe('Back Room, Fri 15 May: 1 due');
  });

  test('begins tomorrow when its hour has passed, and ends when it is called off', async () => {
    await add({ title: 'Rinse' });
    await at(7);
    expect(await writeDailyLetters(app.house)).toBe(0);
    app.later({ days: 1 });
    expect(await writeDailyLetters(app.house)).toBe(1);
    await at(null);
    app.later({ days: 1 });
    expect(await writeDailyLetters(app.house)).toBe(0);
  });

  test('tells a helper of their own tasks first, and nothing of orders', async () => {
    await fill();
    await add({ title: 'Clean the shells', assignedTo: helper.id });
    await at(12, helper);
    app.later({ minutes: 60 });
    await writeDailyLetters(app.house);
    const [letter] = await letters(helper);
    expect(letter?.text).toMatch(/given to you\.\s+Clean the shells: Due today\. Yours\./);
    expect(`${letter?.text}${letter?.html}`).not.toMatch(/Wanda|1001|Collection|€/);
  });

  test('an hour that is none is refused, and a stranger’s letter is not theirs to set', async () => {
    for (const hour of [24, -1, 7.5, '7']) {
      const { status, body } = await owner.ask(setDailyLetter, { params: { roomId }, body: { hour } });
      expect([status, Object.keys(body.error?.fields ?? {})]).toEqual([422, ['hour']]);
    }
    const stranger = (await ownerWithRoom(app)).owner;
    expect((await stranger.ask(setDailyLetter, { params: { roomId }, body: { hour: 7 } })).status).toBe(404);
  });
});

// Oslo is two hours before Greenwich in summer, one in winter; Adelaide nine and a half hours ahead of it in May.
test.each([
  ['2026-05-14T09:12:00Z', 'Europe/Oslo', 11],
  ['2026-12-01T23:30:00Z', 'Europe/Oslo', 0],
  ['2026-05-14T09:12:00Z', 'Australia/Adelaide', 18],
])('%s in %s is %i o’clock', (instant, zone, hour) => {
  expect(hourOf(Date.parse(instant), zone)).toBe(hour);
});
