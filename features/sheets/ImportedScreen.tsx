import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { KeyValues } from '@/components/ui/KeyValues';
import { LinkRow } from '@/components/ui/LinkRow';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import type { readImported } from '@/shared/sheets/importContract';
import { trustWords } from '@/shared/sheets/importWords';
import { keysAddress } from '@/shared/sheets/sheetFile';
import { claimWords } from './claimWords';
import { importedQuery } from './importQueries';
import { saveSheetFile } from './saveFile';

const SheetPaper = lazy(() => import('./SheetPaper').then((module) => ({ default: module.SheetPaper })));

/** A sheet that was taken in: whose it is, how far it was checked, which fish came with it, and what it says. */
export function ImportedScreen({ importId }: { importId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(importedQuery(room.id, importId));
  if (data) return <Imported told={data} />;
  return (
    <Screen title="Sheet taken in" back={`/r/${room.id}/lineage/sheets?show=in`}>
      {error ? (
        <ErrorState title="This sheet could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the sheet" />
      )}
    </Screen>
  );
}

function Imported({ told: { row, content, jws } }: { told: z.output<typeof readImported.output> }) {
  const room = useRoom();
  const trust = trustWords(row);
  const { fishroom } = content;
  return (
    <Screen
      title={row.number}
      code
      subtitle={<Text tone="soft">{`${row.subject} of ${row.room}`}</Text>}
      back={`/r/${room.id}/lineage/sheets?show=in`}
      measure
    >
      <Notice tone={row.signature === 'valid' ? 'tell' : 'look'} title={trust.word} words={trust.says} />
      <KeyValues
        pairs={[
          { key: 'Fishroom', value: row.room, note: row.address.replace(/^https?:\/\//, '') },
          { key: 'Strain', value: claimWords(content.strain) },
          { key: 'Issued', value: `${formatDate(row.issuedOn)}, ${content.issue.by}` },
          { key: 'Taken in', value: `${formatDate(row.takenInOn)}, ${row.by}` },
          { key: 'Ancestors', value: row.ancestors === 0 ? 'none that were new' : `${row.ancestors} that were new` },
        ]}
      />
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2], marginVertical: space[4] }}>
        <Button
          small
          icon="download"
          label="File"
          onPress={() =>
            saveSheetFile(content.issue.number, { jws, keysAt: keysAddress(fishroom.address, fishroom.id) })
          }
        />
      </View>
      <Section title="Fish that came with it" aside={String(row.fish.length)}>
        <Rows bleed>
          {row.fish.map(({ id, code }) => (
            <LinkRow key={id} title={code ?? 'Not told apart'} href={`/r/${room.id}/fish/${id}`} />
          ))}
        </Rows>
      </Section>
      <Suspense fallback={<Loading label="Setting the page" rows={6} />}>
        <SheetPaper content={content} paper="a4" checkUrl={`${fishroom.address}/sheet`} units={room.units} />
      </Suspense>
    </Screen>
  );
}
