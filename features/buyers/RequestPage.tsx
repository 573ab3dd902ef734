import type { Href } from 'expo-router';
import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { TextLink } from '@/components/ui/TextLink';
import { call } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { closeRequest, type RequestRow } from '@/shared/buyers/requests';
import { askedWords } from '@/shared/buyers/requestWords';
import { formatDay } from '@/shared/days';
import { OrderForm } from './OrderForm';
import { useAct } from './queries';
import { RequestLetterSheet } from './RequestLetterSheet';
import { isOpen, standsWords } from './requestFacts';
import { SourcesPart } from './SourcesPart';

/** A request: who asks for what, whether it is there, and what becomes of it. */
export function RequestPage({ request, back }: { request: RequestRow; back: Href }) {
  const room = useRoom();
  const { buyer, kind, order } = request;
  const open = isOpen(request);
  return (
    <Screen
      title={buyer.name}
      subtitle={<Text tone="soft">{askedWords(kind, request, room.units)}</Text>}
      back={back}
      actions={order ? <TextLink label={`Order ${order.number}`} href={`/r/${room.id}/orders/${order.id}`} /> : null}
    >
      <Asked request={request} />
      {open ? <SourcesPart request={request} /> : null}
      {open ? <OrderForm request={request} /> : null}
      <Last request={request} />
    </Screen>
  );
}

function Asked({ request }: { request: RequestRow }) {
  const room = useRoom();
  const { buyer, brood, strain, madeOn, place, words } = request;
  return (
    <Section title="Asked" aside={standsWords(request, room.today)}>
      <KeyValues
        pairs={[
          { key: 'Since', value: formatDay(madeOn, room.today) },
          ...(place === null ? [] : [{ key: 'In the row', value: place === 1 ? 'next' : `number ${place}` }]),
          ...(brood ? [{ key: 'Brood', value: <Code>{brood.code}</Code> }] : []),
          ...(strain ? [{ key: 'Strain', value: <Code>{strain.code}</Code> }] : []),
          { key: 'Email', value: buyer.email ?? 'none: no letter can go out' },
          ...(words ? [{ key: 'Says', value: words }] : []),
        ]}
      />
    </Section>
  );
}

/** Read the letters, or close it without an order. */
function Last({ request }: { request: RequestRow }) {
  const { id: roomId } = useRoom();
  const act = useAct();
  const [reading, setReading] = useState(false);
  const close = () =>
    act.mutate(() =>
      call(closeRequest, { params: { roomId, requestId: request.id }, body: { version: request.version } }),
    );
  return (
    <View style={{ gap: space[3] }}>
      {act.error ? <Notice tone="act" alert words={act.error.message} /> : null}
      <ButtonRow>
        <Button small grow label="Read letters" onPress={() => setReading(true)} />
        {isOpen(request) ? (
          <Button small grow label="Close without an order" busy={act.isPending} onPress={close} />
        ) : null}
      </ButtonRow>
      {reading ? <RequestLetterSheet request={request} onClose={() => setReading(false)} /> : null}
    </View>
  );
}
