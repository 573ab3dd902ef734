import type * as z from 'zod/mini';
import type { proposeSires } from '../../shared/holds/contract';
import type { Scope } from '../scope';
import { profileIn, speciesNames } from '../species';
import { clockFactsFor } from './clockFacts';

type Strains = z.input<typeof proposeSires.output>['strains'];

/** Strains as a hold of theirs would begin in a tank: who carries, the habit of paternity, and what the clock runs on. */
export async function strainsHere(
  scope: Scope,
  tankId: string,
  strainIds: string[],
  { from, until }: { from: string; until: string },
): Promise<Strains> {
  if (strainIds.length === 0) return [];
  const rows = await scope.db
    .selectFrom('strain')
    .where('roomId', '=', scope.roomId)
    .where('id', 'in', strainIds)
    .select(['id', 'code', 'speciesId', 'scientificName', 'locality'])
    .orderBy('code')
    .execute();
  const nameOf = await speciesNames(scope);
  const held = rows.map(({ speciesId }) => ({
    tankId,
    speciesId,
    spawnEarliest: from,
    spawnLatest: until,
    endedOn: null,
  }));
  const clock = await clockFactsFor(scope, held);
  const strains: Strains = [];
  for (const [i, { id, code, speciesId, scientificName, locality }] of rows.entries()) {
    const profile = await profileIn(scope, speciesId);
    strains.push({
      strainId: id,
      strainCode: code,
      displayName: scientificName ?? nameOf(speciesId),
      locality,
      mode: profile?.mode ?? null,
      paternity: profile?.paternity.value.habit ?? null,
      clock: clock(held[i] ?? { tankId, speciesId, spawnEarliest: from, spawnLatest: until, endedOn: null }),
    });
  }
  return strains;
}
