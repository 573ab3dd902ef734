import type { Face } from '../print/page';

/** Parts of a name that stay upright: what stands for a missing epithet, ranks, crosses, names in quotes, authors' dates. */
const UPRIGHT = /^(?:spp?\.|cf\.|aff\.|nr\.|var\.|subsp\.|ssp\.|×|x|\(.*|.*\)|["'‘“].*|.*["'’”]|\d.*)$/u;

type NamePart = { text: string; italic: boolean };

/**
 * A scientific name cut into italic and upright parts, spaces kept: genus and epithet are italic; "sp.", "cf.", ranks
 * and names in quotes are not (International Code of Zoological Nomenclature, recommendations B6 and 6; from memory).
 */
export function nameParts(name: string): NamePart[] {
  const parts: NamePart[] = [];
  let quoted = false;
  for (const text of name.split(/(?<= )/)) {
    const bare = text.trim();
    if (/^["'‘“(]/.test(bare)) quoted = true;
    const italic = !quoted && !UPRIGHT.test(bare);
    if (/["'’”)]$/.test(bare)) quoted = false;
    const last = parts.at(-1);
    if (last && last.italic === italic) last.text += text;
    else parts.push({ text, italic });
  }
  return parts;
}

/** The same as spans of print, in the plain or the bold cut. */
export const nameSpans = (name: string, cut: 'plain' | 'bold'): { text: string; face: Face }[] =>
  nameParts(name).map(({ text, italic }) => ({
    text,
    face: cut === 'bold' ? (italic ? 'boldItalic' : 'bold') : italic ? 'italic' : 'regular',
  }));
