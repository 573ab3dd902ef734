import type { PairingRequest } from '../../shared/lineage/planPairing';

/** A fish of an invented pedigree; parents come first. */
export type Parents = { id: string; sire: string | null; dam: string | null };

/** The same pedigree every time: broods of one size, parents drawn from the latest `window` fish. */
export function invented(count: number, broodSize: number, window: number): Parents[] {
  let state = 2_463;
  const below = (limit: number) => {
    state = (state * 16_807) % 2_147_483_647;
    return state % limit;
  };
  const fish: Parents[] = Array.from({ length: 40 }, (_, i) => ({ id: `w${i}`, sire: null, dam: null }));
  while (fish.length < count) {
    const first = Math.max(0, fish.length - window);
    const recent = () => fish[first + below(fish.length - first)]?.id ?? null;
    const [sire, dam] = [recent(), recent()];
    for (let fry = 0; fry < broodSize && fish.length < count; fry += 1) fish.push({ id: `f${fish.length}`, sire, dam });
  }
  return fish;
}

/** Rows of numbers by the tabular method (Emik & Terrill 1949). */
export function tableOfRows(fish: Parents[]): number[][] {
  const rowOf = new Map(fish.map(({ id }, row) => [id, row]));
  const table: number[][] = fish.map(() => []);
  const at = (i: number, j: number) => (i < 0 || j < 0 ? 0 : ((i > j ? table[i]?.[j] : table[j]?.[i]) ?? 0));
  fish.forEach(({ sire, dam }, row) => {
    const [s, d] = [rowOf.get(sire ?? '') ?? -1, rowOf.get(dam ?? '') ?? -1];
    for (let other = 0; other < row; other += 1) table[row]?.push((at(s, other) + at(d, other)) / 2);
    table[row]?.push((1 + at(s, d)) / 2);
  });
  return table;
}

/**
 * F one fish after the other through the sorted list of its ancestors (Meuwissen & Luo 1992), brood mates copied.
 * Returns the milliseconds for all: those it took, or reckoned from the fish done within `budget`.
 */
export function fByAncestors(fish: Parents[], budget: number): number {
  const rowOf = new Map(fish.map(({ id }, row) => [id, row]));
  const sires = fish.map(({ sire }) => rowOf.get(sire ?? '') ?? -1);
  const dams = fish.map(({ dam }) => rowOf.get(dam ?? '') ?? -1);
  const f: number[] = [];
  const chance: number[] = [];
  const from = performance.now();
  for (let row = 0; row < fish.length; row += 1) {
    const [s, d] = [sires[row] ?? -1, dams[row] ?? -1];
    chance.push(0.5 - ((s < 0 ? -1 : (f[s] ?? 0)) + (d < 0 ? -1 : (f[d] ?? 0))) / 4);
    const mate = row > 0 && s >= 0 && sires[row - 1] === s && dams[row - 1] === d;
    f.push(mate ? (f[row - 1] ?? 0) : s < 0 || d < 0 ? 0 : throughAncestors(row, sires, dams, chance) - 1);
    const spent = performance.now() - from;
    if (spent > budget) return (spent * fish.length) / (row + 1);
  }
  return performance.now() - from;
}

function throughAncestors(row: number, sires: number[], dams: number[], chance: number[]): number {
  const share = new Map([[row, 1]]);
  const waiting = [row];
  let sum = 0;
  for (let next = waiting.pop(); next !== undefined; next = waiting.pop()) {
    const part = share.get(next) ?? 0;
    sum += part * part * (chance[next] ?? 0);
    for (const parent of [sires[next] ?? -1, dams[next] ?? -1]) {
      if (parent < 0) continue;
      const before = share.get(parent);
      share.set(parent, (before ?? 0) + part / 2);
      if (before === undefined) insertSorted(waiting, parent);
    }
  }
  return sum;
}

function insertSorted(waiting: number[], row: number): void {
  let [low, high] = [0, waiting.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((waiting[middle] ?? 0) < row) low = middle + 1;
    else high = middle;
  }
  waiting.splice(low, 0, row);
}

/** One fish against all as T D T' q, ids and maps throughout. */
export function columnByMaps(fish: Parents[], f: (id: string) => number): (id: string) => Map<string, number> {
  const part = (id: string | null) => (id === null ? -1 : f(id));
  const chance = new Map(fish.map(({ id, sire, dam }) => [id, (0.5 - (part(sire) + part(dam)) / 4) / 2]));
  return (asked) => {
    const share = new Map([[asked, 1]]);
    for (const { id, sire, dam } of fish.toReversed()) {
      const own = share.get(id);
      if (own === undefined) continue;
      if (sire) share.set(sire, (share.get(sire) ?? 0) + own / 2);
      if (dam) share.set(dam, (share.get(dam) ?? 0) + own / 2);
    }
    const kinship = new Map<string, number>();
    for (const { id, sire, dam } of fish) {
      const inherited = ((kinship.get(sire ?? '') ?? 0) + (kinship.get(dam ?? '') ?? 0)) / 2;
      kinship.set(id, inherited + (share.get(id) ?? 0) * (chance.get(id) ?? 0));
    }
    return kinship;
  };
}

/** The lowest mean kinship of the young, by looking at every group of males with every group of females. */
export function everyGroup({ matrix, males, females, chooseMales, chooseFemales }: PairingRequest): number {
  const sires = groupsOf(males, chooseMales);
  const dams = groupsOf(females, chooseFemales);
  let best = 1;
  for (const group of sires) {
    for (const mates of dams) {
      best = Math.min(
        best,
        mean(matrix, group, group) / 4 + mean(matrix, mates, mates) / 4 + mean(matrix, group, mates) / 2,
      );
    }
  }
  return best;
}

function mean(matrix: PairingRequest['matrix'], some: string[], others: string[]): number {
  let sum = 0;
  for (const a of some) for (const b of others) sum += matrix.between(a, b);
  return sum / (some.length * others.length);
}

function groupsOf(ids: string[], size: number): string[][] {
  if (size === 0) return [[]];
  return ids.flatMap((id, place) => groupsOf(ids.slice(place + 1), size - 1).map((rest) => [id, ...rest]));
}
