import type { BroodStory, FoundStory, HoldStory } from './broods';
import { lastDayOf } from './broods';
import { CATE_FOUND, CATE_HOLDS } from './broodsAltolamprologus';
import { LEMP_HOLDS } from './broodsCyprichromis';
import { MEUT_HOLDS } from './broodsEnantiopus';
import { CALI_HOLDS } from './broodsLabidochromis';
import { ESMI_HOLDS } from './broodsMaylandia';
import { MOIL_HOLDS } from './broodsTropheus';
import { COLONIES } from './colonies';
import type { HeldBack } from './lives';
import type { StrainCode } from './strains';

export const HOLDS: HoldStory[] = [
  ...MOIL_HOLDS,
  ...LEMP_HOLDS,
  ...MEUT_HOLDS,
  ...CATE_HOLDS,
  ...ESMI_HOLDS,
  ...CALI_HOLDS,
];
export const FOUND: FoundStory[] = CATE_FOUND;

export function strainOfColony(code: string): StrainCode {
  const colony = COLONIES.find((one) => one.code === code);
  if (!colony) throw new Error(`The story has no colony ${code}`);
  return colony.strain;
}

/** Broods made of two once they were joined: fish taken out later have no birthday of their own. */
const joinedInto = (handle: string): { age: number; spawn: number } | null => {
  for (const { brood, spawn } of HOLDS) {
    const joining = brood?.steps.find((step) => step.kind === 'joined' && step.brood === handle);
    if (joining) return { age: joining.age, spawn: lastDayOf(spawn) };
  }
  return null;
};

/** Every fish that was taken out of a brood to be kept. */
export function heldBackFish(): HeldBack[] {
  return HOLDS.flatMap(({ handle, colony, spawn, brood }) =>
    (brood?.steps ?? []).flatMap((step) => {
      if (step.kind !== 'kept') return [];
      const born = lastDayOf(spawn);
      const on = born + step.age;
      const joined = joinedInto(handle);
      const mixed = joined !== null && joined.spawn + joined.age <= on;
      const { stem, numbers, colony: home, tank } = step;
      return [{ on, born: mixed ? null : born, strain: strainOfColony(colony), stem, numbers, colony: home, tank }];
    }),
  );
}

export type Begun = { handle: string; colony: string; strain: StrainCode; born: number; brood: BroodStory };
