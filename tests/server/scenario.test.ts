import { describe, expect, test } from 'vitest';
import { demoScenario } from '@/server/demo/scenario';
import { KEY_KINDS, ORDER_STATES, type Scenario } from '@/server/demo/scenario/shape';
import { headCountOf } from '@/shared/broods/headCount';
import { addDays, daysBetween, isDay } from '@/shared/days';
import { daysAt } from '@/shared/holds/development';
import { temperatureOn } from '@/shared/holds/waterTemperature';
import { uuidV7 } from '@/shared/ids';
import { inbreeding } from '@/shared/lineage/inbreeding';
import type { Parentage, PedigreeEntry } from '@/shared/lineage/pedigree';
import { EntryContent } from '@/shared/record/kinds';
import { may, ROLES, type Role } from '@/shared/roles';
import { profileOf } from '@/shared/species/library';
import { StrainFacts } from '@/shared/strains/contract';
import { TankFacts } from '@/shared/tanks/contract';
import { degreesOf } from '@/shared/units';
import { entriesOf, replay } from '../support/scenarioReplay';

const TODAY = '2026-05-14';
const scenario = demoScenario(TODAY);
const room = replay(scenario);
const KEY = new RegExp(`^(${KEY_KINDS.join('|')}):`);

const speciesOf = (strainKey: string | null | undefined): string => {
  const strain = scenario.strains.find(({ key }) => key === strainKey);
  if (!strain) throw new Error(`No strain ${strainKey}`);
  return strain.speciesId;
};

const begun = [
  ...entriesOf(scenario, 'holdingSeen').map((hold) => ({ ...hold, from: hold.spawnEarliest, until: hold.spawnLatest })),
  ...entriesOf(scenario, 'spawnSeen').map((hold) => ({ ...hold, from: hold.onDay, until: hold.onDay })),
];
const ended = new Map(entriesOf(scenario, 'holdEnded').map((end) => [end.holdId, end]));
const broodCodes = [
  ...entriesOf(scenario, 'holdEnded').flatMap(({ brood, onDay }) => (brood ? [{ code: brood.code, onDay }] : [])),
  ...entriesOf(scenario, 'broodFound').map(({ code, onDay }) => ({ code, onDay })),
].sort((a, b) => (a.onDay < b.onDay ? -1 : 1));

/** Every string of a value, however deep. */
function stringsIn(value: unknown): string[] {
  if (typeof value === 'string') return [value];
  if (typeof value !== 'object' || value === null) return [];
  return Object.values(value).flatMap(stringsIn);
}

/** The same value with an id in the place of each key. */
function withIds(value: unknown, ids = new Map<string, string>()): unknown {
  if (typeof value === 'string' && KEY.test(value)) {
    const id = ids.get(value) ?? uuidV7(1_700_000_000_000 + ids.size, new Uint8Array(10));
    ids.set(value, id);
    return id;
  }
  if (Array.isArray(value)) return value.map((one) => withIds(one, ids));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, one]) => [name, withIds(one, ids)]));
}

describe('the demo fishroom as a whole', () => {
  test('is told the same way twice', () => {
    expect(demoScenario(TODAY)).toEqual(scenario);
  });

  test('has its racks, strains, colonies and broods', () => {
    expect(scenario.tanks).toHaveLength(30);
    expect(scenario.strains).toHaveLength(6);
    expect(room.colonies.size).toBe(8);
    expect(broodCodes).toHaveLength(25);
    expect(new Set(scenario.members.map(({ role }) => role))).toEqual(new Set(ROLES));
    const days = scenario.happenings.map(({ on }) => on);
    expect(daysBetween(days[0] ?? TODAY, TODAY)).toBeGreaterThanOrEqual(730);
  });

  test('keeps other strains than the ones the library is drawn with, and reaches nobody', () => {
    const kept = scenario.strains.map(({ speciesId, locality }) => `${speciesId} ${locality}`);
    expect(kept.filter((text) => /cyphotilapia|Kapampa|Maswa|Kantalamba|Chaitika/.test(text))).toEqual([]);
    for (const { email } of [...scenario.members, ...scenario.buyers])
      expect(email).toMatch(/^[a-z.]+@[a-z-]+\.example$/);
  });

  test('is written in shapes that the app takes', () => {
    for (const { key: _key, ...facts } of scenario.strains) StrainFacts.parse(facts);
    for (const { key: _key, ...facts } of scenario.tanks) TankFacts.parse(facts);
    for (const happening of scenario.happenings) {
      if (happening.what !== 'entry') continue;
      const read = EntryContent.safeParse(withIds(happening.entry));
      expect(read.success ? [] : [happening.entry.kind, read.error.issues]).toEqual([]);
    }
  });

  test('speaks of nothing before it is there', () => {
    const there = new Set<string>(
      [...scenario.strains, ...scenario.lots, ...scenario.tanks, ...scenario.members, ...scenario.orders].map(
        ({ key }) => key,
      ),
    );
    const makes = /^(holdId|broodId|batchId|newBatchId|careId|sampleId|photoId|reservationId)$/;
    for (const happening of scenario.happenings) {
      if (happening.what === 'colony') there.add(happening.key);
      if (happening.what === 'founders') for (const { key } of happening.fish) there.add(key);
      if (happening.what === 'entry') {
        const { entry } = happening;
        if (entry.kind === 'heldBack') for (const { id } of entry.fish) there.add(id);
        const parts = entry.kind === 'holdEnded' && entry.brood ? { ...entry, ...entry.brood } : entry;
        const isMaking =
          /^(spawnSeen|holdingSeen|holdEnded|broodFound|batchSplit|treatmentStarted|quarantineStarted|lengthSampled|photoTaken|headsKept)$/;
        if (isMaking.test(entry.kind))
          for (const [name, value] of Object.entries(parts)) if (makes.test(name)) there.add(String(value));
      }
      const { picture: _picture, ...told } = { picture: null, ...happening };
      for (const key of stringsIn(told).filter((text) => KEY.test(text)))
        expect(there.has(key), `${happening.on} ${key}`).toBe(true);
    }
  });
});

describe.each(['2026-05-14', '2026-01-03', '2027-02-28', '2028-02-29'])('told on %s', (today) => {
  const told: Scenario = demoScenario(today);

  test('nothing is in the future and everything is in order', () => {
    const stamps = told.happenings.map(({ on, time }) => `${on} ${time}`);
    expect([...stamps].sort()).toEqual(stamps);
    for (const { on, time } of told.happenings) {
      expect(isDay(on) && on < today && on >= addDays(today, -740)).toBe(true);
      expect(time).toMatch(/^([01]\d|2[0-3]):[0-5]\d$/);
    }
    const days = told.happenings.flatMap((one) =>
      one.what === 'entry' && 'onDay' in one.entry ? [[one.on, one.entry.onDay]] : [],
    );
    for (const [on, onDay] of days) expect(onDay).toBe(on);
  });

  test('tells as many things as on any other day', () => {
    const kinds = (of: Scenario) =>
      of.happenings.map((one) => (one.what === 'entry' ? one.entry.kind : one.what)).sort();
    expect(kinds(told)).toEqual(kinds(scenario));
  });

  test('has no ledger that lacks fish', () => {
    for (const [batch, lines] of replay(told).ledgers) expect(headCountOf(lines).short, batch).toBe(0);
  });
});

describe('codes', () => {
  test('read as the product writes them', () => {
    for (const { code } of scenario.strains) expect(code).toMatch(/^[A-Z]{4}$/);
    for (const key of room.colonies.keys()) expect(key).toMatch(/^colony:[A-Z]{4}-[A-HJ-NP-Z]$/);
    const fish = scenario.happenings.flatMap((one) =>
      one.what === 'founders'
        ? one.fish.map(({ code }) => code)
        : one.what === 'entry' && one.entry.kind === 'heldBack'
          ? one.entry.fish.map(({ code }) => code)
          : [],
    );
    for (const code of fish) if (code !== null) expect(code).toMatch(/^[A-Z]{4}-[A-HJ-NP-Z]?\d\d$/);
    const coded = fish.filter((code) => code !== null);
    expect(new Set(coded).size).toBe(coded.length);
  });

  test('of broods carry the year they began and go on by letter', () => {
    expect(new Set(broodCodes.map(({ code }) => code)).size).toBe(25);
    const byStem = new Map<string, string[]>();
    for (const { code, onDay } of broodCodes) {
      expect(code).toMatch(/^[A-Z]{4}-\d\d[A-HJ-NP-Z]$/);
      expect(code.slice(5, 7)).toBe(onDay.slice(2, 4));
      byStem.set(code.slice(0, 7), [...(byStem.get(code.slice(0, 7)) ?? []), code.slice(7)]);
    }
    for (const letters of byStem.values()) expect(letters.join('')).toBe('ABCDEFGH'.slice(0, letters.length));
  });
});

describe('fish', () => {
  test('are in one tank at a time, from the day they come to the day they leave', () => {
    for (const [key, { homes, left }] of room.fish) {
      const days = homes.map(({ on }) => on);
      expect([...days].sort()).toEqual(days);
      for (const { on, colony, tank } of homes) expect([colony, tank].filter(Boolean), `${key} ${on}`).toHaveLength(1);
      expect(room.tankOf(key, days[0] ?? '')).not.toBeNull();
      if (left) {
        expect(left > (days[0] ?? '')).toBe(true);
        expect(room.tankOf(key, left)).toBeNull();
      }
    }
  });

  test('that died are not found out about later', () => {
    for (const kind of ['sexSeen', 'dominant', 'markSeen', 'toldApart'] as const) {
      for (const { fishId, onDay } of entriesOf(scenario, kind))
        expect(room.tankOf(fishId, onDay), `${fishId} ${onDay}`).not.toBeNull();
    }
  });

  test('go into colonies of their own strain', () => {
    for (const { homes, strain } of room.fish.values()) {
      for (const { colony } of homes) if (colony) expect(room.colonyStrain.get(colony)).toBe(strain);
    }
  });

  test('come down from the founders in three generations', () => {
    const generation = new Map<string, number>();
    const damOf = new Map(begun.map(({ holdId, parentage }) => [holdId, parentage]));
    const parents = new Map(
      entriesOf(scenario, 'holdEnded').flatMap(({ brood, holdId }) => {
        const parentage = damOf.get(holdId);
        return brood && parentage ? [[brood.batchId, parentage] as const] : [];
      }),
    );
    const batchOf = new Map(
      entriesOf(scenario, 'heldBack').flatMap(({ batchId, fish }) => fish.map(({ id }) => [id, batchId] as const)),
    );
    const of = (key: string): number => {
      const known = generation.get(key);
      if (known !== undefined) return known;
      const parentage = parents.get(batchOf.get(key) ?? '');
      const number = parentage
        ? 1 + Math.min(...[...parentage.dams, ...parentage.sires].map(({ fishId }) => of(fishId ?? '')))
        : 0;
      generation.set(key, number);
      return number;
    };
    const ofBroods = [...parents.values()].map(
      ({ dams, sires }) => 1 + Math.min(...[...dams, ...sires].map(({ fishId }) => of(fishId ?? ''))),
    );
    expect(Math.max(...[...room.fish.keys()].map(of))).toBe(2);
    const deepest = [...parents.values()].map(
      ({ dams }) => 1 + Math.max(...dams.map(({ fishId }) => of(fishId ?? ''))),
    );
    expect(Math.max(...deepest)).toBe(3);
    expect(Math.max(...ofBroods)).toBeGreaterThanOrEqual(2);
  });
});

describe('kinship', () => {
  const shared = new Map(begun.map(({ holdId, parentage }) => [holdId, parentage]));
  const side = (
    key: string,
    paternity: 'single' | 'mixed',
    list: { fishId: string | null; weight: number }[],
  ): Parentage => {
    const candidates = list.map(({ fishId, weight }) => ({ id: fishId, weight }));
    const [only] = candidates;
    if (candidates.length === 1 && only?.id) return { kind: 'known', id: only.id };
    return paternity === 'single' ? { kind: 'oneOf', key, candidates } : { kind: 'mixed', candidates };
  };
  const pairs = entriesOf(scenario, 'holdEnded').flatMap(({ holdId, brood }) => {
    const parentage = shared.get(holdId);
    if (!brood || !parentage) return [];
    const { paternity, sires, dams } = parentage;
    const pair = { sire: side(`${holdId} sire`, paternity, sires), dam: side(`${holdId} dam`, 'single', dams) };
    return [{ brood: brood.broodId, batch: brood.batchId, ...pair }];
  });
  const isMixed = new Set<string>(entriesOf(scenario, 'batchJoined').map(({ intoBatchId }) => intoBatchId));
  const heldBack = entriesOf(scenario, 'heldBack').flatMap(({ batchId, fish }): PedigreeEntry[] => {
    const pair = pairs.find(({ batch }) => batch === batchId);
    if (!pair || isMixed.has(batchId)) return [];
    return fish.map(({ id }) => ({ id, sire: pair.sire, dam: pair.dam }));
  });
  const known = new Set(heldBack.map(({ id }) => id));
  const founders = [...room.fish.keys()]
    .filter((key) => !known.has(key))
    .map((id): PedigreeEntry => ({ id, sire: { kind: 'unknown' }, dam: { kind: 'unknown' } }));
  const broods = pairs.map(({ brood, sire, dam }): PedigreeEntry => ({ id: brood, sire, dam }));
  const inbred = inbreeding([...founders, ...heldBack, ...broods]);

  test('of the young of founders is none', () => {
    for (const brood of ['m1', 's1', 'e1', 'c1', 'l1', 'a1']) expect(inbred.get(`brood:${brood}`)).toBe(0);
  });

  test('of two that may share a father is what the shares say', () => {
    // ESMI-B01 is of A04 and of A01 (2 shares) or A02 (1); ESMI-B10 of A08 and A01. Half sibs at two in three: F 1/8 x 2/3.
    expect(inbred.get('brood:s4')).toBeCloseTo(1 / 12, 12);
  });

  test('stays above none in the third generation', () => {
    expect(inbred.get('brood:s5')).toBeGreaterThan(0.1);
    expect(inbred.get('brood:s5')).toBeLessThan(0.25);
  });
});

describe('holds', () => {
  test('are of females that were in the tank, alive, known as females and not holding already', () => {
    for (const { holdId, holderId, parentage, tankId, from, until } of begun) {
      for (const { fishId } of parentage.dams) {
        const dam = fishId ?? '';
        expect(room.sexOf(dam, until), holdId).toBe('female');
        expect([room.tankOf(dam, from), room.tankOf(dam, until)], holdId).toEqual([tankId, tankId]);
        expect(room.ageOf(dam, from)).toBeGreaterThanOrEqual(180);
      }
      if (holderId) expect(parentage.dams.map(({ fishId }) => fishId)).toEqual([holderId]);
    }
    const spans = begun.flatMap(({ holderId, holdId, from }) =>
      holderId ? [{ holderId, from, to: ended.get(holdId)?.onDay ?? TODAY }] : [],
    );
    for (const a of spans)
      for (const b of spans)
        if (a !== b && a.holderId === b.holderId) expect(a.to < b.from || b.to < a.from).toBe(true);
  });

  test('name as possible sires every adult male of the tank and no one else, unless one was seen', () => {
    const all = [
      ...begun,
      ...entriesOf(scenario, 'broodFound').map((found) => ({
        ...found,
        from: found.spawnEarliest,
        until: found.spawnLatest,
      })),
    ];
    for (const { parentage, tankId, from, until, kind } of all) {
      const named = parentage.sires.map(({ fishId }) => fishId ?? '').sort();
      const there = [...room.fish.keys()].filter(
        (key) =>
          room.tankOf(key, until) === tankId && room.sexOf(key, until) !== 'female' && room.ageOf(key, until) >= 180,
      );
      for (const key of named) expect(there, `${from} ${key}`).toContain(key);
      if (kind === 'spawnSeen') expect(named).toHaveLength(1);
      else expect(named).toEqual(there.sort());
      for (const { weight } of parentage.sires) expect(weight).toBeGreaterThan(0);
    }
  });

  test('end as long after the spawn as the species takes at the temperatures of the tank', () => {
    const tests = entriesOf(scenario, 'waterTested');
    for (const { holdId, colonyId, tankId, from, until } of begun) {
      const end = ended.get(holdId);
      if (!end || (end.outcome !== 'stripped' && end.outcome !== 'released')) continue;
      const profile = profileOf(speciesOf(room.colonyStrain.get(colonyId ?? '')));
      const readings = tests
        .filter((one) => one.tankId === tankId)
        .map(({ onDay, celsius }) => ({ on: onDay, celsius: celsius ?? 26 }));
      const held = daysBetween(from, end.onDay) - daysBetween(from, until) / 2;
      const celsius = temperatureOn(readings)?.(addDays(from, 10)) ?? 26;
      const pace = {
        days: profile.holdDays?.value ?? profile.freeSwimmingDay.value,
        atC: profile.holdAtC.value,
        q10: profile.q10.value,
      };
      const stretch = daysAt(pace, celsius) / pace.days;
      const usual = profile.holdDaysRange?.value ?? [pace.days - 2, pace.days + 2];
      const [low, high] = end.outcome === 'stripped' ? (profile.stripDays?.value ?? usual) : usual;
      expect(held, holdId).toBeGreaterThanOrEqual(low * stretch - 2);
      expect(held, holdId).toBeLessThanOrEqual(high * stretch + 1);
    }
  });

  test('are open today at many days: one nobody can tell, one past its strip window, one guarded pair', () => {
    const open = begun.filter(({ holdId }) => !ended.has(holdId));
    expect(open).toHaveLength(8);
    expect(open.filter(({ holderId }) => holderId === null)).toHaveLength(1);
    const modes = open.map(({ colonyId }) => profileOf(speciesOf(room.colonyStrain.get(colonyId ?? ''))).mode);
    expect(modes.filter((mode) => mode === 'substrateSpawner')).toHaveLength(1);
    const late = open.filter(({ colonyId, until, plan }) => {
      const { stripDays } = profileOf(speciesOf(room.colonyStrain.get(colonyId ?? '')));
      return plan === 'strip' && stripDays && daysBetween(until, TODAY) + 1 > stripDays.value[1] * 1.1;
    });
    expect(late).toHaveLength(1);
    expect(new Set(open.map(({ until }) => until)).size).toBe(8);
  });

  test('that made no brood: one swallowed, one lost, one female that died', () => {
    const outcomes = [...ended.values()].filter(({ brood }) => !brood).map(({ outcome }) => outcome);
    expect(outcomes.sort()).toEqual(['diedHolding', 'lost', 'swallowed']);
  });

  test('are stripped only where females hold alone', () => {
    for (const { holdId, colonyId } of begun) {
      if (ended.get(holdId)?.outcome !== 'stripped') continue;
      expect(profileOf(speciesOf(room.colonyStrain.get(colonyId ?? ''))).mode).toBe('maternalMouthbrooder');
    }
  });

  test('leave one possible hybrid: a male of another strain was in the tank', () => {
    const hybrids = begun.filter(({ holdId, colonyId, parentage }) => {
      const own = room.colonyStrain.get(colonyId ?? '');
      return (
        ended.get(holdId)?.brood && parentage.sires.some(({ fishId }) => room.fish.get(fishId ?? '')?.strain !== own)
      );
    });
    expect(hybrids).toHaveLength(1);
  });
});

describe('broods', () => {
  test('never have fewer heads than leave, and those that are gone are at nought', () => {
    expect(room.ledgers.size).toBe(25);
    for (const [batch, lines] of room.ledgers) {
      const count = headCountOf(lines);
      expect(count.short, batch).toBe(0);
      for (const { balance } of count.series) expect(balance).toBeGreaterThanOrEqual(0);
      expect(count.corrections).toBeLessThanOrEqual(0);
    }
    const living = [...room.ledgers.values()].filter((lines) => headCountOf(lines).balance > 0);
    expect(living).toHaveLength(11);
  });

  test('lose fish for more than one reason', () => {
    expect(new Set(entriesOf(scenario, 'headsLost').map(({ cause }) => cause)).size).toBe(6);
  });

  test('open with no more heads than came out of the mouth', () => {
    for (const { brood } of entriesOf(scenario, 'holdEnded')) {
      if (!brood) continue;
      const opening = room.ledgers.get(brood.batchId)?.find(({ kind }) => kind === 'opening');
      const { total, eggs, wrigglers, freeSwimming, dead } = brood.numbers;
      if (opening) expect(opening.heads).toBeLessThanOrEqual(total ?? 0);
      if (wrigglers !== null) expect((eggs ?? 0) + wrigglers + (freeSwimming ?? 0) + (dead ?? 0)).toBe(total);
      const clutch = profileOf(speciesOf(room.strainOfBrood.get(brood.broodId))).clutchRange?.value;
      if (clutch && total !== null) expect(total).toBeLessThanOrEqual(clutch[1]);
    }
  });

  test('share a tank only where one batch is made of two, or is with its parents', () => {
    const last = [...room.batches].map(([batch, homes]) => ({ batch, homes, lines: room.ledgers.get(batch) ?? [] }));
    const stays = last.flatMap(({ batch, homes, lines }) => {
      const gone = lines.length > 0 && headCountOf(lines).balance === 0 ? lines.at(-1)?.on : undefined;
      return homes.map(({ on, tank }, i) => ({ batch, tank, from: on, to: homes[i + 1]?.on ?? gone ?? TODAY }));
    });
    for (const a of stays.filter(({ tank }) => /tank:[GN]/.test(tank)))
      for (const b of stays)
        if (a.batch < b.batch && a.tank === b.tank && a.from < b.to && b.from < a.to)
          expect([a.batch, b.batch]).toEqual(['batch:l2', 'batch:l3']);
  });

  test('hold one mixed batch and one foreign fry', () => {
    const joins = entriesOf(scenario, 'batchJoined');
    expect(joins).toHaveLength(1);
    const after = entriesOf(scenario, 'heldBack').filter(
      ({ batchId, onDay }) => batchId === joins[0]?.intoBatchId && onDay > (joins[0]?.onDay ?? ''),
    );
    expect(after.flatMap(({ fish }) => fish).length).toBeGreaterThan(0);
    expect(entriesOf(scenario, 'headsLeft').filter(({ note }) => note?.includes('foreign fry'))).toHaveLength(1);
  });

  test('grow: means rise from sample to sample within their noise, of no more fish than there were', () => {
    const samples = entriesOf(scenario, 'lengthSampled').filter(({ of }) => of.thing === 'batch');
    const mean = (readings: { lengthTenthsMm: number }[]) =>
      readings.reduce((sum, { lengthTenthsMm }) => sum + lengthTenthsMm, 0) / readings.length;
    expect(samples.length).toBeGreaterThan(80);
    for (const [batch, lines] of room.ledgers) {
      const own = samples.filter(({ of }) => of.id === batch);
      own.forEach(({ readings, onDay }, i) => {
        const there = headCountOf(lines.filter(({ on }) => on <= onDay)).balance;
        expect(readings.length, `${batch} ${onDay}`).toBeLessThanOrEqual(there);
        const before = own[i - 1];
        if (!before) return;
        // Two standard errors of a brood whose lengths vary by a tenth.
        const noise = 2 * 0.1 * mean(readings) * Math.sqrt(1 / readings.length + 1 / before.readings.length);
        expect(mean(readings) - mean(before.readings)).toBeGreaterThan(-noise);
      });
      const last = own.at(-1);
      const strain = room.strainOfBrood.get(batch.replace('batch:', 'brood:'));
      if (last && strain)
        expect(mean(last.readings) / 10).toBeLessThan((profileOf(speciesOf(strain)).adultMale?.value.mm ?? 0) * 1.05);
    }
  });
});

describe('water', () => {
  const tests = entriesOf(scenario, 'waterTested');
  const heaters = new Map<string, number | null>(scenario.tanks.map(({ key, heaterC }) => [key, heaterC]));
  const inTrouble = ({ tankId, onDay }: { tankId: string; onDay: string }): boolean =>
    (tankId === 'tank:B3' && onDay >= addDays(TODAY, -374) && onDay < addDays(TODAY, -335)) ||
    (tankId === 'tank:G5' && onDay >= addDays(TODAY, -4));

  test('follows the heaters, but for one that failed and one that sticks', () => {
    for (const one of tests.filter((test) => !inTrouble(test))) {
      expect(
        Math.abs((one.celsius ?? 0) - (heaters.get(one.tankId) ?? 0)),
        `${one.tankId} ${one.onDay}`,
      ).toBeLessThanOrEqual(0.8);
    }
    const failed = tests.filter(inTrouble).map(({ celsius }) => celsius ?? 0);
    expect(Math.min(...failed)).toBeLessThan(22);
    expect(Math.max(...failed)).toBeGreaterThan(28);
  });

  test('suits every species of the tank', () => {
    for (const one of tests.filter((test) => !inTrouble(test))) {
      const strains = [...room.fish].flatMap(([key, { strain }]) =>
        room.tankOf(key, one.onDay) === one.tankId && strain ? [strain] : [],
      );
      const inBatches = [...room.batches].flatMap(([batch, homes]) => {
        const lines = (room.ledgers.get(batch) ?? []).filter(({ on }) => on <= one.onDay);
        const isHere =
          homes.findLast(({ on }) => on <= one.onDay)?.tank === one.tankId &&
          lines.length > 0 &&
          headCountOf(lines).balance > 0;
        return isHere ? (room.strainOfBrood.get(batch.replace('batch:', 'brood:').replace('/2', '')) ?? []) : [];
      });
      for (const strain of new Set([...strains, ...inBatches])) {
        const { ph, temperatureC, hardnessDgh } = profileOf(speciesOf(strain));
        const says = `${one.tankId} ${one.onDay} ${strain}`;
        expect(one.ph ?? 0, says).toBeGreaterThanOrEqual(ph.value[0]);
        expect(one.ph ?? 0, says).toBeLessThanOrEqual(ph.value[1]);
        expect(one.celsius ?? 0, says).toBeGreaterThanOrEqual(temperatureC.value[0]);
        expect(one.celsius ?? 0, says).toBeLessThanOrEqual(temperatureC.value[1]);
        if (hardnessDgh) {
          expect(degreesOf(one.ghCaCo3MgL ?? 0), says).toBeGreaterThanOrEqual(hardnessDgh.value[0]);
          expect(degreesOf(one.ghCaCo3MgL ?? 0), says).toBeLessThanOrEqual(hardnessDgh.value[1]);
        }
      }
    }
  });
});

describe('people', () => {
  test('record only what their role allows', () => {
    const roles = new Map<string, Role>(scenario.members.map(({ key, role }) => [key, role]));
    for (const happening of scenario.happenings) {
      const role = roles.get(happening.by);
      const action =
        happening.what !== 'entry'
          ? 'stock:write'
          : happening.entry.kind === 'headsLeft'
            ? 'hand:over'
            : happening.entry.kind === 'headLineReversed'
              ? 'entry:correct'
              : 'entry:record';
      expect(role && may(role, action), `${happening.on} ${happening.by}`).toBe(true);
    }
  });
});

describe('orders', () => {
  test('stand in every state, the waiting list too', () => {
    expect(new Set(scenario.orders.map(({ state }) => state))).toEqual(new Set(ORDER_STATES));
    expect(new Set(scenario.requests.map(({ kind }) => kind))).toEqual(new Set(['fish', 'notice']));
    const numbers = scenario.orders.map(({ number }) => number);
    expect(new Set(numbers).size).toBe(numbers.length);
  });

  test('that were fetched took the heads that the ledger let go', () => {
    const sold = entriesOf(scenario, 'headsLeft').filter(({ how }) => how === 'sold');
    const fetched = scenario.orders.filter(
      ({ state }) => state === 'closed' || state === 'collected' || state === 'sent',
    );
    expect(sold.map(({ order }) => order).sort()).toEqual(fetched.map(({ key }) => key).sort());
    for (const { key, lines, handOverAt, madeOn } of fetched) {
      const left = sold.find(({ order }) => order === key);
      expect(lines).toHaveLength(1);
      expect([lines[0]?.brood, lines[0]?.heads]).toEqual([left?.batchId.replace('batch:', 'brood:'), left?.heads]);
      expect(handOverAt?.slice(0, 10)).toBe(left?.onDay);
      expect(madeOn < (left?.onDay ?? '')).toBe(true);
    }
  });

  test('that are open ask for no more fish than there are', () => {
    const open = scenario.orders.filter(({ state }) => !['closed', 'collected', 'sent', 'cancelled'].includes(state));
    const wanted = new Map<string, number>();
    for (const { lines } of open)
      for (const { brood, heads } of lines) wanted.set(brood, (wanted.get(brood) ?? 0) + heads);
    for (const { broodId, heads } of entriesOf(scenario, 'headsKept'))
      wanted.set(broodId, (wanted.get(broodId) ?? 0) + heads);
    for (const [brood, heads] of wanted) {
      const balance = [...room.ledgers].filter(
        ([batch]) => batch.replace(/\/\d+$/, '') === brood.replace('brood:', 'batch:'),
      );
      expect(heads, brood).toBeLessThanOrEqual(balance.reduce((sum, [, lines]) => sum + headCountOf(lines).balance, 0));
    }
  });

  test('add up: what was paid is what was asked', () => {
    for (const { state, lines, payments, depositCents } of scenario.orders) {
      const total = lines.reduce((sum, { cents }) => sum + cents, 0);
      const paid = payments.reduce((sum, { cents }) => sum + cents, 0);
      if (state === 'closed' || state === 'collected' || state === 'sent') expect(paid).toBe(total);
      if (state === 'cancelled') expect(paid).toBe(0);
      if (state === 'depositPaid' || state === 'ready') expect(paid).toBe(depositCents);
    }
  });
});

describe('photos', () => {
  const photos = scenario.happenings.flatMap((one) =>
    one.what === 'entry' && one.picture ? [{ ...one, picture: one.picture }] : [],
  );

  test('were taken on the day they show, of every kind of thing that can be photographed', () => {
    expect(photos.length).toBeGreaterThan(60);
    for (const { on, picture } of photos) expect(picture.takenAt.slice(0, 10)).toBe(on);
    const things = photos.flatMap(({ entry }) => (entry.kind === 'photoTaken' ? [entry.of.thing] : []));
    expect(new Set(things)).toEqual(new Set(['fish', 'brood', 'colony', 'hold', 'tank']));
  });

  test('of a brood over the ruler agree with what was measured that day', () => {
    const samples = entriesOf(scenario, 'lengthSampled');
    const ofBroods = photos.filter(
      ({ entry, picture }) =>
        entry.kind === 'photoTaken' &&
        entry.of.thing === 'brood' &&
        picture.drawing.setting === 'box' &&
        picture.drawing.species !== 'labidochromis-caeruleus',
    );
    expect(ofBroods.length).toBeGreaterThan(25);
    for (const { entry, on, picture } of ofBroods) {
      if (entry.kind !== 'photoTaken') continue;
      const sample = samples.find(({ of, onDay }) => onDay === on && of.id === entry.of.id.replace('brood:', 'batch:'));
      const lengths = sample?.readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10) ?? [];
      expect(picture.drawing.lengthMm).toBeGreaterThanOrEqual(Math.min(...lengths) * 0.95);
      expect(picture.drawing.lengthMm).toBeLessThanOrEqual(Math.max(...lengths) * 1.05);
    }
  });
});
