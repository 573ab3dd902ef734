import { LETTERS } from './letters';
import type { Face } from './page';

/** One file's letters, as `letters.ts` names them. */
export type LetterSet = keyof typeof LETTERS;

/** A stretch of text that one font file can print. `set` is null where none of them has the letter. */
export type Run = { text: string; set: LetterSet | null };

const TEXT_SETS = ['latin', 'latinExt', 'otherLatin', 'vietnamese', 'cyrillic', 'greek', 'otherMarks'] as const;
const CODE_SETS = ['code', 'codeExt', 'otherLatin', 'vietnamese', 'cyrillic', 'greek', 'otherMarks'] as const;

/** The cut a set is printed in: sets of another family have a regular and a bold one only. */
export function cutOf(set: LetterSet, face: Face): Face {
  const cuts: Record<string, string> = LETTERS[set].widths;
  if (face in cuts) return face;
  return face === 'regular' || face === 'italic' ? 'regular' : 'bold';
}

type Glyph = { set: LetterSet; em: number };
const glyphs = new Map<Face, Map<string, Glyph>>();

function glyphsOf(face: Face): Map<string, Glyph> {
  const known = glyphs.get(face);
  if (known) return known;
  const made = new Map<string, Glyph>();
  for (const set of face === 'code' ? CODE_SETS : TEXT_SETS) {
    const widths: Record<string, string> = LETTERS[set].widths;
    const list = (widths[cutOf(set, face)] ?? '').split(' ').map(Number);
    for (const [i, letter] of [...LETTERS[set].letters].entries()) {
      if (!made.has(letter)) made.set(letter, { set, em: (list[i] ?? list[0] ?? 0) / 1000 });
    }
  }
  glyphs.set(face, made);
  return made;
}

/**
 * Width of one line in millimetres, kerning left out, so that a line never comes out wider than measured. A letter that
 * no font file holds counts as a full square.
 */
export function widthOf(text: string, face: Face, sizeMm: number, tracking = 0): number {
  const known = glyphsOf(face);
  let em = 0;
  for (const letter of text.normalize('NFC')) em += (known.get(letter)?.em ?? 1) + tracking;
  return em * sizeMm;
}

/** Cuts the text where the font file changes. */
export function runsOf(text: string, face: Face): Run[] {
  const known = glyphsOf(face);
  const runs: Run[] = [];
  for (const letter of text.normalize('NFC')) {
    const set = known.get(letter)?.set ?? null;
    const last = runs.at(-1);
    if (last && last.set === set) last.text += letter;
    else runs.push({ text: letter, set });
  }
  return runs;
}

/** The letters of a text that paper will show as a replacement sign, each once. Screens show them as they are. */
export function unprintable(text: string): string[] {
  return [...new Set(runsOf(text, 'regular').flatMap((run) => (run.set === null ? [...run.text] : [])))];
}
