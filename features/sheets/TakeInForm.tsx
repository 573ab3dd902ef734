import { useRouter } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { Form } from '@/components/form/Form';
import { SubmitButton } from '@/components/form/SubmitButton';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { newId } from '@/features/entries';
import { useRoom } from '@/hooks/useRoom';
import { addDays, formatDate } from '@/shared/days';
import type { ImportPreview, SheetSource } from '@/shared/sheets/importContract';
import type { StrainRow } from '@/shared/strains/contract';
import type { TankRow } from '@/shared/tanks/contract';
import { ImportFacts } from './ImportFacts';
import { ImportTrust } from './ImportTrust';
import { useTakeIn } from './importQueries';
import { TakeInFields } from './TakeInFields';
import { draftOf, headsLeft, startOf, TakeInDraft } from './takeInDraft';

type Props = {
  source: SheetSource;
  preview: ImportPreview;
  strains: StrainRow[];
  tanks: TankRow[];
  onOther: () => void;
  onSource: (source: SheetSource) => void;
};

/** Four weeks; common practice, no source. */
const QUARANTINE_DAYS = 28;

/** What the sheet says and does, then what the keeper adds: how many came, and where they go. */
export function TakeInForm({ source, preview, strains, tanks, onOther, onSource }: Props) {
  const room = useRoom();
  const router = useRouter();
  const takeIn = useTakeIn();
  const [strainId] = useState(newId);
  const { form, notice } = useSchemaForm({
    schema: TakeInDraft,
    start: startOf(preview, {
      strains,
      tanks,
      today: room.today,
      until: addDays(room.today, QUARANTINE_DAYS),
    }),
    save: async (value) => {
      const { id, fish } = await takeIn.mutateAsync(draftOf(value, { source, preview, newId: strainId }));
      const [only] = fish;
      router.replace(
        fish.length === 1 && only ? `/r/${room.id}/fish/${only.id}` : `/r/${room.id}/sheets/imported/${id}`,
      );
    },
  });
  const { content, refused, before, taken } = preview;
  const heads = Number(form.values.heads) || 0;
  const title = 'Take a sheet in';
  return (
    <Form form={form} notice={notice} label={title} page>
      <Screen
        title={title}
        subtitle={<Text tone="soft">{`${content.issue.number}, ${content.subject.code}`}</Text>}
        close={{ label: `Close ${title}`, onPress: () => router.back() }}
        dock={refused ? undefined : <SubmitButton label={submitWords(heads)} />}
        low
        measure
      >
        <View style={{ gap: space[4] }}>
          {refused ? (
            <Notice tone="act" alert title="Not taken in" words={refused}>
              <Button small label="Choose another sheet" onPress={onOther} />
            </Notice>
          ) : null}
          <ImportTrust preview={preview} source={source} onSource={onSource} />
          {taken > 0 && !refused ? (
            <Notice
              words={`${taken} of its ${preview.heads} fish are here already. What you take in now is added to them.`}
            />
          ) : null}
          {before.map(({ number, heads: came, on }) => (
            <Notice
              key={number}
              words={`${came === 1 ? '1 fish' : `${came} fish`} of the same came with sheet ${number}, taken in on ${formatDate(on)}.`}
            />
          ))}
          <ImportFacts preview={preview} />
          {refused ? null : (
            <TakeInFields preview={preview} strains={strains} tanks={tanks} left={headsLeft(preview)} />
          )}
          {refused ? null : <Button small label="Choose another sheet" onPress={onOther} />}
        </View>
      </Screen>
    </Form>
  );
}

const submitWords = (heads: number): string =>
  heads === 0 ? 'Take in what it tells' : heads === 1 ? 'Take in 1 fish' : `Take in ${heads} fish`;
