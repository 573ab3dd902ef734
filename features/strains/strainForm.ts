import * as z from 'zod/mini';
import { TypedDay, TypedNote, typedLine } from '@/shared/shapes';
import { SourceCode } from '@/shared/sheets/sourceCodes';
import { StrainFacts, type StrainRow } from '@/shared/strains/contract';

/** A strain as it is typed. */
export const StrainDraft = z.strictObject({
  ...StrainFacts.shape,
  scientificName: typedLine(120),
  tradeName: typedLine(120),
  synonyms: typedLine(300),
  locality: typedLine(120),
  fromWhom: typedLine(200),
  acquiredOn: TypedDay,
  papers: typedLine(300),
  citesSource: z.codec(z.optional(z.string()), z.nullable(SourceCode), {
    decode: (text) => SourceCode.safeParse(text).data ?? null,
    encode: (stored) => stored ?? '',
  }),
  note: TypedNote,
});
export type StrainDraft = z.input<typeof StrainDraft>;

export const emptyStrain: StrainDraft = {
  code: '',
  speciesId: '',
  naming: 'described',
  scientificName: '',
  tradeName: '',
  synonyms: '',
  locality: '',
  localityKnown: 'known',
  provenance: 'unknown',
  fromWhom: '',
  acquiredOn: '',
  papers: '',
  citesSource: '',
  note: '',
};

export function strainAsTyped(strain: StrainRow): StrainDraft {
  const draft: Partial<Record<keyof StrainFacts, unknown>> = {};
  for (const key of Object.keys(StrainFacts.shape)) {
    const name = key as keyof StrainFacts; // keys of that very shape
    draft[name] = strain[name] ?? '';
  }
  return draft as StrainDraft; // every key of the shape, null as the empty text
}
