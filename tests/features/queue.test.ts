import { describe, expect, test } from 'vitest';
import { Unreachable } from '@/features/call';
import { followersOf, heldBy, renamed } from '@/features/queue/following';
import { openQueue } from '@/features/queue/queue';
import type { Line } from '@/features/queue/send';
import type { WaitingStore } from '@/features/queue/store';
import { type NewWaiting, type Waiting, waitingOf } from '@/features/queue/waiting';
import type { EntryLine } from '@/shared/record/contract';
import type { EntryContent } from '@/shared/record/kinds';
import { Refusal } from '@/shared/refusal';
import { makeId } from '../support/testApp';

const ME = makeId();
const TANK = makeId();

/** A store that behaves like the browser's: it outlives every queue opened on it, and copies what it is given. */
function listStore(): WaitingStore & { rows: Map<number, Waiting> } {
  const rows = new Map<number, Waiting>();
  let last = 0;
  return {
    rows,
    all: async (accountId) =>
      [...rows.values()]
        .filter((row) => row.accountId === accountId)
        .sort((a, b) => a.place - b.place)
        .map((row) => structuredClone(row)),
    add: async (entry) => {
      last += 1;
      rows.set(last, structuredClone({ ...entry, place: last }));
      return last;
    },
    put: async (entry) => void rows.set(entry.place, structuredClone(entry)),
    remove: async (place) => void rows.delete(place),
    clear: async (accountId) => {
      for (const [place, row] of rows) if (row.accountId === accountId) rows.delete(place);
    },
  };
}

const lineOf = ({ id, content }: Waiting): EntryLine => ({
  id,
  kind: content.kind,
  onDay: '2026-05-14',
  madeAt: '',
  receivedAt: '',
  by: { id: ME, name: 'Me' },
  said: content.kind,
  about: [],
  made: {},
  undone: null,
  undoUntil: '',
});

type FakeServer = {
  stored: Waiting[];
  signal: boolean;
  losesAnswers: boolean;
  who: string;
  refuse: Map<string, Refusal>;
  line: Line;
};

/** A server that can be cut off, lose its answer, or say no; it keeps what it stored, in order. */
function fakeServer(): FakeServer {
  const stored: Waiting[] = [];
  const server: FakeServer = {
    stored,
    signal: true,
    losesAnswers: false,
    who: ME,
    refuse: new Map<string, Refusal>(),
    line: {
      send: async (entry) => {
        if (!server.signal) throw new Unreachable('No signal');
        const refusal = server.refuse.get(entry.id);
        if (refusal) throw refusal;
        if (!stored.some(({ id }) => id === entry.id)) stored.push(entry);
        if (server.losesAnswers) throw new Unreachable('No answer');
        return lineOf(entry);
      },
      takeBack: async ({ id }) => {
        if (!server.signal) throw new Unreachable('No signal');
        const at = stored.findIndex((entry) => entry.id === id);
        if (at >= 0) stored.splice(at, 1);
      },
      isIn: async (accountId) => {
        if (!server.signal) throw new Unreachable('No signal');
        return accountId === server.who;
      },
    },
  };
  return server;
}

const change = (percent: number): EntryContent => ({
  kind: 'waterChanged',
  tankId: TANK,
  onDay: '2026-05-14',
  // A brand: a share of the tank is a percentage.
  percent: percent as Extract<EntryContent, { kind: 'waterChanged' }>['percent'],
  note: null,
});

const holdOf = (holdId: string): EntryContent => ({
  kind: 'spawnSeen',
  holdId,
  onDay: '2026-05-14',
  tankId: TANK,
  colonyId: null,
  holderId: null,
  plan: 'strip',
  note: null,
  parentage: { paternity: 'single', sires: [], dams: [], basis: null },
});

const checkOf = (holdId: string): EntryContent => ({
  kind: 'holdCheck',
  holdId,
  onDay: '2026-05-14',
  seen: 'holding',
  note: null,
});

const made = (content: EntryContent, id = makeId()): NewWaiting => ({
  id,
  accountId: ME,
  roomId: makeId(),
  madeAt: '2026-05-14T09:12:00.000Z',
  dependsOn: [],
  content,
});

async function queueOn(store: WaitingStore, server: FakeServer, who: string | null = ME) {
  const queue = openQueue({ store, line: server.line });
  await queue.open(who);
  await queue.drain();
  return queue;
}

const conflict = new Refusal('conflict', 'She is recorded as holding already');

describe('without a signal', () => {
  test('records wait, and go up in the order of making, each once', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const queue = await queueOn(store, server);
    const records = [10, 20, 30].map((percent) => made(change(percent)));
    for (const record of records) {
      await queue.add(record);
      expect(await queue.outcomeOf(record.id, 1000)).toEqual({ is: 'waiting' });
    }
    expect(queue.state().noSignal).toBe(true);
    server.signal = true;
    await queue.drain();
    expect(server.stored.map(({ id }) => id)).toEqual(records.map(({ id }) => id));
    expect(queue.state().entries).toEqual([]);
    await queue.drain();
    expect(server.stored).toHaveLength(3);
  });

  test('a browser that was closed and opened again still has them, pictures byte for byte', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const bytes = new Uint8Array([255, 216, 7, 0, 255, 217]).buffer;
    const before = await queueOn(store, server);
    await before.add({ ...made(change(30)), picture: { name: 'female.jpg', type: 'image/jpeg', bytes } });
    server.signal = true;
    const after = await queueOn(store, server);
    expect(after.state().entries).toEqual([]);
    expect(server.stored.map(({ picture }) => picture && [...new Uint8Array(picture.bytes)])).toEqual([
      [255, 216, 7, 0, 255, 217],
    ]);
  });

  test('a record whose answer got lost is sent again and stored once', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const queue = await queueOn(store, server);
    server.losesAnswers = true;
    const record = made(change(30));
    await queue.add(record);
    await queue.outcomeOf(record.id, 1000);
    expect(queue.state().entries.map(({ tries }) => tries)).toEqual([1]);
    server.losesAnswers = false;
    await queue.drain();
    expect(server.stored).toHaveLength(1);
    expect(queue.state().entries).toEqual([]);
  });

  test('undone before it went up it never arrives; undone after a lost answer it is taken back there', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const queue = await queueOn(store, server);
    const never = made(change(10));
    await queue.add(never);
    expect(await queue.takeBack(never.id)).toBe(true);
    expect(queue.state().entries).toEqual([]);
    server.signal = true;
    server.losesAnswers = true;
    const lost = made(change(20));
    await queue.add(lost);
    await queue.drain();
    expect(server.stored.map(({ id }) => id)).toEqual([lost.id]);
    server.losesAnswers = false;
    expect(await queue.takeBack(lost.id)).toBe(true);
    await queue.drain();
    expect(server.stored).toEqual([]);
    expect(queue.state().entries).toEqual([]);
  });

  test('a record opened in its form again is not sent meanwhile, and keeps its place when it is saved', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const queue = await queueOn(store, server);
    const [first, second] = [made(change(10)), made(change(20))];
    await queue.add(first);
    await queue.add(second);
    await queue.edit(first.id, true);
    await queue.replace(first.id, change(15), null);
    server.signal = true;
    await queue.drain();
    expect(server.stored.map(({ content }) => content)).toEqual([change(15), change(20)]);
  });
});

describe('a record that was refused', () => {
  test('holds up what builds on it, and nothing else', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const queue = await queueOn(store, server);
    const holdId = makeId();
    const [hold, check, other] = [made(holdOf(holdId)), made(checkOf(holdId)), made(change(30))];
    server.refuse.set(hold.id, conflict);
    server.signal = false;
    for (const record of [hold, check, other]) await queue.add(record);
    server.signal = true;
    await queue.drain();
    expect(server.stored.map(({ id }) => id)).toEqual([other.id]);
    const { entries } = queue.state();
    expect(entries.map(({ id, trouble }) => [id, trouble?.reason])).toEqual([
      [hold.id, 'conflict'],
      [check.id, undefined],
    ]);
    const waiting = entries.find(({ id }) => id === check.id);
    expect(waiting && heldBy(waiting, entries)?.id).toBe(hold.id);
  });

  test('goes up as a check on the other’s hold when that one is right, and what was built on it names that hold', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const [mine, theirs] = [makeId(), makeId()];
    const queue = await queueOn(store, server);
    const [hold, check] = [made(holdOf(mine)), made(checkOf(mine))];
    server.refuse.set(hold.id, conflict);
    await queue.add(hold);
    await queue.add(check);
    await queue.drain();
    server.refuse.clear();
    await queue.resolve(hold.id, { content: checkOf(theirs), ids: new Map([[mine, theirs]]) });
    await queue.drain();
    expect(server.stored.map(({ id, content }) => [id, content])).toEqual([
      [hold.id, checkOf(theirs)],
      [check.id, checkOf(theirs)],
    ]);
    expect(queue.state().entries).toEqual([]);
  });

  test('cannot be undone under what builds on it', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const queue = await queueOn(store, server);
    const holdId = makeId();
    const [hold, check] = [made(holdOf(holdId)), made(checkOf(holdId))];
    await queue.add(hold);
    await queue.add(check);
    await expect(queue.takeBack(hold.id)).rejects.toThrow(/Undo that first/);
    await queue.takeBack(check.id);
    expect(await queue.takeBack(hold.id)).toBe(true);
  });

  test('tells its form at once when it was just made', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const queue = await queueOn(store, server);
    const record = made(change(30));
    const refusal = new Refusal('invalid', 'Choose a tank', { tankId: 'Choose a tank' });
    server.refuse.set(record.id, refusal);
    await queue.add(record);
    expect(await queue.outcomeOf(record.id, 1000)).toEqual({ is: 'refused', refusal });
  });

  test('does not hold up the rest when the server itself fails on it three times', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const queue = await queueOn(store, server);
    const [bad, good] = [made(change(10)), made(change(20))];
    server.refuse.set(bad.id, new Refusal('broken', 'Something went wrong'));
    await queue.add(bad);
    await queue.add(good);
    await queue.drain();
    await queue.drain();
    expect(server.stored).toEqual([]);
    await queue.drain();
    expect(server.stored.map(({ id }) => id)).toEqual([good.id]);
  });
});

describe('whose they are', () => {
  test('another person at this device neither sees nor sends them; they go up when their maker is back', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const mine = await queueOn(store, server);
    await mine.add(made(change(30)));
    server.signal = true;
    server.who = makeId();
    const others = await queueOn(store, server, server.who);
    expect(others.state().entries).toEqual([]);
    // My page is still open behind, but the session is not mine any more.
    await mine.drain();
    expect(server.stored).toEqual([]);
    expect(mine.state().signedOut).toBe(true);
    server.who = ME;
    await queueOn(store, server);
    expect(server.stored).toHaveLength(1);
  });

  test('a session that has run out keeps them', async () => {
    const [store, server] = [listStore(), fakeServer()];
    const queue = await queueOn(store, server);
    const record = made(change(30));
    server.refuse.set(record.id, new Refusal('signed-out', 'Sign in again'));
    await queue.add(record);
    expect(await queue.outcomeOf(record.id, 1000)).toEqual({ is: 'waiting' });
    expect(queue.state()).toMatchObject({ signedOut: true, entries: [{ id: record.id, trouble: null }] });
  });

  test('after a sign-out nothing of theirs is left', async () => {
    const [store, server] = [listStore(), fakeServer()];
    server.signal = false;
    const queue = await queueOn(store, server);
    await queue.add(made(change(30)));
    await queue.forget();
    expect(store.rows.size).toBe(0);
  });
});

describe('what builds on what', () => {
  const entry = (content: EntryContent, place: number): Waiting => ({ ...waitingOf(made(content)), place });

  test('follows the brood of a strip to its counts, and on', () => {
    const [holdId, broodId, batchId, second] = [makeId(), makeId(), makeId(), makeId()];
    const none = { total: null, eggs: null, wrigglers: null, freeSwimming: null, dead: null, deformed: null };
    const strip = entry(
      {
        kind: 'holdEnded',
        holdId,
        onDay: '2026-05-14',
        outcome: 'stripped',
        brood: { broodId, batchId, code: 'MOKA-26A', tankId: TANK, numbers: none, opening: null },
        note: null,
      },
      1,
    );
    const split = entry(
      { kind: 'batchSplit', batchId, newBatchId: second, toTankId: TANK, onDay: '2026-05-14', heads: 4, note: null },
      2,
    );
    const lost = entry(
      { kind: 'headsLost', batchId: second, onDay: '2026-05-14', heads: 1, cause: 'foundDead', note: null },
      3,
    );
    const water = entry(change(30), 4);
    expect(followersOf(strip, [strip, split, lost, water]).map(({ place }) => place)).toEqual([2, 3]);
    expect(renamed(lost.content, new Map([[second, batchId]]))).toEqual({ ...lost.content, batchId });
  });
});
