import { addColony, readColony } from '@/shared/colonies/contract';
import { recordEntry } from '@/shared/record/contract';
import type { EntryContent } from '@/shared/record/kinds';
import { addStrain } from '@/shared/strains/contract';
import { addTank } from '@/shared/tanks/contract';
import { makeId, type Person, START } from './testApp';

export const TODAY = START.slice(0, 10);

/** A tank of 450 L with a heater at 26 °C. */
export async function tankIn(person: Person, roomId: string, code: string, litres = 450): Promise<string> {
  const id = makeId();
  await person.get(addTank, {
    params: { roomId },
    body: {
      id,
      code,
      place: null,
      walkOrder: 0,
      lengthTenthsMm: null,
      widthTenthsMm: null,
      heightTenthsMm: null,
      fillTenthsMm: null,
      glassTenthsMm: null,
      standKg: null,
      litres,
      heaterC: 26,
      purpose: 'colony',
      note: null,
    },
  });
  return id;
}

/** A strain of Tropheus moorii. */
export async function strainIn(
  person: Person,
  roomId: string,
  code = 'MOKA',
  speciesId = 'tropheus-moorii',
): Promise<string> {
  const id = makeId();
  await person.get(addStrain, {
    params: { roomId },
    body: {
      id,
      code,
      speciesId,
      naming: 'described',
      scientificName: null,
      tradeName: null,
      synonyms: null,
      locality: 'Kasanga',
      localityKnown: 'known',
      provenance: 'wildCaught',
      fromWhom: null,
      acquiredOn: null,
      papers: null,
      citesSource: null,
      note: null,
    },
  });
  return id;
}

export type Colony = { strainId: string; tankId: string; colonyId: string; males: string[]; females: string[] };

/** A colony of coded wild fish in a tank of its own, in since the first of January. */
export async function colonyIn(
  person: Person,
  roomId: string,
  { code = 'MOKA', males = 2, females = 6, speciesId = 'tropheus-moorii' } = {},
): Promise<Colony> {
  const strainId = await strainIn(person, roomId, code, speciesId);
  const tankId = await tankIn(person, roomId, `T-${code}`);
  const colonyId = makeId();
  await person.get(addColony, {
    params: { roomId },
    body: {
      id: colonyId,
      code: `${code}-A`,
      strainId,
      startedOn: '2026-01-01',
      note: null,
      tankId,
      fishIds: [],
      newFish: { males, females, unsexed: 0, lotId: null, coded: true },
    },
  });
  const { members } = await person.get(readColony, { params: { roomId, colonyId } });
  const of = (sex: string) => members.filter((fish) => fish.sex === sex).map(({ id }) => id);
  return { strainId, tankId, colonyId, males: of('male'), females: of('female') };
}

/** Records an entry as the phone does; fails the test unless it is stored. */
export async function record(person: Person, roomId: string, content: EntryContent, id = makeId()) {
  return person.get(recordEntry, { params: { roomId }, body: { id, madeAt: START, dependsOn: [], content } });
}

/** The same, for refusals: answers whatever comes back. */
export const tryRecord = (person: Person, roomId: string, content: unknown, id = makeId()) =>
  person.ask(recordEntry, { params: { roomId }, body: { id, madeAt: START, dependsOn: [], content } });

export const NO_NUMBERS = { total: null, eggs: null, wrigglers: null, freeSwimming: null, dead: null, deformed: null };

/** A hold that began ten to twelve days before the day, by this female and either male. */
export async function holdIn(
  person: Person,
  roomId: string,
  colony: Colony,
  { holderId = colony.females[0] ?? null, from = '2026-04-02', until = '2026-04-04' } = {},
) {
  const holdId = makeId();
  await record(person, roomId, {
    kind: 'holdingSeen',
    holdId,
    tankId: colony.tankId,
    colonyId: colony.colonyId,
    holderId,
    plan: 'strip',
    note: null,
    firstSeenOn: until,
    spawnEarliest: from,
    spawnLatest: until,
    parentage: {
      paternity: 'single',
      basis: null,
      sires: colony.males.map((fishId, i) => ({ fishId, weight: i === 0 ? 3 : 1 })),
      dams: holderId ? [{ fishId: holderId, weight: 1 }] : [],
    },
  });
  return holdId;
}

/** A brood stripped of a hold, its head count opened with so many. */
export async function broodIn(
  person: Person,
  roomId: string,
  colony: Colony,
  { opening = 34, onDay = '2026-04-28', code = 'MOKA-26A' } = {},
) {
  const holdId = await holdIn(person, roomId, colony);
  const tankId = await tankIn(person, roomId, `N-${code}`, 60);
  const [broodId, batchId] = [makeId(), makeId()];
  await record(person, roomId, {
    kind: 'holdEnded',
    holdId,
    onDay,
    outcome: 'stripped',
    note: null,
    brood: { broodId, batchId, code, tankId, opening, numbers: { ...NO_NUMBERS, total: opening + 2, dead: 2 } },
  });
  return { holdId, broodId, batchId, tankId };
}
