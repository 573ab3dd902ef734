import type { Thing } from '../../shared/search/contract';
import type { Named } from '../../shared/search/rank';
import { LIBRARY } from '../../shared/species/library';
import type { Scope } from '../scope';
import { fishNamed } from './fishNamed';
import { ordersNamed, sheetsNamed } from './papersNamed';

/** All of a kind, or those asked for, with the words by which they are found. */
export type Source = (scope: Scope, nameOf: (speciesId: string) => string, ids?: string[]) => Promise<Named[]>;

const tanksNamed: Source = async ({ db, roomId }, _nameOf, ids) => {
  let query = db.selectFrom('tank').where('roomId', '=', roomId).select(['id', 'code', 'place', 'retiredOn']);
  if (ids) query = query.where('id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, code, place, retiredOn }) => ({
    thing: 'tank',
    id,
    code,
    name: place,
    gone: retiredOn !== null,
  }));
};

const strainsNamed: Source = async ({ db, roomId }, nameOf, ids) => {
  let query = db
    .selectFrom('strain')
    .where('roomId', '=', roomId)
    .select(['id', 'code', 'speciesId', 'scientificName', 'tradeName', 'synonyms', 'locality', 'retiredOn']);
  if (ids) query = query.where('id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, code, speciesId, scientificName, tradeName, synonyms, locality, retiredOn }) => ({
    thing: 'strain',
    id,
    code,
    name: [scientificName ?? nameOf(speciesId), locality].filter(Boolean).join(' '),
    gone: retiredOn !== null,
    also: [tradeName, synonyms],
  }));
};

const coloniesNamed: Source = async ({ db, roomId }, nameOf, ids) => {
  let query = db
    .selectFrom('colony')
    .innerJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'colony.roomId').onRef('strain.id', '=', 'colony.strainId'),
    )
    .where('colony.roomId', '=', roomId)
    .select(['colony.id', 'colony.code', 'endedOn', 'speciesId', 'scientificName', 'locality']);
  if (ids) query = query.where('colony.id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, code, endedOn, speciesId, scientificName, locality }) => ({
    thing: 'colony',
    id,
    code,
    name: [scientificName ?? nameOf(speciesId), locality].filter(Boolean).join(' '),
    gone: endedOn !== null,
  }));
};

const broodsNamed: Source = async ({ db, roomId }, nameOf, ids) => {
  let query = db
    .selectFrom('brood')
    .leftJoin('strain', (join) =>
      join.onRef('strain.roomId', '=', 'brood.roomId').onRef('strain.id', '=', 'brood.strainId'),
    )
    .where('brood.roomId', '=', roomId)
    .select(['brood.id', 'brood.code', 'speciesId', 'scientificName', 'locality']);
  if (ids) query = query.where('brood.id', 'in', ids);
  const rows = await query.execute();
  return rows.map(({ id, code, speciesId, scientificName, locality }) => ({
    thing: 'brood',
    id,
    code,
    name: speciesId ? [scientificName ?? nameOf(speciesId), locality].filter(Boolean).join(' ') : 'possible hybrid',
    gone: false,
  }));
};

/** The library's and the fishroom's own. */
const speciesNamed: Source = async ({ db, roomId }, nameOf, ids) => {
  const own = await db
    .selectFrom('speciesOverride')
    .where('roomId', '=', roomId)
    .where('own', '=', 1)
    .select('id')
    .execute();
  const all = [
    ...LIBRARY.map(({ id, commonNames }) => ({ id, also: commonNames?.value ?? [] })),
    ...own.map(({ id }) => ({ id, also: [] })),
  ];
  return all
    .filter(({ id }) => !ids || ids.includes(id))
    .map(({ id, also }) => ({ thing: 'species', id, code: nameOf(id), name: null, gone: false, also: [...also] }));
};

export const SOURCES: Record<Thing, Source> = {
  tank: tanksNamed,
  colony: coloniesNamed,
  brood: broodsNamed,
  fish: fishNamed,
  strain: strainsNamed,
  order: ordersNamed,
  sheet: sheetsNamed,
  species: speciesNamed,
};
