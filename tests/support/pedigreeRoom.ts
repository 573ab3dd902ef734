import { join } from 'node:path';
import BetterSqlite3 from 'better-sqlite3';
import type { Colony } from './stock';
import { makeId } from './testApp';

/** A family of holdbacks: its sire, or the males that it may be by (equal shares), its dam, and how many of them. */
export type Family = { code: string; sires: string[]; dam: string; heads: number };

/**
 * Writes families of coded fish straight into the file of a running product: hundreds of them in a second, where recording
 * each mouthful would take minutes. Every other one is a male.
 */
export function addFamilies(dataFolder: string, roomId: string, colony: Colony, families: Family[]): void {
  const file = new BetterSqlite3(join(dataFolder, 'kinwater.db'));
  file.pragma('busy_timeout = 5000');
  const actor = file
    .prepare<[string], { accountId: string }>('select accountId from member where roomId = ?')
    .get(roomId);
  const now = new Date().toISOString();
  const add = (table: string, row: Record<string, string | number | null>) => {
    const names = Object.keys(row);
    const values = names.map((name) => `@${name}`).join(', ');
    file.prepare(`insert into "${table}" (${names.map((name) => `"${name}"`).join(', ')}) values (${values})`).run(row);
  };
  const keepFamily = ({ code, sires, dam, heads }: Family) => {
    const parentageId = makeId();
    const made = { madeBy: actor?.accountId ?? '', madeAt: now };
    add('parentage', {
      roomId,
      id: parentageId,
      rootId: parentageId,
      turn: 1,
      paternity: 'single',
      basis: null,
      entryId: null,
      ...made,
    });
    const parents = [...sires.map((fishId) => ({ side: 'sire', fishId })), { side: 'dam', fishId: dam }];
    for (const [position, parent] of parents.entries())
      add('parentageCandidate', { roomId, parentageId, position, weight: 1, ...parent });
    for (let n = 1; n <= heads; n += 1) {
      const id = makeId();
      const name = `${code}-${String(n).padStart(2, '0')}`;
      add('fish', {
        roomId,
        id,
        code: name,
        strainId: colony.strainId,
        origin: 'bred',
        bornOn: '2026-03-01',
        keptAs: 'holdback',
        parentageId,
        createdAt: now,
      });
      const seen = { onDay: '2026-05-01', how: 'seen', certain: 1, actorId: actor?.accountId ?? '', at: now };
      add('finding', {
        roomId,
        id: makeId(),
        fishId: id,
        kind: 'sex',
        value: n % 2 === 0 ? 'male' : 'female',
        ...seen,
      });
    }
  };
  file.transaction(() => families.forEach(keepFamily))();
  file.close();
}
