import type * as z from 'zod/mini';
import { byNumber } from '../../shared/codes';
import { notFound, Refusal } from '../../shared/refusal';
import type { addTank, changeTank, readTank, TankRow } from '../../shared/tanks/contract';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import type { Scope } from '../scope';
import { speciesSeen } from '../species';
import { lodgersIn } from './lodgers';
import { type Stayed, staysOf } from './residents';

type Told = z.input<typeof TankRow>;

/** Every tank with who lives in it, in walking order. */
export async function allTanks(scope: Scope): Promise<Told[]> {
  const rows = await tankRows(scope);
  const stays = await staysOf(scope, { openOnly: true });
  return rows
    .map((row) => withResidents(row, stays))
    .sort((a, b) => a.walkOrder - b.walkOrder || byNumber(a.code, b.code));
}

export async function oneTank(scope: Scope, tankId: string): Promise<Told> {
  const [row] = await tankRows(scope, tankId);
  if (!row) throw notFound('That tank');
  return withResidents(row, await staysOf(scope, { tankId, openOnly: true }));
}

export async function tankPage(scope: Scope, tankId: string): Promise<z.input<typeof readTank.output>> {
  const tank = await oneTank(scope, tankId);
  const stays = await staysOf(scope, { tankId, openOnly: false });
  const lodgers = await lodgersIn(scope, tank);
  const species = await speciesSeen(scope, [...new Set(lodgers.map(({ speciesId }) => speciesId))]);
  return {
    tank,
    lodgers,
    species,
    stays: stays.map(({ resident, fromDay, untilDay }) => ({ resident, fromDay, untilDay })),
  };
}

function tankRows({ db, roomId }: Scope, tankId?: string) {
  let query = db
    .selectFrom('tank')
    .where('roomId', '=', roomId)
    .select([
      'id',
      'version',
      'code',
      'place',
      'walkOrder',
      'lengthTenthsMm',
      'widthTenthsMm',
      'heightTenthsMm',
      'fillTenthsMm',
      'glassTenthsMm',
      'standKg',
      'litres',
      'heaterC',
      'purpose',
      'note',
      'retiredOn',
    ]);
  if (tankId) query = query.where('id', '=', tankId);
  return query.execute();
}

type Row = Awaited<ReturnType<typeof tankRows>>[number];

const withResidents = (row: Row, stays: Stayed[]) => ({
  ...row,
  residents: stays.filter(({ tankId }) => tankId === row.id).map(({ resident }) => resident),
});

export async function addOne(
  scope: Scope,
  { id, ...facts }: z.output<typeof addTank.body>,
): Promise<z.input<typeof addTank.output>> {
  await keepTankCode(facts.code, () =>
    scope.db
      .insertInto('tank')
      .values({ roomId: scope.roomId, id, ...facts, retiredOn: null, createdAt: scope.now })
      .execute(),
  );
  await audit(scope, { action: 'tank added', about: 'tank', aboutId: id });
  return oneTank(scope, id);
}

export async function changeOne(
  scope: Scope,
  tankId: string,
  { version, ...facts }: z.output<typeof changeTank.body>,
): Promise<z.input<typeof changeTank.output>> {
  const before = await oneTank(scope, tankId);
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this tank meanwhile', {}, { current: before });
  if (facts.retiredOn && before.residents.length > 0) {
    throw new Refusal('conflict', 'Fish live in this tank. Move them first.', { retiredOn: 'Move its fish first' });
  }
  await keepTankCode(facts.code, () =>
    scope.db
      .updateTable('tank')
      .set({ ...facts, version: version + 1 })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', tankId)
      .execute(),
  );
  await audit(scope, {
    action: 'tank changed',
    about: 'tank',
    aboutId: tankId,
    change: {
      code: [before.code, facts.code],
      litres: [before.litres, facts.litres],
      heaterC: [before.heaterC, facts.heaterC],
      retiredOn: [before.retiredOn, facts.retiredOn],
    },
  });
  return oneTank(scope, tankId);
}

async function keepTankCode<T>(code: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isUniqueViolation(error, 'tank.code')) {
      throw new Refusal('conflict', `Another tank has the code ${code}`, { code: 'Taken: choose another code' });
    }
    throw error;
  }
}
