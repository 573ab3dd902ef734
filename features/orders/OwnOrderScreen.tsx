import { useQuery } from '@tanstack/react-query';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ErrorState } from '@/components/ui/ErrorState';
import { Loading } from '@/components/ui/Loading';
import { Notice } from '@/components/ui/Notice';
import { Screen } from '@/components/ui/Screen';
import { Section } from '@/components/ui/Section';
import { StepBars } from '@/components/ui/StepBars';
import { Text } from '@/components/ui/Text';
import { addressOf } from '@/features/call';
import { formatDay } from '@/shared/days';
import { type OwnOrder, printOwnReceipt } from '@/shared/orders/own';
import { hasLeft, stepsOf } from '@/shared/orders/state';
import { OwnCancel } from './OwnCancel';
import { OwnFish } from './OwnFish';
import { OwnMessages } from './OwnMessages';
import { OwnTimes } from './OwnTimes';
import { ownOrderQuery, usePay } from './ownQueries';

/** A buyer's own order, by the link out of a letter: what is theirs, and nothing else. */
export function OwnOrderScreen({ token }: { token: string }) {
  const { data, error, refetch } = useQuery(ownOrderQuery(token));
  if (data) return <Page token={token} order={data} />;
  return (
    <Screen title="Order">
      {error ? (
        <ErrorState
          title="There is no order here"
          words={`${error.message}. The link may have been cut short: open it again from the letter.`}
          onRetry={() => void refetch()}
        />
      ) : (
        <Loading label="Loading the order" />
      )}
    </Screen>
  );
}

type Props = { token: string; order: OwnOrder };

function Page({ token, order }: Props) {
  return (
    <Screen
      title={`Order ${order.number}`}
      subtitle={<Text tone="soft">{`${order.room.name}, for ${order.buyerName}`}</Text>}
      measure
    >
      <View style={{ gap: space[4] }}>
        <Stage order={order} />
        <OwnFish order={order} />
        <PayPart token={token} order={order} />
        <OwnTimes token={token} order={order} />
        <BeforeTravel order={order} />
        {order.sheets.map(({ id, number, token: sheet, code }) => (
          <Button key={id} icon="print" label={`Lineage sheet ${number}, ${code}`} href={`/sheet/${sheet}`} />
        ))}
        {order.hasReceipt ? (
          <Button
            label="Receipt"
            onPress={() =>
              globalThis.open(addressOf(printOwnReceipt, { params: { token, paper: 'a4' } }), '_blank', 'noopener')
            }
          />
        ) : null}
        <OwnMessages token={token} order={order} />
        {order.mayCancel ? <OwnCancel token={token} order={order} /> : null}
      </View>
    </Screen>
  );
}

const BEFORE = ['requested', 'reserved', 'depositAsked'];

/** The steps of this order; without a deposit there is one fewer. */
function Stage({ order }: { order: OwnOrder }) {
  const { state, lapsed, reservedUntil, today, hasDeposit } = order;
  if (state === 'cancelled') return <Notice tone="look" words="This order is cancelled." />;
  const { steps, current } = stepsOf(state, hasDeposit);
  return (
    <View style={{ gap: space[3] }}>
      {state === 'requested' ? (
        <Notice words="The fishroom has your question and will answer." />
      ) : (
        <StepBars steps={steps} current={current} />
      )}
      {lapsed ? (
        <Notice
          tone="look"
          words="The fish are not held for you any more. Write to the fishroom if you still want them."
        />
      ) : reservedUntil && BEFORE.includes(state) ? (
        <Text tone="soft">{`Held for you until ${formatDay(reservedUntil.slice(0, 10), today)}.`}</Text>
      ) : null}
    </View>
  );
}

function PayPart({ token, order }: Props) {
  const pay = usePay(token);
  const { payNow, bank, toPayCents } = order;
  if (!payNow && !(bank && toPayCents > 0)) return null;
  return (
    <Section title="Pay">
      <View style={{ gap: space[3] }}>
        {pay.error ? <Notice tone="act" alert words={pay.error.message} /> : null}
        {payNow ? (
          <Button
            kind="primary"
            grow
            busy={pay.isPending}
            label={payNow.kind === 'deposit' ? 'Pay the deposit by card' : 'Pay by card'}
            onPress={() => pay.mutate()}
          />
        ) : null}
        {bank && toPayCents > 0 ? <Text tone="soft">{`Or by bank transfer: ${bank}`}</Text> : null}
      </View>
    </Section>
  );
}

/** What to have ready, and what the law and the fish ask for. */
function BeforeTravel({ order }: { order: OwnOrder }) {
  if (order.state === 'cancelled' || hasLeft(order.state)) return null;
  return (
    <Section title="Before they travel">
      <View style={{ gap: space[2] }}>
        {order.cautions.map((words) => (
          <Text key={words} size="small">
            {words}
          </Text>
        ))}
        {order.termsText ? (
          <Text size="small" tone="soft">
            {order.termsText}
          </Text>
        ) : null}
      </View>
    </Section>
  );
}
