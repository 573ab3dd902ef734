import { LOSS_CAUSE_WORDS } from '../../shared/broods/headEntry';
import type { About } from '../../shared/record/contract';
import { Refusal } from '../../shared/refusal';
import { isUniqueViolation } from '../db/constraint';
import { newId } from '../db/newId';
import { addFinding, joinColony, keepCode, mustBeOurs, startStay } from '../fish';
import { keepParentage } from '../lineage';
import type { KindRules } from '../record/kinds';
import type { Scope } from '../scope';
import { availableOf } from './available';
import { addStageCount, beginBrood } from './begin';
import { addLine, countOf, linesOf } from './ledger';
import { sharesOf, sourcesOf } from './sources';

type Kinds =
  | 'stageCount'
  | 'headsOpened'
  | 'headCounted'
  | 'headsLost'
  | 'headsCulled'
  | 'batchSplit'
  | 'batchJoined'
  | 'heldBack'
  | 'headsLeft'
  | 'headLineReversed'
  | 'broodFound'
  | 'headsKept';

const heads = (count: number) => `${count} ${count === 1 ? 'head' : 'heads'}`;

/** What Record can say about broods and batches. */
export const broodKinds: Pick<KindRules, Kinds> = {
  stageCount: {
    async store(scope, { broodId, onDay, numbers, note }, { entryId }) {
      await mustBeOurs(scope, 'brood', broodId, 'broodId', 'Choose a brood');
      if (Object.values(numbers).every((number) => number === null))
        throw new Refusal('invalid', 'Type at least one count', { numbers: 'Type at least one count' });
      await addStageCount(scope, { broodId, onDay, numbers, note, entryId });
      return { onDay, about: [{ thing: 'brood', id: broodId }] };
    },
    say: ({ numbers: { total, eggs, wrigglers, freeSwimming, dead, deformed } }) =>
      `Counted: ${[
        [total, 'in all'],
        [eggs, 'eggs'],
        [wrigglers, 'wrigglers'],
        [freeSwimming, 'free-swimming'],
        [dead, 'dead'],
        [deformed, 'deformed'],
      ]
        .flatMap(([count, word]) => (count === null ? [] : [`${count} ${word}`]))
        .join(', ')}`,
  },
  headsOpened: {
    async store(scope, { batchId, onDay, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      const { openedOn } = await countOf(scope, batchId);
      if (openedOn)
        throw new Refusal('conflict', 'The head count is open already', { heads: 'Record a head count instead' });
      await addLine(scope, { batchId, kind: 'opening', onDay, heads: count, note, entryId });
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: ({ heads: count }) => `Free-swimming: ${heads(count)}`,
  },
  headCounted: {
    async store(scope, { batchId, onDay, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      // The first count of free-swimming fry opens the ledger: nothing is corrected by it.
      const { openedOn } = await countOf(scope, batchId);
      await addLine(scope, { batchId, kind: openedOn ? 'recount' : 'opening', onDay, heads: count, note, entryId });
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: ({ heads: count }) => `Head count: ${count}`,
  },
  headsLost: {
    async store(scope, { batchId, onDay, heads: count, cause, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      await addLine(scope, { batchId, kind: 'loss', onDay, heads: count, cause, note, entryId });
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: ({ heads: count, cause }) => `Loss: ${heads(count)}, ${LOSS_CAUSE_WORDS[cause].toLowerCase()}`,
  },
  headsCulled: {
    async store(scope, { batchId, onDay, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      await addLine(scope, { batchId, kind: 'cull', onDay, heads: count, note, entryId });
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: ({ heads: count }) => `Culled: ${heads(count)}`,
  },
  batchSplit: {
    async store(scope, { batchId, newBatchId, toTankId, onDay, heads: count, note }, { entryId }) {
      const { db, roomId, now } = scope;
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      await mustBeOurs(scope, 'tank', toTankId, 'toTankId', 'Choose a tank');
      await db
        .insertInto('batch')
        .values({ roomId, id: newBatchId, startedOn: onDay, note: null, entryId, createdAt: now })
        .execute();
      const pairId = newId(now);
      await addLine(scope, { batchId, kind: 'movedOut', onDay, heads: count, pairId, note, entryId });
      await addLine(scope, { batchId: newBatchId, kind: 'movedIn', onDay, heads: count, pairId, note, entryId });
      const sources = (await sourcesOf(scope, [batchId], onDay)).get(batchId) ?? [];
      await putSources(scope, newBatchId, onDay, entryId, weighted(sources, count));
      await startStay(scope, { column: 'batchId', id: newBatchId, tankId: toTankId, onDay, entryId });
      return {
        onDay,
        about: [
          ...(await aboutBatch(scope, batchId)),
          { thing: 'batch', id: newBatchId },
          { thing: 'tank', id: toTankId },
        ],
        made: { batch: newBatchId },
      };
    },
    say: ({ heads: count, toTankId }, codes) => `${heads(count)} moved to ${codes(toTankId)}`,
  },
  batchJoined: {
    async store(scope, { batchId, intoBatchId, onDay, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      await mustBeOurs(scope, 'batch', intoBatchId, 'intoBatchId', 'Choose the batch they join');
      if (batchId === intoBatchId)
        throw new Refusal('invalid', 'Choose two batches', { intoBatchId: 'Choose another batch' });
      const lists = await sourcesOf(scope, [batchId, intoBatchId], onDay);
      const before = (await countOf(scope, intoBatchId)).balance;
      const pairId = newId(scope.now);
      await addLine(scope, { batchId, kind: 'movedOut', onDay, heads: count, pairId, note, entryId });
      await addLine(scope, { batchId: intoBatchId, kind: 'movedIn', onDay, heads: count, pairId, note, entryId });
      const joined = [...weighted(lists.get(intoBatchId) ?? [], before), ...weighted(lists.get(batchId) ?? [], count)];
      await putSources(scope, intoBatchId, onDay, entryId, joined);
      return { onDay, about: [...(await aboutBatch(scope, batchId)), ...(await aboutBatch(scope, intoBatchId))] };
    },
    say: ({ heads: count }) => `${heads(count)} joined another batch`,
  },
  heldBack: {
    async store(scope, content, { entryId }) {
      const { batchId, onDay, fish, keptAs, tankId, colonyId, note } = content;
      const { db, roomId, now } = scope;
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      await addLine(scope, { batchId, kind: 'heldBack', onDay, heads: fish.length, note, entryId });
      const sources = (await sourcesOf(scope, [batchId], onDay)).get(batchId) ?? [];
      const only = sources.length === 1 ? sources[0] : undefined;
      const strainIds = [...new Set(sources.map(({ strainId }) => strainId))];
      for (const [i, one] of fish.entries()) {
        await keepCode(one.code, `fish.${i}.code`, () =>
          db
            .insertInto('fish')
            .values({
              roomId,
              id: one.id,
              code: one.code,
              strainId: strainIds.length === 1 ? (strainIds[0] ?? null) : null,
              origin: 'bred',
              lotId: null,
              batchId,
              broodId: only?.broodId ?? null,
              parentageId: null,
              bornOn: only?.spawnLatest ?? null,
              arrivedOn: null,
              keptAs,
              note: null,
              entryId,
              createdAt: now,
            })
            .execute(),
        );
        if (one.sex !== 'unknown')
          await addFinding(scope, { fishId: one.id, kind: 'sex', onDay, value: one.sex, how: 'seen', entryId });
        await settle(scope, { fishId: one.id, batchId, tankId, colonyId, onDay, entryId });
      }
      const about: About[] = fish.map(({ id }) => ({ thing: 'fish', id }));
      return { onDay, about: [...(await aboutBatch(scope, batchId)), ...about] };
    },
    say: ({ fish }, codes) => `Held back: ${fish.map(({ id, code }) => code ?? codes(id)).join(', ')}`,
  },
  headsLeft: {
    needs: 'hand:over',
    async store(scope, { batchId, onDay, how, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      for (const { broodId } of (await sourcesOf(scope, [batchId])).get(batchId) ?? []) {
        const { available, reserved } = await availableOf(scope, broodId);
        if (available < count && reserved > 0) {
          throw new Refusal('conflict', `Only ${Math.max(0, available)} are available: ${reserved} are reserved`, {
            heads: `At most ${Math.max(0, available)}`,
          });
        }
      }
      await addLine(scope, { batchId, kind: how, onDay, heads: count, note, entryId });
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: ({ how, heads: count }) => `${count} ${how}`,
  },
  headLineReversed: {
    needs: 'entry:correct',
    async store(scope, { batchId, lineId, onDay, note }, { entryId }) {
      await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      const line = (await linesOf(scope, [batchId])).find(({ id }) => id === lineId);
      if (!line) throw new Refusal('invalid', 'That line was not found', { lineId: 'Choose a line of this batch' });
      if (line.reverses)
        throw new Refusal('invalid', 'That line is a correction itself', {
          lineId: 'Choose a line that is no correction',
        });
      const { kind, heads: count, cause } = line;
      try {
        await addLine(scope, {
          batchId,
          kind,
          onDay,
          heads: count,
          ...(cause ? { cause } : {}),
          reverses: lineId,
          note,
          entryId,
        });
      } catch (error) {
        if (isUniqueViolation(error, 'headEntry.reverses'))
          throw new Refusal('conflict', 'That line is corrected already');
        throw error;
      }
      return { onDay, about: await aboutBatch(scope, batchId) };
    },
    say: () => 'Ledger line corrected',
  },
  broodFound: {
    async store(scope, content, { entryId }) {
      const { kind: _kind, parentage, strainId, ...brood } = content;
      if (strainId) await mustBeOurs(scope, 'strain', strainId, 'strainId', 'Choose a strain');
      const parentageId = await keepParentage(scope, parentage, { entryId });
      const about = await beginBrood(scope, {
        ...brood,
        holdId: null,
        strainId,
        possibleHybrid: strainId === null,
        parentageId,
        entryId,
      });
      return { onDay: content.onDay, about, made: { brood: content.broodId, batch: content.batchId } };
    },
    say: ({ code, start }) => `Brood ${code}, ${start}`,
  },
  headsKept: {
    async store(scope, { reservationId, broodId, batchId, onDay, heads: count, note }, { entryId }) {
      await mustBeOurs(scope, 'brood', broodId, 'broodId', 'Choose a brood');
      if (batchId) await mustBeOurs(scope, 'batch', batchId, 'batchId', 'Choose a batch');
      const { available } = await availableOf(scope, broodId);
      if (available < count)
        throw new Refusal('conflict', `Only ${Math.max(0, available)} are available`, {
          heads: `At most ${Math.max(0, available)}`,
        });
      const { db, roomId, now } = scope;
      await db
        .insertInto('reservation')
        .values({
          roomId,
          id: reservationId,
          broodId,
          batchId,
          kind: 'keep',
          heads: count,
          purchaseLineId: null,
          until: null,
          freedAt: null,
          note,
          createdAt: now,
          entryId,
        })
        .execute();
      return { onDay, about: [{ thing: 'brood', id: broodId }] };
    },
    say: ({ heads: count }) => `${count} meant to stay`,
  },
};

/** The batch, its tank, and its broods: an entry about a batch shows in the history of each. */
async function aboutBatch(scope: Scope, batchId: string): Promise<About[]> {
  const { db, roomId } = scope;
  const stay = await db
    .selectFrom('stay')
    .where('roomId', '=', roomId)
    .where('batchId', '=', batchId)
    .where('untilDay', 'is', null)
    .select('tankId')
    .executeTakeFirst();
  const sources = (await sourcesOf(scope, [batchId])).get(batchId) ?? [];
  return [
    { thing: 'batch', id: batchId },
    ...sources.map(({ broodId }): About => ({ thing: 'brood', id: broodId })),
    ...(stay ? [{ thing: 'tank', id: stay.tankId } satisfies About] : []),
  ];
}

type Weight = { broodId: string; heads: number };

/** A list of sources scaled to so many heads. */
const weighted = (sources: Parameters<typeof sharesOf>[0], total: number): Weight[] => {
  const shares = sharesOf(sources);
  // Hundredths of a head keep the shares of a small batch exact enough; only their ratio is ever used.
  return sources.map(({ broodId }, i) => ({ broodId, heads: Math.round((shares[i] ?? 0) * total * 100) }));
};

async function putSources(
  { db, roomId, now }: Scope,
  batchId: string,
  fromDay: string,
  entryId: string,
  weights: Weight[],
): Promise<void> {
  const sums = new Map<string, number>();
  for (const { broodId, heads: count } of weights) sums.set(broodId, (sums.get(broodId) ?? 0) + count);
  for (const [broodId, count] of sums) {
    await db
      .insertInto('batchSource')
      .values({ roomId, id: newId(now), batchId, broodId, heads: count, fromDay, entryId })
      .execute();
  }
}

/** A fish taken out goes to a colony or a tank; without either it stays in the batch's tank, as a fish of its own. */
async function settle(
  scope: Scope,
  {
    fishId,
    batchId,
    tankId,
    colonyId,
    onDay,
    entryId,
  }: {
    fishId: string;
    batchId: string;
    tankId: string | null;
    colonyId: string | null;
    onDay: string;
    entryId: string;
  },
): Promise<void> {
  if (colonyId) return joinColony(scope, { fishId, colonyId, onDay, entryId });
  if (tankId) await mustBeOurs(scope, 'tank', tankId, 'tankId', 'Choose a tank');
  const { db, roomId } = scope;
  const stay = tankId
    ? { tankId }
    : await db
        .selectFrom('stay')
        .where('roomId', '=', roomId)
        .where('batchId', '=', batchId)
        .where('untilDay', 'is', null)
        .select('tankId')
        .executeTakeFirst();
  if (stay) await startStay(scope, { column: 'fishId', id: fishId, tankId: stay.tankId, onDay, entryId });
}
