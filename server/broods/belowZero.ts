import { headCountOf } from '../../shared/broods/headCount';
import type { LedgerEntry } from '../../shared/broods/headEntry';
import type { Db } from '../db/open';

/** Batches whose head count cannot be replayed: more fish left alive than ever came in, or a reversal of nothing. */
export async function batchesBelowZero(db: Db, roomId?: string): Promise<string[]> {
  let query = db
    .selectFrom('headEntry')
    .select(['id', 'roomId', 'batchId', 'onDay as on', 'at', 'kind', 'heads', 'cause', 'reverses']);
  if (roomId) query = query.where('roomId', '=', roomId);
  const ledgers = new Map<string, LedgerEntry[]>();
  for (const { batchId, roomId: _room, ...line } of await query.execute())
    ledgers.set(batchId, [...(ledgers.get(batchId) ?? []), line]);
  return [...ledgers].filter(([, lines]) => !canBeReplayed(lines)).map(([batchId]) => batchId);
}

function canBeReplayed(lines: LedgerEntry[]): boolean {
  try {
    return headCountOf(lines).balance >= 0;
  } catch {
    return false;
  }
}
