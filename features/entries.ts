import { useQueryClient } from '@tanstack/react-query';
import { createContext, use, useSyncExternalStore } from 'react';
import { useRoom } from '@/hooks/useRoom';
import { uuidV7 } from '@/shared/ids';
import { type EntryLine, UNDO_MINUTES, undoEntry } from '@/shared/record/contract';
import type { EntryContent, EntryKind } from '@/shared/record/kinds';
import { call, Unreachable } from './call';
import { keptPicture } from './queue/keptPicture';
import { queue } from './queue/queue';
import { serverLine } from './queue/send';
import { type NewWaiting, type Typed, waitingOf } from './queue/waiting';

export type { Typed } from './queue/waiting';

/** An id made on this device. */
export const newId = (): string => uuidV7(Date.now(), crypto.getRandomValues(new Uint8Array(10)));

/** `line` null: it waits on this device. */
export type Kept = { id: string; line: EntryLine | null };

/** What the strip above the bottom bar tells: the record kept last, to be undone, a draft, to be gone on with, a settled task. */
export type Told =
  | { is: 'kept'; entryId: string; kind: EntryKind; line: EntryLine | null; undoUntil: string }
  | { is: 'draft'; title: string; href: string }
  | { is: 'settled'; key: string; words: string; bringBack: () => Promise<unknown> };

/** Held by `features/entries/LastTold`; outside of it nothing is told. */
export const ToldContext = createContext<{ told: Told | null; tell: (told: Told | null) => void }>({
  told: null,
  tell: () => {},
});

type More = {
  id?: string;
  dependsOn?: string[];
  /** Goes with a photo's entry. */
  picture?: File;
  /** What the form was, so that it can be opened again while it waits. */
  typed?: Typed;
};

/** So long a form stays for the server's answer; after that the record waits here and the keeper goes on. */
const PATIENCE_MS = 6000;

/**
 * The one way to record: every Record form, in every feature, hands its entry to this. It is on this device before anything
 * else happens. A refusal that comes at once is thrown, and nothing is kept; without a signal the record waits, in order.
 */
export function useRecord() {
  const room = useRoom();
  const cache = useQueryClient();
  const { tell } = use(ToldContext);
  return async (content: EntryContent, { id = newId(), dependsOn = [], picture, typed }: More = {}): Promise<Kept> => {
    const made: NewWaiting = {
      id,
      accountId: room.accountId,
      roomId: room.id,
      madeAt: new Date().toISOString(),
      dependsOn,
      content,
      picture: picture ? await keptPicture(picture) : null,
      typed: typed ?? null,
    };
    const line = await keep(made);
    if (line) await cache.invalidateQueries({ queryKey: [room.id] });
    tell({ is: 'kept', entryId: id, kind: content.kind, line, undoUntil: line?.undoUntil ?? tenMinutesOn() });
    return { id, line };
  };
}

const tenMinutesOn = (): string => new Date(Date.now() + UNDO_MINUTES * 60_000).toISOString();

async function keep(made: NewWaiting): Promise<EntryLine | null> {
  const { id, content, typed = null } = made;
  const replaced = await queue.replace(id, content, typed);
  if (!replaced && !(await fits(made))) return serverLine.send({ ...waitingOf(made), place: 0 });
  const outcome = await queue.outcomeOf(id, PATIENCE_MS);
  if (outcome.is === 'waiting') return null;
  if (outcome.is === 'stored') return outcome.line;
  // A record that waited stays where it was; a new one goes back to its form.
  if (!replaced) await queue.drop(id);
  throw outcome.refusal;
}

/** Private windows may refuse storage: then it is sent at once or not at all. */
async function fits(made: NewWaiting): Promise<boolean> {
  try {
    await queue.add(made);
    void globalThis.navigator?.storage?.persist?.();
    return true;
  } catch {
    return false;
  }
}

/** Takes an entry back: at once while it waits here, else within ten minutes and as long as nothing was built on it. */
export function useUndo() {
  const room = useRoom();
  const cache = useQueryClient();
  return async (entryId: string): Promise<EntryLine | null> => {
    if (await queue.takeBack(entryId)) return null;
    try {
      const line = await call(undoEntry, { params: { roomId: room.id, entryId } });
      await cache.invalidateQueries({ queryKey: [room.id] });
      return line;
    } catch (error) {
      if (error instanceof Unreachable)
        throw new Unreachable('No signal. This record has gone up already: undo it when the signal is back.');
      throw error;
    }
  };
}

/** What this device holds of the signed-in person, and how sending it goes. */
export const useQueue = () => useSyncExternalStore(queue.listen, queue.state, queue.state);

/** Tries to send what waits; answers how many are left. */
export async function sendWaiting(accountId: string): Promise<number> {
  await queue.open(accountId);
  await queue.drain();
  return queue.state().entries.length;
}

/** After a sign-out: nothing of this person stays. */
export async function forgetWaiting(): Promise<void> {
  await queue.forget().catch(() => {});
  await queue.open(null);
}
