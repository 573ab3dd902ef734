import { describe, expect, test } from 'vitest';
import { addDays } from '@/shared/days';
import { careClock, careProfileOf } from '@/shared/holds/careProfile';
import { clockBasis, clockSentence, clockState, nextInClock, spawnDoubt } from '@/shared/holds/clockWords';
import { dayBars, dayNumber } from '@/shared/holds/dayBars';
import { holdClock } from '@/shared/holds/holdClock';
import { profileOf } from '@/shared/species/library';

const SPAWN = '2026-04-23';
const seen = { spawnEarliest: SPAWN, spawnLatest: SPAWN };
// Strip on days 21 to 28 of a hold of 35, written as shares of the way: 20/35 and 27/35.
const profile = { days: 35, atC: 26, q10: 2.2, stripFrom: 20 / 35, stripTo: 27 / 35, spreadDays: 3 };
const clockOn = (today: string) => holdClock(seen, profile, [], today);

describe('the bars of a hold on day 22', () => {
  const bars = dayBars(clockOn('2026-05-14'), { checks: ['2026-04-30', '2026-05-07'] });
  const daysWhere = (is: (bar: (typeof bars)[number]) => boolean) => bars.filter(is).map(({ day }) => day);

  test('run from day 1 to a day past the release window', () => {
    expect(bars.map(({ day }) => day)).toEqual(Array.from({ length: 40 }, (_, i) => i + 1));
    expect(bars[0]?.on).toBe(SPAWN);
  });

  test('are past, today or ahead', () => {
    expect(daysWhere(({ when }) => when === 'past').at(-1)).toBe(21);
    expect(daysWhere(({ when }) => when === 'today')).toEqual([22]);
    expect(daysWhere(({ when }) => when === 'ahead').at(0)).toBe(23);
  });

  test('change stage where the shares of the way fall', () => {
    expect(daysWhere(({ stage }) => stage === 'egg').at(-1)).toBe(10); // 28 % of 35 is 9.8 days
    expect(daysWhere(({ stage }) => stage === 'wriggler').at(-1)).toBe(30); // 85 % is 29.75 days
  });

  test('mark the strip window, the release window with its expected day, and the checks', () => {
    expect(daysWhere(({ strip }) => strip)).toEqual([21, 22, 23, 24, 25, 26, 27, 28]);
    expect(daysWhere(({ release }) => release)).toEqual([33, 34, 35, 36, 37, 38, 39]);
    expect(daysWhere(({ expected }) => expected)).toEqual([36]);
    expect(daysWhere(({ checked }) => checked)).toEqual([8, 15]);
    expect(daysWhere(({ unseen }) => unseen)).toEqual([]);
  });

  test('read as one sentence', () => {
    expect(clockSentence(clockOn('2026-05-14'))).toBe('Day 22. Strip window 21 to 28. Release about 36.');
    expect(dayNumber(clockOn('2026-05-14'), '2026-05-14')).toBe(22);
  });
});

test('days before she was first seen holding are drawn as unseen', () => {
  const clock = holdClock({ spawnEarliest: '2026-05-10', spawnLatest: '2026-05-14' }, profile, [], '2026-05-14');
  expect(
    dayBars(clock)
      .filter(({ unseen }) => unseen)
      .map(({ day }) => day),
  ).toEqual([1, 2]);
  expect(spawnDoubt(clock)).toBe('Spawn not seen, ± 2 days');
  expect(clockSentence(clock)).toContain('Spawn not seen, ± 2 days.');
});

test('a hold that ended has no today and stops on that day', () => {
  const bars = dayBars(clockOn('2026-06-20'), { endedOn: '2026-05-16' });
  expect(bars.at(-1)).toMatchObject({ day: 24, when: 'past' });
  expect(bars.every(({ when }) => when === 'past')).toBe(true);
});

test('an overdue hold grows to today, a forgotten one not for ever', () => {
  expect(dayBars(clockOn('2026-06-10')).at(-1)).toMatchObject({ when: 'today', day: 49 });
  expect(dayBars(clockOn('2027-06-10'))).toHaveLength(150);
});

describe('what comes next', () => {
  test.each([
    ['2026-05-01', 'early', 'Strip from Wed 13 May'],
    ['2026-05-12', 'early', 'Strip from tomorrow'],
    ['2026-05-14', 'strip', 'Strip by Wed 20 May'],
    ['2026-05-19', 'strip', 'Strip by tomorrow'],
    ['2026-05-20', 'strip', 'Strip today'],
    ['2026-05-21', 'waiting', 'Release from Mon 25 May'],
    ['2026-05-24', 'waiting', 'Release from tomorrow'],
    ['2026-05-26', 'release', 'Release by Sun 31 May'],
    ['2026-06-01', 'late', 'Release 1 day late'],
    ['2026-06-06', 'late', 'Release 6 days late'],
  ])('on %s she is %s: %s', (today, state, words) => {
    expect(clockState(clockOn(today), 'strip')).toBe(state);
    expect(nextInClock(clockOn(today), 'strip')).toBe(words);
  });

  test('a female left to release is never up for stripping', () => {
    expect(nextInClock(clockOn('2026-05-14'), 'leave')).toBe('Release from Mon 25 May');
  });

  test('says what the dates rest on', () => {
    const warm = holdClock(seen, profile, [{ on: SPAWN, celsius: 26.4 }], '2026-05-14');
    expect(clockBasis(warm, 0)).toBe('The species’ usual days, 26.4 °C from 1 day of readings.');
    expect(clockBasis(clockOn('2026-05-14'), 4)).toBe(
      'The species’ usual days and 4 holds of yours, no temperature recorded.',
    );
    const cold = holdClock(seen, profile, [{ on: SPAWN, celsius: 20 }], '2026-05-14');
    expect(clockBasis(cold, 0)).toContain('Outside 22 to 30 °C the rate is not known.');
  });
});

describe('species that are never stripped', () => {
  const clockFor = (id: string, days: number) => {
    const care = careProfileOf(profileOf(id));
    if (!care) throw new Error(`no clock for ${id}`);
    return careClock(seen, care, [], addDays(SPAWN, days));
  };

  test.each([
    'eretmodus-cyanostictus',
    'altolamprologus-calvus',
    'neolamprologus-pulcher',
    'julidochromis-marlieri',
    'sarotherodon-melanotheron',
    'benthochromis-tricoti',
  ])('%s has no strip window on any day', (id) => {
    for (let day = 0; day <= 110; day += 1) {
      const clock = clockFor(id, day);
      expect([clock.stripFrom, clock.stripTo]).toEqual([null, null]);
      expect(nextInClock(clock, 'strip')).not.toContain('Strip');
    }
  });

  // Hatch on day 3 and free-swimming on day 10 at 25 °C: Julidochromis (aquarium society page, see the profile).
  test('guarded eggs hatch, swim free and stay guarded', () => {
    const stages = [0, 2, 3, 9, 10, 12, 13, 40].map((day) => clockFor('julidochromis-marlieri', day).stage);
    expect(stages).toEqual(['egg', 'egg', 'wriggler', 'wriggler', 'fry', 'fry', 'guarded', 'guarded']);
    expect(nextInClock(clockFor('julidochromis-marlieri', 0), 'strip')).toBe('Hatching about Sun 26 Apr');
    expect(nextInClock(clockFor('julidochromis-marlieri', 4), 'strip')).toBe('Free-swimming from Fri 1 May');
    expect(nextInClock(clockFor('julidochromis-marlieri', 30), 'strip')).toBe('Free-swimming, guarded');
    expect(clockSentence(clockFor('julidochromis-marlieri', 4))).toBe('Day 5. Free-swimming about 11.');
    expect(dayBars(clockFor('julidochromis-marlieri', 20)).at(-1)).toMatchObject({ stage: 'guarded', when: 'today' });
  });

  // The female holds 10 to 12 days, then the male (Grueter & Taborsky 2004; aquarium society page).
  test('a brood that is handed over has its window on days 11 to 13', () => {
    const clock = clockFor('eretmodus-cyanostictus', 10);
    expect(clockSentence(clock)).toBe('Day 11. Hand-over 11 to 13. Release about 23.');
    expect(nextInClock(clockFor('eretmodus-cyanostictus', 4), 'leave')).toBe('Hand-over from Sun 3 May');
    expect(nextInClock(clock, 'leave')).toBe('Hand-over by Tue 5 May');
    expect(
      dayBars(clock)
        .filter(({ handOver }) => handOver)
        .map(({ day }) => day),
    ).toEqual([11, 12, 13]);
  });

  test('a maternal mouthbrooder is stripped on the days its profile names', () => {
    expect(clockSentence(clockFor('tropheus-duboisi', 0))).toBe('Day 1. Strip window 21 to 28. Release about 30.');
    expect(clockSentence(clockFor('maylandia-estherae', 0))).toBe('Day 1. Strip window 14 to 18. Release about 22.');
  });
});
