import { useMutation } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { FiguresStrip } from '@/components/ui/FiguresStrip';
import { KeyValues } from '@/components/ui/KeyValues';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import { may } from '@/shared/roles';
import { SOURCE_WORDS } from '@/shared/sheets/sourceCodes';
import { NAMING_WORDS, PROVENANCE_WORDS } from '@/shared/strains/contract';
import { LotRows } from './LotRows';
import { type StrainTold, useChangeStrain } from './queries';
import type { StrainParts } from './StrainScreen';

const LOCALITY_WORDS = { known: null, trade: 'a trade name', unknown: 'not known for sure' };

/** Its names, where its founders came from, the lots that came in, and its colonies and broods. */
export function StrainPage({ told, stock, history }: StrainParts & { told: StrainTold }) {
  const room = useRoom();
  const { strain, lots } = told;
  const source = Object.entries(SOURCE_WORDS).find(([code]) => code === strain.citesSource)?.[1];
  const pairs = [
    { key: 'Founders', value: PROVENANCE_WORDS[strain.provenance] },
    { key: 'From', value: strain.fromWhom },
    { key: 'Since', value: strain.acquiredOn ? formatDate(strain.acquiredOn) : null },
    { key: 'Locality', value: strain.locality, note: LOCALITY_WORDS[strain.localityKnown] },
    { key: 'The name', value: NAMING_WORDS[strain.naming] },
    { key: 'Trade name', value: strain.tradeName },
    { key: 'Other names', value: strain.synonyms },
    { key: 'Papers', value: strain.papers },
    { key: 'Source', value: source },
  ].flatMap(({ key, value, note }) => (value ? [{ key, value, ...(note ? { note } : {}) }] : []));
  return (
    <Screen
      title={strain.code}
      code
      subtitle={
        <Text tone="soft">
          <Text italic>{strain.displayName}</Text>
          {strain.locality ? ` ${strain.locality}` : ''}
        </Text>
      }
      back={`/r/${room.id}/stock/strains`}
      actions={<StrainMenu told={told} />}
    >
      <View style={{ gap: space[4], marginBottom: space[5] }}>
        {strain.retiredOn ? <Notice words={`No longer kept since ${formatDate(strain.retiredOn)}.`} /> : null}
        <FiguresStrip
          figures={[
            { figure: String(strain.livingFish), label: 'fish' },
            { figure: String(strain.colonies), label: 'colonies' },
            { figure: String(strain.broods), label: 'broods' },
          ]}
        />
        {strain.note ? <Text>{strain.note}</Text> : null}
        {may(room.role, 'stock:write') ? (
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
            <Button small icon="plus" label="Colony" href={`/r/${room.id}/colonies/new?strain=${strain.id}`} />
            <Button small icon="plus" label="Fish" href={`/r/${room.id}/fish/new?strain=${strain.id}`} />
            <Button small icon="plus" label="Lot" href={`/r/${room.id}/strains/${strain.id}/lot`} />
          </View>
        ) : null}
      </View>
      <Section
        title="Where from"
        aside={<TextLink label="The species" href={`/r/${room.id}/species/${strain.speciesId}`} />}
      >
        <KeyValues pairs={pairs} />
      </Section>
      <LotRows lots={lots} />
      {stock}
      {history}
    </Screen>
  );
}

function StrainMenu({ told: { strain } }: { told: StrainTold }) {
  const room = useRoom();
  const change = useChangeStrain(strain.id);
  const retire = useMutation({
    mutationFn: () => {
      const { id: _id, displayName: _name, colonies: _c, livingFish: _f, broods: _b, ...facts } = strain;
      return change.mutateAsync({ ...facts, retiredOn: strain.retiredOn ? null : room.today });
    },
  });
  if (!may(room.role, 'stock:write')) return null;
  return (
    <Menu
      label="More"
      items={[
        { word: 'Change the strain', href: `/r/${room.id}/strains/${strain.id}/change` },
        {
          word: strain.retiredOn ? 'Kept again' : 'No longer kept',
          ...(retire.error ? { note: retire.error.message } : {}),
          onPress: () => retire.mutate(),
        },
      ]}
    />
  );
}
