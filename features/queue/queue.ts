import { changing } from './changing';
import { holding } from './held';
import { type Line, serverLine } from './send';
import { sending } from './sending';
import { deviceStore, type WaitingStore } from './store';
import { type NewWaiting, waitingOf } from './waiting';

type Options = {
  store: WaitingStore;
  line: Line;
  alone?: <T>(work: () => Promise<T>) => Promise<T>;
  tellOthers?: () => void;
  later?: (again: () => void, ms: number) => void;
};

/** Records of one person on this device, until the server has them. */
export function openQueue(options: Options) {
  const { store, line, alone = (work) => work(), tellOthers = () => {}, later = () => {} } = options;
  const held = holding(store, tellOthers);
  const sender = sending(held, { line, alone, later });
  return {
    ...sender,
    ...changing(held, sender.drain),
    state: held.state,
    find: held.find,
    listen: held.listen,
    reload: held.reload,
    /** Whose records are shown and sent from now on; nobody's after a sign-out. */
    open: async (accountId: string | null): Promise<void> => {
      if (held.whose() === accountId) return;
      await held.open(accountId);
      void sender.drain();
    },
    add: async (made: NewWaiting): Promise<void> => {
      await store.add(waitingOf(made));
      await held.changed();
    },
    /** Everything of this person, unsent records as well. */
    forget: async (): Promise<void> => {
      const whose = held.whose();
      if (whose) await store.clear(whose);
      await held.changed();
    },
  };
}

const LOCK = 'kinwater-queue';

function deviceQueue() {
  const channel = typeof BroadcastChannel === 'undefined' ? null : new BroadcastChannel(LOCK);
  const locks = globalThis.navigator?.locks;
  let timer: ReturnType<typeof setTimeout> | undefined;
  const made = openQueue({
    store: deviceStore,
    line: serverLine,
    // The library's type says `any` of what the lock's work answers.
    alone: (work) => (locks ? (locks.request(LOCK, work) as ReturnType<typeof work>) : work()),
    tellOthers: () => channel?.postMessage('changed'),
    later: (again, ms) => {
      clearTimeout(timer);
      timer = setTimeout(again, ms);
    },
  });
  channel?.addEventListener('message', () => void made.reload());
  return made;
}

/** This browser's. */
export const queue = deviceQueue();
