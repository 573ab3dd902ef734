import type { Anatomy, Colouring, Drawn, FinPaint } from '../anatomy';

/** A small pointed-snouted yellow fish with a black band in the dorsal fin. */
const anatomy: Anatomy = {
  standard: 0.8,
  back: [
    [0, 0],
    [0.008, 0.014],
    [0.035, 0.042],
    [0.08, 0.073],
    [0.14, 0.101],
    [0.23, 0.128],
    [0.34, 0.133],
    [0.5, 0.111],
    [0.64, 0.072],
    [0.73, 0.052],
    [0.8, 0.051],
  ],
  belly: [
    [0, 0.03],
    [0.02, 0.042],
    [0.08, 0.071],
    [0.18, 0.103],
    [0.32, 0.125],
    [0.48, 0.114],
    [0.6, 0.084],
    [0.7, 0.056],
    [0.8, 0.05],
  ],
  gill: 0.24,
  eye: { x: 0.112, y: -0.027, r: 0.03 },
  mouth: { y: 0.014, length: 0.054, drop: 0.01, lip: 0.01 },
  dorsal: {
    from: 0.22,
    to: 0.71,
    spines: 18,
    rays: 9,
    height: [
      [0, 0.03],
      [0.12, 0.068],
      [0.4, 0.076],
      [0.68, 0.08],
      [0.86, 0.124],
      [0.94, 0.12],
      [1, 0.05],
    ],
    lean: [
      [0, 46],
      [0.5, 50],
      [0.85, 62],
      [1, 66],
    ],
    notch: 0.13,
  },
  anal: {
    from: 0.53,
    to: 0.7,
    spines: 3,
    rays: 8,
    height: [
      [0, 0.035],
      [0.3, 0.075],
      [0.75, 0.125],
      [0.92, 0.115],
      [1, 0.05],
    ],
    lean: [
      [0, 40],
      [1, 64],
    ],
    notch: 0.1,
  },
  tail: { span: 0.106, fork: 0.1, rays: 16, lobe: 1.8 },
  pelvic: { x: 0.285, v: 0.96, length: 0.18, angle: 38, spread: 30, rays: 6, point: 0.9 },
  pectoral: { x: 0.262, v: 0.28, length: 0.18, angle: 18, spread: 46, rays: 13, point: 0.35 },
  scales: { columns: 31, rows: 16 },
};

const sun: FinPaint = {
  root: '#d8a90e',
  edge: '#f4d23c',
  rootCover: 0.95,
  edgeCover: 0.82,
  rayColour: '#7c5c08',
  rayCover: 0.38,
};

const female: Colouring = {
  tones: [
    [-1, '#b48708'],
    [-0.5, '#dfb012'],
    [-0.1, '#f4c81c'],
    [0.3, '#fbd52e'],
    [0.7, '#fbdd62'],
    [1, '#ecd08a'],
  ],
  marks: [
    { kind: 'patch', x: 0.4, v: 0.1, rx: 0.22, rv: 0.5, colour: '#ffe35c', cover: 0.3, soft: 'wide' },
    {
      kind: 'bars',
      at: [0.3, 0.38, 0.46, 0.54, 0.62],
      width: 0.03,
      from: -0.9,
      to: 0.2,
      taper: 0.5,
      colour: '#b98f0c',
      cover: 0.1,
      soft: 'soft',
    },
  ],
  dorsal: {
    ...sun,
    bands: [
      { from: 0.6, to: 0.9, start: 0.02, end: 0.98, colour: '#15130c', cover: 0.9 },
      { from: 0.92, to: 1, colour: '#f8f2dc', cover: 0.6 },
    ],
  },
  anal: { ...sun, bands: [{ from: 0.72, to: 0.95, start: 0, end: 0.7, colour: '#1a170d', cover: 0.55 }] },
  tail: { ...sun, edge: '#f6dc62' },
  pelvic: { ...sun, bands: [{ from: 0.2, to: 0.98, start: 0, end: 0.26, colour: '#1a170d', cover: 0.5 }] },
  pectoral: { ...sun, root: '#f3d45c', edge: '#faeaa8', rootCover: 0.4, edgeCover: 0.14, rayCover: 0.22 },
  iris: '#b99a3a',
  irisRim: '#4c4018',
  lips: '#d9b030',
  scaleEdge: 0.2,
  sparkle: '#fff6c4',
  sparkleCover: 0.15,
};

const male: Colouring = {
  ...female,
  marks: [
    ...female.marks,
    { kind: 'patch', x: 0.05, v: 0.1, rx: 0.09, rv: 0.9, colour: '#5c4d1c', cover: 0.42, soft: 'wide' },
    { kind: 'patch', x: 0.18, v: 1, rx: 0.12, rv: 0.35, colour: '#5c4d1c', cover: 0.35, soft: 'wide' },
  ],
  dorsal: {
    ...sun,
    bands: [
      { from: 0.5, to: 0.9, colour: '#0d0c09', cover: 0.95 },
      { from: 0.92, to: 1, colour: '#fbf6e4', cover: 0.7 },
    ],
  },
  anal: {
    ...sun,
    bands: [{ from: 0.45, to: 0.98, start: 0, end: 0.85, colour: '#121009', cover: 0.82 }],
    spots: [{ t: [0.72, 0.96], s: [0.3, 0.7], columns: 1, rows: 2, size: 0.009, colour: '#f6d84a', cover: 0.95 }],
  },
  pelvic: { ...sun, bands: [{ from: 0.1, to: 1, start: 0, end: 0.6, colour: '#100e08', cover: 0.85 }] },
  lips: '#8c7630',
};

const juvenile: Colouring = {
  ...female,
  tones: [
    [-1, '#b8952c'],
    [-0.3, '#e8c850'],
    [0.3, '#f2dc84'],
    [1, '#ece4c0'],
  ],
  dorsal: { ...sun, bands: [{ from: 0.68, to: 0.88, start: 0.1, end: 0.95, colour: '#2b2715', cover: 0.6 }] },
  anal: sun,
  pelvic: sun,
  scaleEdge: 0.13,
};

export const labidochromisCaeruleus: Drawn = {
  anatomy,
  adultMm: 98,
  colours: { male, female, juvenile },
  egg: { mm: 3.6, colour: '#e2b450' },
};
