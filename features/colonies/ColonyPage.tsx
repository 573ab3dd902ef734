import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { HoldTimeline } from '@/components/chart/HoldTimeline';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { addDays, formatDate } from '@/shared/days';
import { may } from '@/shared/roles';
import { BroodsOf } from './BroodsOf';
import { ColonyMenu } from './ColonyMenu';
import type { ColonyParts } from './ColonyScreen';
import { FormerRows } from './FormerRows';
import { breedingFigures, timelineRows } from './holdFigures';
import { MemberRows } from './MemberRows';
import { allBroodsQuery, type ColonyTold, colonyHoldsQuery } from './queries';

const SHOWN_DAYS = 365;

/** Its males and females, who of them holds, how their holds went over a year, and its broods. */
export function ColonyPage({ told, photos, history }: ColonyParts & { told: ColonyTold }) {
  const room = useRoom();
  const { colony, members, former } = told;
  const { data: holds = [] } = useQuery(colonyHoldsQuery(room.id, colony.id));
  const { data: all = [] } = useQuery(allBroodsQuery(room.id));
  const broods = all.filter(({ hold }) => holds.some(({ id }) => id === hold));
  const { fryABrood, broodsAYear } = breedingFigures(broods, colony.startedOn, room.today);
  const holders = members.filter(({ id, sex }) => sex === 'female' || holds.some(({ holder }) => holder?.id === id));
  const from = addDays(room.today, -SHOWN_DAYS);
  const recent = holds.filter(
    ({ endedOn, spawnLatest }) => (endedOn ?? room.today) >= from && spawnLatest <= room.today,
  );
  return (
    <Screen
      title={colony.code}
      code
      subtitle={
        <Text tone="soft">
          <Text italic>{colony.displayName}</Text>
          {colony.locality ? ` ${colony.locality}` : ''}
          {` · since ${formatDate(colony.startedOn)}`}
        </Text>
      }
      back={`/r/${room.id}/stock/colonies`}
      actions={<ColonyMenu told={told} />}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        {colony.endedOn ? <Notice words={`Given up on ${formatDate(colony.endedOn)}. Its records stay.`} /> : null}
        <FiguresStrip
          figures={[
            {
              figure: `${colony.males}·${colony.females}`,
              label: colony.unsexed > 0 ? `m, f, ${colony.unsexed} not sexed` : 'males, females',
            },
            { figure: String(colony.openHolds), label: 'holding' },
            { figure: fryABrood === null ? '–' : String(fryABrood), label: 'fry a brood' },
            { figure: broodsAYear === null ? '–' : String(broodsAYear), label: 'broods a yr' },
          ]}
        />
        {colony.note ? <Text>{colony.note}</Text> : null}
        {may(room.role, 'entry:record') && !colony.endedOn ? <Actions told={told} /> : null}
      </View>
      <Section
        title="Members"
        aside={
          colony.tank ? (
            <TextLink label={`In ${colony.tank.code}`} href={`/r/${room.id}/tanks/${colony.tank.id}`} />
          ) : (
            'in no tank'
          )
        }
      >
        <MemberRows members={members} holds={holds} />
      </Section>
      {recent.length > 0 ? (
        <Section title="Holds by female" aside="last 12 months">
          <HoldTimeline
            rows={timelineRows(recent, holders, room.today)}
            from={from}
            today={room.today}
            sentence={`${recent.length} holds in the last 12 months, ${recent.filter(({ outcome }) => outcome === 'swallowed').length} swallowed.`}
          />
          <Text size="small" tone="soft">
            Grey: swallowed or lost.
          </Text>
        </Section>
      ) : null}
      <BroodsOf broods={broods} />
      {photos}
      <FormerRows former={former} />
      {history}
    </Screen>
  );
}

function Actions({ told: { colony } }: { told: ColonyTold }) {
  const { id: roomId } = useRoom();
  const form = (name: string) =>
    `/r/${roomId}/record/${name}?colony=${colony.id}${colony.tank ? `&tank=${colony.tank.id}` : ''}` as const;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      <Button small icon="holding" label="Holding seen" href={form('holding')} />
      <Button small icon="spawn" label="Spawn seen" href={form('spawn')} />
      <Button small icon="dominant" label="Dominant" href={form('dominant')} />
      <Button small icon="photo" label="Photo" href={form('photo')} />
    </View>
  );
}
