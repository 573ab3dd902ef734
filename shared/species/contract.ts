import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { line, Version } from '../shapes';
import { FIGURE_SHAPES } from './figureShapes';
import { BREEDING_MODES } from './species';

const figureShapes = Object.entries(FIGURE_SHAPES);

/** Figures that a fishroom sets instead of the library's, each with where it has it from. */
export const SetFigures = z
  .record(z.string(), z.strictObject({ value: z.unknown(), source: line(200, 'Say where the figure comes from') }))
  .check(
    z.superRefine((set, context) => {
      for (const [name, { value }] of Object.entries(set)) {
        const shape = figureShapes.find(([known]) => known === name)?.[1];
        const judged = shape?.safeParse(value);
        if (judged?.success) continue;
        const message = judged ? (judged.error.issues[0]?.message ?? 'That is not a value') : 'There is no such figure';
        context.issues.push({ code: 'custom', input: value, path: [name, 'value'], message });
      }
    }),
  );

/** What a species that is not in the library is like: its figures are then filled in from its relatives, and say so. */
export const SpeciesAbout = z.strictObject({
  mode: z.enum(BREEDING_MODES, 'Choose how the young are cared for'),
  carers: z.enum(['mother', 'father', 'pair', 'group'], 'Choose who cares for them'),
  kin: z.enum(
    [
      'tropheini',
      'cyphotilapia',
      'openWater',
      'mbunaAndHaps',
      'victoriaAndRivers',
      'dwarfRiver',
      'biparental',
      'tilapia',
      'caveSpawner',
    ],
    'Choose its nearest relatives',
  ),
  body: z.enum(['deep', 'standard', 'slender'], 'Choose its shape'),
  waters: z.enum(['tanganyika', 'malawi', 'victoriaAndRivers', 'lagoons'], 'Choose its home water'),
});

/** A species that this fishroom changed, or added. The library itself is in the app. */
export const SpeciesSet = z.strictObject({
  id: z.string(),
  version: Version,
  own: z.boolean(),
  scientificName: z.nullable(z.string()),
  about: z.nullable(SpeciesAbout),
  figures: z.record(z.string(), z.strictObject({ value: z.unknown(), source: z.string() })),
});
export type SpeciesSet = z.output<typeof SpeciesSet>;

export const listSpecies = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/species',
  needs: 'stock:see',
  params: inRoom({}),
  output: z.strictObject({ set: z.array(SpeciesSet) }),
});

/** Sets all figures that differ from the library's; an empty set brings the library back. `version` 0: not set yet. */
export const setSpecies = endpoint({
  method: 'PUT',
  path: '/api/rooms/:roomId/species/:speciesId',
  needs: 'stock:write',
  params: inRoom({ speciesId: z.string().check(z.regex(/^[a-z0-9-]{1,80}$/)) }),
  body: z.strictObject({ version: z.number('Send the version').check(z.int(), z.minimum(0)), figures: SetFigures }),
  output: SpeciesSet,
});

export const addSpecies = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/species',
  needs: 'stock:write',
  params: inRoom({}),
  body: z.strictObject({
    id: Id,
    scientificName: line(120, 'Type the name'),
    about: SpeciesAbout,
    figures: SetFigures,
  }),
  output: SpeciesSet,
});
