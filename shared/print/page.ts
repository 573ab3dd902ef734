/*
 * A printed page as a list of marks in millimetres from its top left corner, in the order in which they are read. The
 * screen and the PDF painter draw the same list, so that both say the same.
 */

/** A4 by ISO 216; Letter is 8.5 by 11 inches. */
export const PAPERS = {
  a4: { widthMm: 210, heightMm: 297 },
  letter: { widthMm: 215.9, heightMm: 279.4 },
} as const;
export type Paper = keyof typeof PAPERS;

export const MARGIN_MM = 14;

/** The light theme on white: paper is never dark. */
export const INKS = {
  ink: '#0B1C22',
  /** Labels: some printers know no other. */
  black: '#000000',
  ink2: '#3B5157',
  control: '#6B8085',
  rule: '#B9C8CA',
  ruleSoft: '#DAE4E5',
  curve: '#17618C',
  paper: '#FFFFFF',
} as const;
export type Ink = keyof typeof INKS;

/** Atkinson Hyperlegible Next in five cuts, with tabular figures; `code` is its Mono at 600, for codes alone. */
export type Face = 'regular' | 'italic' | 'semibold' | 'bold' | 'boldItalic' | 'code';

export type Point = readonly [xMm: number, yMm: number];

/** One line of one face. `y` is the baseline; `x` the start, middle or end of the text by `anchor`. */
export type TextMark = {
  kind: 'text';
  x: number;
  y: number;
  text: string;
  face: Face;
  sizeMm: number;
  ink: Ink;
  anchor: 'start' | 'middle' | 'end';
  /** Space added after each letter, as a share of the size. */
  tracking: number;
  heading?: 1 | 2;
};

/** An open stroke. `dashMm` is the length of stroke and gap in turn: what is dashed is not certain. */
export type LineMark = { kind: 'line'; points: Point[]; widthMm: number; ink: Ink; dashMm?: readonly [number, number] };

/** A closed area: bars, boxes of a chart, the sign of the product. */
export type AreaMark = { kind: 'area'; points: Point[]; fill: Ink; stroke?: { widthMm: number; ink: Ink } };

/** Sex by shape, centred on x and y: square male, circle female, diamond not sexed. `sure: false` is dashed. */
export type ShapeMark = {
  kind: 'shape';
  x: number;
  y: number;
  sizeMm: number;
  sex: Sex;
  sure: boolean;
  filled: boolean;
};
export type Sex = 'male' | 'female' | 'unsexed';

/** A square code of `sizeMm`, without its quiet zone: the layout leaves that free. `level` is the error correction. */
export type QrMark = { kind: 'qr'; x: number; y: number; sizeMm: number; text: string; level: 'M' | 'Q'; ink: Ink };

/** The one photo of the page, fitted into the box. */
export type PictureMark = { kind: 'picture'; x: number; y: number; widthMm: number; heightMm: number; alt: string };

export type Mark = TextMark | LineMark | AreaMark | ShapeMark | QrMark | PictureMark;

export type Page = { widthMm: number; heightMm: number; marks: Mark[] };

/** Corners of an upright box, clockwise from the top left. */
export const box = (x: number, y: number, width: number, height: number): Point[] => [
  [x, y],
  [x + width, y],
  [x + width, y + height],
  [x, y + height],
];

/** A level rule. */
export const rule = (x: number, y: number, widthMm: number, weightMm: number, ink: Ink): LineMark => ({
  kind: 'line',
  points: [
    [x, y],
    [x + widthMm, y],
  ],
  widthMm: weightMm,
  ink,
});

/** All that a page says, line by line in the order of reading. */
export const textsOf = (page: Page): string[] =>
  page.marks.flatMap((mark) => (mark.kind === 'text' ? [mark.text] : []));
