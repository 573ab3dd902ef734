import type { LineageNode } from '@/shared/lineage/contract';
import { UNKNOWN_FOUNDERS } from '@/shared/lineage/founders';

export type FoundersOf = (ids: string[]) => ReadonlyMap<string, number>;

const NAMED = 3;

/** What two fish have in common, in words: "Both carry DUMA-A01 and DUMA-A03". */
export function whyRelated(
  founders: FoundersOf,
  byId: ReadonlyMap<string, LineageNode>,
  male: string,
  female: string,
  f: number,
): string {
  const [his, hers] = [founders([male]), founders([female])];
  const shared = [...his.keys()].filter((id) => id !== UNKNOWN_FOUNDERS && hers.has(id));
  if (f > 0 && shared.length > 0) {
    const codes = shared.map((id) => byId.get(id)?.code ?? 'one without a code');
    const rest = codes.length - NAMED;
    return `Both carry ${joinAnd(codes.slice(0, NAMED))}${rest > 0 ? ` and ${rest} more` : ''}`;
  }
  const blank = Math.max(his.get(UNKNOWN_FOUNDERS) ?? 0, hers.get(UNKNOWN_FOUNDERS) ?? 0);
  return blank > 0.01 ? 'None in common is known; part of the pedigree is not' : 'No founder in common';
}

const joinAnd = (words: string[]): string =>
  words.length < 3 ? words.join(' and ') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;

/** "1 male, 5 females". */
export const headsWords = ({ males, females }: { males: string[]; females: string[] }): string =>
  `${counted(males.length, 'male')}, ${counted(females.length, 'female')}`;

const counted = (count: number, word: string): string => `${count} ${word}${count === 1 ? '' : 's'}`;
