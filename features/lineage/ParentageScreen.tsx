import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { InputBox } from '@/components/form/InputBox';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { changeParentage, previewParentage } from '@/shared/lineage/contract';
import { asFractions, type ParentLine, PossibleParents } from './PossibleParents';
import { type ParentageRead, parentageQuery, pedigreeQuery } from './queries';
import { WhatChanges } from './WhatChanges';

/** Who may be the parents of a fish, a brood or a hold: set later, and shown what it changes before it is saved. */
export function ParentageScreen({ animalId }: { animalId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(parentageQuery(room.id, animalId));
  if (data) return <Parents key={data.turn} animalId={animalId} told={data} />;
  return (
    <Screen title="Parents" back={`/r/${room.id}/lineage`}>
      {error ? (
        <ErrorState title="These parents could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the parents" />
      )}
    </Screen>
  );
}

const linesOf = (parents: ParentageRead['parentage']['sires']): ParentLine[] =>
  parents.map(({ fishId, share }) => ({ fishId, share: String(Math.round(share * 1000) / 10) }));

function useParentage(animalId: string, told: ParentageRead) {
  const room = useRoom();
  const router = useRouter();
  const cache = useQueryClient();
  const { parentage, turn } = told;
  const [sires, setSires] = useState(linesOf(parentage.sires));
  const [dams, setDams] = useState(linesOf(parentage.dams));
  const [paternity, setPaternity] = useState(parentage.paternity);
  const [basis, setBasis] = useState(parentage.basis ?? '');
  const sent = {
    params: { roomId: room.id, animalId },
    body: { turn, parentage: { paternity, basis: basis || null, sires: asFractions(sires), dams: asFractions(dams) } },
  };
  const preview = useMutation({ mutationFn: () => call(previewParentage, sent) });
  const save = useMutation({
    mutationFn: () => call(changeParentage, sent),
    onSuccess: async () => {
      await cache.invalidateQueries({ queryKey: [room.id] });
      router.back();
    },
  });
  /** What was shown counts only for what it was shown of. */
  const edit =
    <Value,>(set: (value: Value) => void) =>
    (value: Value) => {
      preview.reset();
      save.reset();
      set(value);
    };
  return { sires, dams, paternity, basis, preview, save, edit, setSires, setDams, setPaternity, setBasis };
}

const PATERNITY = [
  { value: 'single', word: 'One, not known which' },
  { value: 'mixed', word: 'Several at once' },
] as const;

function Parents({ animalId, told }: { animalId: string; told: ParentageRead }) {
  const room = useRoom();
  const { data: nodes = [] } = useQuery(pedigreeQuery(room.id));
  const draft = useParentage(animalId, told);
  const { preview, save, edit } = draft;
  const failed = save.error ?? preview.error;
  return (
    <Screen
      measure
      title={told.name ? `Parents of ${told.name}` : 'Parents'}
      back={`/r/${room.id}/lineage`}
      subtitle={<Text tone="soft">What was said before stays in the history.</Text>}
    >
      <View style={{ gap: space[4], paddingBottom: space[5] }}>
        <PossibleParents {...{ side: 'sire', animalId, nodes }} lines={draft.sires} onChange={edit(draft.setSires)} />
        {draft.sires.length > 1 ? (
          <Segmented
            label="Fathers of one mouthful"
            choices={PATERNITY}
            value={draft.paternity}
            onChange={edit(draft.setPaternity)}
          />
        ) : null}
        <PossibleParents {...{ side: 'dam', animalId, nodes }} lines={draft.dams} onChange={edit(draft.setDams)} />
        <View style={{ gap: space[2] }}>
          <Text strong>What it rests on</Text>
          <InputBox
            aria-label="What it rests on"
            value={draft.basis}
            onChangeText={edit(draft.setBasis)}
            placeholder="A DNA result; dominant 12 of 15 days"
          />
        </View>
        {failed ? <Notice tone="act" alert title="Not saved" words={failed.message} /> : null}
        {preview.data ? (
          <>
            <WhatChanges told={preview.data} />
            <Button kind="primary" label="Save parents" busy={save.isPending} onPress={() => save.mutate()} />
          </>
        ) : (
          <Button
            kind="primary"
            label="Show what it changes"
            busy={preview.isPending}
            busyLabel="Working it out"
            onPress={() => preview.mutate()}
          />
        )}
      </View>
      <Section title="Said so far" aside={String(told.turns.length)}>
        <Rows>
          {told.turns.map(({ turn, basis, by, at }) => (
            <Row
              key={turn}
              figure={String(turn)}
              title={basis ?? 'Nothing said of why'}
              note={`${by}, ${at.slice(0, 10)}`}
            />
          ))}
        </Rows>
      </Section>
    </Screen>
  );
}
