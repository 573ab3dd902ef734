import type { Anatomy, Colouring, Drawn, FinPaint } from '../anatomy';

/** A slender fish of open sand: long snout, low mouth, large eye, fins held wide when a male displays. */
const anatomy: Anatomy = {
  standard: 0.83,
  back: [
    [0, -0.008],
    [0.008, 0.006],
    [0.03, 0.024],
    [0.08, 0.053],
    [0.14, 0.076],
    [0.22, 0.087],
    [0.34, 0.087],
    [0.5, 0.073],
    [0.66, 0.048],
    [0.76, 0.034],
    [0.83, 0.034],
  ],
  belly: [
    [0, 0.03],
    [0.02, 0.042],
    [0.08, 0.058],
    [0.2, 0.073],
    [0.34, 0.077],
    [0.5, 0.066],
    [0.64, 0.045],
    [0.75, 0.032],
    [0.83, 0.033],
  ],
  gill: 0.262,
  eye: { x: 0.138, y: -0.028, r: 0.03 },
  mouth: { y: 0.02, length: 0.074, drop: 0.008, lip: 0.009 },
  dorsal: {
    from: 0.26,
    to: 0.735,
    spines: 16,
    rays: 13,
    height: [
      [0, 0.025],
      [0.08, 0.06],
      [0.3, 0.072],
      [0.6, 0.07],
      [0.86, 0.078],
      [0.95, 0.07],
      [1, 0.04],
    ],
    lean: [
      [0, 34],
      [0.55, 46],
      [1, 64],
    ],
    notch: 0.1,
  },
  anal: {
    from: 0.5,
    to: 0.735,
    spines: 3,
    rays: 14,
    height: [
      [0, 0.03],
      [0.25, 0.07],
      [0.75, 0.08],
      [0.95, 0.068],
      [1, 0.04],
    ],
    lean: [
      [0, 40],
      [1, 64],
    ],
    notch: 0.1,
  },
  tail: { span: 0.09, fork: 0.24, rays: 16, lobe: 1.6 },
  pelvic: { x: 0.29, v: 0.95, length: 0.15, angle: 30, spread: 30, rays: 6, point: 0.7 },
  pectoral: { x: 0.278, v: 0.28, length: 0.17, angle: 14, spread: 40, rays: 13, point: 0.45 },
  scales: { columns: 40, rows: 14 },
};

const sandFin: FinPaint = {
  root: '#b9ad92',
  edge: '#d9d4c4',
  rootCover: 0.8,
  edgeCover: 0.55,
  rayColour: '#6d6a5c',
  rayCover: 0.5,
};

const female: Colouring = {
  tones: [
    [-1, '#8b7f66'],
    [-0.5, '#b3a584'],
    [-0.1, '#cfc6ae'],
    [0.25, '#e4dfd0'],
    [0.7, '#f1eee6'],
    [1, '#e2dcd0'],
  ],
  marks: [
    {
      kind: 'blotches',
      count: 42,
      size: 0.011,
      x: [0.2, 0.8],
      v: [-0.95, -0.25],
      colour: '#6f6047',
      cover: 0.28,
      soft: 'soft',
    },
    {
      kind: 'spots',
      rows: 1,
      columns: 7,
      size: 0.011,
      x: [0.3, 0.78],
      v: [0, 0.1],
      colour: '#6b5f4a',
      cover: 0.38,
      soft: 'soft',
    },
    { kind: 'patch', x: 0.2, v: 0.1, rx: 0.06, rv: 0.45, colour: '#cfe4e2', cover: 0.4, soft: 'wide' },
  ],
  dorsal: {
    ...sandFin,
    spots: [{ t: [0.05, 1], s: [0.2, 0.9], columns: 15, rows: 3, size: 0.0048, colour: '#7d6f52', cover: 0.5 }],
  },
  anal: sandFin,
  tail: {
    ...sandFin,
    spots: [{ t: [0.08, 0.92], s: [0.2, 0.85], columns: 6, rows: 4, size: 0.0045, colour: '#7d6f52', cover: 0.4 }],
  },
  pelvic: { ...sandFin, edgeCover: 0.6 },
  pectoral: { ...sandFin, rootCover: 0.3, edgeCover: 0.12, rayCover: 0.25 },
  iris: '#b8b48e',
  irisRim: '#5c5a48',
  lips: '#b7a98a',
  scaleEdge: 0.18,
  sparkle: '#eaf6f4',
  sparkleCover: 0.22,
};

const gleam: FinPaint = {
  root: '#7d9aa0',
  edge: '#d8cf86',
  rootCover: 0.86,
  edgeCover: 0.7,
  rayColour: '#3d4a52',
  rayCover: 0.45,
};

const male: Colouring = {
  ...female,
  tones: [
    [-1, '#6f7460'],
    [-0.55, '#a39f7c'],
    [-0.15, '#c4c3a6'],
    [0.2, '#d5dccb'],
    [0.6, '#e8e6c4'],
    [1, '#dcd18c'],
  ],
  marks: [
    { kind: 'stripe', v: -0.5, height: 0.13, from: 0.24, to: 0.8, colour: '#59a7b8', cover: 0.5, soft: 'soft' },
    { kind: 'stripe', v: -0.16, height: 0.13, from: 0.26, to: 0.81, colour: '#d6c457', cover: 0.5, soft: 'soft' },
    { kind: 'stripe', v: 0.16, height: 0.13, from: 0.27, to: 0.81, colour: '#64b2c2', cover: 0.52, soft: 'soft' },
    { kind: 'stripe', v: 0.48, height: 0.12, from: 0.28, to: 0.78, colour: '#d9ca62', cover: 0.45, soft: 'soft' },
    { kind: 'patch', x: 0.13, v: 1, rx: 0.12, rv: 0.42, colour: '#15171b', cover: 0.88, soft: 'wide' },
    { kind: 'stripe', v: 0.34, height: 0.2, from: 0.04, to: 0.23, colour: '#4fb3c4', cover: 0.6, soft: 'soft' },
    { kind: 'patch', x: 0.22, v: 0.25, rx: 0.03, rv: 0.3, colour: '#d9c64c', cover: 0.6, soft: 'wide' },
  ],
  dorsal: {
    ...gleam,
    bands: [
      { from: 0.3, to: 0.5, colour: '#58b0c4', cover: 0.45 },
      { from: 0.5, to: 0.72, colour: '#e4cf5c', cover: 0.5 },
      { from: 0.9, to: 1, colour: '#e9f3f0', cover: 0.6 },
    ],
  },
  anal: {
    ...gleam,
    bands: [
      { from: 0.35, to: 0.6, colour: '#e2cd58', cover: 0.5 },
      { from: 0.85, to: 1, colour: '#20242b', cover: 0.6 },
    ],
  },
  tail: {
    ...gleam,
    spots: [{ t: [0.06, 0.94], s: [0.25, 0.9], columns: 8, rows: 5, size: 0.005, colour: '#56b6c8', cover: 0.6 }],
  },
  pelvic: { ...gleam, edge: '#e3cf5e', bands: [{ from: 0.86, to: 1, colour: '#1c1f26', cover: 0.3 }] },
  pectoral: { ...sandFin, rootCover: 0.3, edgeCover: 0.12, rayCover: 0.25 },
  lips: '#6aa9b4',
  iris: '#c7bf7c',
  sparkle: '#c8f2f4',
  sparkleCover: 0.3,
};

export const enantiopusMelanogenys: Drawn = {
  anatomy,
  adultMm: 145,
  colours: { male, female, juvenile: { ...female, scaleEdge: 0.12 } },
  egg: { mm: 3.6, colour: '#d8c070' },
};
