import { useQueryClient } from '@tanstack/react-query';
import { createContext, use } from 'react';
import { useRoom } from '@/hooks/useRoom';
import { uuidV7 } from '@/shared/ids';
import { type EntryLine, recordEntry, UNDO_MINUTES, undoEntry } from '@/shared/record/contract';
import type { EntryContent, EntryKind } from '@/shared/record/kinds';
import { call } from './call';

/** An id made on this device. */
export const newId = (): string => uuidV7(Date.now(), crypto.getRandomValues(new Uint8Array(10)));

export type Kept = { id: string; line: EntryLine | null };

/** What the strip above the bottom bar tells: the record kept last, to be undone, or a draft, to be gone on with. */
export type Told =
  | { is: 'kept'; entryId: string; kind: EntryKind; line: EntryLine | null; undoUntil: string }
  | { is: 'draft'; title: string; href: string };

/** Held by `features/entries/LastTold`; outside of it nothing is told. */
export const ToldContext = createContext<{ told: Told | null; tell: (told: Told | null) => void }>({
  told: null,
  tell: () => {},
});

/** The one way to record: every Record form, in every feature, hands its entry to this. */
export function useRecord() {
  const room = useRoom();
  const cache = useQueryClient();
  const { tell } = use(ToldContext);
  return async (content: EntryContent, more: { id?: string; dependsOn?: string[] } = {}): Promise<Kept> => {
    const id = more.id ?? newId();
    const body = { id, madeAt: new Date().toISOString(), dependsOn: more.dependsOn ?? [], content };
    const line = await call(recordEntry, { params: { roomId: room.id }, body });
    await cache.invalidateQueries({ queryKey: [room.id] });
    tell({ is: 'kept', entryId: id, kind: content.kind, line, undoUntil: line?.undoUntil ?? tenMinutesOn() });
    return { id, line };
  };
}

const tenMinutesOn = (): string => new Date(Date.now() + UNDO_MINUTES * 60_000).toISOString();

/** Takes an entry back, within ten minutes and as long as nothing was built on it. */
export function useUndo() {
  const room = useRoom();
  const cache = useQueryClient();
  return async (entryId: string): Promise<EntryLine> => {
    const line = await call(undoEntry, { params: { roomId: room.id, entryId } });
    await cache.invalidateQueries({ queryKey: [room.id] });
    return line;
  };
}
