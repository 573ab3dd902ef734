import { createHash } from 'node:crypto';
import { type Forecast, forecast, sizeOn } from '../../shared/growth/forecast';
import type { SizeToday } from '../../shared/growth/sizeToday';
import { adultSizePrior } from '../../shared/species/adultSize';
import type { RoomAsked } from '../scope';
import { profileIn } from '../species';
import { samplesOfBrood } from './samples';

type Brood = { id: string; speciesId: string | null; spawnEarliest: string; spawnLatest: string; heads: number };

/** Fitting takes milliseconds and the same samples give the same curve: the last few hundred are kept. */
const KEPT = 400;
const kept = new Map<string, Forecast>();

/** What the samples of a brood say about its growth, as the brood's page says it. */
export async function growthOfBrood(scope: RoomAsked, brood: Brood): Promise<Forecast> {
  const samples = (await samplesOfBrood(scope, brood.id)).map(({ onDay, measure, readings }) => ({
    onDay,
    measure,
    lengthsMm: readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10),
  }));
  const profile = brood.speciesId ? await profileIn(scope, brood.speciesId) : null;
  const measuredAs = (samples.at(-1)?.measure ?? 'total') === 'total' ? 'TL' : 'SL';
  const prior = profile ? adultSizePrior(profile, null, measuredAs) : null;
  const { spawnEarliest, spawnLatest } = brood;
  const facts = {
    samples,
    spawnEarliest,
    spawnLatest,
    today: scope.today,
    prior: prior && { meanMm: prior.meanMm, sdMm: prior.sdMm },
    heads: Math.floor(brood.heads),
  };
  const key = createHash('sha256').update(JSON.stringify(facts)).digest('base64');
  const known = kept.get(key) ?? forecast(facts);
  if (kept.size >= KEPT) kept.delete(kept.keys().next().value ?? '');
  kept.set(key, known);
  return known;
}

/** How long the fish are today: by the curve, or as last measured; null when nobody measured them. */
export function sizeTodayOf(grown: Forecast, today: string): SizeToday | null {
  const size = sizeOn(grown, today);
  const last = grown.points.at(-1);
  if (!size || !last) return null;
  const { meanMm, seMm, cv, cvSd, measuredOn } = size;
  return {
    meanTenthsMm: Math.round(meanMm * 10),
    seMm,
    cv,
    cvSd,
    measure: grown.measure,
    measuredOn,
    lastOn: last.onDay,
    samples: grown.points.length,
    fish: last.n,
  };
}
