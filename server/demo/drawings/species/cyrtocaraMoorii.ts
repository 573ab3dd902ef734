import type { Anatomy, Colouring, Drawn, FinPaint } from '../anatomy';

/** A large pale-blue fish with thick lips; the hump on the forehead grows with age and is largest in males. */
const anatomy: Anatomy = {
  standard: 0.79,
  back: [
    [0, -0.01],
    [0.01, 0.012],
    [0.035, 0.036],
    [0.062, 0.068],
    [0.085, 0.106],
    [0.115, 0.137],
    [0.16, 0.152],
    [0.21, 0.151],
    [0.27, 0.153],
    [0.38, 0.147],
    [0.54, 0.114],
    [0.66, 0.072],
    [0.73, 0.052],
    [0.79, 0.051],
  ],
  belly: [
    [0, 0.03],
    [0.02, 0.044],
    [0.08, 0.068],
    [0.18, 0.102],
    [0.3, 0.124],
    [0.45, 0.118],
    [0.58, 0.086],
    [0.69, 0.056],
    [0.79, 0.05],
  ],
  hump: [
    [0.03, 0],
    [0.085, 0.032],
    [0.13, 0.034],
    [0.2, 0.016],
    [0.28, 0],
  ],
  gill: 0.258,
  eye: { x: 0.128, y: -0.026, r: 0.0255 },
  mouth: { y: 0.022, length: 0.062, drop: 0.008, lip: 0.016 },
  dorsal: {
    from: 0.24,
    to: 0.7,
    spines: 15,
    rays: 12,
    height: [
      [0, 0.03],
      [0.12, 0.07],
      [0.4, 0.074],
      [0.66, 0.078],
      [0.86, 0.126],
      [0.94, 0.12],
      [1, 0.04],
    ],
    lean: [
      [0, 46],
      [0.55, 52],
      [0.88, 66],
      [1, 70],
    ],
    notch: 0.12,
  },
  anal: {
    from: 0.53,
    to: 0.69,
    spines: 3,
    rays: 10,
    height: [
      [0, 0.03],
      [0.3, 0.07],
      [0.8, 0.125],
      [0.94, 0.115],
      [1, 0.04],
    ],
    lean: [
      [0, 42],
      [1, 68],
    ],
    notch: 0.08,
  },
  tail: { span: 0.118, fork: 0.22, rays: 16, lobe: 1.6 },
  pelvic: { x: 0.29, v: 0.96, length: 0.2, angle: 38, spread: 30, rays: 6, point: 0.95 },
  pectoral: { x: 0.278, v: 0.26, length: 0.2, angle: 18, spread: 42, rays: 13, point: 0.5 },
  scales: { columns: 33, rows: 17 },
};

const skyFin: FinPaint = {
  root: '#5f8fc4',
  edge: '#86b4e2',
  rootCover: 0.95,
  edgeCover: 0.82,
  rayColour: '#274a78',
  rayCover: 0.42,
};

const female: Colouring = {
  tones: [
    [-1, '#4f79aa'],
    [-0.5, '#6e9fd2'],
    [-0.1, '#8abae8'],
    [0.3, '#9cc8ee'],
    [0.7, '#a6caea'],
    [1, '#88a8c8'],
  ],
  marks: [
    { kind: 'patch', x: 0.37, v: -0.15, rx: 0.035, rv: 0.26, colour: '#24405f', cover: 0.5, soft: 'wide' },
    { kind: 'patch', x: 0.56, v: -0.1, rx: 0.032, rv: 0.3, colour: '#24405f', cover: 0.45, soft: 'wide' },
    { kind: 'patch', x: 0.76, v: 0, rx: 0.02, rv: 0.5, colour: '#24405f', cover: 0.3, soft: 'wide' },
    { kind: 'patch', x: 0.45, v: 0.35, rx: 0.24, rv: 0.4, colour: '#d2eaff', cover: 0.3, soft: 'wide' },
  ],
  dorsal: { ...skyFin, bands: [{ from: 0.93, to: 1, colour: '#e8f4ff', cover: 0.5 }] },
  anal: skyFin,
  tail: skyFin,
  pelvic: { ...skyFin, edge: '#a8cced' },
  pectoral: { ...skyFin, root: '#9cc4ea', edge: '#c6def4', rootCover: 0.36, edgeCover: 0.12, rayCover: 0.22 },
  iris: '#c0a05c',
  irisRim: '#32404e',
  lips: '#86b2de',
  scaleEdge: 0.22,
  sparkle: '#eef8ff',
  sparkleCover: 0.18,
};

const male: Colouring = {
  ...female,
  tones: female.tones.map(([v, colour]) => [v, colour === '#8abae8' ? '#6fa6e2' : colour] as const),
  marks: [
    { kind: 'patch', x: 0.11, v: -0.85, rx: 0.09, rv: 0.5, colour: '#9ad0ff', cover: 0.45, soft: 'wide' },
    { kind: 'patch', x: 0.4, v: 0.1, rx: 0.3, rv: 0.6, colour: '#4f90dc', cover: 0.35, soft: 'wide' },
    ...female.marks.slice(0, 2),
  ],
  lips: '#6fa2d8',
};

const paleFin: FinPaint = { ...skyFin, root: '#98a6b0', edge: '#c2d0da', rayColour: '#5a6874', edgeCover: 0.6 };

const juvenile: Colouring = {
  ...female,
  dorsal: paleFin,
  anal: paleFin,
  tail: paleFin,
  pelvic: paleFin,
  lips: '#9aaab4',
  tones: [
    [-1, '#7a858e'],
    [-0.3, '#a4b0b8'],
    [0.3, '#c6d2d8'],
    [1, '#d2d8da'],
  ],
  marks: female.marks.slice(0, 3),
  scaleEdge: 0.14,
};

export const cyrtocaraMoorii: Drawn = {
  anatomy,
  adultMm: 195,
  colours: { male, female, juvenile },
  egg: { mm: 3.8, colour: '#dcae54' },
};
