import { skipToken, useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { FieldError } from '@/components/form/FieldFrame';
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
import { useKept } from '@/hooks/useKept';
import { useRoom } from '@/hooks/useRoom';
import { changeParentage, previewParentage } from '@/shared/lineage/contract';
import { type Fields, Refusal } from '@/shared/refusal';
import { PossibleParents } from './PossibleParents';
import { bodyOf, byDominance, draftOf, isDraft, type ParentsDraft, thenOf } from './parentsDraft';
import { type ParentageRead, parentageQuery, pedigreeQuery, siresThenQuery } from './queries';
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

function useParentage(animalId: string, told: ParentageRead) {
  const room = useRoom();
  const router = useRouter();
  const cache = useQueryClient();
  const { turn } = told;
  const [draft, keep, forget] = useKept(`parents ${animalId} ${turn}`, () => draftOf(told), isDraft);
  const [wrong, setWrong] = useState<Fields>({});
  const params = { roomId: room.id, animalId };
  const onError = (error: Error) => setWrong(error instanceof Refusal ? error.fields : {});
  type Body = z.input<typeof previewParentage.body>;
  const preview = useMutation({ mutationFn: (body: Body) => call(previewParentage, { params, body }), onError });
  const save = useMutation({
    mutationFn: (body: Body) => call(changeParentage, { params, body }),
    onError,
    onSuccess: async () => {
      forget();
      await cache.invalidateQueries({ queryKey: [room.id] });
      router.back();
    },
  });
  /** What was shown counts only for what it was shown of. */
  const edit = (change: Partial<ParentsDraft>) => {
    preview.reset();
    save.reset();
    setWrong({});
    keep({ ...draft, ...change });
  };
  const send = (to: typeof preview | typeof save) => {
    const { body, wrong: found } = bodyOf(draft, turn);
    setWrong(found);
    if (body) to.mutate(body);
  };
  return { draft, edit, wrong, preview, save, showChanges: () => send(preview), saveIt: () => send(save) };
}

const PATERNITY = [
  { value: 'single', word: 'One, not known which' },
  { value: 'mixed', word: 'Several at once' },
] as const;

function Parents({ animalId, told }: { animalId: string; told: ParentageRead }) {
  const room = useRoom();
  const { data: nodes = [] } = useQuery(pedigreeQuery(room.id));
  const { spawn } = told;
  const { data: there } = useQuery(
    spawn ? siresThenQuery(room.id, spawn) : { queryKey: ['nobody'], queryFn: skipToken },
  );
  const { draft, edit, wrong, preview, save, showChanges, saveIt } = useParentage(animalId, told);
  const failed = save.error ?? preview.error;
  const elsewhere = failed && Object.keys(wrong).length === 0 ? failed.message : null;
  return (
    <Screen
      measure
      title={told.name ? `Parents of ${told.name}` : 'Parents'}
      back={`/r/${room.id}/lineage`}
      subtitle={<Text tone="soft">What was said before stays in the history.</Text>}
    >
      <View style={{ gap: space[4], paddingBottom: space[5] }}>
        <PossibleParents
          {...{ side: 'sire', animalId, nodes, wrong }}
          lines={draft.sires}
          onChange={(sires) => edit({ sires })}
          noteOf={(fishId) => thenOf(fishId, there, spawn?.tank.code ?? 'the tank')}
        />
        {there && there.length > 0 && spawn ? (
          <View style={{ alignItems: 'flex-start' }}>
            <Button
              small
              label="Share by days dominant"
              describe={`Share by days dominant in ${spawn.tank.code} before the spawn`}
              onPress={() => edit(byDominance(there))}
            />
          </View>
        ) : null}
        {draft.sires.length > 1 ? (
          <Segmented
            label="Fathers of one mouthful"
            choices={PATERNITY}
            value={draft.paternity}
            onChange={(paternity) => edit({ paternity })}
          />
        ) : null}
        <PossibleParents
          {...{ side: 'dam', animalId, nodes, wrong }}
          lines={draft.dams}
          onChange={(dams) => edit({ dams })}
        />
        <View style={{ gap: space[2] }}>
          <Text strong>What it rests on</Text>
          <InputBox
            aria-label="What it rests on"
            value={draft.basis}
            invalid={Boolean(wrong['parentage.basis'])}
            onChangeText={(basis) => edit({ basis })}
            placeholder="A DNA result; dominant 12 of 15 days; not in the tank then"
          />
          <FieldError id="wrong-basis" words={wrong['parentage.basis'] ?? null} />
        </View>
        {elsewhere ? <Notice tone="act" alert title="Not saved" words={elsewhere} /> : null}
        {preview.data ? (
          <>
            <WhatChanges told={preview.data} />
            <Button kind="primary" label="Save parents" busy={save.isPending} onPress={saveIt} />
          </>
        ) : (
          <Button
            kind="primary"
            label="Show what it changes"
            busy={preview.isPending}
            busyLabel="Working it out"
            onPress={showChanges}
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
