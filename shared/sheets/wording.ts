import * as z from 'zod/mini';
import { isDay } from '../days';

/*
 * Shapes of the words on a sheet. They check and never change what they read: a sheet is signed as bytes, and what is
 * read from it must be what was signed.
 */

/** Control characters, and the marks that turn the direction of text round. */
const CONTROL = /[\p{Cc}\u2028\u2029\u202a-\u202e\u2066-\u2069]/u;

/** One line of a sheet, up to a number of letters. */
export const words = (limit: number) =>
  z.string('Text is needed').check(
    z.minLength(1, 'Text is needed'),
    z.maxLength(limit, `Keep it under ${limit} letters`),
    z.refine((text) => !CONTROL.test(text), 'Leave out line breaks and control characters'),
  );

/** A date known to the day, the month or the year: `'2018-06-14'`, `'2018-06'`, `'2018'`. */
export const PartialDay = z
  .string('A date is needed')
  .check(
    z.refine(
      (text) => isDay(`${text}-01-01`.slice(0, 10)) && /^\d{4}(-\d{2}){0,2}$/.test(text),
      'A date such as 2018-06 is needed',
    ),
  );

/** An address of an installation, or below it: http or https, a host, nothing that hides who is meant. */
export const Address = z
  .string('An address is needed')
  .check(
    z.maxLength(500, 'Keep it under 500 letters'),
    z.regex(
      /^https?:\/\/[a-z0-9.-]+(:\d{1,5})?(\/[\w./~%+-]*)?$/i,
      'An address such as https://fish.example is needed',
    ),
  );

/** Scheme, host and port of an address, in lower case. */
export const hostOf = (address: string): string => (/^https?:\/\/[^/]+/i.exec(address)?.[0] ?? '').toLowerCase();

/** Thumbprint of a public key by RFC 7638: 32 bytes in base64url. */
export const KeyId = z.string('A key is needed').check(z.regex(/^[A-Za-z0-9_-]{43}$/, 'That is not the id of a key'));
