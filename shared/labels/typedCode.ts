/** Digits and letters without those that look alike on wet glass (Crockford's base 32). */
const SIGNS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ';

/** "T03-7H4": the code with three signs out of the id, so that a slip of the finger finds nothing rather than another tank. */
export function typedCode(code: string, id: string): string {
  const tail = Number.parseInt(id.replaceAll('-', '').slice(-4), 16);
  const signs = [tail >> 10, tail >> 5, tail].map((part) => SIGNS[part & 31]);
  return `${code}-${signs.join('')}`;
}
