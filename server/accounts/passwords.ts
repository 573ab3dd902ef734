import { randomBytes, type ScryptOptions, scrypt, timingSafeEqual } from 'node:crypto';
import { Refusal } from '../../shared/refusal';

/*
 * scrypt with N = 2^17 (the house's `passwordCost`), r = 8, p = 1: OWASP's Password Storage Cheat Sheet, second choice after
 * Argon2id, and in Node itself. One hash takes 128 MB and a third of a second, so two at most are worked at once.
 */
const R = 8;
const P = 1;
const AT_ONCE = 2;
const IN_LINE = 20;

let working = 0;
const line: (() => void)[] = [];

async function inTurn<T>(work: () => Promise<T>): Promise<T> {
  if (working >= AT_ONCE) {
    if (line.length >= IN_LINE)
      throw new Refusal(
        'busy',
        'Many people are signing in just now. Try again in a few seconds.',
        {},
        { retryAfter: 5 },
      );
    // Whoever is called takes over the place of the one that left, so the count stays.
    await new Promise<void>((called) => line.push(called));
  } else working += 1;
  try {
    return await work();
  } finally {
    const next = line.shift();
    if (next) next();
    else working -= 1;
  }
}

function derive(password: string, salt: Buffer, log2N: number, length: number): Promise<Buffer> {
  // The same letters come composed from one keyboard and decomposed from another: RFC 8265, section 4.2.2.
  const text = password.normalize('NFC');
  const options: ScryptOptions = { N: 2 ** log2N, r: R, p: P, maxmem: 256 * 2 ** log2N * R };
  return new Promise((done, failed) => {
    scrypt(text, salt, length, options, (error, key) => (error ? failed(error) : done(key)));
  });
}

/** "scrypt$17$8$1$salt$key": its cost stands in it, so that a later cost can be told from this one. */
export async function hashPassword(password: string, log2N: number): Promise<string> {
  const salt = randomBytes(16);
  const key = await inTurn(() => derive(password, salt, log2N, 32));
  return ['scrypt', log2N, R, P, salt.toString('base64url'), key.toString('base64url')].join('$');
}

/**
 * Whether the password belongs to the hash. Without a hash (no such account, or one without a password) it takes as long and
 * says no, so that time does not tell who has an account.
 */
export async function isPassword(password: string, hash: string | null, log2N: number): Promise<boolean> {
  const [, cost = String(log2N), , , salt = '', key = ''] = (hash ?? '').split('$');
  const expected = Buffer.from(key, 'base64url');
  const made = await inTurn(() =>
    derive(password, Buffer.from(salt || 'nobody', 'base64url'), Number(cost), expected.length || 32),
  );
  return hash !== null && expected.length > 0 && timingSafeEqual(made, expected);
}
