import { type Found, THINGS, type Thing } from '../../shared/search/contract';
import { bestOf, type Named } from '../../shared/search/rank';
import type { Scope } from '../scope';
import { speciesNames } from '../species';
import { SOURCES } from './sources';

/** The best finds of all things that this person may see. */
export async function searchIn(scope: Scope, typed: string): Promise<Found[]> {
  if (typed.trim() === '') return [];
  const nameOf = await speciesNames(scope);
  const all: Named[] = [];
  for (const thing of THINGS) all.push(...(await SOURCES[thing](scope, nameOf)));
  return bestOf(all, typed);
}

/** A device remembers some; whoever asks for more is no device of ours. */
const MOST_PAGES = 20;

export async function pagesNamed(scope: Scope, pages: { thing: Thing; id: string }[]): Promise<Found[]> {
  const asked = pages.slice(0, MOST_PAGES);
  const nameOf = await speciesNames(scope);
  const known = new Map<string, Found>();
  for (const thing of THINGS) {
    const ids = asked.filter((page) => page.thing === thing).map(({ id }) => id);
    if (ids.length === 0) continue;
    for (const { also: _also, ...found } of await SOURCES[thing](scope, nameOf, ids)) known.set(keyOf(found), found);
  }
  return asked.flatMap((page) => known.get(keyOf(page)) ?? []);
}

const keyOf = ({ thing, id }: { thing: Thing; id: string }) => `${thing}:${id}`;
