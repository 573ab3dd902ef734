import { useIsWide } from '@/components/theme/breakpoint';
import { Tabs } from '@/components/ui/Tabs';
import { useRoom } from '@/hooks/useRoom';
import { may } from '@/shared/roles';

type Page = 'orders' | 'availability';

/** The pages of the Buyers place, on a phone; the rail of a wide screen lists them itself. */
export function BuyersTabs({ value }: { value: Page }) {
  const room = useRoom();
  const wide = useIsWide();
  if (wide || !may(room.role, 'catch:see')) return null;
  const home = `/r/${room.id}/buyers` as const;
  return (
    <Tabs
      label="Buyers"
      value={value}
      tabs={[
        { value: 'orders', word: 'Orders', href: `${home}/orders` },
        { value: 'availability', word: 'Availability', href: `${home}/availability` },
      ]}
    />
  );
}
