import type { Tank } from './shape';

type Purpose = Tank['purpose'];
/** Code, place, sides in cm, water depth in cm, heater set point in °C, stand in kg, purpose. */
type Row = readonly [
  string,
  string,
  readonly [number, number, number],
  number,
  number,
  number | null,
  Purpose,
  string?,
];

const ROWS: readonly Row[] = [
  ['R1', 'Long wall, bottom left', [180, 65, 65], 60, 26, 90, 'colony'],
  ['R2', 'Long wall, bottom right', [150, 60, 60], 55, 26, 75, 'colony', 'Covers with clips: they jump'],
  ['R3', 'Long wall, top left', [150, 60, 55], 50, 26, null, 'colony', 'Covers with clips: they jump'],
  ['R4', 'Long wall, top right', [150, 60, 45], 40, 26, null, 'colony', '5 cm of fine sand'],
  ['R5', 'Corner', [110, 50, 50], 45, 25.5, 45, 'colony', 'Caves and shells, numbered from the left'],
  ['R6', 'Window side, bottom', [150, 60, 55], 50, 26, 75, 'colony'],
  ['B1', 'Door side, bottom', [150, 55, 55], 50, 26.5, 70, 'colony'],
  ['B2', 'Door side, middle', [150, 55, 55], 50, 26.5, null, 'colony'],
  ['B3', 'Door side, top', [130, 50, 50], 45, 26, null, 'colony'],
  ['D1', 'Hall upstairs', [160, 60, 60], 54, 25.5, 80, 'display'],
  ...['G1', 'G2', 'G3', 'G4', 'G5', 'G6', 'G7', 'G8', 'G9'].map(
    (code, i): Row => [
      code,
      `Middle rack, row ${1 + Math.floor(i / 3)}`,
      [100, 50, 40],
      35,
      i % 3 === 2 ? 25.5 : 26,
      null,
      'growOut',
    ],
  ),
  ...['N1', 'N2', 'N3', 'N4', 'N5', 'N6'].map(
    (code, i): Row => [code, `Nursery shelf, ${i < 3 ? 'upper' : 'lower'}`, [60, 35, 35], 30, 26.5, null, 'nursery'],
  ),
  ['E1', 'Tumbler bench', [40, 25, 25], 20, 26.5, null, 'nursery', 'Two tumblers'],
  ['E2', 'Tumbler bench', [40, 25, 25], 20, 26.5, null, 'nursery', 'Two tumblers'],
  ['E3', 'Tumbler bench', [40, 25, 25], 20, 26.5, null, 'nursery', 'One tumbler, one net box'],
  ['Q1', 'Wash room', [100, 45, 45], 40, 26, 40, 'quarantine', 'Own nets and buckets'],
  ['Q2', 'Wash room', [80, 40, 40], 35, 26, null, 'quarantine', 'Own nets and buckets'],
];

/** Glass of the usual strength for a tank of this height, mm. Common practice, no source. */
const glassMm = (heightCm: number): number => (heightCm > 55 ? 12 : heightCm > 40 ? 10 : 6);

const tenths = (cm: number): number => cm * 100;

export const TANKS: Tank[] = ROWS.map(
  ([code, place, [length, width, height], fill, heaterC, standKg, purpose, note], i) => ({
    key: `tank:${code}`,
    code,
    place,
    walkOrder: (i + 1) * 10,
    lengthTenthsMm: tenths(length),
    widthTenthsMm: tenths(width),
    heightTenthsMm: tenths(height),
    fillTenthsMm: tenths(fill),
    glassTenthsMm: glassMm(height) * 10,
    standKg,
    litres: Math.round((length * width * fill) / 1000),
    heaterC,
    purpose,
    note: note ?? null,
  }),
);

/** The water a tank is run with: hard and alkaline for fish of Lake Tanganyika, a little softer for those of Lake Malawi. */
export const waterOf = (code: string): 'tanganyika' | 'malawi' => (code.startsWith('B') ? 'malawi' : 'tanganyika');
