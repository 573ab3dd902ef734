import { animalId } from '../../shared/sheets/ancestry';
import { cautionsFor } from '../../shared/sheets/cautions';
import type { SheetContent } from '../../shared/sheets/content';

const ROOM = '01890a5d-ac96-774b-bcce-b302099a8057';

/** Ids of an invented fishroom: `local(7)` always gives the same one. */
const local = (n: number): string => `01890a5d-ac96-774b-8cce-${n.toString(16).padStart(12, '0')}`;
export const animal = (n: number): string => animalId(ROOM, local(n));

type Entry = SheetContent['ancestry'][number];

const UNKNOWN = { kind: 'unknown' } as const;
const known = (n: number) => ({ kind: 'known', id: animal(n) }) as const;

export const wild = (n: number, code: string, sex: 'male' | 'female'): Entry => ({
  id: animal(n),
  kind: 'fish',
  code,
  sex,
  born: null,
  origin: 'wild',
  generation: { low: 0, high: 0, oneParentWild: false },
  strain: 'Maswa',
  room: null,
  sire: UNKNOWN,
  dam: UNKNOWN,
});

const bred = (
  n: number,
  code: string,
  sex: Entry['sex'],
  parents: Pick<Extract<Entry, { sire: unknown }>, 'sire' | 'dam'>,
): Entry => ({
  ...wild(n, code, 'male'),
  ...parents,
  sex,
  born: '2022-03-02',
  origin: 'bred',
  generation: { low: 1, high: 1, oneParentWild: false },
});

/** A brood with two possible sires, one of which had two possible sires himself; everything a sheet can say is said. */
export const duboisi: SheetContent = {
  format: 1,
  issue: { number: '2026-0031', on: '2026-06-20', by: 'Ines Hallworth, keeper', order: '1042', replaces: null },
  fishroom: {
    id: ROOM,
    name: 'Larkmoor Fishroom',
    place: 'Tavistock',
    address: 'https://larkmoor.example',
    keyId: 'kPrK_qmxVWaYVA9wwBF6Iuo3vVzz7TxHCTwXBygrS4k',
  },
  subject: {
    id: animal(20),
    kind: 'brood',
    code: 'DUMA-25H',
    heads: { male: 0, female: 0, unsexed: 6 },
    sexSure: true,
  },
  strain: {
    claim: 'strain',
    code: 'DUMA',
    scientific: 'Tropheus duboisi',
    naming: 'described',
    tradeName: null,
    synonyms: [],
    locality: { known: 'known', name: 'Maswa', waters: 'Lake Tanganyika' },
    lineBred: null,
    founders: { provenance: 'wildCaught', from: 'Oduya Imports', on: '2018-06', papers: 'invoice' },
    source: null,
  },
  birth: {
    spawned: { from: '2025-10-16', to: '2025-10-18' },
    taken: { how: 'stripped', on: '2025-11-09', holdDay: 24 },
    arrived: null,
    raised: { alive: 29, of: 34 },
  },
  generation: { low: 2, high: 2, oneParentWild: false },
  inbreeding: {
    // 7 of 33 days the second male, whose kinship with the dam is (0.4 / 2 + 1 / 2) / 4.
    f: (7 / 33) * 0.175,
    outcomes: [
      { f: 0, probability: 26 / 33 },
      { f: 0.125, probability: (7 / 33) * 0.6 },
      { f: 0.25, probability: (7 / 33) * 0.4 },
    ],
    generationsKnown: 2,
  },
  ancestry: [
    bred(20, 'DUMA-25H', 'unsexed', {
      sire: {
        kind: 'oneOf',
        key: animal(90),
        candidates: [
          { id: animal(10), weight: 26 },
          { id: animal(11), weight: 7 },
        ],
      },
      dam: known(12),
    }),
    bred(10, 'DUMA-A01', 'male', { sire: known(1), dam: known(2) }),
    bred(11, 'DUMA-A02', 'male', {
      sire: {
        kind: 'oneOf',
        key: animal(91),
        candidates: [
          { id: animal(1), weight: 6 },
          { id: animal(3), weight: 4 },
        ],
      },
      dam: known(4),
    }),
    bred(12, 'DUMA-A04', 'female', { sire: known(3), dam: known(4) }),
    wild(1, 'DUMA-W01', 'male'),
    wild(2, 'DUMA-W02', 'female'),
    wild(3, 'DUMA-W03', 'male'),
    wild(4, 'DUMA-W04', 'female'),
  ],
  growth: {
    measure: 'total',
    samples: [
      { on: '2025-11-09', n: 12, meanMm: 17, sdMm: 0.9 },
      { on: '2025-12-02', n: 15, meanMm: 22.1, sdMm: 1.4 },
      { on: '2026-01-01', n: 15, meanMm: 27, sdMm: 2.1 },
      { on: '2026-01-31', n: 20, meanMm: 32.9, sdMm: 2.7 },
      { on: '2026-03-04', n: 20, meanMm: 36.2, sdMm: 3.3 },
      { on: '2026-04-04', n: 20, meanMm: 42.6, sdMm: 3.7 },
      { on: '2026-05-11', n: 20, meanMm: 46.8, sdMm: 4.2 },
    ],
    fitted: {
      model: 'gompertz',
      points: [
        { on: '2025-11-09', meanMm: 17.1 },
        { on: '2025-12-15', meanMm: 24.6 },
        { on: '2026-01-20', meanMm: 31 },
        { on: '2026-02-25', meanMm: 36.6 },
        { on: '2026-04-01', meanMm: 41.8 },
        { on: '2026-05-11', meanMm: 47.2 },
      ],
    },
  },
  water: {
    from: '2025-11-12',
    to: '2026-06-14',
    readings: [
      { what: 'celsius', mean: 25.8, low: 25, high: 26.4 },
      { what: 'ph', mean: 8.8, low: 8.6, high: 9 },
      { what: 'kh', mean: 196.3, low: 178.5, high: 214.2 },
      { what: 'gh', mean: 232, low: 214.2, high: 249.9 },
      { what: 'nitrate', mean: 4.07, low: 1.81, high: 6.78 },
      { what: 'conductivity', mean: 612, low: 580, high: 655 },
    ],
  },
  known: [
    {
      on: '2018-06',
      what: 'Founders bought as collected at Maswa.',
      how: 'the importer’s invoice',
      by: 'Ines Hallworth',
    },
    { on: '2025-10-18', what: 'Dam seen holding; not holding two days before.', how: 'seen', by: 'Pim Roswell' },
    {
      on: '2025-10-18',
      what: 'Two males were in the tank.',
      how: 'shares: days each was dominant in the 33 before',
      by: null,
    },
    { on: '2025-11-09', what: 'Stripped, 34 free-swimming.', how: 'counted', by: 'Ines Hallworth' },
    { on: null, what: 'No DNA test was made.', how: null, by: null },
  ],
  photos: { count: 0, shown: null },
  treatments: [],
  cautions: cautionsFor({ treated: false }),
};
