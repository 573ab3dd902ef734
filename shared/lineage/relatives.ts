import { whole } from '../badValue';
import { parentShares } from './parentShares';
import type { PedigreeEntry } from './pedigree';
import { unknownId } from './pedigreeError';

/** The entries near one, in the pedigree's order, and which of them have possible parents or young that are left out. */
export type Relatives<E> = { entries: E[]; moreParents: string[]; moreYoung: string[] };

/**
 * The part of a pedigree around `id`: its possible ancestors up to `ancestors` generations back, its possible descendants
 * up to `descendants` generations on, and itself. Works level by level, however deep the pedigree. Throws `unknownId`, and a
 * `BadValue` for depths that are not whole numbers from 0.
 */
export function relativesWithin<E extends PedigreeEntry>(
  pedigree: E[],
  id: string,
  depth: { ancestors: number; descendants: number },
): Relatives<E> {
  const parentsOf = new Map(pedigree.map((entry) => [entry.id, namesOf(entry)]));
  if (!parentsOf.has(id)) throw unknownId(id);
  const youngOf = new Map<string, string[]>(pedigree.map((entry) => [entry.id, []]));
  for (const [child, parents] of parentsOf) for (const parent of parents) youngOf.get(parent)?.push(child);
  const shown = new Set([
    ...reached(parentsOf, id, whole('ancestors', depth.ancestors)),
    ...reached(youngOf, id, whole('descendants', depth.descendants)),
  ]);
  const entries = pedigree.filter((entry) => shown.has(entry.id));
  const missesOne = (links: Map<string, string[]>) =>
    entries.flatMap((entry) => (links.get(entry.id)?.some((other) => !shown.has(other)) ? entry.id : []));
  return { entries, moreParents: missesOne(parentsOf), moreYoung: missesOne(youngOf) };
}

const namesOf = (entry: PedigreeEntry): string[] => [...new Set(parentShares(entry).flatMap(({ id }) => id ?? []))];

function reached(links: Map<string, string[]>, from: string, depth: number): Set<string> {
  const found = new Set([from]);
  let level = [from];
  for (let step = 0; step < depth && level.length > 0; step += 1) {
    level = level.flatMap((id) => links.get(id) ?? []).filter((id) => links.has(id) && !found.has(id));
    for (const id of level) found.add(id);
  }
  return found;
}
