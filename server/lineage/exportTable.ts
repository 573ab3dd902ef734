import { stringify } from 'csv-stringify/sync';
import type { ParentageTold } from '../../shared/holds/contract';
import { type Parentage, pairsOf } from '../../shared/lineage/pedigree';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { parentagesOf } from './parentage';
import { pedigreeOf } from './pedigree';
import { COLUMNS, UNKNOWN } from './readTable';

type Share = { id: string | null; share: number };

/**
 * Every fish as a row, parents by code. Fish of one brood share a `clutch`, so that a father who is one of several stays one
 * father. Fish out of a mixed batch give their possible parents, without which sire belongs to which dam.
 */
export async function tableOf(scope: Scope): Promise<string> {
  const { db, roomId } = scope;
  const { entries } = await pedigreeOf(scope);
  const byId = new Map(entries.map((entry) => [entry.id, entry]));
  const parentages = await parentagesOf(scope);
  const own = await db
    .selectFrom('fish')
    .leftJoin('brood', (join) => join.onRef('brood.roomId', '=', 'fish.roomId').onRef('brood.id', '=', 'fish.broodId'))
    .where('fish.roomId', '=', roomId)
    .select(['fish.id', 'fish.parentageId', 'brood.parentageId as inherited'])
    .execute();
  const rootOf = new Map(own.map((row) => [row.id, row.parentageId ?? row.inherited]));
  const fish = (await fishRows(scope, { foreign: true })).filter(({ id }) => byId.has(id));
  const codes = new Map(fish.map(({ id, code }) => [id, code ?? standIn(id)]));
  const rows = fish.map(({ id, sex, bornOn, strainCode }) => {
    const told = parentages.get(rootOf.get(id) ?? '');
    const { sires, dams } = told ? ofTold(told) : ofEntry(pairsOf(byId.get(id) ?? { id, from: [] }));
    return {
      id: codes.get(id),
      sire: listed(sires, codes),
      dam: listed(dams, codes),
      sex: sex === 'unknown' ? '' : sex,
      born: bornOn ?? '',
      strain: strainCode ?? '',
      clutch: told?.rootId ?? '',
      fathers: told?.paternity === 'mixed' ? 'several' : '',
    };
  });
  // A cell that begins with = + - @ would be a formula where the table is opened: it is quoted with '.
  return stringify(rows, { header: true, columns: [...COLUMNS], escape_formulas: true });
}

/** A fish that was not told apart has no code: the end of its id stands for it. */
const standIn = (id: string): string => `X-${id.slice(-12)}`;

const ofTold = ({ sires, dams }: ParentageTold) => ({
  sires: sires.map(({ fishId, share }) => ({ id: fishId, share })),
  dams: dams.map(({ fishId, share }) => ({ id: fishId, share })),
});

function ofEntry(pairs: ReturnType<typeof pairsOf>): { sires: Share[]; dams: Share[] } {
  const total = pairs.reduce((sum, { weight }) => sum + weight, 0);
  const side = (which: 'sire' | 'dam') => {
    const shares = new Map<string | null, number>();
    for (const pair of pairs)
      for (const { id, share } of sharesOf(pair[which]))
        shares.set(id, (shares.get(id) ?? 0) + (share * pair.weight) / total);
    return [...shares].map(([id, share]) => ({ id, share }));
  };
  return { sires: side('sire'), dams: side('dam') };
}

function sharesOf(parent: Parentage): Share[] {
  if (parent.kind === 'unknown') return [{ id: null, share: 1 }];
  if (parent.kind === 'known') return [{ id: parent.id, share: 1 }];
  const sum = parent.candidates.reduce((total, { weight }) => total + weight, 0);
  return parent.candidates.map(({ id, weight }) => ({ id, share: weight / sum }));
}

function listed(shares: Share[], codes: Map<string, string>): string {
  const name = (id: string | null) => (id && codes.get(id)) || UNKNOWN;
  const [only] = shares;
  if (!only || (shares.length === 1 && only.id === null)) return '';
  return shares.length === 1 ? name(only.id) : shares.map(({ id, share }) => `${name(id)}:${share}`).join(' ');
}
