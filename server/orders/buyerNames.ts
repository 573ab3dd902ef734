import type * as z from 'zod/mini';
import type { addBuyerName, BuyerName } from '../../shared/orders/buyerNames';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import type { Scope } from '../scope';

export function buyerNames({ db, roomId }: Scope): Promise<BuyerName[]> {
  return db
    .selectFrom('buyer')
    .where('roomId', '=', roomId)
    .where('erasedAt', 'is', null)
    .select(['id', 'name', 'email'])
    .orderBy('name')
    .execute();
}

export async function addName(scope: Scope, buyer: z.output<typeof addBuyerName.body>): Promise<BuyerName> {
  const { db, roomId, now } = scope;
  const nothing = {
    accountId: null,
    phone: null,
    address: null,
    note: null,
    emailConfirmedAt: null,
    noticesStoppedAt: null,
  };
  try {
    await db
      .insertInto('buyer')
      .values({ roomId, ...buyer, ...nothing, erasedAt: null, createdAt: now })
      .execute();
  } catch (error) {
    if (!isUniqueViolation(error, 'buyer.email')) throw error;
    throw new Refusal('conflict', 'A buyer with this address is there already', { email: 'Choose that buyer' });
  }
  await audit(scope, { action: 'buyer added', about: 'buyer', aboutId: buyer.id });
  return buyer;
}
