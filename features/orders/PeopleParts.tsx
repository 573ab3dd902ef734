import { useState } from 'react';
import { View } from 'react-native';
import { space } from '@/components/theme/space';
import { Button } from '@/components/ui/Button';
import { ButtonRow } from '@/components/ui/ButtonRow';
import { Code } from '@/components/ui/Code';
import { KeyValues } from '@/components/ui/KeyValues';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { Text } from '@/components/ui/Text';
import { addressOf } from '@/features/call';
import { useRoom } from '@/hooks/useRoom';
import { type OrderPage, printReceipt } from '@/shared/orders/contract';
import { isOpen } from '@/shared/orders/state';

/** The sheets that went with the fish, and the receipt. */
export function SheetsPart({ told: { order, sheets, hasReceipt } }: { told: OrderPage }) {
  const room = useRoom();
  if (order.state === 'cancelled') return null;
  const pdf = () =>
    void globalThis.open(
      addressOf(printReceipt, { params: { roomId: room.id, orderId: order.id, paper: 'a4' } }),
      '_blank',
    );
  return (
    <Section title="Lineage sheets" aside={sheets.length > 0 ? String(sheets.length) : undefined}>
      <View style={{ gap: space[2] }}>
        {sheets.length === 0 ? (
          <Text size="small" tone="soft">
            {isOpen(order.state)
              ? 'Issued when the fish are handed over; they can be replaced, not edited.'
              : 'None was issued.'}
          </Text>
        ) : (
          <Rows label="Lineage sheets">
            {sheets.map(({ id, number, code }) => (
              <Row
                key={id}
                href={`/r/${room.id}/sheets/${id}`}
                label={`Sheet ${number}, ${code}`}
                title={<Code>{number}</Code>}
                trailing={<Code>{code}</Code>}
              />
            ))}
          </Rows>
        )}
        {hasReceipt ? (
          <ButtonRow>
            <Button small icon="print" label="Receipt" onPress={pdf} />
          </ButtonRow>
        ) : null}
      </View>
    </Section>
  );
}

/** Who it is for: owners only. */
export function BuyerPart({ owner: { buyer, link } }: { owner: NonNullable<OrderPage['owner']> }) {
  const [copied, setCopied] = useState(false);
  const pairs = [
    { key: 'Email', value: buyer.email ?? 'none: no letters go out' },
    ...(buyer.phone ? [{ key: 'Telephone', value: buyer.phone }] : []),
    ...(buyer.address ? [{ key: 'Address', value: buyer.address }] : []),
    ...(buyer.note ? [{ key: 'Note', value: buyer.note }] : []),
  ];
  return (
    <Section title={buyer.name}>
      <KeyValues pairs={pairs} keyWidth={64} />
      <View style={{ marginTop: space[2] }}>
        <Button
          small
          label={copied ? 'Link copied' : 'Copy the buyer’s link'}
          describe="Copy the link by which the buyer opens this order"
          onPress={() => void navigator.clipboard.writeText(link).then(() => setCopied(true))}
        />
      </View>
    </Section>
  );
}
