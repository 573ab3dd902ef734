import { may } from '../../shared/roles';
import { numberWords } from '../sheets';
import type { Source } from './sources';

/** Orders by number, and by the buyer's name for those who may read it; none for those who may see neither. */
export const ordersNamed: Source = async ({ db, roomId, role }, _nameOf, ids) => {
  if (!may(role, 'catch:see')) return [];
  let query = db
    .selectFrom('purchase')
    .innerJoin('buyer', (join) =>
      join.onRef('buyer.roomId', '=', 'purchase.roomId').onRef('buyer.id', '=', 'purchase.buyerId'),
    )
    .where('purchase.roomId', '=', roomId)
    .select(['purchase.id', 'number', 'state', 'buyer.name']);
  if (ids) query = query.where('purchase.id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, number, state, name }) => ({
    thing: 'order',
    id,
    code: String(number),
    name: may(role, 'buyer:see') ? name : null,
    gone: state === 'closed' || state === 'cancelled',
  }));
};

/** Lineage sheets by number and by what they are made for. */
export const sheetsNamed: Source = async ({ db, roomId }, _nameOf, ids) => {
  let query = db
    .selectFrom('sheet')
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'sheet.roomId').onRef('fish.id', '=', 'sheet.fishId'))
    .leftJoin('brood', (join) =>
      join.onRef('brood.roomId', '=', 'sheet.roomId').onRef('brood.id', '=', 'sheet.broodId'),
    )
    .where('sheet.roomId', '=', roomId)
    .select([
      'sheet.id',
      'number',
      'issuedOn',
      'withdrawnAt',
      'replacedAt',
      'fish.code as fish',
      'brood.code as brood',
    ]);
  if (ids) query = query.where('sheet.id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, number, issuedOn, withdrawnAt, replacedAt, fish, brood }) => ({
    thing: 'sheet',
    id,
    code: numberWords(number, issuedOn),
    name: fish ?? brood,
    gone: withdrawnAt !== null || replacedAt !== null,
  }));
};
