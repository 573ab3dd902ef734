import { base64url, calculateJwkThumbprint, compactVerify, errors, importJWK } from 'jose';
import {
  type Algorithm,
  checkSheet,
  type FoundKeys,
  type SheetVerdict,
  type Signatures,
} from '@/shared/sheets/checkSheet';
import type { PublicJwk } from '@/shared/sheets/sheetFile';

/** Null in a browser that has no Ed25519: nothing else can be wrong with a key of the right shape. */
const usableKey = (key: PublicJwk, algorithm: Algorithm) => importJWK(key, algorithm).catch(() => null);

const signatures: Signatures = {
  decode: (text) => base64url.decode(text),
  utf8: (bytes) => new TextDecoder('utf-8', { fatal: true }).decode(bytes),
  thumbprint: (key) => calculateJwkThumbprint(key, 'sha256'),
  async verify(jws, key, algorithm) {
    const usable = await usableKey(key, algorithm);
    if (!usable) return 'unsupported';
    try {
      await compactVerify(jws, usable, { algorithms: [algorithm] });
      return true;
    } catch (error) {
      if (error instanceof errors.JWSSignatureVerificationFailed) return false;
      throw error;
    }
  },
};

/** Checks a signed sheet in the reader's own browser; see `checkSheet`. Browsers offer no cryptography without https. */
export async function verifySheet(jws: string, found: FoundKeys): Promise<SheetVerdict> {
  if (!globalThis.crypto?.subtle) return { state: 'cannotCheck' };
  return checkSheet(jws, found, signatures);
}

/** SHA-256 of a signed sheet in base64url: the name by which its fishroom publishes that it was taken back. */
export async function digestOf(jws: string): Promise<string> {
  const bytes = await crypto.subtle.digest('SHA-256', new TextEncoder().encode(jws));
  return base64url.encode(new Uint8Array(bytes));
}
