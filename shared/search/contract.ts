import * as z from 'zod/mini';
import { endpoint, inRoom } from '../endpoint';

/** What has a page of its own and a code or name. In the order in which equally good finds are told. */
export const THINGS = ['tank', 'colony', 'brood', 'fish', 'strain', 'order', 'sheet', 'species'] as const;
export type Thing = (typeof THINGS)[number];

export const Found = z.strictObject({
  thing: z.enum(THINGS),
  id: z.string(),
  /** The code, the order's or sheet's number, the species' name. */
  code: z.string(),
  /** Species, place, mark or buyer. */
  name: z.nullable(z.string()),
  /** No longer here: died, sold, ended, retired. */
  gone: z.boolean(),
});
export type Found = z.output<typeof Found>;

/** As many as anyone looks through before typing another letter. */
export const MOST_FOUND = 20;

/** Everything of the fishroom by code or name, the best first; orders for those who may see them. */
export const searchAll = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/search',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ q: z.optional(z.string().check(z.maxLength(80, 'Keep it under 80 letters'))) }),
  output: z.strictObject({ found: z.array(Found) }),
});

/** "fish:<id>,tank:<id>": what a device opened lately. */
const Pages = z.codec(
  z.string('Send pages').check(z.maxLength(1200, 'Too many pages')),
  z.array(z.strictObject({ thing: z.enum(THINGS), id: z.string() })),
  {
    decode: (text) => text.split(',').flatMap((page) => pageOf(page) ?? []),
    encode: (pages) => pages.map(({ thing, id }) => `${thing}:${id}`).join(','),
  },
);

function pageOf(text: string): { thing: Thing; id: string } | null {
  const [word, id] = text.split(':');
  const thing = THINGS.find((one) => one === word);
  return thing && id ? { thing, id } : null;
}

/** What those pages are called now, in the order asked; what is not there, or not for this person, is left out. */
export const namePages = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/search/pages',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ pages: z.optional(Pages) }),
  output: z.strictObject({ found: z.array(Found) }),
});
