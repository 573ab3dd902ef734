import { HeadShares } from '@/components/chart/HeadShares';
import { Section } from '@/components/ui/Section';
import type { OrderPage } from '@/shared/orders/contract';

type Stands = NonNullable<OrderPage['owner']>['stands'];

/** For each brood of the order: whose its heads are. */
export function StandsPart({ told, stands }: { told: OrderPage; stands: Stands }) {
  return stands.map((stand) => <StandOf key={stand.broodId} stand={stand} orderId={told.order.id} />);
}

function StandOf({ stand, orderId }: { stand: Stands[number]; orderId: string }) {
  const { broodId, code, heads, orders, kept, available } = stand;
  const own = orders.filter((one) => one.orderId === orderId).reduce((sum, one) => sum + one.heads, 0);
  const shares = [
    ...(own > 0 ? [{ key: 'this', heads: own, word: 'This order', kind: 'this' as const }] : []),
    ...orders
      .filter((one) => one.orderId !== orderId)
      .map((one) => ({
        key: `${one.orderId} ${one.number}`,
        heads: one.heads,
        word: String(one.number),
        kind: 'other' as const,
      })),
    ...(kept > 0 ? [{ key: 'kept', heads: kept, word: 'Kept back', kind: 'other' as const }] : []),
    ...(available > 0 ? [{ key: 'left', heads: available, word: 'Available', kind: 'left' as const }] : []),
  ];
  const says = shares.map((share) => `${share.heads} ${share.word.toLowerCase()}`).join(', ');
  return (
    <Section key={broodId} title={`Where the ${heads} heads of ${code} stand`}>
      <HeadShares shares={shares} sentence={`${heads} heads of ${code}: ${says}`} />
    </Section>
  );
}
