import { useIsWide } from '@/components/theme/breakpoint';
import { Tabs } from '@/components/ui/Tabs';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';

type Page = 'requests' | 'orders' | 'availability' | 'waiting';

/** The pages of the Buyers place, on a phone; the rail of a wide screen lists them itself. */
export function BuyersTabs({ value }: { value: Page }) {
  const room = useRoom();
  const wide = useIsWide();
  if (wide || !may(room.role, 'catch:see')) return null;
  const home = `/r/${room.id}/buyers` as const;
  const seesBuyers = may(room.role, 'buyer:see');
  return (
    <Tabs
      label="Buyers"
      value={value}
      tabs={[
        ...(seesBuyers ? [{ value: 'requests' as const, word: 'Requests', href: `${home}/requests` as const }] : []),
        { value: 'orders', word: 'Orders', href: `${home}/orders` },
        { value: 'availability', word: 'Availability', href: `${home}/availability` },
        ...(seesBuyers ? [{ value: 'waiting' as const, word: 'Waiting list', href: `${home}/waiting` as const }] : []),
      ]}
    />
  );
}
