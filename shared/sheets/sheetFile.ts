import * as z from 'zod/mini';
import { DayText } from '../days';
import { Address, KeyId } from './wording';

/** Longest signed sheet that is read, in characters: 20 000 ancestors take about 10 million. */
const LONGEST = 16_000_000;

/** A compact JWS: header, content and signature in base64url, parted by dots. */
export const Jws = z
  .string('A signed sheet is needed')
  .check(
    z.maxLength(LONGEST, 'That is too long for a sheet'),
    z.regex(/^[\w-]+\.[\w-]+\.[\w-]*$/, 'That is not a signed sheet'),
  );

/** The small file that a sheet travels in: version 1, the signed sheet, the address of the issuer's keys. */
export const SheetFile = z.strictObject({ kinwaterSheet: z.literal(1), jws: Jws, keysAt: Address });
export type SheetFile = z.output<typeof SheetFile>;

export const sheetFile = (jws: string, keysAt: string): SheetFile => SheetFile.parse({ kinwaterSheet: 1, jws, keysAt });

/** A name for the file, made of the issue number: "lineage-sheet-2026-0031.kinwater.json". */
export const sheetFileName = (number: string): string =>
  `lineage-sheet-${number.replace(/[^\p{L}\p{N}]+/gu, '-').replace(/^-|-$/g, '')}.kinwater.json`;

/** Reads a sheet's file, or a bare JWS as pasted; null for anything else. */
export function readSheetFile(text: string): { jws: string; keysAt: string | null } | null {
  const bare = Jws.safeParse(text.trim());
  if (bare.success) return { jws: bare.data, keysAt: null };
  const file = SheetFile.safeParse(parsed(text));
  return file.success ? { jws: file.data.jws, keysAt: file.data.keysAt } : null;
}

/** What JSON text says; undefined when it is not JSON. */
export function parsed(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

/** A public Ed25519 key as a JWK (RFC 8037, section 2), named by its thumbprint. */
export const PublicJwk = z.object({
  kty: z.literal('OKP'),
  crv: z.literal('Ed25519'),
  x: z.string().check(z.regex(/^[A-Za-z0-9_-]{43}$/, 'That is not a public key')),
  kid: KeyId,
});
export type PublicJwk = z.output<typeof PublicJwk>;

/** A sheet that was taken back, named by the SHA-256 of its signed text so that the list gives nothing else away. */
export const Recalled = z.strictObject({
  sheet: z.string().check(z.regex(/^[A-Za-z0-9_-]{43}$/, 'That is not a digest')),
  state: z.enum(['replaced', 'withdrawn']),
  on: DayText,
});
export type Recalled = z.output<typeof Recalled>;

/**
 * A fishroom's published keys, as JWK set (RFC 7517, section 5, which has readers pass over members they do not know), and
 * which of its sheets no longer count.
 */
export type KeySet = { keys: (PublicJwk & { alg: 'EdDSA'; use: 'sig' })[]; recalled: Recalled[] };

/** Where an installation publishes the keys of a fishroom. */
export const keysAddress = (origin: string, roomId: string): string => `${origin}/keys/${roomId}.json`;

/** The keys of a published set that can sign sheets; keys of other kinds are passed over. Null when it is no set. */
export function readKeySet(value: unknown): PublicJwk[] | null {
  const set = z.object({ keys: z.array(z.unknown()).check(z.maxLength(1000)) }).safeParse(value);
  if (!set.success) return null;
  return set.data.keys.flatMap((key) => {
    const known = PublicJwk.safeParse(key);
    return known.success ? [known.data] : [];
  });
}

/** What a published set says of sheets that were taken back; lines of another shape are passed over. */
export function readRecalled(value: unknown): Recalled[] {
  const set = z.object({ recalled: z.array(z.unknown()).check(z.maxLength(20_000)) }).safeParse(value);
  if (!set.success) return [];
  return set.data.recalled.flatMap((line) => {
    const known = Recalled.safeParse(line);
    return known.success ? [known.data] : [];
  });
}
