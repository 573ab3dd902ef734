import { createHash } from 'node:crypto';
import { uuidV7 } from '../../shared/ids';
import { KEY_KINDS } from './scenario/shape';

const KEY = new RegExp(`^(${KEY_KINDS.join('|')}):`);

/** The same key gives the same id on the same day: `startMs` is that of the demo, so that ids look as if made in order. */
export function idsOf(startMs: number): (key: string) => string {
  return (key) => uuidV7(startMs, createHash('sha256').update(`demo ${key}`).digest().subarray(0, 10));
}

/** A copy in which every key is its id. */
export function withIds(value: unknown, idOf: (key: string) => string): unknown {
  if (typeof value === 'string') return KEY.test(value) ? idOf(value) : value;
  if (Array.isArray(value)) return value.map((one) => withIds(one, idOf));
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([name, one]) => [name, withIds(one, idOf)]));
}

/** The instant of a wall-clock time in a zone, such as 08:30 in Dublin. */
export function instantOf(day: string, time: string, timeZone: string): number {
  const asUtc = Date.parse(`${day}T${time.slice(0, 5)}:00Z`);
  const parts = new Intl.DateTimeFormat('sv-SE', { timeZone, dateStyle: 'short', timeStyle: 'medium' }).format(asUtc);
  return asUtc - (Date.parse(`${parts.replace(' ', 'T')}Z`) - asUtc);
}
