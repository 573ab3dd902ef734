import type { EntryContent } from '@/shared/record/kinds';
import type { Fields, Reason } from '@/shared/refusal';

/** A picture that goes with its entry; the bytes themselves, since a file handle does not outlive the page. */
export type KeptPicture = { name: string; type: string; bytes: ArrayBuffer };

/** What the form was, so that a record that still waits can be opened in it again. */
export type Typed = {
  /** The draft's key, and what the form is called and where. */
  key: string;
  title: string;
  href: string;
  values: Record<string, unknown>;
  /** Ids that the content names: later records may build on them, so they stay. */
  ids: [what: string, id: string][];
};

/** Why the server did not take it. It waits for the keeper then, and what builds on it waits with it. */
export type Trouble = { reason: Reason; message: string; fields: Fields; current: unknown };

/** A record as this device keeps it until the server has it. */
export type Waiting = {
  /** Its place in the order of making; given by the store, and kept when it is changed. */
  place: number;
  /** The entry's id, made here: sent twice, it is stored once. */
  id: string;
  accountId: string;
  roomId: string;
  madeAt: string;
  dependsOn: string[];
  content: EntryContent;
  picture: KeptPicture | null;
  /** `editing`: opened in its form again. `takenBack`: undone here, but it may have arrived before. */
  state: 'waiting' | 'editing' | 'takenBack';
  /** Times it was sent without an answer. Above zero it may be stored already. */
  tries: number;
  trouble: Trouble | null;
  typed: Typed | null;
};

export type NewWaiting = Pick<Waiting, 'id' | 'accountId' | 'roomId' | 'madeAt' | 'dependsOn' | 'content'> &
  Partial<Pick<Waiting, 'picture' | 'typed'>>;

export const waitingOf = ({ picture = null, typed = null, ...rest }: NewWaiting): Omit<Waiting, 'place'> => ({
  ...rest,
  picture,
  typed,
  state: 'waiting',
  tries: 0,
  trouble: null,
});
