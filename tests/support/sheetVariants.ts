import type { SheetContent } from '../../shared/sheets/content';
import { animal, duboisi, wild } from './sheetContent';

type Entry = SheetContent['ancestry'][number];

const [brood, ...ancestors] = duboisi.ancestry;
if (!brood) throw new Error('the example has an ancestry');

/** Males bred from one wild pair, ids from 100 on. */
const brothers = (count: number): Entry[] =>
  Array.from({ length: count }, (_, i) => ({
    ...wild(100 + i, `DUMA-B${String(i + 1).padStart(2, '0')}`, 'male'),
    origin: 'bred',
    generation: { low: 1, high: 2, oneParentWild: false },
    sire: { kind: 'known', id: animal(1) },
    dam: { kind: 'known', id: animal(2) },
  }));

const candidates = (count: number) =>
  Array.from({ length: count }, (_, i) => ({ id: animal(100 + i), weight: count - i }));

/** As many possible sires as given, and a male not known; each of the young may have another. */
const withSires = (count: number): SheetContent => ({
  ...duboisi,
  ancestry: [
    {
      ...brood,
      sire: { kind: 'mixed', candidates: [...candidates(count), { id: null, weight: 2 }] },
      dam: { kind: 'known', id: animal(12) },
    },
    ...ancestors,
    ...brothers(count),
  ],
});

const { id, kind, code, sex, born, origin, generation, strain, room } = brood;

/** A batch of two broods: each fish comes of one pair or of the other. */
const mixedBatch: SheetContent = {
  ...duboisi,
  ancestry: [
    {
      ...{ id, kind, code, sex, born, origin, generation, strain, room },
      from: [
        { sire: { kind: 'known', id: animal(10) }, dam: { kind: 'known', id: animal(12) }, weight: 21 },
        { sire: { kind: 'known', id: animal(11) }, dam: { kind: 'known', id: animal(2) }, weight: 9 },
      ],
    },
    ...ancestors,
  ],
};

const oneFish: SheetContent = {
  ...duboisi,
  subject: {
    id: animal(10),
    kind: 'fish',
    code: 'DUMA-A01',
    heads: { male: 1, female: 0, unsexed: 0 },
    sexSure: false,
  },
  generation: { low: 1, high: 1, oneParentWild: false },
  inbreeding: { f: 0, outcomes: [{ f: 0, probability: 1 }], generationsKnown: 1 },
  ancestry: ancestors.filter(({ id }) => [animal(10), animal(1), animal(2)].includes(id)),
  birth: { spawned: { from: '2022-03-02', to: '2022-03-02' }, taken: null, arrived: null, raised: null },
  growth: null,
  water: null,
};

const wildFish: SheetContent = {
  ...oneFish,
  subject: { ...oneFish.subject, id: animal(1), code: 'DUMA-W01', sexSure: true },
  generation: { low: 0, high: 0, oneParentWild: false },
  inbreeding: { f: 0, outcomes: [{ f: 0, probability: 1 }], generationsKnown: 0 },
  ancestry: [wild(1, 'DUMA-W01', 'male')],
  birth: { spawned: null, taken: null, arrived: '2018-06-14', raised: null },
};

const hybrid: SheetContent = {
  ...duboisi,
  strain: {
    claim: 'possibleHybrid',
    kinds: [
      { scientific: 'Tropheus sp. "Ikola"', locality: 'Ikola' },
      { scientific: 'Tropheus duboisi', locality: 'Maswa' },
    ],
  },
  generation: null,
  inbreeding: null,
  known: Array.from({ length: 22 }, (_, i) => ({
    on: '2025-10-12',
    what: `Fish ${i} was moved to another tank while a heater was replaced, and moved back the next morning.`,
    how: 'seen',
    by: 'Pim Roswell',
  })),
};

const tradeName: SheetContent = {
  ...duboisi,
  strain: {
    claim: 'strain',
    code: 'TSRR',
    scientific: 'Tropheus sp. "Red Rainbow"',
    naming: 'undescribed',
    tradeName: 'Red Rainbow Kasanga',
    synonyms: ['Tropheus moorii "Kasanga"'],
    locality: { known: 'trade', name: 'Kasanga', waters: null },
    lineBred: 'red dorsal, since about 2015',
    founders: { provenance: 'unknown', from: null, on: null, papers: null },
    source: 'F',
  },
  treatments: [{ what: 'Salt, 2 g/L', why: 'a torn fin', from: '2026-06-15', to: null }],
};

const long = 'of the keepers beside the eastern water meadows below the old mill';
const longNames: SheetContent = {
  ...duboisi,
  issue: {
    ...duboisi.issue,
    number: '2026-0031-SECOND-PRINT',
    replaces: { number: '2026-0018', because: `the dam ${long}` },
  },
  fishroom: { ...duboisi.fishroom, name: `Żółwia Łąka fishroom ${long}`, place: `Łódź, ${long}` },
  subject: { ...duboisi.subject, code: 'LARKMOOR-DUBOISI-MASWA-25H' },
  ancestry: duboisi.ancestry.map((entry) => ({
    ...entry,
    code: `LARKMOOR-DUBOISI-MASWA-${entry.code.slice(-3)}`,
    strain: `Maswa ${long}`,
    room: `a fishroom ${long}`,
  })),
  known: [{ on: '2025-10-18', what: `Seen ${long}`, how: `by eye ${long}`, by: `Ines Hallworth ${long}` }],
};

/** Sheets of every kind, by what is special about them. */
export const variants: Record<string, SheetContent> = {
  'a brood with two possible sires': duboisi,
  'a brood with five possible sires': withSires(5),
  'a brood with fourteen possible sires': withSires(14),
  'a mixed batch of two pairs': mixedBatch,
  'one fish, sex not certain': oneFish,
  'a wild fish': wildFish,
  'a possible hybrid with a long record': hybrid,
  'an undescribed species under a trade name, treated': tradeName,
  'long names everywhere': longNames,
};
