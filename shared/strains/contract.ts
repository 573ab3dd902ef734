import * as z from 'zod/mini';
import { StrainCode } from '../codes';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { Heads, HeadsOrNone, line, Note, Version } from '../shapes';

export const NAMINGS = ['described', 'undescribed', 'cf', 'aff', 'hybrid', 'lineBred'] as const;
export const PROVENANCES = ['wildCaught', 'bredElsewhere', 'unknown'] as const;
/** Source codes of CITES, as in Res. Conf. 12.3; always shown in words. */
export const SOURCE_CODES = ['W', 'R', 'D', 'A', 'C', 'F', 'U', 'I', 'O', 'X', 'Y'] as const;

export const PROVENANCE_WORDS = {
  wildCaught: 'Wild caught',
  bredElsewhere: 'Bred elsewhere',
  unknown: 'Origin not known',
};
export const NAMING_WORDS = {
  described: 'Described species',
  undescribed: 'Not described yet (sp.)',
  cf: 'Compared with (cf.)',
  aff: 'Near to (aff.)',
  hybrid: 'Known hybrid',
  lineBred: 'Bred for looks',
};

const Provenance = z.enum(PROVENANCES, 'Choose where the fish came from');
const MaybeLine = (limit: number) => z.nullable(line(limit, 'Type it, or leave it empty'));

/** A species from one place, with what is known of where its founders came from. Names are messy: all of it can be said. */
export const StrainFacts = z.strictObject({
  code: StrainCode,
  speciesId: z
    .string('Choose a species')
    .check(z.minLength(1, 'Choose a species'), z.maxLength(80, 'Choose a species')),
  naming: z.enum(NAMINGS, 'Choose how the name is meant'),
  scientificName: MaybeLine(120),
  tradeName: MaybeLine(120),
  synonyms: MaybeLine(300),
  locality: MaybeLine(120),
  localityKnown: z.enum(['known', 'trade', 'unknown'], 'Choose how sure the locality is'),
  provenance: Provenance,
  fromWhom: MaybeLine(200),
  acquiredOn: z.nullable(DayText),
  papers: MaybeLine(300),
  citesSource: z.nullable(z.enum(SOURCE_CODES, 'Choose a source code')),
  note: Note,
});
export type StrainFacts = z.output<typeof StrainFacts>;

const Lot = z.strictObject({
  id: Id,
  receivedOn: DayText,
  fromWhom: MaybeLine(200),
  provenance: Provenance,
  /** Given by the supplier; 0 for wild caught. */
  generation: z.nullable(
    z.number('Type a number').check(z.int('A whole number'), z.minimum(0, 'From 0'), z.maximum(50, 'At most 50')),
  ),
  heads: z.nullable(Heads),
  deadOnArrival: HeadsOrNone,
  quarantineUntil: z.nullable(DayText),
  papers: MaybeLine(300),
  /** Wild fish of one lot may be sibs; kinship among them is then not known to be zero. */
  mayBeSibs: z.boolean('Say yes or no'),
  note: Note,
});
export type Lot = z.output<typeof Lot>;

export const StrainRow = z.strictObject({
  id: Id,
  version: Version,
  ...StrainFacts.shape,
  /** What is printed in italics: the strain's own name, or its species'. */
  displayName: z.string(),
  colonies: z.number(),
  livingFish: z.number(),
  broods: z.number(),
  retiredOn: z.nullable(DayText),
});
export type StrainRow = z.output<typeof StrainRow>;

export const listStrains = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/strains',
  needs: 'stock:see',
  params: inRoom({}),
  output: z.strictObject({ strains: z.array(StrainRow) }),
});

export const readStrain = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/strains/:strainId',
  needs: 'stock:see',
  params: inRoom({ strainId: Id }),
  output: z.strictObject({ strain: StrainRow, lots: z.array(z.strictObject({ ...Lot.shape, version: Version })) }),
});

export const addStrain = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/strains',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({ id: Id, ...StrainFacts.shape }),
  output: StrainRow,
});

export const changeStrain = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/strains/:strainId',
  needs: 'stock:write',
  params: inRoom({ strainId: Id }),
  body: z.strictObject({ version: Version, retiredOn: z.nullable(DayText), ...StrainFacts.shape }),
  output: StrainRow,
});

export const addLot = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/strains/:strainId/lots',
  needs: 'stock:write',
  params: inRoom({ strainId: Id }),
  body: Lot,
  output: z.strictObject({ ...Lot.shape, version: Version }),
});
