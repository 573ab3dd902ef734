import { sql } from 'kysely';
import { formatDate } from '../../shared/days';
import type { AncestryEntry } from '../../shared/sheets/ancestry';
import type { SheetContent } from '../../shared/sheets/content';
import type { Fate } from '../../shared/sheets/importContract';
import { fateOf, type KnownAnimal, rankOf, type Told } from '../../shared/sheets/mergeAncestry';
import { foreignNames, type ToldAnimal, toldAnimals } from '../lineage';
import type { Scope } from '../scope';
import type { SheetRead } from './readSource';

export type Planned = { entry: AncestryEntry; told: Told; fate: Fate; fishId: string | null };
export type Before = { importId: string; number: string; heads: number; on: string };

/** What taking a sheet in would do: each animal's fate, and what of it is here. */
export type ImportPlan = {
  animals: Planned[];
  /** This very sheet, taken in before. */
  same: Before | null;
  /** Other sheets that brought fish of this brood, or this fish. */
  before: Before[];
  heads: number;
  refused: string | null;
};

export async function planImport(scope: Scope, { content, trust, recalled }: SheetRead): Promise<ImportPlan> {
  const told = await toldAnimals(scope);
  const known = await knownAnimals(scope, told);
  const sheet = { issuer: content.fishroom.id, checked: trust.signature === 'valid' };
  const animals = content.ancestry.map((entry): Planned => {
    const now: Told = { entry, rank: rankOf(entry.id, sheet), issuedOn: content.issue.on };
    const before = known.get(entry.id);
    return { entry, told: now, fate: fateOf(now, before), fishId: before?.fishId ?? null };
  });
  const sheets = await sheetsOfSubject(scope, content);
  const isSame = ({ number }: Before) => number === content.issue.number;
  const { male, female, unsexed } = content.subject.heads;
  const plan = {
    animals,
    same: sheets.find(isSame) ?? null,
    before: sheets.filter((one) => !isSame(one)),
    heads: male + female + unsexed,
  };
  return { ...plan, refused: await refusalOf(scope, content, plan, recalled) };
}

/** Every animal with a name beyond the fishroom that is known here: our own fish, and those that sheets brought. */
async function knownAnimals(scope: Scope, told: Map<string, ToldAnimal>): Promise<Map<string, KnownAnimal>> {
  const { db, roomId } = scope;
  const own = await db.selectFrom('fish').where('roomId', '=', roomId).select('id').execute();
  const broods = await db.selectFrom('brood').where('roomId', '=', roomId).select('id').execute();
  const known = new Map<string, KnownAnimal>();
  for (const { id } of [...own, ...broods]) known.set(`${roomId}/${id}`, { fishId: id, told: null });
  for (const [name, fishId] of await foreignNames(scope)) {
    const one = told.get(fishId);
    known.set(name, { fishId, told: one ? { entry: one.entry, rank: one.rank, issuedOn: one.issuedOn } : null });
  }
  return known;
}

/** Sheets of the same fish or brood that were taken in, this one included. */
async function sheetsOfSubject({ db, roomId }: Scope, content: SheetContent): Promise<Before[]> {
  const rows = await db
    .selectFrom('importedSheet as source')
    .where('source.roomId', '=', roomId)
    .where(({ eb, or, and }) =>
      or([
        sql<boolean>`json_extract(source.content, '$.subject.id') = ${content.subject.id}`,
        and([eb('source.issuer', '=', content.fishroom.id), eb('source.number', '=', content.issue.number)]),
      ]),
    )
    .select((eb) => [
      'source.id as importId',
      'source.number',
      'source.createdAt',
      eb
        .selectFrom('toldFish')
        .whereRef('toldFish.roomId', '=', 'source.roomId')
        .whereRef('toldFish.importedSheetId', '=', 'source.id')
        .where('toldFish.here', '=', 1)
        .select(({ fn }) => fn.countAll<number>().as('n'))
        .as('heads'),
    ])
    .orderBy('source.createdAt')
    .execute();
  return rows.map(({ importId, number, createdAt, heads }) => ({
    importId,
    number,
    heads: heads ?? 0,
    on: createdAt.slice(0, 10),
  }));
}

type Judged = Pick<ImportPlan, 'animals' | 'same' | 'heads'>;

async function refusalOf(
  scope: Scope,
  content: SheetContent,
  { animals, same, heads }: Judged,
  recalled: SheetRead['recalled'],
): Promise<string | null> {
  const { fishroom, issue, subject } = content;
  if (fishroom.id === scope.roomId) return 'This sheet is of this fishroom: its fish are known here.';
  if (recalled?.state === 'withdrawn')
    return `${fishroom.name} withdrew this sheet on ${formatDate(recalled.on)}. Ask for the one that counts.`;
  const subjectAnimal = animals.find(({ entry }) => entry.id === subject.id);
  if (same && (subject.kind === 'fish' || same.heads >= heads))
    return `Sheet ${issue.number} of ${fishroom.name} was taken in on ${formatDate(same.on)} already.`;
  if (subjectAnimal?.fate === 'ours' && subject.kind === 'fish')
    return 'This is a fish of this fishroom. Record on its own page that it came back.';
  return posing(scope, content);
}

/** One fishroom's id is not another's: what was checked once at one address is not believed from elsewhere by another key. */
async function posing({ db, roomId }: Scope, { fishroom }: SheetContent): Promise<string | null> {
  const earlier = await db
    .selectFrom('importedSheet')
    .where('roomId', '=', roomId)
    .where('issuer', '=', fishroom.id)
    .where('signature', '=', 'valid')
    .select(({ fn, val }) => [
      'keyId',
      fn<string>('json_extract', ['content', val('$.fishroom.address')]).as('address'),
    ])
    .execute();
  const first = earlier[0];
  if (!first || earlier.some(({ keyId, address }) => keyId === fishroom.keyId || address === fishroom.address))
    return null;
  return `Earlier sheets of this fishroom came from ${first.address}. Ask it whether it has moved to ${fishroom.address}.`;
}
