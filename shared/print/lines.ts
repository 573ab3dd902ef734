import { widthOf } from './measure';
import type { Face, Ink, TextMark } from './page';

/** A stretch of text in one face. A paragraph is a row of them. */
export type Span = { text: string; face: Face; ink?: Ink };

/** `end` sets lines flush with the right: x is then the right edge. */
export type Style = { sizeMm: number; lineMm?: number; ink?: Ink; align?: 'start' | 'end' };

type Piece = { text: string; face: Face; ink: Ink | undefined; widthMm: number };
type Line = { pieces: Piece[]; widthMm: number };

/** Capitals of all faces are this high: lines are centred on them. */
export const CAP_HEIGHT = 0.668;
const LINE_HEIGHT = 1.36;

const trackingOf = (face: Face, sizeMm: number): number => {
  if (face === 'code') return -0.02;
  return sizeMm > 7 ? -0.02 : 0;
};

/** Height of a line of this style, and where its baseline lies in it. */
export const lineHeight = (style: Style): number => style.lineMm ?? style.sizeMm * LINE_HEIGHT;
export const baselineIn = (heightMm: number, sizeMm: number): number => (heightMm + sizeMm * CAP_HEIGHT) / 2;

/** Cuts into words, each with the space that follows it. A word may run over the border of two spans. */
function words(spans: Span[], sizeMm: number): Piece[][] {
  const found: Piece[][] = [];
  let open = false;
  for (const span of spans) {
    for (const part of span.text.normalize('NFC').split(/(?<= )/)) {
      if (part === '') continue;
      const piece = pieceOf(part, span, sizeMm);
      const last = found.at(-1);
      if (open && last) last.push(piece);
      else found.push([piece]);
      open = !part.endsWith(' ');
    }
  }
  return found;
}

const pieceOf = (text: string, span: { face: Face; ink?: Ink | undefined }, sizeMm: number): Piece => ({
  text,
  face: span.face,
  ink: span.ink,
  widthMm: widthOf(text, span.face, sizeMm, trackingOf(span.face, sizeMm)),
});

const widthOfWord = (word: Piece[]): number => word.reduce((sum, piece) => sum + piece.widthMm, 0);

/** Without the space after it, which may hang over the edge. */
function bareWidth(word: Piece[], sizeMm: number): number {
  const last = word.at(-1);
  if (!last?.text.endsWith(' ')) return widthOfWord(word);
  return widthOfWord(word) - widthOf(' ', last.face, sizeMm, trackingOf(last.face, sizeMm));
}

/** Letters after which a long word is cut rather than elsewhere. */
const SEAMS = /[-/._·]/;

/** A word wider than the line is cut: after a hyphen or a slash if there is one, else between letters. */
function cutWord(word: Piece[], widthMm: number, sizeMm: number): Piece[][] {
  if (bareWidth(word, sizeMm) <= widthMm) return [word];
  const parts: Piece[][] = [];
  let part: Piece[] = [];
  for (const piece of word) {
    for (const letter of piece.text) {
      const next = pieceOf(letter, piece, sizeMm);
      if (part.length > 0 && letter !== ' ' && widthOfWord(part) + next.widthMm > widthMm) {
        const seam = part.findLastIndex(({ text }) => SEAMS.test(text)) + 1;
        parts.push(part.slice(0, seam || part.length));
        part = seam ? part.slice(seam) : [];
      }
      part.push(next);
    }
  }
  return [...parts, part];
}

function joined(pieces: Piece[], sizeMm: number): Piece[] {
  const out: Piece[] = [];
  for (const piece of pieces) {
    const last = out.at(-1);
    if (last && last.face === piece.face && last.ink === piece.ink) {
      out[out.length - 1] = pieceOf(last.text + piece.text, last, sizeMm);
    } else out.push(piece);
  }
  const end = out.at(-1);
  if (end?.text.endsWith(' ')) out[out.length - 1] = pieceOf(end.text.trimEnd(), end, sizeMm);
  return out.filter((piece) => piece.text !== '');
}

/** Breaks spans into lines no wider than `widthMm`, at spaces first and inside a word only where it must. */
export function breakLines(spans: Span[], widthMm: number, sizeMm: number): Line[] {
  const lines: Piece[][] = [];
  let line: Piece[] = [];
  for (const word of words(spans, sizeMm).flatMap((each) => cutWord(each, widthMm, sizeMm))) {
    if (line.length > 0 && widthOfWord(line) + bareWidth(word, sizeMm) > widthMm) {
      lines.push(line);
      line = [];
    }
    line.push(...word);
  }
  if (line.length > 0) lines.push(line);
  return lines.map((pieces) => {
    const neat = joined(pieces, sizeMm);
    return { pieces: neat, widthMm: widthOfWord(neat) };
  });
}

export type Paragraph = { heightMm: number; widthMm: number; marks(x: number, y: number): TextMark[] };

/** A wrapped paragraph: its height, its widest line, and its marks with the top left corner at x and y. */
export function paragraph(spans: Span[], widthMm: number, style: Style, heading?: 1 | 2): Paragraph {
  const lines = breakLines(spans, widthMm, style.sizeMm);
  const step = lineHeight(style);
  return {
    heightMm: lines.length * step,
    widthMm: Math.max(0, ...lines.map((line) => line.widthMm)),
    marks: (x, y) =>
      lines.flatMap((line, i) =>
        lineMarks(line, { x, y: y + i * step + baselineIn(step, style.sizeMm), style, heading }),
      ),
  };
}

function lineMarks(line: Line, at: { x: number; y: number; style: Style; heading: 1 | 2 | undefined }): TextMark[] {
  const ends = at.style.align === 'end';
  let x = ends ? at.x - line.widthMm : at.x;
  return line.pieces.map((piece, i) => {
    // The last piece ends exactly at the edge, whatever kerning did to the others.
    const flush = ends && i === line.pieces.length - 1;
    const mark: TextMark = {
      kind: 'text',
      x: flush ? at.x : x,
      y: at.y,
      text: piece.text,
      face: piece.face,
      sizeMm: at.style.sizeMm,
      ink: piece.ink ?? at.style.ink ?? 'ink',
      anchor: flush ? 'end' : 'start',
      tracking: trackingOf(piece.face, at.style.sizeMm),
    };
    if (at.heading) mark.heading = at.heading;
    x += piece.widthMm;
    return mark;
  });
}

/** One line that is not wrapped, on a baseline. */
export function word(
  text: string,
  at: { x: number; y: number; sizeMm: number; face?: Face; ink?: Ink; anchor?: TextMark['anchor'] },
): TextMark {
  const face = at.face ?? 'regular';
  return {
    kind: 'text',
    x: at.x,
    y: at.y,
    text: text.normalize('NFC'),
    face,
    sizeMm: at.sizeMm,
    ink: at.ink ?? 'ink',
    anchor: at.anchor ?? 'start',
    tracking: trackingOf(face, at.sizeMm),
  };
}

/** The largest size, from `largestMm` down to `smallestMm`, at which the text stays within the width on one line. */
export function fittedSize(
  text: string,
  face: Face,
  limits: { widthMm: number; largestMm: number; smallestMm: number },
): number {
  const wide = widthOf(text, face, 1, trackingOf(face, limits.largestMm));
  return Math.max(limits.smallestMm, Math.min(limits.largestMm, wide > 0 ? limits.widthMm / wide : limits.largestMm));
}
