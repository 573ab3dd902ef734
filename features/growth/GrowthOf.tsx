import { useState } from 'react';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { GrowthChart, type GrowthSample } from '@/components/chart/GrowthChart';
import { Select } from '@/components/form/Select';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { stageOf } from '@/shared/broods/stage';
import { addDays, type Day, daysBetween } from '@/shared/days';
import type { listSamples } from '@/shared/growth/contract';
import { type CurveForecast, type Forecast, forecast } from '@/shared/growth/forecast';
import { gradingAdvice } from '@/shared/growth/grading';
import type { SamplePoint } from '@/shared/growth/points';
import { type Target, targetOf } from '@/shared/growth/target';
import {
  curveBasis,
  gradingWords,
  MEASURE_WORDS,
  targetBasis,
  targetWords,
  whyNoForecast,
} from '@/shared/growth/words';
import { may } from '@/shared/roles';
import { adultMm, adultSizePrior } from '@/shared/species/adultSize';
import { librarySpecies } from '@/shared/species/library';
import { profileSeen } from '@/shared/species/profilesIn';
import { TENTHS_MM_PER } from '@/shared/units';

type Told = z.output<typeof listSamples.output>;
type Props = { told: Told; broodId: string; heads: number | null };

/** The sizes that fish are sold and planned by, in mm. */
const TARGETS = [30, 40, 50, 60, 70, 80, 100, 120, 150, 200];

/** Points, curve, band and the date by which half of them reach a length. */
export function GrowthOf({ told, broodId, heads }: Props) {
  const room = useRoom();
  const { units, today } = room;
  const profile =
    told.speciesId && librarySpecies(told.speciesId)
      ? profileSeen({ id: told.speciesId, name: '', about: null, overrides: told.overrides })
      : null;
  const [targetMm, setTargetMm] = useState(() => nearest(profile?.saleMm.value ?? 50));
  const [asked, setAsked] = useState(false);
  const measure = told.samples.at(-1)?.measure ?? 'total';
  const prior = profile ? adultSizePrior(profile, null, measure === 'total' ? 'TL' : 'SL') : null;
  const spawn = { spawnEarliest: told.spawnEarliest ?? today, spawnLatest: told.spawnLatest ?? today };
  const grown = forecast({
    samples: told.samples.map(({ onDay, measure: own, readings }) => ({
      onDay,
      measure: own,
      lengthsMm: readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10),
    })),
    ...spawn,
    today,
    prior: prior && { meanMm: prior.meanMm, sdMm: prior.sdMm },
    heads,
  });
  const last = grown.points.at(-1);
  if (!last) return <NoSamples broodId={broodId} />;
  const target = grown.kind === 'curve' ? targetOf(grown, targetMm) : null;
  const perUnit = TENTHS_MM_PER[units.length] / 10;
  const stage = stageOf({
    spawnLatest: spawn.spawnLatest,
    openedOn: spawn.spawnLatest,
    meanMm: last.meanMm,
    adultMm: profile ? adultMm(profile, null) : null,
    today,
  });
  const title =
    grown.kind === 'curve' && target ? targetWords(target, today, units) : (whyNoForecast(grown, today, units) ?? '');
  const note =
    grown.kind === 'curve' && target
      ? targetBasis(grown, target, today, units)
      : `${grown.points.length} ${grown.points.length === 1 ? 'sample' : 'samples'} · ${MEASURE_WORDS[grown.measure]}, ${units.length}`;
  return (
    <View style={{ gap: space[3] }}>
      <GrowthChart
        title={title}
        note={note}
        unit={units.length}
        sentence={`${title}. ${note}.`}
        samples={grown.points.map((point) => sampleOf(point, perUnit))}
        today={today}
        stage={stage}
        {...(grown.kind === 'curve' ? linesOf(grown, grown.points[0]?.onDay ?? today, today, perUnit, target) : {})}
        target={target && targetMark(target, perUnit, units.length)}
      />
      {last.cv === null ? null : (
        <Text size="small" tone="soft">
          {adviceOf(told, last)}
        </Text>
      )}
      {grown.kind === 'curve' ? (
        <>
          <Select
            label="Target"
            value={String(targetMm)}
            onChange={(value) => setTargetMm(Number(value))}
            options={TARGETS.map((mm) => ({
              value: String(mm),
              word: `${Number((mm / perUnit).toFixed(1))} ${units.length}`,
            }))}
          />
          <TextLink label={asked ? 'Hide what it rests on' : 'What this rests on'} onPress={() => setAsked(!asked)} />
          {asked
            ? curveBasis(grown, target).map((sentence) => (
                <Text key={sentence} size="small">
                  {sentence}
                </Text>
              ))
            : null}
        </>
      ) : null}
    </View>
  );
}

function NoSamples({ broodId }: { broodId: string }) {
  const room = useRoom();
  return (
    <View style={{ gap: space[3], alignItems: 'flex-start' }}>
      <Text tone="soft">Not measured yet. A forecast needs three samples.</Text>
      {may(room.role, 'entry:record') ? (
        <Button
          small
          icon="lengthSample"
          label="Length sample"
          href={`/r/${room.id}/record/length-sample?brood=${broodId}`}
        />
      ) : null}
    </View>
  );
}

const nearest = (mm: number): number =>
  TARGETS.reduce((best, one) => (Math.abs(one - mm) < Math.abs(best - mm) ? one : best), TARGETS[0] ?? 50);

const sampleOf = ({ onDay, meanMm, sdMm, n }: SamplePoint, perUnit: number): GrowthSample => ({
  day: onDay,
  mean: meanMm / perUnit,
  low: (meanMm - (sdMm ?? 0)) / perUnit,
  high: (meanMm + (sdMm ?? 0)) / perUnit,
  fish: n,
});

function adviceOf(told: Told, last: SamplePoint): string {
  const lengths = told.samples
    .filter(({ onDay }) => onDay === last.onDay)
    .flatMap(({ readings }) => readings.map(({ lengthTenthsMm }) => lengthTenthsMm / 10));
  return gradingWords(
    gradingAdvice({ n: last.n, cv: last.cv ?? 0, min: Math.min(...lengths), max: Math.max(...lengths) }),
  );
}

const STEPS = 30;
/** How far past today or the target the curve is drawn. */
const BEYOND_DAYS = 21;

/** The fitted curve up to the last sample, and the forecast after it as far as it speaks. */
function linesOf(grown: Forecast & CurveForecast, from: Day, today: Day, perUnit: number, target: Target | null) {
  const wanted =
    [addDays(today, BEYOND_DAYS), target?.half ? addDays(target.half.on, BEYOND_DAYS) : today].sort().at(-1) ?? today;
  const until = [wanted, grown.untilDay].sort()[0] ?? today;
  const point = (day: Day) => {
    const { mean, low, high } = grown.fit.lengthAt(Math.max(0, daysBetween(grown.bornOn, day)));
    return { day, value: mean / perUnit, low: Math.max(0, low / perUnit), high: high / perUnit };
  };
  const days = (a: Day, b: Day) => {
    const span = daysBetween(a, b);
    return [...new Set(Array.from({ length: STEPS + 1 }, (_, i) => addDays(a, Math.round((i * span) / STEPS))))];
  };
  return {
    fit: days(from, grown.lastOn).map(point),
    forecast: until > grown.lastOn ? days(grown.lastOn, until).map(point) : [],
  };
}

function targetMark({ lengthMm, half }: Target, perUnit: number, unit: string) {
  const value = lengthMm / perUnit;
  return {
    value,
    word: `${Number(value.toFixed(1))} ${unit}`,
    day: half?.on ?? null,
    from: half?.from ?? null,
    to: half?.to ?? null,
  };
}
