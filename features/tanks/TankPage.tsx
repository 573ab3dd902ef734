import { useMutation, useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { may } from '@/shared/roles';
import { profilesIn } from '@/shared/species/profilesIn';
import { TANK_PURPOSE_WORDS } from '@/shared/tanks/contract';
import { formatVolume } from '@/shared/unitWords';
import { CareRows } from './CareRows';
import { FloorPart } from './FloorPart';
import { type TankTold, tankWaterQuery, useChangeTank } from './queries';
import { ResidentRows } from './ResidentRows';
import { StaysPart } from './StaysPart';
import { StockingPart } from './StockingPart';
import type { TankParts } from './TankScreen';
import { WaterPart } from './WaterPart';

/** What its water is like, who lives in it and whether it suits them, what was done; then how heavy it is. */
export function TankPage({ told, photos, history }: TankParts & { told: TankTold }) {
  const room = useRoom();
  const { tank, stays } = told;
  const { data: water } = useQuery(tankWaterQuery(room.id, tank.id));
  const profiles = [...profilesIn(told.species).values()];
  return (
    <Screen
      title={tank.code}
      code
      subtitle={
        <Text tone="soft">
          {[formatVolume(tank.litres, room.units), tank.place, TANK_PURPOSE_WORDS[tank.purpose].toLowerCase()]
            .filter(Boolean)
            .join(' · ')}
        </Text>
      }
      back={`/r/${room.id}/stock/tanks`}
      actions={<TankMenu told={told} />}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        {tank.retiredOn ? (
          <Notice tone="tell" words={`Out of use since ${formatDate(tank.retiredOn)}. Its records stay.`} />
        ) : null}
        {tank.note ? <Text>{tank.note}</Text> : null}
        {may(room.role, 'entry:record') && !tank.retiredOn ? <Actions tankId={tank.id} /> : null}
      </View>
      {water ? <WaterPart readings={water.readings} profiles={profiles} tankId={tank.id} /> : null}
      <ResidentRows residents={tank.residents} />
      <StockingPart told={told} profiles={profiles} />
      {water ? <CareRows care={water.care} /> : null}
      {photos}
      <StaysPart stays={stays} />
      <FloorPart tank={tank} />
      {history}
    </Screen>
  );
}

function Actions({ tankId }: { tankId: string }) {
  const { id: roomId } = useRoom();
  const form = (name: string) => `/r/${roomId}/record/${name}?tank=${tankId}` as const;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      <Button small icon="waterTest" label="Water test" href={form('water-test')} />
      <Button small icon="waterChange" label="Water change" href={form('water-change')} />
      <Button small icon="eye" label="Seen well" href={form('seen-well')} />
      <Button small icon="treatment" label="Treatment" href={form('treatment')} />
    </View>
  );
}

function TankMenu({ told: { tank } }: { told: TankTold }) {
  const room = useRoom();
  const change = useChangeTank(tank.id);
  const retire = useMutation({
    mutationFn: () => {
      const { id: _id, residents: _residents, ...facts } = tank;
      return change.mutateAsync({ ...facts, retiredOn: tank.retiredOn ? null : room.today });
    },
  });
  if (!may(room.role, 'stock:write')) return null;
  const home = `/r/${room.id}` as const;
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center' }}>
      {retire.error ? (
        <Text size="small" tone="trouble">
          {retire.error.message}
        </Text>
      ) : null}
      <Menu
        label="More"
        items={[
          { word: 'Change the tank', href: `${home}/tanks/${tank.id}/change` },
          { word: 'Print its label', href: `${home}/labels?tank=${tank.id}` },
          { word: 'Move fish out of it', href: `${home}/record/move?tank=${tank.id}` },
          { word: 'Incident', href: `${home}/record/incident?tank=${tank.id}` },
          {
            word: tank.retiredOn ? 'Back in use' : 'Out of use from today',
            ...(tank.residents.length > 0 && !tank.retiredOn ? { note: 'Move its fish first' } : {}),
            onPress: () => retire.mutate(),
          },
        ]}
      />
    </View>
  );
}
