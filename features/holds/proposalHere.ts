import type { FishRow } from '@/shared/fish/contract';
import type { HoldRow } from '@/shared/holds/contract';
import type { Proposal } from './beginning';

/**
 * What can be proposed out of what this device has seen, where there is no signal to ask: the tank's fish as they are now,
 * each male with an equal share. Dates are known for a strain of which another female holds.
 */
export function proposalHere(tankId: string, fish: readonly FishRow[], holds: readonly HoldRow[]): Proposal {
  const here = fish.filter(({ tank, exit }) => tank?.id === tankId && exit === null);
  const males = here.filter(({ sex }) => sex !== 'female');
  const openOf = (fishId: string) => {
    const open = holds.find(({ holder }) => holder?.id === fishId);
    return { openHoldId: open?.id ?? null, holdingSince: open?.spawnLatest ?? null };
  };
  return {
    sires: males.map((one) => ({
      fishId: one.id,
      code: one.code,
      sex: one.sex === 'male' ? 'male' : 'unknown',
      strainCode: one.strainCode,
      strainId: one.strainId,
      foreign: false,
      dominantDays: 0,
      ofDays: 0,
      share: 1 / males.length,
      ...openOf(one.id),
    })),
    females: here.flatMap((one) =>
      one.sex === 'male'
        ? []
        : [
            {
              fishId: one.id,
              code: one.code,
              colonyId: one.colony?.id ?? null,
              strainId: one.strainId,
              sex: one.sex,
              lastEndedOn: null,
              ...openOf(one.id),
            },
          ],
    ),
    paternity: null,
    strains: strainsOf(here, holds),
    lookedOn: null,
  };
}

function strainsOf(here: readonly FishRow[], holds: readonly HoldRow[]): Proposal['strains'] {
  const ids = new Set(here.flatMap(({ strainId }) => strainId ?? []));
  return [...ids].flatMap((strainId) => {
    const hold = holds.find((one) => one.strainId === strainId);
    const fish = here.find((one) => one.strainId === strainId);
    if (!hold || !fish) return [];
    const { mode, clock, locality } = hold;
    const displayName = hold.displayName ?? fish.displayName ?? '';
    return [{ strainId, strainCode: fish.strainCode ?? '', displayName, locality, mode, paternity: null, clock }];
  });
}
