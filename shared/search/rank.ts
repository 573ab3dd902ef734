import { byNumber } from '../codes';
import { folded } from '../folded';
import { type Found, MOST_FOUND, THINGS } from './contract';

/** What may be found, with other words that lead to it: a trade name, a synonym, a mark. */
export type Named = Found & { also?: (string | null)[] };

const NOT_WORDS = /[^\p{L}\p{N}]+/u;

/**
 * How well it fits what was typed, 0 best: the code itself, its beginning, the beginning of a part of it ("A04", "04"), every
 * word the beginning of a word of its names. Null: not at all.
 */
export function fitOf({ code, name, also = [] }: Named, typed: string): number | null {
  const wanted = folded(typed.trim());
  const own = folded(code);
  if (own === wanted) return 0;
  if (own.startsWith(wanted)) return 1;
  if (partsOf(own).some((part) => part.startsWith(wanted))) return 2;
  const words = folded([code, name, ...also].filter(Boolean).join(' ')).split(NOT_WORDS);
  const all = wanted.split(NOT_WORDS).filter(Boolean);
  return all.length > 0 && all.every((word) => words.some((one) => one.startsWith(word))) ? 3 : null;
}

/** "duma-a04" is duma, a04 and 04. */
const partsOf = (code: string): string[] =>
  code
    .split(NOT_WORDS)
    .flatMap((part) => [part, part.replace(/^\p{L}+/u, '')])
    .filter(Boolean);

/** The best of what fits, what is here before what is gone. */
export function bestOf(all: readonly Named[], typed: string): Found[] {
  if (!/[\p{L}\p{N}]/u.test(typed)) return [];
  return all
    .flatMap((one) => {
      const fit = fitOf(one, typed);
      return fit === null ? [] : [{ one, fit }];
    })
    .sort(
      (a, b) =>
        a.fit - b.fit ||
        Number(a.one.gone) - Number(b.one.gone) ||
        THINGS.indexOf(a.one.thing) - THINGS.indexOf(b.one.thing) ||
        byNumber(a.one.code, b.one.code),
    )
    .slice(0, MOST_FOUND)
    .map(({ one: { also: _also, ...found } }) => found);
}
