import { PHOTO_OF } from '@/shared/photos/entries';

type PhotoThing = (typeof PHOTO_OF)[number];

export const isPhotoThing = (word: string): word is PhotoThing => PHOTO_OF.some((thing) => thing === word);

/** What a form was opened on, the narrowest first. */
export function photoSubject(
  params: Partial<Record<PhotoThing, string>>,
): { thing: PhotoThing; thingId: string } | null {
  for (const thing of ['fish', 'hold', 'batch', 'brood', 'colony', 'tank'] as const) {
    const thingId = params[thing];
    if (thingId) return { thing, thingId };
  }
  return null;
}
