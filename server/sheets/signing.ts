import { hkdfSync } from 'node:crypto';
import {
  base64url,
  CompactEncrypt,
  CompactSign,
  calculateJwkThumbprint,
  compactDecrypt,
  compactVerify,
  errors,
  exportJWK,
  generateKeyPair,
  importJWK,
} from 'jose';
import * as z from 'zod/mini';
import {
  ALGORITHMS,
  checkSheet,
  type FoundKeys,
  SHEET_TYPE,
  type SheetVerdict,
  type Signatures,
} from '../../shared/sheets/checkSheet';
import { SheetContent } from '../../shared/sheets/content';
import { type KeySet, PublicJwk, parsed } from '../../shared/sheets/sheetFile';

const ALGORITHM = ALGORITHMS[0];
const SEAL_TYPE = 'kinwater-room-key';

const PrivateJwk = z.extend(PublicJwk, { d: z.string() });
type PrivateJwk = z.output<typeof PrivateJwk>;

/** A fishroom's key, opened: it signs sheets, and is never written down. */
export type SheetKey = { keyId: string; privateJwk: PrivateJwk };

/** A new key as it is stored: the public half open, the private half sealed. */
export type StoredSheetKey = { keyId: string; publicJwk: PublicJwk; sealedPrivateJwk: string };

/** Makes an Ed25519 key. `secret` is the installation's; without it the private half can't be opened again. */
export async function newSheetKey(secret: string): Promise<StoredSheetKey> {
  const pair = await generateKeyPair(ALGORITHM, { crv: 'Ed25519', extractable: true });
  const jwk = await exportJWK(pair.privateKey);
  const keyId = await calculateJwkThumbprint(jwk, 'sha256');
  const privateJwk = PrivateJwk.parse({ ...jwk, kid: keyId });
  return {
    keyId,
    publicJwk: PublicJwk.parse(privateJwk),
    sealedPrivateJwk: await sealSheetKey({ keyId, privateJwk }, secret),
  };
}

/** 256 bits for sealing keys alone, so that one secret serves several ends (RFC 5869). */
const sealingKey = (secret: string): Uint8Array =>
  new Uint8Array(hkdfSync('sha256', secret, '', 'kinwater sheet keys 1', 32));

/** Seals a key for the database: a JWE, encrypted directly with A256GCM (RFC 7518, sections 4.5 and 5.3). */
export async function sealSheetKey({ keyId, privateJwk }: SheetKey, secret: string): Promise<string> {
  return new CompactEncrypt(new TextEncoder().encode(JSON.stringify(privateJwk)))
    .setProtectedHeader({ alg: 'dir', enc: 'A256GCM', typ: SEAL_TYPE, kid: keyId })
    .encrypt(sealingKey(secret));
}

/** Opens a sealed key with the first secret that fits: the current one, then the one before it. Throws when none does. */
export async function openSheetKey(sealed: string, secrets: readonly string[]): Promise<SheetKey> {
  for (const secret of secrets) {
    const text = await unsealed(sealed, secret);
    if (text === null) continue;
    const privateJwk = PrivateJwk.parse(parsed(text));
    const keyId = await calculateJwkThumbprint(privateJwk, 'sha256');
    if (keyId !== privateJwk.kid) break;
    return { keyId, privateJwk };
  }
  throw new Error('The fishroom’s key can’t be opened: was the installation’s secret changed?');
}

async function unsealed(sealed: string, secret: string): Promise<string | null> {
  try {
    const options = { keyManagementAlgorithms: ['dir'], contentEncryptionAlgorithms: ['A256GCM'] };
    const { plaintext } = await compactDecrypt(sealed, sealingKey(secret), options);
    return new TextDecoder('utf-8', { fatal: true }).decode(plaintext);
  } catch (error) {
    if (error instanceof errors.JWEDecryptionFailed || error instanceof errors.JWEInvalid) return null;
    throw error;
  }
}

/** The bytes that are signed, and kept as they are: the content's JSON in UTF-8. Throws when it is not a sheet. */
export function sheetBytes(content: SheetContent): Uint8Array {
  return new TextEncoder().encode(JSON.stringify(SheetContent.parse(content)));
}

/** Signs a sheet's bytes: a compact JWS. Refuses bytes that are no sheet, or that name another key. */
export async function signSheet(contentBytes: Uint8Array, { keyId, privateJwk }: SheetKey): Promise<string> {
  const content = SheetContent.parse(parsed(new TextDecoder('utf-8', { fatal: true }).decode(contentBytes)));
  if (content.fishroom.keyId !== keyId) throw new Error('The sheet names another key than the one that signs it');
  return new CompactSign(contentBytes)
    .setProtectedHeader({ alg: ALGORITHM, kid: keyId, typ: SHEET_TYPE })
    .sign(await importJWK(privateJwk, ALGORITHM));
}

/** The published set: every key the fishroom ever had, retired ones too, so that old sheets stay checkable. Public halves only. */
export function keySet(publicJwks: readonly PublicJwk[]): Pick<KeySet, 'keys'> {
  return { keys: publicJwks.map((jwk) => ({ ...PublicJwk.parse(jwk), alg: ALGORITHM, use: 'sig' })) };
}

/** What `checkSheet` needs, by jose on the server. */
export const signatures: Signatures = {
  decode: (text) => base64url.decode(text),
  utf8: (bytes) => new TextDecoder('utf-8', { fatal: true }).decode(bytes),
  thumbprint: (key) => calculateJwkThumbprint(key, 'sha256'),
  async verify(jws, key, algorithm) {
    try {
      await compactVerify(jws, await importJWK(key, algorithm), { algorithms: [algorithm] });
      return true;
    } catch (error) {
      if (error instanceof errors.JWSSignatureVerificationFailed) return false;
      throw error;
    }
  },
};

/** Checks a signed sheet on the server; see `checkSheet`. */
export const verifySheet = (jws: string, found: FoundKeys): Promise<SheetVerdict> => checkSheet(jws, found, signatures);
