import { type DBSchema, type IDBPDatabase, openDB } from 'idb';
import type { Waiting } from './waiting';

/** Where waiting records are kept. The browser's database in the app, a list in tests. */
export type WaitingStore = {
  /** In the order of making. */
  all(accountId: string): Promise<Waiting[]>;
  add(entry: Omit<Waiting, 'place'>): Promise<number>;
  put(entry: Waiting): Promise<void>;
  remove(place: number): Promise<void>;
  clear(accountId: string): Promise<void>;
};

interface Shelf extends DBSchema {
  waiting: { key: number; value: Waiting; indexes: { account: string } };
}

let opened: Promise<IDBPDatabase<Shelf>> | null = null;

/** Opened again after the browser closed it, as it does when somebody signs out and the storage is cleared. */
function shelf(): Promise<IDBPDatabase<Shelf>> {
  opened ??= openDB<Shelf>('kinwater-queue', 1, {
    upgrade(db) {
      db.createObjectStore('waiting', { keyPath: 'place', autoIncrement: true }).createIndex('account', 'accountId');
    },
    terminated() {
      opened = null;
    },
    blocking(_current, _next, event) {
      opened = null;
      if (event.target instanceof IDBDatabase) event.target.close();
    },
  }).catch((error: unknown) => {
    opened = null;
    throw error;
  });
  return opened;
}

export const deviceStore: WaitingStore = {
  all: async (accountId) => (await shelf()).getAllFromIndex('waiting', 'account', accountId),
  // Without its key the store counts on; the type of the library asks for the whole row.
  add: async (entry) => (await shelf()).add('waiting', entry as Waiting),
  put: async (entry) => {
    await (await shelf()).put('waiting', entry);
  },
  remove: async (place) => (await shelf()).delete('waiting', place),
  clear: async (accountId) => {
    const db = await shelf();
    for (const place of await db.getAllKeysFromIndex('waiting', 'account', accountId))
      await db.delete('waiting', place);
  },
};
