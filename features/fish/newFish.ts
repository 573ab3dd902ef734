import * as z from 'zod/mini';
import { FishCode } from '@/shared/codes';
import { addFish, KEPT_AS, SEXES } from '@/shared/fish/contract';
import { Heads, TypedDay, TypedNote, typedLine } from '@/shared/shapes';
import { spelledHeads } from '@/shared/spelled';

const MOST = 200;
const { shape } = addFish.body;

/** An id that is chosen, or none. */
const chosenId = <S extends z.ZodMiniType<string | null, string | null>>(id: S) =>
  z.codec(z.optional(z.string()), id, {
    decode: (text) => (text || null) as z.input<S>,
    encode: (stored) => stored ?? '',
  });

/** Fish from outside as they are typed: so many, with as many codes. */
export const NewFishDraft = z
  .strictObject({
    strainId: z.string('Choose a strain').check(z.minLength(1, 'Choose a strain')),
    heads: spelledHeads(Heads.check(z.maximum(MOST, 'At most 200 fish at once'))),
    sex: z.enum(SEXES, 'Choose a sex'),
    keptAs: z.enum(KEPT_AS, 'Choose what it is kept for'),
    colonyId: chosenId(shape.colonyId),
    tankId: chosenId(shape.tankId),
    lotId: chosenId(shape.lotId),
    coded: z.boolean(),
    codes: z._default(z.string(), ''),
    mark: typedLine(120),
    arrivedOn: TypedDay,
    bornOn: TypedDay,
    note: TypedNote,
  })
  .check(
    z.superRefine(({ coded, codes, heads }, context) => {
      if (!coded) return;
      const given = codes.split(/[\s,;]+/).filter(Boolean);
      const refuse = (message: string) =>
        void context.issues.push({ code: 'custom', input: codes, path: ['codes'], message });
      const bad = given.find((code) => !FishCode.safeParse(code).success);
      if (bad) refuse(`${bad} is not a code: capitals, digits and dashes, such as DUMA-A04`);
      else if (given.length !== heads) refuse(`${given.length} codes for ${heads} fish`);
      else if (new Set(given).size !== given.length) refuse('Two of them are the same');
    }),
  );

export const emptyFish: z.input<typeof NewFishDraft> = {
  strainId: '',
  heads: '1',
  sex: 'unknown',
  keptAs: 'breeder',
  colonyId: '',
  tankId: '',
  lotId: '',
  coded: true,
  codes: '',
  mark: '',
  arrivedOn: '',
  bornOn: '',
  note: '',
};
