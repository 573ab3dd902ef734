import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { StyleSheet, View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { Code } from '@/components/ui/Code';
import { EmptyState } from '@/components/ui/EmptyState';
import { ErrorState } from '@/components/ui/ErrorState';
import { IconButton } from '@/components/ui/IconButton';
import { Loading } from '@/components/ui/Loading';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Screen } from '@/components/ui/Screen';
import { Segmented } from '@/components/ui/Segmented';
import { StepBars } from '@/components/ui/StepBars';
import { Text } from '@/components/ui/Text';
import { VirtualList } from '@/components/ui/VirtualList';
import { useRoom } from '@/hooks/useRoom';
import { useUrlWord } from '@/hooks/useUrlWord';
import { formatMoney } from '@/shared/money';
import type { OrderRow } from '@/shared/orders/shapes';
import { ORDER_STATE_WORDS, stepsOf } from '@/shared/orders/state';
import { may } from '@/shared/roles';
import { ordersQuery } from './queries';
import { needWords, whenWords } from './words';

/** Orders, newest first: those that are not closed, or all. `tabs`: the pages of the place, on a phone. */
export function OrderList({ chosen, tabs }: { chosen?: string; tabs?: ReactNode }) {
  const room = useRoom();
  const { data, error, refetch } = useQuery(ordersQuery(room.id));
  const [show, setShow] = useUrlWord('show', 'open', ['open', 'all']);
  const open = data?.filter(({ state }) => state !== 'closed' && state !== 'cancelled') ?? [];
  const shown = show === 'open' ? open : (data ?? []);
  const add = `/r/${room.id}/buyers/orders/new` as const;
  return (
    <Screen
      title="Orders"
      fixed={tabs}
      actions={
        <>
          {may(room.role, 'money:see') ? (
            <Button small label="Books" href={`/r/${room.id}/buyers/orders/books`} />
          ) : null}
          {may(room.role, 'sale:write') ? <IconButton icon="plus" label="New order" href={add} /> : null}
        </>
      }
    >
      {!data ? (
        error ? (
          <ErrorState title="The orders could not be loaded" words={error.message} onRetry={() => void refetch()} />
        ) : (
          <Loading label="Loading orders" />
        )
      ) : (
        <>
          <View style={styles.which}>
            <Segmented
              label="Which orders"
              as="tabs"
              choices={[
                { value: 'open', word: `Open ${open.length}` },
                { value: 'all', word: `All ${data.length}` },
              ]}
              value={show}
              onChange={setShow}
            />
          </View>
          {shown.length === 0 ? (
            <EmptyState
              small
              title={show === 'open' ? 'No open order' : 'No order yet'}
              words="An order holds fish for a buyer until they are paid and collected."
            />
          ) : null}
          <Rows bleed label="Orders">
            <VirtualList items={shown} keyOf={({ id }) => id}>
              {(order) => <OrderLine order={order} selected={order.id === chosen} />}
            </VirtualList>
          </Rows>
          <ToPay orders={open} />
        </>
      )}
    </Screen>
  );
}

function OrderLine({ order, selected }: { order: OrderRow; selected: boolean }) {
  const room = useRoom();
  const { number, state, buyer, toPayCents, hasDeposit } = order;
  const { steps, current } = stepsOf(state, hasDeposit);
  const need = needWords(order);
  const amount =
    toPayCents === null || state === 'closed' || state === 'cancelled'
      ? null
      : toPayCents === 0
        ? 'Paid'
        : formatMoney(toPayCents, room.currency);
  return (
    <Row
      href={`/r/${room.id}/orders/${order.id}`}
      label={[`Order ${number}`, buyer?.code, ORDER_STATE_WORDS[state], need].filter(Boolean).join(', ')}
      selected={selected}
      title={
        <Text strong>
          <Code>{String(number)}</Code>
          {buyer ? `  ${buyer.code}` : ''}
        </Text>
      }
      state={amount ? <Text strong>{amount}</Text> : undefined}
      note={<Fish order={order} />}
    >
      <View style={styles.steps}>
        {current < 0 ? (
          <Text size="small">{ORDER_STATE_WORDS[state]}</Text>
        ) : (
          <StepBars small steps={steps} current={current} />
        )}
        <Text size="small" tone={need ? 'trouble' : 'soft'} align="right" style={styles.when}>
          {need ?? whenWords(order, room.today)}
        </Text>
      </View>
    </Row>
  );
}

/** "6 × *Tropheus moorii*", each brood with its species. */
function Fish({ order }: { order: OrderRow }) {
  return (
    <Text size="small" tone="soft">
      {order.lines.map(({ id, heads, speciesName, code }, i) => (
        <Text key={id}>
          {`${i > 0 ? ', ' : ''}${heads} × `}
          <Text italic={speciesName !== null}>{speciesName ?? code}</Text>
        </Text>
      ))}
    </Text>
  );
}

function ToPay({ orders }: { orders: OrderRow[] }) {
  const room = useRoom();
  if (!may(room.role, 'money:see') || orders.length === 0) return null;
  const cents = orders.reduce((sum, { toPayCents }) => sum + (toPayCents ?? 0), 0);
  return (
    <View style={styles.sum}>
      <Text tone="soft">To pay, all open</Text>
      <Text strong>{formatMoney(cents, room.currency)}</Text>
    </View>
  );
}

const styles = StyleSheet.create({
  which: { marginTop: space[3], marginBottom: space[3] },
  steps: { flexDirection: 'row', flexWrap: 'wrap', alignItems: 'center', columnGap: space[3], marginTop: space[1] },
  when: { marginLeft: 'auto', flexShrink: 1 },
  sum: { flexDirection: 'row', justifyContent: 'space-between', gap: space[3], paddingVertical: space[4] },
});
