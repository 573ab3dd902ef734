import type { WaitingStore } from './store';
import type { Waiting } from './waiting';

/** `noSignal`: the last try met no server. `signedOut`: kept for this person until they sign in again. */
export type QueueState = { entries: Waiting[]; sendingId: string | null; noSignal: boolean; signedOut: boolean };

export type Held = ReturnType<typeof holding>;

/** What one person's device holds, as the pages see it: read again from the store after every change. */
export function holding(store: WaitingStore, tellOthers: () => void) {
  let accountId: string | null = null;
  let state: QueueState = { entries: [], sendingId: null, noSignal: false, signedOut: false };
  const listeners = new Set<() => void>();
  const set = (part: Partial<QueueState>) => {
    state = { ...state, ...part };
    for (const listener of listeners) listener();
  };
  const reload = async (): Promise<Waiting[]> => {
    const whose = accountId;
    const entries = whose ? await store.all(whose) : [];
    if (whose === accountId) set({ entries });
    return entries;
  };
  return {
    store,
    set,
    reload,
    state: () => state,
    whose: () => accountId,
    find: (id: string) => state.entries.find((entry) => entry.id === id),
    /** After a change here: this page and the browser's others show it. */
    changed: async () => {
      await reload();
      tellOthers();
    },
    listen: (listener: () => void) => {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
    open: async (whose: string | null) => {
      accountId = whose;
      set({ entries: [], sendingId: null, noSignal: false, signedOut: false });
      await reload();
    },
  };
}
