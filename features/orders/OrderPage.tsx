import { StyleSheet, View } from 'react-native';
import { useBreakpoint } from '@/components/theme/breakpoint';
import { space } from '@/components/theme/space';
import { ActRow } from '@/components/ui/ActRow';
import { Screen } from '@/components/ui/Screen';
import { StepBars } from '@/components/ui/StepBars';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import type { OrderPage as Told } from '@/shared/orders/contract';
import { isOpen, ORDER_STATE_WORDS, stepsOf } from '@/shared/orders/state';
import { CatchPart } from './CatchPart';
import { CollectionPart } from './CollectionPart';
import { FishPart } from './FishPart';
import { LettersPart, LogPart } from './LettersPart';
import { MessagesPart } from './MessagesPart';
import { OrderActions } from './OrderActions';
import { PaymentsPart } from './PaymentsPart';
import { BuyerPart, SheetsPart } from './PeopleParts';
import { StandsPart } from './StandsPart';

/** One order: where it stands, its fish and money, what to catch, and everything said about it. */
export function OrderPage({ told }: { told: Told }) {
  const room = useRoom();
  const wide = useBreakpoint() === 'full';
  const { order, owner } = told;
  const { state, number, buyer, madeOn, hasDeposit } = order;
  const { steps, current } = stepsOf(state, hasDeposit);
  return (
    <Screen
      title={String(number)}
      code
      subtitle={
        <Text tone="soft">
          {[buyer?.code, wide || !buyer ? `asked ${formatDay(madeOn, room.today)}` : null].filter(Boolean).join(', ')}
        </Text>
      }
      back={`/r/${room.id}/buyers/orders`}
      actions={<OrderActions told={told} />}
    >
      <View style={styles.steps}>
        {current < 0 ? (
          <Text strong>{told.cancelledBecause ? `Cancelled: ${told.cancelledBecause}` : ORDER_STATE_WORDS[state]}</Text>
        ) : (
          <StepBars steps={steps} current={current} />
        )}
      </View>
      <Troubles told={told} />
      <View style={wide ? styles.columns : null}>
        <View style={wide ? styles.main : null}>
          <FishPart told={told} />
          {wide ? null : <CollectionPart told={told} />}
          {isOpen(state) ? <CatchPart told={told} /> : null}
          {owner ? <StandsPart told={told} stands={owner.stands} /> : null}
          {owner ? <MessagesPart told={told} messages={owner.messages} /> : null}
        </View>
        <View style={wide ? styles.side : null}>
          {wide ? <CollectionPart told={told} /> : null}
          <SheetsPart told={told} />
          {owner ? <PaymentsPart told={told} payments={owner.payments} /> : null}
          {owner ? <BuyerPart owner={owner} /> : null}
          {owner ? <LettersPart told={told} letters={owner.letters} /> : null}
          {owner && owner.log.length > 0 ? <LogPart log={owner.log} /> : null}
        </View>
      </View>
    </Screen>
  );
}

/** What cannot wait: fish that are missing, money that must go back, a hold that is over. */
function Troubles({ told: { order } }: { told: Told }) {
  const room = useRoom();
  const { short, lapsed, flaggedCents, toReturnCents, id } = order;
  const back = (flaggedCents ?? 0) + (toReturnCents ?? 0);
  const href = `/r/${room.id}/orders/${id}` as const;
  const rows = [
    ...(short > 0
      ? [
          {
            key: 'short',
            level: 'act' as const,
            title: `${short} fish short`,
            note: 'Deaths left fewer than are reserved. Change the lines, or write to the buyer.',
          },
        ]
      : []),
    ...(back > 0
      ? [
          {
            key: 'back',
            level: 'act' as const,
            title: `${formatMoney(back, room.currency)} to give back`,
            note: 'See Payments: it came too late, was not what was asked, or is for an order that does not stand.',
          },
        ]
      : []),
    ...(lapsed
      ? [
          {
            key: 'lapsed',
            level: 'look' as const,
            title: 'The fish are not held any more',
            note: 'The time is over, or the payment was not made. Reserve again if they are still there.',
          },
        ]
      : []),
  ];
  return rows.map(({ key, ...row }) => <ActRow key={key} {...row} href={href} label={`${row.title}. ${row.note}`} />);
}

const styles = StyleSheet.create({
  steps: { marginTop: space[2], marginBottom: space[5] },
  columns: { flexDirection: 'row', gap: space[6], alignItems: 'flex-start' },
  main: { flexGrow: 1, flexShrink: 1, flexBasis: 0, minWidth: 0 },
  side: { width: 272 },
});
