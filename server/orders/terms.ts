import { sql } from 'kysely';
import { DEFAULT_TERMS, OrderTerms } from '../../shared/orders/terms';
import { audit } from '../db/audit';
import type { RoomAsked, Scope } from '../scope';

/** The fishroom's terms; what it has not set is the program's. */
export async function termsOf({ db, roomId }: Pick<RoomAsked, 'db' | 'roomId'>): Promise<OrderTerms> {
  const { settings } = await db
    .selectFrom('room')
    .where('id', '=', roomId)
    .select('settings')
    .executeTakeFirstOrThrow();
  const known = OrderTerms.safeParse(JSON.parse(settings)['orders']);
  return known.success ? known.data : DEFAULT_TERMS;
}

export async function termsPage(scope: Scope) {
  return { terms: await termsOf(scope), cards: scope.house.payments !== null };
}

export async function setTerms(scope: Scope, terms: OrderTerms) {
  const { db, roomId } = scope;
  await db
    .updateTable('room')
    .set({ settings: sql<string>`json_set(settings, '$.orders', json(${JSON.stringify(terms)}))` })
    .where('id', '=', roomId)
    .execute();
  await audit(scope, { action: 'order terms changed', about: 'fishroom', aboutId: roomId });
  return termsPage(scope);
}
