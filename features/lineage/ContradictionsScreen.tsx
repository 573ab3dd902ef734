import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Contradiction } from '@/shared/lineage/contract';
import { contradictionsQuery } from './queries';

/** What cannot all be true of parents and young, each with the ways to mend it. */
export function ContradictionsScreen() {
  const room = useRoom();
  const { data, error, refetch } = useQuery(contradictionsQuery(room.id));
  return (
    <Screen title="Contradictions" back={`/r/${room.id}/lineage`} measure>
      {data?.length === 0 ? (
        <EmptyState title="Nothing contradicts" words="Days, sexes and tanks agree with the parents recorded." />
      ) : data ? (
        <View style={{ gap: space[5], paddingVertical: space[3] }}>
          {GROUPS.map(({ kind, title }) => (
            <Group key={kind} title={title} found={data.filter((one) => one.kind === kind)} />
          ))}
        </View>
      ) : error ? (
        <ErrorState title="They could not be looked for" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Looking for contradictions" />
      )}
    </Screen>
  );
}

const GROUPS = [
  { kind: 'loop', title: 'Its own ancestor' },
  { kind: 'younger', title: 'Younger than its young' },
  { kind: 'sex', title: 'Of the other sex' },
  { kind: 'dead', title: 'Dead before' },
  { kind: 'away', title: 'Not there at the time' },
] as const;

function Group({ title, found }: { title: string; found: Contradiction[] }) {
  const { id: roomId } = useRoom();
  const home = `/r/${roomId}` as const;
  if (found.length === 0) return null;
  return (
    <Section title={title} aside={String(found.length)}>
      {found.map(({ id, name, parent, says }) => (
        <View key={`${id} ${says}`} style={{ gap: space[2], paddingVertical: space[3] }}>
          <Text>{says}</Text>
          <ButtonRow>
            <Button small label={`Parents of ${name}`} href={`${home}/lineage/parents/${id}`} />
            {parent ? <Button small label={`Fish ${parent.name}`} href={`${home}/fish/${parent.id}`} /> : null}
          </ButtonRow>
        </View>
      ))}
    </Section>
  );
}
