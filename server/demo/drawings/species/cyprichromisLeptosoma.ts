import type { Anatomy, Colouring, Drawn, FinPaint } from '../anatomy';

/** An open-water torpedo with a small upturned mouth that shoots forward, and a deeply forked tail. */
const anatomy: Anatomy = {
  standard: 0.8,
  back: [
    [0, 0.006],
    [0.008, 0.02],
    [0.03, 0.036],
    [0.08, 0.06],
    [0.15, 0.084],
    [0.25, 0.102],
    [0.37, 0.104],
    [0.52, 0.084],
    [0.66, 0.052],
    [0.74, 0.038],
    [0.8, 0.037],
  ],
  belly: [
    [0, 0.016],
    [0.012, 0.032],
    [0.06, 0.058],
    [0.14, 0.083],
    [0.26, 0.101],
    [0.4, 0.101],
    [0.55, 0.078],
    [0.67, 0.049],
    [0.74, 0.037],
    [0.8, 0.036],
  ],
  gill: 0.226,
  eye: { x: 0.094, y: -0.016, r: 0.031 },
  mouth: { y: 0.006, length: 0.04, drop: 0.022, lip: 0.008 },
  dorsal: {
    from: 0.225,
    to: 0.69,
    spines: 12,
    rays: 14,
    height: [
      [0, 0.025],
      [0.12, 0.075],
      [0.4, 0.076],
      [0.7, 0.088],
      [0.88, 0.13],
      [0.95, 0.12],
      [1, 0.04],
    ],
    lean: [
      [0, 44],
      [0.6, 52],
      [0.9, 66],
      [1, 68],
    ],
    notch: 0.06,
  },
  anal: {
    from: 0.5,
    to: 0.69,
    spines: 3,
    rays: 11,
    height: [
      [0, 0.03],
      [0.3, 0.068],
      [0.8, 0.118],
      [0.94, 0.106],
      [1, 0.04],
    ],
    lean: [
      [0, 44],
      [1, 66],
    ],
    notch: 0.06,
  },
  tail: { span: 0.118, fork: 0.46, rays: 16, lobe: 1.2 },
  pelvic: { x: 0.27, v: 0.96, length: 0.2, angle: 30, spread: 26, rays: 6, point: 1 },
  pectoral: { x: 0.245, v: 0.24, length: 0.185, angle: 16, spread: 38, rays: 13, point: 0.5 },
  scales: { columns: 38, rows: 15 },
};

const nightFin: FinPaint = {
  root: '#26304e',
  edge: '#5876c4',
  rootCover: 0.95,
  edgeCover: 0.82,
  rayColour: '#10162a',
  rayCover: 0.5,
};

const male: Colouring = {
  tones: [
    [-1, '#2a2c3a'],
    [-0.5, '#443f4c'],
    [-0.1, '#5e5566'],
    [0.3, '#6c6684'],
    [0.7, '#6d78a8'],
    [1, '#565f88'],
  ],
  marks: [
    { kind: 'patch', x: 0.42, v: 0.25, rx: 0.26, rv: 0.5, colour: '#6d8fe0', cover: 0.4, soft: 'wide' },
    { kind: 'stripe', v: -0.45, height: 0.16, from: 0.22, to: 0.78, colour: '#7f9ff0', cover: 0.22, soft: 'wide' },
    { kind: 'patch', x: 0.1, v: 0.75, rx: 0.1, rv: 0.4, colour: '#7d96dc', cover: 0.5, soft: 'wide' },
    { kind: 'patch', x: 0.05, v: -0.6, rx: 0.12, rv: 0.6, colour: '#3a3134', cover: 0.5, soft: 'wide' },
  ],
  dorsal: { ...nightFin, bands: [{ from: 0.84, to: 1, colour: '#a4c2ff', cover: 0.75 }] },
  anal: { ...nightFin, bands: [{ from: 0.82, to: 1, colour: '#a4c2ff', cover: 0.7 }] },
  tail: { root: '#8a7426', edge: '#f2cf2c', rootCover: 0.97, edgeCover: 0.94, rayColour: '#7a5c10', rayCover: 0.42 },
  pelvic: { ...nightFin, edge: '#f0d24a', bands: [{ from: 0.7, to: 1, colour: '#f3d743', cover: 0.75 }] },
  pectoral: { ...nightFin, root: '#8e93a8', edge: '#c8cce0', rootCover: 0.28, edgeCover: 0.1, rayCover: 0.2 },
  iris: '#9d9a86',
  irisRim: '#2c2e38',
  lips: '#5a5663',
  scaleEdge: 0.26,
  sparkle: '#b4ccff',
  sparkleCover: 0.26,
};

const paleFin: FinPaint = {
  root: '#a39a86',
  edge: '#dcd7c8',
  rootCover: 0.72,
  edgeCover: 0.45,
  rayColour: '#6a665c',
  rayCover: 0.45,
};

const female: Colouring = {
  ...male,
  tones: [
    [-1, '#6d675c'],
    [-0.5, '#968d7c'],
    [-0.1, '#b7b1a4'],
    [0.3, '#d3d2cd'],
    [0.7, '#e6e8ea'],
    [1, '#d2d4d8'],
  ],
  marks: [
    { kind: 'stripe', v: -0.05, height: 0.22, from: 0.24, to: 0.78, colour: '#8c8577', cover: 0.25, soft: 'wide' },
    { kind: 'patch', x: 0.36, v: 0.45, rx: 0.22, rv: 0.35, colour: '#cfe0f2', cover: 0.4, soft: 'wide' },
  ],
  dorsal: { ...paleFin, bands: [{ from: 0.88, to: 1, colour: '#e6d98c', cover: 0.5 }] },
  anal: paleFin,
  tail: { ...paleFin, edge: '#dccf92', edgeCover: 0.6 },
  pelvic: paleFin,
  pectoral: { ...paleFin, rootCover: 0.25, edgeCover: 0.1, rayCover: 0.2 },
  iris: '#c2bda0',
  irisRim: '#5e5c50',
  lips: '#a49c8c',
  scaleEdge: 0.18,
  sparkle: '#ffffff',
  sparkleCover: 0.24,
};

export const cyprichromisLeptosoma: Drawn = {
  anatomy,
  adultMm: 108,
  colours: { male, female, juvenile: { ...female, scaleEdge: 0.12 } },
  egg: { mm: 4.2, colour: '#e3a64a' },
};
