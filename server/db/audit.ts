import type { Asked } from '../scope';
import { newId } from './newId';

type Change = Record<string, [before: unknown, after: unknown]>;

/** The one way into the audit trail. `change` holds no names, addresses or letters: they must be erasable. */
export async function audit(
  scope: Pick<Asked, 'db' | 'now' | 'requestId'> & { roomId?: string; actorId?: string; accountId?: string },
  line: { action: string; about: string; aboutId?: string; change?: Change; roomId?: string },
): Promise<void> {
  await scope.db
    .insertInto('audit')
    .values({
      id: newId(scope.now),
      roomId: line.roomId ?? scope.roomId ?? null,
      at: scope.now,
      actorId: scope.actorId ?? scope.accountId ?? null,
      action: line.action,
      about: line.about,
      aboutId: line.aboutId ?? null,
      change: line.change ? JSON.stringify(line.change) : null,
      requestId: scope.requestId,
    })
    .execute();
}
