import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { Ancestry, AnimalId, Generation } from './ancestry';
import { Growth, Treatment, Water } from './husbandry';
import { StrainClaim } from './strain';
import { Address, KeyId, PartialDay, words } from './wording';

const Count = z.number().check(z.int(), z.minimum(0), z.maximum(100_000));
const Share = z.number().check(z.minimum(0), z.maximum(1));

const Issue = z.strictObject({
  /** As printed: "2026-0031". */
  number: words(40),
  on: DayText,
  by: words(120),
  order: z.nullable(words(40)),
  replaces: z.nullable(z.strictObject({ number: words(40), because: z.nullable(words(200)) })),
});

const Fishroom = z.strictObject({
  id: Id,
  name: words(120),
  place: z.nullable(words(120)),
  /** Where the installation that issued the sheet is found; its keys are published below it. */
  address: Address,
  keyId: KeyId,
});

const Subject = z
  .strictObject({
    id: AnimalId,
    kind: z.enum(['fish', 'brood']),
    code: words(60),
    heads: z.strictObject({ male: Count, female: Count, unsexed: Count }),
    /** False when a fish's sex was judged and not vented: its shape is dashed. */
    sexSure: z.boolean(),
  })
  .check(
    z.refine(({ kind, heads }) => {
      const all = heads.male + heads.female + heads.unsexed;
      return kind === 'fish' ? all === 1 : all > 0;
    }, 'A sheet is for one fish, or for fish of one brood'),
  );

const Birth = z.strictObject({
  /** The interval in which the spawn lies; one day where it was seen. Age counts from here. */
  spawned: z.nullable(z.strictObject({ from: DayText, to: DayText })),
  taken: z.nullable(
    z.strictObject({ how: z.enum(['stripped', 'released', 'hatched']), on: DayText, holdDay: z.nullable(Count) }),
  ),
  /** For fish that came from elsewhere. */
  arrived: z.nullable(DayText),
  raised: z.nullable(z.strictObject({ alive: Count, of: Count })),
});

/** The coefficient F of these fish, or of a brood's young, with the outcomes behind an expectation. */
const Inbreeding = z.strictObject({
  f: Share,
  /** Every value F takes over the uncertain parents; null when there were too many to list. One value: F is certain. */
  outcomes: z.nullable(
    z.array(z.strictObject({ f: Share, probability: Share })).check(z.minLength(1), z.maxLength(200)),
  ),
  /** Complete generation equivalents of known ancestors. */
  generationsKnown: z.number().check(z.minimum(0), z.maximum(1000)),
});

const KnownFact = z.strictObject({
  on: z.nullable(PartialDay),
  what: words(300),
  /** How it is known: seen, measured, an invoice, a DNA test. */
  how: z.nullable(words(200)),
  by: z.nullable(words(120)),
});

const Photos = z.strictObject({
  count: Count,
  shown: z.nullable(
    z.strictObject({
      caption: words(200),
      takenOn: z.nullable(DayText),
      /** SHA-256 of the picture's file in hex, so that another picture can't be put in its place. */
      sha256: z.string().check(z.regex(/^[0-9a-f]{64}$/, 'A SHA-256 in hex is needed')),
      widthPx: z.number().check(z.int(), z.minimum(1), z.maximum(20_000)),
      heightPx: z.number().check(z.int(), z.minimum(1), z.maximum(20_000)),
    }),
  ),
});

const Caution = z.strictObject({ about: words(40), text: words(500) });

/**
 * All that a lineage sheet says, frozen at issue: version 1. Its JSON is signed byte for byte, so this shape checks and
 * never changes what it reads. A later version is another literal in `format` and another shape beside this one.
 */
export const SheetContent = z
  .strictObject({
    format: z.literal(1),
    issue: Issue,
    fishroom: Fishroom,
    subject: Subject,
    strain: StrainClaim,
    birth: Birth,
    generation: Generation,
    inbreeding: z.nullable(Inbreeding),
    ancestry: Ancestry,
    growth: z.nullable(Growth),
    water: z.nullable(Water),
    known: z.array(KnownFact).check(z.maxLength(80)),
    photos: Photos,
    treatments: z.array(Treatment).check(z.maxLength(20)),
    cautions: z.array(Caution).check(z.maxLength(12)),
  })
  .check(
    z.refine(({ subject, ancestry }) => ancestry.some((entry) => entry.id === subject.id), {
      error: 'The fish itself is missing from its ancestry',
      path: ['ancestry'],
    }),
  );
export type SheetContent = z.output<typeof SheetContent>;
export type SheetFact = z.output<typeof KnownFact>;
export type SheetInbreeding = z.output<typeof Inbreeding>;
