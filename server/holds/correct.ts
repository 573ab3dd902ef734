import type { HoldFacts } from '../../shared/holds/entries';
import type { ParentageDraft } from '../../shared/lineage/parentageDraft';
import type { ContentOf } from '../../shared/record/kinds';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { keepParentage, parentagesOf } from '../lineage';
import type { Scope } from '../scope';
import { alreadyHolding, clashOf } from './clash';
import { oneHold } from './holds';
import { aboutHold, openHold } from './openHold';
import { fathersMustNotBeFemale, mayHold } from './parents';

type Content = ContentOf<'holdCorrected'>;

/** A hold's days, its female and its sires are set right while it goes on; both records stay in its history. */
export async function correctHold(scope: Scope, content: Content, { entryId }: { entryId: string }) {
  const { holdId, onDay, was, now } = content;
  const hold = await openHold(scope, holdId, onDay);
  if (!isSame(was, hold))
    throw new Refusal(
      'conflict',
      'Someone corrected this hold meanwhile',
      {},
      { current: await clashOf(scope, holdId) },
    );
  if (now.spawnEarliest > now.spawnLatest || now.spawnLatest > now.firstSeenOn) {
    throw new Refusal('invalid', 'The days are the wrong way round', {
      'now.spawnEarliest': 'Not after the day she was first seen holding',
    });
  }
  if (now.holderId) await mayHold(scope, now.holderId);
  await setFacts(scope, holdId, now);
  await newTurn(scope, content, entryId);
  return { onDay, about: aboutHold(await oneHold(scope, holdId)) };
}

/** Its parentage goes back by itself: the turn that this entry made is removed. */
export const takeCorrectionBack = (scope: Scope, { holdId, was }: Content): Promise<void> =>
  setFacts(scope, holdId, was);

async function setFacts(scope: Scope, holdId: string, { spawnSeen, ...facts }: HoldFacts): Promise<void> {
  const { version } = await oneHold(scope, holdId);
  try {
    await scope.db
      .updateTable('hold')
      .set({ ...facts, spawnSeen: spawnSeen ? 1 : 0, version: version + 1 })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', holdId)
      .execute();
  } catch (error) {
    if (isUniqueViolation(error, 'hold.holderId')) throw await alreadyHolding(scope, facts.holderId ?? '');
    throw error;
  }
}

const isSame = (was: HoldFacts, hold: Awaited<ReturnType<typeof oneHold>>): boolean =>
  was.holderId === (hold.holder?.id ?? null) &&
  was.spawnSeen === hold.spawnSeen &&
  was.spawnEarliest === hold.spawnEarliest &&
  was.spawnLatest === hold.spawnLatest &&
  was.firstSeenOn === hold.firstSeenOn;

async function newTurn(scope: Scope, { holdId, was, now, parentage }: Content, entryId: string): Promise<void> {
  if (!parentage && was.holderId === now.holderId) return;
  const { parentageId } = await scope.db
    .selectFrom('hold')
    .where('roomId', '=', scope.roomId)
    .where('id', '=', holdId)
    .select('parentageId')
    .executeTakeFirstOrThrow();
  const draft = parentage ?? (await asDraft(scope, parentageId, now.holderId));
  await fathersMustNotBeFemale(scope, draft.sires);
  await keepParentage(scope, draft, { entryId, rootId: parentageId });
}

/** What was known of the sires, with the female that holds as the mother. */
async function asDraft(scope: Scope, parentageId: string, holderId: string | null): Promise<ParentageDraft> {
  const told = (await parentagesOf(scope, [parentageId])).get(parentageId);
  return {
    paternity: told?.paternity ?? 'single',
    sires: (told?.sires ?? []).map(({ fishId, share }) => ({ fishId, weight: share })),
    dams: holderId ? [{ fishId: holderId, weight: 1 }] : [],
    basis: told?.basis ?? null,
  };
}
