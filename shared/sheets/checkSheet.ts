import * as z from 'zod/mini';
import { SheetContent } from './content';
import { Jws, type PublicJwk, parsed } from './sheetFile';
import { hostOf, KeyId } from './wording';

/** `EdDSA` is written (RFC 8037); the name that RFC 9864 gives to the same signature is read as well. Nothing else is. */
export const ALGORITHMS = ['EdDSA', 'Ed25519'] as const;
export type Algorithm = (typeof ALGORITHMS)[number];

export const SHEET_TYPE = 'kinwater-sheet+jws';

const Header = z.strictObject({ alg: z.enum(ALGORITHMS), kid: KeyId, typ: z.literal(SHEET_TYPE) });
const SIGNATURE_BYTES = 64;

/** What a check of a signed sheet comes to. Only `valid` hands out the content. */
export type SheetVerdict =
  | { state: 'valid'; keyId: string; content: SheetContent }
  /** The key is known, and the sheet is not what it signed. */
  | { state: 'altered'; keyId: string }
  /** Not signed in a way that counts: no signature, another method, or by another key than the sheet names. */
  | { state: 'badSignature'; because: 'method' | 'length' | 'otherKey' | 'otherAddress' }
  | { state: 'unknownKey'; keyId: string }
  | { state: 'notASheet'; because: 'form' | 'content' | 'newer' }
  /** This browser has no Ed25519, or the page is not served over https. */
  | { state: 'cannotCheck' };

/** What the check needs done by a library, since `shared` has no cryptography of its own. */
export type Signatures = {
  /** Bytes of base64url text; throws when it is not that. */
  decode(text: string): Uint8Array;
  /** Text of UTF-8 bytes; throws when they are not that. */
  utf8(bytes: Uint8Array): string;
  /** RFC 7638 thumbprint, SHA-256. */
  thumbprint(key: PublicJwk): Promise<string>;
  verify(jws: string, key: PublicJwk, algorithm: Algorithm): Promise<boolean | 'unsupported'>;
};

/** Where keys were found: the address they were fetched from; null when a person vouches for them. */
export type FoundKeys = { keys: PublicJwk[]; at: string | null };

function attempt<T>(run: () => T): T | undefined {
  try {
    return run();
  } catch {
    return undefined;
  }
}

/**
 * Checks a compact JWS against an issuer's keys. The signature covers the bytes as they came: nothing is written anew
 * before it is verified. The method comes from an allow-list, never from the sheet alone (RFC 8725, section 3.1), and a
 * key counts only under its own thumbprint (RFC 7638). Keys fetched from an address count only for sheets that name the
 * same host.
 */
export async function checkSheet(jws: string, found: FoundKeys, signatures: Signatures): Promise<SheetVerdict> {
  const [head = '', body = '', signature = ''] = Jws.safeParse(jws).success ? jws.split('.') : [];
  const said = attempt(() => parsed(signatures.utf8(signatures.decode(head))));
  const alg = z.object({ alg: z.string() }).safeParse(said);
  if (!alg.success) return { state: 'notASheet', because: 'form' };
  if (!ALGORITHMS.some((allowed) => allowed === alg.data.alg)) return { state: 'badSignature', because: 'method' };
  const header = Header.safeParse(said);
  if (!header.success) return { state: 'notASheet', because: 'form' };
  if (attempt(() => signatures.decode(signature))?.length !== SIGNATURE_BYTES)
    return { state: 'badSignature', because: 'length' };
  const keyId = header.data.kid;
  const key = found.keys.find(({ kid }) => kid === keyId);
  if (!key || (await signatures.thumbprint(key)) !== keyId) return { state: 'unknownKey', keyId };
  const stands = await signatures.verify(jws, key, header.data.alg);
  if (stands === 'unsupported') return { state: 'cannotCheck' };
  if (!stands) return { state: 'altered', keyId };
  return readContent(
    attempt(() => parsed(signatures.utf8(signatures.decode(body)))),
    keyId,
    found.at,
  );
}

function readContent(value: unknown, keyId: string, keysAt: string | null): SheetVerdict {
  const version = z.object({ format: z.number() }).safeParse(value);
  if (version.success && version.data.format > 1) return { state: 'notASheet', because: 'newer' };
  const content = SheetContent.safeParse(value);
  if (!content.success) return { state: 'notASheet', because: 'content' };
  const { fishroom } = content.data;
  if (fishroom.keyId !== keyId) return { state: 'badSignature', because: 'otherKey' };
  if (keysAt !== null && (hostOf(keysAt) !== hostOf(fishroom.address) || isOthersPage(keysAt, fishroom.id)))
    return { state: 'badSignature', because: 'otherAddress' };
  return { state: 'valid', keyId, content: content.data };
}

/** Of an installation with several fishrooms, each has a page of keys of its own: one does not vouch for another. */
function isOthersPage(keysAt: string, roomId: string): boolean {
  const [, named] = /\/keys\/([0-9a-f-]{36})\.json$/.exec(keysAt) ?? [];
  return named !== undefined && named !== roomId;
}

/** What a sheet says of itself, checked or not: for a reader who has been told that no key was found. Null when it is no sheet. */
export function claimOf(jws: string, signatures: Pick<Signatures, 'decode' | 'utf8'>): SheetContent | null {
  const [, body = ''] = jws.split('.');
  const content = SheetContent.safeParse(attempt(() => parsed(signatures.utf8(signatures.decode(body)))));
  return content.success ? content.data : null;
}
