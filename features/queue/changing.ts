import type { EntryContent } from '@/shared/record/kinds';
import { Refusal } from '@/shared/refusal';
import { followersOf, renamed } from './following';
import type { Held } from './held';
import type { Typed, Waiting } from './waiting';

/** How a conflict ends. `content` null: the other's record says it all. */
export type Settlement = {
  content: EntryContent | null;
  /** Things of the other's record in place of those that this one was to make. */
  ids: ReadonlyMap<string, string>;
  /** Where the number itself is taken, another. */
  newId?: string;
};

/** What the keeper may do with records that still wait. */
export function changing({ store, state, find, changed }: Held, drain: () => Promise<void>) {
  const put = async (entry: Waiting, then: { send: boolean }) => {
    await store.put(entry);
    await changed();
    if (then.send) void drain();
  };
  return {
    /** Undoes a record that is still here; false when it is not. What builds on it goes first. */
    takeBack: async (id: string): Promise<boolean> => {
      const entry = find(id);
      if (!entry) return false;
      if (followersOf(entry, state().entries).length > 0)
        throw new Refusal('conflict', 'A later record that waits here builds on this one. Undo that first.');
      const mayHaveArrived = entry.tries > 0 || state().sendingId === id;
      if (mayHaveArrived) await put({ ...entry, state: 'takenBack', trouble: null, typed: null }, { send: true });
      else {
        await store.remove(entry.place);
        await changed();
      }
      return true;
    },
    /** Opens a record in its form again: it is not sent before it is saved there, or left as it was. */
    edit: async (id: string, on: boolean): Promise<void> => {
      const entry = find(id);
      if (entry) await put({ ...entry, state: on ? 'editing' : 'waiting' }, { send: !on });
    },
    /** Says it otherwise, in the same place; false when it has gone. */
    replace: async (id: string, content: EntryContent, typed: Typed | null): Promise<boolean> => {
      const entry = find(id);
      if (!entry) return false;
      await put({ ...entry, content, typed, state: 'waiting', trouble: null }, { send: false });
      return true;
    },
    /** Settles a conflict: it is said otherwise, or not at all, and what builds on it names the other's things. */
    resolve: async (id: string, { content, ids, newId = id }: Settlement): Promise<void> => {
      const entry = find(id);
      if (!entry) return;
      for (const later of followersOf(entry, state().entries)) {
        const dependsOn = later.dependsOn.flatMap((on) => (on !== id ? [on] : content ? [newId] : []));
        await store.put({ ...later, dependsOn, content: renamed(later.content, ids), trouble: null });
      }
      if (content) await store.put({ ...entry, id: newId, content, typed: null, tries: 0, trouble: null });
      else await store.remove(entry.place);
      await changed();
      void drain();
    },
    /** Sends a refused record again as it is. */
    retry: async (id: string): Promise<void> => {
      const entry = find(id);
      if (entry) await put({ ...entry, trouble: null }, { send: true });
    },
    /** Takes a record off this device, sent or not. */
    drop: async (id: string): Promise<void> => {
      const entry = find(id);
      if (entry) await store.remove(entry.place);
      await changed();
    },
  };
}
