import { randomBytes } from 'node:crypto';
import { uuidV7 } from '../../shared/ids';

let counter = 0;

/** An id made by the server. Within one millisecond a counter keeps the order of making (RFC 9562, section 6.2, method 1). */
export function newId(now: string): string {
  counter = (counter + 1) % 4096;
  const random = randomBytes(10);
  random.writeUInt16BE(counter, 0);
  return uuidV7(Date.parse(now), random);
}
