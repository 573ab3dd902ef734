import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import type { OrderPage } from '@/shared/orders/contract';
import { hasLeft, isOpen } from '@/shared/orders/state';
import { timeWords } from '@/shared/orders/times';
import { may } from '@/shared/roles';
import { TimesSheet } from './TimesSheet';

/** When the fish leave: agreed, offered, or still to offer. */
export function CollectionPart({ told }: { told: OrderPage }) {
  const room = useRoom();
  const [open, setOpen] = useState(false);
  const { order, offeredTimes } = told;
  const { agreedTime, handedOverAt, state } = order;
  const mayOffer = may(room.role, 'sale:write') && isOpen(state);
  if (state === 'cancelled') return null;
  return (
    <Section title="Collection">
      <View style={{ gap: space[2] }}>
        {hasLeft(state) && handedOverAt ? (
          <Text strong size="large">{`Left ${formatDay(handedOverAt.slice(0, 10), room.today)}`}</Text>
        ) : agreedTime ? (
          <Text strong size="large">
            {timeWords(agreedTime, room.today)}
          </Text>
        ) : (
          <Text tone="soft">
            {offeredTimes.length > 0
              ? `Offered: ${offeredTimes.map((time) => timeWords(time, room.today)).join('; ')}`
              : 'No time is agreed.'}
          </Text>
        )}
        {mayOffer ? (
          <ButtonRow>
            <Button small label={agreedTime ? 'Change the time' : 'Offer times'} onPress={() => setOpen(true)} />
          </ButtonRow>
        ) : null}
      </View>
      {open ? <TimesSheet told={told} onClose={() => setOpen(false)} /> : null}
    </Section>
  );
}
