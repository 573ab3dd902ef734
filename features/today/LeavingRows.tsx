import { Figure } from '@/components/ui/Figure';
import { Row } from '@/components/ui/Row';
import { Rows } from '@/components/ui/Rows';
import { Section } from '@/components/ui/Section';
import { useRoom } from '@/hooks/useRoom';
import type { Day } from '@/shared/days';
import { formatMoney } from '@/shared/money';
import type { TodayFacts } from '@/shared/today/facts';

/** Orders collected or sent today, by the hour. */
export function LeavingRows({ orders, today }: { orders: TodayFacts['orders']; today: Day }) {
  const room = useRoom();
  if (orders.length === 0) return null;
  return (
    <Section title="Leaving today" aside={orders.length === 1 ? '1 collection' : `${orders.length} collections`}>
      <Rows>
        {orders.map(({ id, number, buyerName, what, time, toPayCents }) => (
          <Row
            key={id}
            href={`/r/${room.id}/orders/${id}`}
            label={`Order ${number}, ${what}`}
            margin={<Figure>{time?.slice(11, 16) ?? today}</Figure>}
            marginWidth={76}
            title={buyerName ?? `Order ${number}`}
            note={`${what} · order ${number}`}
            trailing={toPayCents === null ? undefined : `${formatMoney(toPayCents, room.currency)} to pay`}
          />
        ))}
      </Rows>
    </Section>
  );
}
