import { CHECK_WORDS, OUTCOME_WORDS } from '../../shared/holds/entries';
import type { SheetContent } from '../../shared/sheets/content';
import { oneBrood } from '../broods';
import { oneFish } from '../fish';
import { parentagesOf } from '../lineage';
import type { Scope } from '../scope';

type Known = SheetContent['known'];

/** What is known and how: dated facts with who saw them, from the founders to the count. */
export async function factsKnown(scope: Scope, { thing, id }: { thing: 'fish' | 'brood'; id: string }): Promise<Known> {
  const broodId = thing === 'brood' ? id : ((await oneFish(scope, id)).brood?.id ?? null);
  const facts = [
    ...(thing === 'fish' ? await factsOfFish(scope, id) : []),
    ...(broodId ? await factsOfBrood(scope, broodId) : []),
  ];
  return facts.sort((a, b) => ((a.on ?? '9999') < (b.on ?? '9999') ? -1 : 1)).slice(0, 80);
}

async function factsOfFish({ db, roomId }: Scope, fishId: string): Promise<Known> {
  const findings = await db
    .selectFrom('finding')
    .innerJoin('account', 'account.id', 'finding.actorId')
    .where('finding.roomId', '=', roomId)
    .where('finding.fishId', '=', fishId)
    .where('finding.kind', 'in', ['sex', 'mark'])
    .where('finding.value', '<>', '')
    .select(['finding.kind', 'finding.onDay', 'finding.value', 'finding.how', 'account.name'])
    .execute();
  return findings.map(({ kind, onDay, value, how, name }) => ({
    on: onDay,
    what: kind === 'sex' ? (value === 'unknown' ? 'Not sexed.' : `Sexed as ${value}.`) : `Mark: ${value}.`,
    how,
    by: name,
  }));
}

async function factsOfBrood(scope: Scope, broodId: string): Promise<Known> {
  const { db, roomId } = scope;
  const brood = await oneBrood(scope, broodId);
  const row = await db
    .selectFrom('brood')
    .where('roomId', '=', roomId)
    .where('id', '=', broodId)
    .select('parentageId')
    .executeTakeFirstOrThrow();
  const parentage = (await parentagesOf(scope, [row.parentageId])).get(row.parentageId);
  const facts: Known = brood.hold ? await factsOfHold(scope, brood.hold) : [];
  const sires = parentage?.sires.length ?? 0;
  if (sires > 1) {
    facts.push({
      on: brood.spawnLatest,
      what: `${sires} males could be the father; ${parentage?.paternity === 'mixed' ? 'the brood may have several' : 'one of them fathered all'}.`,
      how: parentage?.basis?.slice(0, 200) ?? null,
      by: null,
    });
  }
  if (sires === 0) facts.push({ on: brood.spawnLatest, what: 'The father is not known.', how: null, by: null });
  if (brood.opened !== null && brood.openedOn)
    facts.push({ on: brood.openedOn, what: `${brood.opened} free-swimming counted.`, how: 'counted', by: null });
  return facts;
}

async function factsOfHold({ db, roomId }: Scope, holdId: string): Promise<Known> {
  const hold = await db
    .selectFrom('hold')
    .leftJoin('entry', (join) => join.onRef('entry.roomId', '=', 'hold.roomId').onRef('entry.id', '=', 'hold.entryId'))
    .leftJoin('account', 'account.id', 'entry.actorId')
    .leftJoin('fish', (join) => join.onRef('fish.roomId', '=', 'hold.roomId').onRef('fish.id', '=', 'hold.holderId'))
    .where('hold.roomId', '=', roomId)
    .where('hold.id', '=', holdId)
    .select([
      'hold.spawnSeen',
      'hold.spawnEarliest',
      'hold.spawnLatest',
      'hold.firstSeenOn',
      'hold.outcome',
      'hold.endedOn',
      'fish.code',
      'account.name',
    ])
    .executeTakeFirstOrThrow();
  const checks = await db
    .selectFrom('holdCheck')
    .innerJoin('account', 'account.id', 'holdCheck.actorId')
    .where('holdCheck.roomId', '=', roomId)
    .where('holdCheck.holdId', '=', holdId)
    .select(['holdCheck.onDay', 'holdCheck.seen', 'account.name'])
    .orderBy('holdCheck.onDay')
    .execute();
  const who = hold.code ? `Dam ${hold.code}` : 'A female that could not be told apart';
  const facts: Known = hold.spawnSeen
    ? [
        {
          on: hold.spawnEarliest,
          what: `Spawn seen, ${who.toLowerCase().startsWith('dam') ? who.slice(4) : 'dam not told apart'}.`,
          how: 'seen',
          by: hold.name,
        },
      ]
    : [
        {
          on: hold.firstSeenOn,
          what: `${who} seen holding; spawned between ${hold.spawnEarliest} and ${hold.spawnLatest}.`,
          how: 'seen',
          by: hold.name,
        },
      ];
  facts.push(
    ...checks.map(({ onDay, seen, name }) => ({ on: onDay, what: `${CHECK_WORDS[seen]}.`, how: 'seen', by: name })),
  );
  if (hold.outcome && hold.endedOn)
    facts.push({ on: hold.endedOn, what: `${OUTCOME_WORDS[hold.outcome]}.`, how: 'seen', by: hold.name });
  return facts;
}
