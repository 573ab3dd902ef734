import * as z from 'zod/mini';

const PATTERN = /^[0-9a-f]{8}-[0-9a-f]{4}-7[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/;

/** An id made by the app, on the device or the server: UUID version 7, lower case. */
export const Id = z.string('Choose one').check(z.regex(PATTERN, 'That is not an id'));
export type Id = z.output<typeof Id>;

export const isId = (text: string): boolean => PATTERN.test(text);

/**
 * A UUID of version 7 (RFC 9562, section 5.7): 48 bits of milliseconds, then random bits, so that ids sort by making.
 * Clock and chance are passed in, since `shared` has neither.
 */
export function uuidV7(ms: number, random: Uint8Array): Id {
  const bytes = Uint8Array.from({ length: 16 }, (_, i) =>
    i < 6 ? Math.floor(ms / 2 ** (8 * (5 - i))) % 256 : (random[i - 6] ?? 0),
  );
  bytes[6] = ((bytes[6] ?? 0) & 0x0f) | 0x70;
  bytes[8] = ((bytes[8] ?? 0) & 0x3f) | 0x80;
  const hex = Array.from(bytes, (byte) => byte.toString(16).padStart(2, '0')).join('');
  return [hex.slice(0, 8), hex.slice(8, 12), hex.slice(12, 16), hex.slice(16, 20), hex.slice(20)].join('-');
}
