import { useQuery } from '@tanstack/react-query';
import { useRouter } from 'expo-router';
import { lazy, Suspense, useState } from 'react';
import { View } from 'react-native';
import * as z from 'zod/mini';
import { Form } from '@/components/form/Form';
import { NumberField } from '@/components/form/NumberField';
import { SubmitButton } from '@/components/form/SubmitButton';
import { TextField } from '@/components/form/TextField';
import { useSchemaForm } from '@/components/form/useSchemaForm';
import { space } from '@/components/theme/space';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import type { Paper } from '@/shared/print/page';
import { may } from '@/shared/roles';
import { Heads, typedLine } from '@/shared/shapes';
import type { SheetContent } from '@/shared/sheets/content';
import { spelledHeads } from '@/shared/spelled';
import { previewQuery, type Subject, sheetsQuery, useIssueSheet } from './queries';

const SheetPaper = lazy(() => import('./SheetPaper').then((module) => ({ default: module.SheetPaper })));

type Props = { of: Subject; replaces?: string | undefined };

/** What the sheet would say, as it prints, before it is numbered and signed. */
export function NewSheetScreen({ of, replaces }: Props) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(previewQuery(room.id, of));
  if (data) return <Issue content={data} of={of} replaces={replaces ?? null} />;
  return (
    <Screen title="Lineage sheet" back={`/r/${room.id}/lineage/${of.id}`}>
      {error ? (
        <ErrorState title="The sheet could not be put together" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Putting the sheet together" />
      )}
    </Screen>
  );
}

const Draft = z.strictObject({ heads: spelledHeads(Heads), because: typedLine(200) });

function Issue({ content, of, replaces }: { content: SheetContent; of: Subject; replaces: string | null }) {
  const room = useRoom();
  const router = useRouter();
  const issue = useIssueSheet();
  const { data: sheets = [] } = useQuery(sheetsQuery(room.id, of));
  const [paper, setPaper] = useState<Paper>('a4');
  const before = sheets.find(({ id }) => id === replaces);
  const { form, notice } = useSchemaForm({
    schema: before
      ? Draft.check(z.refine(({ because }) => because !== null, { error: 'Say why', path: ['because'] }))
      : Draft,
    start: { heads: String(before?.heads ?? 1), because: '' },
    save: async ({ heads, because }) => {
      const { id } = await issue.mutateAsync({
        thing: of.thing,
        subjectId: of.id,
        heads,
        replaces: before?.id ?? null,
        because: before ? because : null,
      });
      router.replace(`/r/${room.id}/sheets/${id}`);
    },
  });
  const mayIssue = may(room.role, 'sheet:issue');
  return (
    <Form form={form} notice={notice} label="Lineage sheet" page>
      <Screen
        title={before ? `Replace ${before.number}` : 'Lineage sheet'}
        subtitle={<Text tone="soft">{`${content.subject.code}, not issued yet`}</Text>}
        close={{ label: 'Close Lineage sheet', onPress: () => router.back() }}
        dock={mayIssue ? <SubmitButton label="Issue and sign" /> : undefined}
        low
      >
        <View style={{ gap: space[4] }}>
          <Text tone="soft">
            An issued sheet is numbered, signed and never edited; a wrong one is replaced, and its page says so.
          </Text>
          {mayIssue ? (
            <View style={{ gap: space[4], maxWidth: 420 }}>
              {of.thing === 'brood' ? <NumberField name="heads" label="For how many fish" whole /> : null}
              {before ? <TextField name="because" label="Why is it replaced?" /> : null}
            </View>
          ) : (
            <Notice words="An owner or keeper issues sheets." />
          )}
          <View style={{ maxWidth: 320 }}>
            <Segmented
              label="Paper"
              as="tabs"
              choices={[
                { value: 'a4', word: 'A4' },
                { value: 'letter', word: 'Letter' },
              ]}
              value={paper}
              onChange={setPaper}
            />
          </View>
          <Suspense fallback={<Loading label="Setting the page" rows={6} />}>
            <SheetPaper
              content={content}
              paper={paper}
              checkUrl={`${globalThis.location.origin}/sheet/…`}
              units={room.units}
            />
          </Suspense>
        </View>
      </Screen>
    </Form>
  );
}
