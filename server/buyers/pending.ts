import { foldedEmail } from '../../shared/accounts/shapes';
import { AskDraft } from '../../shared/buyers/ask';
import { Refusal } from '../../shared/refusal';
import { hashOfToken, newMailToken } from '../mail/tokens';
import type { Asked } from '../scope';
import { availablePage, publicRoom } from './available';
import { confirmLetter } from './requestLetters';

const GOOD_FOR_MINUTES = 3 * 24 * 60;

/**
 * Takes a question down outside the fishroom, and writes to the address that was given. Whether that is known here is not said;
 * what is not confirmed in three days is forgotten.
 */
export async function askOnPage(asked: Asked, slug: string, draft: AskDraft): Promise<void> {
  const page = await availablePage(asked, slug);
  const { asks } = draft;
  const fish = asks.kind === 'fish' ? page.fish.find(({ broodId }) => broodId === asks.broodId) : undefined;
  const strain = asks.kind === 'notice' ? page.strains.find(({ id }) => id === asks.strainId) : undefined;
  const what = fish ?? strain;
  if (!what)
    throw new Refusal('invalid', 'Those fish are not on the page any more', {
      [asks.kind === 'fish' ? 'asks.broodId' : 'asks.strainId']: 'Choose others',
    });
  const { scope, name } = await publicRoom(asked, slug);
  await asked.db.transaction().execute(async (db) => {
    const tokenId = await newMailToken(
      { ...asked, db },
      {
        purpose: 'buyer',
        email: foldedEmail(draft.email),
        accountId: null,
        minutes: GOOD_FOR_MINUTES,
        payload: { roomId: scope.roomId, draft },
        alongside: true,
      },
    );
    await confirmLetter({ ...asked, db }, { tokenId, draft, roomName: name, what });
  });
}

type Pending = { id: string; roomId: string; draft: AskDraft };

/** What waits behind a link for its address to be confirmed. */
export async function pendingBy({ db, now }: Pick<Asked, 'db' | 'now'>, token: string): Promise<Pending | null> {
  const row = await db
    .selectFrom('mailToken')
    .where('tokenHash', '=', hashOfToken(token))
    .where('purpose', '=', 'buyer')
    .where('usedAt', 'is', null)
    .where('expiresAt', '>', now)
    .select(['id', 'payload'])
    .executeTakeFirst();
  const told = row?.payload ? Object(JSON.parse(row.payload)) : null;
  const draft = AskDraft.safeParse(told?.draft);
  return row && draft.success ? { id: row.id, roomId: String(told.roomId), draft: draft.data } : null;
}

/** Questions that nobody confirmed are not kept, and neither is what was asked once it stands in the fishroom. */
export async function forgetUnconfirmed({ db, now }: Pick<Asked, 'db' | 'now'>): Promise<void> {
  await db
    .deleteFrom('mailToken')
    .where('purpose', '=', 'buyer')
    .where(({ or, eb }) => or([eb('expiresAt', '<=', now), eb('usedAt', 'is not', null)]))
    .execute();
}
