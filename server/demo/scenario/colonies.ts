import type { Ago, Key } from './shape';
import type { StrainCode } from './strains';

export type ColonyStory = {
  code: string;
  strain: StrainCode;
  on: Ago;
  note: string | null;
  /** Where it lived, first where it began. */
  homes: { on: Ago; tank: string; note?: string }[];
};

/** Colonies without members of their own at first wait for fish that are held back from broods. */
export const COLONIES: ColonyStory[] = [
  {
    code: 'MOIL-A',
    strain: 'MOIL',
    on: -735,
    note: null,
    homes: [
      { on: -735, tank: 'Q1' },
      { on: -707, tank: 'R1', note: 'Out of quarantine, all at once' },
    ],
  },
  {
    code: 'LEMP-A',
    strain: 'LEMP',
    on: -731,
    note: 'The females cannot be told apart',
    homes: [
      { on: -731, tank: 'Q2' },
      { on: -709, tank: 'R2' },
    ],
  },
  { code: 'LEMP-B', strain: 'LEMP', on: -425, note: 'Young of LEMP-A', homes: [{ on: -425, tank: 'R3' }] },
  { code: 'MEUT-A', strain: 'MEUT', on: -690, note: null, homes: [{ on: -690, tank: 'R4' }] },
  { code: 'ESMI-A', strain: 'ESMI', on: -735, note: null, homes: [{ on: -735, tank: 'B1' }] },
  {
    code: 'ESMI-B',
    strain: 'ESMI',
    on: -550,
    note: 'Young of ESMI-A, later their own young',
    homes: [{ on: -550, tank: 'B2' }],
  },
  {
    code: 'CALI-A',
    strain: 'CALI',
    on: -729,
    note: null,
    homes: [
      { on: -729, tank: 'B3' },
      { on: -372, tank: 'B1', note: 'Heater of B3 failed: with ESMI-A until it is replaced' },
      { on: -331, tank: 'B3', note: 'New heater runs since four days' },
    ],
  },
  { code: 'CATE-A', strain: 'CATE', on: -720, note: null, homes: [{ on: -720, tank: 'R5' }] },
];

export type Arrival = {
  lot: string;
  strain: StrainCode;
  on: Ago;
  /** A colony's code, or the tank of fish that are in none yet. */
  colony: string | null;
  tank?: string;
  /** Numbers within the colony; a fish of an uncoded group is named by its place in it. */
  males: readonly number[];
  females: readonly number[];
  /** Females too alike to tell apart have no code until someone does. */
  anonymousFemales?: number;
};

export const ARRIVALS: Arrival[] = [
  {
    lot: 'MOIL-1',
    strain: 'MOIL',
    on: -735,
    colony: 'MOIL-A',
    males: [1, 2, 3, 4, 5],
    females: [6, 7, 8, 9, 10, 11, 12, 13, 14, 15, 16, 17],
  },
  { lot: 'ESMI-1', strain: 'ESMI', on: -735, colony: 'ESMI-A', males: [1, 2], females: [3, 4, 5, 6] },
  { lot: 'ESMI-2', strain: 'ESMI', on: -733, colony: 'ESMI-A', males: [], females: [7, 8, 9, 10] },
  {
    lot: 'LEMP-1',
    strain: 'LEMP',
    on: -731,
    colony: 'LEMP-A',
    males: [1, 2, 3, 4, 5],
    females: [],
    anonymousFemales: 9,
  },
  { lot: 'CALI-1', strain: 'CALI', on: -729, colony: 'CALI-A', males: [1, 2], females: [3, 4, 5, 6, 7, 8] },
  { lot: 'CATE-1', strain: 'CATE', on: -720, colony: 'CATE-A', males: [1, 2], females: [3, 4, 5] },
  { lot: 'MEUT-1', strain: 'MEUT', on: -690, colony: 'MEUT-A', males: [1, 2, 3], females: [4, 5, 6, 7, 8, 9] },
  { lot: 'CALI-2', strain: 'CALI', on: -9, colony: null, tank: 'Q2', males: [], females: [1, 2, 3] },
];

type Exit = { on: Ago; how: 'died' | 'sold' | 'given' | 'lost'; cause: string | null; note: string | null };

/** How single fish left. One that died holding leaves by its hold. */
export const EXITS: Record<Key, Exit> = {
  'fish:MOIL-A09': { on: -721, how: 'died', cause: 'Did not eat since arrival', note: null },
  'fish:MOIL-A02': { on: -255, how: 'died', cause: 'Driven by MOIL-A04', note: 'Found behind the filter, fins torn' },
  'fish:MEUT-A09': { on: -300, how: 'died', cause: 'Jumped', note: 'Cover was open after feeding' },
  'fish:ESMI-A07': { on: -480, how: 'died', cause: null, note: 'No marks on her' },
  'fish:ESMI-B05': { on: -455, how: 'sold', cause: null, note: 'One male too many' },
  'fish:CALI-A08': { on: -250, how: 'given', cause: null, note: 'To Pim, for the school' },
};

export type Finding = { fish: Key; on: Ago } & (
  | { kind: 'sex'; sex: 'male' | 'female' | 'unknown'; how: 'seen' | 'vented'; certain: boolean; note?: string }
  | { kind: 'dominant'; note?: string }
  | { kind: 'mark'; mark: string | null; note?: string }
  | { kind: 'toldApart'; code: string; mark: string }
);

const sexed = (on: Ago, stem: string, sex: 'male' | 'female', numbers: readonly number[]): Finding[] =>
  numbers.map((number) => ({ fish: fishKey(stem, number), on, kind: 'sex', sex, how: 'vented', certain: true }));

export const fishCode = (stem: string, number: number): string =>
  `${stem}${/-[A-Z]+$/.test(stem) ? '' : '-'}${String(number).padStart(2, '0')}`;
export const fishKey = (stem: string, number: number): Key => `fish:${fishCode(stem, number)}`;

const dominant = (on: Ago, fish: Key, note?: string): Finding => ({
  fish,
  on,
  kind: 'dominant',
  ...(note ? { note } : {}),
});

export const FINDINGS: Finding[] = [
  dominant(-690, 'fish:MOIL-A02', 'Holds the left third of the tank'),
  dominant(-326, 'fish:MOIL-A04', 'Took the place of MOIL-A02'),
  dominant(-700, 'fish:LEMP-A01'),
  dominant(-350, 'fish:LEMP-A03'),
  dominant(-300, 'fish:LEMP-B05'),
  dominant(-680, 'fish:MEUT-A01', 'Largest crater'),
  dominant(-230, 'fish:MEUT-A02'),
  dominant(-700, 'fish:ESMI-A01'),
  dominant(-460, 'fish:ESMI-B01'),
  dominant(-250, 'fish:ESMI-B09'),
  dominant(-700, 'fish:CALI-A01'),
  dominant(-650, 'fish:CATE-A01', 'Holds shells 1 to 4'),
  ...sexed(-330, 'LEMP-B', 'male', [2, 5, 10]),
  ...sexed(-330, 'LEMP-B', 'female', [1, 3, 4, 6, 7, 8, 9, 11, 12, 13]),
  ...sexed(-470, 'ESMI-B', 'male', [1, 5, 9]),
  ...sexed(-470, 'ESMI-B', 'female', [2, 3, 4, 6, 7, 8, 10, 11, 12]),
  ...sexed(-190, 'ESMI-B', 'female', [14, 15, 16]),
  { fish: 'fish:ESMI-B13', on: -190, kind: 'sex', sex: 'female', how: 'seen', certain: false, note: 'Orange still' },
  { fish: 'fish:ESMI-B13', on: -150, kind: 'sex', sex: 'male', how: 'vented', certain: true, note: 'Turning blue' },
  ...sexed(-60, 'MOIL', 'male', [1, 4]),
  ...sexed(-60, 'MOIL', 'female', [2, 3, 5]),
  { fish: 'fish:MOIL-A02', on: -700, kind: 'mark', mark: 'Notch in the upper edge of the tail' },
  { fish: 'fish:MOIL-A04', on: -700, kind: 'mark', mark: 'Dark blotch over the right eye' },
  { fish: 'fish:MOIL-A06', on: -690, kind: 'mark', mark: 'White scale on the left gill cover' },
  { fish: 'fish:MOIL-A06', on: -240, kind: 'mark', mark: null, note: 'The white scale has grown out' },
  { fish: 'fish:MOIL-A06', on: -205, kind: 'mark', mark: 'Split third spine of the dorsal fin' },
  { fish: 'fish:MOIL-A10', on: -690, kind: 'mark', mark: 'Two yellow bars that join, left side' },
  { fish: 'fish:MEUT-A08', on: -420, kind: 'mark', mark: 'Spot before the tail missing, right side' },
  { fish: 'fish:ESMI-B06', on: -440, kind: 'mark', mark: 'Pale tip of the left pelvic fin' },
  { fish: 'fish:LEMP-A/f3', on: -602, kind: 'toldApart', code: 'LEMP-A06', mark: 'Nick in the left gill cover' },
  { fish: 'fish:CATE-A01', on: -650, kind: 'mark', mark: 'Largest, lower jaw scarred' },
];
