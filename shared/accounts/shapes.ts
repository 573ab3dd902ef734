import * as z from 'zod/mini';
import { line } from '../shapes';

const LONGEST_EMAIL = 254; // RFC 5321, section 4.5.3.1.3

/** An e-mail address as it was typed, without the space round it. */
export const Email = z.pipe(
  z.pipe(
    z.string('Type your e-mail address'),
    z.transform((text: string) => text.trim()),
  ),
  z
    .string('Type your e-mail address')
    .check(
      z.minLength(1, { error: 'Type your e-mail address', abort: true }),
      z.maxLength(LONGEST_EMAIL, 'That is too long for an e-mail address'),
      z.email('Type an address such as name@mail.example'),
    ),
);

/** Two spellings of one address are one account. */
export const foldedEmail = (email: string): string => email.normalize('NFKC').toLowerCase();

export const PersonName = line(80, 'Type your name');

export const PASSWORD_MIN = 8;
const PASSWORD_MAX = 128;

/** Letters as people count them: an emoji of one code point is one. */
const lettersOf = (text: string): number => [...text].length;

/** A password that is being chosen. Any letters will do; how common it is, is judged by the server. */
export const NewPassword = z.string('Type a password').check(
  z.refine((text) => lettersOf(text) >= PASSWORD_MIN, `Use at least ${PASSWORD_MIN} letters`),
  z.refine((text) => lettersOf(text) <= PASSWORD_MAX, `Use at most ${PASSWORD_MAX} letters`),
);

/** A password that is being checked. */
export const Password = z
  .string('Type your password')
  .check(z.minLength(1, 'Type your password'), z.maxLength(1000, 'That is too long'));

/** Out of a letter's link: 256 bits. */
export const LinkToken = z
  .string('Open the link in the letter')
  .check(z.regex(/^[\w-]{43}$/, 'This link is not whole. Open it from the letter again.'));
