import { createCipheriv, createDecipheriv, hkdfSync, randomBytes } from 'node:crypto';
import type { Config } from '../config';

type Secrets = Pick<Config, 'secret' | 'previousSecret'>;

/** One key for each purpose, so that what was sealed for one cannot be passed off as another. */
const keyOf = (secret: string, purpose: string): Buffer =>
  Buffer.from(hkdfSync('sha256', secret, 'kinwater', `seal ${purpose}`, 32));

/** AES-256-GCM under the installation's secret: what lies in the database so is worth nothing without the secret. */
export function seal({ secret }: Secrets, purpose: string, text: string): string {
  const nonce = randomBytes(12);
  const cipher = createCipheriv('aes-256-gcm', keyOf(secret, purpose), nonce);
  const sealed = Buffer.concat([cipher.update(text, 'utf8'), cipher.final()]);
  return [nonce, cipher.getAuthTag(), sealed].map((part) => part.toString('base64url')).join('.');
}

/** The text again; null when it was sealed under a secret that is gone, or was changed. */
export function unseal({ secret, previousSecret }: Secrets, purpose: string, text: string): string | null {
  const [nonce, tag, sealed] = text.split('.').map((part) => Buffer.from(part, 'base64url'));
  if (!nonce || !tag || !sealed) return null;
  for (const one of [secret, previousSecret]) {
    if (!one) continue;
    try {
      const decipher = createDecipheriv('aes-256-gcm', keyOf(one, purpose), nonce);
      decipher.setAuthTag(tag);
      return Buffer.concat([decipher.update(sealed), decipher.final()]).toString('utf8');
    } catch {
      // Sealed under the other secret, or not ours.
    }
  }
  return null;
}
