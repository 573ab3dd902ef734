import type { AuditLine } from '../../shared/audit/contract';
import type { Scope } from '../scope';

const PAGE = 50;

type Filter = { before?: string | undefined; limit?: number | undefined; aboutId?: string | undefined };

/** What was changed or removed in the fishroom, newest first. Ids are in the order of time. */
export async function trailOf({ db, roomId }: Scope, filter: Filter): Promise<{ lines: AuditLine[]; more: boolean }> {
  const { before, limit = PAGE, aboutId } = filter;
  let query = db
    .selectFrom('audit')
    .leftJoin('account', 'account.id', 'audit.actorId')
    .where('audit.roomId', '=', roomId)
    .select([
      'audit.id',
      'audit.at',
      'audit.actorId',
      'account.name',
      'audit.action',
      'audit.about',
      'audit.aboutId',
      'audit.change',
    ]);
  if (before) query = query.where('audit.id', '<', before);
  if (aboutId) query = query.where('audit.aboutId', '=', aboutId);
  const rows = await query
    .orderBy('audit.id', 'desc')
    .limit(limit + 1)
    .execute();
  const lines = rows.slice(0, limit).map(({ actorId, name, change, ...line }) => ({
    ...line,
    by: actorId !== null && name !== null ? { id: actorId, name } : null,
    change: change === null ? {} : JSON.parse(change),
  }));
  return { lines, more: rows.length > limit };
}
