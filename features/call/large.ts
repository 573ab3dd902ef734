import { type Remote, wrap } from 'comlink';
import type * as z from 'zod/mini';
import type { Endpoint } from '@/shared/endpoint';
import { isReadLarge, LARGE, markRead } from './largeLines';
import type { Reader } from './reader.worker';
import type { Told } from './reading';

/** Longer than this on a bad line, and what the device keeps is shown meanwhile. */
const PATIENCE_MS = 1_500;

/** So many rows are taken over at a time: a slow phone needs some milliseconds for them. */
const ROWS_AT_ONCE = 100;

let worker: Worker | null = null;
let reader: Remote<Reader> | null = null;

/** What each place answered last: many pages ask for the same list, and it is read once. */
const last = new Map<string, { turn: number; data: unknown }>();
const reading = new Map<string, Promise<unknown>>();

let tellLate = () => {};

/** `tell` is called when an answer came after what the device keeps had been shown. */
export function onLateAnswer(tell: () => void): void {
  tellLate = tell;
}

/** Whether a worker reads this answer. */
export const isLarge = (line: Pick<Endpoint, 'path' | 'method'>): boolean =>
  typeof Worker !== 'undefined' && LARGE.some(({ path, method }) => path === line.path && method === line.method);

/** After a sign-out. */
export function forgetLarge(): void {
  worker?.terminate();
  worker = null;
  reader = null;
  last.clear();
  reading.clear();
}

type Line<O extends z.ZodMiniType> = { path: string; output: O };
type Answer<O extends z.ZodMiniType> =
  | Exclude<Told, { as: 'read' | 'kept' | 'same' }>
  | { as: 'read'; data: z.output<O> };

/** The answer; what the device keeps of it where there is no signal, or a bad one. A place is read once at a time. */
export function readLarge<O extends z.ZodMiniType>(line: Line<O>, address: string, place: string): Promise<Answer<O>> {
  const before = reading.get(place) ?? Promise.resolve();
  const now = before.then(() => readNow(line, address, place));
  reading.set(
    place,
    now.catch(() => {}),
  );
  return now;
}

async function readNow<O extends z.ZodMiniType>(line: Line<O>, address: string, place: string): Promise<Answer<O>> {
  const asked = { path: line.path, address, place, has: last.get(place)?.turn ?? null };
  const of = readerHere();
  const answer = of.readLarge(asked);
  if (asked.has !== null) return await settled(line, place, await answer);
  const slow = new Promise<null>((later) => setTimeout(() => later(null), PATIENCE_MS));
  const first = await Promise.race([answer, slow]);
  if (first !== null && first.as !== 'unreachable') return await settled(line, place, first);
  const kept = await of.readKept(asked);
  const shown = kept.as === 'kept' ? await settled(line, place, kept) : null;
  if (shown?.as !== 'read') return await settled(line, place, await answer);
  if (first === null) void answer.then(({ as }) => (as === 'read' ? tellLate() : null));
  return shown;
}

async function settled<O extends z.ZodMiniType>(line: Line<O>, place: string, told: Told): Promise<Answer<O>> {
  if (told.as === 'refused' || told.as === 'unreachable') return told;
  if (told.as !== 'same') {
    const rows: unknown[] = [];
    while (rows.length < told.rows) {
      const next = await readerHere().takeRows(place, told.turn, ROWS_AT_ONCE);
      // A newer answer came while this one was taken over.
      if (!next) return { as: 'unreachable' };
      rows.push(...next);
    }
    const data = { ...told.data, [told.list]: rows };
    // The list too: it is what most pages take out of the answer.
    markRead(data);
    markRead(rows);
    last.set(place, { turn: told.turn, data });
  }
  const data = last.get(place)?.data;
  return wasChecked(line, data) ? { as: 'read', data } : { as: 'unreachable' };
}

/** The worker checked it by the very line of the contract. */
const wasChecked = <O extends z.ZodMiniType>(_line: Line<O>, data: unknown): data is z.output<O> => isReadLarge(data);

function readerHere(): Remote<Reader> {
  worker ??= new Worker(new URL('./reader.worker', import.meta.url));
  reader ??= wrap<Reader>(worker);
  return reader;
}
