import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { ageWords, daysBetween, formatDate } from '@/shared/days';
import { EXIT_WORDS } from '@/shared/fish/contract';
import { may } from '@/shared/roles';
import { TENTHS_MM_PER } from '@/shared/units';
import { FindingRows } from './FindingRows';
import { FishFacts } from './FishFacts';
import type { FishParts } from './FishScreen';
import { HoldsOf } from './HoldsOf';
import { type FishTold, holdsOfQuery } from './queries';

const SEX_WORDS = { male: 'Male', female: 'Female', unknown: 'Not sexed' };

/** Who it is, how that is known, its holds and its parents. */
export function FishPage({ told, photos, history, inbreeding }: FishParts & { told: FishTold }) {
  const room = useRoom();
  const { fish, note, findings } = told;
  const { data: holds = [] } = useQuery(holdsOfQuery(room.id, fish.id));
  const { exit, sex, lastLengthTenthsMm: length, bornOn } = fish;
  const brought = holds.filter(({ brood }) => brood !== null).length;
  const perUnit = TENTHS_MM_PER[room.units.length];
  return (
    <Screen
      title={fish.code ?? 'Not told apart'}
      code={fish.code !== null}
      sex={sex}
      subtitle={
        <Text tone="soft">
          {fish.displayName ? <Text italic>{fish.displayName}</Text> : 'No strain'}
          {fish.tank ? ` · ${fish.tank.code}` : ''}
        </Text>
      }
      back={`/r/${room.id}/stock/fish`}
      actions={<FishMenu told={told} />}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        {exit ? (
          <Notice
            words={`${EXIT_WORDS[exit.kind]} on ${formatDate(exit.onDay)}${exit.cause ? `: ${exit.cause}` : ''}. It stays in the lineage.`}
          />
        ) : null}
        <FiguresStrip
          figures={[
            length
              ? { figure: (length / perUnit).toFixed(1), label: room.units.length }
              : { figure: '–', label: 'not measured' },
            { figure: String(holds.length), label: holds.length === 1 ? 'hold' : 'holds' },
            { figure: String(brought), label: brought === 1 ? 'brood' : 'broods' },
          ]}
        />
        <Text>
          <Text strong>{`${SEX_WORDS[sex]}${fish.sexCertain || sex === 'unknown' ? '' : ', not certain'}`}</Text>
          {fish.dominant ? ', dominant' : ''}
          {bornOn ? `, ${ageWords(daysBetween(bornOn, room.today))} old` : ''}
          {fish.mark ? `, known by ${fish.mark}` : ''}
        </Text>
        {note ? <Text>{note}</Text> : null}
        {may(room.role, 'entry:record') && !exit ? <Actions told={told} /> : null}
      </View>
      <FishFacts told={told} />
      {inbreeding}
      <HoldsOf holds={holds} />
      <FindingRows findings={findings} />
      {photos}
      {history}
    </Screen>
  );
}

function Actions({ told: { fish } }: { told: FishTold }) {
  const { id: roomId } = useRoom();
  const form = (name: string) =>
    `/r/${roomId}/record/${name}?fish=${fish.id}${fish.tank ? `&tank=${fish.tank.id}` : ''}` as const;
  return (
    <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
      <Button small icon="lengthSample" label="Length" href={form('length-sample')} />
      <Button small icon="photo" label="Photo" href={form('photo')} />
      <Button small icon="lineage" label="Sex or mark" href={form('finding')} />
      {fish.sex === 'male' ? <Button small icon="dominant" label="Dominant" href={form('dominant')} /> : null}
    </View>
  );
}

function FishMenu({ told: { fish } }: { told: FishTold }) {
  const room = useRoom();
  const home = `/r/${room.id}` as const;
  const at = `fish=${fish.id}${fish.tank ? `&tank=${fish.tank.id}` : ''}`;
  return (
    <Menu
      label="More"
      items={[
        { word: 'Lineage', href: `${home}/lineage/${fish.id}` },
        ...(may(room.role, 'parentage:write')
          ? [{ word: 'Set parents', href: `${home}/lineage/parents/${fish.id}` as const }]
          : []),
        { word: 'Lineage sheet', href: `${home}/sheets/new?fish=${fish.id}` },
        ...(may(room.role, 'entry:record') && !fish.exit
          ? [
              { word: 'Move', href: `${home}/record/move?${at}` as const },
              { word: 'Died, given away, sold', href: `${home}/record/fish-left?${at}` as const },
            ]
          : []),
        ...(may(room.role, 'parentage:write')
          ? [{ word: 'Same fish as another', href: `${home}/fish/${fish.id}/merge` as const }]
          : []),
        ...(may(room.role, 'stock:write') ? [{ word: 'Change', href: `${home}/fish/${fish.id}/change` as const }] : []),
      ]}
    />
  );
}
