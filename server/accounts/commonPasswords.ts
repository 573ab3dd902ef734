import { readFileSync } from 'node:fs';
import { Refusal } from '../../shared/refusal';

/**
 * The 5000 most used passwords of eight letters or more, most used first. From the frequency list that ships with zxcvbn,
 * copyright 2012-2016 Dan Wheeler and Dropbox, Inc., MIT licence.
 */
const COMMON = new Set(
  readFileSync(new URL('./commonPasswords.txt', import.meta.url), 'utf8')
    .split('\n')
    .filter(Boolean),
);

/** Words that anyone would try here first. */
const OURS = ['kinwater', 'fishroom', 'fishtank', 'aquarium', 'cichlid', 'cichlids', 'mouthbrooder', 'breeder'];

/** "Kinwater-2026!" is "kinwater": digits and signs at the ends hide nothing. */
const core = (text: string): string => text.replace(/^[\P{L}]+|[\P{L}]+$/gu, '');

/** Throws when the password is one of the first that somebody else would try. No rule about kinds of letters. */
export function mustBeUncommon(password: string, person: { name: string; email: string }): void {
  const folded = password.normalize('NFKC').toLowerCase();
  const inner = core(folded);
  const [beforeAt = '', domain = ''] = person.email.toLowerCase().split('@');
  const personal = [person.email.toLowerCase(), beforeAt, domain, domain.split('.')[0] ?? '', ...wordsOf(person.name)];
  const guessable =
    COMMON.has(folded) ||
    (COMMON.has(inner) && folded.length - inner.length <= 4) ||
    OURS.includes(inner) ||
    personal.some((word) => word.length >= 3 && (folded === word || inner === core(word)));
  if (guessable)
    throw new Refusal('invalid', 'Choose another password', {
      password: 'Too many people use this one, or it can be guessed. Three or four words of your own do well.',
    });
}

const wordsOf = (name: string): string[] => {
  const folded = name.toLowerCase();
  return [folded, folded.replace(/\s+/g, ''), ...folded.split(/\s+/)];
};
