import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { LedgerRow } from '@/components/ui/LedgerRow';
import type { MaybeAction } from '@/components/ui/Press';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { useRoom } from '@/hooks/useRoom';
import { formatShortDay } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import type { OrderPage } from '@/shared/orders/contract';
import { PAYMENT_KIND_WORDS, PAYMENT_METHOD_WORDS } from '@/shared/orders/money';
import type { Payment } from '@/shared/orders/shapes';
import { PaymentSheet } from './PaymentSheet';
import { RefundSheet } from './RefundSheet';

/** The payment ledger of the order: nothing in it is edited, money back is a line of its own. */
export function PaymentsPart({ told, payments }: { told: OrderPage; payments: Payment[] }) {
  const [paying, setPaying] = useState(false);
  const [back, setBack] = useState<Payment | null>(null);
  const { order } = told;
  const mayPay = !order.lapsed && (order.toPayCents ?? 0) > 0 && order.state !== 'requested';
  return (
    <Section title="Payments" aside={payments.length > 0 ? undefined : 'none yet'}>
      <View style={{ gap: space[2] }}>
        <Rows label="Payments">
          {payments.map((payment) => (
            <PaymentLine key={payment.id} payment={payment} onBack={() => setBack(payment)} />
          ))}
        </Rows>
        {mayPay ? (
          <ButtonRow>
            <Button small label="Book a payment" onPress={() => setPaying(true)} />
          </ButtonRow>
        ) : null}
      </View>
      {paying ? <PaymentSheet told={told} onClose={() => setPaying(false)} /> : null}
      {back ? <RefundSheet orderId={order.id} payment={back} onClose={() => setBack(null)} /> : null}
    </Section>
  );
}

function PaymentLine({ payment, onBack }: { payment: Payment; onBack: () => void }) {
  const room = useRoom();
  const { kind, method, cents, onDay, needsRefund, refundableCents, note } = payment;
  const words = `${PAYMENT_KIND_WORDS[kind]}, ${PAYMENT_METHOD_WORDS[method]}`;
  const action: MaybeAction = refundableCents > 0 ? { onPress: onBack } : {};
  const must = needsRefund && refundableCents > 0;
  return (
    <LedgerRow
      date={formatShortDay(onDay)}
      {...action}
      label={`${words}, ${formatMoney(cents, room.currency)}: give back`}
      event={
        <>
          {words}
          {must ? <Text tone="trouble">{`. ${note ?? 'Must go back'}`}</Text> : note ? `. ${note}` : ''}
        </>
      }
      by={formatMoney(cents, room.currency)}
    />
  );
}
