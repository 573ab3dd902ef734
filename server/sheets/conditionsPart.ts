import { addDays, daysBetween } from '../../shared/days';
import { forecast, meanOn } from '../../shared/growth/forecast';
import type { SheetContent } from '../../shared/sheets/content';
import { samplesOf, samplesOfBrood } from '../growth';
import type { Scope } from '../scope';
import { careRows, readingRows } from '../water';
import type { Spawn, Subject } from './subjectPart';

export async function growthOf(
  scope: Scope,
  { thing, id }: Subject,
  spawn: Spawn | null,
): Promise<SheetContent['growth']> {
  const all = thing === 'brood' ? await samplesOfBrood(scope, id) : await samplesOf(scope, { fishIds: [id] });
  const samples = all.map(({ onDay, measure, readings }) => ({
    onDay,
    measure,
    lengthsMm: readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10),
  }));
  const born = spawn ?? {
    spawnEarliest: samples[0]?.onDay ?? scope.today,
    spawnLatest: samples[0]?.onDay ?? scope.today,
  };
  const grown = forecast({ samples, ...born, today: scope.today, prior: null });
  const [first, last] = [grown.points[0], grown.points.at(-1)];
  if (!first || !last) return null;
  return {
    measure: grown.measure,
    samples: grown.points.map(({ onDay, n, meanMm, sdMm }) => ({ on: onDay, n, meanMm, sdMm })),
    fitted:
      grown.kind === 'curve' ? { model: grown.fit.model, points: curvePoints(grown, first.onDay, last.onDay) } : null,
  };
}

const CURVE_POINTS = 24;

function curvePoints(curve: Extract<ReturnType<typeof forecast>, { kind: 'curve' }>, from: string, to: string) {
  const span = daysBetween(from, to);
  const days = [
    ...new Set(
      Array.from({ length: CURVE_POINTS + 1 }, (_, i) => addDays(from, Math.round((i * span) / CURVE_POINTS))),
    ),
  ];
  return days.map((on) => ({ on, meanMm: Math.max(0.1, meanOn(curve, on)) }));
}

const MEASURES = {
  celsius: 'celsius',
  ph: 'ph',
  khCaCo3MgL: 'kh',
  ghCaCo3MgL: 'gh',
  nitrateNMgL: 'nitrate',
  conductivityUs: 'conductivity',
} as const;

/** What the water was, over the readings of the tanks the fish are in now. */
export async function waterOf(scope: Scope, tankIds: string[], since: string): Promise<SheetContent['water']> {
  const readings: Awaited<ReturnType<typeof readingRows>> = [];
  for (const tankId of tankIds) readings.push(...(await readingRows(scope, { tankId, since })));
  const days = readings.map(({ onDay }) => onDay).sort();
  const [from, to] = [days[0], days.at(-1)];
  if (!from || !to) return null;
  const told = (Object.keys(MEASURES) as (keyof typeof MEASURES)[]).flatMap((key) => {
    const values = readings.flatMap((reading) => reading[key] ?? []);
    if (values.length === 0) return [];
    const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
    return [{ what: MEASURES[key], mean, low: Math.min(...values), high: Math.max(...values) }];
  });
  return told.length > 0 ? { from, to, readings: told } : null;
}

export async function runningIn(scope: Scope, tankIds: string[]): Promise<SheetContent['treatments']> {
  const running: Awaited<ReturnType<typeof careRows>> = [];
  for (const tankId of tankIds) running.push(...(await careRows(scope, { tankId })));
  return running
    .filter(
      ({ kind, ended, untilDay }) => kind === 'treatment' && !ended && (untilDay === null || untilDay >= scope.today),
    )
    .map(({ what, why, onDay, untilDay }) => ({ what: what ?? 'Treatment', why, from: onDay, to: untilDay }));
}

export async function photoCount({ db, roomId }: Scope, { thing, id }: Subject): Promise<number> {
  const row = await db
    .selectFrom('photo')
    .where('roomId', '=', roomId)
    .where(thing === 'fish' ? 'fishId' : 'broodId', '=', id)
    .select(({ fn }) => fn.countAll<number>().as('n'))
    .executeTakeFirst();
  return row?.n ?? 0;
}
