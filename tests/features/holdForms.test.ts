import { describe, expect, test } from 'vitest';
import { beginningOf, begunOf, CANNOT_TELL, type Proposal, startOf } from '@/features/holds/beginning';
import { type Ending, endingOf, numbersOf, openingOf } from '@/features/holds/ending';
import { lastLookedChoices } from '@/features/holds/lastLooked';
import { shortCodes } from '@/features/holds/shortCode';
import { basisOf, candidatesOf, NO_CHANGE, NOT_KNOWN, type Sire, sireLines } from '@/features/holds/sireDraft';
import type { TankRow } from '@/shared/tanks/contract';

const TODAY = '2026-05-14';

const male = (fishId: string, share: number, dominantDays = 0): Sire => ({
  fishId,
  code: fishId.toUpperCase(),
  sex: 'male',
  strainCode: 'DUMA',
  strainId: 'duma',
  foreign: false,
  dominantDays,
  ofDays: 18,
  share,
  openHoldId: null,
  holdingSince: null,
});
const SIRES = [male('a01', 0.75, 14), male('a02', 0.25, 4)];

const shares = (lines: ReturnType<typeof sireLines>) =>
  Object.fromEntries(lines.filter(({ on }) => on).map(({ key, share }) => [key, Number(share.toFixed(4))]));

describe('possible sires', () => {
  test('keep the proposed shares until the keeper changes them', () => {
    expect(shares(sireLines(SIRES, NO_CHANGE))).toEqual({ a01: 0.75, a02: 0.25 });
  });

  test('share what is left when one is struck out', () => {
    expect(shares(sireLines(SIRES, { ...NO_CHANGE, off: ['a01'] }))).toEqual({ a02: 1 });
  });

  test('make room for a male not known, a tenth beside all the others', () => {
    // 0.75, 0.25 and 0.1 are 1.1 in all.
    const lines = sireLines(SIRES, { ...NO_CHANGE, notKnown: true });
    expect(shares(lines)).toEqual({ a01: 0.6818, a02: 0.2273, [NOT_KNOWN]: 0.0909 });
    expect(candidatesOf(lines).at(-1)?.fishId).toBeNull();
  });

  test('take typed percentages as shares, with a comma too, and leave out a nought', () => {
    const lines = sireLines(SIRES, { ...NO_CHANGE, shares: { a01: '62,5', a02: '37.5' } });
    expect(shares(lines)).toEqual({ a01: 0.625, a02: 0.375 });
    expect(candidatesOf(sireLines(SIRES, { ...NO_CHANGE, shares: { a01: '100', a02: '0' } }))).toEqual([
      { fishId: 'a01', weight: 1 },
    ]);
  });

  test('say what they rest on: days of dominance, the keeper’s hand, or nothing at all', () => {
    const said = (sires: Sire[], draft = NO_CHANGE) => basisOf(sireLines(sires, draft), draft);
    expect(said(SIRES)).toBe('A01 dominant 14 of 18 days, A02 dominant 4 of 18 days');
    expect(said(SIRES, { ...NO_CHANGE, shares: { a01: '60' } })).toBe('Shares set by hand');
    expect(said([male('a01', 0.5), male('a02', 0.5)])).toBe('Equal shares: no dominance recorded');
    expect(said([male('a01', 1)])).toBeNull();
    expect(said([{ ...male('a01', 1), ofDays: 0 }])).toBe('Equal shares: recorded without a signal');
  });
});

describe('last seen not holding', () => {
  const known = { firstSeenOn: TODAY, today: TODAY, lookedOn: '2026-05-09', lastEndedOn: null, longest: 30 };
  const words = (more: object = {}) => lastLookedChoices({ ...known, ...more }).map(({ word, day }) => [word, day]);

  test('is one tap for the usual answers, the last check among them', () => {
    expect(words()).toEqual([
      ['Yesterday', '2026-05-13'],
      ['Last check, 9 May', '2026-05-09'],
      ['A week', '2026-05-07'],
      ['Two weeks', '2026-04-30'],
      ['Not looked', '2026-04-14'],
    ]);
  });

  test('does not go behind the end of her last hold', () => {
    expect(words({ lastEndedOn: '2026-05-05' }).map(([word]) => word)).toEqual([
      'Yesterday',
      'Last check, 9 May',
      'A week',
      'Since her last hold, 5 May',
    ]);
  });

  test('counts from the day she was first seen, not from today', () => {
    expect(words({ firstSeenOn: '2026-05-10' })[0]).toEqual(['The day before', '2026-05-09']);
  });
});

describe('a hold that begins', () => {
  const female = (fishId: string, openHoldId: string | null = null): Proposal['females'][number] => ({
    fishId,
    code: fishId.toUpperCase(),
    colonyId: 'colony',
    strainId: 'duma',
    sex: 'female',
    openHoldId,
    holdingSince: openHoldId && TODAY,
    lastEndedOn: null,
  });
  const proposal: Proposal = {
    sires: SIRES,
    paternity: 'single',
    strains: [],
    lookedOn: null,
    females: [female('f3'), female('f4'), female('f5', 'a hold')],
  };
  const tank: TankRow = {
    id: 'tank',
    version: 1,
    code: 'T07',
    place: null,
    walkOrder: 0,
    lengthTenthsMm: null,
    widthTenthsMm: null,
    heightTenthsMm: null,
    fillTenthsMm: null,
    glassTenthsMm: null,
    standKg: null,
    litres: 450 as TankRow['litres'], // a brand: litres are litres
    heaterC: null,
    purpose: 'colony',
    note: null,
    retiredOn: null,
    residents: [],
  };
  const around = { seen: 'holding', tank, colonyId: 'colony', proposal, heHolds: false, strips: true } as const;
  const typed = (more: object) => {
    const value = begunOf({ ...startOf(TODAY, '2026-05-11', 'single'), ...more });
    if (!value) throw new Error('not a draft that could be sent');
    return value;
  };

  test('lies between the day she was last seen not holding and the day she was seen', () => {
    const entry = beginningOf(typed({ holderId: 'f3' }), around, (what) => `new ${what}`);
    expect(entry).toMatchObject({
      kind: 'holdingSeen',
      holdId: 'new hold',
      holderId: 'f3',
      spawnEarliest: '2026-05-11',
      spawnLatest: TODAY,
      firstSeenOn: TODAY,
      plan: 'strip',
      parentage: { dams: [{ fishId: 'f3', weight: 1 }], paternity: 'single' },
    });
  });

  test('may be any female’s that does not hold already, when one can’t tell which', () => {
    const { holderId, parentage } = beginningOf(typed({ holderId: CANNOT_TELL }), around, (what) => what);
    expect(holderId).toBeNull();
    expect(parentage.dams.map(({ fishId }) => fishId)).toEqual(['f3', 'f4']);
  });

  test('has one sure father when the spawn was watched', () => {
    const watched = { ...around, seen: 'spawn' } as const;
    const entry = beginningOf(typed({ holderId: 'f3', sireId: 'a02', notYetOn: '' }), watched, (what) => what);
    expect(entry).toMatchObject({
      kind: 'spawnSeen',
      onDay: TODAY,
      parentage: { sires: [{ fishId: 'a02', weight: 1 }], basis: 'Spawn seen' },
    });
  });

  test('is never planned to be stripped where the species is not', () => {
    const entry = beginningOf(typed({ holderId: 'f3' }), { ...around, strips: false }, (what) => what);
    expect(entry.plan).toBe('leave');
  });

  test('has the male that holds for its father, where the males hold', () => {
    const { parentage } = beginningOf(typed({ holderId: 'a01' }), { ...around, heHolds: true }, (what) => what);
    expect(parentage.sires).toEqual([{ fishId: 'a01', weight: 1 }]);
    expect(parentage.dams.map(({ fishId }) => fishId)).toEqual(['f3', 'f4']);
  });
});

describe('a strip', () => {
  const ending = (more: Partial<Ending>): Ending => ({
    onDay: TODAY,
    total: 31,
    found: 'freeSwimming',
    eggs: null,
    wrigglers: null,
    freeSwimming: null,
    dead: null,
    deformed: null,
    code: 'DUMA-26A',
    tankId: 'n1',
    note: null,
    ...more,
  });

  test('of free-swimming fry opens the head count with its one total', () => {
    expect(numbersOf(ending({}))).toMatchObject({ total: 31, freeSwimming: 31, eggs: null, wrigglers: null });
    expect(openingOf(ending({}))).toBe(31);
  });

  test('of eggs or wrigglers opens none yet', () => {
    expect(numbersOf(ending({ found: 'wrigglers' }))).toMatchObject({ total: 31, wrigglers: 31, freeSwimming: null });
    expect(openingOf(ending({ found: 'wrigglers' }))).toBeNull();
    expect(openingOf(ending({ found: 'eggs' }))).toBeNull();
  });

  test('of a mixed mouthful adds up its parts when no total was typed', () => {
    const mixed = ending({ found: 'mixed', total: null, wrigglers: 4, freeSwimming: 20 });
    expect(numbersOf(mixed)).toMatchObject({ total: 24, wrigglers: 4, freeSwimming: 20 });
    expect(openingOf(mixed)).toBeNull();
  });

  test('that was not counted makes a brood all the same', () => {
    const entry = endingOf(ending({ total: null }), 'hold', 'stripped', (what) => `new ${what}`);
    expect(entry.brood).toMatchObject({ broodId: 'new brood', batchId: 'new batch', opening: null });
    expect(Object.values(entry.brood?.numbers ?? {}).every((number) => number === null)).toBe(true);
  });
});

test('codes of one colony are shortened to their numbers, and only those', () => {
  const one = shortCodes(['DUMA-A03', 'DUMA-A04']);
  expect(one('DUMA-A04')).toBe('04');
  const two = shortCodes(['DUMA-A03', 'MOKA-A01']);
  expect(two('MOKA-A01')).toBe('MOKA-A01');
});
