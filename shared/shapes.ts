import * as z from 'zod/mini';
import { DayText } from './days';

/** One line of text, trimmed, without control characters. */
export const line = (limit: number, empty: string) =>
  z.string(empty).check(
    z.trim(),
    z.minLength(1, { error: empty, abort: true }),
    z.maxLength(limit, `Keep it under ${limit} letters`),
    z.refine((text) => !CONTROL.test(text), 'Leave out line breaks and control characters'),
  );

/** A note of several lines; an empty one is null. */
export const Note = z.nullable(
  z.pipe(
    z.string('Type text').check(z.maxLength(4000, 'Keep it under 4000 letters')),
    z.transform((text: string) => text.trim() || null),
  ),
);

/** Control characters, and the marks that turn the direction of text round. */
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters are what is being refused
const CONTROL = /[\u0000-\u001f\u007f\u202a-\u202e\u2066-\u2069]/;

/** A row's version: a change carries the one it saw. */
export const Version = z.number('Send the version').check(z.int('A whole number'), z.minimum(1, 'From one'));

/** An instant as UTC text with milliseconds. */
export const Instant = z
  .string('Send an instant')
  .check(z.regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d{1,3})?Z$/, 'An instant such as 2026-03-14T08:30:00.000Z'));

/** A number out of a query string: digits only, so that '', 'null' and '1e3' are refused. */
export const queryNumber = (limit: number) =>
  z.codec(
    z.string('Send a number').check(z.regex(/^\d{1,9}$/, 'Digits only')),
    z.number().check(z.int(), z.minimum(0, 'From zero'), z.maximum(limit, `At most ${limit}`)),
    { decode: (text) => Number(text), encode: (number) => String(number) },
  );

/** Whole heads, one or more. */
export const Heads = z
  .number('Type how many')
  .check(z.int('Whole fish only'), z.minimum(1, 'At least one'), z.maximum(100_000, 'That is over 100 000'));

/** Whole heads, none allowed. */
export const HeadsOrNone = z
  .number('Type how many')
  .check(z.int('Whole fish only'), z.minimum(0, 'Zero or more'), z.maximum(100_000, 'That is over 100 000'));

/** A line of a form that may stay empty: an empty one is null. */
export const typedLine = (limit: number) =>
  z.codec(z.optional(z.string()), z.nullable(line(limit, 'Type it, or leave it empty')), {
    decode: (text) => text?.trim() || null,
    encode: (stored) => stored ?? '',
  });

/** A note of a form: several lines, empty is null. */
export const TypedNote = z.codec(
  z.optional(z.string().check(z.maxLength(4000, 'Keep it under 4000 letters'))),
  z.nullable(z.string()),
  {
    decode: (text) => text?.trim() || null,
    encode: (stored) => stored ?? '',
  },
);

/** A day of a form that may be left out. */
export const TypedDay = z.codec(z.optional(z.string()), z.nullable(DayText), {
  decode: (text) => text?.trim() || null,
  encode: (stored) => stored ?? '',
});
