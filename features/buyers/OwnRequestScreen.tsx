import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { KeyValues } from '@/components/ui/KeyValues';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Text } from '@/components/ui/Text';
import type { OwnRequest } from '@/shared/buyers/ask';
import { askedWords } from '@/shared/buyers/requestWords';
import { ownRequestQuery, useOwnStep } from './publicQueries';

/** A request by the link of its letter: to confirm it, to see where it stands, to withdraw it. */
export function OwnRequestScreen({ token }: { token: string }) {
  const { data, error, refetch } = useQuery(ownRequestQuery(token));
  return (
    <Screen title={data?.state === 'unconfirmed' ? 'Confirm your request' : 'Your request'} measure>
      {data ? (
        <Request token={token} request={data} />
      ) : error ? (
        <ErrorState
          title="There is no request here"
          words="It was not confirmed within three days, or the link was cut short: open it again from the letter."
          onRetry={() => void refetch()}
        />
      ) : (
        <Loading label="Loading the request" />
      )}
    </Screen>
  );
}

function Request({ token, request }: { token: string; request: OwnRequest }) {
  const step = useOwnStep(token);
  const { room, state, kind, broodCode, place, noticesStopped } = request;
  const open = state === 'waiting' || state === 'notified';
  return (
    <View style={{ gap: space[4] }}>
      <KeyValues
        pairs={[
          { key: 'Fishroom', value: room.name },
          { key: kind === 'fish' ? 'Asked for' : 'To be told of', value: askedWords(kind, request) },
          ...(broodCode ? [{ key: 'Brood', value: broodCode }] : []),
          ...(place ? [{ key: 'In the row', value: place === 1 ? 'first' : `number ${place}` }] : []),
        ]}
      />
      <Text>{stateWords(request)}</Text>
      {step.error ? <Notice tone="act" alert words={step.error.message} /> : null}
      {state === 'unconfirmed' ? (
        <Button kind="primary" grow label="Confirm" busy={step.isPending} onPress={() => step.mutate('confirm')} />
      ) : null}
      {open ? (
        <Button label="Withdraw the request" busy={step.isPending} onPress={() => step.mutate('withdraw')} />
      ) : null}
      {state !== 'unconfirmed' && !noticesStopped ? (
        <Button kind="text" label={`No more notices from ${room.name}`} onPress={() => step.mutate('stop')} />
      ) : null}
      {noticesStopped ? <Notice words={`${room.name} sends you no more notices.`} /> : null}
      <Button kind="text" label={`Fish of ${room.name}`} href={`/available/${room.slug}`} />
    </View>
  );
}

function stateWords({ state, kind, waitsForFish, room }: OwnRequest): string {
  switch (state) {
    case 'unconfirmed':
      return 'Confirm that you asked for this. If you did not, close this page: what was typed is forgotten.';
    case 'notified':
      return `${room.name} has written to you about it.`;
    case 'ordered':
      return 'It has become an order; its own letter has the link to it.';
    case 'closed':
      return 'This request is over.';
    default:
      if (kind === 'notice') return 'A letter comes when they are that long and for sale.';
      return waitsForFish
        ? 'Too few are available now. A letter tells you when they come free.'
        : `${room.name} has your request and will answer.`;
  }
}
