import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { formatDay } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import type { OwnOrder } from '@/shared/orders/own';
import { METRIC } from '@/shared/units';
import { formatLength } from '@/shared/unitWords';

const KIND_WORDS: Record<string, string> = {
  deposit: 'Deposit',
  balance: 'Paid',
  payment: 'Paid',
  refund: 'Given back',
};

/** What was ordered, at the server's price, and what is still to pay. */
export function OwnFish({ order }: { order: OwnOrder }) {
  const { room, lines, discountCents, totalCents, toPayCents, payments, today } = order;
  const money = (cents: number) => formatMoney(cents, room.currency);
  return (
    <Section title="Your fish">
      <Rows label="Your fish" open>
        {lines.map((line) => (
          <Row
            key={line.id}
            figure={String(line.heads)}
            unit={line.lot === 'single' ? 'fish' : line.lot}
            title={
              <Text>
                <Text italic>{line.speciesName ?? 'Possible hybrid'}</Text>
                {line.locality ? ` ${line.locality}` : ''}
              </Text>
            }
            note={
              <Text size="small" tone="soft">
                <Code>{line.code}</Code>
                {line.lengthTenthsMm === null
                  ? ''
                  : `, ${formatLength(line.lengthTenthsMm, METRIC)} on ${formatDay(line.measuredOn ?? today, today)}`}
                {line.short > 0 ? `, ${line.short} fewer since deaths` : ''}
              </Text>
            }
            trailing={line.cents === null ? undefined : <Text strong>{money(line.cents)}</Text>}
          />
        ))}
      </Rows>
      <View style={{ paddingTop: space[3] }}>
        <KeyValues
          right
          pairs={[
            ...(discountCents > 0 ? [{ key: 'Discount', value: `−${money(discountCents)}` }] : []),
            { key: 'Total', value: money(totalCents) },
            ...payments.map(({ kind, cents, onDay }, i) => ({
              key: `${KIND_WORDS[kind] ?? 'Paid'}, ${formatDay(onDay, today)}${i > 0 ? ` (${i + 1})` : ''}`,
              value: money(cents),
            })),
            {
              key: toPayCents < 0 ? 'To come back to you' : 'To pay',
              value: (
                <Text strong size="large">
                  {money(Math.abs(toPayCents))}
                </Text>
              ),
            },
          ]}
        />
      </View>
    </Section>
  );
}
