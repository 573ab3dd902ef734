import { type DBSchema, type IDBPDatabase, openDB } from 'idb';

interface Shelf extends DBSchema {
  answers: { key: string; value: string };
}

let opened: Promise<IDBPDatabase<Shelf>> | null = null;

/** Opened again after the browser closed it, as it does when somebody signs out and the storage is cleared. */
function shelf(): Promise<IDBPDatabase<Shelf>> {
  opened ??= openDB<Shelf>('kinwater-answers', 1, {
    upgrade(db) {
      db.createObjectStore('answers');
    },
    terminated() {
      opened = null;
    },
  }).catch((error: unknown) => {
    opened = null;
    throw error;
  });
  return opened;
}

/** What was fetched, as this device keeps it. Private windows may refuse: then nothing is kept, and nothing breaks. */
export const answersStore = {
  get: async (key: string): Promise<string | undefined> =>
    shelf()
      .then((db) => db.get('answers', key))
      .catch(() => undefined),
  put: async (key: string, text: string): Promise<void> => {
    await shelf()
      .then((db) => db.put('answers', text, key))
      .catch(() => {});
  },
  remove: async (key: string): Promise<void> => {
    await shelf()
      .then((db) => db.delete('answers', key))
      .catch(() => {});
  },
  clear: async (): Promise<void> => {
    await shelf()
      .then((db) => db.clear('answers'))
      .catch(() => {});
  },
};
