import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { EmptyState } from '@/components/ui/EmptyState';
import { KeyValues } from '@/components/ui/KeyValues';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { TwoPane } from '@/components/ui/TwoPane';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';
import type { SpeciesSet } from '@/shared/species/contract';
import { STANDING_WORDS } from '@/shared/species/figure';
import { librarySpecies, unlistedSpecies } from '@/shared/species/library';
import {
  type OverrideSources,
  profileFrom,
  type SpeciesOverrides,
  type SpeciesProfile,
} from '@/shared/species/profile';
import { MODE_WORDS } from '@/shared/species/species';
import { EDITABLE, type EditableFigure } from './editable';
import { FigureSheet } from './FigureSheet';
import { figureGroups } from './figureLines';
import { speciesQuery } from './queries';
import { SpeciesList } from './SpeciesList';

export function SpeciesLibraryScreen() {
  return (
    <TwoPane
      list={<SpeciesList />}
      detail={null}
      nothing={<EmptyState title="Choose a species" words="Every figure says where it comes from, and can be set." />}
    />
  );
}

export function SpeciesScreen({ speciesId }: { speciesId: string }) {
  return <TwoPane list={<SpeciesList chosen={speciesId} />} detail={<Detail key={speciesId} id={speciesId} />} />;
}

function Detail({ id }: { id: string }) {
  const room = useRoom();
  const { data } = useQuery(speciesQuery(room.id));
  const set = data?.find((one) => one.id === id) ?? null;
  const profile = data ? profileOfSet(id, set) : null;
  if (profile) return <SpeciesPage profile={profile} set={set} />;
  return (
    <Screen title="Species" back={`/r/${room.id}/species`}>
      {data ? (
        <EmptyState small title="There is no such species" words="Choose another in the list." />
      ) : (
        <Loading label="Loading the species" />
      )}
    </Screen>
  );
}

function profileOfSet(id: string, set: SpeciesSet | null): SpeciesProfile | null {
  const species =
    librarySpecies(id) ??
    (set?.about ? unlistedSpecies({ ...set.about, id, name: set.scientificName ?? 'Species' }) : null);
  if (!species) return null;
  const figures = Object.entries(set?.figures ?? {});
  // Both were checked against the figures' shapes when they were stored.
  const values = Object.fromEntries(figures.map(([name, { value }]) => [name, value])) as SpeciesOverrides;
  const sources = Object.fromEntries(figures.map(([name, { source }]) => [name, source])) as OverrideSources;
  return profileFrom(species, values, sources);
}

/** All that is known of a species, each figure with its source; a fishroom sets its own where it knows better. */
function SpeciesPage({ profile, set }: { profile: SpeciesProfile; set: SpeciesSet | null }) {
  const room = useRoom();
  const [changing, setChanging] = useState<EditableFigure | null>(null);
  const mayChange = may(room.role, 'stock:write');
  return (
    <Screen
      title={profile.name}
      subtitle={
        <Text tone="soft">{`${MODE_WORDS[profile.mode]}${profile.origin ? ` · ${profile.origin.value}` : ''}`}</Text>
      }
      back={`/r/${room.id}/species`}
    >
      {profile.commonNames ? (
        <View style={{ marginBottom: space[4] }}>
          <Text tone="soft">{profile.commonNames.value.join(', ')}</Text>
        </View>
      ) : null}
      {figureGroups(profile, room.units).map(({ word, lines }) => (
        <Section key={word} title={word}>
          <KeyValues
            keyWidth={150}
            pairs={lines.map(({ name, word: key, value, source, standing }) => {
              const editable = EDITABLE.find((one) => one.name === name);
              return {
                key,
                value: (
                  <View style={{ flexDirection: 'row', gap: space[3], alignItems: 'baseline', flexWrap: 'wrap' }}>
                    <Text size="small" strong tone={standing === 'unknown' ? 'faint' : 'ink'} style={{ flexShrink: 1 }}>
                      {value}
                    </Text>
                    {editable && mayChange ? (
                      <TextLink label="Set" describe={`Set ${key}`} onPress={() => setChanging(editable)} />
                    ) : null}
                  </View>
                ),
                ...(source ? { note: sourceWords(source, standing) } : {}),
              };
            })}
          />
        </Section>
      ))}
      {profile.notes ? <Text tone="soft">{profile.notes}</Text> : null}
      {changing ? (
        <FigureSheet
          key={changing.name}
          figure={changing}
          profile={profile}
          set={set}
          onClose={() => setChanging(null)}
        />
      ) : null}
    </Screen>
  );
}

/** "Read in the source named: FishBase, 2019": the standing first where the source does not say it. */
function sourceWords(source: string, standing: string): string {
  if (standing !== 'room') return source;
  return source === STANDING_WORDS.room ? source : `${STANDING_WORDS.room}: ${source}`;
}
