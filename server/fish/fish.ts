import type * as z from 'zod/mini';
import { proposeFishCode } from '../../shared/codes';
import type { addFish, changeFish, FishRow, readFish } from '../../shared/fish/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { audit } from '../db/audit';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import type { Scope } from '../scope';
import { fishRows } from './rows';

type Adding = z.output<typeof addFish.body>;

/** One fish of the fishroom, or "not found". */
export async function oneFish(scope: Scope, fishId: string): Promise<FishRow> {
  const [fish] = await fishRows(scope, { ids: [fishId] });
  if (!fish) throw notFound('That fish');
  return fish;
}

/** Adds fish that came from outside, coded or anonymous, and puts them where they live. */
export async function addFounders(scope: Scope, adding: Adding & { entryId?: string }): Promise<FishRow[]> {
  const { db, roomId, now, today } = scope;
  const { ids, codes, strainId, sex, keptAs, bornOn, arrivedOn, lotId, colonyId, tankId, mark, note } = adding;
  if (codes.length !== ids.length)
    throw new Refusal('invalid', 'Give a code, or none, for each fish', { codes: 'One for each fish' });
  if (bornOn && bornOn > today)
    throw new Refusal('invalid', 'That day is still to come', { bornOn: 'Choose today or an earlier day' });
  if (arrivedOn && arrivedOn > today)
    throw new Refusal('invalid', 'That day is still to come', { arrivedOn: 'Choose today or an earlier day' });
  await mustBeOurs(scope, 'strain', strainId, 'strainId', 'Choose a strain');
  if (lotId) await mustBeOurs(scope, 'lot', lotId, 'lotId', 'Choose a lot');
  const entryId = adding.entryId ?? null;
  const since = arrivedOn ?? today;
  for (const [i, id] of ids.entries()) {
    const code = codes[i] ?? null;
    await keepCode(code, `codes.${i}`, () =>
      db
        .insertInto('fish')
        .values({
          roomId,
          id,
          code,
          strainId,
          origin: 'founder',
          lotId,
          batchId: null,
          broodId: null,
          parentageId: null,
          bornOn,
          arrivedOn,
          keptAs,
          note,
          entryId,
          createdAt: now,
        })
        .execute(),
    );
    if (sex !== 'unknown')
      await addFinding(scope, { fishId: id, kind: 'sex', onDay: since, value: sex, how: 'told', entryId });
    if (mark) await addFinding(scope, { fishId: id, kind: 'mark', onDay: since, value: mark, how: 'seen', entryId });
    if (colonyId) await joinColony(scope, { fishId: id, colonyId, onDay: since, entryId });
    if (tankId && !colonyId) {
      await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
      await db
        .insertInto('stay')
        .values({
          roomId,
          id: newId(now),
          tankId,
          fishId: id,
          colonyId: null,
          batchId: null,
          fromDay: since,
          untilDay: null,
          entryId,
          endEntryId: null,
        })
        .execute();
    }
  }
  if (!adding.entryId)
    await audit(scope, {
      action: 'fish added',
      about: 'fish',
      aboutId: ids[0] ?? '',
      change: { count: [0, ids.length] },
    });
  return fishRows(scope, { ids });
}

type NewFinding = {
  fishId: string;
  kind: 'sex' | 'dominance' | 'mark' | 'check' | 'condition';
  onDay: string;
  value: string;
  how: 'seen' | 'vented' | 'dna' | 'told';
  certain?: boolean;
  note?: string | null;
  entryId: string | null;
};

export async function addFinding({ db, roomId, actorId, now }: Scope, finding: NewFinding): Promise<void> {
  const { certain = true, note = null, ...facts } = finding;
  await db
    .insertInto('finding')
    .values({ roomId, id: newId(now), ...facts, certain: certain ? 1 : 0, note, actorId, at: now })
    .execute();
}

/** A fish in a colony lives where the colony lives; a stay of its own ends. */
export async function joinColony(
  scope: Scope,
  { fishId, colonyId, onDay, entryId }: { fishId: string; colonyId: string; onDay: string; entryId: string | null },
): Promise<void> {
  const { db, roomId, now } = scope;
  await mustBeOurs(scope, 'colony', colonyId, 'colonyId', 'Choose a colony');
  await leaveColony(scope, { fishId, onDay, entryId });
  await db
    .updateTable('stay')
    .set({ untilDay: onDay, endEntryId: entryId })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    .where('untilDay', 'is', null)
    .execute();
  await db
    .insertInto('colonyMember')
    .values({ roomId, id: newId(now), colonyId, fishId, fromDay: onDay, untilDay: null, entryId, endEntryId: null })
    .execute();
}

export async function leaveColony(
  { db, roomId }: Scope,
  { fishId, onDay, entryId }: { fishId: string; onDay: string; entryId: string | null },
): Promise<void> {
  await db
    .updateTable('colonyMember')
    .set({ untilDay: onDay, endEntryId: entryId })
    .where('roomId', '=', roomId)
    .where('fishId', '=', fishId)
    .where('untilDay', 'is', null)
    .execute();
}

type Ours = 'strain' | 'lot' | 'tank' | 'colony' | 'fish' | 'batch' | 'brood' | 'hold';

/** An id in a body that is not of this fishroom is a wrong field, told like one that never was. */
export async function mustBeOurs(
  { db, roomId }: Scope,
  table: Ours,
  id: string,
  field: string,
  sentence: string,
): Promise<void> {
  const row = await db
    .selectFrom(table)
    .where('roomId', '=', roomId)
    .where('id', '=', id)
    .select('id')
    .executeTakeFirst();
  if (!row) throw new Refusal('invalid', sentence, { [field]: sentence });
}

/** As `mustBeOurs`; an ancestor that is known from a sheet of another fishroom has no life here to record. */
export async function mustLiveHere(
  scope: Scope,
  { fishId, field, sentence }: { fishId: string; field: string; sentence: string },
): Promise<void> {
  await mustBeOurs(scope, 'fish', fishId, field, sentence);
  if ((await oneFish(scope, fishId)).origin === 'imported')
    throw new Refusal('invalid', 'That fish lives in another fishroom', { [field]: sentence });
}

/** Runs a write that sets a fish's code, and says which code is taken. */
export async function keepCode<T>(code: string | null, field: string, write: () => Promise<T>): Promise<T> {
  try {
    return await write();
  } catch (error) {
    if (isUniqueViolation(error, 'fish.code')) {
      throw new Refusal('conflict', `Another fish has the code ${code}`, { [field]: 'Taken: choose another code' });
    }
    throw error;
  }
}

export async function changeOne(
  scope: Scope,
  fishId: string,
  change: z.output<typeof changeFish.body>,
): Promise<FishRow> {
  const { db, roomId, today } = scope;
  const before = await oneFish(scope, fishId);
  const { version, ...facts } = change;
  if (before.version !== version)
    throw new Refusal('conflict', 'Someone changed this fish meanwhile', {}, { current: before });
  if (facts.bornOn && facts.bornOn > today)
    throw new Refusal('invalid', 'That day is still to come', { bornOn: 'Choose today or an earlier day' });
  await keepCode(facts.code, 'code', () =>
    db
      .updateTable('fish')
      .set({ ...facts, version: version + 1 })
      .where('roomId', '=', roomId)
      .where('id', '=', fishId)
      .execute(),
  );
  await audit(scope, {
    action: 'fish changed',
    about: 'fish',
    aboutId: fishId,
    change: {
      code: [before.code, facts.code],
      keptAs: [before.keptAs, facts.keptAs],
      bornOn: [before.bornOn, facts.bornOn],
    },
  });
  return oneFish(scope, fishId);
}

export async function fishPage(scope: Scope, fishId: string): Promise<z.input<typeof readFish.output>> {
  const { db, roomId } = scope;
  const fish = await oneFish(scope, fishId);
  const more = await db
    .selectFrom('fish')
    .leftJoin('lot', (join) => join.onRef('lot.roomId', '=', 'fish.roomId').onRef('lot.id', '=', 'fish.lotId'))
    .where('fish.roomId', '=', roomId)
    .where('fish.id', '=', fishId)
    .select(['fish.note', 'lot.id as lotId', 'lot.fromWhom', 'lot.receivedOn', 'lot.provenance'])
    .executeTakeFirstOrThrow();
  const findings = await db
    .selectFrom('finding')
    .innerJoin('account', 'account.id', 'finding.actorId')
    .where('finding.roomId', '=', roomId)
    .where('finding.fishId', '=', fishId)
    .select([
      'finding.id',
      'finding.kind',
      'finding.onDay',
      'finding.value',
      'finding.how',
      'finding.certain',
      'finding.note',
      'account.name as by',
    ])
    .orderBy('finding.onDay', 'desc')
    .orderBy('finding.id', 'desc')
    .execute();
  const colonies = await db
    .selectFrom('colonyMember')
    .innerJoin('colony', (join) =>
      join.onRef('colony.roomId', '=', 'colonyMember.roomId').onRef('colony.id', '=', 'colonyMember.colonyId'),
    )
    .where('colonyMember.roomId', '=', roomId)
    .where('colonyMember.fishId', '=', fishId)
    .select(['colony.id', 'colony.code', 'colonyMember.fromDay', 'colonyMember.untilDay'])
    .orderBy('colonyMember.fromDay', 'desc')
    .execute();
  const tanks = await db
    .selectFrom('stay')
    .innerJoin('tank', (join) => join.onRef('tank.roomId', '=', 'stay.roomId').onRef('tank.id', '=', 'stay.tankId'))
    .where('stay.roomId', '=', roomId)
    .where('stay.fishId', '=', fishId)
    .select(['tank.id', 'tank.code', 'stay.fromDay', 'stay.untilDay'])
    .orderBy('stay.fromDay', 'desc')
    .execute();
  const { note, lotId, fromWhom, receivedOn, provenance } = more;
  return {
    fish,
    note,
    colonies,
    tanks,
    lot: lotId && receivedOn && provenance ? { id: lotId, fromWhom, receivedOn, provenance } : null,
    findings: findings.map((finding) => ({ ...finding, certain: finding.certain === 1 })),
  };
}

/** The next free codes after a stem such as a colony's. */
export async function freeCodes({ db, roomId }: Scope, stem: string, count: number): Promise<string[]> {
  const rows = await db
    .selectFrom('fish')
    .where('roomId', '=', roomId)
    .where('code', 'is not', null)
    .select('code')
    .execute();
  const taken = new Set(rows.map(({ code }) => code ?? ''));
  return Array.from({ length: count }, () => {
    const code = proposeFishCode(stem, taken);
    taken.add(code);
    return code;
  });
}
