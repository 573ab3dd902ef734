import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { BadValue } from '@/shared/badValue';
import { checkEntry } from '@/shared/broods/headCheck';
import { headCount, headCountOf, headsOn, NotEnoughHeads } from '@/shared/broods/headCount';
import { HEAD_EFFECTS, HEAD_KINDS, type HeadKind, type LedgerEntry, LOSS_CAUSES } from '@/shared/broods/headEntry';

let made = 0;
/** An entry on a day of May, recorded at noon of that day unless said otherwise. */
function on(day: number, kind: HeadKind, heads: number, more: Partial<LedgerEntry> = {}): LedgerEntry {
  made += 1;
  const date = `2026-05-${String(day).padStart(2, '0')}`;
  return { id: `e${String(made).padStart(4, '0')}`, on: date, at: `${date}T12:00:00.000Z`, kind, heads, ...more };
}

test('a ledger with every kind of entry adds up as it would on paper', () => {
  const count = headCountOf([
    on(1, 'opening', 40),
    on(2, 'loss', 3, { cause: 'foundDead' }), // 37
    on(3, 'cull', 2), // 35
    on(4, 'recount', 34), // one not found
    on(5, 'movedOut', 10), // 24
    on(6, 'movedIn', 6), // 30
    on(7, 'heldBack', 4), // 26
    on(8, 'sold', 8), // 18
    on(9, 'given', 1), // 17
    on(10, 'traded', 2), // 15
    on(11, 'auctioned', 3), // 12
    on(12, 'returned', 2), // 14
    on(13, 'loss', 1, { cause: 'jumped' }), // 13
    on(13, 'loss', 1), // 12
  ]);
  expect(count).toMatchObject({ balance: 12, opened: 40, lost: 5, sold: 8, heldBack: 4, corrections: -1 });
  expect(count.heads).toMatchObject({
    cull: 2,
    movedOut: 10,
    movedIn: 6,
    given: 1,
    traded: 2,
    auctioned: 3,
    returned: 2,
  });
  expect(count.lostBy).toEqual({ foundDead: 3, deformed: 0, jumped: 1, eaten: 0, equipment: 0, unknown: 1 });
  expect(count.series.map(({ balance }) => balance)).toEqual([40, 37, 35, 34, 24, 30, 26, 18, 17, 15, 12, 14, 12]);
  expect([count.openedOn, count.countedOn, count.short]).toEqual(['2026-05-01', '2026-05-04', 0]);
});

test('an empty ledger has no heads and says nothing of dates', () => {
  expect(headCountOf([])).toMatchObject({
    balance: 0,
    opened: 0,
    series: [],
    openedOn: null,
    countedOn: null,
    rows: [],
  });
});

test('the public figures are those of the full count', () => {
  const ledger = [on(1, 'opening', 40), on(2, 'sold', 5)];
  expect(headCount(ledger)).toEqual({
    balance: 35,
    opened: 40,
    lost: 0,
    sold: 5,
    heldBack: 0,
    corrections: 0,
    series: [
      { on: '2026-05-01', balance: 40 },
      { on: '2026-05-02', balance: 35 },
    ],
  });
});

describe('a recount', () => {
  test('more heads than thought is a correction up', () => {
    expect(headCount([on(1, 'opening', 20), on(2, 'recount', 23)])).toMatchObject({
      balance: 23,
      corrections: 3,
      lost: 0,
    });
  });

  test('a loss that was recorded late does not falsify it', () => {
    const counted = [on(1, 'opening', 30), on(10, 'recount', 27)];
    expect(headCount(counted)).toMatchObject({ balance: 27, corrections: -3, lost: 0 });
    const late = on(5, 'loss', 2, { at: '2026-05-12T08:00:00.000Z' });
    expect(headCount([...counted, late])).toMatchObject({ balance: 27, corrections: -1, lost: 2 });
  });

  test('on the day of a loss, what was recorded first happened first', () => {
    const opened = on(1, 'opening', 30);
    const before = on(5, 'loss', 2, { at: '2026-05-05T08:00:00Z' });
    const after = on(5, 'loss', 2, { at: '2026-05-05T18:00:00.5Z' });
    const seen = on(5, 'recount', 27, { at: '2026-05-05T12:00:00Z' });
    expect(headCount([opened, before, seen])).toMatchObject({ balance: 27, corrections: -1 });
    expect(headCount([opened, after, seen])).toMatchObject({ balance: 25, corrections: -3 });
  });
});

describe('an undone entry', () => {
  const opened = on(1, 'opening', 30);
  const loss = on(3, 'loss', 4);
  const undo = on(3, 'loss', 4, { reverses: loss.id });

  test('counts for nothing, and keeps its place with what undid it', () => {
    const count = headCountOf([opened, loss, undo]);
    expect(count).toMatchObject({ balance: 30, lost: 0 });
    expect(count.series).toEqual([{ on: '2026-05-01', balance: 30 }]);
    expect(count.rows.map((row) => [row.entry.id, row.undoneBy?.id ?? null, row.change, row.balance])).toEqual([
      [opened.id, null, 30, 30],
      [loss.id, undo.id, 0, 30],
    ]);
  });

  test('stands again when the undo is undone', () => {
    const redo = on(4, 'loss', 4, { reverses: undo.id });
    expect(headCount([opened, loss, undo, redo])).toMatchObject({ balance: 26, lost: 4 });
  });

  test('is undone once, however often two devices undo it', () => {
    const again = on(4, 'loss', 4, { reverses: loss.id });
    expect(headCount([opened, loss, undo, again])).toMatchObject({ balance: 30 });
  });

  test('must be there to be undone, and cannot undo itself', () => {
    expect(() => headCount([opened, on(2, 'loss', 1, { reverses: 'missing' })])).toThrow('missing');
    const self = on(2, 'loss', 1);
    expect(() => headCount([opened, { ...self, reverses: self.id }])).toThrow(BadValue);
  });
});

describe('more fish than there are', () => {
  test('a death is never refused: the fish were there, so the books were short', () => {
    expect(headCountOf([on(1, 'opening', 5), on(2, 'loss', 6)])).toMatchObject({
      balance: 0,
      lost: 6,
      corrections: 1,
      short: 1,
    });
  });

  test.each(['sold', 'given', 'traded', 'auctioned', 'heldBack', 'movedOut'] as const)(
    '%s: 6 of 5 is refused',
    (kind) => {
      const entry = on(2, kind, 6);
      expect(() => headCount([on(1, 'opening', 5), entry])).toThrow(NotEnoughHeads);
      expect(() => checkEntry([on(1, 'opening', 5)], entry)).toThrow('6 wanted, 5 there');
    },
  );

  test('a sale that was good when it was made survives deaths reported later', () => {
    const ledger = [on(1, 'opening', 10), on(4, 'sold', 8)];
    const late = on(2, 'loss', 5, { at: '2026-05-03T09:00:00.000Z' });
    expect(() => checkEntry(ledger, late)).not.toThrow();
    expect(headCountOf([...ledger, late])).toMatchObject({ balance: 0, sold: 8, lost: 5, corrections: 3, short: 3 });
  });

  test('a sale dated back may not take fish that later left', () => {
    const ledger = [on(1, 'opening', 10), on(6, 'sold', 7)];
    expect(() => checkEntry(ledger, on(3, 'sold', 4))).toThrow('4 wanted, 3 there');
    expect(() => checkEntry(ledger, on(3, 'sold', 3))).not.toThrow();
  });

  test('a move in cannot be undone once its fish were sold', () => {
    const arrival = on(2, 'movedIn', 6);
    const ledger = [on(1, 'opening', 2), arrival, on(3, 'sold', 7)];
    expect(() => checkEntry(ledger, on(4, 'movedIn', 6, { reverses: arrival.id }))).toThrow(NotEnoughHeads);
    expect(() => checkEntry(ledger.slice(0, 2), on(4, 'movedIn', 6, { reverses: arrival.id }))).not.toThrow();
  });
});

test('the head count of a past day is the one at its end', () => {
  const ledger = [on(2, 'opening', 20), on(5, 'loss', 1), on(5, 'loss', 2)];
  expect(['01', '02', '04', '05', '09'].map((d) => headsOn(ledger, `2026-05-${d}`))).toEqual([0, 20, 20, 17, 17]);
});

test.each([
  ['half a fish', [on(1, 'opening', 1.5)], 'Heads'],
  ['fewer than none', [on(1, 'opening', -1)], 'Heads'],
  ['heads that are not a number', [on(1, 'opening', Number.NaN)], 'Heads'],
  ['a day that does not exist', [{ ...on(1, 'opening', 1), on: '2026-02-30' }], 'Day of entry'],
  ['no time', [{ ...on(1, 'opening', 1), at: 'noon' }], 'Time of entry'],
])('%s is refused by name', (_, ledger, what) => {
  expect(() => headCount(ledger)).toThrow(BadValue);
  expect(() => headCount(ledger)).toThrow(what);
});

test('one id twice is refused', () => {
  const entry = on(1, 'opening', 3);
  expect(() => headCount([entry, { ...entry }])).toThrow(entry.id);
});

describe('any ledger', () => {
  const anyEntry = fc.record({
    day: fc.integer({ min: 2, max: 28 }),
    hour: fc.integer({ min: 0, max: 23 }),
    kind: fc.constantFrom(...HEAD_KINDS.filter((kind) => HEAD_EFFECTS[kind] !== 'leaves')),
    heads: fc.integer({ min: 0, max: 12 }),
    cause: fc.constantFrom(...LOSS_CAUSES, null),
  });
  const anyLeaving = fc.record({ day: fc.integer({ min: 2, max: 28 }), heads: fc.integer({ min: 1, max: 4 }) });
  const anyLedger = fc
    .tuple(fc.array(anyEntry, { maxLength: 15 }), fc.array(anyLeaving, { maxLength: 8 }))
    .map(([some, out]) => [
      on(1, 'opening', 60),
      ...some.map(({ day, hour, kind, heads, cause }) =>
        on(day, kind, heads, {
          cause,
          at: `2026-05-${String(day).padStart(2, '0')}T${String(hour).padStart(2, '0')}:00:00Z`,
        }),
      ),
      ...out.map(({ day, heads }, i) =>
        on(day, (['sold', 'heldBack', 'movedOut', 'given'] as const)[i % 4] ?? 'sold', heads),
      ),
    ]);

  test('gives the same figures in whatever order it is read', () => {
    fc.assert(
      fc.property(
        anyLedger.chain((ledger) =>
          fc.tuple(fc.constant(ledger), fc.shuffledSubarray(ledger, { minLength: ledger.length })),
        ),
        ([ledger, shuffled]) => {
          expect(headCountOf(shuffled)).toEqual(headCountOf(ledger));
        },
      ),
    );
  });

  test('balances to the fish and never falls below zero', () => {
    fc.assert(
      fc.property(anyLedger, (ledger) => {
        const { balance, corrections, heads, series, lostBy } = headCountOf(ledger);
        const { opening, movedIn, returned, loss, cull, movedOut, heldBack, sold, given, traded, auctioned } = heads;
        const out = loss + cull + movedOut + heldBack + sold + given + traded + auctioned;
        expect(balance).toBe(opening + movedIn + returned + corrections - out);
        expect(Math.min(balance, ...series.map((point) => point.balance))).toBeGreaterThanOrEqual(0);
        expect(Object.values(lostBy).reduce((a, b) => a + b, 0)).toBe(loss);
      }),
    );
  });

  test('is as it was after an entry is added and undone', () => {
    fc.assert(
      fc.property(anyLedger, anyEntry, (ledger, { day, kind, heads }) => {
        const added = on(day, kind, heads);
        const undo = on(28, kind, heads, { reverses: added.id });
        expect(headCount([...ledger, added, undo])).toEqual(headCount(ledger));
      }),
    );
  });

  test('does not change what it is given', () => {
    const ledger = [on(9, 'loss', 1), on(1, 'opening', 5)];
    const copy = structuredClone(ledger);
    headCountOf(ledger);
    expect(ledger).toEqual(copy);
  });
});
