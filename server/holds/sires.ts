import type * as z from 'zod/mini';
import { addDays, daysBetween } from '../../shared/days';
import type { FishRow } from '../../shared/fish/contract';
import type { proposeSires } from '../../shared/holds/contract';
import { notFound, Refusal } from '../../shared/refusal';
import { fishRows } from '../fish';
import type { Scope } from '../scope';
import { oneTank, presenceIn } from '../tanks';
import { strainsHere } from './strainsHere';
import { holdsOfFish, lookedInto } from './tankHolds';

type Proposal = z.input<typeof proposeSires.output>;
type Span = { from: string; until: string };

/** Dominance of the fortnight before the spawn counts as well: a male is courted before he is chosen. */
const FORTNIGHT = 14;

/**
 * Proposed shares: by the days each male was recorded dominant in the spawn interval and the fortnight before it; equal
 * where nothing is recorded. A male that was never dominant keeps a small share: sneaking happens (common practice, no source).
 */
export async function siresFor(scope: Scope, tankId: string, span: Span): Promise<Proposal> {
  const { from, until } = span;
  await oneTank(scope, tankId).catch(() => {
    throw notFound('That tank');
  });
  if (until < from)
    throw new Refusal('invalid', 'The days are the wrong way round', { until: 'Not before the first day' });
  const there = new Set((await presenceIn(scope, tankId, from, until)).map(({ fishId }) => fishId));
  const all = (await fishRows(scope)).filter(({ id, exit }) => there.has(id) && (!exit || exit.onDay >= from));
  const adults = all.filter((fish) => isAdult(fish.bornOn, until));
  const strainId = commonest(all.flatMap((fish) => fish.strainId ?? []));
  const holds = await holdsOfFish(
    scope,
    adults.map(({ id }) => id),
  );
  const strains = await strainsHere(scope, tankId, [...new Set(all.flatMap((fish) => fish.strainId ?? []))], span);
  const openOf = (fishId: string) => {
    const open = holds.find((hold) => hold.holderId === fishId && hold.endedOn === null);
    return { openHoldId: open?.id ?? null, holdingSince: open ? middleOf(open) : null };
  };
  return {
    sires: (await sharesOf(scope, adults, span)).map(({ fish, ...shares }) => ({
      ...shares,
      fishId: fish.id,
      code: fish.code,
      sex: fish.sex === 'male' ? 'male' : 'unknown',
      strainCode: fish.strainCode,
      strainId: fish.strainId,
      foreign: fish.strainId !== strainId,
      ...openOf(fish.id),
    })),
    females: adults
      .filter(({ sex, exit }) => sex !== 'male' && !exit)
      .map((fish) => ({
        fishId: fish.id,
        code: fish.code,
        colonyId: fish.colony?.id ?? null,
        strainId: fish.strainId,
        sex: fish.sex === 'female' ? 'female' : 'unknown',
        ...openOf(fish.id),
        lastEndedOn: holds.findLast((hold) => hold.holderId === fish.id && hold.endedOn !== null)?.endedOn ?? null,
      })),
    paternity: strains.find((strain) => strain.strainId === strainId)?.paternity ?? null,
    strains,
    lookedOn: await lookedInto(scope, tankId),
  };
}

/** The day that the days of a hold count from, as its clock has it. */
const middleOf = ({ spawnEarliest, spawnLatest }: { spawnEarliest: string; spawnLatest: string }): string =>
  addDays(spawnEarliest, Math.round(daysBetween(spawnEarliest, spawnLatest) / 2));

/** What a male that was never seen dominant weighs, in days of dominance. */
const SNEAKER_DAYS = 1;
const ADULT_AFTER_DAYS = 180;

/** A fish without a birthday came as an adult. */
const isAdult = (bornOn: string | null, on: string) => bornOn === null || daysBetween(bornOn, on) >= ADULT_AFTER_DAYS;

async function sharesOf(scope: Scope, adults: FishRow[], { from, until }: Span) {
  const candidates = adults.filter(({ sex }) => sex !== 'female');
  const since = addDays(from, -FORTNIGHT);
  const days = await dominanceDays(
    scope,
    candidates.map(({ id }) => id),
    since,
    until,
  );
  const anyDominance = candidates.some(({ id }) => (days.get(id) ?? 0) > 0);
  const weights = candidates.map(({ id }) => (anyDominance ? (days.get(id) ?? 0) + SNEAKER_DAYS : 1));
  const sum = weights.reduce((total, weight) => total + weight, 0);
  return candidates.map((fish, i) => ({
    fish,
    dominantDays: days.get(fish.id) ?? 0,
    ofDays: daysBetween(since, until) + 1,
    share: (weights[i] ?? 0) / sum,
  }));
}

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

function commonest(ids: string[]): string | null {
  const counts = new Map<string, number>();
  for (const id of ids) counts.set(id, (counts.get(id) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? null;
}
