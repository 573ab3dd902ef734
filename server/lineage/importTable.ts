import type { BadCell } from '../../shared/lineage/contract';
import { PedigreeError } from '../../shared/lineage/pedigreeError';
import { sortPedigree } from '../../shared/lineage/sortedPedigree';
import { Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { newId } from '../db/newId';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { mustNotLoop } from './acyclic';
import { keepParentage } from './parentage';
import { type Parent, readTable, type TableRow } from './readTable';

type Known = { id: string | null; sex: string | null; born: string | null };
type Checked = { rows: TableRow[]; bad: BadCell[]; strains: Map<string, string>; here: Map<string, Known> };

/** Reads a table and names all that is wrong with it, held against the fishroom as well. */
export async function checkTable(scope: Scope, text: string): Promise<Checked> {
  const { rows, bad } = readTable(text);
  const strains = new Map(
    (await scope.db.selectFrom('strain').where('roomId', '=', scope.roomId).select(['id', 'code']).execute()).map(
      ({ id, code }) => [code, id],
    ),
  );
  const here = new Map<string, Known>();
  for (const { id, code, sex, bornOn } of await fishRows(scope, { foreign: true }))
    if (code) here.set(code, { id, sex: sex === 'unknown' ? null : sex, born: bornOn });
  const all = new Map(here);
  for (const { id, sex, born } of rows) if (!all.has(id)) all.set(id, { id: null, sex, born });
  const seen = new Set<string>();
  for (const row of rows) {
    const wrong = (column: string, value: string, says: string) =>
      void bad.push({ line: row.line, column, value, says });
    if (here.has(row.id)) wrong('id', row.id, 'A fish of this fishroom has this code already');
    if (seen.has(row.id)) wrong('id', row.id, 'This code stands in the table twice');
    seen.add(row.id);
    if (row.strain && !strains.has(row.strain))
      wrong('strain', row.strain, 'Add this strain first, or correct its code');
    if (row.born && row.born > scope.today) wrong('born', row.born, 'That day is still to come');
    checkParents(row, all, wrong);
  }
  bad.push(...loopsIn(rows), ...clutchesIn(rows));
  return { rows, bad: bad.sort((a, b) => a.line - b.line), strains, here };
}

function checkParents(
  row: TableRow,
  all: Map<string, Known>,
  wrong: (...said: [string, string, string]) => void,
): void {
  for (const [column, parents, other] of [
    ['sire', row.sires, 'female'],
    ['dam', row.dams, 'male'],
  ] as const) {
    for (const { code } of parents) {
      if (code === null) continue;
      const parent = all.get(code);
      if (!parent) wrong(column, code, 'Neither in this table nor in the fishroom');
      if (parent?.sex === other) wrong(column, code, `It is a ${other}`);
      if (parent?.born && row.born && parent.born >= row.born) wrong(column, code, 'It was not born yet');
      if (column === 'sire' && row.dams.some((dam) => dam.code === code)) wrong(column, code, 'Also named as the dam');
    }
  }
}

/** Fish that were in the fishroom before cannot descend from new ones: a loop is within the table. */
function loopsIn(rows: TableRow[]): BadCell[] {
  const own = new Map(rows.map((row) => [row.id, row]));
  const side = (parents: Parent[]) => ({
    kind: 'mixed' as const,
    candidates: [...new Set(parents.map(({ code }) => (code && own.has(code) ? code : null))), null].map((id) => ({
      id,
      weight: 1,
    })),
  });
  try {
    sortPedigree([...own.values()].map(({ id, sires, dams }) => ({ id, sire: side(sires), dam: side(dams) })));
    return [];
  } catch (error) {
    if (!(error instanceof PedigreeError) || error.reason !== 'cycle') throw error;
    const [id = ''] = error.ids;
    return [
      {
        line: own.get(id)?.line ?? 1,
        column: 'id',
        value: id,
        says: `It would be its own ancestor: ${[...error.ids, id].join(', child of ')}`,
      },
    ];
  }
}

const parentsText = ({ sires, dams, several }: TableRow): string => JSON.stringify([sires, dams, several]);

function clutchesIn(rows: TableRow[]): BadCell[] {
  const first = new Map<string, string>();
  return rows.flatMap((row): BadCell[] => {
    if (!row.clutch) return [];
    const known = first.get(row.clutch) ?? parentsText(row);
    first.set(row.clutch, known);
    if (known === parentsText(row)) return [];
    return [
      { line: row.line, column: 'clutch', value: row.clutch, says: 'Fish of one clutch have the same sire and dam' },
    ];
  });
}

/** Writes the whole table inside the caller's transaction, or refuses it whole. */
export async function takeTable(scope: Scope, text: string): Promise<{ rows: number }> {
  const { rows, bad, strains, here } = await checkTable(scope, text);
  const [worst] = bad;
  if (worst) {
    const says = `Line ${worst.line}, ${worst.column} “${worst.value}”: ${worst.says}`;
    throw new Refusal('invalid', `Nothing was written: ${bad.length} cells are wrong`, { text: says });
  }
  const ids = new Map(rows.map(({ id }) => [id, newId(scope.now)]));
  await addFish(scope, { rows, ids, strains });
  const idOf = (code: string | null) => (code === null ? null : (ids.get(code) ?? here.get(code)?.id ?? null));
  const roots = new Map<string, string>();
  for (const row of rows) {
    if (row.sires.length + row.dams.length === 0 && !row.clutch) continue;
    const key = row.clutch ?? `line ${row.line}`;
    const draft = (parents: Parent[]) => parents.map(({ code, weight }) => ({ fishId: idOf(code), weight }));
    const root =
      roots.get(key) ??
      (await keepParentage(
        scope,
        {
          paternity: row.several ? 'mixed' : 'single',
          sires: draft(row.sires),
          dams: draft(row.dams),
          basis: 'Out of a pedigree table',
        },
        { entryId: null },
      ));
    roots.set(key, root);
    await scope.db
      .updateTable('fish')
      .set({ parentageId: root })
      .where('roomId', '=', scope.roomId)
      .where('id', '=', ids.get(row.id) ?? '')
      .execute();
  }
  await mustNotLoop(scope, 'text');
  await audit(scope, { action: 'pedigree table taken in', about: 'fish', change: { count: [0, rows.length] } });
  return { rows: rows.length };
}

type Adding = { rows: TableRow[]; ids: Map<string, string>; strains: Map<string, string> };

async function addFish({ db, roomId, now, today, actorId }: Scope, { rows, ids, strains }: Adding): Promise<void> {
  for (const { id: code, sires, dams, born, strain, sex } of rows) {
    const id = ids.get(code) ?? '';
    await db
      .insertInto('fish')
      .values({
        ...{ roomId, id, code, strainId: strain ? (strains.get(strain) ?? null) : null },
        origin: sires.length + dams.length > 0 ? 'bred' : 'founder',
        ...{ lotId: null, batchId: null, broodId: null, parentageId: null },
        ...{ bornOn: born, arrivedOn: null, keptAs: 'other', note: null, entryId: null, createdAt: now },
      })
      .execute();
    if (!sex) continue;
    await db
      .insertInto('finding')
      .values({
        ...{ roomId, id: newId(now), fishId: id, kind: 'sex', onDay: today, value: sex, how: 'told', certain: 1 },
        ...{ note: null, actorId, at: now, entryId: null },
      })
      .execute();
  }
}
