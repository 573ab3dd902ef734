import { addressOf, call, refusalOf, Unreachable } from '@/features/call';
import { getMe } from '@/shared/accounts/contract';
import { addPhoto } from '@/shared/photos/contract';
import { type EntryDraft, EntryLine, recordEntry, undoEntry } from '@/shared/record/contract';
import { Refusal } from '@/shared/refusal';
import type { KeptPicture, Waiting } from './waiting';

/** How the queue speaks to the server. */
export type Line = {
  /** Throws a `Refusal`, or `Unreachable`. */
  send(entry: Waiting): Promise<EntryLine>;
  takeBack(entry: Waiting): Promise<void>;
  /** Whether the session is still that of the person who made the records. */
  isIn(accountId: string): Promise<boolean>;
};

export const serverLine: Line = {
  send(entry) {
    const { roomId, id, madeAt, dependsOn, content, picture } = entry;
    const draft = { id, madeAt, dependsOn, content };
    return picture ? sendPicture(roomId, draft, picture) : call(recordEntry, { params: { roomId }, body: draft });
  },
  async takeBack({ roomId, id }) {
    try {
      await call(undoEntry, { params: { roomId, entryId: id } });
    } catch (error) {
      // It had not arrived: there is nothing to undo.
      if (!(error instanceof Refusal) || error.reason !== 'not-found') throw error;
    }
  },
  async isIn(accountId) {
    const me = await call(getMe);
    return me.account.id === accountId;
  },
};

async function sendPicture(roomId: string, draft: EntryDraft, { name, type, bytes }: KeptPicture): Promise<EntryLine> {
  const form = new FormData();
  form.append('entry', JSON.stringify(draft));
  form.append('picture', new File([bytes], name, { type }));
  let answer: Response;
  try {
    answer = await fetch(addressOf(addPhoto, { params: { roomId } }), { method: 'POST', body: form });
  } catch {
    throw new Unreachable('No signal. The photo waits here.');
  }
  if (!answer.ok) throw await refusalOf(answer);
  return EntryLine.parse(Object(await answer.json()).line);
}
