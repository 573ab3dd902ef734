import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { StageGlyph } from '@/components/ui/StageGlyph';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { broodStage } from '@/shared/broods/broodStage';
import { ageOn, survivalWords, wilson } from '@/shared/broods/survival';
import { formatShortDay } from '@/shared/days';
import { may } from '@/shared/roles';
import { TENTHS_MM_PER } from '@/shared/units';
import { BatchRows } from './BatchRows';
import type { BroodParts } from './BroodScreen';
import { HeadsPart } from './HeadsPart';
import { ParentRows } from './ParentRows';
import type { BroodTold } from './queries';
import { StageCounts } from './StageCounts';

/** How many, how large, how old; then the growth, the ledger, the parents, and what was recorded. */
export function BroodPage({ told, growth, photos, history, inbreeding }: BroodParts & { told: BroodTold }) {
  const room = useRoom();
  const { brood, parentage, batches, stageCounts, holdbacks, reservations, note } = told;
  const stage = broodStage(brood, room.today);
  return (
    <Screen
      title={brood.code}
      code
      subtitle={<Subtitle told={told} />}
      back={`/r/${room.id}/stock/broods`}
      actions={<BroodMenu told={told} />}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        {brood.possibleHybrid ? (
          <Notice
            tone="look"
            words="A possible hybrid: another strain could be the father, so no strain is claimed until it is settled."
          />
        ) : null}
        <StageGlyph stage={stage} word width={34} strong />
        <FiguresStrip figures={figuresOf(told, room.today, room.units.length)} />
        <SurvivalLine told={told} />
        {note ? <Text>{note}</Text> : null}
        {may(room.role, 'entry:record') ? <Actions told={told} /> : null}
      </View>
      {growth}
      <HeadsPart brood={brood} batches={batches} reservations={reservations} holdbacks={holdbacks} />
      <StageCounts counts={stageCounts} />
      <BatchRows batches={batches} />
      <ParentRows parentage={parentage} hold={brood.hold} />
      {inbreeding}
      {photos}
      {history}
    </Screen>
  );
}

function Subtitle({ told: { brood } }: { told: BroodTold }) {
  return (
    <Text tone="soft">
      {brood.displayName ? <Text italic>{brood.displayName}</Text> : 'No strain claimed'}
      {brood.locality ? ` ${brood.locality}` : ''}
      {brood.tanks.map((tank) => (
        <Text key={tank.id}>
          {' · '}
          <Code>{tank.code}</Code>
        </Text>
      ))}
    </Text>
  );
}

function figuresOf({ brood }: BroodTold, today: string, unit: 'cm' | 'in') {
  const { heads, headsAreShare, opened, lost, lastSample, spawnEarliest, spawnLatest } = brood;
  const survival = opened ? wilson(Math.max(0, opened - lost), opened) : null;
  const length = lastSample ? (lastSample.meanTenthsMm / TENTHS_MM_PER[unit]).toFixed(unit === 'cm' ? 1 : 2) : '–';
  return [
    {
      figure: opened === null ? '–' : `${headsAreShare ? '~' : ''}${Math.round(heads)}`,
      label: opened === null ? 'not counted yet' : `heads of ${opened}`,
    },
    survival
      ? { figure: String(Math.round(survival.share * 100)), after: '%', label: 'survival' }
      : { figure: '–', label: 'survival' },
    { figure: length, label: lastSample ? `${unit}, ${formatShortDay(lastSample.onDay)}` : 'not measured' },
    { figure: String(ageOn(spawnEarliest, spawnLatest, today)), label: 'days old' },
  ];
}

/** The interval, since a share of few fish is not as sure as it looks. */
function SurvivalLine({ told: { brood } }: { told: BroodTold }) {
  const interval = brood.opened ? wilson(Math.max(0, brood.opened - brood.lost), brood.opened) : null;
  if (!interval) return null;
  return (
    <Text size="small" tone="soft">
      {`Survival ${survivalWords(interval)}: ${brood.lost} of ${brood.opened} lost. What was sold, moved or held back has not died.`}
    </Text>
  );
}

function Actions({ told }: { told: BroodTold }) {
  const { id: roomId } = useRoom();
  const { brood } = told;
  const form = (name: string) => `/r/${roomId}/record/${name}?brood=${brood.id}` as const;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      <Button
        small
        icon="headCount"
        label={brood.opened === null ? 'Free-swimming' : 'Head count'}
        href={form('head-count')}
      />
      <Button small icon="lengthSample" label="Length sample" href={form('length-sample')} />
      <Button small icon="photo" label="Photo" href={form('photo')} />
      <Button small icon="loss" label="Loss" href={form('loss')} />
    </View>
  );
}

function BroodMenu({ told: { brood } }: { told: BroodTold }) {
  const room = useRoom();
  const form = (name: string) => `/r/${room.id}/record/${name}?brood=${brood.id}` as const;
  const items = [
    ...(may(room.role, 'entry:record')
      ? [
          { word: 'Hold back', href: form('hold-back') },
          { word: 'Count eggs and wrigglers', href: form('stage-count') },
          { word: 'Move part to another tank', href: form('split') },
          { word: 'Join another batch', href: form('join') },
        ]
      : []),
    ...(may(room.role, 'hand:over') ? [{ word: 'Left: given, traded, sold', href: form('left') }] : []),
    { word: 'Lineage', href: `/r/${room.id}/lineage/${brood.id}` as const },
    ...(may(room.role, 'parentage:write')
      ? [{ word: 'Set parents', href: `/r/${room.id}/lineage/parents/${brood.id}` as const }]
      : []),
  ];
  return <Menu label="More" items={items} />;
}
