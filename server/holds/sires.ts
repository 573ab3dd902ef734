import type * as z from 'zod/mini';
import { addDays, daysBetween } from '../../shared/days';
import type { proposeSires } from '../../shared/holds/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { librarySpecies, profileOf } from '../../shared/species/library';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { oneTank, presenceIn } from '../tanks';

type Proposal = z.input<typeof proposeSires.output>;

/** Dominance of the fortnight before the spawn counts as well: a male is courted before he is chosen. */
const FORTNIGHT = 14;

/**
 * Proposed shares: by the days each male was recorded dominant in the spawn interval and the fortnight before it; equal
 * where nothing is recorded. A male that was never dominant keeps a small share: sneaking happens (common practice, no source).
 */
export async function siresFor(
  scope: Scope,
  tankId: string,
  { from, until }: { from: string; until: string },
): Promise<Proposal> {
  await oneTank(scope, tankId).catch(() => {
    throw notFound('That tank');
  });
  if (until < from)
    throw new Refusal('invalid', 'The days are the wrong way round', { until: 'Not before the first day' });
  const there = new Set((await presenceIn(scope, tankId, from, until)).map(({ fishId }) => fishId));
  const all = (await fishRows(scope)).filter(({ id, exit }) => there.has(id) && (!exit || exit.onDay >= from));
  const adults = all.filter((fish) => isAdult(fish.bornOn, until));
  const strainId = commonest(all.flatMap((fish) => fish.strainId ?? []));
  const dominantDays = await dominanceDays(
    scope,
    adults.map(({ id }) => id),
    addDays(from, -FORTNIGHT),
    until,
  );
  const candidates = adults.filter(({ sex }) => sex !== 'female');
  const ofDays = daysBetween(addDays(from, -FORTNIGHT), until) + 1;
  const anyDominance = candidates.some(({ id }) => (dominantDays.get(id) ?? 0) > 0);
  const weights = candidates.map(({ id }) => (anyDominance ? (dominantDays.get(id) ?? 0) + SNEAKER_DAYS : 1));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  const speciesId = all.find((fish) => fish.strainId === strainId)?.speciesId ?? null;
  return {
    sires: candidates.map((fish, i) => ({
      fishId: fish.id,
      code: fish.code,
      sex: fish.sex === 'male' ? 'male' : 'unknown',
      strainCode: fish.strainCode,
      strainId: fish.strainId,
      foreign: fish.strainId !== strainId,
      dominantDays: dominantDays.get(fish.id) ?? 0,
      ofDays,
      share: (weights[i] ?? 0) / sum,
    })),
    paternity: speciesId && librarySpecies(speciesId) ? profileOf(speciesId).paternity.value.habit : null,
    females: await femalesOf(scope, adults),
  };
}

/** What a male that was never seen dominant weighs, in days of dominance. */
const SNEAKER_DAYS = 1;
const ADULT_AFTER_DAYS = 180;

/** A fish without a birthday came as an adult. */
const isAdult = (bornOn: string | null, on: string) => bornOn === null || daysBetween(bornOn, on) >= ADULT_AFTER_DAYS;

async function dominanceDays(
  { db, roomId }: Scope,
  fishIds: string[],
  from: string,
  until: string,
): Promise<Map<string, number>> {
  const days = new Map<string, number>();
  if (fishIds.length === 0) return days;
  const rows = await db
    .selectFrom('finding')
    .where('roomId', '=', roomId)
    .where('kind', '=', 'dominance')
    .where('fishId', 'in', fishIds)
    .where('onDay', '<=', until)
    .select(['fishId', 'onDay', 'value'])
    .orderBy('onDay')
    .orderBy('id')
    .execute();
  for (const fishId of fishIds) {
    const own = rows.filter((row) => row.fishId === fishId);
    let total = 0;
    own.forEach(({ onDay, value }, i) => {
      if (value !== 'dominant') return;
      const start = onDay > from ? onDay : from;
      const end = own[i + 1]?.onDay ?? addDays(until, 1);
      total += Math.max(0, daysBetween(start, end));
    });
    days.set(fishId, total);
  }
  return days;
}

async function femalesOf(
  { db, roomId }: Scope,
  adults: Awaited<ReturnType<typeof fishRows>>,
): Promise<Proposal['females']> {
  const open = await db
    .selectFrom('hold')
    .where('roomId', '=', roomId)
    .where('endedOn', 'is', null)
    .where('holderId', 'is not', null)
    .select(['id', 'holderId', 'spawnLatest'])
    .execute();
  return adults
    .filter(({ sex, exit }) => sex !== 'male' && !exit)
    .map((fish) => {
      const hold = open.find(({ holderId }) => holderId === fish.id);
      return {
        fishId: fish.id,
        code: fish.code,
        colonyId: fish.colony?.id ?? null,
        sex: fish.sex === 'female' ? 'female' : 'unknown',
        openHoldId: hold?.id ?? null,
        holdingSince: hold?.spawnLatest ?? null,
      };
    });
}

function commonest(ids: string[]): string | null {
  const counts = new Map<string, number>();
  for (const id of ids) counts.set(id, (counts.get(id) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
}
