import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense } from 'react';
import { View } from 'react-native';
import type * as z from 'zod/mini';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { addressOf } from '@/features/call';
import { formatDate } from '@/shared/days';
import type { SheetVerdict } from '@/shared/sheets/checkSheet';
import { type checkSheetPage, printCheckedSheet } from '@/shared/sheets/contract';
import { readKeySet } from '@/shared/sheets/sheetFile';
import { verdictWords } from '@/shared/sheets/verdictWords';
import { checkedQuery } from './queries';
import { saveSheetFile } from './saveFile';
import { TakeInOffer } from './TakeInOffer';
import { verifySheet } from './verifySheet';

const SheetPaper = lazy(() => import('./SheetPaper').then((module) => ({ default: module.SheetPaper })));

type Checked = z.output<typeof checkSheetPage.output>;

/** Behind the square code of a printed sheet: the signature is checked here, in the reader's own browser. */
export function CheckScreen({ token }: { token: string }) {
  const { data, error, refetch } = useQuery(checkedQuery(token));
  const verdict = useQuery({
    queryKey: ['checkedSheet', token, 'verdict'],
    queryFn: () =>
      verifySheet(data?.jws ?? '', { keys: readKeySet({ keys: data?.keys }) ?? [], at: data?.keysAt ?? null }),
    enabled: data !== undefined,
  });
  return (
    <Screen title="Lineage sheet" actions={<TextLink label="Check a file" href="/sheet" />}>
      {data && verdict.data ? (
        <Found token={token} checked={data} verdict={verdict.data} />
      ) : error || verdict.error ? (
        <ErrorState
          title="There is no sheet here"
          words={error?.message ?? 'The sheet could not be checked.'}
          onRetry={() => void refetch()}
        />
      ) : (
        <Loading label="Checking the sheet" />
      )}
    </Screen>
  );
}

function Found({ token, checked, verdict }: { token: string; checked: Checked; verdict: SheetVerdict }) {
  const { state, at, because, replacedBy, checkUrl } = checked;
  const on = at ? formatDate(at.slice(0, 10)) : null;
  return (
    <View style={{ gap: space[4] }}>
      {state === 'withdrawn' ? (
        <Notice
          tone="act"
          alert
          title={`Withdrawn${on ? ` on ${on}` : ''}`}
          words={because ?? 'The fishroom gives no reason.'}
        />
      ) : state === 'replaced' ? (
        <Notice
          tone="look"
          title={`Replaced${on ? ` on ${on}` : ''}`}
          words={because ?? 'A later sheet takes its place.'}
        >
          {replacedBy ? <Button small label={`See ${replacedBy.number}`} href={`/sheet/${replacedBy.token}`} /> : null}
        </Notice>
      ) : null}
      <VerdictNotice verdict={verdict} />
      {verdict.state === 'valid' ? (
        <>
          <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2] }}>
            {(['a4', 'letter'] as const).map((paper) => (
              <Button
                key={paper}
                small
                icon="print"
                label={`PDF, ${paper === 'a4' ? 'A4' : 'Letter'}`}
                onPress={() =>
                  void globalThis.open(addressOf(printCheckedSheet, { params: { token, paper } }), '_blank')
                }
              />
            ))}
            <Button
              small
              icon="download"
              label="File"
              onPress={() => saveSheetFile(verdict.content.issue.number, checked)}
            />
          </View>
          {state === 'withdrawn' ? null : <TakeInOffer checkUrl={checkUrl} issuer={verdict.content.fishroom.id} />}
          <Suspense fallback={<Loading label="Setting the page" rows={6} />}>
            <SheetPaper content={verdict.content} paper="a4" checkUrl={checkUrl} />
          </Suspense>
        </>
      ) : null}
    </View>
  );
}

/** What the check came to; only a valid signature is good news. */
export function VerdictNotice({ verdict }: { verdict: SheetVerdict }) {
  const { title, text } = verdictWords(verdict);
  const good = verdict.state === 'valid';
  return (
    <Notice
      tone={good ? 'tell' : verdict.state === 'cannotCheck' ? 'look' : 'act'}
      alert={!good}
      title={title}
      words={text}
    >
      {good ? (
        <Text size="small" tone="soft">
          Checked in this browser, by the fishroom’s published key. That says who wrote it, not that all of it is true.
        </Text>
      ) : null}
    </Notice>
  );
}
