import { Unreachable } from '@/features/call';
import type { EntryLine } from '@/shared/record/contract';
import type { EntryContent } from '@/shared/record/kinds';
import { Refusal } from '@/shared/refusal';
import { followersOf, nextToSend, renamed } from './following';
import type { Line } from './send';
import type { WaitingStore } from './store';
import { type NewWaiting, type Typed, type Waiting, waitingOf } from './waiting';

/** `noSignal`: the last try met no server. `signedOut`: kept for this person until they sign in again. */
export type QueueState = { entries: Waiting[]; sendingId: string | null; noSignal: boolean; signedOut: boolean };

/** What became of a record: stored, refused, or still here. */
export type Outcome = { is: 'stored'; line: EntryLine | null } | { is: 'refused'; refusal: Refusal } | { is: 'waiting' };

type Options = {
  store: WaitingStore;
  line: Line;
  /** One page at a time sends: two tabs must not take turns in the wrong order. */
  alone?: <T>(work: () => Promise<T>) => Promise<T>;
  /** Tells other pages of this browser. */
  tellOthers?: () => void;
  /** Tries again later. */
  later?: (again: () => void, ms: number) => void;
};

const AGAIN_MS = 15_000;
/** After so many failures of the server itself a record is put to the keeper, so that it does not hold up the rest. */
const MOST_FAILURES = 3;

export type Queue = ReturnType<typeof openQueue>;

/** Records of one person on this device, sent in the order of making, each once, whenever there is a signal. */
export function openQueue({ store, line, alone = (work) => work(), tellOthers = () => {}, later = () => {} }: Options) {
  let accountId: string | null = null;
  let state: QueueState = { entries: [], sendingId: null, noSignal: false, signedOut: false };
  let draining: Promise<void> | null = null;
  let again = false;
  const listeners = new Set<() => void>();
  const arrivals = new Set<(roomIds: string[]) => void>();
  const asked = new Map<string, (outcome: Outcome) => void>();

  const set = (part: Partial<QueueState>) => {
    state = { ...state, ...part };
    for (const listener of listeners) listener();
  };
  const reload = async () => {
    const whose = accountId;
    const entries = whose ? await store.all(whose) : [];
    if (whose === accountId) set({ entries });
    return entries;
  };
  const changed = async () => {
    await reload();
    tellOthers();
  };
  const find = (id: string) => state.entries.find((entry) => entry.id === id);
  const settle = (id: string, outcome: Outcome) => {
    asked.get(id)?.(outcome);
    asked.delete(id);
  };

  async function open(whose: string | null): Promise<void> {
    accountId = whose;
    set({ entries: [], noSignal: false, signedOut: false });
    await reload();
    void drain();
  }

  async function drain(): Promise<void> {
    again = true;
    draining ??= (async () => {
      while (again) {
        again = false;
        await alone(sendAll).catch(() => {});
      }
    })().finally(() => {
      draining = null;
    });
    return draining;
  }

  async function sendAll(): Promise<void> {
    const whose = accountId;
    if (!whose) return;
    const rooms = new Set<string>();
    let sure = false;
    try {
      for (let next = nextToSend(await reload()); next && whose === accountId; next = nextToSend(await reload())) {
        // Others may have signed in at this browser since: a record goes under its maker's name or not at all.
        const isFresh = asked.has(next.id) && next.tries === 0;
        if (!sure && !isFresh && !(await line.isIn(whose))) throw new Refusal('signed-out', 'Sign in again');
        sure = sure || !isFresh;
        const wasAsked = asked.has(next.id);
        if ((await sendOne(next)) && !wasAsked) rooms.add(next.roomId);
      }
      set({ sendingId: null, noSignal: false, signedOut: false });
    } catch (error) {
      stopped(error);
    }
    if (rooms.size > 0) for (const arrived of arrivals) arrived([...rooms]);
    tellOthers();
  }

  /** True when the server has it. A refusal is kept with the record; what is no answer stops the round. */
  async function sendOne(entry: Waiting): Promise<boolean> {
    const tried = { ...entry, tries: entry.tries + 1 };
    await store.put(tried);
    set({ sendingId: entry.id });
    try {
      const stored = entry.state === 'takenBack' ? await line.takeBack(tried).then(() => null) : await line.send(tried);
      // Undone while it was under way: the next round takes it back on the server.
      const takenBack = entry.state !== 'takenBack' && find(entry.id)?.state === 'takenBack';
      if (!takenBack) await store.remove(entry.place);
      settle(entry.id, { is: 'stored', line: stored });
      return true;
    } catch (error) {
      if (!(error instanceof Refusal) || isNoAnswer(error, tried)) throw error;
      const { reason, message, fields, current } = error;
      // Refused, it is not stored: sent again after a change it is as new.
      await store.put({ ...(find(entry.id) ?? tried), tries: 0, trouble: { reason, message, fields, current } });
      settle(entry.id, { is: 'refused', refusal: error });
      return false;
    }
  }

  function stopped(error: unknown): void {
    const signedOut = error instanceof Refusal && error.reason === 'signed-out';
    set({ sendingId: null, signedOut, noSignal: error instanceof Unreachable });
    for (const id of [...asked.keys()]) settle(id, { is: 'waiting' });
    if (signedOut) return;
    const wait = error instanceof Refusal && error.retryAfter ? error.retryAfter * 1000 : AGAIN_MS;
    later(() => void drain(), wait);
  }

  async function add(made: NewWaiting): Promise<void> {
    await store.add(waitingOf(made));
    await changed();
  }

  /** What becomes of a record that was just added, as far as it is known after so long. */
  function outcomeOf(id: string, withinMs: number): Promise<Outcome> {
    const answer = new Promise<Outcome>((done) => asked.set(id, done));
    const timer = setTimeout(() => settle(id, { is: 'waiting' }), withinMs);
    void drain().then(() => settle(id, { is: 'waiting' }));
    return answer.finally(() => clearTimeout(timer));
  }

  async function remove(id: string): Promise<void> {
    const entry = find(id);
    if (entry) await store.remove(entry.place);
    await changed();
  }

  /** Undoes a record that is still here; false when it is not. What builds on it goes first. */
  async function takeBack(id: string): Promise<boolean> {
    const entry = find(id);
    if (!entry) return false;
    if (followersOf(entry, state.entries).length > 0)
      throw new Refusal('conflict', 'A later record that waits here builds on this one. Undo that first.');
    if (entry.tries > 0 || state.sendingId === id)
      await store.put({ ...entry, state: 'takenBack', trouble: null, typed: null });
    else await store.remove(entry.place);
    await changed();
    void drain();
    return true;
  }

  /** Opens a record in its form again: it is not sent before it is saved there, or left as it was. */
  async function edit(id: string, on: boolean): Promise<void> {
    const entry = find(id);
    if (entry) await store.put({ ...entry, state: on ? 'editing' : 'waiting' });
    await changed();
    if (!on) void drain();
  }

  /** Says it otherwise, in the same place. */
  async function replace(id: string, content: EntryContent, typed: Typed | null): Promise<boolean> {
    const entry = find(id);
    if (!entry) return false;
    await store.put({ ...entry, content, typed, state: 'waiting', trouble: null });
    await changed();
    return true;
  }

  /** Settles a conflict: the record is said otherwise (or not at all), and what builds on it names the other's things. */
  async function resolve(
    id: string,
    to: { content: EntryContent | null; ids: ReadonlyMap<string, string>; newId?: string },
  ): Promise<void> {
    const entry = find(id);
    if (!entry) return;
    for (const later of followersOf(entry, state.entries)) {
      const dependsOn = later.dependsOn.map((on) => (on === id && to.newId ? to.newId : on));
      await store.put({ ...later, dependsOn, content: renamed(later.content, to.ids), trouble: null });
    }
    if (to.content) {
      const changedEntry = { ...entry, id: to.newId ?? id, content: to.content, typed: null };
      await store.put({ ...changedEntry, state: 'waiting', tries: 0, trouble: null });
    } else await store.remove(entry.place);
    await changed();
    void drain();
  }

  /** Sends a refused record again as it is. */
  async function retry(id: string): Promise<void> {
    const entry = find(id);
    if (entry) await store.put({ ...entry, trouble: null });
    await changed();
    void drain();
  }

  async function forget(): Promise<void> {
    if (accountId) await store.clear(accountId);
    await changed();
  }

  return {
    open,
    add,
    outcomeOf,
    remove,
    takeBack,
    edit,
    replace,
    resolve,
    retry,
    drain,
    reload,
    forget,
    state: () => state,
    find,
    listen: (listener: () => void) => {
      listeners.add(listener);
      return () => void listeners.delete(listener);
    },
    /** Rooms whose waiting records have arrived: once per round. */
    onArrival: (arrived: (roomIds: string[]) => void) => {
      arrivals.add(arrived);
      return () => void arrivals.delete(arrived);
    },
  };
}

/** Says nothing about the record: to be sent again as it is. */
function isNoAnswer({ reason }: Refusal, { tries }: Waiting): boolean {
  if (reason === 'broken') return tries < MOST_FAILURES;
  return reason === 'signed-out' || reason === 'busy' || reason === 'too-many';
}
