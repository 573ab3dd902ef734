import { View } from 'react-native';
import { TrendLine } from '@/components/chart/TrendLine';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { GaugeRow } from '@/components/ui/Gauge';
import { Notice } from '@/components/ui/Notice';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { addDays, formatShortDay, fromToday } from '@/shared/days';
import { may } from '@/shared/roles';
import type { SpeciesProfile } from '@/shared/species/profile';
import { fahrenheitOf } from '@/shared/units';
import type { WaterReading } from '@/shared/water/contract';
import { isDemand, waterDemands } from '@/shared/water/demands';
import { waterFindings } from '@/shared/water/waterFindings';
import { gaugesOf, lastOfEach } from './gauges';

type Props = { readings: readonly WaterReading[]; profiles: SpeciesProfile[]; tankId: string };

/** The last value of everything measured, against what the most demanding species asks for. */
export function WaterPart({ readings, profiles, tankId }: Props) {
  const room = useRoom();
  const [latest] = readings;
  if (!latest)
    return (
      <Section title="Water" aside="never tested">
        <Text tone="soft">Nothing measured here yet.</Text>
      </Section>
    );
  const last = lastOfEach(readings);
  const findings = waterFindings(last, profiles, room.units);
  const gauges = gaugesOf(last, profiles, room.units);
  return (
    <Section title="Water" aside={`${fromToday(latest.onDay, room.today)}, ${latest.by}`}>
      <View style={{ gap: space[2], marginBottom: findings.length > 0 ? space[3] : 0 }}>
        {findings.map(({ of, level, says, because }, i) => (
          <Notice key={of} tone={level} title={says} words={because}>
            {i === 0 && level === 'act' && may(room.role, 'entry:record') ? (
              <ButtonRow>
                <Button
                  grow
                  kind="primary"
                  icon="waterChange"
                  label="Water change"
                  href={`/r/${room.id}/record/water-change?tank=${tankId}`}
                />
                <Button
                  grow
                  icon="waterTest"
                  label="Test again"
                  href={`/r/${room.id}/record/water-test?tank=${tankId}`}
                />
              </ButtonRow>
            ) : null}
          </Notice>
        ))}
      </View>
      {gauges.map((gauge) => (
        <GaugeRow
          key={gauge.name}
          {...gauge}
          name={gauge.onDay === latest.onDay ? gauge.name : `${gauge.name}, ${formatShortDay(gauge.onDay)}`}
        />
      ))}
      <Temperatures readings={readings} profiles={profiles} />
    </Section>
  );
}

const TREND_DAYS = 90;

function Temperatures({ readings, profiles }: Omit<Props, 'tankId'>) {
  const { today, units } = useRoom();
  const from = addDays(today, -TREND_DAYS);
  const shown = (celsius: number) => (units.temperature === 'F' ? fahrenheitOf(celsius) : celsius);
  const points = readings
    .flatMap(({ onDay, celsius }) => (celsius === null || onDay < from ? [] : [{ day: onDay, value: shown(celsius) }]))
    .reverse();
  const unit = units.temperature === 'F' ? '°F' : '°C';
  const values = points.map(({ value }) => value);
  if (points.length < 3) return null;
  const demand = waterDemands(profiles).temperatureC;
  const range = isDemand(demand) ? demand : null;
  const [least, most] = [Math.min(...values), Math.max(...values)].map((value) => value.toFixed(1));
  return (
    <View style={{ marginTop: space[4] }}>
      <TrendLine
        title="Temperature"
        points={points}
        unit={unit}
        from={range ? shown(range.low) : null}
        to={range ? shown(range.high) : null}
        today={today}
        sentence={`Temperature over ${TREND_DAYS} days: ${least} to ${most} ${unit}, ${points.length} readings.`}
      />
    </View>
  );
}
