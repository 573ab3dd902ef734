import { PedigreeError } from '../../shared/lineage/pedigreeError';
import { sortPedigree } from '../../shared/lineage/sortedPedigree';
import { Refusal } from '../../shared/refusal';
import type { Scope } from '../scope';
import { pedigreeOf } from './pedigree';

/** Refuses, inside the transaction that would write it, a pedigree in which a fish is its own ancestor. */
export async function mustNotLoop(scope: Scope, field: string): Promise<void> {
  const { entries } = await pedigreeOf(scope);
  try {
    sortPedigree(entries);
  } catch (error) {
    if (!(error instanceof PedigreeError) || error.reason !== 'cycle') throw error;
    const names = await namesIn(scope, error.ids);
    throw new Refusal('invalid', `A fish would be its own ancestor: ${[...names, names[0]].join(', child of ')}`, {
      [field]: 'A descendant cannot be a parent',
    });
  }
}

/** The codes of a ring of animals; the draws between them have none. */
export async function namesIn({ db, roomId }: Scope, ids: string[]): Promise<string[]> {
  const fish = await db
    .selectFrom('fish')
    .where('roomId', '=', roomId)
    .where('id', 'in', ids)
    .select(['id', 'code'])
    .execute();
  const broods = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('id', 'in', ids)
    .select(['id', 'code'])
    .execute();
  const byId = new Map([...fish, ...broods].map(({ id, code }) => [id, code ?? 'a fish not told apart']));
  return ids.flatMap((id) => byId.get(id) ?? []);
}
