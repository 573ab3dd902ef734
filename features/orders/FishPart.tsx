import { useState } from 'react';
import { StyleSheet, View } from 'react-native';
import { line, space } from '@/components/theme/space';
import { useTheme } from '@/components/theme/ThemeProvider';
import { Code } from '@/components/ui/Code';
import type { MaybeAction } from '@/components/ui/Press';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatDay } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import type { OrderPage } from '@/shared/orders/contract';
import { LOT_WORDS } from '@/shared/orders/price';
import type { OrderLine } from '@/shared/orders/shapes';
import { hasLeft, isOpen, ORDER_WAY_WORDS } from '@/shared/orders/state';
import { may } from '@/shared/roles';
import { formatLength } from '@/shared/unitWords';
import { LineSheet } from './LineSheet';

/** The lines with their prices, and below what is paid and what is left to pay. */
export function FishPart({ told }: { told: OrderPage }) {
  const room = useRoom();
  const { order, note } = told;
  const [changing, setChanging] = useState<OrderLine | null>(null);
  const mayChange = may(room.role, 'sale:write') && isOpen(order.state);
  const count = order.lines.length === 1 ? '1 line' : `${order.lines.length} lines`;
  return (
    <Section title="Fish" aside={order.way === 'sale' ? count : `${ORDER_WAY_WORDS[order.way]} · ${count}`}>
      <Rows label="Lines">
        {order.lines.map((one) => (
          <FishLine key={one.id} line={one} action={mayChange ? { onPress: () => setChanging(one) } : {}} />
        ))}
      </Rows>
      <Sums told={told} />
      {note ? (
        <Text size="small" tone="soft" style={styles.note}>
          {note}
        </Text>
      ) : null}
      {changing ? <LineSheet order={order} line={changing} onClose={() => setChanging(null)} /> : null}
    </Section>
  );
}

function FishLine({ line: one, action }: { line: OrderLine; action: MaybeAction }) {
  const room = useRoom();
  const {
    heads,
    code,
    speciesName,
    locality,
    lengthTenthsMm,
    measuredOn,
    cents,
    lot,
    short,
    lostHeads,
    returnedHeads,
  } = one;
  const size =
    lengthTenthsMm && measuredOn
      ? `${formatLength(lengthTenthsMm, room.units)} on ${formatDay(measuredOn, room.today)}`
      : null;
  const after = [
    lostHeads > 0 ? `${lostHeads} died on the way` : null,
    returnedHeads > 0 ? `${returnedHeads} came back` : null,
  ];
  const each =
    cents !== null && lot === 'single' && heads > 1
      ? `${formatMoney(Math.round(cents / heads), room.currency)} each`
      : LOT_WORDS[lot];
  return (
    <Row
      {...action}
      label={`${heads} of ${code}, change`}
      figure={String(heads)}
      unit="fish"
      figureTone={short > 0 ? 'trouble' : 'ink'}
      title={
        <Text>
          <Text italic>{speciesName ?? code}</Text>
          {locality ? ` ${locality}` : ''}
        </Text>
      }
      note={
        <>
          {size ? (
            <Text size="small" tone="soft">
              {size}
            </Text>
          ) : null}
          <Text size="small" tone="soft">
            Brood <Code>{code}</Code>
            {one.note ? ` · ${one.note}` : ''}
          </Text>
          {after.some(Boolean) ? <Text size="small">{after.filter(Boolean).join(' · ')}</Text> : null}
        </>
      }
      trailing={
        cents === null ? undefined : (
          <>
            <Text strong>{formatMoney(cents, room.currency)}</Text>
            {each ? (
              <Text size="small" tone="soft">
                {each}
              </Text>
            ) : null}
          </>
        )
      }
    />
  );
}

function Sums({ told: { order, owner } }: { told: OrderPage }) {
  const room = useRoom();
  if (!owner || order.totalCents === null) return null;
  const money = (cents: number) => formatMoney(cents, room.currency);
  const { discountCents, receivedCents, depositCents } = owner;
  const asked = depositCents !== null && receivedCents < depositCents;
  return (
    <View>
      {discountCents > 0 ? <Sum words="Discount" amount={money(-discountCents)} /> : null}
      {asked ? <Sum words="Deposit asked" amount={money(depositCents)} soft /> : null}
      {receivedCents !== 0 ? <Sum words="Paid so far" amount={money(-receivedCents)} /> : null}
      <Sum
        words={hasLeft(order.state) ? 'Still to pay' : 'To pay at collection'}
        amount={money(order.toPayCents ?? 0)}
        large
      />
    </View>
  );
}

type SumProps = { words: string; amount: string; large?: boolean; soft?: boolean };

function Sum({ words, amount, large = false, soft = false }: SumProps) {
  const theme = useTheme();
  return (
    <View style={[styles.sum, { borderBottomColor: theme.rule }]}>
      <Text strong={large} tone={soft ? 'soft' : 'ink'}>
        {words}
      </Text>
      <Text strong={large} size={large ? 'heading' : 'body'} tone={soft ? 'soft' : 'ink'} align="right">
        {amount}
      </Text>
    </View>
  );
}

const styles = StyleSheet.create({
  sum: {
    flexDirection: 'row',
    flexWrap: 'wrap',
    alignItems: 'baseline',
    justifyContent: 'space-between',
    columnGap: space[3],
    paddingVertical: 10,
    borderBottomWidth: line.row,
  },
  note: { marginTop: space[2] },
});
