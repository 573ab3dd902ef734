import { useQueryClient } from '@tanstack/react-query';
import { useRoom } from '@/hooks/useRoom';
import { uuidV7 } from '@/shared/ids';
import { type EntryLine, recordEntry } from '@/shared/record/contract';
import type { EntryContent } from '@/shared/record/kinds';
import { call } from './call';

/** An id made on this device. */
export const newId = (): string => uuidV7(Date.now(), crypto.getRandomValues(new Uint8Array(10)));

export type Kept = { id: string; line: EntryLine | null };

/** The one way to record: every Record form, in every feature, hands its entry to this. */
export function useRecord() {
  const room = useRoom();
  const cache = useQueryClient();
  return async (content: EntryContent, more: { id?: string; dependsOn?: string[] } = {}): Promise<Kept> => {
    const id = more.id ?? newId();
    const body = { id, madeAt: new Date().toISOString(), dependsOn: more.dependsOn ?? [], content };
    const line = await call(recordEntry, { params: { roomId: room.id }, body });
    await cache.invalidateQueries({ queryKey: [room.id] });
    return { id, line };
  };
}
