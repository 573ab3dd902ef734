import * as z from 'zod/mini';
import { SourceCode } from './sourceCodes';
import { PartialDay, words } from './wording';

/** A species as a keeper knows it. `undescribed`, `cf` and `aff` are said in the name itself ("Tropheus sp."). */
const SpeciesName = {
  scientific: words(120),
  naming: z.enum(['described', 'undescribed', 'cf', 'aff']),
  /** What the trade calls it. */
  tradeName: z.nullable(words(120)),
  /** Earlier or other scientific names. */
  synonyms: z.array(words(120)).check(z.maxLength(12)),
};

/** A place; `trade`: a name of the trade that was never traced to a place. */
const Locality = z.discriminatedUnion('known', [
  z.strictObject({ known: z.literal('known'), name: words(120), waters: z.nullable(words(120)) }),
  z.strictObject({ known: z.literal('trade'), name: words(120), waters: z.nullable(words(120)) }),
  z.strictObject({ known: z.literal('unknown') }),
]);
export type Locality = z.output<typeof Locality>;

const Founders = z.strictObject({
  provenance: z.enum(['wildCaught', 'bredElsewhere', 'unknown']),
  /** From whom; left out where the fishroom shows no other people. */
  from: z.nullable(words(160)),
  on: z.nullable(PartialDay),
  papers: z.nullable(words(160)),
});
export type Founders = z.output<typeof Founders>;

const PureStrain = z.strictObject({
  claim: z.literal('strain'),
  code: words(40),
  ...SpeciesName,
  locality: Locality,
  /** Selected for looks by breeders: for what, since when. */
  lineBred: z.nullable(words(160)),
  founders: Founders,
  source: z.nullable(SourceCode),
});

const Kind = z.strictObject({ scientific: words(120), locality: z.nullable(words(120)) });

/** A known cross, or a brood that another strain could have fathered. The shape has no room for a strain's claims. */
const Hybrid = z.strictObject({
  claim: z.enum(['hybrid', 'possibleHybrid']),
  kinds: z.array(Kind).check(z.minLength(2, 'Name at least two'), z.maxLength(12)),
});

/** What the sheet claims these fish to be. */
export const StrainClaim = z.union([PureStrain, Hybrid]);
export type StrainClaim = z.output<typeof StrainClaim>;
