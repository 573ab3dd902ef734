import * as z from 'zod/mini';
import { DayText } from '../days';
import { endpoint, inRoom } from '../endpoint';
import { Id } from '../ids';
import { EntryLine } from '../record/contract';
import { PHOTO_OF } from './entries';

export const Photo = z.strictObject({
  id: Id,
  of: z.strictObject({ thing: z.enum(PHOTO_OF), id: Id, code: z.nullable(z.string()) }),
  takenOn: DayText,
  takenAt: z.nullable(z.string()),
  caption: z.nullable(z.string()),
  width: z.number(),
  height: z.number(),
  by: z.string(),
  entryId: z.nullable(Id),
});
export type Photo = z.output<typeof Photo>;

/**
 * Takes in one picture with its entry: a form with the field `entry` (an entry draft of kind `photoTaken` as JSON) and the
 * file in `picture`. Sent twice it is stored once.
 */
export const addPhoto = endpoint({
  method: 'POST',
  path: '/api/rooms/:roomId/photos',
  needs: 'entry:record',
  kind: 'upload',
  params: inRoom({}),
  output: z.strictObject({ line: EntryLine, photo: Photo }),
});

/** Newest first. Of a brood: its own, its batches' and its hold's. */
export const listPhotos = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/photos',
  needs: 'stock:see',
  params: inRoom({}),
  query: z.strictObject({ thing: z.optional(z.enum(PHOTO_OF)), thingId: z.optional(Id) }),
  output: z.strictObject({ photos: z.array(Photo) }),
});

/** The picture itself: `small` 320 px, `large` 1280 px on the long edge. */
export const showPhoto = endpoint({
  method: 'GET',
  path: '/api/rooms/:roomId/photos/:photoId/:size',
  needs: 'stock:see',
  kind: 'file',
  params: inRoom({ photoId: Id, size: z.enum(['small', 'large']) }),
  output: z.unknown(),
});

export const removePhoto = endpoint({
  method: 'DELETE',
  path: '/api/rooms/:roomId/photos/:photoId',
  needs: 'photo:remove',
  params: inRoom({ photoId: Id }),
  output: z.strictObject({ ok: z.literal(true) }),
});
