import * as yup from 'yup';
import * as z from 'zod/mini';
import { fieldsOf } from '@/shared/fieldsOf';

/** A yup schema with one rule: ask zod. Formik believes it is talking to yup. */
export function zodAsYup(schema: z.core.$ZodType) {
  return yup.mixed().test('shared-schema', async (draft) => {
    const result = await z.safeParseAsync(schema, draft);
    if (result.success) return true;
    return new yup.ValidationError(
      Object.entries(fieldsOf(result.error)).map(([path, message]) => new yup.ValidationError(message, draft, path)),
    );
  });
}
