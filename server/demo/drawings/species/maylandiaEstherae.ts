import type { Anatomy, Colouring, Drawn, FinPaint } from '../anatomy';

/** A stout rock grazer with a rounded snout and egg spots on the anal fin of the male. */
const anatomy: Anatomy = {
  standard: 0.8,
  back: [
    [0, 0],
    [0.008, 0.018],
    [0.03, 0.053],
    [0.07, 0.087],
    [0.13, 0.116],
    [0.22, 0.139],
    [0.34, 0.143],
    [0.5, 0.122],
    [0.64, 0.08],
    [0.73, 0.056],
    [0.8, 0.055],
  ],
  belly: [
    [0, 0.03],
    [0.02, 0.053],
    [0.08, 0.086],
    [0.18, 0.116],
    [0.32, 0.134],
    [0.48, 0.121],
    [0.6, 0.09],
    [0.7, 0.06],
    [0.8, 0.054],
  ],
  gill: 0.24,
  eye: { x: 0.108, y: -0.032, r: 0.0295 },
  mouth: { y: 0.02, length: 0.058, drop: 0.014, lip: 0.013 },
  dorsal: {
    from: 0.21,
    to: 0.71,
    spines: 18,
    rays: 9,
    height: [
      [0, 0.03],
      [0.1, 0.07],
      [0.4, 0.082],
      [0.68, 0.086],
      [0.86, 0.135],
      [0.94, 0.13],
      [1, 0.05],
    ],
    lean: [
      [0, 46],
      [0.5, 50],
      [0.85, 64],
      [1, 68],
    ],
    notch: 0.14,
  },
  anal: {
    from: 0.53,
    to: 0.7,
    spines: 3,
    rays: 8,
    height: [
      [0, 0.035],
      [0.3, 0.08],
      [0.75, 0.135],
      [0.92, 0.125],
      [1, 0.05],
    ],
    lean: [
      [0, 40],
      [1, 66],
    ],
    notch: 0.1,
  },
  tail: { span: 0.112, fork: 0.12, rays: 16, lobe: 1.8 },
  pelvic: { x: 0.285, v: 0.96, length: 0.2, angle: 38, spread: 32, rays: 6, point: 0.95 },
  pectoral: { x: 0.262, v: 0.28, length: 0.19, angle: 18, spread: 48, rays: 13, point: 0.35 },
  scales: { columns: 30, rows: 16 },
};

const orangeFin: FinPaint = {
  root: '#d46f24',
  edge: '#f0a350',
  rootCover: 0.95,
  edgeCover: 0.8,
  rayColour: '#7a3410',
  rayCover: 0.42,
};

const female: Colouring = {
  tones: [
    [-1, '#a8541c'],
    [-0.5, '#d4702a'],
    [-0.1, '#ee8c38'],
    [0.3, '#f59d4a'],
    [0.7, '#f6ae68'],
    [1, '#df9658'],
  ],
  marks: [
    {
      kind: 'bars',
      at: [0.3, 0.38, 0.46, 0.54, 0.62, 0.7],
      width: 0.036,
      from: -1,
      to: 0.5,
      taper: 0.4,
      colour: '#b3581e',
      cover: 0.16,
      soft: 'soft',
    },
    { kind: 'patch', x: 0.38, v: 0.25, rx: 0.2, rv: 0.45, colour: '#ffc07a', cover: 0.35, soft: 'wide' },
    { kind: 'patch', x: 0.08, v: -0.5, rx: 0.12, rv: 0.7, colour: '#b4561f', cover: 0.35, soft: 'wide' },
  ],
  dorsal: { ...orangeFin, bands: [{ from: 0.92, to: 1, colour: '#ffd9a0', cover: 0.5 }] },
  anal: {
    ...orangeFin,
    spots: [{ t: [0.6, 0.8], s: [0.3, 0.6], columns: 1, rows: 1, size: 0.01, colour: '#f5d860', cover: 0.6 }],
  },
  tail: orangeFin,
  pelvic: { ...orangeFin, edge: '#f6b870' },
  pectoral: { ...orangeFin, root: '#f3b26a', edge: '#f8d6a8', rootCover: 0.4, edgeCover: 0.14, rayCover: 0.24 },
  iris: '#c98a3c',
  irisRim: '#60391a',
  lips: '#d07a38',
  scaleEdge: 0.24,
  sparkle: '#ffe2b8',
  sparkleCover: 0.16,
};

const blueFin: FinPaint = {
  root: '#7f9fc6',
  edge: '#b9d2ea',
  rootCover: 0.95,
  edgeCover: 0.82,
  rayColour: '#3f5878',
  rayCover: 0.42,
};

const male: Colouring = {
  tones: [
    [-1, '#6f8bb0'],
    [-0.5, '#8fb0d4'],
    [-0.1, '#a9c8e6'],
    [0.3, '#b9d5ee'],
    [0.7, '#c3d9ec'],
    [1, '#a2b6cc'],
  ],
  marks: [
    {
      kind: 'bars',
      at: [0.29, 0.37, 0.45, 0.53, 0.61, 0.69],
      width: 0.034,
      from: -1,
      to: 0.4,
      taper: 0.5,
      colour: '#5f7fa8',
      cover: 0.2,
      soft: 'soft',
    },
    { kind: 'patch', x: 0.1, v: 0.6, rx: 0.1, rv: 0.4, colour: '#dcc8b0', cover: 0.3, soft: 'wide' },
    { kind: 'patch', x: 0.07, v: -0.6, rx: 0.13, rv: 0.6, colour: '#7289a8', cover: 0.45, soft: 'wide' },
    { kind: 'patch', x: 0.4, v: 0.05, rx: 0.22, rv: 0.4, colour: '#d8ecff', cover: 0.35, soft: 'wide' },
  ],
  dorsal: { ...blueFin, bands: [{ from: 0.9, to: 1, colour: '#eaf4ff', cover: 0.55 }] },
  anal: {
    ...blueFin,
    spots: [
      {
        t: [0.48, 0.98],
        s: [0.3, 0.85],
        columns: 2,
        rows: 2,
        size: 0.0115,
        colour: '#f4c63a',
        cover: 0.95,
        ring: '#4d5c74',
      },
    ],
  },
  tail: { ...blueFin, edge: '#c2d6e8' },
  pelvic: { ...blueFin, edge: '#d6e6f4' },
  pectoral: { ...blueFin, root: '#bcd0e4', edge: '#dce8f4', rootCover: 0.36, edgeCover: 0.12, rayCover: 0.24 },
  iris: '#b8a078',
  irisRim: '#38424e',
  lips: '#8ba4c2',
  scaleEdge: 0.24,
  sparkle: '#f0f8ff',
  sparkleCover: 0.2,
};

export const maylandiaEstherae: Drawn = {
  anatomy,
  adultMm: 125,
  colours: {
    male,
    female,
    juvenile: {
      ...female,
      marks: [],
      tones: female.tones.map(([v]) => [v, v < -0.3 ? '#b86428' : '#ee9a50'] as const),
      scaleEdge: 0.16,
    },
  },
  egg: { mm: 3.8, colour: '#e4b04c' },
};
