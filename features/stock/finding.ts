import type { BroodRow } from '@/shared/broods/contract';
import { byNumber } from '@/shared/codes';
import type { ColonyRow } from '@/shared/colonies/contract';
import type { FishRow } from '@/shared/fish/contract';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';

export type Stock = {
  colonies: ColonyRow[];
  broods: BroodRow[];
  tanks: TankRow[];
  fish: FishRow[];
  strains: StrainRow[];
};
export type Found = { kind: keyof Stock; id: string; code: string; note: string | null };

/** What has the words in its code, mark, place or species; codes that begin with them first. */
export function foundIn(stock: Stock, search: string): Found[] {
  const wanted = search.trim().toLowerCase();
  const { colonies, broods, tanks, fish, strains } = stock;
  const named = (displayName: string | null, locality: string | null) =>
    [displayName, locality].filter(Boolean).join(' ') || null;
  const all: (Found & { also: (string | null)[] })[] = [
    ...tanks.map(({ id, code, place }) => ({ kind: 'tanks' as const, id, code, note: place, also: [] })),
    ...colonies.map(({ id, code, displayName, locality }) => ({
      kind: 'colonies' as const,
      id,
      code,
      note: named(displayName, locality),
      also: [],
    })),
    ...fish.map(({ id, code, displayName, mark }) => ({
      kind: 'fish' as const,
      id,
      code: code ?? '',
      note: mark ?? displayName,
      also: [displayName],
    })),
    ...broods.map(({ id, code, displayName, locality }) => ({
      kind: 'broods' as const,
      id,
      code,
      note: named(displayName, locality),
      also: [],
    })),
    ...strains.map(({ id, code, displayName, locality, tradeName }) => ({
      kind: 'strains' as const,
      id,
      code,
      note: named(displayName, locality),
      also: [tradeName],
    })),
  ];
  const begins = ({ code }: Found) => code.toLowerCase().startsWith(wanted);
  return all
    .filter(({ code, note, also }) => [code, note, ...also].some((text) => text?.toLowerCase().includes(wanted)))
    .sort((a, b) => Number(begins(b)) - Number(begins(a)) || byNumber(a.code, b.code))
    .map(({ also: _also, ...found }) => found);
}
