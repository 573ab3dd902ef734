import { Unreachable } from '@/features/call';
import type { EntryLine } from '@/shared/record/contract';
import { Refusal } from '@/shared/refusal';
import { nextToSend } from './following';
import type { Held } from './held';
import type { Line } from './send';
import type { Waiting } from './waiting';

/** What became of a record: stored, refused, or still here. */
export type Outcome =
  | { is: 'stored'; line: EntryLine | null }
  | { is: 'refused'; refusal: Refusal }
  | { is: 'waiting' };

type Options = {
  line: Line;
  /** One page at a time sends: two tabs must not take turns in the wrong order. */
  alone: <T>(work: () => Promise<T>) => Promise<T>;
  /** Tries again later. */
  later: (again: () => void, ms: number) => void;
};

const AGAIN_MS = 15_000;
/** After so many failures of the server itself a record is put to the keeper, so that it does not hold up the rest. */
const MOST_FAILURES = 3;

/** Sends what is held, in the order of making, each once, whenever there is a signal. */
export function sending(held: Held, { line, alone, later }: Options) {
  const arrivals = new Set<(roomIds: string[]) => void>();
  const asked = new Map<string, (outcome: Outcome) => void>();
  let round: Promise<void> | null = null;
  let again = false;

  const settle = (id: string, outcome: Outcome) => {
    asked.get(id)?.(outcome);
    asked.delete(id);
  };

  function drain(): Promise<void> {
    again = true;
    round ??= rounds();
    return round;
  }

  async function rounds(): Promise<void> {
    try {
      while (again) {
        again = false;
        await alone(sendAll);
      }
    } finally {
      round = null;
    }
  }

  async function sendAll(): Promise<void> {
    const whose = held.whose();
    if (!whose) return;
    const rooms = new Set<string>();
    try {
      let next = nextToSend(await held.reload());
      if (next) await mustBeIn(whose, next);
      while (next && whose === held.whose()) {
        const wasAsked = asked.has(next.id);
        if ((await sendOne(next)) && !wasAsked) rooms.add(next.roomId);
        next = nextToSend(await held.reload());
      }
      held.set({ sendingId: null, noSignal: false, signedOut: false });
    } catch (error) {
      stopped(error);
    }
    if (rooms.size > 0) for (const arrived of arrivals) arrived([...rooms]);
    await held.changed();
  }

  /** Others may have signed in at this browser since: a record goes under its maker's name or not at all. */
  async function mustBeIn(whose: string, { id, tries }: Waiting): Promise<void> {
    const isFresh = asked.has(id) && tries === 0;
    if (!isFresh && !(await line.isIn(whose))) throw new Refusal('signed-out', 'Sign in again');
  }

  /** True when the server has it. A refusal is kept with the record; what is no answer stops the round. */
  async function sendOne(entry: Waiting): Promise<boolean> {
    const tried = { ...entry, tries: entry.tries + 1 };
    await held.store.put(tried);
    held.set({ sendingId: entry.id });
    try {
      const stored = entry.state === 'takenBack' ? await line.takeBack(tried).then(() => null) : await line.send(tried);
      // Undone while it was under way: the next round takes it back on the server.
      const goesBack = entry.state !== 'takenBack' && held.find(entry.id)?.state === 'takenBack';
      if (!goesBack) await held.store.remove(entry.place);
      settle(entry.id, { is: 'stored', line: stored });
      return true;
    } catch (error) {
      if (!(error instanceof Refusal) || isNoAnswer(error, tried)) throw error;
      const { reason, message, fields, current } = error;
      // Refused means not stored: sent again after a change it is as new.
      await held.store.put({
        ...(held.find(entry.id) ?? tried),
        tries: 0,
        trouble: { reason, message, fields, current },
      });
      settle(entry.id, { is: 'refused', refusal: error });
      return false;
    }
  }

  function stopped(error: unknown): void {
    const signedOut = error instanceof Refusal && error.reason === 'signed-out';
    held.set({ sendingId: null, signedOut, noSignal: error instanceof Unreachable });
    for (const id of [...asked.keys()]) settle(id, { is: 'waiting' });
    if (signedOut) return;
    const wait = error instanceof Refusal && error.retryAfter ? error.retryAfter * 1000 : AGAIN_MS;
    later(() => void drain(), wait);
  }

  return {
    drain,
    /** What becomes of a record that was just added, as far as it is known after so long. */
    outcomeOf: (id: string, withinMs: number): Promise<Outcome> => {
      const answer = new Promise<Outcome>((done) => asked.set(id, done));
      const timer = setTimeout(() => settle(id, { is: 'waiting' }), withinMs);
      const end = () => settle(id, { is: 'waiting' });
      drain().then(end, end);
      return answer.finally(() => clearTimeout(timer));
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
