import * as z from 'zod/mini';
import { DayText } from '../days';
import { Id } from '../ids';
import { line } from '../shapes';

export const PHOTO_OF = ['fish', 'brood', 'batch', 'colony', 'hold', 'tank'] as const;

/** A photo; its picture comes with the same request. `takenOn` null: the capture date in the picture, else the day it is sent. */
const PhotoTaken = z.strictObject({
  kind: z.literal('photoTaken'),
  photoId: Id,
  of: z.strictObject({ thing: z.enum(PHOTO_OF, 'Choose what the photo shows'), id: Id }),
  takenOn: z.nullable(DayText),
  caption: z.nullable(line(200, 'Type a caption, or leave it empty')),
});

export const photoEntries = [PhotoTaken] as const;
