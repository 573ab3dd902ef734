import { randomBytes } from 'node:crypto';
import { uuidV7 } from '../../shared/ids';

/** An id made by the server, in the order of time. */
export const newId = (now: string): string => uuidV7(Date.parse(now), randomBytes(10));
