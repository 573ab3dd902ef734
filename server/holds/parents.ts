import type { FishRow } from '../../shared/fish/contract';
import { Refusal } from '../../shared/refusal';
import { mustBeOurs, mustLiveHere, oneFish } from '../fish';
import type { Scope } from '../scope';
import { profileIn } from '../species';

/** The fish that holds: a female or unsexed, except where the species' males hold. */
export async function mayHold(scope: Scope, holderId: string): Promise<FishRow> {
  await mustLiveHere(scope, { fishId: holderId, field: 'holderId', sentence: 'Choose a fish' });
  const holder = await oneFish(scope, holderId);
  if (holder.sex === 'male' && !(await malesHold(scope, holder.speciesId))) {
    throw new Refusal('invalid', 'A male is recorded here', { holderId: 'Choose a female, or correct the sex first' });
  }
  return holder;
}

async function malesHold(scope: Scope, speciesId: string | null): Promise<boolean> {
  const profile = speciesId ? await profileIn(scope, speciesId) : null;
  return profile?.mode === 'paternalMouthbrooder';
}

export async function fathersMustNotBeFemale(scope: Scope, sires: { fishId: string | null }[]): Promise<void> {
  for (const [i, { fishId }] of sires.entries()) {
    if (!fishId) continue;
    await mustBeOurs(scope, 'fish', fishId, `parentage.sires.${i}.fishId`, 'Choose a fish');
    const fish = await oneFish(scope, fishId);
    if (fish.sex === 'female') {
      throw new Refusal('invalid', `${fish.code ?? 'This fish'} is recorded as a female`, {
        [`parentage.sires.${i}.fishId`]: 'A female cannot be the father',
      });
    }
  }
}
