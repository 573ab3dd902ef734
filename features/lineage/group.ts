import type { KinFish } from '@/components/chart/KinshipTable';
import { byNumber } from '@/shared/codes';
import type { LineageNode } from '@/shared/lineage/contract';
import { type Nodes, nameOf } from './entries';
import { inScope, type Scope } from './scope';

export const KEPT = ['breeder', 'holdback', 'other'] as const;
export type Kept = (typeof KEPT)[number];
export const KEPT_WORDS: Record<Kept, string> = { breeder: 'Breeders', holdback: 'Holdbacks', other: 'Other living' };

export const keptOf = ({ keptAs }: LineageNode): Kept => keptAs ?? 'other';

/** The fish of a scope that live here; of those chosen one by one all. */
export const fishIn = (nodes: Nodes, scope: Scope): LineageNode[] =>
  inScope(nodes, scope).filter(({ thing, living }) => thing === 'fish' && (living || scope.ids !== undefined));

/** Those that are compared: breeders and holdbacks, unless the keeper says otherwise; where there are none, all. */
export function comparedOf(fish: readonly LineageNode[], scope: Scope, kept: readonly Kept[]): LineageNode[] {
  if (scope.ids) return [...fish];
  const wanted: readonly Kept[] = kept.length > 0 ? kept : ['breeder', 'holdback'];
  const compared = fish.filter((node) => wanted.includes(keptOf(node)));
  return compared.length === 0 && kept.length === 0 ? [...fish] : compared;
}

/** Whether its code, tank or colony has every typed word in it. */
export const isWanted = (node: LineageNode | undefined, search: string): boolean => {
  const text = [node?.code, node?.tank?.code, node?.colony?.code].join(' ').toLowerCase();
  return search
    .toLowerCase()
    .split(/\s+/)
    .every((part) => text.includes(part));
};

/** What all codes begin with, up to a dash: "DUMA-", to be left out where there is little room. */
export function sharedStart(codes: readonly string[]): string {
  const [first = ''] = codes;
  const start = first.slice(0, first.indexOf('-') + 1);
  return codes.length > 1 && codes.every((code) => code.startsWith(start) && code.length > start.length) ? start : '';
}

/** How a fish stands at the head of its row and column. */
export function kinFishOf(fish: readonly LineageNode[], mean: ReadonlyMap<string, number>): KinFish[] {
  const start = sharedStart(fish.flatMap(({ code }) => code ?? []));
  return fish.map((node) => ({
    id: node.id,
    code: nameOf(node),
    short: node.code?.slice(start.length) ?? 'no code',
    sex: node.sex,
    possible: node.sex !== 'unknown' && !node.sexCertain,
    note: `mean ${(mean.get(node.id) ?? 0).toFixed(3).replace(/^0/, '')}`,
  }));
}

export type Order = 'mean' | 'code';

/** By mean kinship, lowest first, for those are the most useful; else by code. */
export const ordered = (fish: readonly KinFish[], order: Order, mean: ReadonlyMap<string, number>): KinFish[] =>
  [...fish].sort((a, b) => {
    const apart = order === 'mean' ? (mean.get(a.id) ?? 0) - (mean.get(b.id) ?? 0) : 0;
    return Math.abs(apart) > 1e-12 ? apart : byNumber(a.code, b.code);
  });

export type View = 'pairs' | 'all';

/** Males across and females down, fish not sexed on both sides; everyone on both where a sex is missing. */
export function sidesOf(fish: readonly KinFish[], view: View): { across: KinFish[]; down: KinFish[]; view: View } {
  const across = fish.filter(({ sex }) => sex !== 'female');
  const down = fish.filter(({ sex }) => sex !== 'male');
  const pairs = view === 'pairs' && across.length > 0 && down.length > 0;
  return pairs ? { across, down, view } : { across: [...fish], down: [...fish], view: 'all' };
}
