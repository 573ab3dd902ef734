import { expect, test } from 'vitest';
import type * as yup from 'yup';
import * as z from 'zod/mini';
import { zodAsYup } from '@/components/form/zodAsYup';

const Length = z.codec(
  z.string('Type a length'),
  z.number('Type a length such as 32.5').check(z.minimum(1, 'Must be above zero')),
  {
    decode: (text) => Number(text.replace(',', '.')) * 10,
    encode: (tenths) => String(tenths / 10),
  },
);
const Draft = z.object({ length: Length, sires: z.array(z.object({ share: Length })) });
const schema = zodAsYup(Draft);

/** What Formik makes of a refusal: the first message of each path. */
async function errorsOf(draft: unknown): Promise<Record<string, string>> {
  try {
    await schema.validate(draft, { abortEarly: false });
    return {};
  } catch (error) {
    const { inner } = error as yup.ValidationError; // the only error that yup throws
    return Object.fromEntries(inner.map(({ path, message }) => [path, message]));
  }
}

test('a draft that the contract takes has no errors', async () =>
  expect(await errorsOf({ length: '32,5', sires: [{ share: '7' }] })).toEqual({}));

test('a blank, a word and a negative length each say what to do', async () => {
  expect(await errorsOf({ length: undefined, sires: [] })).toEqual({ length: 'Type a length' });
  expect(await errorsOf({ length: 'abc', sires: [] })).toEqual({ length: 'Type a length such as 32.5' });
  expect(await errorsOf({ length: '-3', sires: [] })).toEqual({ length: 'Must be above zero' });
});

test('errors of several fields land on each of them, nested ones by their path', async () =>
  expect(await errorsOf({ length: 'abc', sires: [{ share: '4' }, { share: '-1' }] })).toEqual({
    length: 'Type a length such as 32.5',
    'sires.1.share': 'Must be above zero',
  }));
