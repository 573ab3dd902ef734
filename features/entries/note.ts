import * as z from 'zod/mini';

/** A note as typed in a form, where Formik leaves an empty field out: null when there is nothing in it. */
export const NoteDraft = z.pipe(
  z.optional(z.string('Type text').check(z.maxLength(4000, 'Keep it under 4000 letters'))),
  z.transform((text) => text?.trim() || null),
);
