import { parentShares } from './parentShares';
import type { PedigreeEntry } from './pedigree';

/** For each of `founders`, which of `ids` may carry its genes: its possible descendants, and itself. In the order of `ids`. */
export function carriersOf(pedigree: PedigreeEntry[], founders: string[], ids: string[]): Map<string, string[]> {
  const young = new Map<string, string[]>();
  for (const entry of pedigree)
    for (const { id } of parentShares(entry)) {
      if (id === null) continue;
      const known = young.get(id);
      if (known) known.push(entry.id);
      else young.set(id, [entry.id]);
    }
  return new Map(
    founders.map((founder) => {
      const reached = new Set([founder]);
      for (const id of reached) for (const other of young.get(id) ?? []) reached.add(other);
      return [founder, ids.filter((id) => reached.has(id))];
    }),
  );
}

/** The animals with their possible ancestors up to so many generations back: ids, each once. */
export function withAncestorIds(pedigree: PedigreeEntry[], of: readonly string[], generations: number): Set<string> {
  const byId = new Map(pedigree.map((entry) => [entry.id, entry]));
  const shown = new Set(of);
  let level = [...shown];
  for (let back = 0; back < generations && level.length > 0; back += 1) {
    const parents = level.flatMap((id) => {
      const entry = byId.get(id);
      return entry ? parentShares(entry).flatMap(({ id: parent }) => parent ?? []) : [];
    });
    level = [...new Set(parents)].filter((id) => byId.has(id) && !shown.has(id));
    for (const id of level) shown.add(id);
  }
  return shown;
}
