import { useQuery } from '@tanstack/react-query';
import { lazy, Suspense, useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Menu } from '@/components/ui/Menu';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { addressOf } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { formatDate } from '@/shared/days';
import type { Paper } from '@/shared/print/page';
import { may } from '@/shared/roles';
import { printSheet } from '@/shared/sheets/contract';
import { type SheetTold, sheetQuery } from './queries';
import { saveSheetFile } from './saveFile';
import { WithdrawSheet } from './WithdrawSheet';

const SheetPaper = lazy(() => import('./SheetPaper').then((module) => ({ default: module.SheetPaper })));

/** An issued sheet: what became of it, the page as it prints, and every way to hand it over. */
export function SheetScreen({ sheetId }: { sheetId: string }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(sheetQuery(room.id, sheetId));
  if (data) return <Issued told={data} />;
  return (
    <Screen title="Lineage sheet" back={`/r/${room.id}/lineage/sheets`}>
      {error ? (
        <ErrorState title="This sheet could not be loaded" words={error.message} onRetry={() => void refetch()} />
      ) : (
        <Loading label="Loading the sheet" />
      )}
    </Screen>
  );
}

function Issued({ told }: { told: SheetTold }) {
  const room = useRoom();
  const [paper, setPaper] = useState<Paper>('a4');
  const [withdrawing, setWithdrawing] = useState(false);
  const { row, content, checkUrl } = told;
  const pdf = addressOf(printSheet, { params: { roomId: room.id, sheetId: row.id, paper } });
  return (
    <Screen
      title={row.number}
      code
      subtitle={<Text tone="soft">{`${row.subject.code}, issued ${formatDate(row.issuedOn)} by ${row.by}`}</Text>}
      back={`/r/${room.id}/lineage/sheets`}
      actions={<SheetMenu told={told} onWithdraw={() => setWithdrawing(true)} />}
    >
      <View style={{ gap: space[4] }}>
        <StateNotice told={told} />
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space[2], alignItems: 'center' }}>
          <View style={{ width: 180 }}>
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
          <Button small kind="primary" icon="print" label="PDF" onPress={() => void globalThis.open(pdf, '_blank')} />
          <Button small icon="download" label="File" onPress={() => saveSheetFile(content.issue.number, told)} />
        </View>
        {row.linkRevoked ? (
          <Text size="small" tone="soft">
            Its check page is closed.
          </Text>
        ) : (
          <TextLink label="Its check page, for the buyer" href={`/sheet/${row.token}`} />
        )}
        <Suspense fallback={<Loading label="Setting the page" rows={6} />}>
          <SheetPaper content={content} paper={paper} checkUrl={checkUrl} />
        </Suspense>
      </View>
      {withdrawing ? <WithdrawSheet row={row} onClose={() => setWithdrawing(false)} /> : null}
    </Screen>
  );
}

function StateNotice({ told: { row } }: { told: SheetTold }) {
  if (row.state === 'valid') return null;
  if (row.state === 'replaced')
    return <Notice tone="look" words={`Replaced by ${row.replacedBy ?? 'a later sheet'}. Its check page says so.`} />;
  return (
    <Notice tone="act" words={`Withdrawn: ${row.withdrawnBecause ?? 'no reason given'}. Its check page says so.`} />
  );
}

function SheetMenu({ told: { row }, onWithdraw }: { told: SheetTold; onWithdraw: () => void }) {
  const room = useRoom();
  const home = `/r/${room.id}` as const;
  const { subject } = row;
  return (
    <Menu
      label="More"
      items={[
        { word: 'Lineage', href: `${home}/lineage/${subject.id}` },
        ...(row.state === 'valid' && may(room.role, 'sheet:issue')
          ? [
              {
                word: 'Replace it',
                href: `${home}/sheets/new?${subject.thing}=${subject.id}&replaces=${row.id}` as const,
              },
            ]
          : []),
        ...(row.state !== 'withdrawn' && may(room.role, 'sheet:withdraw')
          ? [{ word: 'Withdraw it', onPress: onWithdraw }]
          : []),
      ]}
    />
  );
}
