import type { RoomAsked } from '../scope';
import { speciesNames } from '../species';

type Of = { broodId: string | null; strainId: string | null };

export type What = {
  name: string;
  locality: string | null;
  broodCode: string | null;
  strain: { id: string; code: string } | null;
};

/** What a request is about, by its brood or its strain. */
export async function whatOf(scope: RoomAsked, { broodId, strainId }: Of): Promise<What> {
  const { db, roomId } = scope;
  const brood = broodId
    ? await db
        .selectFrom('brood')
        .where('roomId', '=', roomId)
        .where('id', '=', broodId)
        .select(['code', 'strainId'])
        .executeTakeFirst()
    : undefined;
  const strain = await db
    .selectFrom('strain')
    .where('roomId', '=', roomId)
    .where('id', '=', strainId ?? brood?.strainId ?? '')
    .select(['id', 'code', 'speciesId', 'scientificName', 'locality'])
    .executeTakeFirst();
  const nameOf = await speciesNames(scope);
  return {
    name: strain ? (strain.scientificName ?? nameOf(strain.speciesId)) : 'Species not settled',
    locality: strain?.locality ?? null,
    broodCode: brood?.code ?? null,
    strain: strain ? { id: strain.id, code: strain.code } : null,
  };
}
