import type * as z from 'zod/mini';
import type { Lodging, TankRow } from '../../shared/tanks/contract';
import type { Scope } from '../scope';

type Told = z.input<typeof Lodging>;

/** Who lives in a tank as the stocking check takes them. Fish without a strain (possible hybrids) have no profile and are left out. */
export async function lodgersIn(
  scope: Scope,
  { residents }: Pick<z.input<typeof TankRow>, 'residents'>,
): Promise<Told[]> {
  const lodgings: Told[] = [];
  for (const { thing, id, code, strainId, heads } of residents) {
    const strain = strainId ? await strainOf(scope, strainId) : null;
    if (!strain) continue;
    const { speciesId, locality } = strain;
    const size = await sizeOf(scope, thing, id);
    const sexes =
      thing === 'batch' ? { males: 0, females: 0, unsexed: Math.round(heads) } : await sexesOf(scope, thing, id);
    lodgings.push({ name: code, speciesId, locality, ...sexes, ...size });
  }
  return lodgings;
}

const strainOf = ({ db, roomId }: Scope, strainId: string) =>
  db
    .selectFrom('strain')
    .where('roomId', '=', roomId)
    .where('id', '=', strainId)
    .select(['speciesId', 'locality'])
    .executeTakeFirst();

async function sexesOf({ db, roomId }: Scope, thing: 'colony' | 'fish', id: string) {
  const fish = db
    .selectFrom('fish')
    .where('fish.roomId', '=', roomId)
    .select((eb) =>
      eb
        .selectFrom('finding')
        .whereRef('finding.roomId', '=', 'fish.roomId')
        .whereRef('finding.fishId', '=', 'fish.id')
        .where('finding.kind', '=', 'sex')
        .orderBy('finding.onDay', 'desc')
        .orderBy('finding.id', 'desc')
        .limit(1)
        .select('finding.value')
        .as('sex'),
    );
  const rows = await (thing === 'fish'
    ? fish.where('fish.id', '=', id)
    : fish.where('fish.id', 'in', (eb) =>
        eb
          .selectFrom('colonyMember')
          .where('colonyMember.roomId', '=', roomId)
          .where('colonyMember.colonyId', '=', id)
          .where('colonyMember.untilDay', 'is', null)
          .select('colonyMember.fishId'),
      )
  ).execute();
  const count = (sex: string) => rows.filter((row) => row.sex === sex).length;
  return { males: count('male'), females: count('female'), unsexed: rows.length - count('male') - count('female') };
}

/** Smallest and largest of the last sample in total length; null where nothing was measured. */
async function sizeOf(
  { db, roomId }: Scope,
  thing: 'colony' | 'fish' | 'batch',
  id: string,
): Promise<Pick<Told, 'smallestMm' | 'largestMm'>> {
  if (thing === 'colony') return { smallestMm: null, largestMm: null };
  const sample = await db
    .selectFrom('lengthSample')
    .where('roomId', '=', roomId)
    .where(thing === 'fish' ? 'fishId' : 'batchId', '=', id)
    .where('measure', '=', 'total')
    .select('id')
    .orderBy('onDay', 'desc')
    .executeTakeFirst();
  if (!sample) return { smallestMm: null, largestMm: null };
  const range = await db
    .selectFrom('lengthReading')
    .where('roomId', '=', roomId)
    .where('sampleId', '=', sample.id)
    .select(({ fn }) => [fn.min<number>('lengthTenthsMm').as('least'), fn.max<number>('lengthTenthsMm').as('most')])
    .executeTakeFirst();
  return { smallestMm: range ? range.least / 10 : null, largestMm: range ? range.most / 10 : null };
}
